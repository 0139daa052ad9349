import { readStoreConfig } from '../config'
import { closeDatabase, openDatabase } from '../models/database'
import { inviteFirstManager } from '../services/first-manager'
import { runProgram } from './program'

/** Prints the one-time address at which the first manager signs up; nothing when somebody is there already. */
runProgram(async () => {
  const { databaseUrl, publicUrl } = readStoreConfig(process.env)
  await openDatabase(databaseUrl)
  try {
    const token = await inviteFirstManager()
    if (token !== undefined) process.stdout.write(`${publicUrl}/welcome/${token}\n`)
  } finally {
    await closeDatabase()
  }
})
