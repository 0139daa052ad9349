import type { Actor } from '@shared/access'
import type { OrderEventRequest, OutputOf } from '@shared/contracts'
import type { KnifeOrder } from '../models/order'
import { Batch, RackMovement, RackPiece } from '../models/rack'
import { Issue } from '../models/review'
import { SawCard } from '../models/workshop'
import { now } from './clock'
import { nextNumber } from './numbering'
import type { Tx } from './transaction'

export interface Delivery {
  readonly order: KnifeOrder
  readonly batch: NonNullable<OutputOf<typeof OrderEventRequest>['batch']>
  readonly actor: Actor
}

/** What a mill delivered goes on the rack: one batch with its true width and rebate, and every length with a code of its own. */
export async function recordDelivery(tx: Tx, { order, batch, actor }: Delivery): Promise<void> {
  const issue = await Issue.findByPk(order.issueId, { transaction: tx, rejectOnEmpty: true })
  const row = await Batch.create(
    {
      orderId: order.id,
      issueId: issue.id,
      shapeSha256: issue.shapeSha256,
      species: order.document.species,
      finish: '',
      trueWidthMm: batch.trueWidth,
      trueRebateMm: batch.trueRebate,
      at: now(),
    },
    { transaction: tx },
  )
  const trim = await factoryEndTrim(tx)
  for (const { length, count } of batch.lengths) {
    for (let copy = 0; copy < count; copy += 1) {
      await rackPiece(tx, {
        actor,
        batchId: row.id,
        lengthMm: length,
        trims: [trim, trim],
        parentId: null,
        reason: `delivered on ${order.number}`,
      })
    }
  }
}

/** What comes off a factory end, by the saw's latest card; nothing where there is none. */
async function factoryEndTrim(tx: Tx): Promise<number> {
  const card = await SawCard.findOne({
    order: [
      ['at', 'DESC'],
      ['no', 'DESC'],
    ],
    transaction: tx,
  })
  return card?.document.endTrim ?? 0
}

export interface NewPiece {
  readonly actor: Actor
  readonly batchId: string
  readonly lengthMm: number
  readonly trims: readonly [start: number, end: number]
  readonly parentId: string | null
  readonly reason: string
}

/** Puts one piece on the rack under the next code. */
export async function rackPiece(tx: Tx, piece: NewPiece): Promise<RackPiece> {
  const at = now()
  const row = await RackPiece.create(
    {
      code: `R-${await nextNumber(tx, 'rack')}`,
      batchId: piece.batchId,
      lengthMm: piece.lengthMm,
      trimStartMm: piece.trims[0],
      trimEndMm: piece.trims[1],
      state: 'on-rack',
      parentId: piece.parentId,
      reservedById: null,
      at,
    },
    { transaction: tx },
  )
  await RackMovement.create(
    {
      pieceId: row.id,
      act: 'racked',
      lengthMm: piece.lengthMm,
      reason: piece.reason,
      personId: piece.actor.personId,
      at,
    },
    { transaction: tx },
  )
  return row
}
