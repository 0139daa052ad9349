import { describe, expect, it } from 'vitest'
import { polygonOpeningOf, railsOf, rebateOpeningOf } from '@shared/cutting'
import { expectWithin } from '../../helpers/expect-within'

const MM_PER_INCH = 25.4

interface Frame {
  readonly size: readonly [number, number]
  readonly moulding: number
  readonly rebate: number
  /** Clearance in each direction. */
  readonly allowance: number
}

/** Rails of a frame all of whose measures are in one unit, mm or inches: nothing in them depends on the unit. */
function railsAround({ size: [width, height], moulding, rebate, allowance }: Frame) {
  const { opening } = rebateOpeningOf({ width: [width], height: [height], allowance, lining: 0 })
  return railsOf({
    sides: 4,
    opening,
    rebateWidthFinishedMm: rebate,
    rebateWidthWoodMm: rebate,
    greatestXFinishedMm: moulding,
    greatestXWoodMm: moulding,
    count: 1,
  })
}

describe('rails, worked examples of the trade', () => {
  // A framing supplier's article on moulding lengths (read): perimeter + 8 × width + allowance; 16 × 20 in, 2 in moulding, ¼ in for the
  // fit in all: 72 + 16 + ¼. It measures from the picture's edge: no rebate.
  it('16 × 20 in of 2 in moulding takes 88¼ in', () => {
    const frame = { size: [16, 20], moulding: 2, rebate: 0, allowance: 0.25 / 4 } as const
    expectWithin(railsAround(frame).footageMm, 88.25, { within: 1e-12 })
  })

  // The same article: the long rails 20 + 2 + 2 and the short 16 + 2 + 2 in, without the fit.
  it('its rails are 24 and 20 in', () => {
    const rails = railsAround({ size: [16, 20], moulding: 2, rebate: 0, allowance: 0 })
    expect(rails.list.map(({ longPointMm }) => longPointMm)).toEqual([20, 24, 20, 24])
  })

  // A framing shop's page (read): 305 × 407 mm, 66 mm moulding, 4 mm fit in all: 1424 + 4 + 8 × 66 = 1956 mm.
  it('305 × 407 mm of 66 mm moulding takes 1956 mm', () => {
    const frame = { size: [305, 407], moulding: 66, rebate: 0, allowance: 1 } as const
    expectWithin(railsAround(frame).footageMm, 1956, { withinMm: 1e-9 })
  })

  // A woodworking magazine's tip, no. 275 (read): rail = glazed size + 1/16 in + 2 × the distance from rebate to outside edge.
  it('a rail is the glazed size, 1/16 in, and twice the moulding outside the rebate', () => {
    const [top] = railsAround({ size: [10, 8], moulding: 1.5, rebate: 0.25, allowance: 1 / 16 }).list
    expectWithin(top?.longPointMm ?? 0, 10 + 1 / 16 + 2 * (1.5 - 0.25), { within: 1e-12 })
  })

  // A woodworker's page (read): 8 in opening, 2 in moulding, 1/8 in rebate: 8 + 2 (2 − 1/8) = 11¾ in.
  it('an 8 in opening of 2 in moulding with a 1/8 in rebate has 11¾ in rails', () => {
    const rails = railsAround({ size: [8, 8], moulding: 2, rebate: 0.125, allowance: 0 })
    for (const { longPointMm } of rails.list) expectWithin(longPointMm, 11.75, { within: 1e-12 })
  })

  // A hardwood moulding seller's page (read), footage without its three cuts: by rebate size 2 (D1 + D2) + 4 (2 (W − R) + A),
  // by sight size 2 (D1 + D2) + 4 (2 W + A), by outside size 2 (D1 + D2).
  it('the seller’s three ways of counting footage agree with the rails', () => {
    const [moulding, rebate, allowance] = [57, 7, 3]
    const rails = railsAround({ size: [420, 297], moulding, rebate, allowance })
    expectWithin(rails.footageMm, 2 * (420 + 297) + 4 * (2 * (moulding - rebate) + allowance), {
      withinMm: 1e-9,
    })
    const [sightAcross, sightUp] = rails.sightMm
    expectWithin(rails.footageMm, 2 * (sightAcross + sightUp) + 8 * moulding, { withinMm: 1e-9 })
    const [outsideAcross, outsideUp] = rails.outsideMm
    expectWithin(rails.footageMm, 2 * (outsideAcross + outsideUp), { withinMm: 1e-9 })
  })

  // A retailer's woodworking-maths page (read): 8 in across the flats, six sides: side 4.6188 in.
  it('a hexagon 8 in across the flats has sides of 4.6188 in', () => {
    const opening = polygonOpeningOf({ acrossFlats: [8 * MM_PER_INCH], allowance: 0, lining: 0 })
    const rails = railsOf({
      sides: 6,
      opening,
      rebateWidthFinishedMm: 0,
      rebateWidthWoodMm: 0,
      greatestXFinishedMm: 0,
      greatestXWoodMm: 0,
      count: 1,
    })
    for (const { rebateMm } of rails.list) {
      expectWithin(rebateMm / MM_PER_INCH, 4.6188, { within: 5e-5 })
    }
  })
})
