import type { IssueStateName, LetterBriefView, OrderStateName, RackPieceView } from '@shared/contracts'
import type { CutListStateName } from '@shared/course'

/** How a state is shown: always a word, with a sign and a colour that say the same. */
export interface StateLook {
  readonly word: string
  readonly sign: 'tick' | 'look' | 'stop' | 'waits' | 'none'
  readonly tone: 'done' | 'look' | 'stop' | 'waits' | 'quiet'
}

const done = (word: string): StateLook => ({ word, sign: 'tick', tone: 'done' })
const waits = (word: string): StateLook => ({ word, sign: 'waits', tone: 'waits' })
const look = (word: string): StateLook => ({ word, sign: 'look', tone: 'look' })
const stop = (word: string): StateLook => ({ word, sign: 'stop', tone: 'stop' })
const quiet = (word: string): StateLook => ({ word, sign: 'none', tone: 'quiet' })

export const ISSUE_LOOKS = {
  'put-forward': waits('Put forward'),
  returned: look('Returned'),
  approved: done('Approved'),
  withdrawn: stop('Approval withdrawn'),
  superseded: quiet('Superseded'),
} satisfies Record<IssueStateName, StateLook>

/** The first-off is said in the words of the workshop, which are passed in. */
export const orderLooksOf = (firstOff: string) =>
  ({
    prepared: quiet('Prepared'),
    queued: waits('Queued'),
    sent: waits('Sent'),
    acknowledged: waits('Acknowledged'),
    quoted: look('Quoted'),
    'price-accepted': waits('Price accepted'),
    'first-off-reported': look(`${firstOff} reported`),
    'first-off-accepted': done(`${firstOff} accepted`),
    'part-delivered': waits('Part delivered'),
    delivered: done('Delivered'),
    closed: done('Closed'),
    held: stop('Held'),
    cancelled: quiet('Cancelled'),
  }) satisfies Record<OrderStateName, StateLook>

export const CUT_LIST_LOOKS = {
  closed: waits('Not open yet'),
  open: look('Open'),
  done: done('All cut'),
  superseded: quiet('Superseded'),
} satisfies Record<CutListStateName, StateLook>

export const LETTER_LOOKS = {
  queued: waits('Queued'),
  sending: waits('Being sent'),
  sent: done('Sent'),
  failed: stop('Failed'),
} satisfies Record<LetterBriefView['state'], StateLook>

export const PIECE_LOOKS = {
  'on-rack': done('On the rack'),
  reserved: waits('Reserved'),
  used: quiet('Used'),
  scrapped: quiet('Scrapped'),
} satisfies Record<RackPieceView['state'], StateLook>
