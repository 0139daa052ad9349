import { MillAnswer, MillCardAnswer } from '@shared/contracts'
import type { MillCardRequest, MillChangeRequest, MillRequest, OutputOf } from '@shared/contracts'
import { ask, send } from './request'
import type { ArchiveState } from './people'

export const readMills = (state: ArchiveState, signal?: AbortSignal) =>
  ask(MillAnswer.array(), ['mills'], { query: { state }, signal })
export const readMill = (id: string, signal?: AbortSignal) => ask(MillAnswer, ['mills', id], { signal })
export const addMill = (body: OutputOf<typeof MillRequest>) => send(MillAnswer, 'POST', ['mills'], { body })
export const changeMill = (id: string, body: OutputOf<typeof MillChangeRequest>) =>
  send(MillAnswer, 'PATCH', ['mills', id], { body })
export const addMillCard = (id: string, body: OutputOf<typeof MillCardRequest>) =>
  send(MillCardAnswer, 'POST', ['mills', id, 'cards'], { body })
