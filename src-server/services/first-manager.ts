import type { FirstManagerRequest, OutputOf } from '@shared/contracts'
import { Failure } from '@shared/failure'
import { Person } from '../models/person'
import { Link } from '../models/session'
import { now } from './clock'
import { findLink, isLinkLive, makeLink } from './links'
import { hashPassword } from './passwords'
import { enterPerson } from './people'
import { countTry } from './rate-limit'
import { beginSession } from './sessions'
import type { BegunSession } from './sessions'
import { keepSettings, readSettings } from './settings'
import { inTransaction } from './transaction'

const BY_ADDRESS = { what: 'first-manager', mostTries: 20, windowMinutes: 15 }

/** A link for the first manager of an empty installation; an earlier one is worthless from now on. Undefined: there is somebody already. */
export const inviteFirstManager = (): Promise<string | undefined> =>
  inTransaction(async (tx) => {
    if ((await Person.count({ transaction: tx })) > 0) return undefined
    await Link.update(
      { revokedAt: now() },
      { where: { purpose: 'first-manager', usedAt: null, revokedAt: null }, transaction: tx },
    )
    return makeLink(tx, { purpose: 'first-manager', subjectId: null, days: 7 })
  })

/** Makes the first manager, names the workshop and signs the person in. The link works once. */
export async function welcomeFirstManager(
  { token, name, email, password, workshop }: OutputOf<typeof FirstManagerRequest>,
  from: string,
): Promise<BegunSession> {
  await countTry(BY_ADDRESS, from)
  const passwordHash = await hashPassword(password)
  return inTransaction(async (tx) => {
    const link = await findLink(token, tx)
    const isMeant = link !== null && link.purpose === 'first-manager' && isLinkLive(link)
    if (!isMeant || (await Person.count({ transaction: tx })) > 0) throw spent()
    await link.update({ usedAt: now() }, { transaction: tx })
    const memberships = [{ role: 'manager' as const, clientId: null, millId: null }]
    const personId = await enterPerson(tx, { name, email, passwordHash, memberships })
    const settings = await readSettings(tx)
    await keepSettings(tx, {
      version: settings.version,
      document: { ...settings.document, workshop, signature: `${name}\n${workshop}` },
    })
    return beginSession(tx, personId)
  })
}

const spent = (): Failure =>
  new Failure('link-spent', {
    says: 'This link was used, has run out or was replaced. Start Listel again to be given a new one.',
  })
