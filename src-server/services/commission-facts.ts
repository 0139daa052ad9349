import { Op, QueryTypes } from 'sequelize'
import type { CommissionFacts } from '@shared/course'
import { Measurement, Picture } from '../models/commission'
import { database } from '../models/database'
import { Photograph } from '../models/photograph'
import { lengthsKnown } from './lengths-known'
import { ordersKnown } from './orders-known'
import { issuesKnown } from './review-known'

/** What one source knows of a commission. */
export interface KnownOfCommission {
  readonly facts?: Partial<CommissionFacts>
  readonly latestIssue?: {
    readonly id: string
    readonly letter: string
    readonly state: 'put-forward' | 'returned' | 'approved' | 'withdrawn' | 'superseded'
  }
  /** Something failed or was refused, so that nothing goes on until a person acts. */
  readonly isStuck?: boolean
}

/** Looks up many commissions at once; those it knows nothing of may be left out. */
export type FactSource = (commissionIds: readonly string[]) => Promise<ReadonlyMap<string, KnownOfCommission>>

/** Everything that a commission's standing is read from. */
export const FACT_SOURCES: readonly FactSource[] = [
  picturesKnown,
  photographsKnown,
  draftsKnown,
  issuesKnown,
  ordersKnown,
  lengthsKnown,
]

/** All facts of a commission, with what the list says besides. */
export interface CommissionState {
  readonly facts: CommissionFacts
  readonly latestIssue: KnownOfCommission['latestIssue'] | null
  readonly isStuck: boolean
}

const NOTHING_KNOWN: CommissionState = {
  facts: {
    pictures: 0,
    measuredPictures: 0,
    photographs: 0,
    draftMembers: 0,
    issue: 'none',
    draftMovedOn: false,
    order: 'none',
    rackHasShape: false,
    cutList: 'none',
  },
  latestIssue: null,
  isStuck: false,
}

/** The facts of each commission, every source asked once. */
export async function commissionFacts(
  commissionIds: readonly string[],
): Promise<ReadonlyMap<string, CommissionState>> {
  const answers = await Promise.all(FACT_SOURCES.map((source) => source(commissionIds)))
  return new Map(
    commissionIds.map((id) => {
      const known = answers.flatMap((answer) => answer.get(id) ?? [])
      return [id, known.reduce<CommissionState>(withKnown, NOTHING_KNOWN)]
    }),
  )
}

function withKnown(state: CommissionState, known: KnownOfCommission): CommissionState {
  return {
    facts: { ...state.facts, ...known.facts },
    latestIssue: known.latestIssue ?? state.latestIssue,
    isStuck: state.isStuck || known.isStuck === true,
  }
}

async function picturesKnown(commissionIds: readonly string[]) {
  const pictures = await Picture.findAll({
    where: { commissionId: { [Op.in]: [...commissionIds] }, state: 'open' },
    attributes: ['id', 'commissionId'],
  })
  const measured = await Measurement.findAll({
    where: { pictureId: { [Op.in]: pictures.map(({ id }) => id) }, no: 1 },
    attributes: ['pictureId'],
  })
  const measuredIds = new Set(measured.map(({ pictureId }) => pictureId))
  return grouped(pictures, (own) => ({
    pictures: own.length,
    measuredPictures: own.filter(({ id }) => measuredIds.has(id)).length,
  }))
}

async function photographsKnown(commissionIds: readonly string[]) {
  const photographs = await Photograph.findAll({
    where: { commissionId: { [Op.in]: [...commissionIds] }, state: 'open' },
    attributes: ['id', 'commissionId'],
  })
  return grouped(photographs, (own) => ({ photographs: own.length }))
}

/** The members are counted by the database: a list of commissions has no need of every drawing whole. */
async function draftsKnown(commissionIds: readonly string[]) {
  if (commissionIds.length === 0) return new Map<string, KnownOfCommission>()
  const drafts = await database().query<{ commissionId: string; members: number }>(
    `SELECT commission_id AS commissionId, JSON_LENGTH(document, '$.members') AS members
     FROM draft WHERE commission_id IN (:commissionIds)`,
    { replacements: { commissionIds }, type: QueryTypes.SELECT },
  )
  return grouped(drafts, ([draft]) => ({ draftMembers: draft?.members ?? 0 }))
}

/** Rows of many commissions, told apart; each group says its facts. */
function grouped<Row extends { readonly commissionId: string }>(
  rows: readonly Row[],
  factsOf: (own: readonly Row[]) => Partial<CommissionFacts>,
): ReadonlyMap<string, KnownOfCommission> {
  const groups = new Map<string, Row[]>()
  for (const row of rows) groups.set(row.commissionId, [...(groups.get(row.commissionId) ?? []), row])
  return new Map([...groups].map(([id, own]) => [id, { facts: factsOf(own) }]))
}
