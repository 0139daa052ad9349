import type { Actor } from '@shared/access'
import { benchWaits, planWaits } from './length-waits'
import { orderWaits, postWaits } from './order-waits'
import { reviewWaits } from './review-waits'
import { drawingWaits, overdueWaits } from './waiting'
import type { WaitingItem, WaitingSource } from './waiting'

/** Every part of the work that something can wait in. */
const WAITING_SOURCES: readonly WaitingSource[] = [
  drawingWaits,
  reviewWaits,
  orderWaits,
  planWaits,
  benchWaits,
  postWaits,
  overdueWaits,
]

/** Everything that waits for the actor: the urgent first, then what has waited longest. */
export async function whatWaits(actor: Actor): Promise<WaitingItem[]> {
  const found = await Promise.all(WAITING_SOURCES.map((source) => source(actor)))
  return found
    .flat()
    .sort((a, b) => Number(b.urgent) - Number(a.urgent) || a.since.getTime() - b.since.getTime())
}
