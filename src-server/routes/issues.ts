import {
  DecisionRequest,
  DifferenceAnswer,
  IdParams,
  IssueAnswer,
  IssuesAnswer,
  PutForwardRequest,
  RemarkAnswer,
  RemarkEntryRequest,
  RemarkRequest,
  SheetParams,
} from '@shared/contracts'
import { presentDifference, presentIssue, presentIssueLine, presentRemark } from '../presenters/review'
import { decideIssue } from '../services/decide-issue'
import { listIssues, readDifference, readIssue } from '../services/issues'
import { putForward } from '../services/put-forward'
import { addRemark, answerRemark } from '../services/remarks'
import { readIssueSheet } from '../services/sheets'
import { route } from './route'

const putForwardRoute = route({
  method: 'post',
  path: '/commissions/:id/issues',
  right: 'issue.put-forward',
  see: 'commission.read',
  params: IdParams,
  body: PutForwardRequest,
  answer: IssueAnswer,
  handle: async ({ actor, params, body }) =>
    presentIssue(await readIssue(actor, await putForward(actor, params.id, body))),
})

const listIssuesRoute = route({
  method: 'get',
  path: '/commissions/:id/issues',
  right: 'issue.read',
  params: IdParams,
  answer: IssuesAnswer,
  handle: async ({ actor, params }) => (await listIssues(actor, params.id)).map(presentIssueLine),
})

const readIssueRoute = route({
  method: 'get',
  path: '/issues/:id',
  right: 'issue.read',
  params: IdParams,
  answer: IssueAnswer,
  handle: async ({ actor, params }) => presentIssue(await readIssue(actor, params.id)),
})

const readDifferenceRoute = route({
  method: 'get',
  path: '/issues/:id/difference',
  right: 'issue.read',
  params: IdParams,
  answer: DifferenceAnswer,
  handle: async ({ actor, params }) => presentDifference(await readDifference(actor, params.id)),
})

const readIssueSheetRoute = route({
  method: 'get',
  path: '/issues/:id/sheet.:format',
  right: 'issue.read',
  params: SheetParams,
  answer: 'file',
  handle: ({ actor, params }) => readIssueSheet(actor, params.id, params.format),
})

const addRemarkRoute = route({
  method: 'post',
  path: '/issues/:id/remarks',
  right: 'remark.add',
  see: 'issue.read',
  params: IdParams,
  body: RemarkRequest,
  answer: RemarkAnswer,
  handle: async ({ actor, params, body }) => presentRemark(await addRemark(actor, params.id, body)),
})

const answerRemarkRoute = route({
  method: 'post',
  path: '/remarks/:id/entries',
  right: 'remark.add',
  see: 'issue.read',
  params: IdParams,
  body: RemarkEntryRequest,
  answer: RemarkAnswer,
  handle: async ({ actor, params, body }) => presentRemark(await answerRemark(actor, params.id, body)),
})

const decideIssueRoute = route({
  method: 'post',
  path: '/issues/:id/decisions',
  right: 'issue.decide',
  see: 'issue.read',
  params: IdParams,
  body: DecisionRequest,
  answer: IssueAnswer,
  handle: async ({ actor, params, body }) =>
    presentIssue(await readIssue(actor, await decideIssue(actor, params.id, body))),
})

export const ISSUE_ROUTES = [
  putForwardRoute,
  listIssuesRoute,
  readIssueRoute,
  readDifferenceRoute,
  readIssueSheetRoute,
  addRemarkRoute,
  answerRemarkRoute,
  decideIssueRoute,
]
