import { Failure } from '@shared/failure'
import { Person } from '../models/person'
import { countTry, forgiveTry } from './rate-limit'
import type { Limit } from './rate-limit'
import { isPasswordOf } from './passwords'
import { beginSession } from './sessions'
import type { BegunSession } from './sessions'
import { inTransaction } from './transaction'

const BY_ACCOUNT: Limit = { what: 'sign-in-account', mostTries: 10, windowMinutes: 15 }
const BY_ADDRESS: Limit = { what: 'sign-in-address', mostTries: 100, windowMinutes: 15 }

export interface Credentials {
  readonly email: string
  readonly password: string
}

/** Begins a session. Refuses in the same words whether the address, the password or the account is at fault. */
export async function signIn({ email, password }: Credentials, from: string): Promise<BegunSession> {
  const account = email.toLowerCase()
  await countTry(BY_ADDRESS, from)
  await countTry(BY_ACCOUNT, account)
  const person = await Person.findOne({ where: { email: account } })
  const isRight = await isPasswordOf(person?.passwordHash, password)
  if (person === null || !isRight || person.state !== 'active') {
    throw new Failure('sign-in-refused', {
      says: 'The address and the password do not go together. Check both, or ask the workshop manager.',
    })
  }
  const session = await inTransaction((tx) => beginSession(tx, person.id))
  await forgiveTry(BY_ADDRESS, from)
  await forgiveTry(BY_ACCOUNT, account)
  return session
}
