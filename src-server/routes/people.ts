import {
  ClientAnswer,
  ClientChangeRequest,
  ClientRequest,
  ClientsAnswer,
  IdParams,
  ListQuery,
  PeopleAnswer,
  PersonAnswer,
  PersonChangeRequest,
  PersonRequest,
} from '@shared/contracts'
import { presentClient, presentPerson } from '../presenters/people'
import { changeClient, listClients, takeOnClient } from '../services/clients'
import { changePerson, listPeople, takeInPerson } from '../services/people'
import { route } from './route'

const listPeopleRoute = route({
  method: 'get',
  path: '/people',
  right: 'people.manage',
  query: ListQuery,
  answer: PeopleAnswer,
  handle: async ({ actor, query }) => (await listPeople(actor, query.state)).map(presentPerson),
})

const takeInPersonRoute = route({
  method: 'post',
  path: '/people',
  right: 'people.manage',
  body: PersonRequest,
  answer: PersonAnswer,
  handle: async ({ actor, body }) => presentPerson(await takeInPerson(actor, body)),
})

const changePersonRoute = route({
  method: 'patch',
  path: '/people/:id',
  right: 'people.manage',
  params: IdParams,
  body: PersonChangeRequest,
  answer: PersonAnswer,
  handle: async ({ actor, params, body }) => presentPerson(await changePerson(actor, params.id, body)),
})

const listClientsRoute = route({
  method: 'get',
  path: '/clients',
  right: 'client.read',
  query: ListQuery,
  answer: ClientsAnswer,
  handle: async ({ actor, query }) => (await listClients(actor, query.state)).map(presentClient),
})

const takeOnClientRoute = route({
  method: 'post',
  path: '/clients',
  right: 'client.manage',
  see: 'client.read',
  body: ClientRequest,
  answer: ClientAnswer,
  handle: async ({ actor, body }) => presentClient(await takeOnClient(actor, body)),
})

const changeClientRoute = route({
  method: 'patch',
  path: '/clients/:id',
  right: 'client.manage',
  see: 'client.read',
  params: IdParams,
  body: ClientChangeRequest,
  answer: ClientAnswer,
  handle: async ({ actor, params, body }) => presentClient(await changeClient(actor, params.id, body)),
})

export const PEOPLE_ROUTES = [
  listPeopleRoute,
  takeInPersonRoute,
  changePersonRoute,
  listClientsRoute,
  takeOnClientRoute,
  changeClientRoute,
]
