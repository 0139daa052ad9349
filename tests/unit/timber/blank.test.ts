import { describe, expect, it } from 'vitest'
import { BOARD_FOOT_MM3, blankFor, boardFeetOf, cubicMetresOf, withWaste } from '@shared/timber'
import { expectWithin } from '../../helpers/expect-within'

const MOULDING = { widthMm: 60, thicknessMm: 40, machiningAllowanceMm: 6 }

describe('blankFor', () => {
  // 40 + 6 = 46 mm: 6/4 is 38.1, 8/4 is 50.8.
  it('takes the thinnest nominal thickness that holds finished + allowance', () => {
    expect(blankFor(MOULDING)).toEqual({
      thicknessMm: 46,
      widthMm: 66,
      nominal: '8/4',
      layers: 1,
      label: '8/4',
    })
  })

  // 44.8 + 6 = 50.8: just 8/4. A tenth of a millimetre more is 10/4.
  it('fills a nominal thickness to the last', () => {
    expect(blankFor({ ...MOULDING, thicknessMm: 44.8 }).nominal).toBe('8/4')
    expect(blankFor({ ...MOULDING, thicknessMm: 44.9 }).nominal).toBe('10/4')
  })

  // 100 + 6 is more than 16/4 = 101.6. Two boards lose 6 each: 112 / 2 = 56 mm: 10/4 = 63.5.
  it('glues up what no board holds, each board losing the allowance', () => {
    expect(blankFor({ ...MOULDING, thicknessMm: 100 })).toEqual({
      thicknessMm: 112,
      widthMm: 66,
      nominal: '10/4',
      layers: 2,
      label: '2 × 10/4 glued up',
    })
  })

  // With 4/4 and 5/4 only, 46 mm: two boards need (40 + 12)/2 = 26 mm: 5/4 = 31.75.
  it('keeps to what the yard has', () => {
    expect(blankFor({ ...MOULDING, available: ['5/4', '4/4'] }).label).toBe('2 × 5/4 glued up')
  })

  it('refuses what ten boards do not hold', () => {
    expect(() => blankFor({ ...MOULDING, thicknessMm: 5000 })).toThrow(/No blank of up to 10 boards/)
    expect(() => blankFor({ ...MOULDING, machiningAllowanceMm: 200 })).toThrow(/machining allowance less/)
  })

  it('names every wrong size', () => {
    expect(() =>
      blankFor({ widthMm: 0, thicknessMm: Number.NaN, machiningAllowanceMm: -1, available: [] }),
    ).toThrow(/width is 0.*thickness is NaN.*machiningAllowance is -1.*No nominal thickness/)
  })
})

describe('board feet', () => {
  it('is 144 cubic inches', () => {
    expectWithin(BOARD_FOOT_MM3, 2_359_737.216, { withinMm3: 1e-6 })
  })

  // 8/4 × 66 mm × 10 m: 50.8 · 66 · 10 000 / 2 359 737.216 = 14.2085; 0.033528 m³.
  it('counts the nominal thickness and the rough width, unrounded', () => {
    const blank = blankFor(MOULDING)
    expectWithin(boardFeetOf(blank, 10_000), 14.2084, { within: 0.0001 })
    expectWithin(cubicMetresOf(blank, 10_000), 0.033528, { within: 1e-12 })
  })

  it('counts every board of a glued-up blank', () => {
    const one = boardFeetOf({ nominal: '8/4', layers: 1, widthMm: 66 }, 1000)
    expectWithin(boardFeetOf({ nominal: '8/4', layers: 3, widthMm: 66 }, 1000), 3 * one, { within: 1e-12 })
  })

  it('adds waste as a share, and refuses less than none', () => {
    expectWithin(withWaste(10, 0.2), 12, { within: 1e-12 })
    expect(() => withWaste(10, -0.1)).toThrow(/share of waste is -0.1/)
  })
})
