import { DatabaseError, Transaction } from 'sequelize'
import { database } from '../models/database'

export type Tx = Transaction

const DEADLOCK = 1213
const MOST_TRIES = 3

/**
 * Does the work in one transaction, all of it or none. A deadlock with another transaction is tried again, so the
 * work must have no effect outside the database (letters are rows, files are written before).
 */
export async function inTransaction<T>(work: (tx: Tx) => Promise<T>): Promise<T> {
  for (let tries = 1; ; tries += 1) {
    try {
      return await database().transaction(
        { isolationLevel: Transaction.ISOLATION_LEVELS.READ_COMMITTED },
        work,
      )
    } catch (error) {
      if (!isDeadlock(error) || tries >= MOST_TRIES) throw error
    }
  }
}

function isDeadlock(error: unknown): boolean {
  return error instanceof DatabaseError && 'errno' in error.original && error.original.errno === DEADLOCK
}
