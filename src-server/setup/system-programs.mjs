import { accessSync, constants } from 'node:fs'
import { delimiter, join } from 'node:path'
import { runToEnd } from './processes.mjs'
import { Refusal, lastLinesOf, say } from './say.mjs'

/** An ordinary account's PATH lacks the folders where servers live. */
const PLACES = [
  ...(process.env.PATH ?? '').split(delimiter),
  '/usr/local/sbin',
  '/usr/sbin',
  '/sbin',
  '/usr/bin',
]

/** What Listel and its tests need from the system: the programs, and the Debian packages that bring them. */
export const MARIADB = {
  title: 'MariaDB',
  programs: ['mariadbd', 'mariadb-install-db', 'mariadb'],
  // The core packages hold the same server without the system service that the full one would start.
  packages: ['mariadb-server-core', 'mariadb-client-core'],
  advice: 'mariadb-server',
}
export const CHROMIUM = {
  title: 'Chromium',
  programs: ['chromium'],
  packages: ['chromium'],
  advice: 'chromium',
}
export const POPPLER = {
  title: 'the PDF tools',
  programs: ['pdftoppm', 'pdftotext'],
  packages: ['poppler-utils'],
  advice: 'poppler-utils',
}

/** Full path of a program, or undefined. */
export function findProgram(name, places = PLACES) {
  return places
    .filter((place) => place !== '')
    .map((place) => join(place, name))
    .find(isExecutable)
}

function isExecutable(file) {
  try {
    accessSync(file, constants.X_OK)
    return true
  } catch {
    return false
  }
}

/** Installs by apt whichever of these is missing, as root or through sudo without a question. */
export async function ensurePrograms(wanted, { log } = {}) {
  const missing = wanted.filter(({ programs }) => programs.some((name) => findProgram(name) === undefined))
  if (missing.length === 0) return
  const titles = missing.map(({ title }) => title).join(' and ')
  const advice = `Install it as root and start again: apt-get install ${missing.map((one) => one.advice).join(' ')}`
  const apt = await howToRunApt()
  if (apt === undefined)
    throw new Refusal(`${titles} is missing and this account may not install it. ${advice}`)
  say(`Installing ${titles} (apt) …`)
  const packages = missing.flatMap((one) => one.packages)
  const updated = await runApt(apt, ['update'], log)
  const installed = await runApt(apt, ['install', '-y', '--no-install-recommends', ...packages], log)
  if (installed.code !== 0) {
    const why = lastLinesOf(installed.output) || lastLinesOf(updated.output)
    throw new Refusal(`${titles} could not be installed: ${why}. ${advice}`)
  }
  const still = missing.flatMap(({ programs }) => programs).filter((name) => findProgram(name) === undefined)
  if (still.length > 0)
    throw new Refusal(`apt installed ${titles} but ${still.join(', ')} is not there. ${advice}`)
}

async function howToRunApt() {
  if (findProgram('apt-get') === undefined) return undefined
  if (process.getuid?.() === 0) return { command: 'env', args: [] }
  const asked = await runToEnd({ name: 'sudo', command: 'sudo', args: ['-n', 'true'], env: process.env })
  return asked.code === 0 ? { command: 'sudo', args: ['-n', 'env'] } : undefined
}

function runApt(apt, args, log) {
  return runToEnd({
    name: 'apt-get',
    command: apt.command,
    args: [
      ...apt.args,
      'DEBIAN_FRONTEND=noninteractive',
      'apt-get',
      '-q',
      '-o',
      'DPkg::Lock::Timeout=300',
      ...args,
    ],
    env: process.env,
    log,
    graceMs: 120_000, // an interrupted dpkg leaves the system half configured
  })
}
