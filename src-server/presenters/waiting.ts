import type { WaitingLineView } from '@shared/contracts'

export function presentWaiting(
  item: Omit<WaitingLineView, 'since'> & { readonly since: Date },
): WaitingLineView {
  const { kind, says, commission, to, since, urgent } = item
  return { kind, says, commission, to, since: since.toISOString(), urgent }
}
