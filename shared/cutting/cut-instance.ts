/**
 * What a plan is made from and what it answers. The short names are the commission file's (demand, lengths, rack, saw, order), so that its
 * parts can be given as they are: lengths in mm, `mitre` in degrees from square, `price` a decimal text.
 */
import type { LengthUnit } from '@shared/units'

export interface DemandedRail {
  readonly id: string
  /** Long point, mm. */
  readonly length: number
  readonly count: number
  /** Degrees from square at both ends; 0 for a square cut. */
  readonly mitre: number
  readonly frame?: string
  readonly side?: string
}

/** A length that can be ordered, without limit or up to `count`. */
export interface OrderableLength {
  readonly length: number
  readonly price?: string
  readonly count?: number
}

/** A single piece in the workshop; `endTrim` (start, end) where it differs from the saw's. */
export interface RackPiece {
  readonly id: string
  readonly length: number
  readonly endTrim?: readonly [number, number]
}

export interface SawSettings {
  readonly kerf: number
  /** Handling margin between neighbours, mm. */
  readonly margin: number
  readonly endTrim: number
  readonly shortestSafe: number
  readonly smallestUsableOffcut: number
  /**
   * `alternate`: mitred on the length, swinging from side to side: kerf ÷ cos mitre + margin lies between neighbours.
   * `square-rough`: cut square first and mitred after: a square kerf between neighbours and the margin more for each rail.
   * Absent: alternate.
   */
  readonly handling?: 'alternate' | 'square-rough'
}

export interface OrderRules {
  readonly setupPieces: number
  /** Length of the first-off and of each set-up piece, mm. */
  readonly firstOff: number
  /** Share of the lengths ordered that is ordered in addition: 0.1 = 10 %. */
  readonly reserve: number
}

export interface CutInstance {
  readonly demand: readonly DemandedRail[]
  readonly lengths: readonly OrderableLength[]
  readonly rack: readonly RackPiece[]
  readonly saw: SawSettings
  readonly order?: OrderRules
}

export interface PlanProgress {
  readonly steps: number
  readonly stepLimit: number
}

export interface PlanOptions {
  /** In which lengths are printed in what the plan says; mm where absent. */
  readonly unit?: LengthUnit
  /** How much may be tried before the best plan so far is answered: counted, not timed. */
  readonly stepLimit?: number
  /** Called now and then while the plan is made. */
  readonly onProgress?: (progress: PlanProgress) => void
  /** Asked as often; true ends the search with the best plan so far. */
  readonly isStopped?: () => boolean
}

export interface PlannedCut {
  readonly id: string
  /** Which of the equal rails of this id, from 1. */
  readonly copy: number
  readonly length: number
  readonly mitre: number
  readonly frame?: string
  readonly side?: string
  /** Where the long point starts along the back edge, mm from the piece's start. */
  readonly at: number
}

export interface OpenedLength {
  /** The rack piece's id, or the ordered length. */
  readonly from: string
  readonly source: 'rack' | 'order'
  readonly length: number
  readonly trims: readonly [number, number]
  readonly cuts: readonly PlannedCut[]
  /** From the end of the last kerf to the end of the piece along the back edge, mm. */
  readonly offcut: number
  readonly isOffcutUsable: boolean
}

export interface LengthsToOrder {
  readonly length: number
  readonly count: number
}

export interface CutPlan {
  readonly opened: readonly OpenedLength[]
  /** Pieces opened. */
  readonly count: number
  /** Decimal text where there are prices, else null. */
  readonly cost: string | null
  /** No plan is better than this in the first objective: cost (text); else pieces where there is one orderable length and no rack, else mm opened. */
  readonly bound: number | string
  /** The plan meets its bound, and no plan as good opens fewer pieces. */
  readonly proven: boolean
  /** With set-up pieces, first-off and reserve; nothing where the rack is enough. */
  readonly toOrder: readonly LengthsToOrder[]
  readonly warnings: readonly string[]
  readonly steps: number
}

export type PlanOutcome =
  | { readonly kind: 'planned'; readonly plan: CutPlan }
  | {
      readonly kind: 'no-plan'
      readonly reason: 'rail-too-long' | 'lengths-run-out' | 'not-found'
      readonly says: string
      /** A length that would help, mm, trims included. */
      readonly neededLengthMm: number
    }
