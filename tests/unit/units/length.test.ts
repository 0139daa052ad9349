import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { parseLength, type LengthUnit } from '@shared/units'

const mmOf = (text: string, unit: LengthUnit = 'mm'): number => {
  const parsed = parseLength(text, unit)
  if (parsed.kind !== 'length') throw new Error(`${text}: ${parsed.says}`)
  return parsed.mm
}

const faultOf = (text: string, unit: LengthUnit = 'mm'): string => {
  const parsed = parseLength(text, unit)
  return parsed.kind === 'not-a-length' ? parsed.says : `read as ${parsed.mm} mm`
}

describe('parseLength', () => {
  // 1 in = 25.4 mm, so 3 5/16 in = 53 × 25.4 / 16 = 84.1375 mm and 7 ft 2 in = 86 × 25.4 = 2184.4 mm
  it.each<[string, LengthUnit, number]>([
    ['84', 'mm', 84],
    ['84', 'in', 2133.6],
    ['84 mm', 'in', 84],
    ['84mm', 'in', 84],
    ['8.4 cm', 'mm', 84],
    ['0.084 m', 'mm', 84],
    ['.5', 'mm', 0.5],
    ['7.', 'mm', 7],
    ['3 5/16', 'in', 84.1375],
    ['3 5/16', 'mm', 3.3125],
    ['3 5/16 in', 'mm', 84.1375],
    ['3-5/16"', 'mm', 84.1375],
    ['3-5/16', 'in', 84.1375],
    ['-3-5/16"', 'mm', -84.1375],
    ['3 - 5/16', 'in', 68.2625],
    ['3 -5/16', 'in', 68.2625],
    ['3-1', 'mm', 2],
    ['5/16"', 'mm', 7.9375],
    ['3½"', 'mm', 88.9],
    ['3 ½ in', 'mm', 88.9],
    ['¾', 'in', 19.05],
    ['7\' 2"', 'mm', 2184.4],
    ['7′ 2″', 'mm', 2184.4],
    ['7’2”', 'mm', 2184.4],
    ['7\' 2 1/2"', 'mm', 2197.1],
    ['7\'-2 1/2"', 'mm', 2197.1],
    ["7' 2½", 'mm', 2197.1],
    ["7'", 'mm', 2133.6],
    ['7 ft 2 in', 'mm', 2184.4],
    ['7\' - 2"', 'mm', 2082.8],
    ["7' + 10 mm", 'in', 2143.6],
    ['1/2*(3+1/4)', 'mm', 1.625],
    ['1/2*(3+1/4)', 'in', 41.275],
    ['1/2 × (3 + 1/4) in', 'mm', 41.275],
    ['(3 + 1/4)"', 'mm', 82.55],
    ['100 - 2*8.5', 'mm', 83],
    ['100 − 2×8.5', 'mm', 83],
    ['12/4/3', 'mm', 1],
    ['12 / 4 * 3', 'mm', 9],
    ['2 + 3 * 4', 'mm', 14],
    ['2 - 3 - 4', 'mm', -5],
    ['1 in / 4', 'mm', 6.35],
    ['10 mm / 4 mm', 'mm', 2.5],
    ['1 in + 1', 'mm', 26.4],
    ['-84', 'mm', -84],
    ['−84', 'mm', -84],
    ['+84', 'mm', 84],
    ['3 - -2', 'mm', 5],
    ['  84  ', 'mm', 84],
    ['2*3-5/16"', 'mm', 168.275],
    ['0', 'in', 0],
  ])('reads %s where lengths are %s as %d mm', (text, unit, mm) => {
    expect(mmOf(text, unit)).toBe(mm)
  })

  it('never gives −0', () => expect(Object.is(mmOf('-0'), 0)).toBe(true))

  it('rounds only once: 3/64 in is the double nearest to 1.190625, whichever way it is typed', () => {
    for (const text of ['3/64"', '3/64 in', '0.046875"', '1.190625 mm', '1/64" * 3', '0.1190625 cm']) {
      expect(mmOf(text)).toBe(1.190625)
    }
    expect(mmOf('0.1 + 0.2')).toBe(0.3)
  })

  // 1 + 2⁻⁵³ lies midway between two doubles: the tie goes to the even one, 1; a hair more goes up
  it('rounds a tie to even, and sees the least bit beyond it', () => {
    const tie = '1.00000000000000011102230246251565404236316680908203125'
    expect(mmOf(tie)).toBe(1)
    expect(mmOf(`${tie}${'0'.repeat(40)}1`)).toBe(1 + Number.EPSILON)
  })

  it.each([
    ['', /missing/],
    ['   ', /missing/],
    ['3,5', /decimals or thousands: write 3\.5 or 35/],
    ['3,500', /write 3\.500 or 3500/],
    ['3,', /write 3\.5 or 3500/],
    ['3 5/0', /0 below the stroke/],
    ['1/0', /divided by 0/],
    ['1/(2 - 2)', /divided by 0/],
    ['NaN', /NaN.*has no place/],
    ['Infinity', /Infinity.*has no place/],
    ['-infinity', /infinity.*has no place/],
    ['1e308', /powers of ten/],
    ['1e3', /powers of ten/],
    ['9'.repeat(12), /thousand kilometres/],
    ['9'.repeat(401), /too long.*400/],
    ['84 mm x', /“x” has no place/],
    ['84 mm mm', /left over/],
    ['84)', /left over/],
    ['12 84', /another number/],
    ['3 5 / 16', /another number/],
    ['3.5 1/2', /whole number/],
    ['3.5½', /whole number/],
    ['3 17/16', /less than one/],
    ['3 16/16', /less than one/],
    ['100-50/2', /less than one.*spaces/],
    ['5+3-1/4', /mixed number or a subtraction/],
    ['3 1.5/16', /two whole numbers/],
    ['(3', /not closed/],
    ['3 +', /missing before the end/],
    ['3 ++ -2', /two signs/],
    ['*3', /missing before “\*”/],
    ['3 mm * 4 mm', /area/],
    ['3 / 4 mm * ', /missing|not a length/],
    ['3 / 4mm', /not a length/],
    ['7\' 14"', /fewer than twelve/],
    ["7' 2 mm", /only inches/],
    [`7' 12"`, /fewer than twelve/],
    ['(3 mm) in', /two units/],
    ['mm', /number is missing/],
    ['84#', /“#” has no place/],
    ['84;', /“;” has no place/],
  ])('refuses %j and says why', (text, says) => {
    expect(faultOf(text)).toMatch(says)
  })

  it('answers any text whatever with one kind or the other, and only with finite lengths', () => {
    const piece = fc.constantFrom(
      '3',
      '5',
      '0',
      '.',
      '/',
      '-',
      '+',
      '*',
      '(',
      ')',
      ' ',
      '"',
      "'",
      'mm',
      '½',
      ',',
      'e',
    )
    const text = fc.oneof(
      fc.string({ maxLength: 60 }),
      fc.array(piece, { maxLength: 20 }).map((parts) => parts.join('')),
    )
    fc.assert(
      fc.property(text, fc.constantFrom<LengthUnit>('mm', 'in'), (typed, unit) => {
        const parsed = parseLength(typed, unit)
        if (parsed.kind === 'length') expect(Number.isFinite(parsed.mm)).toBe(true)
        else expect(parsed.says.length).toBeGreaterThan(10)
      }),
      { numRuns: 2000 },
    )
  })

  it('agrees with the same sum worked out in doubles', () => {
    const number = fc.integer({ min: 1, max: 999 })
    const operator = fc.constantFrom(' + ', ' - ', ' * ', ' / ')
    fc.assert(
      fc.property(number, operator, number, operator, number, (a, p, b, q, c) => {
        const text = `${a}${p}${b}${q}${c}`
        const expected = sumOf([a, b, c], [p.trim(), q.trim()])
        expect(Math.abs(mmOf(text) - expected)).toBeLessThanOrEqual(1e-12 * (Math.abs(expected) + a + b * c))
      }),
    )
  })

  it('takes deep nesting up to the longest text', () => {
    const depth = 199
    expect(mmOf('('.repeat(depth) + '7' + ')'.repeat(depth))).toBe(7)
  })
})

/** Three numbers and two operators, the usual precedence, in doubles. */
function sumOf([a = 0, b = 0, c = 0]: readonly number[], [p, q]: readonly string[]): number {
  const apply = (left: number, operator: string | undefined, right: number): number => {
    if (operator === '+') return left + right
    if (operator === '-') return left - right
    return operator === '*' ? left * right : left / right
  }
  const laterFirst = (q === '*' || q === '/') && (p === '+' || p === '-')
  return laterFirst ? apply(a, p, apply(b, q, c)) : apply(apply(a, p, b), q, c)
}
