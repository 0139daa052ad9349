import { readStoreConfig } from '../config'
import { openFileStore } from '../files/file-store'
import { closeDatabase, openDatabase } from '../models/database'
import { fillDemo } from '../seeds/demo'
import { setInstallation } from '../services/installation'
import { runProgram } from './program'

/** Fills the demo workshop into an empty database and notes its sign-ins in the data folder. */
runProgram(async () => {
  const { databaseUrl, dataDir, publicUrl, mailFrom } = readStoreConfig(process.env)
  await openDatabase(databaseUrl)
  openFileStore(dataDir)
  setInstallation({ publicUrl, caughtMailDir: undefined, mailFrom })
  try {
    await fillDemo({ dataDir })
  } finally {
    await closeDatabase()
  }
})
