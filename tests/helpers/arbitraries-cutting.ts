import fc from 'fast-check'
import type { CutInstance } from '@shared/cutting'

/** Instances of whole millimetres that may or may not have a plan: one to six rails, some mitred otherwise, with or without rack and prices. */
export const anySmallInstance = (): fc.Arbitrary<CutInstance> =>
  fc
    .record({
      rails: fc.array(
        fc.record({
          length: fc.integer({ min: 5, max: 60 }).map((tens) => tens * 10 + (tens % 7)),
          mitre: fc.constantFrom(45, 45, 45, 30, 0),
        }),
        { minLength: 1, maxLength: 6 },
      ),
      isOfOneMitre: fc.boolean(),
      lengths: fc.array(
        fc.record({
          length: fc.integer({ min: 40, max: 150 }).map((tens) => tens * 10),
          cents: fc.integer({ min: 100, max: 4000 }),
          most: fc.constantFrom(undefined, undefined, 1, 2),
        }),
        { maxLength: 3 },
      ),
      isPriced: fc.boolean(),
      rack: fc.array(
        fc.record({
          length: fc.integer({ min: 10, max: 90 }).map((tens) => tens * 10),
          endTrim: fc.constantFrom(undefined, [0, 20] as const, [0, 0] as const),
        }),
        { maxLength: 3 },
      ),
      saw: fc.record({
        kerf: fc.constantFrom(0, 3, 4),
        margin: fc.constantFrom(0, 2),
        endTrim: fc.constantFrom(0, 25),
        shortestSafe: fc.constantFrom(0, 150),
        smallestUsableOffcut: fc.constantFrom(0, 200),
      }),
    })
    .map(({ rails, isOfOneMitre, lengths, isPriced, rack, saw }) => ({
      demand: rails.map(({ length, mitre }, index) => ({
        id: `r${index}`,
        length,
        count: 1,
        mitre: isOfOneMitre ? 45 : mitre,
      })),
      lengths: lengths
        .filter(({ length }, index) => lengths.findIndex((other) => other.length === length) === index)
        .map(({ length, cents, most }) => ({
          length,
          ...(isPriced ? { price: (cents / 100).toFixed(2) } : {}),
          ...(most === undefined ? {} : { count: most }),
        })),
      rack: rack.map(({ length, endTrim }, index) => ({
        id: `R-${index}`,
        length,
        ...(endTrim === undefined ? {} : { endTrim }),
      })),
      saw,
    }))

/** What a workshop cuts in a day: up to six frames of four rails, from two priced lengths and a few pieces of the rack. */
export const anyDaysWork = (): fc.Arbitrary<CutInstance> =>
  fc
    .record({
      frames: fc.array(fc.tuple(anySide(), anySide()), { minLength: 1, maxLength: 6 }),
      rack: fc.array(fc.integer({ min: 4000, max: 24_000 }), { maxLength: 4 }),
      isPriced: fc.boolean(),
    })
    .map(({ frames, rack, isPriced }) => ({
      demand: frames.flatMap(([width, height], index) =>
        (['top', 'right', 'bottom', 'left'] as const).map((side, place) => ({
          id: `F${index}-${side}`,
          length: place % 2 === 0 ? width : height,
          count: 1,
          mitre: 45,
          frame: `F${index}`,
          side,
        })),
      ),
      lengths: [
        { length: 2440, ...(isPriced ? { price: '18.50' } : {}) },
        { length: 3660, ...(isPriced ? { price: '26.00' } : {}) },
      ],
      rack: rack.map((tenths, index) => ({ id: `R-${index}`, length: tenths / 10 })),
      saw: { kerf: 3.2, margin: 2, endTrim: 75, shortestSafe: 200, smallestUsableOffcut: 400 },
      order: { setupPieces: 2, firstOff: 300, reserve: 0.1 },
    }))

/** A rail's long point, in tenths of a millimetre, mm. */
const anySide = () => fc.integer({ min: 3000, max: 12_000 }).map((tenths) => tenths / 10)
