import type { MillCardView, MillView, SawCardView } from '@shared/contracts'
import type { Mill } from '../models/person'
import type { MillCard, SawCard } from '../models/workshop'

export function presentMill({
  mill,
  card,
}: {
  readonly mill: Mill
  readonly card: MillCard | null
}): MillView {
  const { id, name, email, state, version } = mill
  return { id, name, email, state, version, card: card === null ? null : presentMillCard(card) }
}

export function presentMillCard({ id, no, at, document }: MillCard): MillCardView {
  return { id, no, at: at.toISOString(), document }
}

export function presentSawCard({ id, no, at, document }: SawCard): SawCardView {
  return { id, no, at: at.toISOString(), document }
}
