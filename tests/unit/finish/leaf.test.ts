import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { Failure } from '@shared/failure'
import { leafPlanFor } from '@shared/finish'

const LEAF = { leafMm: 80, lapMm: 3, waste: 0 }

describe('leafPlanFor', () => {
  // 77 mm is left of a leaf of 80 that laps by 3. Girth 100: two rows. 2 × 3000 ÷ 77 = 77.92: 78 leaves, four books.
  it('counts rows, leaves and books', () => {
    expect(leafPlanFor({ girthMm: 100, totalRailLengthMm: 3000 }, LEAF)).toEqual({
      rows: 2,
      leaves: 78,
      books: 4,
    })
  })

  // 77.92 × 1.15 = 89.61: the waste is added before rounding up.
  it('adds the waste to the leaves', () => {
    expect(leafPlanFor({ girthMm: 100, totalRailLengthMm: 3000 }, { ...LEAF, waste: 0.15 }).leaves).toBe(90)
  })

  it('takes one row for a girth of just one leaf and two for a hair more', () => {
    expect(leafPlanFor({ girthMm: 77, totalRailLengthMm: 770 }, LEAF)).toEqual({
      rows: 1,
      leaves: 10,
      books: 1,
    })
    expect(leafPlanFor({ girthMm: 77.001, totalRailLengthMm: 770 }, LEAF).rows).toBe(2)
  })

  // 0.3 ÷ 0.1 is 2.9999999999999996 and 0.7 ÷ 0.1 is 6.999…; 1.1 × 3 ÷ 1.1 may land above 3: none may cost a row.
  it('does not buy a row for binary rounding', () => {
    expect(
      leafPlanFor({ girthMm: 1.1 * 3, totalRailLengthMm: 1.1 }, { ...LEAF, leafMm: 1.1, lapMm: 0 }),
    ).toEqual({
      rows: 3,
      leaves: 3,
      books: 1,
    })
  })

  it('takes no leaf for nothing', () => {
    expect(leafPlanFor({ girthMm: 0, totalRailLengthMm: 3000 }, LEAF)).toEqual({
      rows: 0,
      leaves: 0,
      books: 0,
    })
  })

  it('names every fault at once', () => {
    const attempt = () =>
      leafPlanFor({ girthMm: -1, totalRailLengthMm: Number.NaN }, { leafMm: 0, lapMm: 80, waste: -0.1 })
    expect(attempt).toThrow(Failure)
    try {
      attempt()
    } catch (error) {
      if (!(error instanceof Failure)) throw error
      expect(error.code).toBe('input-invalid')
      expect(error.details.faults?.map(({ path }) => path)).toEqual([
        '/girth',
        '/railLength',
        '/leaf',
        '/lap',
        '/waste',
      ])
    }
  })

  it('refuses a lap as wide as the leaf, and says so', () => {
    expect(() =>
      leafPlanFor({ girthMm: 10, totalRailLengthMm: 10 }, { leafMm: 80, lapMm: 80, waste: 0 }),
    ).toThrow(/lap is 80 mm.*less than the leaf/)
  })

  it('never plans less area of leaf, laps off, than is gilded', () => {
    const length = fc.double({ min: 1, max: 5000, noNaN: true })
    const share = fc.double({ min: 0, max: 0.9, noNaN: true })
    fc.assert(
      fc.property(length, length, share, (girthMm, totalRailLengthMm, lapShare) => {
        const leaf = { leafMm: 80, lapMm: 80 * lapShare, waste: 0 }
        const { leaves } = leafPlanFor({ girthMm, totalRailLengthMm }, leaf)
        const covered = leaves * (80 - leaf.lapMm) ** 2
        expect(covered).toBeGreaterThanOrEqual(girthMm * totalRailLengthMm * (1 - 1e-6) - 1)
      }),
    )
  })
})
