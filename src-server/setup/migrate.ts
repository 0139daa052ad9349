import { readDatabaseUrl } from '../config'
import { migratorOf } from '../migrations/migrator'
import { closeDatabase, openDatabase } from '../models/database'
import { runProgram } from './program'

runProgram(async () => {
  const sequelize = await openDatabase(readDatabaseUrl(process.env))
  try {
    const done = await migratorOf(sequelize).up()
    process.stdout.write(`${done.length} migration(s) run\n`)
  } finally {
    await closeDatabase()
  }
})
