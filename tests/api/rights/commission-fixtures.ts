import { randomUUID } from 'node:crypto'
import { MEASUREMENT, aPicture } from '../../helpers/factories/commissions'
import { aPhotograph, anImageFile } from '../../helpers/factories/photographs'
import { OUTCOMES, clientOn, commissionOn } from './fixture'
import type { RightsFixture, Side, World } from './fixture'

const readers = { own: OUTCOMES.readers, foreign: OUTCOMES.readersOfOtherClient }
const staffShownToReaders = { own: OUTCOMES.staffShownToReaders, foreign: OUTCOMES.staffShownToWorkshop }

const pictureOn = async (world: World, side: Side) => aPicture(await commissionOn(world, side))
const photographOn = async (world: World, side: Side) => aPhotograph(await commissionOn(world, side))

/** Commissions, pictures, photographs, drafts, the trail. */
export const COMMISSION_FIXTURES: readonly RightsFixture[] = [
  {
    route: 'get /commissions',
    own: { manager: 'done', designer: 'done', curator: 'done', mill: 404, bench: 'done' },
    target: async () => ({ path: '/commissions' }),
  },
  {
    route: 'post /commissions',
    own: { manager: 'done', designer: 'done', curator: 403, mill: 404, bench: 403 },
    target: async (world, side) => ({
      path: '/commissions',
      body: {
        operationId: randomUUID(),
        clientId: clientOn(world, side),
        title: 'Harbour',
        artist: '',
        accession: '',
        due: null,
      },
    }),
  },
  {
    route: 'get /commissions/:id',
    ...readers,
    target: async (world, side) => ({ path: `/commissions/${(await commissionOn(world, side)).id}` }),
  },
  {
    route: 'patch /commissions/:id',
    ...staffShownToReaders,
    target: async (world, side) => {
      const { id, version } = await commissionOn(world, side)
      return { path: `/commissions/${id}`, body: { version, title: 'Another title' } }
    },
  },
  {
    route: 'post /commissions/:id/pictures',
    ...staffShownToReaders,
    target: async (world, side) => ({
      path: `/commissions/${(await commissionOn(world, side)).id}/pictures`,
      body: { operationId: randomUUID(), name: 'Left wing', copies: 1 },
    }),
  },
  {
    route: 'patch /pictures/:id',
    ...staffShownToReaders,
    target: async (world, side) => {
      const { id, version } = await pictureOn(world, side)
      return { path: `/pictures/${id}`, body: { version, copies: 2 } }
    },
  },
  {
    route: 'post /pictures/:id/measurements',
    ...staffShownToReaders,
    target: async (world, side) => ({
      path: `/pictures/${(await pictureOn(world, side)).id}/measurements`,
      body: { operationId: randomUUID(), document: MEASUREMENT },
    }),
  },
  {
    route: 'get /pictures/:id/measurements',
    ...readers,
    target: async (world, side) => ({ path: `/pictures/${(await pictureOn(world, side)).id}/measurements` }),
  },
  {
    route: 'get /commissions/:id/trail',
    ...staffShownToReaders,
    target: async (world, side) => ({ path: `/commissions/${(await commissionOn(world, side)).id}/trail` }),
  },
  {
    route: 'post /commissions/:id/photographs',
    ...staffShownToReaders,
    target: async (world, side) => ({
      path: `/commissions/${(await commissionOn(world, side)).id}/photographs`,
      body: { operationId: randomUUID(), title: 'The old frame', source: '', citation: '' },
      file: { bytes: await anImageFile(), name: 'frame.png' },
    }),
  },
  {
    route: 'patch /photographs/:id',
    ...staffShownToReaders,
    target: async (world, side) => {
      const { id, version } = await photographOn(world, side)
      return { path: `/photographs/${id}`, body: { version, title: 'Another title' } }
    },
  },
  {
    route: 'get /photographs/:id/image',
    ...readers,
    target: async (world, side) => ({ path: `/photographs/${(await photographOn(world, side)).id}/image` }),
  },
  {
    route: 'get /photographs/:id/original',
    ...readers,
    target: async (world, side) => ({
      path: `/photographs/${(await photographOn(world, side)).id}/original`,
    }),
  },
  {
    route: 'post /photographs/:id/readings',
    ...staffShownToReaders,
    target: async (world, side) => ({
      path: `/photographs/${(await photographOn(world, side)).id}/readings`,
      body: { operationId: randomUUID(), document: { scale: null, lay: null } },
    }),
  },
  {
    route: 'get /commissions/:id/draft',
    ...staffShownToReaders,
    target: async (world, side) => ({ path: `/commissions/${(await commissionOn(world, side)).id}/draft` }),
  },
  {
    route: 'post /commissions/:id/draft/edits',
    ...staffShownToReaders,
    target: async (world, side) => ({
      path: `/commissions/${(await commissionOn(world, side)).id}/draft/edits`,
      body: {
        version: 1,
        operationId: randomUUID(),
        steps: [{ act: 'do', name: 'set the gesso', edit: { act: 'set', field: 'gesso', value: 0.5 } }],
      },
    }),
  },
  {
    route: 'get /commissions/:id/file',
    ...staffShownToReaders,
    target: async (world, side) => ({ path: `/commissions/${(await commissionOn(world, side)).id}/file` }),
  },
  {
    route: 'post /commissions/import',
    own: { manager: 'done', designer: 'done', curator: 403, mill: 404, bench: 403 },
    target: async (world, side) => ({
      path: '/commissions/import',
      body: {
        operationId: randomUUID(),
        clientId: clientOn(world, side),
        file: { listel: 1, title: 'Harbour' },
      },
    }),
  },
]
