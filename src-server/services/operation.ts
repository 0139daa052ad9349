import { UniqueConstraintError } from 'sequelize'
import type { Actor } from '@shared/access'
import { Failure } from '@shared/failure'
import { canonicalText, sha256Hex } from '@shared/section'
import { Operation } from '../models/operation'
import { now } from './clock'
import type { Tx } from './transaction'

/** Plain data that can be kept: what a repeated request is given again. */
export type Kept = null | boolean | number | string | readonly Kept[] | { readonly [name: string]: Kept }

export interface OnceOnly {
  readonly operationId: string
  readonly actor: Actor
  /** What was asked, with where it was asked: a repeat must ask the same. */
  readonly request: unknown
}

/**
 * Does the work once for an operation id. A repeat of the same request by the same person is given what the first
 * gave (usually the key of what it made, which the caller then shows as it stands); any other use of the id is
 * refused with operation-reused. A repeat that comes while the first still runs waits for it.
 */
export async function onceOnly<T extends Kept>(
  tx: Tx,
  { operationId, actor, request }: OnceOnly,
  work: () => Promise<T>,
): Promise<T> {
  const requestSha256 = sha256Hex(canonicalText(withoutUndefined(request)))
  const first = await begin(tx, operationId, actor, requestSha256)
  if (first === 'begun') {
    const answer = await work()
    await Operation.update({ answer }, { where: { operationId }, transaction: tx })
    return answer
  }
  if (first.actorId !== actor.personId || first.requestSha256 !== requestSha256) {
    throw new Failure('operation-reused', {
      says: 'This operation id was used for another request; make a new one for each act.',
    })
  }
  return first.answer as T
}

async function begin(
  tx: Tx,
  operationId: string,
  actor: Actor,
  requestSha256: string,
): Promise<'begun' | Operation> {
  try {
    await Operation.create(
      { operationId, actorId: actor.personId, requestSha256, answer: null, at: now() },
      { transaction: tx },
    )
    return 'begun'
  } catch (error) {
    if (!(error instanceof UniqueConstraintError)) throw error
    const first = await Operation.findByPk(operationId, { transaction: tx })
    if (first === null) throw error
    return first
  }
}

/** The same data with absent keys truly absent, as it would travel. */
const withoutUndefined = (value: unknown): unknown => JSON.parse(JSON.stringify(value ?? null))
