import { Failure } from '@shared/failure'
import { GREATEST_LENGTH_MM, NANOMETRE_SNAP_MM } from './tolerance'

declare const nanometresBrand: unique symbol

/** A whole number of nanometres, always a safe integer: sums of them are exact and "fits" is <=. 1/64 in is 396 875 nm. */
export type Nanometres = number & { readonly [nanometresBrand]: 'nm' }

export const NANOMETRES_PER_MM = 1e6

/** Takes a number that is already whole nanometres; refuses one that is no safe integer. */
export function nanometresFrom(whole: number): Nanometres {
  if (!Number.isSafeInteger(whole)) {
    throw new Failure('input-invalid', {
      says: `${whole} is not a whole number of nanometres that adds exactly`,
    })
  }
  return (whole === 0 ? 0 : whole) as Nanometres
}

/** Least whole nanometres not below a length in mm: for lengths needed. Robust as nanometresDown. */
export const nanometresUp = (mm: number): Nanometres => rounded(mm, Math.ceil)

/**
 * Greatest whole nanometres not above a length in mm: for lengths there are.
 *
 * A double is hardly ever the decimal it stands for: 1119.1 × 10⁶ may come out a hair above or below 1 119 100 000. So the nearest whole
 * number is tried first: if the length lies within NANOMETRE_SNAP_MM of it, it is that number, up and down alike. A double nearest to a decimal
 * of at most six places is off by at most 6·10⁻⁸ mm at the greatest length allowed; there, n / 10⁶ giving back the very same double decides.
 */
export const nanometresDown = (mm: number): Nanometres => rounded(mm, Math.floor)

function rounded(mm: number, round: (value: number) => number): Nanometres {
  if (!(Math.abs(mm) <= GREATEST_LENGTH_MM)) {
    throw new Failure('input-invalid', { says: `${mm} mm is not a length that can be planned with` })
  }
  const scaled = mm * NANOMETRES_PER_MM
  const nearest = Math.round(scaled)
  const isNearest =
    nearest / NANOMETRES_PER_MM === mm || Math.abs(scaled - nearest) <= NANOMETRE_SNAP_MM * NANOMETRES_PER_MM
  return nanometresFrom(isNearest ? nearest : round(scaled))
}

/** The double nearest to a whole number of nanometres, mm. */
export const mmFromNanometres = (nanometres: Nanometres): number => nanometres / NANOMETRES_PER_MM

/** The double nearest to so many 64ths of an inch, mm: 25.4/64 = 127/320, so a whole number is rounded only once. */
export const mmFromSixtyFourths = (sixtyFourths: number): number => (sixtyFourths * 127) / 320
