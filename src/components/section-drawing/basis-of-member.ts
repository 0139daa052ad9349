import type { Basis, Member } from '@shared/section'

export type BasisKind = Basis['kind'] | 'none'

/** The weakest comes first: a member is shown as surely as the least sure of its dimensions. */
const WEAKEST_FIRST = ['none', 'judged', 'precedent', 'measured'] as const satisfies readonly BasisKind[]

/** What a member rests on; a width or rise of nothing needs no basis. */
export function basisOfMember({ width, rise, basis }: Member): BasisKind {
  const kinds: BasisKind[] = []
  if (width !== 0) kinds.push(basis?.width?.kind ?? 'none')
  if (rise !== 0) kinds.push(basis?.rise?.kind ?? 'none')
  return WEAKEST_FIRST.find((kind) => kinds.includes(kind)) ?? 'none'
}
