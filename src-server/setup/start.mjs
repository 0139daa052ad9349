import { constants } from 'node:os'
import { bringUp } from './bring-up.mjs'
import { requireNode } from './packages.mjs'
import { stopAllChildren } from './processes.mjs'
import { say, sayFault } from './say.mjs'
import { readSettings } from './settings.mjs'

/**
 * `npm start`: from a bare machine to a running product, and back to nothing running.
 * Uses Node's own modules only, since there may be no packages yet.
 */
const stopAsked = new Promise((resolve) => {
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => resolve(signal))
})
const broken = new Promise((resolve, reject) => {
  process.on('uncaughtException', reject)
  process.on('unhandledRejection', reject)
})

let isReady = false
let goodbye = () => {}

async function run() {
  requireNode()
  const settings = readSettings(process.argv.slice(2), process.env)
  if (settings.isHelp) return say(settings.usage)
  const product = bringUp(settings, { onOpen: (forget) => (goodbye = forget) })
  const first = await Promise.race([product, stopAsked, broken])
  product.catch(() => {}) // stopped while it was starting: whatever it says now is the echo of that
  if (typeof first === 'string') return stoppedBy(first)
  isReady = true
  const end = await Promise.race([stopAsked, first.ended, broken])
  if (typeof end === 'string') return stoppedBy(end)
  throw end
}

function stoppedBy(signal) {
  say('Stopping …')
  process.exitCode = isReady ? 0 : 128 + constants.signals[signal]
}

try {
  await run()
} catch (fault) {
  sayFault(fault)
  process.exitCode = fault.exitCode ?? 1
}
await stopAllChildren()
goodbye()
if (isReady) say('Stopped.')
process.exit()
