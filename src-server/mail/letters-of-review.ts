import type { Commission } from '../models/commission'
import { Membership, Person } from '../models/person'
import type { Decision, Issue } from '../models/review'
import { installation } from '../services/installation'
import { readSettings } from '../services/settings'
import type { Tx } from '../services/transaction'
import { issueDecidedLetter, issuePutForwardLetter } from './letters/review-letters'
import { queueLetter } from './outbox'

interface About {
  readonly commission: Commission
  readonly issue: Issue
}

/** Queues a letter to each of the client's curators. */
export async function tellCuratorsOfIssue(tx: Tx, { commission, issue }: About): Promise<void> {
  const curators = await Membership.findAll({
    where: { role: 'curator', clientId: commission.clientId, state: 'active' },
    transaction: tx,
  })
  const people = await Person.findAll({
    where: { id: curators.map(({ personId }) => personId), state: 'active' },
    transaction: tx,
  })
  const common = await commonParts(tx, { commission, issue })
  for (const { email } of people) {
    await queueLetter(tx, {
      kind: 'issue-put-forward',
      about: { type: 'issue', id: issue.id, commissionId: commission.id },
      to: email,
      body: issuePutForwardLetter({ ...common, note: issue.note }),
    })
  }
}

/** Queues a letter to whoever put the issue forward. */
export async function tellDesignersOfDecision(
  tx: Tx,
  { commission, issue, decision }: About & { readonly decision: Decision },
): Promise<void> {
  const author = await Person.findByPk(issue.putForwardById, { transaction: tx })
  if (author === null || author.state !== 'active') return
  const { kind, typedName, statement } = decision
  await queueLetter(tx, {
    kind: 'issue-decided',
    about: { type: 'issue', id: issue.id, commissionId: commission.id },
    to: author.email,
    body: issueDecidedLetter({
      ...(await commonParts(tx, { commission, issue })),
      kind,
      by: typedName,
      statement,
    }),
  })
}

async function commonParts(tx: Tx, { commission, issue }: About) {
  const { document: settings } = await readSettings(tx)
  return {
    workshop: settings.workshop,
    signature: settings.signature,
    title: commission.title,
    number: commission.number,
    issueLetter: issue.letter,
    sha256: issue.sha256,
    url: `${installation().publicUrl}/commissions/${commission.id}/review`,
  }
}
