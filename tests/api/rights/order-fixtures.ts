import { randomUUID } from 'node:crypto'
import { aCommission, SOUND_SECTION } from '../../helpers/factories/commissions'
import { aLetter, anOrder, ORDER } from '../../helpers/factories/orders'
import { anIssue } from '../../helpers/factories/review'
import { clientOn, millOn, OUTCOMES } from './fixture'
import type { RightsFixture, Side, World } from './fixture'

const approvedOn = async (world: World, side: Side) =>
  anIssue({
    commission: await aCommission({ clientId: clientOn(world, side), section: SOUND_SECTION }),
    state: 'approved',
  })
const orderOn = async (world: World, side: Side) =>
  anOrder({ issue: await approvedOn(world, side), millId: millOn(world, side) })

/** Staff and the mill it is addressed to; to everybody else an order is not there. */
const addressed = {
  own: { manager: 'done', designer: 'done', curator: 404, mill: 'done', bench: 404 },
  foreign: { manager: 'done', designer: 'done', curator: 404, mill: 404, bench: 404 },
} as const
const sending = { own: OUTCOMES.staffShownToReaders, foreign: OUTCOMES.staffShownToWorkshop }

const asked = (world: World, side: Side) => ({
  operationId: randomUUID(),
  millId: millOn(world, side),
  document: ORDER,
})

/** Knife orders and the post. */
export const ORDER_FIXTURES: readonly RightsFixture[] = [
  ...['', '/preview'].map((tail): RightsFixture => ({
    route: `post /issues/:id/orders${tail}`,
    ...sending,
    target: async (world, side) => ({
      path: `/issues/${(await approvedOn(world, side)).id}/orders${tail}`,
      body: asked(world, side),
    }),
  })),
  {
    route: 'get /orders',
    own: { manager: 'done', designer: 'done', curator: 404, mill: 'done', bench: 404 },
    target: async () => ({ path: '/orders' }),
  },
  {
    route: 'get /commissions/:id/orders',
    ...sending,
    target: async (world, side) => ({
      path: `/commissions/${(await orderOn(world, side)).commissionId}/orders`,
    }),
  },
  ...['', '/sheet.pdf'].map((tail): RightsFixture => ({
    route: `get /orders/:id${tail.replace('pdf', ':format')}`,
    ...addressed,
    target: async (world, side) => ({ path: `/orders/${(await orderOn(world, side)).id}${tail}` }),
  })),
  {
    route: 'post /orders/:id/events',
    ...addressed,
    target: async (world, side) => ({
      path: `/orders/${(await orderOn(world, side)).id}/events`,
      body: {
        operationId: randomUUID(),
        event: 'acknowledge',
        note: 'by telephone',
        price: null,
        promised: null,
        batch: null,
      },
    }),
  },
  {
    route: 'get /letters',
    own: OUTCOMES.managersAlone,
    target: async () => ({ path: '/letters' }),
  },
  ...['', '/raw', '/attachments/0'].map((tail): RightsFixture => ({
    route: `get /letters/:id${tail.replace('/0', '/:index')}`,
    own: OUTCOMES.managersAlone,
    target: async (world) => ({ path: `/letters/${(await aLetter(await orderOn(world, 'own'))).id}${tail}` }),
  })),
  {
    // Nothing was caught here: a manager is told so as everybody else is.
    route: 'get /letters/:id/caught',
    own: { manager: 404, designer: 404, curator: 404, mill: 404, bench: 404 },
    target: async (world) => ({ path: `/letters/${(await aLetter(await orderOn(world, 'own'))).id}/caught` }),
  },
  {
    route: 'post /letters/:id/send-again',
    own: OUTCOMES.managersAlone,
    target: async (world) => ({
      path: `/letters/${(await aLetter(await orderOn(world, 'own'))).id}/send-again`,
      body: {},
    }),
  },
]
