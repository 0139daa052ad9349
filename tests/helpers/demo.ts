import { readFile } from 'node:fs/promises'
import { join } from 'node:path'
import type { Express } from 'express'
import { openFileStore } from '@server/files/file-store'
import { fillDemo } from '@server/seeds/demo'
import type { DemoSignIn } from '@server/seeds/people'
import { setInstallation } from '@server/services/installation'
import { startApplication } from './application'
import { stranger } from './client'
import type { HttpClient } from './client'
import { emptyDatabase } from './database'

/** The demo filled into a database of its own. */
export interface FilledDemo {
  readonly app: Express
  readonly signIns: readonly DemoSignIn[]
  /** Fills it again, as a second start would if it did not know better. */
  fillAgain(): Promise<void>
  stop(): Promise<void>
}

export async function filledDemo(): Promise<FilledDemo> {
  const { url, drop } = await emptyDatabase()
  const { app, dataDir, stop } = await startApplication({ databaseUrl: url })
  openFileStore(dataDir)
  setInstallation({
    publicUrl: 'http://127.0.0.1:4700',
    caughtMailDir: undefined,
    mailFrom: 'workshop@listel.example',
  })
  const fill = () => fillDemo({ dataDir })
  await fill()
  const text = await readFile(join(dataDir, 'demo-sign-ins.json'), 'utf8')
  return {
    app,
    signIns: JSON.parse(text) as readonly DemoSignIn[],
    fillAgain: fill,
    stop: async () => {
      await stop()
      await drop()
    },
  }
}

/** A browser signed in as somebody of the demo. */
export async function signedInAs({ app, signIns }: FilledDemo, name: string): Promise<HttpClient> {
  const found = signIns.find((one) => one.name === name)
  if (found === undefined) throw new Error(`${name} is not of the demo`)
  const client = stranger(app)
  const answer = await client.post('/session', { email: found.email, password: found.password })
  if (answer.status !== 200) throw new Error(`sign-in answered ${answer.status}: ${answer.text}`)
  return client
}
