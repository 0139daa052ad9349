import { parseArgs } from 'node:util'
import { ensurePackages, requireNode } from './packages.mjs'
import { runToEnd, stopAllChildren } from './processes.mjs'
import { Refusal, say, sayFault } from './say.mjs'
import { ROOT } from './settings.mjs'

/**
 * `npm run check`: what a reviewer runs first. Types, lint, format, unit and reference tests, two at a time;
 * neither a database nor a browser nor a build is needed. `--only NAME` runs the steps of that name alone.
 */
const NODE = process.execPath
const STEPS = [
  // The longest first, so that the two lanes end together.
  {
    name: 'tests',
    args: ['node_modules/vitest/vitest.mjs', 'run', '--project', 'unit', '--project', 'reference'],
  },
  { name: 'types of the client', args: ['node_modules/vue-tsc/bin/vue-tsc.js', '-p', 'src'] },
  { name: 'types of the tests', args: ['node_modules/typescript/bin/tsc', '-p', 'tests'] },
  { name: 'lint', args: ['node_modules/eslint/bin/eslint.js', '.', '--max-warnings', '0'] },
  { name: 'types of the server', args: ['node_modules/typescript/bin/tsc', '-p', 'src-server'] },
  { name: 'format', args: ['node_modules/prettier/bin/prettier.cjs', '--check', '--log-level', 'warn', '.'] },
  { name: 'types of the shared code', args: ['node_modules/typescript/bin/tsc', '-p', 'shared'] },
]
const LANES = 2

const seconds = (since) => `${((performance.now() - since) / 1000).toFixed(1)} s`

async function runStep({ name, args }) {
  const since = performance.now()
  const { code, output } = await runToEnd({ name, command: NODE, args, cwd: ROOT, env: process.env })
  say(`${code === 0 ? 'ok    ' : 'FAULT '} ${name} (${seconds(since)})`)
  return { name, code, output }
}

async function runLane(waiting, done) {
  for (let step = waiting.shift(); step !== undefined; step = waiting.shift()) done.push(await runStep(step))
}

async function check() {
  requireNode()
  const { values } = parseArgs({ options: { only: { type: 'string' } } })
  const since = performance.now()
  await ensurePackages(ROOT)
  const steps = STEPS.filter(({ name }) => values.only === undefined || name === values.only)
  if (steps.length === 0) {
    throw new Refusal(
      `No step is named "${values.only}"; there are: ${STEPS.map((one) => one.name).join(', ')}`,
      2,
    )
  }
  const waiting = [...steps]
  const done = []
  await Promise.all(Array.from({ length: LANES }, () => runLane(waiting, done)))
  const faults = done.filter(({ code }) => code !== 0)
  for (const { name, output } of faults) say(`\n── ${name} ──\n${output.trim()}`)
  say(`\n${done.length - faults.length} of ${done.length} steps hold (${seconds(since)})`)
  process.exitCode = faults.length === 0 ? 0 : 1
}

for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) {
  process.on(signal, () => void stopAllChildren().then(() => process.exit(1)))
}
try {
  await check()
} catch (fault) {
  sayFault(fault)
  process.exitCode = fault.exitCode ?? 1
}
