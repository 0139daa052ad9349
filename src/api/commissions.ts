import { CommissionAnswer, CommissionsAnswer, ImportAnswer, TrailAnswer } from '@shared/contracts'
import type {
  CommissionChangeRequest,
  CommissionListQuery,
  CommissionRequest,
  ImportRequest,
  OutputOf,
} from '@shared/contracts'
import { addressOf, ask, send } from './request'

export type CommissionQuery = Partial<OutputOf<typeof CommissionListQuery>>

export const readCommissions = (query: CommissionQuery, signal?: AbortSignal) =>
  ask(CommissionsAnswer, ['commissions'], { query, signal })
export const readCommission = (id: string, signal?: AbortSignal) =>
  ask(CommissionAnswer, ['commissions', id], { signal })
export const addCommission = (body: OutputOf<typeof CommissionRequest>) =>
  send(CommissionAnswer, 'POST', ['commissions'], { body })
export const changeCommission = (id: string, body: OutputOf<typeof CommissionChangeRequest>) =>
  send(CommissionAnswer, 'PATCH', ['commissions', id], { body })
/** Takes a commission file in; the server checks it whole and names every fault. */
export const importCommission = (body: OutputOf<typeof ImportRequest>) =>
  send(ImportAnswer, 'POST', ['commissions', 'import'], { body })
export const readTrail = (id: string, signal?: AbortSignal) =>
  ask(TrailAnswer, ['commissions', id, 'trail'], { signal })
export const commissionFileAddress = (id: string) => addressOf(['commissions', id, 'file'])
