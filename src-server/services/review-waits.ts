import { can } from '@shared/access'
import { Commission } from '../models/commission'
import { Issue, Remark } from '../models/review'
import { seenBy } from './commissions'
import { factsOfIssue } from './require-issue'
import { briefOf, hasRole } from './waiting'
import type { WaitingItem, WaitingSource } from './waiting'

/** Curators: issues that wait for their word. Designers: issues that came back with remarks. */
export const reviewWaits: WaitingSource = async (actor) => {
  const wanted = [
    ...(hasRole(actor, 'curator') ? ['put-forward'] : []),
    ...(hasRole(actor, 'designer') ? ['returned'] : []),
  ]
  if (wanted.length === 0) return []
  const commissions = await Commission.findAll({ where: { ...seenBy(actor), state: 'open' } })
  const byId = new Map(commissions.map((commission) => [commission.id, commission]))
  const issues = await Issue.findAll({ where: { commissionId: [...byId.keys()], state: wanted } })
  const items = await Promise.all(
    issues.map(async (issue): Promise<WaitingItem[]> => {
      const commission = byId.get(issue.commissionId)
      if (commission === undefined) return []
      const common = {
        commission: briefOf(commission),
        to: `/commissions/${commission.id}/review`,
        since: issue.at,
      }
      if (issue.state === 'put-forward') {
        if (!can(actor, 'issue.decide', factsOfIssue(commission, issue))) return []
        return [
          { ...common, kind: 'review', says: `Issue ${issue.letter} waits for your word`, urgent: false },
        ]
      }
      const open = await Remark.count({ where: { issueId: issue.id, state: 'open' } })
      const says = `Issue ${issue.letter} came back${open > 0 ? ` with ${open} open ${open === 1 ? 'remark' : 'remarks'}` : ''}`
      return [{ ...common, kind: 'answer-remarks', says, urgent: false }]
    }),
  )
  return items.flat()
}
