import { SawsAnswer } from '@shared/contracts'
import type { OutputOf, SawCardRequest } from '@shared/contracts'
import { ask, send } from './request'

/** The saws with the latest card of each. */
export const readSaws = (signal?: AbortSignal) => ask(SawsAnswer, ['saws'], { signal })
export const addSawCard = (body: OutputOf<typeof SawCardRequest>) =>
  send(SawsAnswer, 'POST', ['saws', 'cards'], { body })
