import { randomUUID } from 'node:crypto'

import { aCommission, SOUND_SECTION } from '../../helpers/factories/commissions'
import { anIssue, aRemark } from '../../helpers/factories/review'
import { clientOn, OUTCOMES } from './fixture'
import type { RightsFixture, Side, World } from './fixture'

const readers = { own: OUTCOMES.readers, foreign: OUTCOMES.readersOfOtherClient }
/** The client's own curators and the designers write; the bench looks. */
const remarks = {
  own: { manager: 'done', designer: 'done', curator: 'done', mill: 404, bench: 403 },
  foreign: { manager: 'done', designer: 'done', curator: 404, mill: 404, bench: 403 },
} as const

const issueOn = async (world: World, side: Side) =>
  anIssue({ commission: await aCommission({ clientId: clientOn(world, side), section: SOUND_SECTION }) })

/** Issues, remarks, decisions and sheets. */
export const REVIEW_FIXTURES: readonly RightsFixture[] = [
  {
    route: 'post /commissions/:id/issues',
    own: OUTCOMES.staffShownToReaders,
    foreign: OUTCOMES.staffShownToWorkshop,
    target: async (world, side) => {
      const { id } = await aCommission({ clientId: clientOn(world, side), section: SOUND_SECTION })
      const body = { version: 1, operationId: randomUUID(), note: '', openOrders: null }
      return { path: `/commissions/${id}/issues`, body }
    },
  },
  {
    route: 'get /commissions/:id/issues',
    ...readers,
    target: async (world, side) => ({
      path: `/commissions/${(await issueOn(world, side)).commissionId}/issues`,
    }),
  },
  ...['', '/difference', '/sheet.svg'].map((tail): RightsFixture => ({
    route: `get /issues/:id${tail.replace('svg', ':format')}`,
    ...readers,
    target: async (world, side) => ({ path: `/issues/${(await issueOn(world, side)).id}${tail}` }),
  })),
  {
    route: 'post /issues/:id/remarks',
    ...remarks,
    target: async (world, side) => ({
      path: `/issues/${(await issueOn(world, side)).id}/remarks`,
      body: { operationId: randomUUID(), place: { x: 10, y: 30 }, text: 'Deeper here?' },
    }),
  },
  {
    route: 'post /remarks/:id/entries',
    ...remarks,
    target: async (world, side) => ({
      path: `/remarks/${(await aRemark(await issueOn(world, side))).id}/entries`,
      body: { operationId: randomUUID(), text: 'Measured again.', state: 'answered' },
    }),
  },
  {
    route: 'post /issues/:id/decisions',
    own: { manager: 403, designer: 403, curator: 'done', mill: 404, bench: 403 },
    foreign: { manager: 403, designer: 403, curator: 404, mill: 404, bench: 403 },
    target: async (world, side) => {
      const { id, sha256 } = await issueOn(world, side)
      const body = {
        operationId: randomUUID(),
        kind: 'approve',
        typedName: 'A. Person',
        statement: 'Agreed.',
        sha256,
      }
      return { path: `/issues/${id}/decisions`, body }
    },
  },
]
