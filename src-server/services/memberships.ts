import { invalid } from '@shared/contracts'
import type { MembershipRequest, OutputOf } from '@shared/contracts'
import { Failure } from '@shared/failure'
import { Client, Membership, Mill, Person } from '../models/person'
import { now } from './clock'
import type { Tx } from './transaction'

export type NewMembership = OutputOf<typeof MembershipRequest>

/** Makes a membership. A curator must name a client that is there, a mill's person a mill; nobody else either. */
export async function enterMembership(
  tx: Tx,
  personId: string,
  { role, clientId, millId }: NewMembership,
  path: string,
): Promise<void> {
  requireFit(role === 'curator', clientId, `${path}/clientId`, 'client')
  requireFit(role === 'mill', millId, `${path}/millId`, 'mill')
  if (clientId !== null && (await Client.findByPk(clientId, { transaction: tx })) === null) {
    throw unknown(`${path}/clientId`, 'client')
  }
  if (millId !== null && (await Mill.findByPk(millId, { transaction: tx })) === null) {
    throw unknown(`${path}/millId`, 'mill')
  }
  await Membership.create({ personId, role, clientId, millId, createdAt: now() }, { transaction: tx })
}

function requireFit(isWanted: boolean, id: string | null, path: string, what: string): void {
  if (isWanted === (id !== null)) return
  const says = isWanted
    ? `is missing; a person with this role belongs to a ${what}.`
    : `has no meaning for this role; leave the ${what} out (null).`
  throw invalid([{ path, code: isWanted ? 'missing' : 'not-wanted', says }])
}

const unknown = (path: string, what: string): Failure =>
  invalid([{ path, code: 'unknown', says: `names no ${what} on the list; choose one that is.` }])

/** Archives the memberships that are no longer wanted and makes those that are new. */
export async function changeMemberships(
  tx: Tx,
  personId: string,
  wanted: readonly NewMembership[],
): Promise<void> {
  const held = await Membership.findAll({
    where: { personId, state: 'active' },
    transaction: tx,
    lock: tx.LOCK.UPDATE,
  })
  const isSame = (a: NewMembership, b: NewMembership) =>
    a.role === b.role && a.clientId === b.clientId && a.millId === b.millId
  for (const membership of held) {
    if (!wanted.some((other) => isSame(membership, other))) {
      await membership.update({ state: 'archived' }, { transaction: tx })
    }
  }
  for (const [index, membership] of wanted.entries()) {
    if (!held.some((other) => isSame(other, membership))) {
      await enterMembership(tx, personId, membership, `/memberships/${index}`)
    }
  }
}

/** Refuses a change after which nobody could manage the workshop. */
export async function requireSomeManager(tx: Tx): Promise<void> {
  const managers = await Person.count({
    where: { state: 'active' },
    include: [
      { model: Membership, as: 'memberships', where: { role: 'manager', state: 'active' }, required: true },
    ],
    distinct: true,
    transaction: tx,
  })
  if (managers > 0) return
  throw new Failure('not-ready', {
    says: 'The workshop would be left without a manager; make another person manager first.',
  })
}
