import { coverOf, rebateOpeningOf } from '@shared/cutting'
import type { Cover } from '@shared/cutting'
import type { Measurement } from '@shared/contracts'
import { Failure } from '@shared/failure'

/** What follows from a measurement, mm and degrees; the sight size and cover only where a section says how wide the rebate is. */
export interface OpeningFigures {
  readonly widthMm: number
  readonly heightMm: number
  readonly skewDeg: number
  readonly sight?: readonly [number, number]
  readonly cover?: Cover
}

export type Opening =
  | { readonly kind: 'figures'; readonly figures: OpeningFigures }
  | { readonly kind: 'wrong'; readonly says: string }

/** `rebateWidthMm`: of the finished face, where a section is in hand. */
export function openingFiguresOf(picture: Measurement, rebateWidthMm: number | undefined): Opening {
  try {
    const { opening, skewRad } = rebateOpeningOf(picture)
    const { widthMm, heightMm } = opening
    const bare = { widthMm, heightMm, skewDeg: (skewRad * 180) / Math.PI }
    if (rebateWidthMm === undefined) return { kind: 'figures', figures: bare }
    const sight = [widthMm - 2 * rebateWidthMm, heightMm - 2 * rebateWidthMm] as const
    return { kind: 'figures', figures: { ...bare, sight, cover: coverOf(picture, rebateWidthMm) } }
  } catch (error) {
    if (!(error instanceof Failure)) throw error
    return { kind: 'wrong', says: error.details.says ?? 'These readings do not fit one another.' }
  }
}
