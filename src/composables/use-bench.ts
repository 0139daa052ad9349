import { useQueryClient } from '@tanstack/vue-query'
import { useEventListener, useIntervalFn } from '@vueuse/core'
import { v7 as newOperationId } from 'uuid'
import { computed, onMounted, toValue } from 'vue'
import type { MaybeRefOrGetter } from 'vue'
import type { CutListView, PlannedCutView } from '@shared/contracts'
import { useKeptFactsStore } from '@/stores/kept-facts'
import type { CutFactInput, KeptFact } from '@/stores/kept-facts'
import { useSessionStore } from '@/stores/session'
import { KEYS, keysTouchedBy } from './query-keys'
import { useCutList } from './use-cut-lists'

/** A list out of reach is tried again this often, ms; a list at hand is looked at as often, since it may go out of date. */
const LOOK_AGAIN_MS = 10_000

export type BenchFact = Pick<CutFactInput, 'kind' | 'cutId' | 'lengthNo' | 'trueLength'>

/** A cut list at the saw: what the server knows with what this device has still to send laid over it. */
export function useBench(listId: MaybeRefOrGetter<string>) {
  const queryClient = useQueryClient()
  const store = useKeptFactsStore()
  const session = useSessionStore()
  const { value: known, isAsking, failure, askAgain } = useCutList(() => toValue(listId))

  const kept = computed(() => store.keptOf(toValue(listId)))
  const list = computed(() =>
    known.value === undefined
      ? undefined
      : withKept(known.value, kept.value, session.session?.person.name ?? ''),
  )

  async function record(fact: BenchFact): Promise<void> {
    if (known.value === undefined) return
    await store.keep(toValue(listId), {
      ...fact,
      operationId: newOperationId(),
      listVersion: known.value.version,
      deviceTime: new Date().toISOString(),
    })
    await send()
  }
  async function send(): Promise<void> {
    const latest = await store.sendKept(toValue(listId))
    if (latest === undefined) return
    queryClient.setQueryData(KEYS.cutList(latest.id), latest)
    const touched = [...keysTouchedBy(latest.commission.id), KEYS.cutLists, KEYS.rack]
    await Promise.all(touched.map((queryKey) => queryClient.invalidateQueries({ queryKey })))
  }
  onMounted(async () => {
    await store.load()
    await send()
  })
  useEventListener(window, 'online', () => void send())
  useIntervalFn(() => {
    if (kept.value.some(({ refused }) => refused === null)) void send()
    else askAgain()
  }, LOOK_AGAIN_MS)

  return { list, kept, store, record, send, isAsking, failure, askAgain }
}

/** The list as it will stand once everything kept has been taken. */
function withKept(list: CutListView, kept: readonly KeptFact[], by: string): CutListView {
  return kept
    .filter(({ refused }) => refused === null)
    .reduce(
      (shown, { fact }) => ({
        ...shown,
        lengths: shown.lengths.map((length) => ({
          ...length,
          cuts: length.cuts.map((cut) => (cut.id === fact.cutId ? withFact(cut, fact, by) : cut)),
          offcutFact:
            fact.kind === 'offcut' && fact.lengthNo === length.no && fact.trueLength !== null
              ? { code: '', length: fact.trueLength, by, at: fact.deviceTime }
              : length.offcutFact,
        })),
      }),
      list,
    )
}

function withFact(
  cut: PlannedCutView,
  { kind, trueLength, deviceTime }: CutFactInput,
  by: string,
): PlannedCutView {
  if (kind === 'undo') return { ...cut, fact: null }
  if (kind === 'offcut') return cut
  return { ...cut, fact: { trueLength, by, at: deviceTime, kind, conflict: false } }
}
