import { rmSync } from 'node:fs'
import { join, resolve } from 'node:path'
import { fileURLToPath } from 'node:url'
import { parseArgs } from 'node:util'
import { build } from 'esbuild'

/**
 * Bundles the server's programs: one file each, packages left outside to be found in node_modules.
 * `--outdir` names another folder than dist/server.
 */
const PROGRAMS = {
  main: 'src-server/main.ts',
  'mail-catcher': 'src-server/setup/mail-catcher.ts',
  migrate: 'src-server/setup/migrate.ts',
  seed: 'src-server/setup/seed.ts',
  'first-manager': 'src-server/setup/first-manager.ts',
}

const root = fileURLToPath(new URL('../..', import.meta.url))
const { values } = parseArgs({ options: { outdir: { type: 'string', default: 'dist/server' } } })
const outdir = resolve(root, values.outdir)

rmSync(outdir, { recursive: true, force: true })
try {
  await build({
    absWorkingDir: root,
    entryPoints: Object.entries(PROGRAMS).map(([out, file]) => ({ out, in: join(root, file) })),
    outdir,
    bundle: true,
    splitting: true,
    chunkNames: 'parts/[name]-[hash]',
    packages: 'external',
    platform: 'node',
    format: 'esm',
    target: 'node20.19',
    sourcemap: true,
    logLevel: 'warning',
  })
} catch {
  process.exitCode = 1 // esbuild has said what is wrong
}
