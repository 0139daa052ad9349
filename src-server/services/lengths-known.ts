import { Op } from 'sequelize'
import { CutList } from '../models/cut-list'
import { Batch, RackPiece } from '../models/rack'
import { Issue } from '../models/review'
import type { FactSource } from './commission-facts'

/** Whether moulding of the latest issue's shape lies on the rack, and how far the latest cut list is. */
export const lengthsKnown: FactSource = async (commissionIds) => {
  const where = { commissionId: { [Op.in]: [...commissionIds] } }
  const issues = await Issue.findAll({
    where,
    attributes: ['commissionId', 'shapeSha256', 'no'],
    order: [['no', 'ASC']],
  })
  const shapeOf = new Map(issues.map(({ commissionId, shapeSha256 }) => [commissionId, shapeSha256]))
  const batches = await Batch.findAll({ where: { shapeSha256: [...new Set(shapeOf.values())] } })
  const free = await RackPiece.findAll({
    where: { batchId: batches.map(({ id }) => id), state: ['on-rack', 'reserved'] },
    attributes: ['batchId'],
  })
  const withPieces = new Set(free.map(({ batchId }) => batchId))
  const shapesOnRack = new Set(
    batches.filter(({ id }) => withPieces.has(id)).map(({ shapeSha256 }) => shapeSha256),
  )
  const lists = await CutList.findAll({
    where,
    attributes: ['commissionId', 'state', 'no'],
    order: [['no', 'ASC']],
  })
  const stateOf = new Map(lists.map(({ commissionId, state }) => [commissionId, state]))
  return new Map(
    commissionIds.map((id) => {
      const shape = shapeOf.get(id)
      const facts = {
        rackHasShape: shape !== undefined && shapesOnRack.has(shape),
        cutList: stateOf.get(id) ?? 'none',
      } as const
      return [id, { facts }]
    }),
  )
}
