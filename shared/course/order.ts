import type { Course } from './transition'

export type OrderStateName =
  | 'prepared'
  | 'queued'
  | 'sent'
  | 'acknowledged'
  | 'quoted'
  | 'price-accepted'
  | 'first-off-reported'
  | 'first-off-accepted'
  | 'part-delivered'
  | 'delivered'
  | 'closed'
  | 'held'
  | 'cancelled'

export type OrderEventName =
  | 'send'
  | 'mail-taken'
  | 'acknowledge'
  | 'quote'
  | 'accept-price'
  | 'pass-over-quote'
  | 'report-first-off'
  | 'accept-first-off'
  | 'refuse-first-off'
  | 'pass-over-first-off'
  | 'deliver-part'
  | 'deliver-rest'
  | 'close'
  | 'hold'
  | 'resume'
  | 'cancel'

/**
 * The course of a knife order. `hold` remembers the state it came from; `resume` leads back there, so its target
 * in the table is only the name `held`: services put the remembered state in its place.
 */
export const ORDER_COURSE: Course<OrderStateName, OrderEventName> = {
  prepared: { send: 'queued', cancel: 'cancelled', hold: 'held' },
  // A mill may answer by telephone before the mail server has taken the letter.
  queued: { 'mail-taken': 'sent', acknowledge: 'acknowledged', hold: 'held', cancel: 'cancelled' },
  sent: { acknowledge: 'acknowledged', hold: 'held', cancel: 'cancelled' },
  acknowledged: { quote: 'quoted', 'pass-over-quote': 'price-accepted', hold: 'held', cancel: 'cancelled' },
  quoted: { quote: 'quoted', 'accept-price': 'price-accepted', hold: 'held', cancel: 'cancelled' },
  'price-accepted': {
    'report-first-off': 'first-off-reported',
    'pass-over-first-off': 'first-off-accepted',
    hold: 'held',
    cancel: 'cancelled',
  },
  'first-off-reported': {
    'accept-first-off': 'first-off-accepted',
    'refuse-first-off': 'price-accepted',
    hold: 'held',
    cancel: 'cancelled',
  },
  'first-off-accepted': {
    'deliver-part': 'part-delivered',
    'deliver-rest': 'delivered',
    hold: 'held',
    cancel: 'cancelled',
  },
  'part-delivered': {
    'deliver-part': 'part-delivered',
    'deliver-rest': 'delivered',
    hold: 'held',
    cancel: 'cancelled',
  },
  delivered: { close: 'closed', hold: 'held', cancel: 'cancelled' },
  closed: {},
  held: { resume: 'held', cancel: 'cancelled' },
  cancelled: {},
}

/** Whether moulding of this order may be cut: only after the first-off was accepted (or passed over, with a reason). */
export function isFirstOffSettled(state: OrderStateName): boolean {
  return (
    state === 'first-off-accepted' ||
    state === 'part-delivered' ||
    state === 'delivered' ||
    state === 'closed'
  )
}

/** Whether the order still runs, so that a later issue must ask what becomes of it. */
export function isOrderOpen(state: OrderStateName): boolean {
  return state !== 'closed' && state !== 'cancelled'
}
