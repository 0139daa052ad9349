import {
  IdParams,
  ListQuery,
  MillAnswer,
  MillCardRequest,
  MillCardsAnswer,
  MillChangeRequest,
  MillRequest,
  MillsAnswer,
  SawCardRequest,
  SawsAnswer,
  SettingsAnswer,
  SettingsRequest,
} from '@shared/contracts'
import { presentMill, presentMillCard, presentSawCard } from '../presenters/workshop'
import { addMillCard, changeMill, listMillCards, listMills, readMill, takeOnMill } from '../services/mills'
import { addSawCard, listSaws } from '../services/saws'
import { changeSettings, readSettings } from '../services/settings'
import { route } from './route'

const listMillsRoute = route({
  method: 'get',
  path: '/mills',
  right: 'mill.read',
  query: ListQuery,
  answer: MillsAnswer,
  handle: async ({ actor, query }) => (await listMills(actor, query.state)).map(presentMill),
})

const readMillRoute = route({
  method: 'get',
  path: '/mills/:id',
  right: 'mill.read',
  params: IdParams,
  answer: MillAnswer,
  handle: async ({ actor, params }) => presentMill(await readMill(actor, params.id)),
})

const takeOnMillRoute = route({
  method: 'post',
  path: '/mills',
  right: 'mill.manage',
  see: 'mill.read',
  body: MillRequest,
  answer: MillAnswer,
  handle: async ({ actor, body }) => presentMill(await takeOnMill(actor, body)),
})

const changeMillRoute = route({
  method: 'patch',
  path: '/mills/:id',
  right: 'mill.manage',
  see: 'mill.read',
  params: IdParams,
  body: MillChangeRequest,
  answer: MillAnswer,
  handle: async ({ actor, params, body }) => presentMill(await changeMill(actor, params.id, body)),
})

const listMillCardsRoute = route({
  method: 'get',
  path: '/mills/:id/cards',
  right: 'mill.read',
  params: IdParams,
  answer: MillCardsAnswer,
  handle: async ({ actor, params }) => (await listMillCards(actor, params.id)).map(presentMillCard),
})

const addMillCardRoute = route({
  method: 'post',
  path: '/mills/:id/cards',
  right: 'mill.manage',
  see: 'mill.read',
  params: IdParams,
  body: MillCardRequest,
  answer: MillAnswer,
  handle: async ({ actor, params, body }) => presentMill(await addMillCard(actor, params.id, body)),
})

const listSawsRoute = route({
  method: 'get',
  path: '/saws',
  right: 'saw.read',
  answer: SawsAnswer,
  handle: async ({ actor }) => (await listSaws(actor)).map(presentSawCard),
})

const addSawCardRoute = route({
  method: 'post',
  path: '/saws/cards',
  right: 'saw.manage',
  see: 'saw.read',
  body: SawCardRequest,
  answer: SawsAnswer,
  handle: async ({ actor, body }) => (await addSawCard(actor, body)).map(presentSawCard),
})

const readSettingsRoute = route({
  method: 'get',
  path: '/settings',
  right: 'settings.read',
  answer: SettingsAnswer,
  handle: () => readSettings(),
})

const changeSettingsRoute = route({
  method: 'put',
  path: '/settings',
  right: 'settings.change',
  see: 'settings.read',
  body: SettingsRequest,
  answer: SettingsAnswer,
  handle: ({ actor, body }) => changeSettings(actor, body),
})

export const WORKSHOP_ROUTES = [
  listMillsRoute,
  readMillRoute,
  takeOnMillRoute,
  changeMillRoute,
  listMillCardsRoute,
  addMillCardRoute,
  listSawsRoute,
  addSawCardRoute,
  readSettingsRoute,
  changeSettingsRoute,
]
