import type { Actor } from '@shared/access'
import type { OutputOf, SawCardRequest } from '@shared/contracts'
import { SawCard } from '../models/workshop'
import { now } from './clock'
import { latestBy } from './latest'
import { onceOnly } from './operation'
import { requireRight } from './rights'
import { inTransaction } from './transaction'
import type { Tx } from './transaction'

/** Each saw's card that holds now, by the saw's name. */
export async function listSaws(actor: Actor): Promise<SawCard[]> {
  requireRight(actor, 'saw.read', {})
  return latestSawCards()
}

export async function latestSawCards(tx?: Tx): Promise<SawCard[]> {
  const cards = await SawCard.findAll({
    order: [
      ['name', 'ASC'],
      ['no', 'ASC'],
    ],
    ...(tx === undefined ? {} : { transaction: tx }),
  })
  return [...latestBy(cards, ({ name }) => name.toLowerCase()).values()]
}

/** Adds the next card of the saw that the card names; a name not heard before is a new saw. */
export const addSawCard = (
  actor: Actor,
  { document, operationId }: OutputOf<typeof SawCardRequest>,
): Promise<SawCard[]> =>
  inTransaction(async (tx) => {
    requireRight(actor, 'saw.manage', {})
    const request = { what: 'saw-card', document }
    await onceOnly(tx, { operationId, actor, request }, async () => {
      const last = await SawCard.findOne({
        where: { name: document.name },
        order: [['no', 'DESC']],
        transaction: tx,
        lock: tx.LOCK.UPDATE,
      })
      const card = await SawCard.create(
        { name: document.name, no: (last?.no ?? 0) + 1, document, byId: actor.personId, at: now() },
        { transaction: tx },
      )
      return card.id
    })
    return latestSawCards(tx)
  })
