import { CutListAnswer, CutListsAnswer, RailsAnswer } from '@shared/contracts'
import type { CutFactRequest, OpenCutListRequest, OutputOf, PlanRequest } from '@shared/contracts'
import { addressOf, ask, send } from './request'

export const readRails = (commissionId: string, signal?: AbortSignal) =>
  ask(RailsAnswer, ['commissions', commissionId, 'rails'], { signal })
export const makeCutList = (commissionId: string, body: OutputOf<typeof PlanRequest>) =>
  send(CutListAnswer, 'POST', ['commissions', commissionId, 'plans'], { body })
export const readCutLists = (signal?: AbortSignal) => ask(CutListsAnswer, ['cut-lists'], { signal })
export const readCutList = (id: string, signal?: AbortSignal) =>
  ask(CutListAnswer, ['cut-lists', id], { signal })
export const openCutList = (id: string, body: OutputOf<typeof OpenCutListRequest>) =>
  send(CutListAnswer, 'POST', ['cut-lists', id, 'open'], { body })
export const recordCutFact = (id: string, body: OutputOf<typeof CutFactRequest>) =>
  send(CutListAnswer, 'POST', ['cut-lists', id, 'facts'], { body })
export const cutListPrintAddress = (id: string) => addressOf(['cut-lists', id, 'print.pdf'])
