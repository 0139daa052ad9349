import { randomUUID } from 'node:crypto'
import type { Actor } from '@shared/access'
import { putForward } from '../services/put-forward'
import { addRemark, answerRemark } from '../services/remarks'
import { decideIssue } from '../services/decide-issue'
import { readDraft } from '../services/drafts'
import { readIssue } from '../services/issues'

/** Puts the draft forward as it stands; gives the issue's key. */
export async function putForwardNow(actor: Actor, commissionId: string, note: string): Promise<string> {
  const { draft } = await readDraft(actor, commissionId)
  const request = { version: draft.version, operationId: randomUUID(), note, openOrders: null }
  return putForward(actor, commissionId, request)
}

/** Pins a remark to a place of an issue, mm; gives its key. */
export async function pin(
  actor: Actor,
  issueId: string,
  [x, y]: readonly [number, number],
  text: string,
): Promise<string> {
  const { remark } = await addRemark(actor, issueId, { operationId: randomUUID(), place: { x, y }, text })
  return remark.id
}

export async function answer(
  actor: Actor,
  remarkId: string,
  text: string,
  state: 'answered' | 'settled',
): Promise<void> {
  await answerRemark(actor, remarkId, { operationId: randomUUID(), text, state })
}

/** Approves or returns what the person sees. */
export async function decide(
  actor: Actor,
  issueId: string,
  kind: 'approve' | 'return',
  statement: string,
): Promise<void> {
  const { issue } = await readIssue(actor, issueId)
  await decideIssue(actor, issueId, {
    operationId: randomUUID(),
    kind,
    typedName: actor.name,
    statement,
    sha256: issue.sha256,
  })
}
