import { describe, it } from 'vitest'
import { affineOf, layMovedBy, mmPerPixelOf } from '@/board/photograph-lay'
import { expectWithin } from '../../helpers/expect-within'

const onto = (lay: Parameters<typeof affineOf>[1], u: number, v: number, mmPerPixel = 0.1) => {
  const { a, b, c, d, e, f } = affineOf(mmPerPixel, lay)
  return { x: a * u + c * v + e, y: b * u + d * v + f }
}
const expectAt = (found: { x: number; y: number }, x: number, y: number) => {
  expectWithin(found.x, x, { withinMm: 1e-9 })
  expectWithin(found.y, y, { withinMm: 1e-9 })
}

describe('a photograph under the drawing', () => {
  it('takes its scale from two points', () => {
    // 3-4-5: 500 pixels over 100 mm.
    const scale = { from: [100, 100], to: [400, 500], distance: 100, plusMinus: 0.5 } as const
    expectWithin(mmPerPixelOf({ ...scale, from: [...scale.from], to: [...scale.to] }) ?? NaN, 0.2, {
      withinMm: 1e-12,
    })
  })

  it('lies with its point on the origin, right to the right and down to the wall', () => {
    const lay = { at: [200, 300] as [number, number], turn: 0, mirrored: false }
    expectAt(onto(lay, 200, 300), 0, 0)
    expectAt(onto(lay, 250, 300), 5, 0)
    expectAt(onto(lay, 200, 260), 0, 4)
  })

  it('turns counter-clockwise about that point', () => {
    const lay = { at: [200, 300] as [number, number], turn: 90, mirrored: false }
    expectAt(onto(lay, 250, 300), 0, 5)
    expectAt(onto(lay, 200, 260), -4, 0)
  })

  it('is mirrored left to right before it is turned', () => {
    const lay = { at: [200, 300] as [number, number], turn: 0, mirrored: true }
    expectAt(onto(lay, 250, 300), -5, 0)
    expectAt(onto(lay, 200, 260), 0, 4)
  })

  it('follows the hand, however it lies', () => {
    for (const turn of [0, 37, -120]) {
      for (const mirrored of [false, true]) {
        const lay = { at: [200, 300] as [number, number], turn, mirrored }
        const before = onto(lay, 410, 95)
        const after = onto(layMovedBy(0.1, lay, { x: 3, y: -2 }), 410, 95)
        expectAt(after, before.x + 3, before.y - 2)
      }
    }
  })
})
