import type { Actor, Facts, Right } from '@shared/access'
import { requireValid, SectionSchema } from '@shared/contracts'
import type { Section } from '@shared/section'
import { Commission } from '../models/commission'
import { Issue } from '../models/review'
import { withClient } from './require-commission'
import { notFound, requireRight, requireSeen } from './rights'
import type { Tx } from './transaction'

export interface IssueReach {
  readonly actor: Actor
  readonly right: Right
  /** What one must be allowed to see; the issue itself where absent. */
  readonly see?: Right
  readonly tx?: Tx
  /** Holds the commission's and the issue's rows until the transaction ends. */
  readonly lock?: boolean
}

export interface ReachedIssue {
  readonly issue: Issue
  readonly commission: Commission
  /** Whether no later issue has been put forward. */
  readonly isLatest: boolean
}

/** The one way to an issue and to what hangs on it: through its commission, within the actor's rights. */
export async function requireIssue(id: string, options: IssueReach): Promise<ReachedIssue> {
  const { actor, right, see = 'issue.read', tx, lock = false } = options
  const inside = tx === undefined ? {} : { transaction: tx }
  const found = await Issue.findByPk(id, inside)
  if (found === null) throw notFound()
  const held = tx !== undefined && lock
  const commission = await Commission.findByPk(found.commissionId, {
    include: [withClient],
    rejectOnEmpty: true,
    ...inside,
    ...(held ? { lock: { level: tx.LOCK.UPDATE, of: Commission } } : {}),
  })
  const facts = factsOfIssue(commission, found)
  requireSeen(actor, see, facts)
  requireRight(actor, right, facts)
  // Read again once the commission is held: the state may have moved while waiting for it.
  const issue = held
    ? await Issue.findByPk(id, { ...inside, lock: tx.LOCK.UPDATE, rejectOnEmpty: true })
    : found
  const later = await Issue.count({ where: { commissionId: commission.id }, ...inside })
  return { issue, commission, isLatest: issue.no === later - 1 }
}

export const factsOfIssue = (commission: Commission, issue: Issue): Facts => ({
  clientId: commission.clientId,
  putForwardById: issue.putForwardById,
})

/** The section that an issue froze, read back from its canonical text. */
export function sectionOfIssue({ canonicalText }: Pick<Issue, 'canonicalText'>): Section {
  const frozen = JSON.parse(canonicalText) as { readonly section: unknown }
  return requireValid(SectionSchema, frozen.section)
}
