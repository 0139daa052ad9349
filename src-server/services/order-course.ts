import type { Actor, Right } from '@shared/access'
import { ORDER_COURSE, nextState } from '@shared/course'
import type { OrderEventName, OrderStateName } from '@shared/course'
import type { KnifeOrder } from '../models/order'
import { OrderEvent } from '../models/order'
import { now } from './clock'
import type { Tx } from './transaction'

/** The right that each event needs; `send` and `mail-taken` are not a person's to record. */
export const RIGHT_OF_EVENT: Readonly<Record<OrderEventName, Right | null>> = {
  send: null,
  'mail-taken': null,
  acknowledge: 'order.answer',
  quote: 'order.answer',
  'report-first-off': 'order.answer',
  'deliver-part': 'order.answer',
  'deliver-rest': 'order.answer',
  'accept-price': 'order.accept-price',
  'pass-over-quote': 'order.pass-over',
  'pass-over-first-off': 'order.pass-over',
  'accept-first-off': 'first-off.decide',
  'refuse-first-off': 'first-off.decide',
  hold: 'order.hold',
  resume: 'order.hold',
  close: 'order.close',
  cancel: 'order.cancel',
}

export interface OrderStep {
  readonly event: OrderEventName
  readonly actor: Actor
  readonly onBehalfOfMill?: boolean
  readonly note?: string
  readonly price?: string | null
  readonly promised?: string | null
}

/** Takes an order one step along its course and writes who, when and what was said. The order must be held. */
export async function takeOrderStep(tx: Tx, order: KnifeOrder, step: OrderStep): Promise<OrderEvent> {
  const from = order.state
  const to = stateAfter(order, step.event)
  await order.update(
    {
      state: to,
      heldFrom: to === 'held' ? from : null,
      refusals: order.refusals + (step.event === 'refuse-first-off' ? 1 : 0),
    },
    { transaction: tx },
  )
  const seq = (await OrderEvent.count({ where: { orderId: order.id }, transaction: tx })) + 1
  return OrderEvent.create(
    {
      orderId: order.id,
      seq,
      event: step.event,
      fromState: from,
      toState: to,
      actorId: step.actor.personId,
      actorName: step.actor.name,
      onBehalfOfMill: step.onBehalfOfMill ?? false,
      note: step.note ?? '',
      price: step.price ?? null,
      promised: step.promised ?? null,
      at: now(),
    },
    { transaction: tx },
  )
}

/** Resuming leads back to where the order was held; everything else is the table's. */
function stateAfter(order: KnifeOrder, event: OrderEventName): OrderStateName {
  const next = nextState(ORDER_COURSE, order.state, event)
  return event === 'resume' && order.heldFrom !== null ? order.heldFrom : next
}
