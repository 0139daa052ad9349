import type { Actor } from '@shared/access'
import { invalid } from '@shared/contracts'
import type { CutFactRequest, OpenCutListRequest, OutputOf } from '@shared/contracts'
import { CUT_LIST_COURSE, eventsIn, nextState } from '@shared/course'
import type { CutListEventName } from '@shared/course'
import { Failure } from '@shared/failure'
import { Cut, CutFact, CutListPlan } from '../models/cut-list'
import type { CutList } from '../models/cut-list'
import { Batch, RackPiece } from '../models/rack'
import { Issue } from '../models/review'
import { now } from './clock'
import { reasonsOutOfDate, requireCutList, standingOfFacts, whyClosed } from './cut-lists'
import { onceOnly } from './operation'
import { noteMovement } from './plan-cuts'
import { rackPiece } from './record-delivery'
import { requireRight } from './rights'
import { enterTrail } from './trail'
import { inTransaction } from './transaction'
import type { Tx } from './transaction'

type Request = OutputOf<typeof CutFactRequest>

/** Opens a list to the bench. Before the first-off is accepted only a manager does, and says why. */
export const openCutList = (
  actor: Actor,
  id: string,
  request: OutputOf<typeof OpenCutListRequest>,
): Promise<string> =>
  inTransaction(async (tx) => {
    const list = await requireCutList(id, { actor, right: 'cut-list.open', tx, lock: true })
    const { operationId, reason } = request
    return onceOnly(tx, { operationId, actor, request: { what: 'open-cut-list', id, reason } }, async () => {
      const issue = await Issue.findByPk(list.issueId, { transaction: tx, rejectOnEmpty: true })
      const closed = await whyClosed(list, issue, tx)
      if (closed !== null) {
        requireRight(actor, 'cut-list.open-early', {})
        if (reason === '')
          throw invalid([
            {
              path: '/reason',
              code: 'missing',
              says: `is empty. ${closed} Say why the list is opened all the same.`,
            },
          ])
      }
      await list.update(
        { state: nextState(CUT_LIST_COURSE, list.state, 'open'), openedBecause: reason },
        { transaction: tx },
      )
      await enterTrail(tx, {
        commissionId: list.commissionId,
        actor,
        act: 'cut-list-opened',
        says: `Opened cut list ${list.no} to the bench${closed === null ? '' : ' before the first-off was accepted'}`,
        document: { cutListId: id, reason },
      })
      return id
    })
  })

/**
 * Records what happened at the saw. Facts are never refused because the list moved on: they are kept against the
 * version the bench saw and marked as a conflict. Only what makes no sense at all is refused.
 */
export const recordCut = (actor: Actor, id: string, request: Request): Promise<string> =>
  inTransaction(async (tx) => {
    const list = await requireCutList(id, { actor, right: 'cut.record', tx, lock: true })
    const { operationId, ...asked } = request
    return onceOnly(tx, { operationId, actor, request: { what: 'cut-fact', id, ...asked } }, () =>
      enterFact(tx, actor, list, request),
    )
  })

async function enterFact(tx: Tx, actor: Actor, list: CutList, request: Request): Promise<string> {
  const { kind, trueLength, deviceTime, listVersion, operationId } = request
  const cut = kind === 'offcut' ? null : await requireCut(tx, list, request.cutId)
  const lengthNo = cut?.lengthNo ?? requireLengthNo(request)
  const earlier = await CutFact.findAll({
    where: { cutListId: list.id },
    order: [['seq', 'ASC']],
    transaction: tx,
  })
  const standing = standingOfFacts(earlier)
  const issue = await Issue.findByPk(list.issueId, { transaction: tx, rejectOnEmpty: true })
  const isTwice = cut !== null && kind !== 'undo' && standing.facts.has(cut.id)
  const conflict = isTwice || list.state === 'closed' || (await reasonsOutOfDate(list, issue)).length > 0
  const pieceId = kind === 'offcut' ? await rackOffcut(tx, actor, { list, lengthNo, request, issue }) : null
  await CutFact.create(
    {
      cutListId: list.id,
      seq: earlier.length + 1,
      kind,
      cutId: cut?.id ?? null,
      lengthNo,
      trueLengthMm: trueLength,
      pieceId,
      conflict,
      listVersion,
      operationId,
      personId: actor.personId,
      personName: actor.name,
      deviceTime: new Date(deviceTime),
      at: now(),
    },
    { transaction: tx },
  )
  if (cut !== null && kind !== 'undo') await usePiece(tx, actor, cut, list)
  await enterTrail(tx, {
    commissionId: list.commissionId,
    actor,
    act: `cut-list-${kind}`,
    says: saysOf(kind, cut, trueLength, list),
    document: { cutListId: list.id, kind, cutId: cut?.id ?? null, lengthNo, trueLength, conflict },
  })
  await moveList(tx, list)
  return list.id
}

function saysOf(kind: Request['kind'], cut: Cut | null, trueLength: number | null, list: CutList): string {
  const length = trueLength === null ? '' : `, ${trueLength} mm`
  if (cut === null) return `Put an offcut of cut list ${list.no} on the rack${length}`
  const rail = `the ${cut.side} rail of ${cut.frame}`
  if (kind === 'undo') return `Took back ${rail}`
  return kind === 'cut' ? `Cut ${rail}${length}` : `Mis-cut ${rail}${length}`
}

async function requireCut(tx: Tx, list: CutList, cutId: string | null): Promise<Cut> {
  const cut =
    cutId === null ? null : await Cut.findOne({ where: { id: cutId, cutListId: list.id }, transaction: tx })
  if (cut === null) throw invalid([{ path: '/cutId', code: 'unknown', says: 'names no cut of this list.' }])
  return cut
}

function requireLengthNo({ lengthNo, trueLength }: Request): number {
  if (lengthNo === null)
    throw invalid([
      { path: '/lengthNo', code: 'missing', says: 'is missing; an offcut is of one of the lengths.' },
    ])
  if (trueLength === null) {
    throw invalid([
      { path: '/trueLength', code: 'missing', says: 'is missing; measure the offcut along its back edge.' },
    ])
  }
  return lengthNo
}

interface OffcutOf {
  readonly list: CutList
  readonly lengthNo: number
  readonly request: Request
  readonly issue: Issue
}

/** A new piece on the rack: the mitred end needs no trim, the other keeps what the piece's own end asked. */
async function rackOffcut(
  tx: Tx,
  actor: Actor,
  { list, lengthNo, request, issue }: OffcutOf,
): Promise<string> {
  const plan = await CutListPlan.findOne({
    where: { cutListId: list.id },
    order: [['no', 'DESC']],
    transaction: tx,
    rejectOnEmpty: true,
  })
  const opened = plan.document.opened[lengthNo]
  if (opened === undefined || request.trueLength === null) {
    throw invalid([{ path: '/lengthNo', code: 'unknown', says: 'names no length of this plan.' }])
  }
  if (request.trueLength >= opened.length) {
    throw invalid([
      {
        path: '/trueLength',
        code: 'too-long',
        says: `is ${request.trueLength} mm; an offcut is shorter than the length it came from, ${opened.length} mm.`,
      },
    ])
  }
  const parent =
    opened.source === 'rack'
      ? await RackPiece.findOne({ where: { code: opened.from }, transaction: tx })
      : null
  const batchId = parent?.batchId ?? (await batchFor(tx, issue))
  const piece = await rackPiece(tx, {
    actor,
    batchId,
    lengthMm: request.trueLength,
    trims: [0, opened.trims[1]],
    parentId: parent?.id ?? null,
    reason: `offcut of cut list ${list.no}`,
  })
  return piece.id
}

async function batchFor(tx: Tx, issue: Issue): Promise<string> {
  const batch = await Batch.findOne({
    where: { shapeSha256: issue.shapeSha256 },
    order: [['at', 'DESC']],
    transaction: tx,
  })
  if (batch === null) {
    throw new Failure('not-ready', {
      says: 'No moulding of this shape has been delivered or entered on the rack yet; enter it first.',
    })
  }
  return batch.id
}

async function usePiece(tx: Tx, actor: Actor, { pieceId }: Cut, list: CutList): Promise<void> {
  if (pieceId === null) return
  const piece = await RackPiece.findByPk(pieceId, {
    transaction: tx,
    lock: tx.LOCK.UPDATE,
    rejectOnEmpty: true,
  })
  if (piece.state === 'used') return
  await piece.update({ state: 'used' }, { transaction: tx })
  await noteMovement(tx, actor, piece, 'used', `cut list ${list.no}`)
}

/** Done when every rail is cut; open again when one is taken back. */
async function moveList(tx: Tx, list: CutList): Promise<void> {
  const facts = await CutFact.findAll({
    where: { cutListId: list.id },
    order: [['seq', 'ASC']],
    transaction: tx,
  })
  const cuts = await Cut.findAll({ where: { cutListId: list.id }, attributes: ['id'], transaction: tx })
  const { facts: standing } = standingOfFacts(facts)
  const isDone = cuts.every(({ id }) => standing.get(id)?.kind === 'cut')
  const event: CutListEventName = isDone ? 'finish' : 'reopen'
  if (eventsIn(CUT_LIST_COURSE, list.state).includes(event)) {
    await list.update({ state: nextState(CUT_LIST_COURSE, list.state, event) }, { transaction: tx })
  }
}
