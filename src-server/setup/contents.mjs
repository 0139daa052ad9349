import { runProgram } from './product.mjs'
import { Refusal, say } from './say.mjs'

/**
 * Brings the database to the present tables and, once in its life, fills the demo workshop in.
 * What the database holds is decided by its first start and never changed by a later one.
 */
export async function ensureContents({ settings, data, installation, database, env }) {
  const { key } = database
  await clearHalfFilled(database, installation)
  requireAgreement(settings, installation.contentsOf(key))
  const run = (name, purpose) =>
    runProgram(name, settings, { env, log: data.at('logs', `${name}.log`), purpose })
  say('Preparing the tables …')
  await run('migrate', 'Preparing the tables')
  if (installation.contentsOf(key) !== undefined) return
  if (settings.wantsDemo === false) return installation.keepContents(key, 'empty')
  say('Filling the demo workshop …')
  installation.keepContents(key, 'half')
  await run('seed', 'Filling the demo workshop')
  installation.keepContents(key, 'demo')
}

/** A fill that was interrupted is begun again: nobody has worked in that database yet. */
async function clearHalfFilled(database, installation) {
  if (installation.contentsOf(database.key) !== 'half') return
  if (database.remake === undefined) {
    throw new Refusal(
      'The demo was filled only in part into the database of LISTEL_DATABASE_URL. Empty that database, or give another, and start again.',
    )
  }
  say('The demo was filled only in part; beginning it again …')
  await database.remake()
  installation.keepContents(database.key, undefined)
}

function requireAgreement({ wantsDemo }, contents) {
  if (wantsDemo === false && contents === 'demo') {
    throw new Refusal(
      'LISTEL_DEMO=no, but this installation holds the demo workshop. Give another folder in LISTEL_DATA, or throw the demo away with LISTEL_DEMO=no npm start -- --reset --yes',
    )
  }
  if (wantsDemo === true && contents === 'empty') {
    throw new Refusal(
      'LISTEL_DEMO=yes, but this installation was started without the demo. Give another folder in LISTEL_DATA to see it.',
    )
  }
}
