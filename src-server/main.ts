import { createServer } from 'node:http'
import type { Server } from 'node:http'
import { buildApp } from './app'
import { ConfigFault, readConfig } from './config'
import type { Config } from './config'
import { dropUploadsBefore } from './files/file-store'
import { logOf } from './middleware/request-log'
import { closeDatabase, openDatabase } from './models/database'
import { WORKERS } from './workers'
import type { RunningWorker } from './services/running-worker'

/** Requests under way have this long to end once a stop is asked for. */
const GRACE_MS = 10_000
/** An upload that was begun this long ago and is still lying there was left behind. */
const STALE_UPLOAD_MS = 24 * 60 * 60 * 1000

function configOrStop(): Config {
  try {
    return readConfig(process.env)
  } catch (error) {
    if (!(error instanceof ConfigFault)) throw error
    process.stderr.write(`${error.message}\n`)
    process.exit(1)
  }
}

async function listen(server: Server, { port, host }: Config): Promise<void> {
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject)
    server.listen(port, host, resolve)
  })
}

async function stop(server: Server, workers: readonly RunningWorker[]): Promise<void> {
  const closed = new Promise((resolve) => server.close(resolve))
  server.closeIdleConnections()
  const cut = setTimeout(() => server.closeAllConnections(), GRACE_MS)
  await closed
  clearTimeout(cut)
  await Promise.all(workers.map((worker) => worker.stop()))
  await closeDatabase()
}

async function main(): Promise<void> {
  const config = configOrStop()
  const log = logOf(config.logLevel)
  await openDatabase(config.databaseUrl)
  const server = createServer(buildApp(config))
  await dropUploadsBefore(new Date(Date.now() - STALE_UPLOAD_MS))
  await listen(server, config)
  const workers = WORKERS.map((start) =>
    start({ smtpUrl: config.smtpUrl, log: (err, says) => log.error({ err }, says) }),
  )
  log.info({ host: config.host, port: config.port }, 'listening')

  let stopping: Promise<void> | undefined
  const stopOnce = () => {
    stopping ??= stop(server, workers).then(
      () => process.exit(0),
      (error: unknown) => {
        log.error({ err: error }, 'did not stop cleanly')
        process.exit(1)
      },
    )
  }
  process.on('SIGTERM', stopOnce)
  process.on('SIGINT', stopOnce)
}

main().catch((error: unknown) => {
  process.stderr.write(`The server cannot start: ${error instanceof Error ? error.message : String(error)}\n`)
  process.exit(1)
})
