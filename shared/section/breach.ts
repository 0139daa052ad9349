/** A rule that one field of a member breaks: the field's path within the member, and what it is and must be. */
export interface Breach {
  readonly field: string
  readonly code: string
  readonly says: string
}

/** mm. A dimension is 0 or at least a nanometre: less is no dimension, and geometry on it is noise. */
export const LEAST_MM = 1e-6
