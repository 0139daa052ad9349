import type { DecisionView, DifferenceView, IssueLineView, IssueView, RemarkView } from '@shared/contracts'
import type { differenceOf, Section, SectionChange } from '@shared/section'
import type { Commission } from '../models/commission'
import type { Decision, Issue, Remark, RemarkEntry } from '../models/review'

interface RemarkWithEntries {
  readonly remark: Remark
  readonly entries: readonly RemarkEntry[]
}

export function presentIssue(whole: {
  readonly issue: Issue
  readonly commission: Commission
  readonly isLatest: boolean
  readonly section: Section
  readonly decisions: readonly Decision[]
  readonly remarks: readonly RemarkWithEntries[]
  readonly photographIds: ReadonlyMap<string, string>
}): IssueView {
  const { issue, commission } = whole
  const { id, number, title, artist, accession, client } = commission
  if (client === undefined) throw new Error('a commission was read without its client')
  return {
    id: issue.id,
    commission: { id, number, title, artist, accession, client: client.name },
    letter: issue.letter,
    state: issue.state,
    latest: whole.isLatest,
    note: issue.note,
    putForwardBy: { id: issue.putForwardById, name: issue.putForwardByName },
    putForwardAt: issue.at.toISOString(),
    section: whole.section as IssueView['section'],
    sha256: issue.sha256,
    shapeSha256: issue.shapeSha256,
    evidence: issue.evidence,
    evidenceSha256: issue.evidenceSha256,
    photographIds: Object.fromEntries(whole.photographIds),
    decisions: whole.decisions.map(presentDecision),
    remarks: whole.remarks.map(presentRemark),
  }
}

export function presentIssueLine({
  issue,
  isLatest,
  openRemarks,
}: {
  readonly issue: Issue
  readonly isLatest: boolean
  readonly openRemarks: number
}): IssueLineView {
  const { id, letter, state, sha256, putForwardByName, at } = issue
  return {
    id,
    letter,
    state,
    latest: isLatest,
    sha256,
    putForwardBy: putForwardByName,
    putForwardAt: at.toISOString(),
    openRemarks,
  }
}

const presentDecision = ({ kind, personName, typedName, statement, sha256, at }: Decision): DecisionView => ({
  kind,
  by: personName,
  typedName,
  statement,
  sha256,
  at: at.toISOString(),
})

export const presentRemark = ({ remark, entries }: RemarkWithEntries): RemarkView => ({
  id: remark.id,
  no: remark.no,
  place: { x: remark.x, y: remark.y },
  state: remark.state,
  entries: entries.map(({ authorName, at, text }) => ({ by: authorName, at: at.toISOString(), text })),
})

export function presentDifference(found: {
  readonly from: Issue | null
  readonly fromSection: Section | null
  readonly difference: ReturnType<typeof differenceOf> | null
}): DifferenceView {
  const { from, fromSection, difference } = found
  return {
    from: from === null ? null : { id: from.id, letter: from.letter },
    fromSection: fromSection as DifferenceView['fromSection'],
    areaBetweenMm2: difference?.areaBetweenMm2 ?? null,
    greatestDistanceMm: difference?.greatestDistanceMm ?? null,
    changes: difference?.changes.map((change) => ({ says: saysOfChange(change) })) ?? [],
  }
}

/** A change in words: `member 3, width: 20 → 22`. */
function saysOfChange({ path, before, after }: SectionChange): string {
  const parts = path.split('/').slice(1)
  const place = parts[0] === 'members' ? [`member ${Number(parts[1]) + 1}`, ...parts.slice(2)] : parts
  return `${place.join(', ')}: ${shown(before)} → ${shown(after)}`
}

function shown(value: unknown): string {
  if (value === null) return 'none'
  if (typeof value !== 'object') return String(value)
  if ('kind' in value && 'width' in value && 'rise' in value) {
    return `${String(value.kind)} ${String(value.width)} wide, rise ${String(value.rise)}`
  }
  return JSON.stringify(value)
}
