import type { Actor } from '@shared/access'
import { invalid } from '@shared/contracts'
import type { OutputOf, RackMovementRequest, RackPieceRequest } from '@shared/contracts'
import { Failure } from '@shared/failure'
import { Commission } from '../models/commission'
import { Batch, RackMovement, RackPiece } from '../models/rack'
import { Issue } from '../models/review'
import { now } from './clock'
import { onceOnly } from './operation'
import { rackPiece } from './record-delivery'
import { requireIssue } from './require-issue'
import { notFound, requireRight } from './rights'
import { inTransaction } from './transaction'

export interface PieceOnRack {
  readonly piece: RackPiece
  readonly batch: Batch
  readonly issue: Issue
  readonly commission: Commission
  readonly parentCode: string | null
}

/** Every piece that is or was on the rack, the latest first. */
export async function listRack(actor: Actor): Promise<PieceOnRack[]> {
  requireRight(actor, 'rack.read', {})
  const pieces = await RackPiece.findAll({
    order: [
      ['at', 'DESC'],
      ['id', 'DESC'],
    ],
    limit: 5000,
  })
  const batches = mapped(await Batch.findAll({ where: { id: pieces.map(({ batchId }) => batchId) } }))
  const issues = mapped(
    await Issue.findAll({ where: { id: [...batches.values()].map(({ issueId }) => issueId) } }),
  )
  const commissions = mapped(
    await Commission.findAll({ where: { id: [...issues.values()].map(({ commissionId }) => commissionId) } }),
  )
  const codes = new Map(pieces.map(({ id, code }) => [id, code]))
  return pieces.map((piece) => {
    const batch = batches.get(piece.batchId)
    const issue = batches.size > 0 && batch !== undefined ? issues.get(batch.issueId) : undefined
    const commission = issue === undefined ? undefined : commissions.get(issue.commissionId)
    if (batch === undefined || issue === undefined || commission === undefined)
      throw new Error('a rack piece has no batch')
    return {
      piece,
      batch,
      issue,
      commission,
      parentCode: piece.parentId === null ? null : (codes.get(piece.parentId) ?? null),
    }
  })
}

const mapped = <Row extends { readonly id: string }>(rows: readonly Row[]) =>
  new Map(rows.map((row) => [row.id, row]))

/** Puts moulding on the rack that was in the workshop already: one batch, each piece with a code of its own. */
export const addToRack = (
  actor: Actor,
  { operationId, ...asked }: OutputOf<typeof RackPieceRequest>,
): Promise<string> =>
  inTransaction(async (tx) => {
    requireRight(actor, 'rack.change', {})
    const { issue } = await requireIssue(asked.issueId, { actor, right: 'rack.change', tx, lock: true })
    return onceOnly(tx, { operationId, actor, request: { what: 'rack', ...asked } }, async () => {
      const batch = await Batch.create(
        {
          orderId: null,
          issueId: issue.id,
          shapeSha256: issue.shapeSha256,
          species: asked.species,
          finish: asked.finish,
          trueWidthMm: asked.trueWidth,
          trueRebateMm: asked.trueRebate,
          at: now(),
        },
        { transaction: tx },
      )
      for (let copy = 0; copy < asked.count; copy += 1) {
        await rackPiece(tx, {
          actor,
          batchId: batch.id,
          lengthMm: asked.length,
          trims: asked.endTrim,
          parentId: null,
          reason: 'was in the workshop',
        })
      }
      return batch.id
    })
  })

/** Scraps a piece or corrects its length. What a cut list counts on is freed there first. */
export const moveOnRack = (
  actor: Actor,
  { operationId, pieceId, act, length, reason }: OutputOf<typeof RackMovementRequest>,
): Promise<string> =>
  inTransaction(async (tx) => {
    requireRight(actor, 'rack.change', {})
    if (act === 'correct' && length === null) {
      throw invalid([
        { path: '/length', code: 'missing', says: 'is missing; a correction says the true length.' },
      ])
    }
    return onceOnly(
      tx,
      { operationId, actor, request: { what: 'rack-movement', pieceId, act, length, reason } },
      async () => {
        const piece = await RackPiece.findByPk(pieceId, { transaction: tx, lock: tx.LOCK.UPDATE })
        if (piece === null) throw notFound()
        if (piece.state !== 'on-rack') {
          throw new Failure('transition-not-allowed', {
            says: `${piece.code} is ${piece.state}; only what lies free on the rack is scrapped or corrected.`,
          })
        }
        await piece.update(act === 'scrap' ? { state: 'scrapped' } : { lengthMm: length ?? piece.lengthMm }, {
          transaction: tx,
        })
        await RackMovement.create(
          {
            pieceId,
            act: act === 'scrap' ? 'scrapped' : 'corrected',
            lengthMm: length,
            reason,
            personId: actor.personId,
            at: now(),
          },
          { transaction: tx },
        )
        return pieceId
      },
    )
  })
