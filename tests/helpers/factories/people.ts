import { randomUUID } from 'node:crypto'
import argon2 from 'argon2'
import type { RoleName } from '@shared/contracts'
import { Client, Membership, Mill, Person } from '@server/models/person'
import { MillCard, SawCard } from '@server/models/workshop'
import { MILL_CARD, SAW_CARD } from './cards'

/** The password of every person made here. */
export const PASSWORD = 'correct horse battery'

/** Cheap to check: these tests are about the application, not about argon2. */
let passwordHash: Promise<string> | undefined

/** A few letters that no other row has. */
export const unique = (): string => randomUUID().slice(0, 8)

export interface PersonWish {
  readonly role: RoleName
  readonly clientId?: string
  readonly millId?: string
  readonly name?: string
  readonly email?: string
  readonly state?: 'active' | 'archived'
}

/** A person with one role; a curator without a client gets a new one, a mill's person a new mill. */
export async function aPerson({ role, clientId, millId, ...wish }: PersonWish): Promise<Person> {
  passwordHash ??= argon2.hash(PASSWORD, { memoryCost: 1024, timeCost: 2, parallelism: 1 })
  const tag = unique()
  const person = await Person.create({
    name: wish.name ?? `Person ${tag}`,
    email: wish.email ?? `person-${tag}@listel.example`,
    passwordHash: await passwordHash,
    state: wish.state ?? 'active',
    createdAt: new Date(),
  })
  await Membership.create({
    personId: person.id,
    role,
    clientId: role === 'curator' ? (clientId ?? (await aClient()).id) : null,
    millId: role === 'mill' ? (millId ?? (await aMill()).id) : null,
    createdAt: new Date(),
  })
  return person
}

export const aClient = (wish: { readonly name?: string; readonly state?: 'active' | 'archived' } = {}) =>
  Client.create({
    name: wish.name ?? `Client ${unique()}`,
    state: wish.state ?? 'active',
    createdAt: new Date(),
  })

/** A mill with its first card. */
export async function aMill(wish: { readonly name?: string; readonly email?: string } = {}): Promise<Mill> {
  const tag = unique()
  const mill = await Mill.create({
    name: wish.name ?? `Mill ${tag}`,
    email: wish.email ?? `mill-${tag}@listel.example`,
    createdAt: new Date(),
  })
  await aMillCard(mill)
  return mill
}

export async function aMillCard(mill: Mill, document = MILL_CARD): Promise<MillCard> {
  const no = (await MillCard.count({ where: { millId: mill.id } })) + 1
  return MillCard.create({ millId: mill.id, no, document, byId: mill.id, at: new Date() })
}

export async function aSawCard(name = `Saw ${unique()}`): Promise<SawCard> {
  const no = (await SawCard.count({ where: { name } })) + 1
  return SawCard.create({ name, no, document: { ...SAW_CARD, name }, byId: randomUUID(), at: new Date() })
}
