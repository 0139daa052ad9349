import { PeopleAnswer, PersonAnswer } from '@shared/contracts'
import type { OutputOf, PersonChangeRequest, PersonRequest } from '@shared/contracts'
import { ask, send } from './request'

export type ArchiveState = 'active' | 'archived' | 'all'

export const readPeople = (state: ArchiveState, signal?: AbortSignal) =>
  ask(PeopleAnswer, ['people'], { query: { state }, signal })
export const addPerson = (body: OutputOf<typeof PersonRequest>) =>
  send(PersonAnswer, 'POST', ['people'], { body })
export const changePerson = (id: string, body: OutputOf<typeof PersonChangeRequest>) =>
  send(PersonAnswer, 'PATCH', ['people', id], { body })
