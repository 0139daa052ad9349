import { readWaiting } from '@/api/waiting'
import { KEYS } from './query-keys'
import { useAsked } from './use-asked'

const LOOK_AGAIN_MS = 30_000

/** What waits for the person signed in. */
export const useWaiting = () => useAsked(KEYS.waiting, readWaiting, { everyMs: LOOK_AGAIN_MS })
