import { describe, expect, it } from 'vitest'
import { mmFromSixtyFourths, nanometresUp, parseLength, printLength } from '@shared/units'
import table from '../data/fractions-inch.json'
import { expectWithin } from '../../helpers/expect-within'

// Aeronautical Engineer's Data Book, table 2.11, mm to five places, cut off (published).
const PRINTED: readonly (readonly [string, number])[] = [
  ['1/64', 0.39687],
  ['1/32', 0.79375],
  ['3/64', 1.19062],
  ['1/16', 1.5875],
  ['1/8', 3.175],
  ['3/16', 4.7625],
  ['1/4', 6.35],
  ['3/8', 9.525],
  ['7/16', 11.1125],
  ['1/2', 12.7],
  ['5/8', 15.875],
  ['3/4', 19.05],
  ['7/8', 22.225],
  ['31/32', 24.60625],
  ['63/64', 25.00312],
]

describe('fractions of an inch', () => {
  it('have all 64 rows', () => expect(table.rows.length).toBe(64))

  it.each(table.rows)('$reduced in is $mm mm and prints in lowest terms', ({ n64, reduced, decimal, mm }) => {
    expect(mmFromSixtyFourths(n64)).toBe(mm)
    expect(parseLength(`${reduced}"`, 'mm')).toEqual({ kind: 'length', mm })
    expect(parseLength(String(decimal), 'in')).toEqual({ kind: 'length', mm })
    expect(printLength(mm, { unit: 'in', withUnit: false })).toBe(reduced)
    expect(nanometresUp(mm)).toBe(n64 * 396_875)
  })

  it.each(PRINTED)('%s in is printed as %d mm', (reduced, printed) => {
    const parsed = parseLength(reduced, 'in')
    expectWithin(parsed.kind === 'length' ? parsed.mm : NaN, printed, { withinMm: 1e-5 })
  })

  // Building Trades Pocketbook (published): decimals of an inch to the nearest 64th.
  it.each([
    [0.133, '9/64'],
    [0.367, '23/64'],
    [0.8979, '57/64'],
    [0.4, '13/32'],
    [0.123, '1/8'],
  ])('%d in is nearest to %s', (inches, nearest) => {
    expect(printLength(inches * 25.4, { unit: 'in', withUnit: false })).toBe(nearest)
  })
})
