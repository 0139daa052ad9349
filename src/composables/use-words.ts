import { wordOf } from '@shared/units'
import type { WordKey, WordOptions } from '@shared/units'
import { useSessionStore } from '@/stores/session'

/** The workshop's trade words. Reading `word` in a template keeps it up with the setting. */
export function useWords() {
  const session = useSessionStore()
  const word = (key: WordKey, options: WordOptions = {}) => wordOf(session.vocabulary, key, options)
  return { word }
}
