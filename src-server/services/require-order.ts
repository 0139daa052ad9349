import type { Actor, Facts, Right } from '@shared/access'
import { Commission } from '../models/commission'
import { KnifeOrder } from '../models/order'
import { withClient } from './require-commission'
import { notFound, requireRight, requireSeen } from './rights'
import type { Tx } from './transaction'

export interface OrderReach {
  readonly actor: Actor
  readonly right: Right
  readonly tx?: Tx
  /** Holds the commission's and the order's rows until the transaction ends. */
  readonly lock?: boolean
}

export interface ReachedOrder {
  readonly order: KnifeOrder
  readonly commission: Commission
}

/** The one way to an order: staff see all, a mill those addressed to it; nobody else is told that it exists. */
export async function requireOrder(
  id: string,
  { actor, right, tx, lock = false }: OrderReach,
): Promise<ReachedOrder> {
  const inside = tx === undefined ? {} : { transaction: tx }
  const found = await KnifeOrder.findByPk(id, inside)
  if (found === null) throw notFound()
  requireSeen(actor, 'order.read', factsOfOrder(found))
  requireRight(actor, right, factsOfOrder(found))
  const held = tx !== undefined && lock
  const commission = await Commission.findByPk(found.commissionId, {
    include: [withClient],
    rejectOnEmpty: true,
    ...inside,
    ...(held ? { lock: { level: tx.LOCK.UPDATE, of: Commission } } : {}),
  })
  const order = held
    ? await KnifeOrder.findByPk(id, { ...inside, lock: tx.LOCK.UPDATE, rejectOnEmpty: true })
    : found
  return { order, commission }
}

export const factsOfOrder = ({ millId }: Pick<KnifeOrder, 'millId'>): Facts => ({ millId })
