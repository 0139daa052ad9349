import { Op } from 'sequelize'
import type { WhereOptions } from 'sequelize'
import { can, isOfWorkshop, millIdsOf } from '@shared/access'
import type { Actor } from '@shared/access'
import { eventsIn, ORDER_COURSE } from '@shared/course'
import type { OrderEventName } from '@shared/course'
import { pathOf } from '../files/file-store'
import { fileAnswer } from '../files/file-answer'
import type { FileAnswer } from '../files/file-answer'
import { Commission } from '../models/commission'
import { StoredFile } from '../models/file'
import { Letter, LetterTry } from '../models/letter'
import { KnifeOrder, OrderEvent, OrderSheet } from '../models/order'
import { Mill } from '../models/person'
import { Issue } from '../models/review'
import { MillCard } from '../models/workshop'
import { RIGHT_OF_EVENT } from './order-course'
import { requireCommission } from './require-commission'
import { factsOfOrder, requireOrder } from './require-order'
import { notFound } from './rights'
import { readSettings } from './settings'
import { SHEET_TYPES, sheetNameOf } from './sheets'
import type { SheetFormat } from './sheets'

export interface LetterWithOutcome {
  readonly letter: Letter
  readonly lastOutcome: string | null
}

/** An order with all that hangs on it, as far as the actor may see. */
export interface WholeOrder {
  readonly order: KnifeOrder
  readonly commission: Commission
  readonly issue: Issue
  readonly mill: Mill
  readonly card: MillCard
  readonly events: readonly OrderEvent[]
  readonly letters: readonly LetterWithOutcome[]
  readonly currency: string
  readonly seesPrice: boolean
  readonly may: readonly OrderEventName[]
}

export interface OrderInList {
  readonly order: KnifeOrder
  readonly commission: Commission
  readonly issue: Issue
  readonly mill: Mill
}

/** Orders that the actor may see, the latest first: staff all, a mill those addressed to it. */
export async function listOrders(actor: Actor): Promise<OrderInList[]> {
  const staff = can(actor, 'order.list') && isOfWorkshop(actor)
  return ordersWhere(staff ? {} : { millId: { [Op.in]: [...millIdsOf(actor)] } })
}

export async function listOrdersOfCommission(actor: Actor, commissionId: string): Promise<OrderInList[]> {
  await requireCommission(commissionId, { actor, right: 'order.send' })
  return ordersWhere({ commissionId })
}

async function ordersWhere(where: WhereOptions<KnifeOrder>): Promise<OrderInList[]> {
  const orders = await KnifeOrder.findAll({ where, order: [['number', 'DESC']] })
  const byId = async <Row extends { readonly id: string }>(rows: Promise<Row[]>) =>
    new Map((await rows).map((row) => [row.id, row]))
  const commissions = await byId(Commission.findAll({ where: { id: orders.map((one) => one.commissionId) } }))
  const issues = await byId(Issue.findAll({ where: { id: orders.map((one) => one.issueId) } }))
  const mills = await byId(Mill.findAll({ where: { id: orders.map((one) => one.millId) } }))
  return orders.map((order) => ({
    order,
    commission: found(commissions, order.commissionId),
    issue: found(issues, order.issueId),
    mill: found(mills, order.millId),
  }))
}

function found<Row>(rows: ReadonlyMap<string, Row>, id: string): Row {
  const row = rows.get(id)
  if (row === undefined) throw new Error(`row ${id} is missing`)
  return row
}

export async function readOrder(actor: Actor, id: string): Promise<WholeOrder> {
  const { order, commission } = await requireOrder(id, { actor, right: 'order.read' })
  const isStaff = can(actor, 'order.send')
  return {
    order,
    commission,
    issue: await Issue.findByPk(order.issueId, { rejectOnEmpty: true }),
    mill: await Mill.findByPk(order.millId, { rejectOnEmpty: true }),
    card: await MillCard.findByPk(order.millCardId, { rejectOnEmpty: true }),
    events: await OrderEvent.findAll({ where: { orderId: id }, order: [['seq', 'ASC']] }),
    letters: isStaff ? await lettersOf(id) : [],
    currency: (await readSettings()).document.currency,
    seesPrice: can(actor, 'order.see-price', factsOfOrder(order)),
    may: eventsIn(ORDER_COURSE, order.state).filter((event) => {
      const right = RIGHT_OF_EVENT[event]
      return right !== null && can(actor, right, factsOfOrder(order))
    }),
  }
}

async function lettersOf(orderId: string): Promise<LetterWithOutcome[]> {
  const letters = await Letter.findAll({
    where: { aboutType: 'order', aboutId: orderId },
    order: [['queuedAt', 'ASC']],
  })
  return withOutcomes(letters)
}

/** Each letter with what came of its last try. */
export async function withOutcomes(letters: readonly Letter[]): Promise<LetterWithOutcome[]> {
  const tries = await LetterTry.findAll({
    where: { letterId: letters.map(({ id }) => id) },
    order: [['no', 'ASC']],
  })
  const last = new Map(tries.map(({ letterId, outcome }) => [letterId, outcome]))
  return letters.map((letter) => ({ letter, lastOutcome: last.get(letter.id) ?? null }))
}

/** The sheet as it went to the mill, byte for byte. */
export async function readOrderSheet(actor: Actor, id: string, format: SheetFormat): Promise<FileAnswer> {
  const { order, commission } = await requireOrder(id, { actor, right: 'order.read' })
  const sheet = await OrderSheet.findOne({ where: { orderId: id, format } })
  if (sheet === null) throw notFound()
  const file = await StoredFile.findByPk(sheet.fileId, { rejectOnEmpty: true })
  const issue = await Issue.findByPk(order.issueId, { rejectOnEmpty: true })
  return fileAnswer({
    from: { path: pathOf(file.sha256) },
    type: SHEET_TYPES[format],
    name: sheetNameOf(commission, issue, format),
    inline: format === 'pdf',
    cache: 'forever',
  })
}
