import { can } from '@shared/access'
import type { Actor, Facts, Right } from '@shared/access'
import { Failure } from '@shared/failure'

/** Answers as if the thing were not there (404) when the actor may not even see it. */
export function requireSeen(actor: Actor, right: Right, facts: Facts): void {
  if (!can(actor, right, facts)) throw notFound()
}

/** Refuses (403) what the actor may see but not do; ask requireSeen first. */
export function requireRight(actor: Actor, right: Right, facts: Facts): void {
  if (!can(actor, right, facts)) throw rightMissing(right)
}

export const notFound = (): Failure =>
  new Failure('not-found', { says: 'There is nothing here, or it is not yours to see.' })

export const rightMissing = (right: Right): Failure =>
  new Failure('right-missing', {
    says: 'Your part in the workshop does not include this; ask the workshop manager.',
    right,
  })

/** The named job of the system that acts for the workshop where no person does. */
export const SYSTEM_ACTOR: Actor = {
  personId: '00000000-0000-7000-8000-000000000000',
  name: 'Listel',
  memberships: [],
}
