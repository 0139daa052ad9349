import { Op } from 'sequelize'
import type { CommissionFacts, OrderStateName } from '@shared/course'
import { KnifeOrder } from '../models/order'
import { Letter } from '../models/letter'
import type { FactSource } from './commission-facts'

const WAITS_FOR: Readonly<Record<OrderStateName, CommissionFacts['order']>> = {
  prepared: 'awaits-mill',
  queued: 'awaits-mill',
  sent: 'awaits-mill',
  acknowledged: 'awaits-mill',
  quoted: 'awaits-manager',
  'price-accepted': 'awaits-mill',
  'first-off-reported': 'awaits-first-off-decision',
  'first-off-accepted': 'first-off-settled',
  'part-delivered': 'first-off-settled',
  delivered: 'first-off-settled',
  closed: 'first-off-settled',
  held: 'held',
  cancelled: 'cancelled',
}

/** The latest order of each commission; held orders and letters that failed are stuck. */
export const ordersKnown: FactSource = async (commissionIds) => {
  const where = { commissionId: { [Op.in]: [...commissionIds] } }
  const orders = await KnifeOrder.findAll({
    where,
    order: [
      ['at', 'ASC'],
      ['number', 'ASC'],
    ],
  })
  const failed = await Letter.findAll({ where: { ...where, state: 'failed' }, attributes: ['commissionId'] })
  const withFailure = new Set(failed.map(({ commissionId }) => commissionId))
  const known = new Map(
    orders.map(({ commissionId, state }) => [
      commissionId,
      { facts: { order: WAITS_FOR[state] }, isStuck: state === 'held' || withFailure.has(commissionId) },
    ]),
  )
  for (const id of withFailure) if (!known.has(id)) known.set(id, { facts: { order: 'none' }, isStuck: true })
  return known
}
