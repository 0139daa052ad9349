import { toValue } from 'vue'
import type { MaybeRefOrGetter } from 'vue'
import { addClient, changeClient, readClients } from '@/api/clients'
import { addPerson, changePerson, readPeople } from '@/api/people'
import type { ArchiveState } from '@/api/people'
import { KEYS } from './query-keys'
import { useAct } from './use-act'
import { useAsked } from './use-asked'
import type { AskedOptions } from './use-asked'

export type { ArchiveState } from '@/api/people'

type StateSource = MaybeRefOrGetter<ArchiveState>

export const usePeople = (state: StateSource) =>
  useAsked(
    () => [...KEYS.people, toValue(state)],
    (signal) => readPeople(toValue(state), signal),
  )
export const useAddPerson = () =>
  useAct((input: Parameters<typeof addPerson>[0]) => addPerson(input), { changes: () => [KEYS.people] })
export const useChangePerson = () =>
  useAct(
    ({ id, ...change }: { readonly id: string } & Parameters<typeof changePerson>[1]) =>
      changePerson(id, change),
    { changes: () => [KEYS.people] },
  )

export const useClients = (state: StateSource = 'active', options: AskedOptions = {}) =>
  useAsked(
    () => [...KEYS.clients, toValue(state)],
    (signal) => readClients(toValue(state), signal),
    options,
  )
export const useAddClient = () =>
  useAct((input: Parameters<typeof addClient>[0]) => addClient(input), { changes: () => [KEYS.clients] })
export const useChangeClient = () =>
  useAct(
    ({ id, ...change }: { readonly id: string } & Parameters<typeof changeClient>[1]) =>
      changeClient(id, change),
    { changes: () => [KEYS.clients, KEYS.commissions] },
  )
