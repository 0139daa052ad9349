import type { Actor } from '@shared/access'
import { differenceOf } from '@shared/section'
import type { Section } from '@shared/section'
import { Photograph } from '../models/photograph'
import { StoredFile } from '../models/file'
import { Decision, Issue, Remark, RemarkEntry } from '../models/review'
import type { Commission } from '../models/commission'
import { requireCommission } from './require-commission'
import { requireIssue, sectionOfIssue } from './require-issue'

export interface RemarkWithEntries {
  readonly remark: Remark
  readonly entries: readonly RemarkEntry[]
}

/** An issue with everything that hangs on it. */
export interface WholeIssue {
  readonly issue: Issue
  readonly commission: Commission
  readonly isLatest: boolean
  readonly section: Section
  readonly decisions: readonly Decision[]
  readonly remarks: readonly RemarkWithEntries[]
  /** The evidence's photographs that still can be shown: key → id. */
  readonly photographIds: ReadonlyMap<string, string>
}

export interface IssueWithRemarks {
  readonly issue: Issue
  readonly isLatest: boolean
  readonly openRemarks: number
}

/** The issues of a commission, the latest first. */
export async function listIssues(actor: Actor, commissionId: string): Promise<IssueWithRemarks[]> {
  await requireCommission(commissionId, { actor, right: 'issue.read', see: 'commission.read' })
  const issues = await Issue.findAll({ where: { commissionId }, order: [['no', 'DESC']] })
  const open = await Remark.findAll({
    where: { issueId: issues.map(({ id }) => id), state: 'open' },
    attributes: ['issueId'],
  })
  return issues.map((issue, index) => ({
    issue,
    isLatest: index === 0,
    openRemarks: open.filter(({ issueId }) => issueId === issue.id).length,
  }))
}

export async function readIssue(actor: Actor, id: string): Promise<WholeIssue> {
  const reached = await requireIssue(id, { actor, right: 'issue.read' })
  const { issue } = reached
  const remarks = await Remark.findAll({ where: { issueId: id }, order: [['no', 'ASC']] })
  const entries = await RemarkEntry.findAll({
    where: { remarkId: remarks.map((remark) => remark.id) },
    order: [
      ['at', 'ASC'],
      ['id', 'ASC'],
    ],
  })
  return {
    ...reached,
    section: sectionOfIssue(issue),
    decisions: await Decision.findAll({ where: { issueId: id }, order: [['at', 'ASC']] }),
    remarks: remarks.map((remark) => ({
      remark,
      entries: entries.filter(({ remarkId }) => remarkId === remark.id),
    })),
    photographIds: await photographIdsOf(issue),
  }
}

/** A photograph is shown beside an issue only while it is the very file that the issue was frozen with. */
async function photographIdsOf({ commissionId, evidence }: Issue): Promise<ReadonlyMap<string, string>> {
  const photographs = await Photograph.findAll({
    where: { commissionId },
    include: [{ model: StoredFile, as: 'file', required: true }],
  })
  return new Map(
    evidence.photographs.flatMap(({ key, sha256 }) => {
      const same = photographs.find(
        (photograph) => photograph.key === key && photograph.file?.sha256 === sha256,
      )
      return same === undefined ? [] : [[key, same.id] as const]
    }),
  )
}

export interface IssueDifference {
  readonly from: Issue | null
  readonly fromSection: Section | null
  readonly difference: ReturnType<typeof differenceOf> | null
}

/** How an issue differs from the last one before it that was ever approved, else from the one before it. */
export async function readDifference(actor: Actor, id: string): Promise<IssueDifference> {
  const { issue } = await requireIssue(id, { actor, right: 'issue.read' })
  const all = await Issue.findAll({ where: { commissionId: issue.commissionId }, order: [['no', 'DESC']] })
  const earlier = all.filter(({ no }) => no < issue.no)
  const approvals = await Decision.findAll({
    where: { issueId: earlier.map((one) => one.id), kind: 'approve' },
    attributes: ['issueId'],
  })
  const approvedIds = new Set(approvals.map(({ issueId }) => issueId))
  const from = earlier.find((one) => approvedIds.has(one.id)) ?? earlier[0] ?? null
  if (from === null) return { from, fromSection: null, difference: null }
  const fromSection = sectionOfIssue(from)
  return { from, fromSection, difference: differenceOf(fromSection, sectionOfIssue(issue)) }
}
