import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { railsOf, totalRailLengthAt, volumeOf } from '@shared/cutting'
import type { RailsRequest } from '@shared/cutting'
import { Failure } from '@shared/failure'
import { expectWithin } from '../../helpers/expect-within'

const FRAME: RailsRequest = {
  sides: 4,
  opening: { kind: 'rectangle', widthMm: 900, heightMm: 600 },
  rebateWidthFinishedMm: 8,
  rebateWidthWoodMm: 7.5,
  greatestXFinishedMm: 60,
  greatestXWoodMm: 59,
  count: 2,
}

describe('railsOf', () => {
  // Sight 900 − 16 by 600 − 16; outside + 120 each way. Long points by the wood: 900 + 2 (59 − 7.5) = 1003, 600 + 103 = 703.
  it('takes sight and outside from the finished face, long points from the wood', () => {
    const rails = railsOf(FRAME)
    expect(rails.sightMm).toEqual([884, 584])
    expect(rails.outsideMm).toEqual([1004, 704])
    expect(rails.list.map(({ side }) => side)).toEqual(['top', 'right', 'bottom', 'left'])
    const [top, right] = rails.list
    expect(top).toEqual({
      side: 'top',
      count: 2,
      longPointMm: 1003,
      rebateMm: 900,
      sightMm: 884,
      mitreDeg: 45,
      bevelDeg: 0,
    })
    expect(right).toMatchObject({ longPointMm: 703, rebateMm: 600, sightMm: 584 })
    expect(rails.footageMm).toBe(2 * 2 * (1003 + 703))
  })

  // A hexagon 300 across the flats has sides 300 · tan 30°; each millimetre of x adds 2 · tan 30°.
  it('changes a regular frame’s rails by 2·tan(180°/n) per unit of x', () => {
    const rails = railsOf({
      ...FRAME,
      sides: 6,
      opening: { kind: 'polygon', acrossFlatsMm: 300 },
      rebateWidthWoodMm: 8,
      greatestXWoodMm: 60,
      count: 1,
    })
    expect(rails.list.map(({ side }) => side)).toEqual(['1', '2', '3', '4', '5', '6'])
    const perMm = 2 * Math.tan(Math.PI / 6)
    for (const rail of rails.list) {
      expect(rail.mitreDeg).toBe(30)
      expectWithin(rail.rebateMm, 150 * perMm, { withinMm: 1e-9 })
      expectWithin(rail.sightMm, rail.rebateMm - 8 * perMm, { withinMm: 1e-9 })
      expectWithin(rail.longPointMm, rail.sightMm + 60 * perMm, { withinMm: 1e-9 })
    }
    expect(rails.outsideMm).toEqual([404, 404])
  })

  it('sets the saw for a tilted section as for a sprung one', () => {
    const [top] = railsOf({ ...FRAME, tiltRad: (15 * Math.PI) / 180 }).list
    expectWithin(top?.mitreDeg ?? 0, 44.01, { withinDeg: 0.005 })
    expectWithin(top?.bevelDeg ?? 0, 10.55, { withinDeg: 0.005 })
  })

  it.each<[string, Partial<RailsRequest>]>([
    ['two sides', { sides: 2 }],
    ['five sides round a rectangle', { sides: 5 }],
    ['a rebate wider than half the picture', { rebateWidthFinishedMm: 300, greatestXFinishedMm: 400 }],
    ['a back edge inside the rebate', { greatestXWoodMm: 5 }],
    ['no frames', { count: 0 }],
    ['a width that is no number', { rebateWidthWoodMm: Number.NaN }],
    ['a section on edge', { tiltRad: Math.PI / 2 }],
  ])('refuses %s', (_name, change) => {
    expect(() => railsOf({ ...FRAME, ...change })).toThrow(Failure)
  })
})

/** A section of wood as strips: its upper and lower edges are straight between rows [x, low, high]. */
type Strips = readonly (readonly [number, number, number])[]

/** ∫ f over the section for f linear in x, exactly: thickness × f is a quadratic on each strip, which Simpson's rule integrates. */
function integralOver(strips: Strips, f: (x: number) => number): number {
  return strips.slice(1).reduce((sum, [x1, low1, high1], index) => {
    const [x0, low0, high0] = strips[index] ?? [0, 0, 0]
    const [t0, t1] = [high0 - low0, high1 - low1]
    const middle = ((t0 + t1) / 2) * f((x0 + x1) / 2)
    return sum + ((x1 - x0) / 6) * (t0 * f(x0) + 4 * middle + t1 * f(x1))
  }, 0)
}

const anyStrips = () =>
  fc
    .array(
      fc.tuple(
        fc.double({ min: 1, max: 30, noNaN: true }),
        fc.double({ min: 0, max: 20, noNaN: true }),
        fc.double({ min: 1, max: 40, noNaN: true }),
      ),
      { minLength: 2, maxLength: 8 },
    )
    .map((rows) => {
      let x = -1
      return rows.map(([step, low, thickness]) => [(x += step), low, low + thickness] as const)
    })

describe('volumeOf', () => {
  // The solid is cut into slices at every x: a slice of thickness t(x) is as long as the rails are there.
  it('agrees with adding up the solid slice by slice', () => {
    fc.assert(
      fc.property(anyStrips(), fc.constantFrom(3, 4, 5, 6, 8, 12), (strips, sides) => {
        const opening =
          sides === 4
            ? ({ kind: 'rectangle', widthMm: 900, heightMm: 600 } as const)
            : ({ kind: 'polygon', acrossFlatsMm: 700 } as const)
        const request = { opening, sides, count: 3, rebateWidthWoodMm: 8 }
        const areaMm2 = integralOver(strips, () => 1)
        const centroidXMm = integralOver(strips, (x) => x) / areaMm2
        const slices = integralOver(strips, (x) => totalRailLengthAt(request, 8, x))
        expectWithin(volumeOf(request, { areaMm2, centroidXMm }), slices, { withinRatio: 1e-12 })
      }),
    )
  })

  // A square tube of wall w round a square of side s: (s + 2w)² − s², times its height.
  it('gives a plain square frame as the difference of two blocks', () => {
    const request = {
      opening: { kind: 'rectangle', widthMm: 500, heightMm: 500 },
      sides: 4,
      count: 1,
      rebateWidthWoodMm: 0,
    } as const
    const volume = volumeOf(request, { areaMm2: 40 * 20, centroidXMm: 20 })
    expectWithin(volume, (580 ** 2 - 500 ** 2) * 20, { withinMm3: 1e-6 })
  })
})
