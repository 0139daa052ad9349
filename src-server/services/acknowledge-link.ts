import type { LinkAcknowledgeRequest, OutputOf } from '@shared/contracts'
import { eventsIn, ORDER_COURSE } from '@shared/course'
import { Failure } from '@shared/failure'
import { Commission } from '../models/commission'
import { KnifeOrder } from '../models/order'
import { Mill } from '../models/person'
import { Issue } from '../models/review'
import type { Link } from '../models/session'
import { now } from './clock'
import { findLink, isLinkLive } from './links'
import { takeOrderStep } from './order-course'
import { countTry } from './rate-limit'
import { notFound } from './rights'
import { readSettings } from './settings'
import { enterTrail } from './trail'
import { inTransaction } from './transaction'

const LIMIT = { what: 'link', mostTries: 60, windowMinutes: 15 } as const

export interface ShownLink {
  readonly purpose: Link['purpose']
  readonly workshop: string
  readonly used: boolean
  readonly order: {
    readonly order: KnifeOrder
    readonly commission: Commission
    readonly issue: Issue
    readonly mill: Mill
  } | null
}

/** What a link is for. Looking changes nothing. Unknown, revoked or past its day: as if it were not there. */
export async function readLink(token: string, from: string): Promise<ShownLink> {
  await countTry(LIMIT, from)
  const link = await findLink(token)
  if (link === null || link.revokedAt !== null || link.expiresAt.getTime() <= now().getTime())
    throw notFound()
  const { document: settings } = await readSettings()
  const common = { purpose: link.purpose, workshop: settings.workshop, used: link.usedAt !== null }
  if (link.purpose !== 'acknowledge-order' || link.subjectId === null) return { ...common, order: null }
  const order = await KnifeOrder.findByPk(link.subjectId, { rejectOnEmpty: true })
  return {
    ...common,
    order: {
      order,
      commission: await Commission.findByPk(order.commissionId, { rejectOnEmpty: true }),
      issue: await Issue.findByPk(order.issueId, { rejectOnEmpty: true }),
      mill: await Mill.findByPk(order.millId, { rejectOnEmpty: true }),
    },
  }
}

/** The mill says without an account that a letter has arrived: an order is acknowledged, a notice of holding noted. Once. */
export async function acknowledgeLink(
  token: string,
  from: string,
  { name, note }: OutputOf<typeof LinkAcknowledgeRequest>,
): Promise<void> {
  await countTry(LIMIT, from)
  await inTransaction(async (tx) => {
    const link = await findLink(token, tx)
    if (link === null || link.purpose !== 'acknowledge-order' || link.subjectId === null) throw notFound()
    if (!isLinkLive(link)) {
      throw new Failure('link-spent', {
        says: 'This link has been used already, or its time is over. The workshop has been told if it was used.',
      })
    }
    const found = await KnifeOrder.findByPk(link.subjectId, { transaction: tx, rejectOnEmpty: true })
    await Commission.findByPk(found.commissionId, { transaction: tx, lock: tx.LOCK.UPDATE })
    const order = await KnifeOrder.findByPk(found.id, {
      transaction: tx,
      lock: tx.LOCK.UPDATE,
      rejectOnEmpty: true,
    })
    const mill = await Mill.findByPk(order.millId, { transaction: tx, rejectOnEmpty: true })
    await link.update({ usedAt: now() }, { transaction: tx })
    const actor = {
      personId: mill.id,
      name: `${name}, ${mill.name}`.slice(0, 200),
      memberships: [{ role: 'mill' as const, clientId: null, millId: mill.id }],
    }
    const moves = eventsIn(ORDER_COURSE, order.state).includes('acknowledge')
    if (moves) await takeOrderStep(tx, order, { event: 'acknowledge', actor, note })
    await enterTrail(tx, {
      commissionId: order.commissionId,
      actor,
      act: 'order-acknowledged',
      says: moves
        ? `${order.number}: acknowledged by link`
        : `${order.number}: the notice was acknowledged by link`,
      document: { orderId: order.id, name, note },
    })
  })
}
