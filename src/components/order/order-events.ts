import type { OrderEventName } from '@shared/contracts'

/** Events that a person records: the machine's own (sent, taken by the mail server) are not among them. */
export type RecordedEvent = Exclude<OrderEventName, 'send' | 'mail-taken'>

/** How an event is asked for. */
export interface EventAsk {
  /** On the button and the title of its dialog. */
  readonly act: string
  readonly says: string
  /** Whether a note must be given by whoever records it, whoever that is. */
  readonly reason: 'needed' | 'optional'
  readonly reasonLabel: string
  readonly asks: 'nothing' | 'quote' | 'delivery'
  /** The mill's own to say: staff who record it must note how the mill's word reached them. */
  readonly isMills: boolean
  readonly tone: 'forward' | 'side'
}

const mills = (act: string, says: string, asks: EventAsk['asks'] = 'nothing'): EventAsk => ({
  act,
  says,
  asks,
  reason: 'optional',
  reasonLabel: 'Note',
  isMills: true,
  tone: 'forward',
})
const ours = (act: string, says: string): EventAsk => ({ ...mills(act, says), isMills: false })
const withReason = (act: string, says: string): EventAsk => ({
  ...ours(act, says),
  reason: 'needed',
  reasonLabel: 'Reason',
  tone: 'side',
})

/** Events as the workshop words them; `firstOff` is its word for the first piece. */
export const eventAsksOf = (firstOff: string) =>
  ({
    acknowledge: mills(
      'Acknowledge',
      'The mill has the order and can read the drawings. It binds nobody yet.',
    ),
    quote: mills(
      'Give the price',
      'The price for the knife and the lengths, and the day they are promised.',
      'quote',
    ),
    'accept-price': ours(
      'Accept the price',
      `The mill may grind the knife. Nothing more is run before the ${firstOff} is accepted in writing.`,
    ),
    'pass-over-quote': withReason(
      'Go on without a price',
      'No price was asked for or given; the reason is kept with the order.',
    ),
    'report-first-off': mills(`Report the ${firstOff}`, `The ${firstOff} is run and can be looked at.`),
    'accept-first-off': ours(
      `Accept the ${firstOff}`,
      `The ${firstOff} was held against the sheet and is right. The mill may run the lengths.`,
    ),
    'refuse-first-off': withReason(
      `Refuse the ${firstOff}`,
      'Say what is wrong with it: the mill corrects the knife and runs another.',
    ),
    'pass-over-first-off': withReason(
      `Go on without a ${firstOff}`,
      'Lengths are run unseen. The reason is kept with the order.',
    ),
    'deliver-part': mills(
      'Part delivered',
      'What came goes on the rack with its true sizes, as measured on it.',
      'delivery',
    ),
    'deliver-rest': mills(
      'All delivered',
      'What came goes on the rack with its true sizes, as measured on it.',
      'delivery',
    ),
    close: ours('Close the order', 'Nothing more is expected of the mill.'),
    hold: withReason(
      'Hold',
      'The mill is told to stop, and asked to say that it has. Nothing is cut until the order is resumed.',
    ),
    resume: ours('Resume', 'The order goes on from where it was held.'),
    cancel: withReason('Cancel the order', 'It ends here. What was sent stays on record.'),
  }) satisfies Record<RecordedEvent, EventAsk>

export const isRecordedEvent = (event: OrderEventName): event is RecordedEvent =>
  event !== 'send' && event !== 'mail-taken'

/** An event that happened, in the past. */
export const eventWordsOf = (firstOff: string) =>
  ({
    send: 'Made and queued',
    'mail-taken': 'Sent: the mail server took the letter',
    acknowledge: 'Acknowledged',
    quote: 'Price given',
    'accept-price': 'Price accepted',
    'pass-over-quote': 'Gone on without a price',
    'report-first-off': `${firstOff} reported`,
    'accept-first-off': `${firstOff} accepted`,
    'refuse-first-off': `${firstOff} refused`,
    'pass-over-first-off': `Gone on without a ${firstOff}`,
    'deliver-part': 'Part delivered',
    'deliver-rest': 'All delivered',
    close: 'Closed',
    hold: 'Held',
    resume: 'Resumed',
    cancel: 'Cancelled',
  }) satisfies Record<OrderEventName, string>
