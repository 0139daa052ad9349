import {
  CutFactRequest,
  CutListAnswer,
  CutListsAnswer,
  Done,
  IdParams,
  OpenCutListRequest,
  PlanRequest,
  RackAnswer,
  RackMovementRequest,
  RackPieceRequest,
  RailsAnswer,
} from '@shared/contracts'
import { presentCutList, presentCutListLine, presentRackPiece, presentRails } from '../presenters/lengths'
import { listCutLists, readCutList } from '../services/cut-lists'
import { makeCutList } from '../services/plan-cuts'
import { printCutList } from '../services/print-cut-list'
import { addToRack, listRack, moveOnRack } from '../services/rack'
import { readRails } from '../services/rails'
import { openCutList, recordCut } from '../services/record-cut'
import { route } from './route'

const listRackRoute = route({
  method: 'get',
  path: '/rack',
  right: 'rack.read',
  answer: RackAnswer,
  handle: async ({ actor }) => (await listRack(actor)).map(presentRackPiece),
})

const addToRackRoute = route({
  method: 'post',
  path: '/rack',
  right: 'rack.change',
  see: 'rack.read',
  body: RackPieceRequest,
  answer: Done,
  handle: async ({ actor, body }) => {
    await addToRack(actor, body)
    return { done: true as const }
  },
})

const moveOnRackRoute = route({
  method: 'post',
  path: '/rack/movements',
  right: 'rack.change',
  see: 'rack.read',
  body: RackMovementRequest,
  answer: Done,
  handle: async ({ actor, body }) => {
    await moveOnRack(actor, body)
    return { done: true as const }
  },
})

const readRailsRoute = route({
  method: 'get',
  path: '/commissions/:id/rails',
  right: 'rails.read',
  see: 'commission.read',
  params: IdParams,
  answer: RailsAnswer,
  handle: async ({ actor, params }) => presentRails(await readRails(actor, params.id)),
})

const makeCutListRoute = route({
  method: 'post',
  path: '/commissions/:id/plans',
  right: 'plan.make',
  see: 'commission.read',
  params: IdParams,
  body: PlanRequest,
  answer: CutListAnswer,
  handle: async ({ actor, params, body }) =>
    presentCutList(await readCutList(actor, await makeCutList(actor, params.id, body))),
})

const listCutListsRoute = route({
  method: 'get',
  path: '/cut-lists',
  right: 'cut-list.list',
  answer: CutListsAnswer,
  handle: async ({ actor }) => (await listCutLists(actor)).map(presentCutListLine),
})

const readCutListRoute = route({
  method: 'get',
  path: '/cut-lists/:id',
  right: 'cut-list.read',
  params: IdParams,
  answer: CutListAnswer,
  handle: async ({ actor, params }) => presentCutList(await readCutList(actor, params.id)),
})

const openCutListRoute = route({
  method: 'post',
  path: '/cut-lists/:id/open',
  right: 'cut-list.open',
  see: 'cut-list.read',
  params: IdParams,
  body: OpenCutListRequest,
  answer: CutListAnswer,
  handle: async ({ actor, params, body }) =>
    presentCutList(await readCutList(actor, await openCutList(actor, params.id, body))),
})

const recordCutRoute = route({
  method: 'post',
  path: '/cut-lists/:id/facts',
  right: 'cut.record',
  see: 'cut-list.read',
  params: IdParams,
  body: CutFactRequest,
  answer: CutListAnswer,
  handle: async ({ actor, params, body }) =>
    presentCutList(await readCutList(actor, await recordCut(actor, params.id, body))),
})

const printCutListRoute = route({
  method: 'get',
  path: '/cut-lists/:id/print.pdf',
  right: 'cut-list.read',
  params: IdParams,
  answer: 'file',
  handle: ({ actor, params }) => printCutList(actor, params.id),
})

export const LENGTH_ROUTES = [
  listRackRoute,
  addToRackRoute,
  moveOnRackRoute,
  readRailsRoute,
  makeCutListRoute,
  listCutListsRoute,
  readCutListRoute,
  openCutListRoute,
  recordCutRoute,
  printCutListRoute,
]
