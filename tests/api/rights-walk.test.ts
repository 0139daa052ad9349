import { beforeAll, describe, expect, it } from 'vitest'
import { ROUTES } from '@server/routes'
import type { Route } from '@server/routes/route'
import type { RoleName } from '@shared/contracts'
import { useApplication } from '../helpers/application'
import { signedIn, stranger } from '../helpers/client'
import type { HttpClient } from '../helpers/client'
import { aWorld } from './rights/fixture'
import type { Outcome, RightsFixture, Side, Target, World } from './rights/fixture'
import { PUBLIC_ROUTES, RIGHTS_FIXTURES } from './rights/fixtures'

const ROLES: readonly RoleName[] = ['manager', 'designer', 'curator', 'mill', 'bench']
const nameOf = ({ method, path }: Route) => `${method} ${path}`

const listel = useApplication()
let world: World
const browsers = new Map<RoleName, HttpClient>()
beforeAll(async () => {
  world = await aWorld()
  for (const role of ROLES) browsers.set(role, await enter(role))
})

const enter = (role: RoleName): Promise<HttpClient> =>
  signedIn(listel.app, { role, clientId: world.ownClientId, millId: world.ownMillId })

/** Asks as the target says, by the method of the route. */
function ask(http: HttpClient, route: Route, { path, body, file }: Target) {
  if (file !== undefined) return http.upload(path, { about: body, file: file.bytes, name: file.name })
  if (route.answer === 'file') return http.file(path)
  return route.method === 'get' || route.method === 'delete'
    ? http[route.method](path)
    : http[route.method](path, body)
}

const outcomeOf = (status: number): Outcome | number => (status >= 200 && status < 300 ? 'done' : status)

describe('the list of routes', () => {
  it('has a fixture, or a reason to be public, for every route', () => {
    const known = [...RIGHTS_FIXTURES.map(({ route }) => route), ...Object.keys(PUBLIC_ROUTES)]
    expect([...known].sort()).toEqual(ROUTES.map(nameOf).sort())
  })

  it('is public only where a reason is written down', () => {
    const open = ROUTES.filter(({ right }) => right === 'public').map(nameOf)
    expect(open.sort()).toEqual(Object.keys(PUBLIC_ROUTES).sort())
  })

  it('names no address twice', () => {
    expect(new Set(ROUTES.map(nameOf)).size).toBe(ROUTES.length)
  })
})

describe.each(RIGHTS_FIXTURES.map((fixture) => [fixture.route, fixture] as const))('%s', (name, fixture) => {
  const route = ROUTES.find((one) => nameOf(one) === name)
  const sides: readonly Side[] = fixture.foreign === undefined ? ['own'] : ['own', 'foreign']

  it('lets in nobody who is not signed in', async () => {
    if (route === undefined) throw new Error(`no such route: ${name}`)
    const answer = await ask(stranger(listel.app), route, await fixture.target(world, 'own'))
    expect(answer.status).toBe(401)
  })

  it.each(sides)('answers each role as the rules say: %s', async (side) => {
    if (route === undefined) throw new Error(`no such route: ${name}`)
    const got: Record<string, Outcome | number> = {}
    for (const role of ROLES) {
      const http = fixture.endsSession ? await enter(role) : browsers.get(role)
      if (http === undefined) throw new Error(`nobody signed in as ${role}`)
      const answer = await ask(http, route, await fixture.target(world, side))
      got[role] = outcomeOf(answer.status)
    }
    expect(got).toEqual(wantedOn(fixture, side))
  })
})

const wantedOn = ({ own, foreign }: RightsFixture, side: Side) => (side === 'own' ? own : foreign)
