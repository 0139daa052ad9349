import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { Express } from 'express'
import { afterAll, beforeAll } from 'vitest'
import { buildApp } from '@server/app'
import { migratorOf } from '@server/migrations/migrator'
import { closeDatabase, openDatabase } from '@server/models/database'
import { testDatabaseUrl } from './database'

/** A running application on this worker's database, with files of its own. */
export interface TestApplication {
  readonly app: Express
  readonly dataDir: string
  readonly databaseUrl: string
}

export interface ApplicationOptions {
  /** Another database than the worker's. */
  readonly databaseUrl?: string
  readonly smtpUrl?: string
  readonly caughtMailDir?: string
  readonly clientDir?: string
}

const SECRET = 'a secret of forty characters, for tests.'

/** The application for the tests of a file: built before the first, closed after the last. */
export function useApplication(options: ApplicationOptions = {}): TestApplication {
  let running: (TestApplication & { stop(): Promise<void> }) | undefined
  const current = () => {
    if (running === undefined) throw new Error('the application is there only while tests run')
    return running
  }
  beforeAll(async () => {
    running = await startApplication(options)
  })
  afterAll(async () => {
    await running?.stop()
    running = undefined
  })
  return {
    get app() {
      return current().app
    },
    get dataDir() {
      return current().dataDir
    },
    get databaseUrl() {
      return current().databaseUrl
    },
  }
}

export async function startApplication(options: ApplicationOptions = {}) {
  const databaseUrl = options.databaseUrl ?? (await testDatabaseUrl())
  const sequelize = await openDatabase(databaseUrl)
  await migratorOf(sequelize).up()
  const dataDir = await mkdtemp(join(tmpdir(), 'listel-data-'))
  const app = buildApp({
    databaseUrl,
    smtpUrl: options.smtpUrl ?? 'smtp://127.0.0.1:1',
    host: '127.0.0.1',
    port: 4700,
    secret: SECRET,
    dataDir,
    clientDir: options.clientDir,
    publicUrl: 'http://127.0.0.1:4700',
    caughtMailDir: options.caughtMailDir,
    mailFrom: 'Listel <listel@listel.example>',
    logLevel: 'silent',
  })
  const stop = async () => {
    await closeDatabase()
    await rm(dataDir, { recursive: true, force: true })
  }
  return { app, dataDir, databaseUrl, stop }
}
