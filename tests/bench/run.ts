import { readdir } from 'node:fs/promises'
import { pathToFileURL } from 'node:url'
import { join } from 'node:path'
import type { BenchRow } from './section.bench'

/**
 * Runs every bench beside this file, or those whose names are given, and prints each figure with its peer or bound
 * measured in the same run. It gates nothing: machines differ.
 */
const here = import.meta.dirname
const wanted = process.argv.slice(2)
const files = (await readdir(here)).filter((name) => name.endsWith('.bench.ts')).sort()
const chosen = files.filter((name) => wanted.length === 0 || wanted.some((word) => name.includes(word)))

const shown = (value: number | undefined) =>
  value === undefined ? '' : value.toLocaleString('en', { maximumSignificantDigits: 4, useGrouping: false })

for (const name of chosen) {
  const bench = (await import(pathToFileURL(join(here, name)).href)) as {
    run(): Promise<readonly BenchRow[]>
  }
  process.stdout.write(`\n${name.replace('.bench.ts', '')}\n`)
  for (const row of await bench.run()) {
    const ratio = row.ratio === undefined ? '' : `ratio ${shown(row.ratio)}`
    const peer = row.peer === undefined ? '' : `peer ${shown(row.peer)} ${row.unit}`
    process.stdout.write(
      `  ${row.name.padEnd(64)} ${`${shown(row.value)} ${row.unit}`.padEnd(18)} ${peer.padEnd(22)} ${ratio}\n`,
    )
  }
}
