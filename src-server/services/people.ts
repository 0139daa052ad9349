import type { Actor } from '@shared/access'
import type { PersonChangeRequest, PersonRequest, PreferencesRequest, OutputOf } from '@shared/contracts'
import { Failure } from '@shared/failure'
import { UniqueConstraintError } from 'sequelize'
import { Client, Membership, Mill, Person } from '../models/person'
import { now } from './clock'
import { changeMemberships, enterMembership, requireSomeManager } from './memberships'
import { hashPassword } from './passwords'
import { notFound, requireRight } from './rights'
import { endSessionsOf } from './sessions'
import { inTransaction } from './transaction'
import type { Tx } from './transaction'
import { requireVersion } from './versions'

type NewPerson = OutputOf<typeof PersonRequest>

const WITH_MEMBERSHIPS = {
  model: Membership,
  as: 'memberships',
  where: { state: 'active' },
  required: false,
  include: [
    { model: Client, as: 'client' },
    { model: Mill, as: 'mill' },
  ],
}

/** A person with the memberships that hold now, each with its client or mill. */
export async function requirePerson(id: string, tx?: Tx): Promise<Person> {
  const person = await Person.findByPk(id, {
    include: [WITH_MEMBERSHIPS],
    ...(tx === undefined ? {} : { transaction: tx }),
  })
  if (person === null) throw notFound()
  return person
}

export async function listPeople(actor: Actor, state: 'active' | 'archived' | 'all'): Promise<Person[]> {
  requireRight(actor, 'people.manage', {})
  return Person.findAll({
    where: state === 'all' ? {} : { state },
    include: [WITH_MEMBERSHIPS],
    order: [
      ['name', 'ASC'],
      ['id', 'ASC'],
    ],
  })
}

export async function takeInPerson(actor: Actor, request: NewPerson): Promise<Person> {
  requireRight(actor, 'people.manage', {})
  const passwordHash = await hashPassword(request.password)
  return inTransaction(async (tx) => {
    const id = await enterPerson(tx, { ...request, passwordHash })
    return requirePerson(id, tx)
  })
}

/** Makes the rows of a person. Refuses an address that somebody has, and memberships that make no sense. */
export async function enterPerson(
  tx: Tx,
  { name, email, passwordHash, memberships }: Omit<NewPerson, 'password'> & { readonly passwordHash: string },
): Promise<string> {
  try {
    const person = await Person.create(
      { name, email: email.toLowerCase(), passwordHash, createdAt: now() },
      { transaction: tx },
    )
    for (const [index, membership] of memberships.entries()) {
      await enterMembership(tx, person.id, membership, `/memberships/${index}`)
    }
    return person.id
  } catch (error) {
    if (!(error instanceof UniqueConstraintError)) throw error
    throw new Failure('already-exists', {
      says: 'Somebody with this address is on the list already; look among the archived too.',
      faults: [{ path: '/email', code: 'already-exists', says: 'is on the list already.' }],
    })
  }
}

export async function changePerson(
  actor: Actor,
  id: string,
  { version, name, password, memberships, state }: OutputOf<typeof PersonChangeRequest>,
): Promise<Person> {
  requireRight(actor, 'people.manage', {})
  const passwordHash = password === undefined ? undefined : await hashPassword(password)
  return inTransaction(async (tx) => {
    const person = await Person.findByPk(id, { transaction: tx, lock: tx.LOCK.UPDATE })
    if (person === null) throw notFound()
    requireVersion(person.version, version)
    if (name !== undefined) person.name = name
    if (state !== undefined) person.state = state
    if (passwordHash !== undefined) person.passwordHash = passwordHash
    // A save that changes nothing else still counts, since the memberships are part of what people see.
    person.changed('name', true)
    await person.save({ transaction: tx })
    if (memberships !== undefined) await changeMemberships(tx, id, memberships)
    if (passwordHash !== undefined || state === 'archived') await endSessionsOf(tx, id)
    await requireSomeManager(tx)
    return requirePerson(id, tx)
  })
}

export const changePreferences = (
  actor: Actor,
  { units, vocabulary }: OutputOf<typeof PreferencesRequest>,
): Promise<Person> =>
  inTransaction(async (tx) => {
    await Person.update({ units, vocabulary }, { where: { id: actor.personId }, transaction: tx })
    return requirePerson(actor.personId, tx)
  })
