import type { Failure } from '@shared/failure'

/** What is wrong at one place of what was sent (a JSON pointer), in words that stand under its field. */
export function faultAt(failure: Failure | undefined, path: string): string | undefined {
  const fault = failure?.details.faults?.find((each) => each.path === path)
  if (fault === undefined) return undefined
  return `It ${fault.says}`
}
