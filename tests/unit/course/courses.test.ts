import { describe, expect, it } from 'vitest'
import {
  CUT_LIST_COURSE,
  eventsIn,
  ISSUE_COURSE,
  isFirstOffSettled,
  isOrderOpen,
  issueLetterOf,
  nextState,
  ORDER_COURSE,
} from '@shared/course'
import type { Course } from '@shared/course'
import { Failure } from '@shared/failure'

/** Every pair of a state and an event, as `state event → next`, or `-` where it must be refused. */
function pairsOf<S extends string, E extends string>(course: Course<S, E>, events: readonly E[]): string[] {
  return (Object.keys(course) as S[])
    .flatMap((state) =>
      events.map((event) => {
        try {
          return `${state} ${event} ${nextState(course, state, event)}`
        } catch (error) {
          expect(error).toBeInstanceOf(Failure)
          expect((error as Failure).code).toBe('transition-not-allowed')
          return ''
        }
      }),
    )
    .filter((line) => line !== '')
}
const eventsOf = <S extends string, E extends string>(course: Course<S, E>) => [
  ...new Set((Object.keys(course) as S[]).flatMap((state) => eventsIn(course, state))),
]

describe('the knife order', () => {
  it('goes from prepared to closed by the steps that the trade takes', () => {
    const steps = [
      'send',
      'mail-taken',
      'acknowledge',
      'quote',
      'accept-price',
      'report-first-off',
      'accept-first-off',
      'deliver-part',
      'deliver-rest',
      'close',
    ] as const
    const states = steps.reduce<string[]>(
      (seen, event) => [...seen, nextState(ORDER_COURSE, (seen.at(-1) ?? 'prepared') as 'prepared', event)],
      [],
    )
    expect(states).toEqual([
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
    ])
  })

  it('goes back to price accepted when the first-off is refused', () => {
    expect(nextState(ORDER_COURSE, 'first-off-reported', 'refuse-first-off')).toBe('price-accepted')
  })

  it('can be held and cancelled from any state before closed, and from none after', () => {
    for (const state of [
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
    ] as const) {
      expect(nextState(ORDER_COURSE, state, 'hold')).toBe('held')
      expect(nextState(ORDER_COURSE, state, 'cancel')).toBe('cancelled')
    }
    expect(eventsIn(ORDER_COURSE, 'closed')).toEqual([])
    expect(eventsIn(ORDER_COURSE, 'cancelled')).toEqual([])
    expect(eventsIn(ORDER_COURSE, 'held')).toEqual(['resume', 'cancel'])
  })

  it('allows nothing else: 20 states of holding and cancelling, and the steps above with their short cuts', () => {
    const others = pairsOf(ORDER_COURSE, eventsOf(ORDER_COURSE)).filter(
      (line) => !/ (hold|cancel|resume) /.test(line),
    )
    expect(others.sort()).toEqual(
      [
        'prepared send queued',
        'queued mail-taken sent',
        'queued acknowledge acknowledged',
        'sent acknowledge acknowledged',
        'acknowledged quote quoted',
        'acknowledged pass-over-quote price-accepted',
        'quoted quote quoted',
        'quoted accept-price price-accepted',
        'price-accepted report-first-off first-off-reported',
        'price-accepted pass-over-first-off first-off-accepted',
        'first-off-reported accept-first-off first-off-accepted',
        'first-off-reported refuse-first-off price-accepted',
        'first-off-accepted deliver-part part-delivered',
        'first-off-accepted deliver-rest delivered',
        'part-delivered deliver-part part-delivered',
        'part-delivered deliver-rest delivered',
        'delivered close closed',
      ].sort(),
    )
  })

  it('lets moulding be cut only once the first-off is settled', () => {
    const settled = (Object.keys(ORDER_COURSE) as (keyof typeof ORDER_COURSE)[]).filter(isFirstOffSettled)
    expect(settled).toEqual(['first-off-accepted', 'part-delivered', 'delivered', 'closed'])
    expect(isOrderOpen('held')).toBe(true)
    expect(isOrderOpen('closed') || isOrderOpen('cancelled')).toBe(false)
  })
})

describe('the issue of a drawing', () => {
  it('allows exactly these steps', () => {
    expect(pairsOf(ISSUE_COURSE, eventsOf(ISSUE_COURSE)).sort()).toEqual(
      [
        'put-forward approve approved',
        'put-forward return returned',
        'put-forward supersede superseded',
        'returned supersede superseded',
        'approved withdraw withdrawn',
        'approved supersede superseded',
        'withdrawn approve approved',
        'withdrawn return returned',
        'withdrawn supersede superseded',
      ].sort(),
    )
  })

  it('is lettered as drawings are', () => {
    expect([0, 1, 25, 26, 27, 51, 52, 701, 702].map(issueLetterOf)).toEqual([
      'A',
      'B',
      'Z',
      'AA',
      'AB',
      'AZ',
      'BA',
      'ZZ',
      'AAA',
    ])
  })
})

describe('the cut list', () => {
  it('allows exactly these steps', () => {
    expect(pairsOf(CUT_LIST_COURSE, eventsOf(CUT_LIST_COURSE)).sort()).toEqual(
      [
        'closed open open',
        'closed supersede superseded',
        'open finish done',
        'open supersede superseded',
        'done reopen open',
        'done supersede superseded',
      ].sort(),
    )
  })
})
