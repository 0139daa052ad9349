import type { Actor } from '@shared/access'
import { TrailEntry } from '../models/trail'
import { requireCommission } from './require-commission'

/** Everything that was done with a commission, the first first. */
export async function readTrail(actor: Actor, commissionId: string): Promise<TrailEntry[]> {
  await requireCommission(commissionId, { actor, right: 'trail.read' })
  return TrailEntry.findAll({ where: { commissionId }, order: [['seq', 'ASC']] })
}
