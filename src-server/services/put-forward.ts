import type { Actor } from '@shared/access'
import type { OutputOf, PutForwardRequest } from '@shared/contracts'
import { ISSUE_COURSE, issueLetterOf, nextState } from '@shared/course'
import { Failure } from '@shared/failure'
import {
  canonicalText,
  faultsOfSection,
  issueTextOf,
  missingBasisOf,
  sectionFromDraft,
  sha256Hex,
  shapeSha256,
} from '@shared/section'
import type { Section } from '@shared/section'
import type { Commission } from '../models/commission'
import { Issue } from '../models/review'
import { tellCuratorsOfIssue } from '../mail/letters-of-review'
import { now } from './clock'
import { requireDraft } from './drafts'
import { evidenceOf } from './evidence'
import { settleOpenOrders } from './open-orders'
import { onceOnly } from './operation'
import { requireCommission } from './require-commission'
import { enterTrail } from './trail'
import { inTransaction } from './transaction'
import type { Tx } from './transaction'
import { requireVersion } from './versions'

/**
 * Freezes the draft, at the version that was seen, as the next issue, with what it rests on. Earlier issues are
 * superseded; an order that is open for one of them is held or goes on, as the request says.
 */
export const putForward = (
  actor: Actor,
  commissionId: string,
  request: OutputOf<typeof PutForwardRequest>,
): Promise<string> =>
  inTransaction(async (tx) => {
    const commission = await requireCommission(commissionId, {
      actor,
      right: 'issue.put-forward',
      tx,
      lock: true,
    })
    const { operationId, ...asked } = request
    return onceOnly(tx, { operationId, actor, request: { what: 'issue', commissionId, ...asked } }, () =>
      enterIssue(tx, actor, commission, request),
    )
  })

async function enterIssue(
  tx: Tx,
  actor: Actor,
  commission: Commission,
  { version, note, openOrders }: OutputOf<typeof PutForwardRequest>,
): Promise<string> {
  const draft = await requireDraft(tx, commission.id)
  requireVersion(draft.version, version)
  const section = sectionFromDraft(draft.document)
  requireReady(section)
  const evidence = await evidenceOf(tx, commission.id)
  const earlier = await Issue.findAll({
    where: { commissionId: commission.id },
    transaction: tx,
    lock: tx.LOCK.UPDATE,
  })
  const no = earlier.length
  const text = issueTextOf(section)
  const issue = await Issue.create(
    {
      commissionId: commission.id,
      no,
      letter: issueLetterOf(no),
      state: 'put-forward',
      note,
      canonicalText: text,
      sha256: sha256Hex(text),
      shapeSha256: shapeSha256(section),
      evidence,
      evidenceSha256: sha256Hex(canonicalText(evidence)),
      putForwardById: actor.personId,
      putForwardByName: actor.name,
      at: now(),
    },
    { transaction: tx },
  )
  for (const one of earlier.filter(({ state }) => state !== 'superseded')) {
    await one.update({ state: nextState(ISSUE_COURSE, one.state, 'supersede') }, { transaction: tx })
  }
  await enterTrail(tx, {
    commissionId: commission.id,
    actor,
    act: 'issue-put-forward',
    says: `Put forward issue ${issue.letter}`,
    document: {
      issueId: issue.id,
      letter: issue.letter,
      sha256: issue.sha256,
      evidenceSha256: issue.evidenceSha256,
    },
  })
  await settleOpenOrders(tx, {
    actor,
    commission,
    issue,
    earlierIds: earlier.map(({ id }) => id),
    openOrders,
  })
  await tellCuratorsOfIssue(tx, { commission, issue })
  return issue.id
}

/** Throws not-ready with every fault of the drawing and every dimension whose basis is missing. */
function requireReady(section: Section): void {
  const faults = [...faultsOfSection(section), ...missingBasisOf(section)]
  if (faults.length === 0) return
  throw new Failure('not-ready', {
    says: `The drawing cannot be put forward yet: ${faults.length} ${faults.length === 1 ? 'thing is' : 'things are'} to be mended first.`,
    faults,
  })
}
