import { spawn } from 'node:child_process'
import { chmodSync, mkdirSync, openSync, readFileSync, renameSync, writeFileSync } from 'node:fs'
import { ftruncateSync, writeSync } from 'node:fs'
import { join } from 'node:path'
import { Refusal } from './say.mjs'

/**
 * Takes the kernel's lock on a file for as long as this process lives. It goes with the process, however that
 * ends, so a lock is never stale. Gives the open file, or undefined when another process holds the lock.
 */
export async function takeLock(file, { waitSeconds = 0 } = {}) {
  const held = openSync(file, 'a+', 0o600)
  const how = waitSeconds === 0 ? ['-n'] : ['-w', String(waitSeconds)]
  const code = await new Promise((resolve, reject) => {
    // The lock belongs to the open file, which the short-lived program shares with us.
    const program = spawn('flock', ['-x', ...how, '3'], { stdio: ['ignore', 'ignore', 'ignore', held] })
    program.once('error', reject)
    program.once('close', resolve)
  }).catch(() => {
    throw new Refusal('The program "flock" is missing; on Debian: apt-get install util-linux')
  })
  return code === 0 ? held : undefined
}

/**
 * Opens the data folder for this process alone.
 * @param {string} path absolute
 */
export async function openDataFolder(path) {
  try {
    mkdirSync(join(path, 'logs'), { recursive: true, mode: 0o700 })
    chmodSync(path, 0o700)
  } catch (error) {
    throw new Refusal(`The data folder ${path} cannot be used: ${error.message}`)
  }
  const lockFile = join(path, 'start.lock')
  const lock = await takeLock(lockFile)
  if (lock === undefined) {
    const { pid, address } = readRecord(lockFile)
    const where = address === undefined ? '' : ` at ${address}`
    throw new Refusal(
      `Listel is already running on this data folder${where} (process ${pid ?? 'unknown'}). Stop that one first, or give another folder in LISTEL_DATA.`,
    )
  }
  const note = (facts) => {
    ftruncateSync(lock)
    writeSync(lock, JSON.stringify({ pid: process.pid, ...facts }))
  }
  note({})
  return { path, at: (...names) => join(path, ...names), note }
}

/** A small JSON record; an absent file reads as {}. */
export function readRecord(file) {
  let text
  try {
    text = readFileSync(file, 'utf8')
  } catch (error) {
    if (error.code === 'ENOENT') return {}
    throw error
  }
  if (text === '') return {}
  try {
    return JSON.parse(text)
  } catch {
    throw new Refusal(`${file} is not readable as JSON; put it right or delete it, then start again.`)
  }
}

/** Writes a record readable by its owner alone, whole or not at all. */
export function writeRecord(file, record) {
  const fresh = `${file}.${process.pid}`
  writeFileSync(fresh, `${JSON.stringify(record, null, 2)}\n`, { mode: 0o600 })
  renameSync(fresh, file)
}
