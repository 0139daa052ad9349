import type { Section, SectionMeasures } from '@shared/section'
import type { LengthUnit, Vocabulary } from '@shared/units'

/** An instant or day as it is to be read on paper, such as 2026-12-01: nothing here knows a calendar. */
export type PrintedDate = string

/** What state of the section the sheet shows. */
export type SheetState =
  | { readonly kind: 'draft' }
  | {
      readonly kind: 'issue'
      readonly letter: string
      readonly sha256: string
      readonly shapeSha256?: string
      readonly putForwardBy: string
      readonly putForwardOn: PrintedDate
      /** Absent while the issue waits for its approval. */
      readonly approval?: { readonly by: string; readonly on: PrintedDate }
    }

/** What is asked of the mill, in words; whatever is absent stays off the sheet. */
export interface MillText {
  readonly orderNumber?: string
  readonly mill?: string
  readonly timber?: string
  readonly moisture?: string
  readonly grade?: string
  readonly jointing?: string
  readonly sanding?: string
  readonly quantity?: string
  readonly firstOff?: string
  /** Which end of the length one looks at when the section is as drawn. */
  readonly seenFrom?: string
  readonly lies?: string
  readonly guideEdge?: string
  readonly surfacesCut?: string
  readonly wantedBy?: PrintedDate
  readonly notes?: string
}

export interface SheetInput {
  readonly section: Section
  readonly measures: SectionMeasures
  readonly unit: LengthUnit
  readonly vocabulary: Vocabulary
  /** ISO 7200's legal owner. */
  readonly workshop: string
  readonly commissionNumber: string
  readonly title: string
  readonly client?: string
  readonly accession?: string
  readonly state: SheetState
  readonly mill?: MillText
  /** Further cautions, each a sentence: checks that warn, what the knife asks. */
  readonly cautions?: readonly string[]
}
