/**
 * Exact fractions for typed arithmetic: 3/64 in must come out as the double nearest to 1.190625 mm, whichever way it was typed.
 * The denominator is always positive; fractions are not reduced, since typed texts are short.
 */
export interface Rational {
  readonly numerator: bigint
  readonly denominator: bigint
}

export const rationalFrom = (numerator: bigint, denominator = 1n): Rational =>
  denominator < 0n ? { numerator: -numerator, denominator: -denominator } : { numerator, denominator }

export const sumOf = (a: Rational, b: Rational): Rational => ({
  numerator: a.numerator * b.denominator + b.numerator * a.denominator,
  denominator: a.denominator * b.denominator,
})

export const negated = (a: Rational): Rational => ({ numerator: -a.numerator, denominator: a.denominator })

export const productOf = (a: Rational, b: Rational): Rational => ({
  numerator: a.numerator * b.numerator,
  denominator: a.denominator * b.denominator,
})

/** The divisor must not be zero. */
export const quotientOf = (a: Rational, b: Rational): Rational =>
  rationalFrom(a.numerator * b.denominator, a.denominator * b.numerator)

/** An unsigned plain decimal such as 12, 3.25, .5 or 7., exactly. */
export function rationalFromDecimal(text: string): Rational {
  const [whole = '', decimals = ''] = text.split('.')
  return { numerator: BigInt(whole + decimals), denominator: 10n ** BigInt(decimals.length) }
}

/** The very value of a finite double. */
export function rationalFromDouble(value: number): Rational {
  let scaled = value
  let halvings = 0
  while (!Number.isInteger(scaled)) {
    scaled *= 2
    halvings += 1
  }
  return { numerator: BigInt(scaled), denominator: 2n ** BigInt(halvings) }
}

const bitsOf = (value: bigint): number => value.toString(2).length

/**
 * The double nearest to a fraction, ties to even: the quotient is taken to 66 bits or a few more with the remainder folded into its lowest bit,
 * so that the one rounding to 53 bits sees which side of a tie it is on. Infinity beyond the doubles.
 */
export function doubleFrom({ numerator, denominator }: Rational): number {
  if (numerator === 0n) return 0
  const size = numerator < 0n ? -numerator : numerator
  const shift = 66 - (bitsOf(size) - bitsOf(denominator))
  if (shift > LEAST_NORMAL_SHIFT) return subnormalFrom(size, denominator) * (numerator < 0n ? -1 : 1)
  const up = shift > 0 ? size << BigInt(shift) : size
  const down = shift < 0 ? denominator << BigInt(-shift) : denominator
  const quotient = up / down
  const sticky = up % down === 0n ? quotient : quotient | 1n
  const magnitude = scaledByPowerOfTwo(Number(sticky), -shift)
  return numerator < 0n ? -magnitude : magnitude
}

/** With a greater shift the last of 53 bits would lie below 2⁻¹⁰⁷⁴, the step of the smallest doubles. */
const LEAST_NORMAL_SHIFT = 1087

/** Rounded to that step, ties to even. */
function subnormalFrom(size: bigint, denominator: bigint): number {
  const up = size << 1074n
  const steps = up / denominator
  const twiceRest = 2n * (up % denominator)
  const isUp = twiceRest > denominator || (twiceRest === denominator && steps % 2n === 1n)
  return Number(isUp ? steps + 1n : steps) * Number.MIN_VALUE
}

/** In two steps, since 2 ** −1100 alone would be zero. */
function scaledByPowerOfTwo(value: number, exponent: number): number {
  const half = Math.trunc(exponent / 2)
  return value * 2 ** half * 2 ** (exponent - half)
}
