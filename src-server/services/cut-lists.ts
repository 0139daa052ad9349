import { can } from '@shared/access'
import type { Actor, Right } from '@shared/access'
import { isFirstOffSettled } from '@shared/course'
import type { CutPlan } from '@shared/cutting'
import { Commission } from '../models/commission'
import { Cut, CutFact, CutList, CutListPlan } from '../models/cut-list'
import { KnifeOrder } from '../models/order'
import { RackPiece } from '../models/rack'
import { Issue } from '../models/review'
import { latestBatchOf } from './rails'
import { picturesOf } from './pictures'
import { withClient } from './require-commission'
import { notFound, requireRight, requireSeen } from './rights'
import type { Tx } from './transaction'

export interface CutListReach {
  readonly actor: Actor
  readonly right: Right
  readonly tx?: Tx
  /** Holds the commission's and the list's rows until the transaction ends. */
  readonly lock?: boolean
}

/** A cut list reached through its commission. */
export async function requireCutList(
  id: string,
  { actor, right, tx, lock = false }: CutListReach,
): Promise<CutList> {
  const inside = tx === undefined ? {} : { transaction: tx }
  const found = await CutList.findByPk(id, inside)
  if (found === null) throw notFound()
  const held = tx !== undefined && lock
  const commission = await Commission.findByPk(found.commissionId, {
    rejectOnEmpty: true,
    ...inside,
    ...(held ? { lock: tx.LOCK.UPDATE } : {}),
  })
  const facts = { clientId: commission.clientId }
  requireSeen(actor, 'cut-list.read', facts)
  requireRight(actor, right, facts)
  return held ? CutList.findByPk(id, { ...inside, lock: tx.LOCK.UPDATE, rejectOnEmpty: true }) : found
}

/** What holds of each cut and each offcut once the facts are read in order. */
export interface CutStanding {
  readonly facts: ReadonlyMap<string, CutFact>
  readonly offcuts: ReadonlyMap<number, CutFact>
}

/** The last word on each cut; an `undo` takes it back. A second person's tick stands beside the first as a conflict. */
export function standingOfFacts(facts: readonly CutFact[]): CutStanding {
  const cuts = new Map<string, CutFact>()
  const offcuts = new Map<number, CutFact>()
  for (const fact of facts) {
    if (fact.kind === 'offcut') {
      if (fact.lengthNo !== null) offcuts.set(fact.lengthNo, fact)
    } else if (fact.cutId !== null) {
      if (fact.kind === 'undo') cuts.delete(fact.cutId)
      else cuts.set(fact.cutId, fact)
    }
  }
  return { facts: cuts, offcuts }
}

export interface WholeCutList {
  readonly list: CutList
  readonly commission: Commission
  readonly issue: Issue
  readonly plan: CutPlan
  readonly cuts: readonly Cut[]
  readonly standing: CutStanding
  /** Codes of rack pieces that came of offcuts, by id. */
  readonly codes: ReadonlyMap<string, string>
  readonly outOfDate: readonly string[]
  readonly closedBecause: string | null
  readonly seesCost: boolean
}

export async function readCutList(actor: Actor, id: string): Promise<WholeCutList> {
  const list = await requireCutList(id, { actor, right: 'cut-list.read' })
  const commission = await Commission.findByPk(list.commissionId, {
    include: [withClient],
    rejectOnEmpty: true,
  })
  const issue = await Issue.findByPk(list.issueId, { rejectOnEmpty: true })
  const plan = await CutListPlan.findOne({
    where: { cutListId: id },
    order: [['no', 'DESC']],
    rejectOnEmpty: true,
  })
  const facts = await CutFact.findAll({ where: { cutListId: id }, order: [['seq', 'ASC']] })
  const madeIds = facts.flatMap(({ pieceId }) => (pieceId === null ? [] : [pieceId]))
  const made = await RackPiece.findAll({ where: { id: madeIds } })
  return {
    list,
    commission,
    issue,
    plan: plan.document,
    cuts: await Cut.findAll({ where: { cutListId: id }, order: [['no', 'ASC']] }),
    standing: standingOfFacts(facts),
    codes: new Map(made.map((piece) => [piece.id, piece.code])),
    outOfDate: await reasonsOutOfDate(list, issue),
    closedBecause: list.state === 'closed' ? await whyClosed(list, issue) : null,
    seesCost: can(actor, 'cut-list.see-cost'),
  }
}

/** Why a list no longer fits what it was worked out from; empty while it does. */
export async function reasonsOutOfDate(list: CutList, issue: Issue): Promise<string[]> {
  if (list.state === 'superseded') return ['A later cut list has taken its place.']
  const reasons: string[] = []
  const latest = await Issue.findOne({ where: { commissionId: list.commissionId }, order: [['no', 'DESC']] })
  if (latest !== null && latest.id !== issue.id) {
    reasons.push(`Issue ${latest.letter} has been put forward since; this list is of issue ${issue.letter}.`)
  } else if (issue.state !== 'approved') {
    reasons.push(`Issue ${issue.letter} is ${issue.state.replace('-', ' ')} now.`)
  }
  const pictures = await picturesOf(list.commissionId)
  for (const { pictureId, name, copies, measurementNo } of list.inputs.pictures) {
    const now = pictures.find(({ picture }) => picture.id === pictureId)
    if (now === undefined || now.picture.state !== 'open')
      reasons.push(`The picture "${name}" is not part of the work any more.`)
    else if (now.measurement?.no !== measurementNo)
      reasons.push(`The picture "${name}" has been measured again.`)
    else if (now.picture.copies !== copies)
      reasons.push(`The picture "${name}" wants ${now.picture.copies} frames now, not ${copies}.`)
  }
  const listed = new Set(list.inputs.pictures.map(({ pictureId }) => pictureId))
  for (const { picture } of pictures) {
    if (picture.state === 'open' && !listed.has(picture.id))
      reasons.push(`The picture "${picture.name}" has come since.`)
  }
  const batch = await latestBatchOf(issue.shapeSha256)
  if (batch !== null && !list.inputs.batchIds.includes(batch.id)) {
    reasons.push('Moulding has been delivered and measured since: its true width moves the long points.')
  }
  return reasons
}

/** Why the bench may not start: the first-off of new moulding is not accepted. Null: nothing stands in the way. */
export async function whyClosed(list: CutList, issue: Issue, tx?: Tx): Promise<string | null> {
  const inside = tx === undefined ? {} : { transaction: tx }
  const plan = await CutListPlan.findOne({
    where: { cutListId: list.id },
    order: [['no', 'DESC']],
    rejectOnEmpty: true,
    ...inside,
  })
  if (plan.document.opened.every(({ source }) => source === 'rack')) return null
  const orders = await KnifeOrder.findAll({ where: { issueId: issue.id }, ...inside })
  if (orders.some(({ state }) => isFirstOffSettled(state))) return null
  return 'The first-off has not been accepted in writing: no new moulding is cut before it is.'
}

export interface CutListInList {
  readonly list: CutList
  readonly commission: Commission
  readonly issue: Issue
  readonly cuts: number
  readonly done: number
  readonly isOutOfDate: boolean
}

/** Every cut list, the latest first. */
export async function listCutLists(actor: Actor): Promise<CutListInList[]> {
  requireRight(actor, 'cut-list.list', {})
  const lists = await CutList.findAll({ order: [['at', 'DESC']], limit: 500 })
  return Promise.all(
    lists.map(async (list) => {
      const issue = await Issue.findByPk(list.issueId, { rejectOnEmpty: true })
      const facts = await CutFact.findAll({ where: { cutListId: list.id }, order: [['seq', 'ASC']] })
      const standing = standingOfFacts(facts)
      return {
        list,
        commission: await Commission.findByPk(list.commissionId, { rejectOnEmpty: true }),
        issue,
        cuts: await Cut.count({ where: { cutListId: list.id } }),
        done: [...standing.facts.values()].filter(({ kind }) => kind === 'cut').length,
        isOutOfDate: (await reasonsOutOfDate(list, issue)).length > 0,
      }
    }),
  )
}
