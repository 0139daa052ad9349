import { Failure } from '@shared/failure'
import type { Fault } from '@shared/failure'

/** One fault at a JSON pointer, or none where the rule is kept. `must` ends the sentence 'It is …; it must be'. */
export const faultUnless = (isKept: boolean, path: string, value: unknown, must: string): Fault[] =>
  isKept ? [] : [{ path, code: 'out-of-range', says: `${path} is ${String(value)}; it must be ${must}.` }]

export const isAmount = (value: number) => Number.isFinite(value) && value >= 0
export const isSize = (value: number) => Number.isFinite(value) && value > 0

/** Throws Failure 'input-invalid' with all faults, if there are any. */
export function refuseFaults(faults: readonly Fault[]): void {
  if (faults.length === 0) return
  throw new Failure('input-invalid', { says: faults.map(({ says }) => says).join(' '), faults })
}
