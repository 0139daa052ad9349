import { beginningAt, now } from '../services/clock'

const DAY_MS = 86_400_000

/** Does the work as if on an earlier day, at an hour of that day (UTC). */
export const onDay = <T>(daysAgo: number, hour: number, work: () => Promise<T>): Promise<T> => {
  const day = new Date(now().getTime() - daysAgo * DAY_MS)
  day.setUTCHours(Math.floor(hour), Math.round((hour % 1) * 60), 0, 0)
  return beginningAt(day, work)
}

/** A day counted from today, as 2026-12-01; negative: gone by. */
export const dayFromNow = (days: number): string =>
  new Date(now().getTime() + days * DAY_MS).toISOString().slice(0, 10)
