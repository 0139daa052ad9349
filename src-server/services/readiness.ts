import { Failure } from '@shared/failure'
import { migratorOf } from '../migrations/migrator'
import { database } from '../models/database'

/** Throws out-of-service until the database answers and has every migration. */
export async function requireReady(): Promise<void> {
  const pending = await migratorOf(database()).pending()
  if (pending.length > 0) {
    throw new Failure('out-of-service', {
      says: `The database waits for ${pending.length} migration(s); run "npm run db:migrate".`,
    })
  }
}
