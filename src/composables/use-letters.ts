import { toValue } from 'vue'
import type { MaybeRefOrGetter } from 'vue'
import { readLetter, readLetters, sendLetterAgain } from '@/api/letters'
import { KEYS } from './query-keys'
import { useAct } from './use-act'
import { useAsked } from './use-asked'

export { attachmentAddress, caughtLetterAddress, rawLetterAddress } from '@/api/letters'

/** The post moves by itself. */
const LOOK_AGAIN_MS = 5_000

export const useLetters = () => useAsked(KEYS.letters, readLetters, { everyMs: LOOK_AGAIN_MS })
export const useLetter = (id: MaybeRefOrGetter<string>) =>
  useAsked(
    () => KEYS.letter(toValue(id)),
    (signal) => readLetter(toValue(id), signal),
    { everyMs: LOOK_AGAIN_MS },
  )
export const useSendLetterAgain = (id: MaybeRefOrGetter<string>) =>
  useAct((_: 'again') => sendLetterAgain(toValue(id)), {
    changes: () => [KEYS.letters, KEYS.waiting],
  })
