import type { Actor } from '@shared/access'
import { canonicalText, sha256Hex } from '@shared/section'
import { Commission } from '../models/commission'
import { TrailEntry } from '../models/trail'
import { now } from './clock'
import type { Kept } from './operation'
import type { Tx } from './transaction'

export interface TrailAct {
  readonly commissionId: string
  readonly actor: Actor
  /** One of a closed vocabulary of the service that enters it, as `issue-decided`. */
  readonly act: string
  /** What happened, in words for people. */
  readonly says: string
  readonly document: Kept
}

/** Enters an act in the commission's trail, chained by its hash to the entry before. Holds the commission's row. */
export async function enterTrail(tx: Tx, entry: TrailAct): Promise<void> {
  const { commissionId, actor, act, says, document } = entry
  await Commission.findByPk(commissionId, { attributes: ['id'], transaction: tx, lock: tx.LOCK.UPDATE })
  const last = await TrailEntry.findOne({
    where: { commissionId },
    order: [['seq', 'DESC']],
    transaction: tx,
  })
  const row = {
    commissionId,
    seq: (last?.seq ?? 0) + 1,
    at: now(),
    actorId: actor.personId,
    actorName: actor.name,
    act,
    says,
    document,
    prevHash: last?.hash ?? null,
  }
  await TrailEntry.create({ ...row, hash: hashOf(row) }, { transaction: tx })
}

type Hashed = Pick<
  TrailEntry,
  'commissionId' | 'seq' | 'at' | 'actorId' | 'actorName' | 'act' | 'says' | 'document' | 'prevHash'
>

/** SHA-256 of the canonical JSON of an entry with the hash of the one before. */
export function hashOf(row: Hashed): string {
  const { commissionId, seq, at, actorId, actorName, act, says, document, prevHash } = row
  return sha256Hex(
    canonicalText({
      commissionId,
      seq,
      at: at.toISOString(),
      actorId,
      actorName,
      act,
      says,
      document,
      prevHash,
    }),
  )
}
