import { toValue } from 'vue'
import type { MaybeRefOrGetter } from 'vue'
import { acknowledgeByLink, readLink } from '@/api/links'
import { KEYS } from './query-keys'
import { useAct } from './use-act'
import { useAsked } from './use-asked'

/** What a signed link shows to whoever holds it. */
export const useLink = (token: MaybeRefOrGetter<string>) =>
  useAsked(
    () => KEYS.link(toValue(token)),
    (signal) => readLink(toValue(token), signal),
  )
export const useAcknowledgeByLink = (token: MaybeRefOrGetter<string>) =>
  useAct((input: Parameters<typeof acknowledgeByLink>[1]) => acknowledgeByLink(toValue(token), input), {
    changes: () => [KEYS.link(toValue(token))],
  })
