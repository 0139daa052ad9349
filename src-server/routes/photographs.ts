import {
  IdParams,
  ImageQuery,
  PhotographAnswer,
  PhotographChangeRequest,
  PhotographRequest,
  ReadingRequest,
} from '@shared/contracts'
import { MOST_IMAGE_BYTES } from '../middleware/body'
import { fileAnswer } from '../files/file-answer'
import { presentPhotograph } from '../presenters/commissions'
import { addPhotograph } from '../services/add-photograph'
import { imageOf, originalOf } from '../services/photograph-files'
import { changePhotograph, readOffPhotograph } from '../services/photographs'
import { route } from './route'

const addPhotographRoute = route({
  method: 'post',
  path: '/commissions/:id/photographs',
  right: 'photograph.manage',
  see: 'photograph.read',
  params: IdParams,
  body: PhotographRequest,
  takesUpload: { mostBytes: MOST_IMAGE_BYTES },
  answer: PhotographAnswer,
  handle: async ({ actor, params, body, upload }) =>
    presentPhotograph(await addPhotograph(actor, params.id, body, upload)),
})

const changePhotographRoute = route({
  method: 'patch',
  path: '/photographs/:id',
  right: 'photograph.manage',
  see: 'photograph.read',
  params: IdParams,
  body: PhotographChangeRequest,
  answer: PhotographAnswer,
  handle: async ({ actor, params, body }) =>
    presentPhotograph(await changePhotograph(actor, params.id, body)),
})

const imageRoute = route({
  method: 'get',
  path: '/photographs/:id/image',
  right: 'photograph.read',
  params: IdParams,
  query: ImageQuery,
  answer: 'file',
  handle: async ({ actor, params, query }) => {
    const { path, type, name } = await imageOf(actor, params.id, query.size)
    return fileAnswer({ from: { path }, type, name, inline: true, cache: 'forever' })
  },
})

const originalRoute = route({
  method: 'get',
  path: '/photographs/:id/original',
  right: 'photograph.read',
  params: IdParams,
  answer: 'file',
  handle: async ({ actor, params }) => {
    const { path, type, name } = await originalOf(actor, params.id)
    return fileAnswer({ from: { path }, type, name, inline: false, cache: 'forever' })
  },
})

const readOffRoute = route({
  method: 'post',
  path: '/photographs/:id/readings',
  right: 'photograph.manage',
  see: 'photograph.read',
  params: IdParams,
  body: ReadingRequest,
  answer: PhotographAnswer,
  handle: async ({ actor, params, body }) =>
    presentPhotograph(await readOffPhotograph(actor, params.id, body)),
})

export const PHOTOGRAPH_ROUTES = [
  addPhotographRoute,
  changePhotographRoute,
  imageRoute,
  originalRoute,
  readOffRoute,
]
