import { spawn } from 'node:child_process'
import { appendFileSync, closeSync, openSync } from 'node:fs'
import { setTimeout as pause } from 'node:timers/promises'
import { Refusal } from './say.mjs'

/**
 * Every process that this one starts is kept here in the order of starting, in a process group of its own:
 * Ctrl-C in a terminal reaches only the parent, which then stops the others in the reverse order.
 */
const children = []
let isClosing = false

/**
 * @typedef {{ name: string, pid: number | undefined, hasEnded: boolean, graceMs: number,
 *   ended: Promise<{ code: number | null, signal: string | null, error?: Error }> }} Child
 */

/** Starts a process that is meant to stay. `log` is a file that receives what it prints. @returns {Child} */
export function startChild({ name, command, args, env, cwd, log, graceMs = 15_000 }) {
  const output = log === undefined ? 'ignore' : openSync(log, 'a', 0o600)
  try {
    return enter(name, graceMs, spawnInGroup(command, args, { cwd, env, stdio: ['ignore', output, output] }))
  } finally {
    if (output !== 'ignore') closeSync(output)
  }
}

/**
 * Runs a process to its end and gives its exit code (127 where the program is missing) with what it printed
 * on both outputs, in full in `log` where one is named. `show` passes the output on as well.
 */
export async function runToEnd({ name, command, args, env, cwd, input, log, show = false, graceMs = 5_000 }) {
  const spawned = spawnInGroup(command, args, {
    cwd,
    env,
    stdio: [input === undefined ? 'ignore' : 'pipe', 'pipe', 'pipe'],
  })
  const child = enter(name, graceMs, spawned)
  const out = []
  const both = []
  const keep = (chunk, isOut) => {
    both.push(chunk)
    if (isOut) out.push(chunk)
    if (log !== undefined) appendFileSync(log, chunk, { mode: 0o600 })
    if (show) (isOut ? process.stdout : process.stderr).write(chunk)
  }
  spawned.stdout?.on('data', (chunk) => keep(chunk, true))
  spawned.stderr?.on('data', (chunk) => keep(chunk, false))
  spawned.stdin?.on('error', () => {}) // the process ended before it read everything; its exit code tells
  spawned.stdin?.end(input)
  const { code, signal, error } = await child.ended
  if (error !== undefined) return { code: 127, out: '', output: error.message }
  if (isClosing && signal !== null) throw new Refusal(`stopped while running ${name}`)
  return { code: code ?? 1, out: Buffer.concat(out).toString(), output: Buffer.concat(both).toString() }
}

function spawnInGroup(command, args, options) {
  if (isClosing) throw new Refusal('stopped before it was ready')
  return spawn(command, args, { ...options, detached: true })
}

function enter(name, graceMs, spawned) {
  const child = { name, pid: spawned.pid, hasEnded: false, graceMs, ended: undefined }
  child.ended = new Promise((resolve) => {
    const end = (how) => {
      child.hasEnded = true
      children.splice(children.indexOf(child), 1)
      resolve(how)
    }
    spawned.once('error', (error) => child.pid === undefined && end({ code: null, signal: null, error }))
    spawned.once('close', (code, signal) => child.hasEnded || end({ code, signal }))
  })
  children.push(child)
  return child
}

/** Ends one process kindly, then firmly; whatever it left behind in its group goes too. */
export async function stopChild(child) {
  if (child.pid === undefined) return
  if (!child.hasEnded) {
    signalGroup(child.pid, 'SIGTERM')
    const late = pause(child.graceMs, 'late', { ref: false })
    if ((await Promise.race([child.ended, late])) === 'late') signalGroup(child.pid, 'SIGKILL')
    await child.ended
  }
  signalGroup(child.pid, 'SIGKILL')
}

/** Stops everything in the reverse order of starting and lets nothing new begin. */
export async function stopAllChildren() {
  isClosing = true
  for (const child of [...children].reverse()) await stopChild(child)
}

/** Signals a whole process group. One that is gone already is what was wanted; one run by sudo is waited for. */
export function signalGroup(pid, signal) {
  try {
    process.kill(-pid, signal)
  } catch (error) {
    if (error.code !== 'ESRCH' && error.code !== 'EPERM') throw error
  }
}
