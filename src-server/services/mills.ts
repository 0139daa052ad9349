import type { Actor } from '@shared/access'
import type {
  MillCard as MillCardDocument,
  MillCardRequest,
  MillChangeRequest,
  MillRequest,
  OutputOf,
} from '@shared/contracts'
import { Mill } from '../models/person'
import { MillCard } from '../models/workshop'
import { now } from './clock'
import { latestBy } from './latest'
import { onceOnly } from './operation'
import { notFound, requireRight } from './rights'
import { inTransaction } from './transaction'
import type { Tx } from './transaction'
import { requireVersion } from './versions'

/** A mill with the card that holds now; null: it has sent none. */
export interface MillWithCard {
  readonly mill: Mill
  readonly card: MillCard | null
}

export async function listMills(actor: Actor, state: 'active' | 'archived' | 'all'): Promise<MillWithCard[]> {
  requireRight(actor, 'mill.read', {})
  const mills = await Mill.findAll({
    where: state === 'all' ? {} : { state },
    order: [
      ['name', 'ASC'],
      ['id', 'ASC'],
    ],
  })
  const cards = latestBy(
    await MillCard.findAll({ where: { millId: mills.map(({ id }) => id) } }),
    ({ millId }) => millId,
  )
  return mills.map((mill) => ({ mill, card: cards.get(mill.id) ?? null }))
}

export async function readMill(actor: Actor, id: string): Promise<MillWithCard> {
  requireRight(actor, 'mill.read', {})
  return requireMill(id)
}

export async function listMillCards(actor: Actor, id: string): Promise<MillCard[]> {
  requireRight(actor, 'mill.read', {})
  const { mill } = await requireMill(id)
  return MillCard.findAll({ where: { millId: mill.id }, order: [['no', 'DESC']] })
}

export async function requireMill(id: string, tx?: Tx): Promise<MillWithCard> {
  const options = tx === undefined ? {} : { transaction: tx }
  const mill = await Mill.findByPk(id, options)
  if (mill === null) throw notFound()
  const card = await MillCard.findOne({ where: { millId: id }, order: [['no', 'DESC']], ...options })
  return { mill, card }
}

export const takeOnMill = (
  actor: Actor,
  { name, email, card }: OutputOf<typeof MillRequest>,
): Promise<MillWithCard> =>
  inTransaction(async (tx) => {
    requireRight(actor, 'mill.manage', {})
    const mill = await Mill.create({ name, email, createdAt: now() }, { transaction: tx })
    if (card !== null) await enterCard(tx, actor, mill.id, card)
    return requireMill(mill.id, tx)
  })

export const changeMill = (
  actor: Actor,
  id: string,
  { version, name, email, state }: OutputOf<typeof MillChangeRequest>,
): Promise<MillWithCard> =>
  inTransaction(async (tx) => {
    requireRight(actor, 'mill.manage', {})
    const mill = await requireLocked(tx, id)
    requireVersion(mill.version, version)
    if (name !== undefined) mill.name = name
    if (email !== undefined) mill.email = email
    if (state !== undefined) mill.state = state
    await mill.save({ transaction: tx })
    return requireMill(id, tx)
  })

/** Adds the next card; the earlier ones stay as they were. */
export const addMillCard = (
  actor: Actor,
  id: string,
  { document, operationId }: OutputOf<typeof MillCardRequest>,
): Promise<MillWithCard> =>
  inTransaction(async (tx) => {
    requireRight(actor, 'mill.manage', {})
    await requireLocked(tx, id)
    const request = { what: 'mill-card', id, document }
    await onceOnly(tx, { operationId, actor, request }, () => enterCard(tx, actor, id, document))
    return requireMill(id, tx)
  })

async function requireLocked(tx: Tx, id: string): Promise<Mill> {
  const mill = await Mill.findByPk(id, { transaction: tx, lock: tx.LOCK.UPDATE })
  if (mill === null) throw notFound()
  return mill
}

async function enterCard(tx: Tx, actor: Actor, millId: string, document: MillCardDocument): Promise<string> {
  const last =
    (await MillCard.max<number | null, MillCard>('no', { where: { millId }, transaction: tx })) ?? 0
  const card = await MillCard.create(
    { millId, no: last + 1, document, byId: actor.personId, at: now() },
    { transaction: tx },
  )
  return card.id
}
