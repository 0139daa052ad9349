import type { LetterBriefView, LetterView, LinkView, OrderLineView, OrderView } from '@shared/contracts'
import type { Letter, LetterTry } from '../models/letter'
import type { KnifeOrder, OrderEvent } from '../models/order'
import type { Commission } from '../models/commission'
import type { Mill } from '../models/person'
import type { Issue } from '../models/review'
import type { MillCard } from '../models/workshop'

interface LetterWithOutcome {
  readonly letter: Letter
  readonly lastOutcome: string | null
}

interface OrderInList {
  readonly order: KnifeOrder
  readonly commission: Commission
  readonly issue: Issue
  readonly mill: Mill
}

export function presentOrder(
  whole: OrderInList & {
    readonly card: MillCard
    readonly events: readonly OrderEvent[]
    readonly letters: readonly LetterWithOutcome[]
    readonly currency: string
    readonly seesPrice: boolean
    readonly may: readonly OrderView['may'][number][]
  },
): OrderView {
  const { order, commission, issue, mill, card, events, letters, currency, seesPrice, may } = whole
  const { id, number, title, accession } = commission
  const price = events.findLast((one) => one.price !== null)?.price ?? null
  return {
    id: order.id,
    number: order.number,
    state: order.state,
    heldFrom: order.heldFrom,
    commission: { id, number, title, accession },
    issue: { id: issue.id, letter: issue.letter, sha256: issue.sha256, shapeSha256: issue.shapeSha256 },
    mill: { id: mill.id, name: mill.name, email: mill.email },
    card: card.document,
    document: order.document,
    refusals: order.refusals,
    ...(seesPrice ? { price: price === null ? null : plainMoney(price), currency } : {}),
    events: events.map((event) => presentEvent(event, seesPrice)),
    letters: letters.map(presentLetterBrief),
    may: [...may],
  }
}

/** DECIMAL comes back with four places: 240.0000 is shown as it was said, 240.00. */
const plainMoney = (text: string): string => text.replace(/(\.\d\d)0+$/, '$1')

function presentEvent(event: OrderEvent, seesPrice: boolean): OrderView['events'][number] {
  const { seq, fromState, toState, actorName, onBehalfOfMill, at, note, price, promised } = event
  return {
    seq,
    event: event.event,
    from: fromState,
    to: toState,
    by: actorName,
    onBehalfOfMill,
    at: at.toISOString(),
    note,
    ...(seesPrice ? { price: price === null ? null : plainMoney(price) } : {}),
    promised,
  }
}

export function presentOrderLine({ order, commission, issue, mill }: OrderInList): OrderLineView {
  const { id, number, title } = commission
  return {
    id: order.id,
    number: order.number,
    state: order.state,
    commission: { id, number, title },
    issueLetter: issue.letter,
    mill: mill.name,
    at: order.at.toISOString(),
  }
}

export function presentLetterBrief({ letter, lastOutcome }: LetterWithOutcome): LetterBriefView {
  const { id, kind, toAddress, subject, state, queuedAt, sentAt, tries } = letter
  return {
    id,
    kind,
    to: toAddress,
    subject,
    state,
    queuedAt: queuedAt.toISOString(),
    sentAt: sentAt?.toISOString() ?? null,
    tries,
    lastOutcome,
  }
}

export function presentLetter(
  whole: LetterWithOutcome & {
    readonly attempts: readonly LetterTry[]
    readonly attachments: readonly {
      readonly name: string
      readonly type: string
      readonly bytes: Uint8Array
    }[]
    readonly caught: boolean
  },
): LetterView {
  const { letter, attempts, attachments, caught } = whole
  return {
    ...presentLetterBrief(whole),
    messageId: letter.messageId,
    about: letter.aboutType,
    text: letter.text,
    html: letter.html,
    attachments: attachments.map(({ name, type, bytes }, index) => ({
      name,
      type,
      bytes: bytes.byteLength,
      index,
    })),
    attempts: attempts.map(({ no, at, outcome }) => ({ no, at: at.toISOString(), outcome })),
    caught,
  }
}

export function presentLink(shown: {
  readonly purpose: LinkView['purpose']
  readonly workshop: string
  readonly used: boolean
  readonly order: OrderInList | null
}): LinkView {
  const { purpose, workshop, used, order } = shown
  return {
    purpose,
    workshop,
    used,
    order:
      order === null
        ? null
        : {
            number: order.order.number,
            title: order.commission.title,
            issueLetter: order.issue.letter,
            mill: order.mill.name,
            state: order.order.state,
            lengths: order.order.document.lengths.map(({ length, count }) => ({ length, count })),
          },
  }
}
