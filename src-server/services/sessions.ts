import { Op } from 'sequelize'
import type { Actor } from '@shared/access'
import { Membership, Person } from '../models/person'
import { Session } from '../models/session'
import { now } from './clock'
import type { Tx } from './transaction'

const MINUTE = 60_000
/** Left alone this long a session ends. */
const IDLE = 12 * 60 * MINUTE
/** And this long after sign-in in any case. */
const ABSOLUTE = 14 * 24 * 60 * MINUTE
/** `seen` is written at most this often. */
const SEEN_EVERY = MINUTE

/** A session that was begun just now, and whose it is. */
export interface BegunSession {
  readonly sessionId: string
  readonly personId: string
}

export interface LiveSession {
  readonly actor: Actor
  readonly sessionId: string
}

export async function beginSession(tx: Tx, personId: string): Promise<BegunSession> {
  const at = now()
  const expiresAt = new Date(at.getTime() + ABSOLUTE)
  const session = await Session.create(
    { personId, createdAt: at, seenAt: at, expiresAt },
    { transaction: tx },
  )
  return { sessionId: session.id, personId }
}

/** The session if it is neither ended, idle too long nor past its end, and its person is still active. */
export async function liveSession(id: string): Promise<LiveSession | undefined> {
  const at = now()
  const session = await Session.findOne({
    where: {
      id,
      endedAt: null,
      expiresAt: { [Op.gt]: at },
      seenAt: { [Op.gt]: new Date(at.getTime() - IDLE) },
    },
  })
  if (session === null) return undefined
  const actor = await findActor(session.personId)
  if (actor === undefined) return undefined
  if (at.getTime() - session.seenAt.getTime() > SEEN_EVERY) {
    await Session.update({ seenAt: at }, { where: { id } })
  }
  return { actor, sessionId: id }
}

/** Ends it for good: the token that names it is worthless from now on. */
export async function endSession(id: string): Promise<void> {
  await Session.update({ endedAt: now() }, { where: { id, endedAt: null } })
}

export async function endSessionsOf(tx: Tx, personId: string): Promise<void> {
  await Session.update({ endedAt: now() }, { where: { personId, endedAt: null }, transaction: tx })
}

async function findActor(personId: string): Promise<Actor | undefined> {
  const person = await Person.findOne({
    where: { id: personId, state: 'active' },
    include: [{ model: Membership, as: 'memberships', where: { state: 'active' }, required: false }],
  })
  if (person === null) return undefined
  const memberships = (person.memberships ?? []).map(({ role, clientId, millId }) => ({
    role,
    clientId,
    millId,
  }))
  return { personId: person.id, name: person.name, memberships }
}
