import { Op } from 'sequelize'
import { Issue } from '../models/review'
import type { FactSource } from './commission-facts'

/** The latest issue of each commission, for the list and the standing. */
export const issuesKnown: FactSource = async (commissionIds) => {
  const issues = await Issue.findAll({
    where: { commissionId: { [Op.in]: [...commissionIds] } },
    attributes: ['id', 'commissionId', 'letter', 'state', 'no'],
    order: [['no', 'ASC']],
  })
  return new Map(
    issues.map(({ id, commissionId, letter, state }) => [
      commissionId,
      { facts: { issue: state }, latestIssue: { id, letter, state } },
    ]),
  )
}
