import { randomUUID } from 'node:crypto'
import type { Actor } from '@shared/access'
import type { OrderEventRequest, OrderInput, OutputOf } from '@shared/contracts'
import { recordOrderEvent } from '../services/record-order-event'
import { sendOrder } from '../services/send-order'

/** An order as the workshop usually writes it. */
export const orderFor = (
  species: string,
  lengths: OrderInput['lengths'],
  wantedBy: string,
  notes = '',
): OrderInput => ({
  lengths,
  firstOff: 300,
  setupPieces: 2,
  species,
  moisture: 9,
  grade: 'clear, straight grained, quarter or rift where it can be had',
  sanding: 'as it leaves the knife',
  notes,
  wantedBy,
})

export const orderFrom = (
  actor: Actor,
  issueId: string,
  millId: string,
  document: OrderInput,
): Promise<string> => sendOrder(actor, issueId, { operationId: randomUUID(), millId, document })

type Said = OutputOf<typeof OrderEventRequest>

/** Records a step of an order with what was said. */
export async function step(
  actor: Actor,
  orderId: string,
  event: Said['event'],
  said: Partial<Pick<Said, 'note' | 'price' | 'promised' | 'batch'>> = {},
): Promise<void> {
  const silent = { note: '', price: null, promised: null, batch: null }
  await recordOrderEvent(actor, orderId, { operationId: randomUUID(), event, ...silent, ...said })
}
