/** The time, to the millisecond as the database keeps it. The one place of the server that asks the clock. */
export const now = (): Date => new Date()

/** Today in UTC, as 2026-12-01. */
export const today = (): string => now().toISOString().slice(0, 10)
