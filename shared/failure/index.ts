export { Failure, assertNever } from './failure'
export type { FailureCode, FailureDetails, Fault } from './failure'
