import {
  CommissionAnswer,
  CommissionChangeRequest,
  CommissionListQuery,
  CommissionRequest,
  CommissionsAnswer,
  IdParams,
  MeasurementRequest,
  MeasurementsAnswer,
  PictureAnswer,
  PictureChangeRequest,
  PictureRequest,
  TrailAnswer,
} from '@shared/contracts'
import {
  presentCommission,
  presentCommissionLine,
  presentMeasurement,
  presentPicture,
  presentTrailLine,
} from '../presenters/commissions'
import { changeCommission, listCommissions, readCommission, takeOnCommission } from '../services/commissions'
import { addPicture, changePicture, listMeasurements, measurePicture } from '../services/pictures'
import { readTrail } from '../services/trail-reading'
import { route } from './route'

const listCommissionsRoute = route({
  method: 'get',
  path: '/commissions',
  right: 'commission.list',
  query: CommissionListQuery,
  answer: CommissionsAnswer,
  handle: async ({ actor, query }) => (await listCommissions(actor, query)).map(presentCommissionLine),
})

const takeOnCommissionRoute = route({
  method: 'post',
  path: '/commissions',
  right: 'commission.manage',
  see: 'commission.list',
  body: CommissionRequest,
  answer: CommissionAnswer,
  handle: async ({ actor, body }) => presentCommission(await takeOnCommission(actor, body)),
})

const readCommissionRoute = route({
  method: 'get',
  path: '/commissions/:id',
  right: 'commission.read',
  params: IdParams,
  answer: CommissionAnswer,
  handle: async ({ actor, params }) => presentCommission(await readCommission(actor, params.id)),
})

const changeCommissionRoute = route({
  method: 'patch',
  path: '/commissions/:id',
  right: 'commission.manage',
  see: 'commission.read',
  params: IdParams,
  body: CommissionChangeRequest,
  answer: CommissionAnswer,
  handle: async ({ actor, params, body }) =>
    presentCommission(await changeCommission(actor, params.id, body)),
})

const addPictureRoute = route({
  method: 'post',
  path: '/commissions/:id/pictures',
  right: 'picture.manage',
  see: 'commission.read',
  params: IdParams,
  body: PictureRequest,
  answer: PictureAnswer,
  handle: async ({ actor, params, body }) => presentPicture(await addPicture(actor, params.id, body)),
})

const changePictureRoute = route({
  method: 'patch',
  path: '/pictures/:id',
  right: 'picture.manage',
  see: 'commission.read',
  params: IdParams,
  body: PictureChangeRequest,
  answer: PictureAnswer,
  handle: async ({ actor, params, body }) => presentPicture(await changePicture(actor, params.id, body)),
})

const measurePictureRoute = route({
  method: 'post',
  path: '/pictures/:id/measurements',
  right: 'picture.manage',
  see: 'commission.read',
  params: IdParams,
  body: MeasurementRequest,
  answer: PictureAnswer,
  handle: async ({ actor, params, body }) => presentPicture(await measurePicture(actor, params.id, body)),
})

const listMeasurementsRoute = route({
  method: 'get',
  path: '/pictures/:id/measurements',
  right: 'commission.read',
  params: IdParams,
  answer: MeasurementsAnswer,
  handle: async ({ actor, params }) => (await listMeasurements(actor, params.id)).map(presentMeasurement),
})

const readTrailRoute = route({
  method: 'get',
  path: '/commissions/:id/trail',
  right: 'trail.read',
  see: 'commission.read',
  params: IdParams,
  answer: TrailAnswer,
  handle: async ({ actor, params }) => (await readTrail(actor, params.id)).map(presentTrailLine),
})

export const COMMISSION_ROUTES = [
  listCommissionsRoute,
  takeOnCommissionRoute,
  readCommissionRoute,
  changeCommissionRoute,
  addPictureRoute,
  changePictureRoute,
  measurePictureRoute,
  listMeasurementsRoute,
  readTrailRoute,
]
