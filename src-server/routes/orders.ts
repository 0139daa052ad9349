import {
  IdParams,
  LetterPreview,
  OrderAnswer,
  OrderEventRequest,
  OrderRequest,
  OrdersAnswer,
  SheetParams,
} from '@shared/contracts'
import { presentOrder, presentOrderLine } from '../presenters/orders'
import { listOrders, listOrdersOfCommission, readOrder, readOrderSheet } from '../services/orders'
import { recordOrderEvent } from '../services/record-order-event'
import { previewOrder, sendOrder } from '../services/send-order'
import { route } from './route'

const sendOrderRoute = route({
  method: 'post',
  path: '/issues/:id/orders',
  right: 'order.send',
  see: 'issue.read',
  params: IdParams,
  body: OrderRequest,
  answer: OrderAnswer,
  handle: async ({ actor, params, body }) =>
    presentOrder(await readOrder(actor, await sendOrder(actor, params.id, body))),
})

const previewOrderRoute = route({
  method: 'post',
  path: '/issues/:id/orders/preview',
  right: 'order.send',
  see: 'issue.read',
  params: IdParams,
  body: OrderRequest,
  answer: LetterPreview,
  handle: async ({ actor, params, body }) => {
    const { to, body: letter, attachments } = await previewOrder(actor, params.id, body)
    return { to, ...letter, attachments: attachments.map(({ name, type }) => ({ name, type })) }
  },
})

const listOrdersRoute = route({
  method: 'get',
  path: '/orders',
  right: 'order.list',
  answer: OrdersAnswer,
  handle: async ({ actor }) => (await listOrders(actor)).map(presentOrderLine),
})

const listOrdersOfCommissionRoute = route({
  method: 'get',
  path: '/commissions/:id/orders',
  right: 'order.send',
  see: 'commission.read',
  params: IdParams,
  answer: OrdersAnswer,
  handle: async ({ actor, params }) => (await listOrdersOfCommission(actor, params.id)).map(presentOrderLine),
})

const readOrderRoute = route({
  method: 'get',
  path: '/orders/:id',
  right: 'order.read',
  params: IdParams,
  answer: OrderAnswer,
  handle: async ({ actor, params }) => presentOrder(await readOrder(actor, params.id)),
})

const recordOrderEventRoute = route({
  method: 'post',
  path: '/orders/:id/events',
  right: 'order.read',
  params: IdParams,
  body: OrderEventRequest,
  answer: OrderAnswer,
  handle: async ({ actor, params, body }) =>
    presentOrder(await readOrder(actor, await recordOrderEvent(actor, params.id, body))),
})

const readOrderSheetRoute = route({
  method: 'get',
  path: '/orders/:id/sheet.:format',
  right: 'order.read',
  params: SheetParams,
  answer: 'file',
  handle: ({ actor, params }) => readOrderSheet(actor, params.id, params.format),
})

export const ORDER_ROUTES = [
  sendOrderRoute,
  previewOrderRoute,
  listOrdersRoute,
  listOrdersOfCommissionRoute,
  readOrderRoute,
  recordOrderEventRoute,
  readOrderSheetRoute,
]
