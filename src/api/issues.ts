import {
  DifferenceAnswer,
  IssueAnswer,
  IssuesAnswer,
  LetterPreview,
  OrderAnswer,
  RemarkAnswer,
} from '@shared/contracts'
import type {
  DecisionRequest,
  OrderRequest,
  OutputOf,
  PutForwardRequest,
  RemarkEntryRequest,
  RemarkRequest,
} from '@shared/contracts'
import { addressOf, ask, send } from './request'

export type SheetForm = 'pdf' | 'dxf' | 'svg'

export const readIssues = (commissionId: string, signal?: AbortSignal) =>
  ask(IssuesAnswer, ['commissions', commissionId, 'issues'], { signal })
export const putForward = (commissionId: string, body: OutputOf<typeof PutForwardRequest>) =>
  send(IssueAnswer, 'POST', ['commissions', commissionId, 'issues'], { body })
export const readIssue = (id: string, signal?: AbortSignal) => ask(IssueAnswer, ['issues', id], { signal })
export const readDifference = (id: string, signal?: AbortSignal) =>
  ask(DifferenceAnswer, ['issues', id, 'difference'], { signal })
export const addRemark = (issueId: string, body: OutputOf<typeof RemarkRequest>) =>
  send(RemarkAnswer, 'POST', ['issues', issueId, 'remarks'], { body })
export const addRemarkEntry = (remarkId: string, body: OutputOf<typeof RemarkEntryRequest>) =>
  send(RemarkAnswer, 'POST', ['remarks', remarkId, 'entries'], { body })
export const decideIssue = (issueId: string, body: OutputOf<typeof DecisionRequest>) =>
  send(IssueAnswer, 'POST', ['issues', issueId, 'decisions'], { body })
export const sendOrder = (issueId: string, body: OutputOf<typeof OrderRequest>) =>
  send(OrderAnswer, 'POST', ['issues', issueId, 'orders'], { body })
/** The letter as it would go out; nothing is sent. */
export const previewOrder = (issueId: string, body: OutputOf<typeof OrderRequest>) =>
  send(LetterPreview, 'POST', ['issues', issueId, 'orders', 'preview'], { body })
export const issueSheetAddress = (id: string, form: SheetForm) => addressOf(['issues', id, `sheet.${form}`])
