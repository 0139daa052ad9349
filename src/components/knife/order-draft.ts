import type { CutListView, OrderInput } from '@shared/contracts'
import { requireSpecies } from '@shared/timber'
import type { AskedLength } from './LengthsAsked.vue'

/** An order as it is being made up: as OrderInput, with what is not yet entered left null. */
export interface OrderDraft extends Omit<OrderInput, 'lengths' | 'firstOff' | 'setupPieces' | 'moisture'> {
  readonly lengths: readonly AskedLength[]
  readonly firstOff: number | null
  readonly setupPieces: number | null
  readonly moisture: number | null
}

/** Length of the first-off, mm, and pieces for setting up, where no plan says otherwise: usual, to be changed. */
const USUAL_FIRST_OFF_MM = 300
const USUAL_SETUP_PIECES = 2
/** Per cent: furniture in heated rooms. */
const USUAL_MOISTURE = 8

/** What the plan says is to be ordered, or an empty row. */
export function orderDraftFrom(plan: CutListView | undefined): OrderDraft {
  const asked = plan?.toOrder.map(({ length, count }) => ({ length, count })) ?? []
  return {
    lengths: asked.length === 0 ? [{ length: null, count: 1 }] : asked,
    firstOff: USUAL_FIRST_OFF_MM,
    setupPieces: USUAL_SETUP_PIECES,
    species: requireSpecies('basswood').name,
    moisture: USUAL_MOISTURE,
    grade: 'clear, straight grain, one face',
    sanding: 'as it comes from the knife, not sanded',
    notes: '',
    wantedBy: null,
  }
}

/** The lengths as they can be sent, or undefined while one is half written. */
export function writtenLengthsOf(lengths: readonly AskedLength[]): OrderInput['lengths'] | undefined {
  const written = lengths.flatMap(({ length, count }) =>
    length === null || count === null ? [] : [{ length, count }],
  )
  return written.length === lengths.length && written.length > 0 ? written : undefined
}

/** The order whole, or undefined while something is missing. */
export function orderFrom(draft: OrderDraft): OrderInput | undefined {
  const { firstOff, setupPieces, moisture } = draft
  const lengths = writtenLengthsOf(draft.lengths)
  if (lengths === undefined || firstOff === null || setupPieces === null || moisture === null)
    return undefined
  return { ...draft, lengths, firstOff, setupPieces, moisture }
}
