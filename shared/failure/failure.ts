/** Every rule that can be broken has a code; wording is the client's job, the HTTP status the error handler's. */
export type FailureCode =
  | 'input-invalid'
  | 'not-signed-in'
  | 'sign-in-refused'
  | 'too-many-tries'
  | 'right-missing'
  | 'not-found'
  | 'version-stale'
  | 'transition-not-allowed'
  | 'not-ready'
  | 'operation-reused'
  | 'already-exists'
  | 'file-refused'
  | 'file-too-large'
  | 'no-plan'
  | 'link-spent'
  | 'out-of-service'

/** One fault found in what was given: where (JSON pointer), which rule, and in words what it is and what it must be. */
export interface Fault {
  readonly path: string
  readonly code: string
  readonly says: string
}

/** Plain JSON data that goes with a failure to whoever asked; never anything that is not theirs to see. */
export interface FailureDetails {
  readonly faults?: readonly Fault[]
  readonly says?: string
  readonly [key: string]: unknown
}

/** The one class thrown for a broken rule. Anything else that is thrown is a defect. */
export class Failure extends Error {
  readonly code: FailureCode
  readonly details: FailureDetails

  constructor(code: FailureCode, details: FailureDetails = {}, options: { cause?: unknown } = {}) {
    super(details.says ?? code, options)
    this.name = 'Failure'
    this.code = code
    this.details = details
  }
}

/** Makes an unhandled kind a compile error, and at run time a loud one instead of a silent zero. */
export function assertNever(value: never): never {
  throw new TypeError(`unhandled kind: ${JSON.stringify(value)}`)
}
