import { AsyncLocalStorage } from 'node:async_hooks'

const begun = new AsyncLocalStorage<{ readonly aheadMs: number }>()

/** The time, to the millisecond as the database keeps it. The one place of the server that asks the clock. */
export const now = (): Date => new Date(Date.now() + (begun.getStore()?.aheadMs ?? 0))

/** The time on the wall, also within work that began at another. */
export const wallTime = (): Date => new Date()

/** Today in UTC, as 2026-12-01. */
export const today = (): string => now().toISOString().slice(0, 10)

/** Does the work as if it began at another time, from when its clock runs on: how a demo comes to have a past. */
export const beginningAt = <T>(start: Date, work: () => Promise<T>): Promise<T> =>
  begun.run({ aheadMs: start.getTime() - Date.now() }, work)
