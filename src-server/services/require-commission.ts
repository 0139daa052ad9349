import type { Actor, Facts, Right } from '@shared/access'
import { Commission } from '../models/commission'
import { Client } from '../models/person'
import { notFound, requireRight, requireSeen } from './rights'
import type { Tx } from './transaction'

export interface ReachOptions {
  readonly actor: Actor
  /** What is to be done with it or with what hangs on it. */
  readonly right: Right
  /** What one must be allowed to see, or it is as if it were not there; the commission itself where absent. */
  readonly see?: Right
  readonly tx?: Tx
  /** Holds the commission's row until the transaction ends. */
  readonly lock?: boolean
}

/** The one way to a commission and to everything that hangs on it: it is there, seen and within the actor's rights. */
export async function requireCommission(id: string, options: ReachOptions): Promise<Commission> {
  const { actor, right, see = 'commission.read', tx, lock = false } = options
  const commission = await Commission.findByPk(id, {
    ...(tx === undefined ? {} : { transaction: tx }),
    ...(tx !== undefined && lock ? { lock: tx.LOCK.UPDATE } : {}),
  })
  if (commission === null) throw notFound()
  requireSeen(actor, see, factsOf(commission))
  requireRight(actor, right, factsOf(commission))
  return commission
}

export const factsOf = ({ clientId }: Pick<Commission, 'clientId'>): Facts => ({ clientId })

/** With the client that it is for. */
export const withClient = { model: Client, as: 'client', required: true }
