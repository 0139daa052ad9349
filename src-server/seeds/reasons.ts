import { requireSpecies } from '@shared/timber'
import type { Basis, MemberBasis } from '@shared/section'

/** Read off the commission's first photograph; plusMinus is one standard deviation, mm. */
export const seen = (plusMinus: number): Basis => ({ kind: 'measured', plusMinus, photograph: 'p1' })

/** Measured on a piece that survives. */
export const gauged = (plusMinus: number): Basis => ({ kind: 'measured', plusMinus })

/** A pattern in the workshop's own drawer. */
export const drawer = (no: number): Basis => ({
  kind: 'precedent',
  citation: `Pattern drawer of the workshop, no. ${no}`,
})

export const judged = (note: string): Basis => ({ kind: 'judged', note })

/** The timber most of the moulding is run in. */
export const LIME = requireSpecies('basswood').name

/** Why a member is as wide and as high as it is; a dimension of nothing needs no reason. */
export const because = (width: Basis, rise?: Basis): { readonly basis: MemberBasis } => ({
  basis: { width, ...(rise !== undefined && { rise }) },
})
