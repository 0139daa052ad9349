import { ClientAnswer, ClientsAnswer } from '@shared/contracts'
import type { ClientChangeRequest, ClientRequest, OutputOf } from '@shared/contracts'
import { ask, send } from './request'
import type { ArchiveState } from './people'

export const readClients = (state: ArchiveState, signal?: AbortSignal) =>
  ask(ClientsAnswer, ['clients'], { query: { state }, signal })
export const addClient = (body: OutputOf<typeof ClientRequest>) =>
  send(ClientAnswer, 'POST', ['clients'], { body })
export const changeClient = (id: string, body: OutputOf<typeof ClientChangeRequest>) =>
  send(ClientAnswer, 'PATCH', ['clients', id], { body })
