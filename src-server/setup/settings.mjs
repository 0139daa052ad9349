import { join, resolve } from 'node:path'
import { fileURLToPath } from 'node:url'
import { parseArgs } from 'node:util'
import { Refusal } from './say.mjs'

/** The checkout's top folder. */
export const ROOT = fileURLToPath(new URL('../..', import.meta.url)).replace(/\/$/, '')

const USAGE = `Usage: npm start [-- OPTIONS]
  --reset --yes  throws away this installation's database and files and fills the demo anew
  --dev          serves the sources and reloads on change
Settings by environment: LISTEL_HOST, LISTEL_PORT, LISTEL_DATA, LISTEL_DATABASE_URL, LISTEL_SMTP_URL,
LISTEL_SECRET, LISTEL_PUBLIC_URL, LISTEL_DEMO=no (see README.md)`

/** What the caller asked for, by options and by environment, checked. */
export function readSettings(args, env) {
  const options = readOptions(args)
  const given = (name) => (env[name] === undefined || env[name] === '' ? undefined : env[name])
  const settings = {
    ...options,
    usage: USAGE,
    host: given('LISTEL_HOST') ?? '127.0.0.1',
    port: portFrom('LISTEL_PORT', given('LISTEL_PORT')),
    dataFolder: resolve(given('LISTEL_DATA') ?? join(ROOT, '.data')),
    buildFolder: resolve(given('LISTEL_BUILD') ?? join(ROOT, 'dist')),
    databaseUrl: urlFrom('LISTEL_DATABASE_URL', given('LISTEL_DATABASE_URL'), ['mariadb:']),
    smtpUrl: urlFrom('LISTEL_SMTP_URL', given('LISTEL_SMTP_URL'), ['smtp:', 'smtps:']),
    publicUrl: urlFrom('LISTEL_PUBLIC_URL', given('LISTEL_PUBLIC_URL'), ['http:', 'https:']),
    secret: secretFrom('LISTEL_SECRET', given('LISTEL_SECRET')),
    wantsDemo: yesOrNo('LISTEL_DEMO', given('LISTEL_DEMO')),
  }
  requireReset(settings)
  return settings
}

function readOptions(args) {
  try {
    const { values } = parseArgs({
      args,
      options: {
        reset: { type: 'boolean', default: false },
        yes: { type: 'boolean', default: false },
        dev: { type: 'boolean', default: false },
        help: { type: 'boolean', default: false },
      },
    })
    return { isReset: values.reset, isSure: values.yes, isDev: values.dev, isHelp: values.help }
  } catch (error) {
    throw new Refusal(`${error.message}\n${USAGE}`, 2)
  }
}

function requireReset({ isReset, isSure, databaseUrl, dataFolder }) {
  if (!isReset) return
  if (databaseUrl !== undefined) {
    throw new Refusal('--reset works on the database that Listel runs itself; LISTEL_DATABASE_URL is set.', 2)
  }
  if (isSure) return
  throw new Refusal(
    `--reset throws away the database, the photographs and the caught mail in ${dataFolder} and fills the demo anew. Nothing was changed. To go ahead: npm start -- --reset --yes`,
    2,
  )
}

function portFrom(name, text) {
  if (text === undefined) return undefined
  const port = Number(text)
  if (/^\d{1,5}$/.test(text) && port >= 1 && port <= 65535) return port
  throw new Refusal(`${name} must be a port from 1 to 65535, not "${text}".`)
}

function urlFrom(name, text, schemes) {
  if (text === undefined) return undefined
  if (URL.canParse(text) && schemes.includes(new URL(text).protocol)) return text
  throw new Refusal(`${name} must be an address that begins with ${schemes[0]}// .`)
}

function secretFrom(name, text) {
  if (text === undefined || text.length >= 32) return text
  throw new Refusal(`${name} must be at least 32 characters.`)
}

function yesOrNo(name, text) {
  if (text === undefined) return undefined
  if (text === 'yes' || text === 'no') return text === 'yes'
  throw new Refusal(`${name} must be yes or no, not "${text}".`)
}
