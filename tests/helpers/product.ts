import { spawn } from 'node:child_process'
import type { ChildProcess } from 'node:child_process'
import { once } from 'node:events'
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { setTimeout as wait } from 'node:timers/promises'
import { anyFreePort } from './free-port'
import { ROOT } from './source-files'

/** One of the demo workshop's people, as `npm start` prints them. */
export interface SignIn {
  readonly role: string
  readonly name: string
  readonly email: string
  readonly password: string
}

/** The product as a person starts it: own data folder, own port, the demo workshop in it. */
export interface Product {
  readonly url: string
  readonly dataDir: string
  readonly signIns: readonly SignIn[]
  /** The first sign-in of this role; throws when the demo has none. */
  signInOf(role: string): SignIn
  /** Ends all of it and removes its folder. */
  stop(): Promise<void>
}

/** The demo is filled and its database made anew: seconds on an idle machine, far more on a busy one. */
const LONGEST_START_MS = 300_000

/** Starts the built product on a data folder of its own and waits until it has said all it says. */
export async function startProduct(): Promise<Product> {
  const dataDir = mkdtempSync(join(tmpdir(), 'listel-journey-'))
  const port = await anyFreePort()
  const child = spawn(process.execPath, ['src-server/setup/start.mjs'], {
    cwd: ROOT,
    env: environmentOf(dataDir, port),
    stdio: ['ignore', 'pipe', 'pipe'],
  })
  let said = ''
  for (const stream of [child.stdout, child.stderr])
    stream.on('data', (chunk: Buffer) => (said += chunk.toString()))
  const stop = async () => {
    await end(child)
    rmSync(dataDir, { recursive: true, force: true })
  }
  try {
    await untilReady(child, () => said)
  } catch (fault) {
    await stop()
    throw fault
  }
  const signIns = signInsIn(dataDir)
  return {
    url: `http://127.0.0.1:${port}`,
    dataDir,
    signIns,
    signInOf: (role) => {
      const found = signIns.find((signIn) => signIn.role === role)
      if (found === undefined) throw new Error(`the demo has nobody who signs in as ${role}`)
      return found
    },
    stop,
  }
}

function environmentOf(dataDir: string, port: number): NodeJS.ProcessEnv {
  const build = process.env.LISTEL_TEST_BUILD
  if (build === undefined)
    throw new Error('LISTEL_TEST_BUILD is not set: run these tests by "npm run test:e2e"')
  const inherited = Object.entries(process.env).filter(([name]) => !/^(LISTEL|VITEST|NODE_ENV)/.test(name))
  return {
    ...Object.fromEntries(inherited),
    LISTEL_DATA: dataDir,
    LISTEL_BUILD: build,
    LISTEL_PORT: String(port),
  }
}

const isRunning = (child: ChildProcess) => child.exitCode === null && child.signalCode === null

async function untilReady(child: ChildProcess, said: () => string): Promise<void> {
  const deadline = Date.now() + LONGEST_START_MS
  while (!said().includes('Ctrl-C stops everything.')) {
    if (!isRunning(child)) throw new Error(`the product ended with ${child.exitCode}: ${said()}`)
    if (Date.now() > deadline)
      throw new Error(`the product is not up after ${LONGEST_START_MS} ms: ${said()}`)
    await wait(50)
  }
}

async function end(child: ChildProcess): Promise<void> {
  if (!isRunning(child)) return
  const ended = once(child, 'close')
  child.kill('SIGTERM')
  await ended
}

function signInsIn(dataDir: string): SignIn[] {
  const path = join(dataDir, 'demo-sign-ins.json')
  if (!existsSync(path)) throw new Error('the product left no list of demo sign-ins')
  return JSON.parse(readFileSync(path, 'utf8')) as SignIn[]
}
