import { describe, expect, it } from 'vitest'
import { gildedAreaOf, leafPlanFor } from '@shared/finish'
import { expectWithin } from '../../helpers/expect-within'

const MM_PER_INCH = 25.4
const MM2_PER_SQUARE_FOOT = (12 * MM_PER_INCH) ** 2

describe('leaf, figures of the trade', () => {
  // A gilding supplier's article, 2021 (read): a book is 25 leaves of 80 × 80 mm and covers 0.16 m² with no overlap.
  it('0.16 m² takes one book of 80 mm leaf without lap or waste', () => {
    const stretch = { girthMm: 400, totalRailLengthMm: 400 }
    expectWithin(gildedAreaOf(stretch), 160_000, { withinMm2: 0 })
    expect(leafPlanFor(stretch, { leafMm: 80, lapMm: 0, waste: 0 })).toEqual({
      rows: 5,
      leaves: 25,
      books: 1,
    })
  })

  // A gilder's page (read): 20 books of 3⅜ in leaf are 500 leaves and 3.67 m².
  it('3.67 m² is 500 leaves of 3⅜ in', () => {
    const leafMm = 3.375 * MM_PER_INCH
    const stretch = { girthMm: 20 * leafMm, totalRailLengthMm: 25 * leafMm }
    expectWithin(gildedAreaOf(stretch), 3.67e6, { withinMm2: 5000 })
    expect(leafPlanFor(stretch, { leafMm, lapMm: 0, waste: 0 })).toEqual({
      rows: 20,
      leaves: 500,
      books: 20,
    })
  })

  // A frame-maker's notes, January 2011 (read): frame 30 × 40 in of 3½ in moulding, five leaves to every 3 in of length; the centre
  // line 2·(30 + 40) + 4·3½ = 154 in is bought as 13 ft, 13 × 4 × 5 = 260 leaves.
  it('13 ft of a face five rows wide takes 260 leaves', () => {
    const leaf = { leafMm: 3.375 * MM_PER_INCH, lapMm: 0.375 * MM_PER_INCH, waste: 0 }
    const plan = leafPlanFor({ girthMm: 15 * MM_PER_INCH, totalRailLengthMm: 156 * MM_PER_INCH }, leaf)
    expect(plan).toEqual({ rows: 5, leaves: 260, books: 11 })
    expect(
      leafPlanFor({ girthMm: 15 * MM_PER_INCH, totalRailLengthMm: 154 * MM_PER_INCH }, leaf).leaves,
    ).toBe(257)
  })

  // A gold-leaf specification sheet (read): with normal laps and waste a book of 3⅜ in leaf covers about 1½ sq ft. Computed: laps of
  // 3/8 in and an eighth more leaves give 1½ within a fifth.
  it('a book covers about 1½ sq ft with laps and waste', () => {
    const stretch = { girthMm: 3 * MM_PER_INCH, totalRailLengthMm: 3000 * MM_PER_INCH }
    const { leaves } = leafPlanFor(stretch, {
      leafMm: 3.375 * MM_PER_INCH,
      lapMm: 0.375 * MM_PER_INCH,
      waste: 0.125,
    })
    const perBook = (gildedAreaOf(stretch) / leaves) * 25
    expectWithin(perBook / MM2_PER_SQUARE_FOOT, 1.5, { withinRatio: 0.2 })
  })
})
