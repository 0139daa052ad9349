import { useQuery } from '@tanstack/vue-query'
import { computed, toValue } from 'vue'
import type { MaybeRefOrGetter } from 'vue'
import { Failure } from '@shared/failure'
import type { Key } from './query-keys'

export interface AskedOptions {
  /** Asked only while this holds. */
  readonly when?: MaybeRefOrGetter<boolean>
  /** Asked again after so many ms, for things that move by themselves. */
  readonly everyMs?: number
}

/** A thing asked of the server and kept fresh: the value once it is there, and in words what went wrong when it did. */
export function useAsked<Value>(
  key: MaybeRefOrGetter<Key>,
  read: (signal: AbortSignal) => Promise<Value>,
  { when = true, everyMs }: AskedOptions = {},
) {
  const query = useQuery({
    queryKey: computed(() => toValue(key)),
    queryFn: ({ signal }) => read(signal),
    enabled: computed(() => toValue(when)),
    ...(everyMs === undefined ? {} : { refetchInterval: everyMs }),
  })
  return {
    value: query.data,
    isAsking: computed(() => query.isLoading.value),
    failure: computed(() => (query.data.value === undefined ? failureOf(query.error.value) : undefined)),
    askAgain: () => void query.refetch(),
  }
}

/** Anything thrown that is no Failure is a defect of ours; the user is told so instead of nothing. */
export function failureOf(error: unknown): Failure | undefined {
  if (error === null || error === undefined) return undefined
  if (error instanceof Failure) return error
  return new Failure(
    'out-of-service',
    { says: 'Something went wrong in this page. Reload it; what was saved is safe.' },
    { cause: error },
  )
}
