import { rationalFrom, rationalFromDecimal, type Rational } from './rational'

/** The unit a person works in: one setting for the whole workshop. */
export type LengthUnit = 'mm' | 'in'

/** Millimetres in a unit, as an exact fraction. */
export const MM_OF = {
  mm: rationalFrom(1n),
  cm: rationalFrom(10n),
  m: rationalFrom(1000n),
  in: rationalFrom(127n, 5n),
  ft: rationalFrom(1524n, 5n),
} as const satisfies Record<string, Rational>

export type TypedUnit = keyof typeof MM_OF

/** gapBefore: white space stood before it (or it is the first). It tells 3-5/16 from 3 - 5/16. */
export type LengthToken = { readonly gapBefore: boolean; readonly at: number } & (
  | { readonly kind: 'number'; readonly text: string; readonly value: Rational; readonly whole: boolean }
  | { readonly kind: 'vulgar'; readonly value: Rational }
  | { readonly kind: 'unit'; readonly unit: TypedUnit }
  | { readonly kind: 'sign'; readonly sign: '+' | '-' | '*' | '/' | '(' | ')' }
  | { readonly kind: 'end' }
)

const VULGAR: Readonly<Record<string, readonly [bigint, bigint]>> = {
  '½': [1n, 2n],
  '⅓': [1n, 3n],
  '⅔': [2n, 3n],
  '¼': [1n, 4n],
  '¾': [3n, 4n],
  '⅕': [1n, 5n],
  '⅖': [2n, 5n],
  '⅗': [3n, 5n],
  '⅘': [4n, 5n],
  '⅙': [1n, 6n],
  '⅚': [5n, 6n],
  '⅛': [1n, 8n],
  '⅜': [3n, 8n],
  '⅝': [5n, 8n],
  '⅞': [7n, 8n],
}

const SIGNS: Readonly<Record<string, '+' | '-' | '*' | '/' | '(' | ')'>> = {
  '+': '+',
  '-': '-',
  '−': '-',
  '–': '-',
  '*': '*',
  '×': '*',
  '·': '*',
  '/': '/',
  '÷': '/',
  '⁄': '/',
  '(': '(',
  ')': ')',
}

const UNIT_WORDS: Readonly<Record<string, TypedUnit>> = {
  mm: 'mm',
  cm: 'cm',
  m: 'm',
  in: 'in',
  inch: 'in',
  inches: 'in',
  ft: 'ft',
  foot: 'ft',
  feet: 'ft',
}

const UNIT_MARKS: Readonly<Record<string, TypedUnit>> = {
  '"': 'in',
  '″': 'in',
  '”': 'in',
  "'": 'ft',
  '′': 'ft',
  '’': 'ft',
}

/** What is wrong with a typed length, in words for who typed it. */
export class LengthFault extends Error {}

const NUMBER = /^(\d+\.?\d*|\.\d+)/
const WORD = /^\p{L}+/u

/** Cuts a typed length into tokens; throws LengthFault at the first character that has no place in one. */
export function lengthTokensOf(text: string): readonly LengthToken[] {
  const tokens: LengthToken[] = []
  let at = 0
  let gapBefore = true
  while (at < text.length) {
    const rest = text.slice(at)
    const gap = /^\s+/.exec(rest)
    if (gap) {
      at += gap[0].length
      gapBefore = true
      continue
    }
    const { token, size } = nextToken(rest, { gapBefore, at })
    tokens.push(token)
    at += size
    gapBefore = false
  }
  tokens.push({ kind: 'end', gapBefore, at })
  return tokens
}

function nextToken(
  rest: string,
  place: { readonly gapBefore: boolean; readonly at: number },
): { readonly token: LengthToken; readonly size: number } {
  const number = NUMBER.exec(rest)?.[0]
  if (number !== undefined) {
    refuseExponent(rest, number)
    const whole = /^\d+$/.test(number)
    return {
      token: { ...place, kind: 'number', text: number, value: rationalFromDecimal(number), whole },
      size: number.length,
    }
  }
  const [mark = ''] = rest
  const sign = SIGNS[mark]
  if (sign !== undefined) return { token: { ...place, kind: 'sign', sign }, size: 1 }
  const vulgar = VULGAR[mark]
  if (vulgar) return { token: { ...place, kind: 'vulgar', value: rationalFrom(...vulgar) }, size: 1 }
  if (rest.startsWith("''")) return { token: { ...place, kind: 'unit', unit: 'in' }, size: 2 }
  const unitMark = UNIT_MARKS[mark]
  if (unitMark) return { token: { ...place, kind: 'unit', unit: unitMark }, size: 1 }
  const word = WORD.exec(rest)?.[0]
  const unit = word === undefined ? undefined : UNIT_WORDS[word.toLowerCase()]
  if (word !== undefined && unit) return { token: { ...place, kind: 'unit', unit }, size: word.length }
  throw new LengthFault(`“${word ?? mark}” has no place in a length: write for example 84 mm or 3 5/16"`)
}

function refuseExponent(rest: string, number: string): void {
  if (/^[eE][-+]?\d/.test(rest.slice(number.length))) {
    throw new LengthFault('write the number out in full: powers of ten such as 1e3 are not read')
  }
}
