import { useMutation, useQueryClient } from '@tanstack/vue-query'
import { computed, shallowRef } from 'vue'
import { v7 as newOperationId } from 'uuid'
import { failureOf } from './use-asked'
import type { Key } from './query-keys'

export interface ActOptions<Input, Answer> {
  /** What the act makes stale. */
  readonly changes?: (answer: Answer, input: Input) => readonly Key[]
}

/**
 * One act of the user on the server. The operation id is made once per act and kept while the same thing is tried
 * again, so that a try whose answer was lost is not done twice; another input is another act.
 */
export function useAct<Input, Answer>(
  act: (input: Input, operationId: string) => Promise<Answer>,
  options: ActOptions<Input, Answer> = {},
) {
  const queryClient = useQueryClient()
  const attempt = shallowRef<{ readonly of: Input; readonly operationId: string }>()

  const mutation = useMutation({
    mutationFn: (input: Input) => {
      if (attempt.value === undefined || !isSame(attempt.value.of, input)) {
        attempt.value = { of: input, operationId: newOperationId() }
      }
      return act(input, attempt.value.operationId)
    },
    onSuccess: async (answer, input) => {
      attempt.value = undefined
      const keys = options.changes?.(answer, input) ?? []
      await Promise.all(keys.map((queryKey) => queryClient.invalidateQueries({ queryKey })))
    },
  })

  /** Does it; undefined when it was refused, and `failure` then says why. */
  async function run(input: Input): Promise<Answer | undefined> {
    try {
      return await mutation.mutateAsync(input)
    } catch {
      return undefined
    }
  }

  return {
    run,
    isRunning: mutation.isPending,
    failure: computed(() => failureOf(mutation.error.value)),
    clear: mutation.reset,
  }
}

/** Files are the same only when they are one and the same; all else by what it says. */
function isSame(a: unknown, b: unknown): boolean {
  if (Object.is(a, b)) return true
  if (typeof a !== 'object' || typeof b !== 'object' || a === null || b === null) return false
  if (a instanceof Blob || b instanceof Blob || Array.isArray(a) !== Array.isArray(b)) return false
  const [left, right] = [Object.entries(a), Object.entries(b)]
  const other = b as Record<string, unknown>
  return (
    left.length === right.length &&
    left.every(([name, value]) => Object.hasOwn(b, name) && isSame(value, other[name]))
  )
}
