import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { fittedTo, gridOf, pannedBy, toCanvas, toSection, zoomedAt } from '@/board/view-transform'
import type { View } from '@/board/view-transform'
import { expectWithin } from '../../helpers/expect-within'

const coordinate = fc.double({ min: -5000, max: 5000, noNaN: true })
const anyPoint = fc.record({ x: coordinate, y: coordinate })
const anyView: fc.Arbitrary<View> = fc.record({
  pixelsPerMm: fc.double({ min: 0.2, max: 120, noNaN: true }),
  originX: coordinate,
  originY: coordinate,
})

describe('the view', () => {
  it('puts the origin where it says, x to the right and y up', () => {
    const view = { pixelsPerMm: 4, originX: 100, originY: 300 }
    expect(toCanvas(view, { x: 0, y: 0 })).toEqual({ x: 100, y: 300 })
    expect(toCanvas(view, { x: 10, y: 25 })).toEqual({ x: 140, y: 200 })
  })

  it('comes back to the same place of the section', () => {
    fc.assert(
      fc.property(anyView, anyPoint, (view, point) => {
        const back = toSection(view, toCanvas(view, point))
        expectWithin(back.x, point.x, { withinMm: 1e-7 })
        expectWithin(back.y, point.y, { withinMm: 1e-7 })
      }),
    )
  })

  it('zooms about the pointer: what lies under it stays', () => {
    fc.assert(
      fc.property(
        anyView,
        anyPoint,
        fc.double({ min: 0.05, max: 20, noNaN: true }),
        (view, place, factor) => {
          const before = toSection(view, place)
          const after = toSection(zoomedAt(view, place, factor), place)
          expectWithin(after.x, before.x, { withinMm: 1e-6 })
          expectWithin(after.y, before.y, { withinMm: 1e-6 })
        },
      ),
    )
  })

  it('stops zooming at its closest and farthest', () => {
    const view = { pixelsPerMm: 4, originX: 0, originY: 0 }
    expect(zoomedAt(view, { x: 0, y: 0 }, 1e9).pixelsPerMm).toBe(120)
    expect(zoomedAt(view, { x: 0, y: 0 }, 1e-9).pixelsPerMm).toBe(0.2)
  })

  it('moves with the hand', () => {
    const moved = pannedBy({ pixelsPerMm: 2, originX: 10, originY: 20 }, 5, -3)
    expect(moved).toEqual({ pixelsPerMm: 2, originX: 15, originY: 17 })
  })

  it('shows a whole section within its margins, in their middle, at the greatest scale that fits', () => {
    const margins = { left: 100, right: 50, top: 80, bottom: 40 }
    const extent = { min: { x: 0, y: 0 }, max: { x: 100, y: 50 } }
    // 1000 - 150 across for 100 mm: 8.5 px/mm; 600 - 120 up for 50 mm: 9.6. The width decides.
    const view = fittedTo(extent, { width: 1000, height: 600 }, margins)
    expectWithin(view.pixelsPerMm, 8.5, { withinMm: 1e-12 })
    expect(toCanvas(view, { x: 0, y: 0 }).x).toBe(100)
    expect(toCanvas(view, { x: 100, y: 0 }).x).toBe(950)
    // 50 mm are 425 px, in the middle of 80 … 560.
    expectWithin(toCanvas(view, { x: 0, y: 50 }).y, 107.5, { withinMm: 1e-9 })
  })

  it('draws the finest division that can be told apart', () => {
    const at = (pixelsPerMm: number) => ({ pixelsPerMm, originX: 0, originY: 0 })
    expect(gridOf(at(20), 'mm')).toEqual({ stepMm: 0.5, major: 10 })
    expect(gridOf(at(4), 'mm')).toEqual({ stepMm: 5, major: 2 })
    expect(gridOf(at(4), 'in').stepMm).toBe(3.175)
    expect(gridOf(at(0.2), 'mm').stepMm).toBe(50)
  })
})
