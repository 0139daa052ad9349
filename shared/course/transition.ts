import { Failure } from '@shared/failure'

/** A course: for each state, the events that may happen in it and the state each leads to. */
export type Course<State extends string, Event extends string> = Readonly<
  Record<State, Readonly<Partial<Record<Event, State>>>>
>

/** The state that an event leads to. Throws transition-not-allowed, naming the events that are allowed. */
export function nextState<State extends string, Event extends string>(
  course: Course<State, Event>,
  state: State,
  event: Event,
): State {
  const next = course[state][event]
  if (next === undefined) {
    const allowed = Object.keys(course[state])
    throw new Failure('transition-not-allowed', {
      says: `It is ${state} now, where "${event}" cannot happen${allowed.length > 0 ? `; what can: ${allowed.join(', ')}` : ''}.`,
      state,
      event,
      allowed,
    })
  }
  return next
}

/** The events that may happen in a state. */
export function eventsIn<State extends string, Event extends string>(
  course: Course<State, Event>,
  state: State,
): readonly Event[] {
  return Object.keys(course[state]) as Event[]
}
