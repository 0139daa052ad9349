import type { Course } from './transition'

export type IssueStateName = 'put-forward' | 'returned' | 'approved' | 'withdrawn' | 'superseded'
export type IssueEventName = 'approve' | 'return' | 'withdraw' | 'supersede'

/** The course of an issue: only the latest is decided on; a later issue supersedes it whatever it was. */
export const ISSUE_COURSE: Course<IssueStateName, IssueEventName> = {
  'put-forward': { approve: 'approved', return: 'returned', supersede: 'superseded' },
  returned: { supersede: 'superseded' },
  approved: { withdraw: 'withdrawn', supersede: 'superseded' },
  withdrawn: { approve: 'approved', return: 'returned', supersede: 'superseded' },
  superseded: {},
}

/** A, B … Z, AA, AB …: the letter of the issue that comes n-th (0 first). */
export function issueLetterOf(n: number): string {
  const letter = String.fromCharCode(65 + (n % 26))
  return n < 26 ? letter : issueLetterOf(Math.floor(n / 26) - 1) + letter
}
