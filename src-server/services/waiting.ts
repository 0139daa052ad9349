import { QueryTypes } from 'sequelize'
import type { Actor, RoleOfPerson } from '@shared/access'
import type { WaitingLineView } from '@shared/contracts'
import { Commission } from '../models/commission'
import { database } from '../models/database'
import { today } from './clock'
import { seenBy, withStanding } from './commissions'
import type { StandingCommission } from './commissions'
import { withClient } from './require-commission'

/** One thing that waits for a person. */
export interface WaitingItem extends Omit<WaitingLineView, 'since' | 'commission'> {
  readonly since: Date
  readonly commission: { readonly id: string; readonly number: string; readonly title: string } | null
}

/** Says what waits for the actor in one part of the work; nothing for a role that it does not concern. */
export type WaitingSource = (actor: Actor) => Promise<readonly WaitingItem[]>

export const hasRole = (actor: Actor, role: RoleOfPerson): boolean =>
  actor.memberships.some((membership) => membership.role === role)

/** Open commissions that the actor may see, with where they stand. */
export async function openCommissions(actor: Actor): Promise<StandingCommission[]> {
  const commissions = await Commission.findAll({
    where: { ...seenBy(actor), state: 'open' },
    include: [withClient],
  })
  return withStanding(commissions)
}

/** Designers: pictures to be measured, evidence to be found, sections to be drawn. */
export async function drawingWaits(actor: Actor): Promise<readonly WaitingItem[]> {
  if (!hasRole(actor, 'designer')) return []
  const waiting = (await openCommissions(actor)).filter(({ standing }) =>
    ['picture', 'evidence', 'section'].includes(standing.stage),
  )
  const since = await lastActs(waiting)
  return waiting.map(({ commission, standing, isStuck }) => ({
    kind: standing.stage === 'picture' ? 'measure' : 'draw',
    says: standing.waitsFor,
    commission: briefOf(commission),
    to: `/commissions/${commission.id}/${standing.stage}`,
    since: since.get(commission.id) ?? commission.createdAt,
    urgent: isStuck,
  }))
}

/** Managers: what is past its day, wherever it stands. */
export async function overdueWaits(actor: Actor): Promise<readonly WaitingItem[]> {
  if (!hasRole(actor, 'manager')) return []
  const day = today()
  return (await openCommissions(actor)).flatMap(({ commission, standing }) => {
    const { id, due } = commission
    if (due === null || due >= day || standing.stage === 'finish') return []
    return {
      kind: 'overdue' as const,
      says: `Was due on ${due}. ${standing.waitsFor}`,
      commission: briefOf(commission),
      to: `/commissions/${id}/${standing.stage}`,
      since: new Date(`${due}T00:00:00.000Z`),
      urgent: true,
    }
  })
}

export const briefOf = ({ id, number, title }: Commission) => ({ id, number, title })

/** When something last happened in each commission. */
async function lastActs(waiting: readonly StandingCommission[]): Promise<ReadonlyMap<string, Date>> {
  if (waiting.length === 0) return new Map()
  const rows = await database().query<{ commissionId: string; at: Date }>(
    'SELECT commission_id AS commissionId, MAX(at) AS at FROM trail WHERE commission_id IN (:ids) GROUP BY commission_id',
    { replacements: { ids: waiting.map(({ commission }) => commission.id) }, type: QueryTypes.SELECT },
  )
  return new Map(rows.map(({ commissionId, at }) => [commissionId, at]))
}
