import type { DraftStepInput, DraftView } from '@shared/contracts'
import { Failure } from '@shared/failure'
import { applyEdit } from '@shared/section'
import type { DraftSection, SectionEdit } from '@shared/section'

/** The draft as the server last gave it. */
export interface DraftBase extends Pick<DraftView, 'version' | 'undo' | 'redo'> {
  readonly document: DraftSection
}

/** The same with the steps that led to it. */
export type DraftWithHistory = DraftBase & Pick<DraftView, 'history'>

/** A step on its way to the server, and what it did here; a step of the server's own history does nothing here until it answers. */
export interface QueuedStep {
  readonly step: DraftStepInput
  readonly applied?: SectionEdit
}

/** Steps sent together, under the one operation id that every further try of them bears. */
export interface Batch {
  readonly operationId: string
  readonly version: number
  readonly steps: readonly QueuedStep[]
}

/** A step taken on this page, which can be undone here without asking. */
interface TakenStep {
  readonly name: string
  readonly edit: SectionEdit
  readonly inverse: SectionEdit
}

/** Why what was drawn is not saved. All of it is kept meanwhile. */
export type Trouble =
  | { readonly kind: 'out-of-reach'; readonly says: string }
  | { readonly kind: 'stale'; readonly current: DraftWithHistory }
  | { readonly kind: 'refused'; readonly says: string }

/** A draft being drawn: what the server has, what is drawn here, and what is on its way. Every function below gives a new one. */
export interface DraftSession {
  readonly base: DraftBase
  readonly document: DraftSection
  readonly waiting: readonly QueuedStep[]
  readonly sending: Batch | undefined
  readonly done: readonly TakenStep[]
  readonly undone: readonly TakenStep[]
  readonly trouble: Trouble | undefined
}

/** What outlives the page: the server's last word and all that it has not taken yet. */
export type KeptWork = Pick<DraftSession, 'base' | 'waiting' | 'sending'>

/** The most steps that go in one batch. */
const BATCH_AT_MOST = 200

export const sessionFrom = (base: DraftBase): DraftSession => ({
  base,
  document: base.document,
  waiting: [],
  sending: undefined,
  done: [],
  undone: [],
  trouble: undefined,
})

/** A session taken up again from what was kept when the page went away. */
export function sessionFromKept({ base, waiting, sending }: KeptWork): DraftSession {
  const steps = [...(sending?.steps ?? []), ...waiting]
  return { ...sessionFrom(base), document: replayed(base.document, steps), waiting, sending }
}

export const keptOf = ({ base, waiting, sending }: DraftSession): KeptWork => ({ base, waiting, sending })
export const hasUnsaved = ({ waiting, sending }: KeptWork): boolean =>
  waiting.length > 0 || sending !== undefined

/** Draws one step here at once and queues it. What cannot be applied is the Failure of applyEdit, and nothing happens. */
export function stepTaken(session: DraftSession, name: string, edit: SectionEdit): DraftSession {
  const { draft, inverse } = applyEdit(session.document, edit)
  return {
    ...session,
    document: draft,
    waiting: [...session.waiting, { step: { act: 'do', name, edit }, applied: edit }],
    done: [...session.done, { name, edit, inverse }],
    undone: [],
  }
}

/** Undoes the last step: here at once where it was taken here, otherwise by asking the server, whose history goes all the way back. */
export function stepUndone(session: DraftSession): DraftSession {
  const last = session.done.at(-1)
  if (last === undefined) return undoName(session) === undefined ? session : asked(session, 'undo')
  return {
    ...session,
    document: applyEdit(session.document, last.inverse).draft,
    waiting: [...session.waiting, { step: { act: 'undo' }, applied: last.inverse }],
    done: session.done.slice(0, -1),
    undone: [...session.undone, last],
  }
}

export function stepRedone(session: DraftSession): DraftSession {
  const next = session.undone.at(-1)
  if (next === undefined) return redoName(session) === undefined ? session : asked(session, 'redo')
  return {
    ...session,
    document: applyEdit(session.document, next.edit).draft,
    waiting: [...session.waiting, { step: { act: 'redo' }, applied: next.edit }],
    done: [...session.done, next],
    undone: session.undone.slice(0, -1),
  }
}

/** A step that only the server knows; what was undone here comes after it in its history, so from now on the server is asked for that too. */
const asked = (session: DraftSession, act: 'undo' | 'redo'): DraftSession => ({
  ...session,
  waiting: [...session.waiting, { step: { act } }],
  undone: [],
})

/** Whether a step is on its way whose outcome only the server knows: nothing can be drawn until it answers. */
export const isAwaitingServer = ({ waiting, sending }: DraftSession): boolean =>
  [...(sending?.steps ?? []), ...waiting].some(({ applied }) => applied === undefined)

/** The step that would be undone next, in words. Beyond this page's own steps the server's word counts only once it has them all. */
export const undoName = (session: DraftSession): string | undefined =>
  session.done.at(-1)?.name ?? (hasUnsaved(session) ? undefined : (session.base.undo ?? undefined))

export const redoName = (session: DraftSession): string | undefined =>
  session.undone.at(-1)?.name ?? (hasUnsaved(session) ? undefined : (session.base.redo ?? undefined))

/** Takes the next batch in hand; one that is already in hand is tried again as it is. */
export function batchInHand(session: DraftSession, makeOperationId: () => string): DraftSession {
  if (session.sending !== undefined || session.waiting.length === 0) return session
  return {
    ...session,
    sending: {
      operationId: makeOperationId(),
      version: session.base.version,
      steps: session.waiting.slice(0, BATCH_AT_MOST),
    },
    waiting: session.waiting.slice(BATCH_AT_MOST),
  }
}

/** The server has taken the batch: its document is the new ground, and what was drawn meanwhile is drawn on it again. */
export function batchSaved(session: DraftSession, answer: DraftBase): DraftSession {
  const base = baseOf(answer)
  return {
    ...session,
    base,
    document: replayed(base.document, session.waiting),
    sending: undefined,
    trouble: undefined,
  }
}

export const baseOf = ({ version, document, undo, redo }: DraftBase): DraftBase => ({
  version,
  document,
  undo,
  redo,
})

export const batchInTrouble = (session: DraftSession, trouble: Trouble): DraftSession => ({
  ...session,
  trouble,
})

/** What became of one's own steps when they were put on top of somebody else's. */
export interface PutOnTop {
  readonly session: DraftSession
  /** Names of steps that can no longer be taken. */
  readonly lost: readonly string[]
}

/** Draws the refused steps again on what the server has now; those whose ground is gone are named and left out. */
export function mineOnTop(session: DraftSession, current: DraftBase): PutOnTop {
  let next = sessionFrom(baseOf(current))
  const lost: string[] = []
  for (const { name, edit } of ownSteps(session)) {
    try {
      next = stepTaken(next, name, edit)
    } catch (error) {
      if (!(error instanceof Failure)) throw error
      lost.push(name)
    }
  }
  return { session: next, lost }
}

/** The refused steps as steps to do: one that was undone or redone here is a step of its own to those who drew on. */
function ownSteps(session: DraftSession): readonly { readonly name: string; readonly edit: SectionEdit }[] {
  return [...(session.sending?.steps ?? []), ...session.waiting].flatMap(({ step, applied }) => {
    if (applied === undefined) return []
    const name = step.act === 'do' ? step.name : step.act === 'undo' ? 'Undo' : 'Redo'
    return [{ name, edit: applied }]
  })
}

/** Names of all that is not saved yet, the first first. */
export const unsavedNames = (session: DraftSession): readonly string[] =>
  ownSteps(session).map(({ name }) => name)

function replayed(document: DraftSection, steps: readonly QueuedStep[]): DraftSection {
  let current = document
  for (const { applied } of steps) {
    if (applied !== undefined) current = applyEdit(current, applied).draft
  }
  return current
}
