import { DraftAnswer } from '@shared/contracts'
import type { DraftEditsRequest, DraftView, OutputOf } from '@shared/contracts'
import type { Failure } from '@shared/failure'
import { ask, send } from './request'

export const readDraft = (commissionId: string, signal?: AbortSignal) =>
  ask(DraftAnswer, ['commissions', commissionId, 'draft'], { signal })
/** 409 version-stale carries the current draft: see `currentDraftOf`. */
export const sendDraftEdits = (commissionId: string, body: OutputOf<typeof DraftEditsRequest>) =>
  send(DraftAnswer, 'POST', ['commissions', commissionId, 'draft', 'edits'], { body })

/** The draft as it stands on the server, out of the refusal of a save that was made from an older one. */
export function currentDraftOf(failure: Failure): DraftView | undefined {
  if (failure.code !== 'version-stale') return undefined
  const result = DraftAnswer.safeParse(failure.details.draft)
  return result.success ? result.data : undefined
}
