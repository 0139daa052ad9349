import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { Failure } from '@shared/failure'
import {
  clampRoomLeftOf,
  findDepthRefusal,
  greatestDepthOf,
  knifeFaceDepth,
  knifeHeadFrom,
  riseCutBy,
} from '@shared/knife'
import type { KnifeSetting } from '@shared/knife'
import { expectWithin } from '../../helpers/expect-within'

const HEAD = knifeHeadFrom(125, 20)

function faceMmOf(depthMm: number, setting: KnifeSetting): number {
  const depth = knifeFaceDepth(depthMm, setting)
  if (depth.kind === 'refused') throw new Error(depth.says)
  return depth.faceMm
}

describe('knifeFaceDepth', () => {
  // R 62.5, γ 20°: e = 21.376259; D 20: the highest point is cut at r = 42.5. √(62.5² − e²) = 58.730789, √(42.5² − e²) = 36.732894.
  it('is the difference of the two roots', () => {
    expectWithin(faceMmOf(0, { ...HEAD, greatestDepthMm: 20 }), 58.730789 - 36.732894, { withinMm: 2e-6 })
  })

  it('is 0 at the deepest point, which lies on the tip line', () => {
    expect(faceMmOf(20, { ...HEAD, greatestDepthMm: 20 })).toBe(0)
  })

  it('grows from the deepest point to the highest', () => {
    const depths = fc.tuple(
      fc.double({ min: 0, max: 30, noNaN: true }),
      fc.double({ min: 0.001, max: 5, noNaN: true }),
    )
    fc.assert(
      fc.property(depths, ([higher, step]) => {
        const setting = { ...HEAD, greatestDepthMm: 35 }
        expect(faceMmOf(higher, setting)).toBeGreaterThan(faceMmOf(Math.min(35, higher + step), setting))
      }),
    )
  })

  it('keeps all digits of a cut of a nanometre under a hook of a millionth of a degree', () => {
    const setting = { ...knifeHeadFrom(125, 1e-6), greatestDepthMm: 1e-6 }
    expectWithin(faceMmOf(0, setting), 1e-6, { withinRatio: 1e-15 })
  })

  it('is turned back by riseCutBy', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 30, noNaN: true }),
        fc.double({ min: 0, max: 30, noNaN: true }),
        (depthMm, hookDeg) => {
          const head = knifeHeadFrom(180, hookDeg)
          const faceMm = faceMmOf(depthMm, { ...head, greatestDepthMm: 30 })
          expectWithin(riseCutBy(head, faceMm), 30 - depthMm, { withinMm: 1e-11 })
        },
      ),
    )
  })

  it.each([-0.001, 20.001, Number.NaN])('refuses a depth of %f mm under a greatest of 20', (depthMm) => {
    expect(() => knifeFaceDepth(depthMm, { ...HEAD, greatestDepthMm: 20 })).toThrow(/between 0 and/)
  })

  it('names every impossible size of the head at once', () => {
    const attempt = () =>
      knifeFaceDepth(0, { cuttingRadiusMm: 0, hookRad: 2, clampRoomMm: -1, greatestDepthMm: -1 })
    expect(attempt).toThrow(Failure)
    expect(attempt).toThrow(/cutting circle.*hook angle.*clamp.*depth/)
    expect(() => knifeFaceDepth(0, { ...HEAD, greatestDepthMm: Number.POSITIVE_INFINITY })).toThrow(/finite/)
  })
})

describe('what a head cannot cut', () => {
  // e = 21.376259, room 10: R − √(e² + 100) = 62.5 − 23.599670 = 38.900330.
  it('is refused with the greatest depth that would do', () => {
    const refusal = knifeFaceDepth(0, { ...HEAD, greatestDepthMm: 40 })
    expect(refusal.kind).toBe('refused')
    if (refusal.kind !== 'refused') return
    expectWithin(refusal.greatestDepthMm, 38.90033, { withinMm: 1e-6 })
    expect(refusal.says).toMatch(/40\.00 mm deep.*mm of knife is left to clamp.*at most 38\.90 mm/)
  })

  it('says so when the knife’s face does not reach in at all', () => {
    const refusal = findDepthRefusal(HEAD, 41.2)
    expect(clampRoomLeftOf(HEAD, 41.2)).toBeUndefined()
    expect(refusal?.says).toMatch(/does not reach in so far/)
  })

  // Without room to clamp the limit is R − e = 41.123741.
  it('goes to R − e where no room is asked for', () => {
    const head = knifeHeadFrom(125, 20, 0)
    expectWithin(greatestDepthOf(head), 41.123741, { withinMm: 1e-6 })
    expect(findDepthRefusal(head, 41.1237)).toBeUndefined()
    expect(findDepthRefusal(head, 41.1238)?.kind).toBe('refused')
  })

  it('says that no depth would do in a head too small to clamp any knife', () => {
    const refusal = findDepthRefusal(knifeHeadFrom(15, 20), 1)
    expect(refusal?.greatestDepthMm).toBe(0)
    expect(refusal?.says).toMatch(/Use a head with a larger cutting circle/)
  })

  it('takes exactly the depth that it names', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 60, max: 300, noNaN: true }),
        fc.double({ min: 0, max: 40, noNaN: true }),
        (diameterMm, hookDeg) => {
          const head = knifeHeadFrom(diameterMm, hookDeg)
          const greatestMm = greatestDepthOf(head)
          fc.pre(greatestMm > 0.01)
          expect(findDepthRefusal(head, greatestMm - 1e-9)).toBeUndefined()
          expect(findDepthRefusal(head, greatestMm + 1e-6)?.kind).toBe('refused')
        },
      ),
    )
  })
})
