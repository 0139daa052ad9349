import cookieParser from 'cookie-parser'
import express, { Router } from 'express'
import type { Express } from 'express'
import { Failure } from '@shared/failure'
import type { Config } from './config'
import { openFileStore } from './files/file-store'
import { authenticator } from './middleware/authenticate'
import { errorHandler } from './middleware/error-handler'
import { mount } from './middleware/mount'
import { logOf, requestLog } from './middleware/request-log'
import { sameOrigin } from './middleware/same-origin'
import { securityHeaders } from './middleware/security'
import { staticClient } from './middleware/static-client'
import { ROUTES } from './routes'
import { setInstallation } from './services/installation'

/** Builds the application, which answers but does not listen. The database must be open. */
export function buildApp(config: Config): Express {
  const isHttps = config.publicUrl.startsWith('https:')
  const log = logOf(config.logLevel)
  openFileStore(config.dataDir)
  setInstallation({
    publicUrl: config.publicUrl,
    caughtMailDir: config.caughtMailDir,
    mailFrom: config.mailFrom,
  })

  const app = express()
  app.disable('x-powered-by')
  app.set('trust proxy', 'loopback')
  app.use(requestLog(log), securityHeaders(isHttps))
  app.use('/api', cookieParser(), sameOrigin, apiRouter(config.secret, isHttps))
  if (config.clientDir !== undefined) app.use(staticClient(config.clientDir))
  app.use(() => {
    throw new Failure('not-found', { says: 'There is nothing at this address.' })
  })
  app.use(errorHandler(log))
  return app
}

function apiRouter(secret: string, isHttps: boolean): Router {
  const router = Router()
  const options = { authenticate: authenticator(secret), token: { secret, secure: isHttps } }
  for (const route of ROUTES) mount(router, route, options)
  router.use(() => {
    throw new Failure('not-found', { says: 'There is nothing at this address.' })
  })
  return router
}
