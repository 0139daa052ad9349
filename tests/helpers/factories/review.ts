import { randomUUID } from 'node:crypto'
import { issueLetterOf } from '@shared/course'
import type { IssueStateName } from '@shared/course'
import { canonicalText, issueTextOf, sectionFromDraft, sha256Hex, shapeSha256 } from '@shared/section'
import type { DraftSection } from '@shared/section'
import type { Commission } from '@server/models/commission'
import { Decision, Issue, Remark, RemarkEntry } from '@server/models/review'
import { aCommission, SOUND_SECTION } from './commissions'

export interface IssueWish {
  readonly commission?: Commission
  readonly state?: IssueStateName
  readonly section?: DraftSection
  readonly putForwardById?: string
}

/** An issue of a sound section; of a commission of its own unless one is named. An approved one has its approval. */
export async function anIssue(wish: IssueWish = {}): Promise<Issue> {
  const commission = wish.commission ?? (await aCommission({ section: SOUND_SECTION }))
  const section = sectionFromDraft(wish.section ?? SOUND_SECTION)
  const no = await Issue.count({ where: { commissionId: commission.id } })
  const text = issueTextOf(section)
  const evidence = { pictures: [], photographs: [] }
  const issue = await Issue.create({
    commissionId: commission.id,
    no,
    letter: issueLetterOf(no),
    state: wish.state ?? 'put-forward',
    note: '',
    canonicalText: text,
    sha256: sha256Hex(text),
    shapeSha256: shapeSha256(section),
    evidence,
    evidenceSha256: sha256Hex(canonicalText(evidence)),
    putForwardById: wish.putForwardById ?? randomUUID(),
    putForwardByName: 'A designer',
    at: new Date(),
  })
  if (issue.state === 'approved') {
    await Decision.create({
      issueId: issue.id,
      kind: 'approve',
      personId: randomUUID(),
      personName: 'A curator',
      typedName: 'A. Curator',
      statement: 'Agreed as drawn.',
      sha256: issue.sha256,
      at: new Date(),
    })
  }
  return issue
}

/** A remark with its first entry. */
export async function aRemark(issue: Issue): Promise<Remark> {
  const no = (await Remark.count({ where: { issueId: issue.id } })) + 1
  const remark = await Remark.create({ issueId: issue.id, no, x: 12, y: 30 })
  await RemarkEntry.create({
    remarkId: remark.id,
    authorId: randomUUID(),
    authorName: 'A curator',
    text: 'Is this hollow not deeper?',
    at: new Date(),
  })
  return remark
}
