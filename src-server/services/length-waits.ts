import { Op } from 'sequelize'
import { KnifeOrder } from '../models/order'
import { listCutLists } from './cut-lists'
import { briefOf, hasRole, openCommissions } from './waiting'
import type { WaitingItem, WaitingSource } from './waiting'

/** The bench: lists to cut. */
export const benchWaits: WaitingSource = async (actor) => {
  if (!hasRole(actor, 'bench')) return []
  const lists = await listCutLists(actor)
  return lists
    .filter(({ list }) => list.state === 'open')
    .map(({ list, commission, cuts, done, isOutOfDate }): WaitingItem => ({
      kind: 'cut',
      says: `Cut list ${list.no}: ${cuts - done} of ${cuts} rails to cut${isOutOfDate ? ', out of date: look before you cut' : ''}`,
      commission: briefOf(commission),
      to: `/cut-lists/${list.id}`,
      since: list.at,
      urgent: isOutOfDate,
    }))
}

/** Designers: orders to be sent, rails to be planned, lists to be opened. */
export const planWaits: WaitingSource = async (actor) => {
  if (!hasRole(actor, 'designer')) return []
  const ready = (await openCommissions(actor)).filter(
    ({ standing }) =>
      standing.role === 'designer' && (standing.stage === 'lengths' || standing.stage === 'knife'),
  )
  const told = await withOrderUnderWay(ready.map(({ commission }) => commission.id))
  const untold = ready.filter(
    ({ commission, standing }) => standing.stage !== 'knife' || !told.has(commission.id),
  )
  return untold.map(({ commission, standing, isStuck }) => ({
    kind: standing.stage === 'lengths' ? 'plan' : 'order',
    says: standing.waitsFor,
    commission: briefOf(commission),
    to: `/commissions/${commission.id}/${standing.stage}`,
    since: commission.createdAt,
    urgent: isStuck,
  }))
}

/** Commissions with an order that was not cancelled: what it waits for, the orders tell by themselves. */
async function withOrderUnderWay(commissionIds: readonly string[]): Promise<ReadonlySet<string>> {
  const orders = await KnifeOrder.findAll({
    where: { commissionId: { [Op.in]: [...commissionIds] }, state: { [Op.ne]: 'cancelled' } },
    attributes: ['commissionId'],
  })
  return new Set(orders.map(({ commissionId }) => commissionId))
}
