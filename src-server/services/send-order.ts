import type { Actor } from '@shared/access'
import type { OrderRequest, OutputOf } from '@shared/contracts'
import { enterFile, storeBytes } from '../files/file-store'
import { knifeOrderLetter } from '../mail/letters/knife-order'
import { queueLetter } from '../mail/outbox'
import type { Attachment } from '../mail/outbox'
import type { LetterBody } from '../mail/letters/letter-body'
import { KnifeOrder, OrderSheet } from '../models/order'
import { now } from './clock'
import { installation } from './installation'
import { makeLink } from './links'
import { nextNumber, numberText } from './numbering'
import { onceOnly } from './operation'
import { takeOrderStep } from './order-course'
import { lengthsText, requireOrderParts } from './order-parts'
import type { OrderParts } from './order-parts'
import { requireIssue } from './require-issue'
import { readSettings } from './settings'
import { renderedSheet, SHEET_FORMATS, SHEET_TYPES, sheetNameOf } from './sheets'
import type { SheetFormat } from './sheets'
import { enterTrail } from './trail'
import { inTransaction } from './transaction'
import type { Tx } from './transaction'

const LINK_DAYS = 60

/** Makes a knife order and queues its letter, in one act: either both are there afterwards or neither. */
export const sendOrder = (
  actor: Actor,
  issueId: string,
  { operationId, ...request }: OutputOf<typeof OrderRequest>,
): Promise<string> =>
  inTransaction(async (tx) => {
    const reached = await requireIssue(issueId, { actor, right: 'order.send', tx, lock: true })
    return onceOnly(tx, { operationId, actor, request: { what: 'order', issueId, ...request } }, async () => {
      const number = numberText('K', await nextNumber(tx, 'knife-order'))
      const parts = await requireOrderParts(tx, { ...reached, request, number })
      return enterOrder(tx, actor, number, parts)
    })
  })

async function enterOrder(tx: Tx, actor: Actor, number: string, parts: OrderParts): Promise<string> {
  const { issue, commission, mill, card, document } = parts
  const order = await KnifeOrder.create(
    {
      number,
      commissionId: commission.id,
      issueId: issue.id,
      millId: mill.id,
      millCardId: card.id,
      document,
      state: 'prepared',
      byId: actor.personId,
      at: now(),
    },
    { transaction: tx },
  )
  const sheets = await sheetsOfOrder(parts)
  for (const { format, bytes } of sheets) {
    const file = await enterFile(tx, await storeBytes(bytes, SHEET_TYPES[format]), now())
    await OrderSheet.create({ orderId: order.id, format, fileId: file.id }, { transaction: tx })
  }
  const token = await makeLink(tx, { purpose: 'acknowledge-order', subjectId: order.id, days: LINK_DAYS })
  const body = await letterBodyOf(tx, parts, number, `${installation().publicUrl}/link/${token}`)
  await takeOrderStep(tx, order, { event: 'send', actor, note: `to ${mill.name}` })
  await queueLetter(tx, {
    kind: 'knife-order',
    about: { type: 'order', id: order.id, commissionId: commission.id },
    to: mill.email,
    body,
    attachments: sheets,
  })
  await enterTrail(tx, {
    commissionId: commission.id,
    actor,
    act: 'order-sent',
    says: `Sent knife order ${number} for issue ${issue.letter} to ${mill.name}`,
    document: {
      orderId: order.id,
      number,
      issueId: issue.id,
      sha256: issue.sha256,
      millId: mill.id,
      order: toKept(document),
    },
  })
  return order.id
}

const toKept = (document: OrderParts['document']) => ({
  ...document,
  lengths: document.lengths.map((one) => ({ ...one })),
})

interface OrderSheetFile extends Attachment {
  readonly format: SheetFormat
}

const sheetsOfOrder = ({ sheet, issue, commission }: OrderParts): Promise<OrderSheetFile[]> =>
  Promise.all(
    SHEET_FORMATS.map(async (format) => ({
      format,
      name: sheetNameOf(commission, issue, format),
      type: SHEET_TYPES[format],
      bytes: await renderedSheet(sheet, issue, format),
    })),
  )

async function letterBodyOf(tx: Tx, parts: OrderParts, number: string, link: string): Promise<LetterBody> {
  const { document: settings } = await readSettings(tx)
  const { issue, commission, mill, document, sheet } = parts
  return knifeOrderLetter({
    workshop: settings.workshop,
    signature: settings.signature,
    mill: mill.name,
    number,
    title: commission.title,
    commissionNumber: commission.number,
    accession: commission.accession,
    issueLetter: issue.letter,
    sha256: issue.sha256,
    lengths: lengthsText(document, settings.units),
    asked: sheet.mill ?? {},
    sheetNames: SHEET_FORMATS.map((format) => sheetNameOf(commission, issue, format)),
    notes: document.notes,
    wantedBy: document.wantedBy,
    link,
  })
}

export interface PreviewedLetter {
  readonly to: string
  readonly body: LetterBody
  readonly attachments: readonly Pick<Attachment, 'name' | 'type'>[]
}

/** The letter as it would go out. Nothing is written and nothing sent; its link is a sample that leads nowhere. */
export const previewOrder = (
  actor: Actor,
  issueId: string,
  request: Pick<OutputOf<typeof OrderRequest>, 'millId' | 'document'>,
): Promise<PreviewedLetter> =>
  inTransaction(async (tx) => {
    const reached = await requireIssue(issueId, { actor, right: 'order.send', tx })
    const number = 'K-0000'
    const parts = await requireOrderParts(tx, { ...reached, request, number })
    return {
      to: parts.mill.email,
      body: await letterBodyOf(tx, parts, number, `${installation().publicUrl}/link/made-when-it-is-sent`),
      attachments: SHEET_FORMATS.map((format) => ({
        name: sheetNameOf(parts.commission, parts.issue, format),
        type: SHEET_TYPES[format],
      })),
    }
  })
