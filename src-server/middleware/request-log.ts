import { randomUUID } from 'node:crypto'
import { pino } from 'pino'
import type { Logger } from 'pino'
import { pinoHttp } from 'pino-http'

export function logOf(level: string): Logger {
  return pino({ level, base: null, timestamp: pino.stdTimeFunctions.isoTime })
}

/** One line for each request, under a request id that the answer carries as well; no bodies, no cookies, no query. */
export function requestLog(logger: Logger) {
  return pinoHttp({
    logger,
    genReqId: (_request, response) => {
      const id = randomUUID()
      response.setHeader('X-Request-Id', id)
      return id
    },
    customLogLevel: (_request, response) => (response.statusCode >= 500 ? 'warn' : 'info'),
    serializers: {
      req: (request: { readonly id: unknown; readonly method: string; readonly url: string }) => ({
        id: request.id,
        method: request.method,
        path: withoutSecrets(request.url),
      }),
      res: (response: { readonly statusCode: number }) => ({ status: response.statusCode }),
    },
  })
}

/** The token in a signed link is a key: it does not belong in a log. */
const withoutSecrets = (url: string): string =>
  (url.split('?')[0] ?? url).replace(/\/(links?|welcome)\/[^/]+/, '/$1/…')
