import { readFileSync } from 'node:fs'
import { connect } from 'node:net'
import { networkInterfaces } from 'node:os'
import { join } from 'node:path'
import { setTimeout as pause } from 'node:timers/promises'
import { runToEnd, startChild } from './processes.mjs'
import { Refusal, lastLinesOf } from './say.mjs'
import { ROOT } from './settings.mjs'

/** How each of the server's programs is run: bundled by plain Node, or from its source while developing. */
function commandOf(name, { isDev, buildFolder }) {
  const source = name === 'main' ? 'src-server/main.ts' : `src-server/setup/${name}.ts`
  if (!isDev) return ['--enable-source-maps', join(buildFolder, 'server', `${name}.js`)]
  const tsx = ['node_modules/tsx/dist/cli.mjs']
  return [...tsx, ...(name === 'main' ? ['watch'] : []), '--tsconfig', 'src-server/tsconfig.json', source]
}

/** Runs one of the programs to its end and gives what it printed on standard output. */
export async function runProgram(name, settings, { env, log, purpose }) {
  const { code, out, output } = await runToEnd({
    name: purpose,
    command: process.execPath,
    args: commandOf(name, settings),
    cwd: ROOT,
    env,
    log,
  })
  if (code !== 0) throw new Refusal(`${purpose} failed: ${lastLinesOf(output, 5)} (whole text in ${log})`)
  return out
}

/** Starts one of the programs to stay. */
export function startProgram(name, settings, { title, env, log }) {
  return startChild({
    name: title,
    command: process.execPath,
    args: commandOf(name, settings),
    cwd: ROOT,
    env,
    log,
  })
}

/** Starts the client's development server, which passes /api on to the application. */
export function startClientServer({ env, log, port }) {
  const vite = 'node_modules/vite/bin/vite.js'
  return startChild({
    name: 'client server',
    command: process.execPath,
    args: [vite, '--host', '127.0.0.1', '--port', String(port), '--strictPort'],
    cwd: ROOT,
    env,
    log,
  })
}

/** Asks again and again until `isReady` says so; ends early when the process does. */
export async function waitFor(child, isReady, { log, withinMs = 60_000 }) {
  const giveUpAt = Date.now() + withinMs
  while (!child.hasEnded && Date.now() < giveUpAt) {
    if (await isReady()) return
    await pause(50)
  }
  const how = child.hasEnded ? 'ended at once' : `was not ready within ${withinMs / 1000} seconds`
  const words = lastLinesOf(readFileSync(log, 'utf8'), 2)
  throw new Refusal(`The ${child.name} ${how}: ${words} (whole text in ${log})`)
}

/** Whether the address answers 200. */
export async function answersWell(url) {
  try {
    const { status } = await fetch(url, { signal: AbortSignal.timeout(2_000), redirect: 'manual' })
    return status === 200
  } catch {
    return false // not listening yet
  }
}

/** Whether something listens on this loopback port. */
export function isListening(port) {
  return new Promise((resolve) => {
    const socket = connect({ port, host: '127.0.0.1' })
    socket.once('connect', () => resolve(socket.destroy() !== undefined))
    socket.once('error', () => resolve(false))
  })
}

/** The address to reach the application by from this machine. */
export function addressOf(host, port) {
  if (host === '0.0.0.0') return `http://127.0.0.1:${port}`
  if (host === '::') return `http://[::1]:${port}`
  return `http://${host.includes(':') ? `[${host}]` : host}:${port}`
}

/** The addresses for other devices when the application listens on all of the machine's networks. */
export function addressesForOthers(host, port) {
  if (host !== '0.0.0.0' && host !== '::') return []
  return Object.values(networkInterfaces())
    .flat()
    .filter((one) => one !== undefined && !one.internal && one.family === 'IPv4')
    .map((one) => `http://${one.address}:${port}`)
}
