import { existsSync, mkdirSync, mkdtempSync, renameSync, rmSync } from 'node:fs'
import { tmpdir, userInfo } from 'node:os'
import { join } from 'node:path'
import { setTimeout as pause } from 'node:timers/promises'
import { runToEnd, startChild, stopChild } from './processes.mjs'
import { Refusal, lastLinesOf } from './say.mjs'
import { findProgram } from './system-programs.mjs'

/** The kernel's limit for a socket's path is 108 bytes with the closing zero; a longer one ends the server. */
const SOCKET_PATH_LIMIT = 107
const READY_WITHIN_MS = 60_000

/** Makes an empty database folder unless there is one. Gives true when it was made now. */
export async function initialiseMariaDb({ folder, log }) {
  if (existsSync(folder)) return false
  // Made beside its place and moved there when whole: an interrupted one is never taken for a database.
  const fresh = `${folder}.new`
  rmSync(fresh, { recursive: true, force: true })
  mkdirSync(fresh, { recursive: true, mode: 0o700 })
  const { code, output } = await runToEnd({
    name: 'mariadb-install-db',
    command: findProgram('mariadb-install-db'),
    args: [
      '--no-defaults',
      `--datadir=${fresh}`,
      '--auth-root-authentication-method=socket',
      `--auth-root-socket-user=${accountName()}`,
      '--skip-test-db',
      '--skip-name-resolve',
      ...asRoot(),
    ],
    env: process.env,
    log,
  })
  if (code !== 0) throw new Refusal(`The database could not be made: ${lastLinesOf(output)}`)
  renameSync(fresh, folder)
  return true
}

/**
 * Starts MariaDB on loopback and waits until it answers.
 * `onStart` hears of the process as soon as it runs, before it is ready.
 */
export async function startMariaDb({ folder, port, log, extra = [], onStart = () => {} }) {
  const place = socketPlaceFor(folder)
  const socket = join(place.folder, 'db.sock')
  const child = startChild({
    name: 'MariaDB',
    command: findProgram('mariadbd'),
    args: [
      '--no-defaults',
      `--datadir=${folder}`,
      `--socket=${socket}`,
      `--pid-file=${join(place.folder, 'db.pid')}`,
      '--bind-address=127.0.0.1',
      `--port=${port}`,
      '--skip-name-resolve',
      '--character-set-server=utf8mb4',
      '--collation-server=utf8mb4_unicode_520_ci',
      '--default-time-zone=+00:00',
      '--max-allowed-packet=64M',
      '--local-infile=0',
      ...asRoot(),
      ...extra,
    ],
    env: process.env,
    log,
    graceMs: 60_000, // it writes its pages out before it ends
  })
  if (place.isTemporary) void child.ended.then(() => rmSync(place.folder, { recursive: true, force: true }))
  onStart(child)
  const database = { child, port, run: (sql) => runSql(socket, sql), stop: () => stopChild(child) }
  await waitUntilItAnswers(database, log)
  return database
}

function socketPlaceFor(folder) {
  const own = `${folder}.run`
  if (Buffer.byteLength(join(own, 'db.sock')) <= SOCKET_PATH_LIMIT) {
    mkdirSync(own, { recursive: true, mode: 0o700 })
    return { folder: own, isTemporary: false }
  }
  return { folder: mkdtempSync(join(shortTemporaryFolder(), 'listel-')), isTemporary: true }
}

/** TMPDIR itself may be a long path. */
const shortTemporaryFolder = () => (Buffer.byteLength(tmpdir()) <= 60 ? tmpdir() : '/tmp')

async function waitUntilItAnswers({ child, run }, log) {
  const giveUpAt = Date.now() + READY_WITHIN_MS
  while (Date.now() < giveUpAt) {
    if (child.hasEnded) break
    if ((await run('SELECT 1')).code === 0) return
    await pause(100)
  }
  const how = child.hasEnded ? 'ended at once' : 'did not answer within a minute'
  await stopChild(child)
  throw new Refusal(`MariaDB ${how}; its own words are in ${log}`)
}

/** SQL goes in by standard input, so that no password is ever seen in a list of processes. */
function runSql(socket, sql) {
  return runToEnd({
    name: 'mariadb',
    command: findProgram('mariadb'),
    args: [
      '--no-defaults',
      `--socket=${socket}`,
      `--user=${accountName()}`,
      '--batch',
      '--skip-column-names',
      '--connect-timeout=5',
    ],
    env: process.env,
    input: sql,
  })
}

/** As root the server must be told so: as the system's own mysql account it dies under a closed folder. */
const asRoot = () => (process.getuid?.() === 0 ? ['--user=root'] : [])

function accountName() {
  try {
    return userInfo().username
  } catch {
    throw new Refusal(
      `This account (number ${process.getuid()}) has no name on this system, which MariaDB needs.`,
    )
  }
}

/** Makes the application's database and account, or brings the account's password up to date. */
export async function ensureDatabase(database, { name, user, password }) {
  const account = `'${user}'@'127.0.0.1'`
  const { code, output } = await database.run(`
    CREATE DATABASE IF NOT EXISTS ${name} CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_520_ci;
    CREATE USER IF NOT EXISTS ${account};
    ALTER USER ${account} IDENTIFIED BY '${password}';
    GRANT ALL ON ${name}.* TO ${account};`)
  if (code !== 0) throw new Refusal(`The database could not be prepared: ${lastLinesOf(output)}`)
}

/** An account that may make and drop databases: for tests alone. */
export async function ensureAdministrator(database, { user, password }) {
  const account = `'${user}'@'127.0.0.1'`
  const { code, output } = await database.run(`
    CREATE USER ${account} IDENTIFIED BY '${password}';
    GRANT ALL ON *.* TO ${account} WITH GRANT OPTION;`)
  if (code !== 0) throw new Refusal(`The test database could not be prepared: ${lastLinesOf(output)}`)
}
