import { computed, toValue } from 'vue'
import type { MaybeRefOrGetter } from 'vue'
import {
  makeCutList,
  openCutList,
  readCutList,
  readCutLists,
  readRails,
  recordCutFact,
} from '@/api/cut-lists'
import { KEYS, keysTouchedBy } from './query-keys'
import { useAct } from './use-act'
import { useAsked } from './use-asked'
import type { AskedOptions } from './use-asked'

export { cutListPrintAddress } from '@/api/cut-lists'

type IdSource = MaybeRefOrGetter<string>

export const useRails = (commissionId: IdSource) =>
  useAsked(
    () => KEYS.rails(toValue(commissionId)),
    (signal) => readRails(toValue(commissionId), signal),
  )
/** The cut lists made for one commission, the latest first. */
export function useCutListsOf(commissionId: IdSource) {
  const { value, ...asked } = useAsked(KEYS.cutLists, readCutLists)
  const ofCommission = computed(() =>
    value.value
      ?.filter(({ commission }) => commission.id === toValue(commissionId))
      .sort((a, b) => b.no - a.no),
  )
  return { value: ofCommission, ...asked }
}
export const useCutLists = (options: AskedOptions = {}) => useAsked(KEYS.cutLists, readCutLists, options)
export const useCutList = (id: MaybeRefOrGetter<string | null>) =>
  useAsked(
    () => KEYS.cutList(toValue(id) ?? ''),
    (signal) => readCutList(toValue(id) ?? '', signal),
    { when: () => toValue(id) !== null },
  )

export const useMakeCutList = (commissionId: IdSource) =>
  useAct(
    (input: Omit<Parameters<typeof makeCutList>[1], 'operationId'>, operationId) =>
      makeCutList(toValue(commissionId), { ...input, operationId }),
    { changes: () => [...keysTouchedBy(toValue(commissionId)), KEYS.cutLists, KEYS.rack] },
  )
export const useOpenCutList = (id: IdSource) =>
  useAct(
    (input: { readonly reason: string }, operationId) => openCutList(toValue(id), { ...input, operationId }),
    {
      changes: ({ commission }) => [
        ...keysTouchedBy(commission.id),
        KEYS.cutList(toValue(id)),
        KEYS.cutLists,
      ],
    },
  )
/** The operation id is the caller's: a tick made out of reach is kept on the device and sent later under the same one. */
export const useRecordCutFact = (id: IdSource) =>
  useAct((input: Parameters<typeof recordCutFact>[1]) => recordCutFact(toValue(id), input), {
    changes: ({ commission }) => [
      ...keysTouchedBy(commission.id),
      KEYS.cutList(toValue(id)),
      KEYS.cutLists,
      KEYS.rack,
    ],
  })
