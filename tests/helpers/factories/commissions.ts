import { randomUUID } from 'node:crypto'
import type { Measurement as MeasurementDocument } from '@shared/contracts'
import type { DraftSection } from '@shared/section'
import { Commission, Measurement, Picture } from '@server/models/commission'
import { Draft } from '@server/models/draft'
import { aClient, unique } from './people'

export interface CommissionWish {
  readonly clientId?: string
  readonly title?: string
  readonly artist?: string
  readonly accession?: string
  readonly due?: string | null
  readonly state?: 'open' | 'archived'
  readonly section?: DraftSection
}

/** A commission with its draft; a client of its own unless one is named. */
export async function aCommission(wish: CommissionWish = {}): Promise<Commission> {
  const commission = await Commission.create({
    number: `T-${unique()}`,
    clientId: wish.clientId ?? (await aClient()).id,
    title: wish.title ?? `Harbour at low water ${unique()}`,
    artist: wish.artist ?? 'Unknown',
    accession: wish.accession ?? `1910.${unique()}`,
    due: wish.due ?? null,
    state: wish.state ?? 'open',
    createdById: randomUUID(),
    createdAt: new Date(),
  })
  await Draft.create({ commissionId: commission.id, document: wish.section ?? BARE, version: 1 })
  return commission
}

const BARE: DraftSection = {
  sightEdgeHeight: 30,
  rebate: { width: 8, depth: 20 },
  backSplay: { x: 0, height: 0 },
  gesso: 0,
  tolerance: 0.2,
  members: [],
}

/** A section that has no fault and a basis for every dimension: 50 wide, from 30 up to 42 and down to 34 mm. */
export const SOUND_SECTION: DraftSection = {
  ...BARE,
  basis: { sightEdgeHeight: { kind: 'judged', note: 'as the rebate needs' } },
  members: [
    {
      key: 'a',
      kind: 'fillet',
      width: 4,
      rise: 0,
      basis: { width: { kind: 'judged', note: 'from the print' } },
    },
    {
      key: 'b',
      kind: 'cyma-recta',
      width: 20,
      rise: 12,
      basis: {
        width: { kind: 'measured', plusMinus: 0.4, photograph: 'p1' },
        rise: { kind: 'precedent', citation: 'Pattern book of the workshop, no. 14' },
      },
    },
    {
      key: 'c',
      kind: 'torus',
      width: 14,
      rise: 0,
      basis: { width: { kind: 'measured', plusMinus: 0.5, photograph: 'p1' } },
    },
    {
      key: 'd',
      kind: 'cavetto',
      width: 8,
      rise: -8,
      basis: {
        width: { kind: 'judged', note: 'as its fellows' },
        rise: { kind: 'judged', note: 'as its fellows' },
      },
    },
    {
      key: 'e',
      kind: 'fillet',
      width: 4,
      rise: 0,
      basis: { width: { kind: 'judged', note: 'as the first' } },
    },
  ],
}

export async function aPicture(
  commission: Pick<Commission, 'id'>,
  wish: { readonly name?: string; readonly copies?: number; readonly state?: 'open' | 'archived' } = {},
): Promise<Picture> {
  const position = (await Picture.count({ where: { commissionId: commission.id } })) + 1
  return Picture.create({
    commissionId: commission.id,
    position,
    name: wish.name ?? `Picture ${unique()}`,
    copies: wish.copies ?? 1,
    state: wish.state ?? 'open',
    createdAt: new Date(),
  })
}

export const MEASUREMENT: MeasurementDocument = {
  width: [914, 914.5],
  height: [610],
  diagonals: [1099, 1098.2],
  thickness: 12,
  allowance: 3,
  lining: 0.5,
  stack: { glazing: 3, airGap: 3, backing: 4, fixings: 2 },
  measuredBy: 'Somebody of the workshop',
  measuredOn: '2026-11-20',
  inFrame: false,
}

export async function aMeasurement(
  picture: Pick<Picture, 'id'>,
  document: Partial<MeasurementDocument> = {},
): Promise<Measurement> {
  const no = (await Measurement.count({ where: { pictureId: picture.id } })) + 1
  return Measurement.create({
    pictureId: picture.id,
    no,
    document: { ...MEASUREMENT, ...document },
    byId: randomUUID(),
    at: new Date(),
  })
}
