import { useSessionStore } from '@/stores/session'

/** Days and moments as this person reads them. */
export function useDates() {
  const session = useSessionStore()
  const locale = () => (session.vocabulary === 'molding' ? 'en-US' : 'en-GB')
  const print = (instant: Date, options: Intl.DateTimeFormatOptions) =>
    new Intl.DateTimeFormat(locale(), options).format(instant)

  return {
    /** A day such as 2026-12-01, which belongs to no time zone: 1 December 2026 */
    printDay: (day: string) =>
      print(new Date(`${day}T12:00:00Z`), {
        day: 'numeric',
        month: 'short',
        year: 'numeric',
        timeZone: 'UTC',
      }),
    /** The day of a moment, in the time of this place. */
    printDayOf: (instant: string) =>
      print(new Date(instant), { day: 'numeric', month: 'short', year: 'numeric' }),
    /** A moment, in the time of this place: 1 Dec 2026, 10:42 */
    printMoment: (instant: string) =>
      print(new Date(instant), {
        day: 'numeric',
        month: 'short',
        year: 'numeric',
        hour: '2-digit',
        minute: '2-digit',
      }),
    printTime: (instant: string) => print(new Date(instant), { hour: '2-digit', minute: '2-digit' }),
    /** Today in the time of this place, as 2026-12-01. */
    today: () => dayOf(new Date()),
  }
}

function dayOf(date: Date): string {
  const two = (n: number) => String(n).padStart(2, '0')
  return `${date.getFullYear()}-${two(date.getMonth() + 1)}-${two(date.getDate())}`
}
