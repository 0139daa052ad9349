import { WaitingAnswer } from '@shared/contracts'
import { ask } from './request'

/** What waits for the person asking. */
export const readWaiting = (signal?: AbortSignal) => ask(WaitingAnswer, ['waiting'], { signal })
