import { Failure } from '@shared/failure'
import { MM_OF, type LengthUnit } from './length-tokens'
import {
  doubleFrom,
  productOf,
  quotientOf,
  rationalFrom,
  rationalFromDouble,
  type Rational,
} from './rational'

/** Finest division of the inch that is printed. */
export type InchDivision = 64 | 32 | 16 | 8

export interface PrintLengthOptions {
  readonly unit: LengthUnit
  /** Decimals: of a millimetre (default 2), or of an inch, in which case no fraction is printed. */
  readonly places?: number
  /** Inches as mixed fractions to this division (default 64). */
  readonly fraction?: InchDivision
  /** Whether the unit follows the number (default true). */
  readonly withUnit?: boolean
}

/** A number with a point, so many decimals and no thousands comma; never “-0”. */
export function printNumber(value: number, places: number): string {
  if (!Number.isFinite(value))
    throw new Failure('input-invalid', { says: `${value} is not a number to print` })
  const text = value.toFixed(places)
  return /^-[0.]*$/.test(text) ? text.slice(1) : text
}

/**
 * A length for people: 84.10 mm, 3 5/16". Read back by parseLength it is the same double when it lies on the printed grid
 * (a decimal of so many places; a whole number of the inch's divisions), else within half the last place.
 */
export function printLength(mm: number, options: PrintLengthOptions): string {
  const { unit, places, fraction = 64, withUnit = true } = options
  if (unit === 'mm') return printNumber(mm, places ?? 2) + (withUnit ? ' mm' : '')
  const text = places === undefined ? printInchFraction(mm, fraction) : printNumber(mm / 25.4, places)
  return text + (withUnit ? '"' : '')
}

/** 25.4 mm is 127/5 mm: division by 127 is the only rounding before the nearest division is taken. */
function printInchFraction(mm: number, division: InchDivision): string {
  if (!Number.isFinite(mm)) throw new Failure('input-invalid', { says: `${mm} is not a length to print` })
  const parts = Math.round((Math.abs(mm) * 5 * division) / 127)
  if (parts === 0) return '0'
  const sign = mm < 0 ? '-' : ''
  const whole = Math.floor(parts / division)
  const [numerator, denominator] = reduced(parts % division, division)
  if (numerator === 0) return `${sign}${whole}`
  return whole === 0 ? `${sign}${numerator}/${denominator}` : `${sign}${whole} ${numerator}/${denominator}`
}

function reduced(numerator: number, denominator: number): readonly [number, number] {
  return numerator > 0 && numerator % 2 === 0
    ? reduced(numerator / 2, denominator / 2)
    : [numerator, denominator]
}

/** A length in full: parseLength gives back the very same double, whatever it is. */
export function printLengthExact(mm: number, unit: LengthUnit): string {
  if (!Number.isFinite(mm)) throw new Failure('input-invalid', { says: `${mm} is not a length to print` })
  if (mm === 0) return unit === 'mm' ? '0 mm' : '0"'
  return unit === 'mm' ? `${plainDecimalOf(mm)} mm` : `${exactInchesOf(mm)}"`
}

/** JavaScript's shortest digits that give the double back, without a power of ten. */
function plainDecimalOf(value: number): string {
  const [mantissa = '', exponent] = String(value).split('e')
  if (exponent === undefined) return mantissa
  const sign = mantissa.startsWith('-') ? '-' : ''
  const [whole = '', decimals = ''] = mantissa.replace('-', '').split('.')
  const point = whole.length + Number(exponent)
  const digits = whole + decimals
  if (point <= 0) return `${sign}0.${'0'.repeat(-point)}${digits}`
  return sign + digits.padEnd(point, '0')
}

/** Not every double of mm is 25.4 times a double of inches, so decimals are added until the text reads back as the same mm. */
function exactInchesOf(mm: number): string {
  const inches = quotientOf(rationalFromDouble(Math.abs(mm)), MM_OF.in)
  const leading = Math.floor(Math.log10(Math.abs(mm)) - Math.log10(25.4))
  for (let places = Math.max(0, 14 - leading); ; places += 1) {
    const scale = 10n ** BigInt(places)
    const whole = nearestWhole(productOf(inches, rationalFrom(scale)))
    const readBack = doubleFrom(productOf(rationalFrom(whole, scale), MM_OF.in))
    if (readBack === Math.abs(mm)) return (mm < 0 ? '-' : '') + decimalText(whole, places)
  }
}

const nearestWhole = ({ numerator, denominator }: Rational): bigint =>
  (2n * numerator + denominator) / (2n * denominator)

function decimalText(scaled: bigint, places: number): string {
  const digits = scaled.toString().padStart(places + 1, '0')
  if (places === 0) return digits
  const text = `${digits.slice(0, -places)}.${digits.slice(-places)}`
  return text.replace(/\.?0+$/, '')
}

/** Twice the standard deviation: the ± about 95 % that people read and type. Files hold one standard deviation. */
export const plusMinus95 = (standardDeviation: number): number => 2 * standardDeviation

/** The standard deviation behind a ± about 95 % that a person typed. */
export const standardDeviationFrom95 = (plusMinus: number): number => plusMinus / 2

/** ± about 95 % of a length whose standard deviation is given in mm, always as decimals (2 of a mm, 3 of an inch unless said). */
export function printPlusMinus(
  standardDeviationMm: number,
  options: { unit: LengthUnit; places?: number },
): string {
  const { unit, places = unit === 'mm' ? 2 : 3 } = options
  return `±${printLength(plusMinus95(standardDeviationMm), { unit, places })}`
}

/** An area: mm² (default 1 decimal) or in² (default 3). */
export function printArea(mm2: number, { unit, places }: { unit: LengthUnit; places?: number }): string {
  return unit === 'mm'
    ? `${printNumber(mm2, places ?? 1)} mm²`
    : `${printNumber(mm2 / 25.4 ** 2, places ?? 3)} in²`
}

/** A volume given in mm³: dm³ (default 2 decimals) or in³ (default 1). */
export function printVolume(mm3: number, { unit, places }: { unit: LengthUnit; places?: number }): string {
  return unit === 'mm'
    ? `${printNumber(mm3 / 1e6, places ?? 2)} dm³`
    : `${printNumber(mm3 / 25.4 ** 3, places ?? 1)} in³`
}

/** Kilograms in the avoirdupois pound, exactly (international yard and pound agreement, 1959). */
const KG_PER_POUND = 0.45359237

/** A mass given in kg: kg, or pounds where lengths are inches; default 2 decimals. */
export function printMass(kg: number, { unit, places = 2 }: { unit: LengthUnit; places?: number }): string {
  return unit === 'mm' ? `${printNumber(kg, places)} kg` : `${printNumber(kg / KG_PER_POUND, places)} lb`
}
