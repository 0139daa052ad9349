import { SawCardAnswer } from '@shared/contracts'
import type { OutputOf, SawCardRequest } from '@shared/contracts'
import { ask, send } from './request'

/** The saws with the latest card of each. */
export const readSaws = (signal?: AbortSignal) => ask(SawCardAnswer.array(), ['saws'], { signal })
export const addSawCard = (body: OutputOf<typeof SawCardRequest>) =>
  send(SawCardAnswer, 'POST', ['saws', 'cards'], { body })
