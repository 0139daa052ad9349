import { beginningAt, wallTime } from '../services/clock'

const DAY_MS = 86_400_000

/** Does the work as if on an earlier day, at an hour of that day (UTC). */
export const onDay = <T>(daysAgo: number, hour: number, work: () => Promise<T>): Promise<T> =>
  beginningAt(timeOn(daysAgo, hour), work)

/** An hour (UTC) of an earlier day. */
export function timeOn(daysAgo: number, hour: number): Date {
  const day = new Date(wallTime().getTime() - daysAgo * DAY_MS)
  day.setUTCHours(Math.floor(hour), Math.round((hour % 1) * 60), 0, 0)
  return day
}

/** A day counted from today, as 2026-12-01; negative: gone by. */
export const dayFromNow = (days: number): string =>
  new Date(wallTime().getTime() + days * DAY_MS).toISOString().slice(0, 10)
