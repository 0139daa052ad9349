import type { LengthUnit, Vocabulary } from '@shared/units'
import type { PrintedDate } from './sheet-input'

/** A rail as it is cut: lengths mm, the mitre in degrees from square. */
export interface ListedRail {
  readonly frame: string
  readonly side: string
  readonly count: number
  readonly longPointMm: number
  readonly rebateMm: number
  readonly sightMm: number
  readonly mitreDeg: number
}

/** One cut on a length: where its long point starts along the back edge, from the length's own start. */
export interface ListedCut {
  readonly frame: string
  readonly side: string
  readonly longPointMm: number
  readonly mitreDeg: number
  readonly atMm: number
}

export interface ListedLength {
  /** The rack piece's code, or the words for one to be ordered. */
  readonly name: string
  readonly lengthMm: number
  /** What the first cut takes off a sawn or factory end, mm. */
  readonly startTrimMm: number
  readonly cuts: readonly ListedCut[]
  readonly offcutMm: number
  /** The code that the offcut gets when it goes back to the rack; absent for waste. */
  readonly offcutMark?: string
}

export interface CutListInput {
  readonly unit: LengthUnit
  readonly vocabulary: Vocabulary
  readonly workshop: string
  readonly commissionNumber: string
  readonly title: string
  readonly issueLetter: string
  readonly sha256: string
  readonly listNumber: number
  readonly printedOn: PrintedDate
  /** The moulding's true width, which the mitres run across, mm. */
  readonly trueWidthMm: number
  readonly batch?: string
  /** Said in large letters at the top where the list must not be cut yet, or no longer. */
  readonly barred?: string
  readonly saw: {
    readonly name: string
    readonly kerfMm: number
    readonly marginMm: number
    readonly shortestSafeMm: number
  }
  readonly rails: readonly ListedRail[]
  readonly lengths: readonly ListedLength[]
  readonly cautions?: readonly string[]
}
