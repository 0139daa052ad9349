import { can } from '@shared/access'
import type { Actor } from '@shared/access'
import type { WaitingLineView } from '@shared/contracts'
import type { OrderStateName } from '@shared/course'
import { Commission } from '../models/commission'
import { Letter } from '../models/letter'
import { listOrders } from './orders'
import { briefOf, hasRole } from './waiting'
import type { WaitingItem, WaitingSource } from './waiting'

type Waits = readonly [kind: WaitingLineView['kind'], says: string]

const FOR_MILL: Partial<Record<OrderStateName, Waits>> = {
  sent: ['order', 'waits to be acknowledged'],
  acknowledged: ['order', 'waits for your price and date'],
  'price-accepted': ['order', 'is accepted: grind, and report the first-off'],
  'first-off-accepted': ['order', 'may be run: the first-off is accepted'],
}
const FOR_MANAGER: Partial<Record<OrderStateName, Waits>> = {
  quoted: ['order-reply', 'is quoted: the price waits to be accepted'],
}
const FOR_DESIGNER: Partial<Record<OrderStateName, Waits>> = {
  'first-off-reported': ['first-off', 'has its first-off: accept or refuse it'],
  held: ['order-reply', 'is held: resume it or have it cancelled'],
}

/** What orders wait for, by whose turn it is. */
export const orderWaits: WaitingSource = async (actor) => {
  if (!can(actor, 'order.list')) return []
  const orders = await listOrders(actor)
  return orders.flatMap(({ order, commission }): WaitingItem[] =>
    turnsOf(actor, order.state).map(([kind, says]) => ({
      kind,
      says: `Knife order ${order.number} ${says}`,
      commission: briefOf(commission),
      to: `/orders/${order.id}`,
      since: order.at,
      urgent: order.state === 'held',
    })),
  )
}

function turnsOf(actor: Actor, state: OrderStateName): Waits[] {
  const turns = [
    hasRole(actor, 'mill') ? FOR_MILL[state] : undefined,
    hasRole(actor, 'manager') ? FOR_MANAGER[state] : undefined,
    hasRole(actor, 'designer') ? FOR_DESIGNER[state] : undefined,
  ]
  return turns.filter((turn) => turn !== undefined)
}

/** Managers: letters that the mail server refused for good. */
export const postWaits: WaitingSource = async (actor) => {
  if (!hasRole(actor, 'manager')) return []
  const letters = await Letter.findAll({ where: { state: 'failed' } })
  const commissions = new Map(
    (await Commission.findAll({ where: { id: letters.map(({ commissionId }) => commissionId) } })).map(
      (one) => [one.id, one],
    ),
  )
  return letters.map((letter) => {
    const commission = commissions.get(letter.commissionId)
    return {
      kind: 'post-failed',
      says: `A letter to ${letter.toAddress} was refused: ${letter.subject}`,
      commission: commission === undefined ? null : briefOf(commission),
      to: `/post/${letter.id}`,
      since: letter.queuedAt,
      urgent: true,
    }
  })
}
