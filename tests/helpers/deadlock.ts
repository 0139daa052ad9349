import { inTransaction } from '@server/services/transaction'
import { Client } from '@server/models/person'

/**
 * Two transactions that take two rows in opposite order, each waiting for the other at its first try: a deadlock for
 * certain. Gives how often the work of either was begun.
 */
export async function crossOver(a: Client, b: Client): Promise<number> {
  let tries = 0
  let holding = 0
  let release = () => {}
  const bothHold = new Promise<void>((resolve) => (release = resolve))
  const rename = (first: Client, second: Client, name: string) => {
    let isFirstTry = true
    return inTransaction(async (tx) => {
      tries += 1
      await Client.update({ name: `${name} 1` }, { where: { id: first.id }, transaction: tx })
      if (isFirstTry) {
        isFirstTry = false
        holding += 1
        if (holding === 2) release()
        await bothHold
      }
      await Client.update({ name: `${name} 2` }, { where: { id: second.id }, transaction: tx })
    })
  }
  await Promise.all([rename(a, b, 'there'), rename(b, a, 'back')])
  return tries
}

/** A transaction that fails after writing. */
export function failAfterWriting(client: Client): Promise<void> {
  return inTransaction(async (tx) => {
    await Client.update({ name: 'half done' }, { where: { id: client.id }, transaction: tx })
    throw new Error('failed on purpose')
  })
}
