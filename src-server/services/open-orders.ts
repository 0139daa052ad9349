import type { Actor } from '@shared/access'
import { isOrderOpen } from '@shared/course'
import { Failure } from '@shared/failure'
import { orderHeldLetter } from '../mail/letters/review-letters'
import { queueLetter } from '../mail/outbox'
import type { Commission } from '../models/commission'
import { KnifeOrder } from '../models/order'
import { Mill } from '../models/person'
import { Issue } from '../models/review'
import { installation } from './installation'
import { makeLink } from './links'
import { takeOrderStep } from './order-course'
import { readSettings } from './settings'
import { enterTrail } from './trail'
import type { Tx } from './transaction'

interface Settling {
  readonly actor: Actor
  readonly commission: Commission
  readonly issue: Issue
  readonly earlierIds: readonly string[]
  readonly openOrders: { readonly act: 'hold' | 'continue'; readonly reason: string } | null
}

/**
 * What becomes of orders that are open for earlier issues when a later one is put forward: the person must have said.
 * Throws not-ready naming them when nothing was said. Holding sends each mill a notice; going on sends nothing.
 */
export async function settleOpenOrders(tx: Tx, settling: Settling): Promise<void> {
  const { actor, commission, issue, earlierIds, openOrders } = settling
  const orders = await KnifeOrder.findAll({
    where: { issueId: [...earlierIds] },
    order: [['number', 'ASC']],
    transaction: tx,
    lock: tx.LOCK.UPDATE,
  })
  const open = orders.filter(({ state }) => isOrderOpen(state) && state !== 'held')
  if (open.length === 0) return
  if (openOrders === null) {
    throw new Failure('not-ready', {
      says: `Knife order ${open.map(({ number }) => number).join(', ')} is open for an earlier issue: say whether it is held or goes on, and why.`,
      openOrders: open.map(({ id, number, state }) => ({ id, number, state })),
    })
  }
  for (const order of open) {
    if (openOrders.act === 'hold') await hold(tx, actor, commission, order, openOrders.reason)
  }
  await enterTrail(tx, {
    commissionId: commission.id,
    actor,
    act: openOrders.act === 'hold' ? 'orders-held' : 'orders-go-on',
    says: `${openOrders.act === 'hold' ? 'Held' : 'Let go on'} ${open.map(({ number }) => number).join(', ')} while issue ${issue.letter} is looked at`,
    document: { issueId: issue.id, orderIds: open.map(({ id }) => id), reason: openOrders.reason },
  })
}

async function hold(
  tx: Tx,
  actor: Actor,
  commission: Commission,
  order: KnifeOrder,
  reason: string,
): Promise<void> {
  await takeOrderStep(tx, order, { event: 'hold', actor, note: reason })
  const mill = await Mill.findByPk(order.millId, { transaction: tx, rejectOnEmpty: true })
  const ordered = await Issue.findByPk(order.issueId, { transaction: tx, rejectOnEmpty: true })
  const { document: settings } = await readSettings(tx)
  const token = await makeLink(tx, { purpose: 'acknowledge-order', subjectId: order.id, days: 60 })
  await queueLetter(tx, {
    kind: 'order-held',
    about: { type: 'order', id: order.id, commissionId: commission.id },
    to: mill.email,
    body: orderHeldLetter({
      workshop: settings.workshop,
      signature: settings.signature,
      number: order.number,
      title: commission.title,
      issueLetter: ordered.letter,
      reason,
      link: `${installation().publicUrl}/link/${token}`,
    }),
  })
}
