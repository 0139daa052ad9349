import type { DraftView } from '@shared/contracts'
import type { Draft, DraftEdit } from '../models/draft'

/** A draft as it stands, with the line of its history: what can be undone and redone. */
export function presentDraft({
  draft,
  steps,
}: {
  readonly draft: Draft
  readonly steps: readonly DraftEdit[]
}): DraftView {
  const line = steps.filter(({ state }) => state !== 'superseded')
  return {
    version: draft.version,
    document: draft.document as DraftView['document'],
    undo: line.findLast(({ state }) => state === 'done')?.name ?? null,
    redo: line.find(({ state }) => state === 'undone')?.name ?? null,
    history: line.map(({ seq, name, authorName, at, state }) => ({
      seq,
      name,
      by: authorName,
      at: at.toISOString(),
      undone: state === 'undone',
    })),
  }
}
