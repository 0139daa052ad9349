import type { Actor } from '@shared/access'
import type { OutputOf, RemarkEntryRequest, RemarkRequest } from '@shared/contracts'
import { Remark, RemarkEntry } from '../models/review'
import { now } from './clock'
import { onceOnly } from './operation'
import { requireIssue } from './require-issue'
import type { RemarkWithEntries } from './issues'
import { notFound } from './rights'
import { enterTrail } from './trail'
import { inTransaction } from './transaction'
import type { Tx } from './transaction'

/** Pins a remark to a place of an issue. */
export const addRemark = (
  actor: Actor,
  issueId: string,
  { operationId, place, text }: OutputOf<typeof RemarkRequest>,
): Promise<RemarkWithEntries> =>
  inTransaction(async (tx) => {
    const { issue } = await requireIssue(issueId, { actor, right: 'remark.add', tx, lock: true })
    const request = { what: 'remark', issueId, place, text }
    const id = await onceOnly(tx, { operationId, actor, request }, async () => {
      const no = (await Remark.count({ where: { issueId }, transaction: tx })) + 1
      const remark = await Remark.create({ issueId, no, x: place.x, y: place.y }, { transaction: tx })
      await addEntry(tx, actor, remark.id, text)
      await enterTrail(tx, {
        commissionId: issue.commissionId,
        actor,
        act: 'remark-pinned',
        says: `Pinned remark ${no} to issue ${issue.letter}`,
        document: { issueId, remarkId: remark.id, place, text },
      })
      return remark.id
    })
    return remarkWithEntries(tx, id)
  })

/** Adds to a remark, and says whether it is open, answered or settled with it. */
export const answerRemark = (
  actor: Actor,
  remarkId: string,
  { operationId, text, state }: OutputOf<typeof RemarkEntryRequest>,
): Promise<RemarkWithEntries> =>
  inTransaction(async (tx) => {
    const found = await Remark.findByPk(remarkId, { transaction: tx })
    if (found === null) throw notFound()
    const { issue } = await requireIssue(found.issueId, { actor, right: 'remark.add', tx, lock: true })
    const request = { what: 'remark-entry', remarkId, text, state }
    await onceOnly(tx, { operationId, actor, request }, async () => {
      const remark = await Remark.findByPk(remarkId, {
        transaction: tx,
        lock: tx.LOCK.UPDATE,
        rejectOnEmpty: true,
      })
      await addEntry(tx, actor, remarkId, text)
      await remark.update({ state }, { transaction: tx })
      await enterTrail(tx, {
        commissionId: issue.commissionId,
        actor,
        act: 'remark-answered',
        says: `Wrote on remark ${remark.no} of issue ${issue.letter}`,
        document: { issueId: issue.id, remarkId, text, state },
      })
      return remarkId
    })
    return remarkWithEntries(tx, remarkId)
  })

const addEntry = (tx: Tx, actor: Actor, remarkId: string, text: string) =>
  RemarkEntry.create(
    { remarkId, authorId: actor.personId, authorName: actor.name, text, at: now() },
    { transaction: tx },
  )

async function remarkWithEntries(tx: Tx, id: string): Promise<RemarkWithEntries> {
  const remark = await Remark.findByPk(id, { transaction: tx, rejectOnEmpty: true })
  const entries = await RemarkEntry.findAll({
    where: { remarkId: id },
    order: [
      ['at', 'ASC'],
      ['id', 'ASC'],
    ],
    transaction: tx,
  })
  return { remark, entries }
}
