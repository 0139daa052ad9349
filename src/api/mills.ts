import { MillAnswer, MillCardsAnswer, MillsAnswer } from '@shared/contracts'
import type { MillCardRequest, MillChangeRequest, MillRequest, OutputOf } from '@shared/contracts'
import { ask, send } from './request'
import type { ArchiveState } from './people'

export const readMills = (state: ArchiveState, signal?: AbortSignal) =>
  ask(MillsAnswer, ['mills'], { query: { state }, signal })
export const readMill = (id: string, signal?: AbortSignal) => ask(MillAnswer, ['mills', id], { signal })
export const addMill = (body: OutputOf<typeof MillRequest>) => send(MillAnswer, 'POST', ['mills'], { body })
export const changeMill = (id: string, body: OutputOf<typeof MillChangeRequest>) =>
  send(MillAnswer, 'PATCH', ['mills', id], { body })
/** All cards of a mill, each a numbered version. */
export const readMillCards = (id: string, signal?: AbortSignal) =>
  ask(MillCardsAnswer, ['mills', id, 'cards'], { signal })
export const addMillCard = (id: string, body: OutputOf<typeof MillCardRequest>) =>
  send(MillAnswer, 'POST', ['mills', id, 'cards'], { body })
