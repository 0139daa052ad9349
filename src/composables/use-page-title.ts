import { useTitle } from '@vueuse/core'
import { computed, toValue } from 'vue'
import type { MaybeRefOrGetter } from 'vue'

/** The window's title: what the page shows, then the product. */
export function usePageTitle(title: MaybeRefOrGetter<string | undefined>): void {
  useTitle(computed(() => (toValue(title) ? `${toValue(title)} · Listel` : 'Listel')))
}
