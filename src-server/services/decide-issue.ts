import type { Actor } from '@shared/access'
import type { DecisionRequest, OutputOf } from '@shared/contracts'
import { ISSUE_COURSE, nextState } from '@shared/course'
import { Failure } from '@shared/failure'
import { Decision } from '../models/review'
import { tellDesignersOfDecision } from '../mail/letters-of-review'
import { now } from './clock'
import { onceOnly } from './operation'
import { requireIssue } from './require-issue'
import { enterTrail } from './trail'
import { inTransaction } from './transaction'

const SAID = { approve: 'Approved', return: 'Returned', withdraw: 'Withdrew the approval of' } as const

/** Approves, returns or withdraws. Only the latest issue is decided on, and only what the person saw: the hash must be its own. */
export const decideIssue = (
  actor: Actor,
  issueId: string,
  request: OutputOf<typeof DecisionRequest>,
): Promise<string> =>
  inTransaction(async (tx) => {
    const { issue, commission, isLatest } = await requireIssue(issueId, {
      actor,
      right: 'issue.decide',
      tx,
      lock: true,
    })
    const { operationId, kind, typedName, statement, sha256 } = request
    const asked = { what: 'decision', issueId, kind, typedName, statement, sha256 }
    return onceOnly(tx, { operationId, actor, request: asked }, async () => {
      if (!isLatest) {
        throw new Failure('transition-not-allowed', {
          says: `Issue ${issue.letter} is not the latest any more; decide on the latest one.`,
        })
      }
      if (sha256 !== issue.sha256) {
        throw new Failure('version-stale', {
          says: 'The drawing you saw is not the one that is put forward; look at it again before you decide.',
          sha256: issue.sha256,
        })
      }
      await issue.update({ state: nextState(ISSUE_COURSE, issue.state, kind) }, { transaction: tx })
      const decision = await Decision.create(
        {
          issueId,
          kind,
          personId: actor.personId,
          personName: actor.name,
          typedName,
          statement,
          sha256,
          at: now(),
        },
        { transaction: tx },
      )
      await enterTrail(tx, {
        commissionId: commission.id,
        actor,
        act: 'issue-decided',
        says: `${SAID[kind]} issue ${issue.letter}`,
        document: { issueId, decisionId: decision.id, kind, typedName, statement, sha256 },
      })
      await tellDesignersOfDecision(tx, { commission, issue, decision })
      return issueId
    })
  })
