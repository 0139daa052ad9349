import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { spreadApart } from '@shared/sheet'
import { expectWithin } from '../../helpers/expect-within'

const places = fc
  .array(fc.double({ min: 0, max: 100, noNaN: true }), { minLength: 1, maxLength: 60 })
  .map((list) => [...list].sort((a, b) => a - b))

const squares = (wanted: readonly number[], got: readonly number[]): number =>
  got.reduce((sum, place, index) => sum + (place - (wanted[index] ?? Number.NaN)) ** 2, 0)

describe('labels spread apart', () => {
  it('stay where they are wanted when they have room', () => {
    expect(spreadApart([0, 5, 12], 4)).toEqual([0, 5, 12])
  })

  it('part evenly from a common place', () => {
    expect(spreadApart([10, 10, 10], 4)).toEqual([6, 10, 14])
  })

  it('by hand: two that crowd move half each, and take in a neighbour they come to touch', () => {
    // 10 and 11 at pitch 4 part to 8.5 and 12.5; 13 then crowds: least squares gives 7 1/3, 11 1/3, 15 1/3.
    const got = spreadApart([10, 11, 13], 4)
    ;[22 / 3, 34 / 3, 46 / 3].forEach((place, index) => {
      expectWithin(got[index] ?? Number.NaN, place, { withinMm: 1e-12 })
    })
  })

  it('keep their order and never stand nearer than the pitch', () => {
    fc.assert(
      fc.property(places, (wanted) => {
        const got = spreadApart(wanted, 3.8)
        expect(got).toHaveLength(wanted.length)
        got.slice(1).forEach((place, index) => {
          expect(place - (got[index] ?? Number.NaN)).toBeGreaterThanOrEqual(3.8 - 1e-9)
        })
      }),
    )
  })

  it('move no farther in sum of squares than any other lawful placing', () => {
    fc.assert(
      fc.property(
        places,
        fc.array(fc.double({ min: -1, max: 1, noNaN: true }), { minLength: 60, maxLength: 60 }),
        (wanted, nudges) => {
          const got = spreadApart(wanted, 3.8)
          const other: number[] = []
          got.forEach((place, index) => {
            const least = (other[index - 1] ?? -Infinity) + 3.8
            other.push(Math.max(least, place + (nudges[index] ?? 0)))
          })
          expect(squares(wanted, got)).toBeLessThanOrEqual(squares(wanted, other) + 1e-6)
        },
      ),
    )
  })
})
