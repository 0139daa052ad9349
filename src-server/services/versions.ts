import { Failure } from '@shared/failure'

/** Refuses a change that was made from an older version than the one that stands; the row must be locked. */
export function requireVersion(current: number, given: number): void {
  if (current === given) return
  throw new Failure('version-stale', {
    says: 'Somebody else changed this meanwhile; look at it again, then repeat your change.',
    version: current,
  })
}
