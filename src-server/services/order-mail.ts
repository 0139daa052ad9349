import { eventsIn, ORDER_COURSE } from '@shared/course'
import type { Letter } from '../models/letter'
import { Commission } from '../models/commission'
import { KnifeOrder } from '../models/order'
import { takeOrderStep } from './order-course'
import { SYSTEM_ACTOR } from './rights'
import { enterTrail } from './trail'
import type { Tx } from './transaction'

/** The mail server took the letter that carries an order: the order is sent, if it still waited for that. */
export async function noteOrderMailTaken(tx: Tx, letter: Letter): Promise<void> {
  if (letter.kind !== 'knife-order') return
  await Commission.findByPk(letter.commissionId, { transaction: tx, lock: tx.LOCK.UPDATE })
  const order = await KnifeOrder.findByPk(letter.aboutId, {
    transaction: tx,
    lock: tx.LOCK.UPDATE,
    rejectOnEmpty: true,
  })
  if (order.state === 'held' && order.heldFrom === 'queued') {
    await order.update({ heldFrom: 'sent' }, { transaction: tx })
    return
  }
  if (!eventsIn(ORDER_COURSE, order.state).includes('mail-taken')) return
  await takeOrderStep(tx, order, { event: 'mail-taken', actor: SYSTEM_ACTOR, note: `to ${letter.toAddress}` })
  await enterTrail(tx, {
    commissionId: order.commissionId,
    actor: SYSTEM_ACTOR,
    act: 'order-mail-taken',
    says: `The mail server took knife order ${order.number} to ${letter.toAddress}`,
    document: { orderId: order.id, letterId: letter.id },
  })
}
