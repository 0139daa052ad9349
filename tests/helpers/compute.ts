import { spawnSync } from 'node:child_process'
import { join } from 'node:path'
import { ROOT } from './source-files'

export interface Computed {
  readonly status: number | null
  readonly stdout: string
  readonly stderr: string
}

/** Runs the command line as a person would, in a process of its own. */
export function compute(...args: readonly string[]): Computed {
  const tsx = join(ROOT, 'node_modules', 'tsx', 'dist', 'cli.mjs')
  const ran = spawnSync(
    process.execPath,
    [tsx, '--tsconfig', 'src-server/tsconfig.json', 'src-server/compute.ts', ...args],
    { cwd: ROOT, encoding: 'utf8', maxBuffer: 64 * 1024 * 1024 },
  )
  return { status: ran.status, stdout: ran.stdout, stderr: ran.stderr }
}
