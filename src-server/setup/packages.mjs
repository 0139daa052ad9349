import { createHash } from 'node:crypto'
import { existsSync, readFileSync, statSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { runToEnd } from './processes.mjs'
import { Refusal, lastLinesOf, say } from './say.mjs'

const NODE_WANTED = [20, 19]

/** Refuses a Node that the packages do not run on. */
export function requireNode(version = process.versions.node) {
  const [major, minor] = version.split('.').map(Number)
  const [wantedMajor, wantedMinor] = NODE_WANTED
  if (major > wantedMajor || (major === wantedMajor && minor >= wantedMinor)) return
  throw new Refusal(
    `Listel needs Node ${NODE_WANTED.join('.')} or later; this is ${version}. Install a newer Node and start again.`,
  )
}

/** Installs the packages of the lock file when there are none, or when the lock file has changed since. */
export async function ensurePackages(root) {
  const lockFile = join(root, 'package-lock.json')
  const stamp = join(root, 'node_modules', '.listel-packages')
  const hash = createHash('sha256').update(readFileSync(lockFile)).digest('hex')
  if (isInstalled(root, lockFile, stamp, hash)) return
  say('Installing packages (npm ci) …')
  const { code, output } = await runToEnd({
    name: 'npm ci',
    command: 'npm',
    args: ['ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error'],
    cwd: root,
    env: process.env,
  })
  if (code !== 0) throw new Refusal(`npm ci failed: ${lastLinesOf(output)}`)
  writeFileSync(stamp, hash)
}

/** npm writes its own list of what it installed last of all, so one that is newer than the lock file is whole. */
function isInstalled(root, lockFile, stamp, hash) {
  if (existsSync(stamp)) return readFileSync(stamp, 'utf8') === hash
  const installed = join(root, 'node_modules', '.package-lock.json')
  if (!existsSync(installed) || statSync(installed).mtimeMs < statSync(lockFile).mtimeMs) return false
  writeFileSync(stamp, hash)
  return true
}
