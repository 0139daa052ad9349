import { spawn, spawnSync } from 'node:child_process'
import type { ChildProcess } from 'node:child_process'
import { once } from 'node:events'
import { existsSync, mkdtempSync, readFileSync, readdirSync, rmSync, statSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest'
import { emptyDatabase } from '../helpers/database'
import { anyFreePort } from '../helpers/free-port'
import { listenForLetters } from '../helpers/smtp'
import { ROOT } from '../helpers/source-files'

interface Started {
  readonly process: ChildProcess
  readonly address: string
  readonly said: () => string
}

interface ChildLine {
  readonly name: string
  readonly pid: number
}

let folder: string
let running: ChildProcess[] = []

beforeAll(() => {
  // A folder that no other account may enter, as a checkout's own may be.
  folder = mkdtempSync(join(tmpdir(), 'listel-start-'))
})
afterEach(async () => {
  for (const child of running.filter(isRunning)) {
    child.kill('SIGTERM')
    await once(child, 'close')
  }
  running = []
})
afterAll(() => {
  for (const data of readdirSync(folder)) {
    if (existsSync(join(folder, data, 'children.json'))) childrenOf(data).forEach(({ pid }) => end(pid))
  }
  rmSync(folder, { recursive: true, force: true })
})

/** Only a test that failed halfway leaves anything to end here. */
function end(pid: number): void {
  if (existsSync(`/proc/${pid}`)) process.kill(pid, 'SIGKILL')
}

const isRunning = (child: ChildProcess) => child.exitCode === null && child.signalCode === null

function environment(data: string, more: Record<string, string> = {}): NodeJS.ProcessEnv {
  const build = process.env.LISTEL_TEST_BUILD
  if (build === undefined)
    throw new Error('LISTEL_TEST_BUILD is not set: run these tests by "npm run test:e2e"')
  const inherited = Object.entries(process.env).filter(([name]) => !/^(LISTEL|VITEST|NODE_ENV)/.test(name))
  return { ...Object.fromEntries(inherited), LISTEL_DATA: join(folder, data), LISTEL_BUILD: build, ...more }
}

function launch(data: string, more?: Record<string, string>, args: readonly string[] = []) {
  const child = spawn(process.execPath, ['src-server/setup/start.mjs', ...args], {
    cwd: ROOT,
    env: environment(data, more),
    stdio: ['ignore', 'pipe', 'pipe'],
  })
  running.push(child)
  let text = ''
  child.stdout.on('data', (chunk: Buffer) => (text += chunk.toString()))
  child.stderr.on('data', (chunk: Buffer) => (text += chunk.toString()))
  return { child, said: () => text }
}

/** Starts the product and waits until it has said all it says. */
async function start(
  data: string,
  more?: Record<string, string>,
  args?: readonly string[],
): Promise<Started> {
  const { child, said } = launch(data, more, args)
  while (!said().includes('Ctrl-C stops everything.')) {
    if (!isRunning(child)) throw new Error(`it ended with ${child.exitCode}: ${said()}`)
    await new Promise((resolve) => setTimeout(resolve, 50))
  }
  const address = /^http:\/\/\S+$/m.exec(said())?.[0] ?? ''
  return { process: child, address, said }
}

async function stop(
  { process: child }: Started,
  ...signals: readonly NodeJS.Signals[]
): Promise<number | null> {
  const ended = once(child, 'close')
  for (const signal of signals) child.kill(signal)
  await ended
  return child.exitCode
}

/** Runs it to its end, for the calls that are refused. */
async function refused(data: string, more?: Record<string, string>, args?: readonly string[]) {
  const { child, said } = launch(data, more, args)
  await once(child, 'close')
  return { code: child.exitCode, said: said() }
}

function childrenOf(data: string): ChildLine[] {
  const { children } = JSON.parse(readFileSync(join(folder, data, 'children.json'), 'utf8')) as {
    children: ChildLine[]
  }
  return children
}

/** Every process on the machine whose command line names this data folder or this build. */
function processesOf(data: string): string[] {
  const listed = spawnSync('ps', ['-eo', 'pid=,args='], { encoding: 'utf8' }).stdout.split('\n')
  return listed.filter((line) => line.includes(join(folder, data)))
}

const isAlive = ({ pid }: ChildLine) => existsSync(`/proc/${pid}`)
const signInsOf = (said: string) => said.split('\n').filter((line) => /\S+@\S+/.test(line))
const readyOf = async (address: string) => (await fetch(`${address}/api/ready`)).status

describe('npm start', () => {
  it('brings the product up on this machine alone, and stops all of it on SIGTERM', async () => {
    const product = await start('shop')
    expect(product.address).toMatch(/^http:\/\/127\.0\.0\.1:\d+$/)
    expect(await readyOf(product.address)).toBe(200)
    expect(await (await fetch(product.address)).text()).toContain('<script type="module"')
    for (const role of ['manager', 'designer', 'curator', 'mill', 'bench']) {
      expect(signInsOf(product.said()).some((line) => line.includes(role))).toBe(true)
    }
    expect(statSync(join(folder, 'shop', 'installation.json')).mode & 0o777).toBe(0o600)
    expect(statSync(join(folder, 'shop', 'demo-sign-ins.json')).mode & 0o777).toBe(0o600)
    const children = childrenOf('shop')
    expect(children.map(({ name }) => name)).toEqual(['MariaDB', 'mail catcher', 'application'])
    expect(children.every(isAlive)).toBe(true)

    expect(await stop(product, 'SIGTERM')).toBe(0)
    expect(children.filter(isAlive)).toEqual([])
    expect(processesOf('shop')).toEqual([])
    expect(existsSync(join(folder, 'shop', 'children.json'))).toBe(false)
  })

  it('keeps data, port and passwords from start to start; Ctrl-C twice stops it as well as once', async () => {
    const before = JSON.parse(readFileSync(join(folder, 'shop', 'installation.json'), 'utf8')) as object
    const product = await start('shop')
    expect(product.said()).not.toContain('Filling the demo')
    expect(signInsOf(product.said())).toHaveLength(
      (JSON.parse(readFileSync(join(folder, 'shop', 'demo-sign-ins.json'), 'utf8')) as unknown[]).length,
    )
    expect(JSON.parse(readFileSync(join(folder, 'shop', 'installation.json'), 'utf8'))).toEqual(before)
    const children = childrenOf('shop')
    expect(await stop(product, 'SIGINT', 'SIGINT')).toBe(0)
    expect(children.filter(isAlive)).toEqual([])
  })

  it('refuses a second start on the same data folder and leaves the first alone', async () => {
    const product = await start('shop')
    const second = await refused('shop')
    expect(second.code).toBe(1)
    expect(second.said).toContain(`already running on this data folder at ${product.address}`)
    expect(await readyOf(product.address)).toBe(200)
  })

  it('ends with a fault when the application ends by itself, and leaves nothing running', async () => {
    const product = await start('shop')
    const children = childrenOf('shop')
    const ended = once(product.process, 'close')
    process.kill(children.find(({ name }) => name === 'application')?.pid ?? 0, 'SIGKILL')
    await ended
    expect(product.process.exitCode).toBe(1)
    expect(product.said()).toContain('The application ended by itself (SIGKILL).')
    expect(children.filter(isAlive)).toEqual([])
  })

  it('stops what a start that was killed outright left running, then starts', async () => {
    const product = await start('shop')
    const orphans = childrenOf('shop')
    const ended = once(product.process, 'close')
    product.process.kill('SIGKILL')
    await ended
    expect(orphans.every(isAlive)).toBe(true)
    const next = await start('shop')
    expect(next.said()).toContain('Stopped what an earlier start left running')
    expect(orphans.filter(isAlive)).toEqual([])
    expect(await readyOf(next.address)).toBe(200)
  })

  it('explains a reset and changes nothing unless it is told yes', async () => {
    const { code, said } = await refused('shop', {}, ['--reset'])
    expect(code).toBe(2)
    expect(said).toContain('npm start -- --reset --yes')
    const signIns = readFileSync(join(folder, 'shop', 'demo-sign-ins.json'), 'utf8')
    await start('shop', {}, ['--reset', '--yes'])
    expect(readFileSync(join(folder, 'shop', 'demo-sign-ins.json'), 'utf8')).not.toBe(signIns)
  })

  it('says in one line what is wrong with a setting', async () => {
    const { code, said } = await refused('shop', { LISTEL_PORT: 'eighty' })
    expect(code).toBe(1)
    expect(said.trim().split('\n')).toEqual(['LISTEL_PORT must be a port from 1 to 65535, not "eighty".'])
  })

  it('starts empty with LISTEL_DEMO=no and gives the first manager a link', async () => {
    const product = await start('empty', { LISTEL_DEMO: 'no' })
    expect(product.said()).toMatch(/The first manager signs up once at:\nhttp:\/\/127\.0\.0\.1:\d+\/\S+/)
    expect(signInsOf(product.said())).toEqual([])
    expect(await stop(product, 'SIGTERM')).toBe(0)
    const demoAsked = await refused('empty', { LISTEL_DEMO: 'yes' })
    expect(demoAsked.code).toBe(1)
    expect(demoAsked.said).toContain('was started without the demo')
  })

  it('uses the database, the mail server, the port and the secret it is given, and starts none of its own', async () => {
    const database = await emptyDatabase()
    const letters = await listenForLetters()
    const port = String(await anyFreePort())
    const given = {
      LISTEL_DATABASE_URL: database.url,
      LISTEL_SMTP_URL: letters.url,
      LISTEL_PORT: port,
      LISTEL_SECRET: 'a secret of at least thirty-two characters',
    }
    const product = await start('given', given)
    expect(product.address).toBe(`http://127.0.0.1:${port}`)
    expect(await readyOf(product.address)).toBe(200)
    expect(childrenOf('given').map(({ name }) => name)).toEqual(['application'])
    expect(existsSync(join(folder, 'given', 'mariadb'))).toBe(false)
    const taken = await refused('other', given)
    expect(taken.code).toBe(1)
    expect(taken.said).toContain(`Port ${port} at 127.0.0.1 is taken`)
    expect(await stop(product, 'SIGTERM')).toBe(0)
    await letters.stop()
    await database.drop()
  })

  it('stops whatever it had begun when it is told to while starting', async () => {
    const { child, said } = launch('early')
    while (!said().includes('Starting the database')) await new Promise((resolve) => setTimeout(resolve, 20))
    await new Promise((resolve) => setTimeout(resolve, 700))
    child.kill('SIGTERM')
    await once(child, 'close')
    expect(child.exitCode).toBe(143)
    expect(processesOf('early')).toEqual([])
  })
})
