import { randomUUID } from 'node:crypto'
import type { OrderInput } from '@shared/contracts'
import type { OrderStateName } from '@shared/course'
import { enterFile, storeBytes } from '@server/files/file-store'
import { composed } from '@server/mail/message'
import { database } from '@server/models/database'
import { Letter } from '@server/models/letter'
import { KnifeOrder, OrderSheet } from '@server/models/order'
import type { Issue } from '@server/models/review'
import { MillCard } from '@server/models/workshop'
import { makeLink } from '@server/services/links'
import { aMill, unique } from './people'
import { anIssue } from './review'

export const ORDER: OrderInput = {
  lengths: [{ length: 2440, count: 3 }],
  firstOff: 300,
  setupPieces: 2,
  species: 'basswood',
  moisture: 9,
  grade: 'clear on the face',
  sanding: '',
  notes: '',
  wantedBy: null,
}

export interface OrderWish {
  readonly issue?: Issue
  readonly millId?: string
  readonly state?: OrderStateName
}

/** A knife order with stand-ins for its three sheets. */
export async function anOrder(wish: OrderWish = {}): Promise<KnifeOrder> {
  const issue = wish.issue ?? (await anIssue({ state: 'approved' }))
  const millId = wish.millId ?? (await aMill()).id
  const card = await MillCard.findOne({ where: { millId }, rejectOnEmpty: true })
  const state = wish.state ?? 'sent'
  const order = await KnifeOrder.create({
    number: `T-${unique()}`,
    commissionId: issue.commissionId,
    issueId: issue.id,
    millId,
    millCardId: card.id,
    document: ORDER,
    state,
    heldFrom: state === 'held' ? 'sent' : null,
    byId: randomUUID(),
    at: new Date(),
  })
  await database().transaction(async (tx) => {
    for (const format of ['pdf', 'dxf', 'svg'] as const) {
      const stored = await storeBytes(Buffer.from(`${format} of ${order.number}`), 'text/plain')
      const file = await enterFile(tx, stored, new Date())
      await OrderSheet.create({ orderId: order.id, format, fileId: file.id }, { transaction: tx })
    }
  })
  return order
}

/** The secret of a link on which the mill acknowledges an order. */
export const anAcknowledgeToken = (order: KnifeOrder): Promise<string> =>
  database().transaction((tx) =>
    makeLink(tx, { purpose: 'acknowledge-order', subjectId: order.id, days: 60 }),
  )

/** A letter about an order, with one attachment; it is not due, so that no worker takes it. */
export async function aLetter(order: KnifeOrder, state: Letter['state'] = 'sent'): Promise<Letter> {
  const messageId = `<${randomUUID()}@listel.example>`
  const at = new Date()
  const words = { subject: 'A letter', text: 'Words', html: '<p>Words</p>' }
  const raw = await composed({
    messageId,
    from: { name: 'Workshop', address: 'workshop@listel.example' },
    to: 'mill@listel.example',
    ...words,
    attachments: [{ name: 'sheet.svg', type: 'image/svg+xml', bytes: Buffer.from('<svg/>') }],
    date: at,
  })
  const stored = await storeBytes(raw, 'message/rfc822')
  const file = await database().transaction((tx) => enterFile(tx, stored, at))
  return Letter.create({
    messageId,
    kind: 'knife-order',
    aboutType: 'order',
    aboutId: order.id,
    commissionId: order.commissionId,
    toAddress: 'mill@listel.example',
    ...words,
    rawFileId: file.id,
    state,
    dueAt: at,
    queuedAt: at,
    sentAt: state === 'sent' ? at : null,
  })
}
