import { join } from 'node:path'
import { firstFreePort, isPortFree } from './ports.mjs'
import { addressOf, addressesForOthers } from './product.mjs'
import { Refusal } from './say.mjs'

/** The ports that are tried first; where one is taken, any free one serves and is remembered instead. */
export const USUAL_PORTS = { application: 4700, mail: 4725, database: 4733, client: 4780 }

/** The environment of every program: settings as they were given, the rest from the installation. */
export async function environmentFor({ settings, data, installation }, databaseUrl) {
  const { host } = settings
  const port = await applicationPort(settings, installation)
  return {
    ...process.env,
    NODE_ENV: settings.isDev ? 'development' : 'production',
    LISTEL_HOST: host,
    LISTEL_PORT: String(port),
    LISTEL_API: addressOf(host, port),
    LISTEL_DATA: data.path,
    LISTEL_CLIENT_DIR: join(settings.buildFolder, 'client'),
    LISTEL_DATABASE_URL: databaseUrl,
    LISTEL_SECRET: settings.secret ?? installation.secret('secret'),
    ...(await clientEnvironment(settings, port)),
    ...(await mailEnvironment(settings, data, installation)),
  }
}

async function applicationPort({ host, port: given }, { record, keep }) {
  if (given !== undefined) return given
  const port = await firstFreePort([record.port, USUAL_PORTS.application], host)
  keep({ port })
  return port
}

/** Asked before anything is begun: an address that cannot be listened on is told at once. */
export async function requireAddress({ host, port }) {
  if (await isPortFree(port ?? 0, host)) return
  throw new Refusal(
    port === undefined
      ? `${host} is not an address of this machine; give another in LISTEL_HOST.`
      : `Port ${port} at ${host} is taken or not allowed; give another in LISTEL_PORT.`,
  )
}

/** What the links in letters begin with: reachable from other devices where those can reach the product. */
async function clientEnvironment({ isDev, host, publicUrl }, port) {
  if (!isDev) {
    return { LISTEL_PUBLIC_URL: publicUrl ?? addressesForOthers(host, port)[0] ?? addressOf(host, port) }
  }
  const clientPort = await firstFreePort([USUAL_PORTS.client])
  const LISTEL_PUBLIC_URL = publicUrl ?? `http://127.0.0.1:${clientPort}`
  return { LISTEL_PUBLIC_URL, LISTEL_CLIENT_PORT: String(clientPort) }
}

/** Where letters go: to the given server, else to the mail catcher that is started for them. */
async function mailEnvironment({ smtpUrl }, data, { record, keep }) {
  if (smtpUrl !== undefined) return { LISTEL_SMTP_URL: smtpUrl }
  const port = await firstFreePort([record.smtpPort, USUAL_PORTS.mail])
  keep({ smtpPort: port })
  return {
    LISTEL_SMTP_PORT: String(port),
    LISTEL_SMTP_URL: `smtp://127.0.0.1:${port}`,
    LISTEL_CAUGHT_MAIL_DIR: data.at('caught-mail'),
  }
}
