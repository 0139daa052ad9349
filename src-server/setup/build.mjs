import { createHash } from 'node:crypto'
import { closeSync, mkdirSync, readFileSync, readdirSync, rmSync, writeFileSync } from 'node:fs'
import { join, relative } from 'node:path'
import { readRecord, takeLock, writeRecord } from './data-folder.mjs'
import { runToEnd } from './processes.mjs'
import { Refusal, lastLinesOf, say } from './say.mjs'

/** Everything that the built client and server are made from. */
const SOURCES = [
  'src',
  'shared',
  'src-server',
  'public',
  'index.html',
  'vite.config.ts',
  'tsconfig.base.json',
  'package.json',
  'package-lock.json',
]

/**
 * Builds client and server into `outDir` unless that was done already from these very sources.
 * Two builds of one checkout take turns. Gives true when something was built.
 */
export async function ensureBuild({ root, outDir }) {
  const cache = join(root, 'node_modules', '.cache')
  mkdirSync(cache, { recursive: true })
  const lock = await takeLock(join(cache, 'listel-build.lock'), { waitSeconds: 300 })
  if (lock === undefined) throw new Refusal('Another build of this checkout has not ended within 5 minutes.')
  try {
    const record = join(outDir, 'build.json')
    const hash = hashOfSources(root)
    if (readRecord(record).sources === hash) return false
    say('Building client and server …')
    // An interrupted build leaves no record behind and is made anew.
    rmSync(record, { force: true })
    await Promise.all([buildClient(root, outDir), buildServer(root, outDir)])
    writeFileSync(join(outDir, 'package.json'), '{ "type": "module" }\n')
    writeRecord(record, { sources: hash })
    return true
  } finally {
    closeSync(lock)
  }
}

function buildClient(root, outDir) {
  const args = ['node_modules/vite/bin/vite.js', 'build', '--emptyOutDir', '--outDir', join(outDir, 'client')]
  return runBuild('client', args, root)
}

function buildServer(root, outDir) {
  return runBuild('server', ['src-server/setup/build-server.mjs', '--outdir', join(outDir, 'server')], root)
}

async function runBuild(name, args, root) {
  const { code, output } = await runToEnd({
    name: `the ${name} build`,
    command: process.execPath,
    args,
    cwd: root,
    env: { ...process.env, NODE_ENV: 'production', NO_COLOR: '1', FORCE_COLOR: '0' },
  })
  if (code !== 0) throw new Refusal(`The ${name} could not be built: ${lastLinesOf(output, 12)}`)
}

/** SHA-256 over the paths and contents of all sources. */
export function hashOfSources(root) {
  const hash = createHash('sha256')
  for (const file of SOURCES.flatMap((name) => filesUnder(join(root, name)))) {
    hash.update(`${relative(root, file)}\0`)
    hash.update(createHash('sha256').update(readFileSync(file)).digest())
  }
  return hash.digest('hex')
}

function filesUnder(path) {
  let entries
  try {
    entries = readdirSync(path, { withFileTypes: true })
  } catch (error) {
    if (error.code === 'ENOTDIR') return [path]
    if (error.code === 'ENOENT') return [] // `public` need not exist; a missing source fails the build itself
    throw error
  }
  return entries
    .sort((one, other) => (one.name < other.name ? -1 : 1))
    .flatMap((entry) => (entry.isDirectory() ? filesUnder(join(path, entry.name)) : [join(path, entry.name)]))
}
