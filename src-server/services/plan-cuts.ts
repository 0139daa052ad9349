import { Op } from 'sequelize'
import type { Actor } from '@shared/access'
import type { OutputOf, PlanRequest } from '@shared/contracts'
import { CUT_LIST_COURSE, nextState } from '@shared/course'
import { planCuts } from '@shared/cutting'
import type { CutInstance, CutPlan } from '@shared/cutting'
import { Failure } from '@shared/failure'
import type { Commission } from '../models/commission'
import { Cut, CutFact, CutList, CutListPlan } from '../models/cut-list'
import { KnifeOrder } from '../models/order'
import { Batch, RackMovement, RackPiece } from '../models/rack'
import type { Issue } from '../models/review'
import { MillCard, SawCard } from '../models/workshop'
import { now } from './clock'
import { railsOfPictures } from './frame-rails'
import type { RailedPicture } from './frame-rails'
import { onceOnly } from './operation'
import { latestBatchOf, measuredPictures } from './rails'
import { requireIssue, sectionOfIssue } from './require-issue'
import { enterTrail } from './trail'
import { inTransaction } from './transaction'
import type { Tx } from './transaction'

type Request = OutputOf<typeof PlanRequest>

/** Plans the rails of an approved issue's pictures on the rack and on lengths that can be ordered: a new cut list, closed. */
export const makeCutList = (actor: Actor, commissionId: string, request: Request): Promise<string> =>
  inTransaction(async (tx) => {
    const { issue, commission, isLatest } = await requireIssue(request.issueId, {
      actor,
      right: 'plan.make',
      see: 'issue.read',
      tx,
      lock: true,
    })
    if (commission.id !== commissionId) {
      throw new Failure('not-found', { says: 'The issue belongs to another commission.' })
    }
    const { operationId, ...asked } = request
    return onceOnly(
      tx,
      { operationId, actor, request: { what: 'plan', commissionId, ...asked } },
      async () => {
        requireApproved(issue, isLatest)
        await supersedeEarlier(tx, actor, commissionId)
        return enterList(tx, actor, { commission, issue, request })
      },
    )
  })

function requireApproved(issue: Issue, isLatest: boolean): void {
  if (issue.state === 'approved' && isLatest) return
  throw new Failure('not-ready', {
    says: `Issue ${issue.letter} is ${isLatest ? issue.state.replace('-', ' ') : 'not the latest any more'}; cut lists are made from the latest approved issue.`,
  })
}

/** A list on which nothing was cut gives way to the new one; one that has been begun stands until it is done. */
async function supersedeEarlier(tx: Tx, actor: Actor, commissionId: string): Promise<void> {
  const lists = await CutList.findAll({
    where: { commissionId, state: ['closed', 'open'] },
    transaction: tx,
    lock: tx.LOCK.UPDATE,
  })
  for (const list of lists) {
    const facts = await CutFact.count({ where: { cutListId: list.id }, transaction: tx })
    if (facts > 0) {
      throw new Failure('not-ready', {
        says: `Cut list ${list.no} has been begun at the saw. Finish it, or take its cuts back there, before a new one is planned.`,
      })
    }
    await list.update({ state: nextState(CUT_LIST_COURSE, list.state, 'supersede') }, { transaction: tx })
    await releasePieces(tx, actor, list)
  }
}

/** Frees the rack pieces that a list counted on. */
export async function releasePieces(tx: Tx, actor: Actor, list: CutList): Promise<void> {
  const held = await RackPiece.findAll({
    where: { reservedById: list.id, state: 'reserved' },
    transaction: tx,
  })
  for (const piece of held) {
    await piece.update({ state: 'on-rack', reservedById: null }, { transaction: tx })
    await noteMovement(tx, actor, piece, 'released', `cut list ${list.no} was superseded`)
  }
}

export const noteMovement = (
  tx: Tx,
  actor: Actor,
  piece: RackPiece,
  act: RackMovement['act'],
  reason: string,
): Promise<RackMovement> =>
  RackMovement.create(
    { pieceId: piece.id, act, lengthMm: piece.lengthMm, reason, personId: actor.personId, at: now() },
    { transaction: tx },
  )

interface ListOf {
  readonly commission: Commission
  readonly issue: Issue
  readonly request: Request
}

async function enterList(tx: Tx, actor: Actor, { commission, issue, request }: ListOf): Promise<string> {
  const { measured, missing } = await measuredPictures(commission.id, tx)
  if (missing.length > 0 || measured.length === 0) throw new Failure('not-ready', { says: missing.join(' ') })
  const saw = await SawCard.findOne({
    order: [
      ['at', 'DESC'],
      ['no', 'DESC'],
    ],
    transaction: tx,
  })
  if (saw === null) {
    throw new Failure('not-ready', {
      says: 'No saw has a card yet: a manager enters its kerf and end trim under settings.',
    })
  }
  const batch = await latestBatchOf(issue.shapeSha256, tx)
  const railed = railsOfPictures(sectionOfIssue(issue), measured, batch)
  const rails = singleRailsOf(railed)
  const pieces = request.useRack ? await freePieces(tx, issue.shapeSha256) : []
  const lengths = request.lengths ?? (await lengthsOfMill(tx, issue))
  const plan = requirePlan({
    demand: rails.map(({ id, length, mitre, frame, side }) => ({ id, length, count: 1, mitre, frame, side })),
    lengths: lengths.map(({ length, price, count }) => ({
      length,
      ...(price !== null && { price }),
      ...(count !== null && { count }),
    })),
    rack: pieces.map(({ code, lengthMm, trimStartMm, trimEndMm }) => ({
      id: code,
      length: lengthMm,
      endTrim: [trimStartMm, trimEndMm] as const,
    })),
    saw: saw.document,
    order: request.order,
  })
  const list = await CutList.create(
    {
      commissionId: commission.id,
      issueId: issue.id,
      no: (await CutList.count({ where: { commissionId: commission.id }, transaction: tx })) + 1,
      inputs: {
        pictures: railed.map(({ picture, measurement }) => ({
          pictureId: picture.id,
          name: picture.name,
          copies: picture.copies,
          measurementNo: measurement.no,
        })),
        batchIds: batch === null ? [] : [batch.id],
        saw: saw.document,
        sawCardId: saw.id,
      },
      state: 'closed',
      byId: actor.personId,
      at: now(),
    },
    { transaction: tx },
  )
  await CutListPlan.create(
    { cutListId: list.id, no: 1, document: plan, byId: actor.personId, at: now() },
    { transaction: tx },
  )
  await enterCuts(tx, actor, { list, plan, rails, pieces })
  await enterTrail(tx, {
    commissionId: commission.id,
    actor,
    act: 'cut-list-made',
    says: `Planned cut list ${list.no} from issue ${issue.letter}: ${plan.count} ${plan.count === 1 ? 'length' : 'lengths'}`,
    document: {
      cutListId: list.id,
      issueId: issue.id,
      sha256: issue.sha256,
      count: plan.count,
      bound: String(plan.bound),
      proven: plan.proven,
    },
  })
  return list.id
}

/** One rail of one frame, with what the saw needs to know of it. */
interface SingleRail {
  readonly id: string
  readonly picture: string
  readonly frame: string
  readonly side: string
  readonly length: number
  readonly rebate: number
  readonly sight: number
  readonly mitre: number
}

function singleRailsOf(railed: readonly RailedPicture[]): SingleRail[] {
  let frames = 0
  return railed.flatMap(({ picture, frame }) =>
    Array.from({ length: picture.copies }, () => {
      frames += 1
      const name = `frame ${frames}`
      return frame.rails.map((rail) => ({
        id: `${name}, ${rail.side}`,
        picture: picture.name,
        frame: name,
        side: rail.side,
        length: rail.longPointMm,
        rebate: rail.rebateMm,
        sight: rail.sightMm,
        mitre: rail.mitreDeg,
      }))
    }).flat(),
  )
}

/** Moulding of the shape that lies free on the rack: all of one timber and finish, that of the oldest piece. */
async function freePieces(tx: Tx, shape: string): Promise<RackPiece[]> {
  const batches = await Batch.findAll({
    where: { shapeSha256: shape },
    order: [['at', 'ASC']],
    transaction: tx,
  })
  const pieces = await RackPiece.findAll({
    where: { batchId: batches.map(({ id }) => id), state: 'on-rack' },
    order: [
      ['at', 'ASC'],
      ['id', 'ASC'],
    ],
    transaction: tx,
    lock: tx.LOCK.UPDATE,
  })
  const first = batches.find(({ id }) => id === pieces[0]?.batchId)
  const alike = new Set(
    batches
      .filter(({ species, finish }) => species === first?.species && finish === first.finish)
      .map(({ id }) => id),
  )
  return pieces.filter(({ batchId }) => alike.has(batchId))
}

type Orderable = NonNullable<Request['lengths']>

/** The sizes on the card of the mill that runs this shape; none where no order was ever sent. */
async function lengthsOfMill(tx: Tx, issue: Issue): Promise<Orderable> {
  const order = await KnifeOrder.findOne({
    where: { commissionId: issue.commissionId, state: { [Op.ne]: 'cancelled' } },
    order: [['at', 'DESC']],
    transaction: tx,
  })
  const card =
    order === null
      ? null
      : await MillCard.findOne({ where: { millId: order.millId }, order: [['no', 'DESC']], transaction: tx })
  return (card?.document.lengths ?? []).map(({ length, price }) => ({ length, price, count: null }))
}

function requirePlan(instance: CutInstance): CutPlan {
  const outcome = planCuts(instance)
  if (outcome.kind === 'planned') return outcome.plan
  throw new Failure('no-plan', {
    says: outcome.says,
    reason: outcome.reason,
    neededLengthMm: outcome.neededLengthMm,
  })
}

interface CutsOf {
  readonly list: CutList
  readonly plan: CutPlan
  readonly rails: readonly SingleRail[]
  readonly pieces: readonly RackPiece[]
}

async function enterCuts(tx: Tx, actor: Actor, { list, plan, rails, pieces }: CutsOf): Promise<void> {
  const railById = new Map(rails.map((rail) => [rail.id, rail]))
  const pieceByCode = new Map(pieces.map((piece) => [piece.code, piece]))
  let no = 0
  for (const [lengthNo, opened] of plan.opened.entries()) {
    const piece = opened.source === 'rack' ? pieceByCode.get(opened.from) : undefined
    if (piece !== undefined) {
      await piece.update({ state: 'reserved', reservedById: list.id }, { transaction: tx })
      await noteMovement(tx, actor, piece, 'reserved', `for cut list ${list.no}`)
    }
    for (const cut of opened.cuts) {
      const rail = railById.get(cut.id)
      if (rail === undefined) throw new Error(`the plan cuts ${cut.id}, which nobody asked for`)
      no += 1
      const { picture, frame, side, length, rebate, sight, mitre } = rail
      await Cut.create(
        {
          cutListId: list.id,
          no,
          lengthNo,
          pieceId: piece?.id ?? null,
          picture,
          frame,
          side,
          lengthMm: length,
          rebateMm: rebate,
          sightMm: sight,
          mitreDeg: mitre,
          atMm: cut.at,
        },
        { transaction: tx },
      )
    }
  }
}
