import type { Course } from './transition'

export type CutListStateName = 'closed' | 'open' | 'done' | 'superseded'
export type CutListEventName = 'open' | 'finish' | 'reopen' | 'supersede'

/** The course of a cut list: closed to the bench until the first-off is accepted (or a manager opens it). */
export const CUT_LIST_COURSE: Course<CutListStateName, CutListEventName> = {
  closed: { open: 'open', supersede: 'superseded' },
  open: { finish: 'done', supersede: 'superseded' },
  done: { reopen: 'open', supersede: 'superseded' },
  superseded: {},
}
