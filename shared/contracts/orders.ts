import { z } from 'zod'
import { MillCardDocument } from './people'
import {
  Day,
  Id,
  Instant,
  LengthMm,
  LongText,
  Money,
  OperationId,
  PositiveMm,
  Sha256,
  ShortText,
} from './scalars'

export const OrderState = z.enum([
  'prepared',
  'queued',
  'sent',
  'acknowledged',
  'quoted',
  'price-accepted',
  'first-off-reported',
  'first-off-accepted',
  'part-delivered',
  'delivered',
  'closed',
  'held',
  'cancelled',
])
export const OrderEventKind = z.enum([
  'send',
  'mail-taken',
  'acknowledge',
  'quote',
  'accept-price',
  'pass-over-quote',
  'report-first-off',
  'accept-first-off',
  'refuse-first-off',
  'pass-over-first-off',
  'deliver-part',
  'deliver-rest',
  'close',
  'hold',
  'resume',
  'cancel',
])

/** What is asked of the mill. Lengths: how many of which size. */
export const OrderDocument = z.strictObject({
  lengths: z
    .array(z.strictObject({ length: PositiveMm, count: z.int().min(1).max(10_000) }))
    .min(1)
    .max(50),
  firstOff: LengthMm,
  setupPieces: z.int().min(0).max(100),
  species: ShortText,
  moisture: z.number().min(0).max(30),
  grade: z.string().trim().max(200),
  sanding: z.string().trim().max(200),
  notes: z.string().trim().max(5000),
  wantedBy: Day.nullable(),
})
/** Makes the order and queues its letter in one act. `stopReason` is needed when a check says stop… it bars the order, so it is refused. */
export const OrderRequest = z.strictObject({ operationId: OperationId, millId: Id, document: OrderDocument })
export const OrderEventRequest = z.strictObject({
  operationId: OperationId,
  event: OrderEventKind.exclude(['send', 'mail-taken']),
  note: z.string().trim().max(5000),
  price: Money.nullable(),
  promised: Day.nullable(),
  /** With a delivery: the batch as measured. */
  batch: z
    .strictObject({
      trueWidth: PositiveMm,
      trueRebate: LengthMm,
      lengths: z
        .array(z.strictObject({ length: PositiveMm, count: z.int().min(1).max(10_000) }))
        .min(1)
        .max(50),
    })
    .nullable(),
})
/** `price` is absent for whoever may not see prices. */
export const OrderEventAnswer = z.strictObject({
  seq: z.int(),
  event: OrderEventKind,
  from: OrderState.nullable(),
  to: OrderState,
  by: z.string(),
  onBehalfOfMill: z.boolean(),
  at: Instant,
  note: z.string(),
  price: Money.nullable().optional(),
  promised: Day.nullable(),
})
export const LetterBrief = z.strictObject({
  id: Id,
  kind: z.string(),
  to: z.string(),
  subject: z.string(),
  state: z.enum(['queued', 'sending', 'sent', 'failed']),
  queuedAt: Instant,
  sentAt: Instant.nullable(),
  tries: z.int(),
  lastOutcome: z.string().nullable(),
})
export const OrderAnswer = z.strictObject({
  id: Id,
  number: z.string(),
  state: OrderState,
  heldFrom: OrderState.nullable(),
  commission: z.strictObject({ id: Id, number: z.string(), title: z.string(), accession: z.string() }),
  issue: z.strictObject({ id: Id, letter: z.string(), sha256: Sha256, shapeSha256: Sha256 }),
  mill: z.strictObject({ id: Id, name: z.string(), email: z.string() }),
  card: MillCardDocument,
  document: OrderDocument,
  refusals: z.int(),
  price: Money.nullable().optional(),
  currency: z.string().optional(),
  events: z.array(OrderEventAnswer),
  letters: z.array(LetterBrief),
  /** Events that the person asking may record now. */
  may: z.array(OrderEventKind),
})
export const OrderLine = z.strictObject({
  id: Id,
  number: z.string(),
  state: OrderState,
  commission: z.strictObject({ id: Id, number: z.string(), title: z.string() }),
  issueLetter: z.string(),
  mill: z.string(),
  at: Instant,
})
/** The letter as it would go out, nothing sent. */
export const LetterPreview = z.strictObject({
  to: z.string(),
  subject: z.string(),
  text: z.string(),
  html: z.string(),
  attachments: z.array(z.strictObject({ name: z.string(), type: z.string() })),
})
/** What a signed link shows, before anything is done. */
export const LinkAnswer = z.strictObject({
  purpose: z.enum(['acknowledge-order', 'first-manager']),
  workshop: z.string(),
  used: z.boolean(),
  order: z
    .strictObject({
      number: z.string(),
      title: z.string(),
      issueLetter: z.string(),
      mill: z.string(),
      state: OrderState,
      lengths: z.array(z.strictObject({ length: z.number(), count: z.int() })),
    })
    .nullable(),
})
export const LinkAcknowledgeRequest = z.strictObject({ name: ShortText, note: z.string().trim().max(5000) })

// ---- post --------------------------------------------------------------------------------------------------------

export const LetterAnswer = LetterBrief.extend({
  messageId: z.string(),
  about: z.string(),
  text: z.string(),
  html: z.string(),
  attachments: z.array(
    z.strictObject({ name: z.string(), type: z.string(), bytes: z.int(), index: z.int() }),
  ),
  attempts: z.array(z.strictObject({ no: z.int(), at: Instant, outcome: z.string() })),
  /** Whether the workshop's own stand-in for a mail provider caught it, so that it can be opened as it arrived. */
  caught: z.boolean(),
})
export const Reason = LongText

export type OrderStateName = z.infer<typeof OrderState>
export type OrderEventName = z.infer<typeof OrderEventKind>
export type OrderView = z.infer<typeof OrderAnswer>
export type OrderLineView = z.infer<typeof OrderLine>
export type OrderInput = z.infer<typeof OrderDocument>
export type LetterView = z.infer<typeof LetterAnswer>
export type LetterBriefView = z.infer<typeof LetterBrief>
export type LinkView = z.infer<typeof LinkAnswer>
