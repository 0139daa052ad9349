import {
  Done,
  FirstManagerRequest,
  PreferencesRequest,
  SessionAnswer,
  SignInRequest,
} from '@shared/contracts'
import { presentSession } from '../presenters/people'
import { welcomeFirstManager } from '../services/first-manager'
import { changePreferences, requirePerson } from '../services/people'
import { endSession } from '../services/sessions'
import type { BegunSession } from '../services/sessions'
import { readSettings } from '../services/settings'
import { signIn } from '../services/sign-in'
import { route } from './route'
import type { RequestFacts } from './route'

const signInRoute = route({
  method: 'post',
  path: '/session',
  right: 'public',
  body: SignInRequest,
  answer: SessionAnswer,
  handle: async ({ body, request }) => enter(request, await signIn(body, request.from)),
})

const firstManagerRoute = route({
  method: 'post',
  path: '/first-manager',
  right: 'public',
  body: FirstManagerRequest,
  answer: SessionAnswer,
  handle: async ({ body, request }) => enter(request, await welcomeFirstManager(body, request.from)),
})

/** Gives the browser its cookie and shows who it now is. */
async function enter({ cookie }: RequestFacts, { sessionId, personId }: BegunSession) {
  cookie.keep(sessionId)
  const { document } = await readSettings()
  return presentSession(await requirePerson(personId), document)
}

const readSessionRoute = route({
  method: 'get',
  path: '/session',
  right: 'session.own',
  answer: SessionAnswer,
  handle: async ({ actor }) => {
    const { document } = await readSettings()
    return presentSession(await requirePerson(actor.personId), document)
  },
})

const signOutRoute = route({
  method: 'delete',
  path: '/session',
  right: 'session.own',
  answer: Done,
  handle: async ({ request }) => {
    if (request.sessionId !== undefined) await endSession(request.sessionId)
    request.cookie.drop()
    return { done: true as const }
  },
})

const preferencesRoute = route({
  method: 'put',
  path: '/session/preferences',
  right: 'session.own',
  body: PreferencesRequest,
  answer: SessionAnswer,
  handle: async ({ actor, body }) => {
    const person = await changePreferences(actor, body)
    const { document } = await readSettings()
    return presentSession(person, document)
  },
})

export const SESSION_ROUTES = [
  signInRoute,
  firstManagerRoute,
  readSessionRoute,
  signOutRoute,
  preferencesRoute,
]
