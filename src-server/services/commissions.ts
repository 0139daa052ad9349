import { Op } from 'sequelize'
import type { WhereOptions } from 'sequelize'
import { can, clientIdsOf, isOfWorkshop } from '@shared/access'
import type { Actor } from '@shared/access'
import { invalid } from '@shared/contracts'
import type {
  CommissionChangeRequest,
  CommissionListQuery,
  CommissionRequest,
  OutputOf,
} from '@shared/contracts'
import { standingOf } from '@shared/course'
import type { Standing } from '@shared/course'
import type { DraftSection } from '@shared/section'
import { Commission } from '../models/commission'
import { Client } from '../models/person'
import { now, today } from './clock'
import { commissionFacts } from './commission-facts'
import type { CommissionState } from './commission-facts'
import { enterDraft } from './drafts'
import { nextNumber, numberText } from './numbering'
import { onceOnly } from './operation'
import { picturesOf } from './pictures'
import type { PictureWithMeasurement } from './pictures'
import { photographsOf } from './photographs'
import type { PhotographWithReading } from './photographs'
import { requireCommission, withClient } from './require-commission'
import { requireRight } from './rights'
import { enterTrail } from './trail'
import { inTransaction } from './transaction'
import type { Tx } from './transaction'
import { requireVersion } from './versions'

/** A commission with where it stands. */
export interface StandingCommission {
  readonly commission: Commission
  readonly standing: Standing
  readonly latestIssue: CommissionState['latestIssue']
  /** Overdue, or something in it failed or was refused. */
  readonly isStuck: boolean
}

export interface WholeCommission extends StandingCommission {
  readonly pictures: readonly PictureWithMeasurement[]
  readonly photographs: readonly PhotographWithReading[]
}

/** Commissions that the actor may see, as the query narrows them, the newest first. */
export async function listCommissions(
  actor: Actor,
  query: OutputOf<typeof CommissionListQuery>,
): Promise<StandingCommission[]> {
  const commissions = await Commission.findAll({
    where: whereOf(actor, query),
    include: [withClient],
    order: [['number', 'DESC']],
  })
  const standing = await withStanding(commissions)
  return query.stage === undefined ? standing : standing.filter((one) => one.standing.stage === query.stage)
}

/** What a list of the actor's commissions is filtered by: the workshop sees all, a curator those of the own client. */
export function seenBy(actor: Actor): WhereOptions<Commission> {
  return isOfWorkshop(actor) ? {} : { clientId: { [Op.in]: [...clientIdsOf(actor)] } }
}

function whereOf(
  actor: Actor,
  { state, clientId, find }: OutputOf<typeof CommissionListQuery>,
): WhereOptions<Commission> {
  const words = (find ?? '').split(/\s+/).filter((text) => text !== '')
  return {
    [Op.and]: [
      seenBy(actor),
      state === 'all' ? {} : { state },
      clientId === undefined ? {} : { clientId },
      ...words.map((text) => {
        const like = { [Op.like]: `%${text.replaceAll(/[\\%_]/g, String.raw`\$&`)}%` }
        return {
          [Op.or]: [
            { number: like },
            { title: like },
            { artist: like },
            { accession: like },
            { '$client.name$': like },
          ],
        }
      }),
    ],
  }
}

export async function withStanding(commissions: readonly Commission[]): Promise<StandingCommission[]> {
  const states = await commissionFacts(commissions.map(({ id }) => id))
  const day = today()
  return commissions.map((commission) => {
    const state = states.get(commission.id)
    if (state === undefined) throw new Error('a commission has no facts')
    const standing = standingOf(state.facts)
    const isOverdue =
      commission.state === 'open' &&
      commission.due !== null &&
      commission.due < day &&
      standing.stage !== 'finish'
    return { commission, standing, latestIssue: state.latestIssue, isStuck: isOverdue || state.isStuck }
  })
}

export async function readCommission(actor: Actor, id: string): Promise<WholeCommission> {
  await requireCommission(id, { actor, right: 'commission.read' })
  const commission = await Commission.findByPk(id, { include: [withClient], rejectOnEmpty: true })
  const [standing] = await withStanding([commission])
  if (standing === undefined) throw new Error('a commission has no standing')
  const maySeePhotographs = can(actor, 'photograph.read', { clientId: commission.clientId })
  return {
    ...standing,
    pictures: await picturesOf(id),
    photographs: maySeePhotographs ? await photographsOf(id) : [],
  }
}

type NewCommission = OutputOf<typeof CommissionRequest>

export async function takeOnCommission(actor: Actor, request: NewCommission): Promise<WholeCommission> {
  const id = await inTransaction(async (tx) => {
    requireRight(actor, 'commission.manage', {})
    const { operationId, ...asked } = request
    return onceOnly(tx, { operationId, actor, request: { what: 'commission', ...asked } }, () =>
      enterCommission(tx, actor, asked),
    )
  })
  return readCommission(actor, id)
}

/** Makes the rows of a new commission: itself, its draft (bare, or the section given), the first entry of its trail. Gives its key. */
export async function enterCommission(
  tx: Tx,
  actor: Actor,
  { clientId, title, artist, accession, due }: Omit<NewCommission, 'operationId'>,
  section?: DraftSection,
): Promise<string> {
  const client = await Client.findByPk(clientId, { transaction: tx })
  if (client === null || client.state !== 'active') {
    throw invalid([
      { path: '/clientId', code: 'unknown', says: 'names no client on the list; choose one that is.' },
    ])
  }
  const number = numberText('C', await nextNumber(tx, 'commission'))
  const commission = await Commission.create(
    { number, clientId, title, artist, accession, due, createdById: actor.personId, createdAt: now() },
    { transaction: tx },
  )
  await enterDraft(tx, commission.id, section)
  await enterTrail(tx, {
    commissionId: commission.id,
    actor,
    act: 'commission-taken-on',
    says: `Took on ${number} for ${client.name}: ${title}`,
    document: { number, clientId, title, artist, accession, due },
  })
  return commission.id
}

export async function changeCommission(
  actor: Actor,
  id: string,
  { version, ...changes }: OutputOf<typeof CommissionChangeRequest>,
): Promise<WholeCommission> {
  await inTransaction(async (tx) => {
    const commission = await requireCommission(id, { actor, right: 'commission.manage', tx, lock: true })
    requireVersion(commission.version, version)
    const given = Object.fromEntries(Object.entries(changes).filter(([, value]) => value !== undefined))
    commission.set(given)
    const changed = Object.keys(given).filter((name) => commission.changed(name as keyof typeof changes))
    if (changed.length === 0) return
    await commission.save({ transaction: tx })
    await enterTrail(tx, {
      commissionId: id,
      actor,
      act: 'commission-changed',
      says: `Changed ${changed.join(', ')}`,
      document: given,
    })
  })
  return readCommission(actor, id)
}
