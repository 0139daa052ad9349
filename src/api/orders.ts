import { OrderAnswer, OrdersAnswer } from '@shared/contracts'
import type { OrderEventRequest, OutputOf } from '@shared/contracts'
import { addressOf, ask, send } from './request'
import type { SheetForm } from './issues'

export const readOrders = (signal?: AbortSignal) => ask(OrdersAnswer, ['orders'], { signal })
export const readOrdersOf = (commissionId: string, signal?: AbortSignal) =>
  ask(OrdersAnswer, ['commissions', commissionId, 'orders'], { signal })
export const readOrder = (id: string, signal?: AbortSignal) => ask(OrderAnswer, ['orders', id], { signal })
export const recordOrderEvent = (id: string, body: OutputOf<typeof OrderEventRequest>) =>
  send(OrderAnswer, 'POST', ['orders', id, 'events'], { body })
/** The sheet as it was sent, byte for byte. */
export const orderSheetAddress = (id: string, form: SheetForm) => addressOf(['orders', id, `sheet.${form}`])
