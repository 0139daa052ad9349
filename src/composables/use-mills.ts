import { toValue } from 'vue'
import type { MaybeRefOrGetter } from 'vue'
import type { MillCard, SawCard } from '@shared/contracts'
import { addMill, addMillCard, changeMill, readMill, readMillCards, readMills } from '@/api/mills'
import type { ArchiveState } from '@/api/people'
import { addSawCard, readSaws } from '@/api/saws'
import { KEYS } from './query-keys'
import { useAct } from './use-act'
import { useAsked } from './use-asked'

type IdSource = MaybeRefOrGetter<string>

export const useMills = (state: MaybeRefOrGetter<ArchiveState> = 'active') =>
  useAsked(
    () => [...KEYS.mills, toValue(state)],
    (signal) => readMills(toValue(state), signal),
  )
export const useMill = (id: IdSource) =>
  useAsked(
    () => KEYS.mill(toValue(id)),
    (signal) => readMill(toValue(id), signal),
  )
/** All cards of a mill, each a numbered version. */
export const useMillCards = (id: IdSource) =>
  useAsked(
    () => KEYS.millCards(toValue(id)),
    (signal) => readMillCards(toValue(id), signal),
  )
export const useAddMill = () =>
  useAct((input: Parameters<typeof addMill>[0]) => addMill(input), { changes: () => [KEYS.mills] })
export const useChangeMill = (id: IdSource) =>
  useAct((input: Parameters<typeof changeMill>[1]) => changeMill(toValue(id), input), {
    changes: () => [KEYS.mills],
  })
/** A card is never changed: what is saved is the next one. */
export const useAddMillCard = (id: IdSource) =>
  useAct((document: MillCard, operationId) => addMillCard(toValue(id), { document, operationId }), {
    changes: () => [KEYS.mills],
  })
export const useSaws = () => useAsked(KEYS.saws, readSaws)
export const useAddSawCard = () =>
  useAct((document: SawCard, operationId) => addSawCard({ document, operationId }), {
    changes: () => [KEYS.saws, ['commission']],
  })
