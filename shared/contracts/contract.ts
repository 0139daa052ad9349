import type { z } from 'zod'
import { Failure } from '@shared/failure'
import type { Fault } from '@shared/failure'
import { faultsOf } from './faults'

/** A validator of ours, seen from outside this folder. */
export type Contract<Output = unknown> = z.ZodType<Output>
export type OutputOf<C extends Contract> = z.output<C>

/** What the contract makes of the input. Throws input-invalid with every fault. */
export function requireValid<C extends Contract>(contract: C, input: unknown): OutputOf<C> {
  const result = readDeep(contract, input)
  if (result.success) return result.data
  throw invalid(faultsOf(result.error, input))
}

/** The failure that tells all faults, the first of them in its one sentence. */
export function invalid(faults: readonly Fault[]): Failure {
  const [first] = faults
  const more = faults.length > 1 ? ` (and ${faults.length - 1} more)` : ''
  const says = first === undefined ? 'What was given cannot be read.' : `${first.path} ${first.says}`.trim()
  return new Failure('input-invalid', { says: says + more, faults })
}

function readDeep<C extends Contract>(contract: C, input: unknown): z.ZodSafeParseResult<OutputOf<C>> {
  try {
    return contract.safeParse(input) as z.ZodSafeParseResult<OutputOf<C>>
  } catch (error) {
    // A few thousand levels of nesting are more than the stack holds.
    if (!(error instanceof RangeError)) throw error
    throw invalid([{ path: '', code: 'too-deep', says: 'is nested too deeply to be read; flatten it.' }])
  }
}
