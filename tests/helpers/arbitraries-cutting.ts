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
