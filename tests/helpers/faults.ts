import type { Response } from 'supertest'

/** JSON pointers of the faults that an answer names. */
export function pathsOf(answer: Response): readonly string[] {
  const { error } = answer.body as {
    readonly error?: { readonly faults?: readonly { readonly path: string }[] }
  }
  return (error?.faults ?? []).map(({ path }) => path)
}
