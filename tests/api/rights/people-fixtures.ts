import { randomUUID } from 'node:crypto'
import { MILL_CARD, SAW_CARD } from '../../helpers/factories/cards'
import { aClient, aMill, aPerson, unique } from '../../helpers/factories/people'
import { Setting } from '@server/models/workshop'
import { OUTCOMES } from './fixture'
import type { RightsFixture } from './fixture'

const at = (path: string, body?: object) => async () => (body === undefined ? { path } : { path, body })

/** Sessions, people, clients, mills, saws, settings. */
export const PEOPLE_FIXTURES: readonly RightsFixture[] = [
  { route: 'get /session', own: OUTCOMES.everyone, target: at('/session') },
  { route: 'delete /session', own: OUTCOMES.everyone, endsSession: true, target: at('/session') },
  {
    route: 'put /session/preferences',
    own: OUTCOMES.everyone,
    target: at('/session/preferences', { units: 'mm', vocabulary: null }),
  },
  { route: 'get /waiting', own: OUTCOMES.everyone, target: at('/waiting') },
  { route: 'get /people', own: OUTCOMES.managersAlone, target: at('/people') },
  {
    route: 'post /people',
    own: OUTCOMES.managersAlone,
    target: async () => ({
      path: '/people',
      body: {
        name: 'Somebody new',
        email: `new-${unique()}@listel.example`,
        password: 'long enough',
        memberships: [{ role: 'bench', clientId: null, millId: null }],
      },
    }),
  },
  {
    route: 'patch /people/:id',
    own: OUTCOMES.managersAlone,
    target: async () => {
      const person = await aPerson({ role: 'bench' })
      return { path: `/people/${person.id}`, body: { version: person.version, name: 'Another name' } }
    },
  },
  { route: 'get /clients', own: OUTCOMES.staff, target: at('/clients') },
  {
    route: 'post /clients',
    own: OUTCOMES.managersShownToDesigners,
    target: at('/clients', { name: 'New client' }),
  },
  {
    route: 'patch /clients/:id',
    own: OUTCOMES.managersShownToDesigners,
    target: async () => {
      const client = await aClient()
      return { path: `/clients/${client.id}`, body: { version: client.version, name: 'Another name' } }
    },
  },
  { route: 'get /mills', own: OUTCOMES.staff, target: at('/mills') },
  {
    route: 'get /mills/:id',
    own: OUTCOMES.staff,
    target: async (world) => ({ path: `/mills/${world.ownMillId}` }),
  },
  {
    route: 'post /mills',
    own: OUTCOMES.managersShownToDesigners,
    target: at('/mills', { name: 'New mill', email: 'new@mill.example', card: null }),
  },
  {
    route: 'patch /mills/:id',
    own: OUTCOMES.managersShownToDesigners,
    target: async () => {
      const mill = await aMill()
      return { path: `/mills/${mill.id}`, body: { version: mill.version, name: 'Another name' } }
    },
  },
  {
    route: 'get /mills/:id/cards',
    own: OUTCOMES.staff,
    target: async (world) => ({ path: `/mills/${world.ownMillId}/cards` }),
  },
  {
    route: 'post /mills/:id/cards',
    own: OUTCOMES.managersShownToDesigners,
    target: async (world) => ({
      path: `/mills/${world.ownMillId}/cards`,
      body: { operationId: randomUUID(), document: MILL_CARD },
    }),
  },
  { route: 'get /saws', own: OUTCOMES.workshop, target: at('/saws') },
  {
    route: 'post /saws/cards',
    own: OUTCOMES.managersShownToWorkshop,
    target: async () => ({
      path: '/saws/cards',
      body: { operationId: randomUUID(), document: { ...SAW_CARD, name: `Saw ${unique()}` } },
    }),
  },
  { route: 'get /settings', own: OUTCOMES.everyone, target: at('/settings') },
  {
    route: 'put /settings',
    own: OUTCOMES.managersShownToAll,
    target: async () => ({
      path: '/settings',
      body: {
        version: (await Setting.findByPk('workshop'))?.version ?? 0,
        document: {
          workshop: 'A workshop',
          units: 'mm',
          vocabulary: 'moulding',
          currency: 'EUR',
          allowance: 3,
          signature: 'Somebody',
        },
      },
    }),
  },
]
