import { Failure } from '@shared/failure'

/** Money as whole units of its last decimal place: sums are exact. */
export interface DecimalScale {
  readonly decimals: number
}

const DECIMAL = /^\d+(\.\d+)?$/

export const isDecimal = (text: string) => DECIMAL.test(text)

/** The places that all of these decimal texts need. */
export const decimalScaleOf = (texts: readonly string[]): DecimalScale => ({
  decimals: Math.max(0, ...texts.map((text) => (text.split('.')[1] ?? '').length)),
})

/** '18.5' at two decimals is 1850. Refuses what is no safe integer then. */
export function wholeFromDecimal(text: string, { decimals }: DecimalScale): number {
  const [units = '0', places = ''] = text.split('.')
  const whole = Number(units + places.padEnd(decimals, '0'))
  if (isDecimal(text) && Number.isSafeInteger(whole)) return whole
  throw new Failure('input-invalid', { says: `The price ${text} is not a decimal that adds exactly.` })
}

/** 1850 at two decimals is '18.50'. */
export function decimalFromWhole(whole: number, { decimals }: DecimalScale): string {
  const digits = String(whole).padStart(decimals + 1, '0')
  return decimals === 0 ? digits : `${digits.slice(0, -decimals)}.${digits.slice(-decimals)}`
}
