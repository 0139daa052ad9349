import { randomUUID } from 'node:crypto'
import { Cut } from '@server/models/cut-list'
import { aCommission, aMeasurement, aPicture, SOUND_SECTION } from '../../helpers/factories/commissions'
import { aCutList, aRackPiece } from '../../helpers/factories/lengths'
import { aSawCard } from '../../helpers/factories/people'
import { anIssue } from '../../helpers/factories/review'
import { clientOn, OUTCOMES } from './fixture'
import type { RightsFixture, Side, World } from './fixture'

const approvedOn = async (world: World, side: Side) => {
  const commission = await aCommission({ clientId: clientOn(world, side), section: SOUND_SECTION })
  await aMeasurement(await aPicture(commission))
  return anIssue({ commission, state: 'approved' })
}
const listOn = async (world: World, side: Side, state: 'closed' | 'open' = 'open') =>
  aCutList(await approvedOn(world, side), state)

const workshop = { own: OUTCOMES.workshop, foreign: OUTCOMES.workshop }
/** The workshop sees it; managers and designers do it. */
const staffShownToBench = { manager: 'done', designer: 'done', curator: 404, mill: 404, bench: 403 } as const

/** Rack, rails, plans, cut lists. */
export const LENGTH_FIXTURES: readonly RightsFixture[] = [
  { route: 'get /rack', own: OUTCOMES.workshop, target: async () => ({ path: '/rack' }) },
  {
    route: 'post /rack',
    own: staffShownToBench,
    target: async (world) => ({
      path: '/rack',
      body: {
        operationId: randomUUID(),
        length: 2440,
        count: 2,
        endTrim: [75, 75],
        species: 'basswood',
        finish: '',
        issueId: (await approvedOn(world, 'own')).id,
        trueWidth: null,
        trueRebate: null,
      },
    }),
  },
  {
    route: 'post /rack/movements',
    own: staffShownToBench,
    target: async () => ({
      path: '/rack/movements',
      body: {
        operationId: randomUUID(),
        pieceId: (await aRackPiece()).id,
        act: 'scrap',
        length: null,
        reason: 'split',
      },
    }),
  },
  {
    route: 'get /commissions/:id/rails',
    own: { manager: 'done', designer: 'done', curator: 403, mill: 404, bench: 'done' },
    foreign: OUTCOMES.workshop,
    target: async (world, side) => ({
      path: `/commissions/${(await approvedOn(world, side)).commissionId}/rails`,
    }),
  },
  {
    route: 'post /commissions/:id/plans',
    own: OUTCOMES.staffShownToReaders,
    foreign: OUTCOMES.staffShownToWorkshop,
    target: async (world, side) => {
      await aSawCard()
      const issue = await approvedOn(world, side)
      const body = {
        operationId: randomUUID(),
        issueId: issue.id,
        lengths: [{ length: 2440, price: null, count: null }],
        useRack: false,
        order: { setupPieces: 0, firstOff: 0, reserve: 0 },
      }
      return { path: `/commissions/${issue.commissionId}/plans`, body }
    },
  },
  { route: 'get /cut-lists', own: OUTCOMES.workshop, target: async () => ({ path: '/cut-lists' }) },
  ...['', '/print.pdf'].map((tail): RightsFixture => ({
    route: `get /cut-lists/:id${tail}`,
    ...workshop,
    target: async (world, side) => ({ path: `/cut-lists/${(await listOn(world, side)).id}${tail}` }),
  })),
  {
    // The first-off is not accepted here: only a manager may open the list all the same.
    route: 'post /cut-lists/:id/open',
    own: OUTCOMES.managersShownToWorkshop,
    foreign: OUTCOMES.managersShownToWorkshop,
    target: async (world, side) => ({
      path: `/cut-lists/${(await listOn(world, side, 'closed')).id}/open`,
      body: { operationId: randomUUID(), reason: 'the first-off lies on the bench' },
    }),
  },
  {
    route: 'post /cut-lists/:id/facts',
    ...workshop,
    target: async (world, side) => {
      const { id, version } = await listOn(world, side)
      const cut = await Cut.findOne({ where: { cutListId: id }, rejectOnEmpty: true })
      const body = {
        operationId: randomUUID(),
        listVersion: version,
        kind: 'cut',
        cutId: cut.id,
        lengthNo: null,
        trueLength: 800.1,
        deviceTime: new Date().toISOString(),
      }
      return { path: `/cut-lists/${id}/facts`, body }
    },
  },
]
