import type { ErrorRequestHandler, Request, Response } from 'express'
import { MulterError } from 'multer'
import type { Logger } from 'pino'
import {
  BaseError,
  ConnectionAcquireTimeoutError,
  ConnectionError,
  DatabaseError,
  OptimisticLockError,
} from 'sequelize'
import { Failure } from '@shared/failure'
import type { FailureCode } from '@shared/failure'

/** The one place where a broken rule becomes an HTTP status; a new code without one does not compile. */
export const STATUS_OF = {
  'input-invalid': 400,
  'not-signed-in': 401,
  'sign-in-refused': 401,
  'too-many-tries': 429,
  'right-missing': 403,
  'not-found': 404,
  'version-stale': 409,
  'transition-not-allowed': 409,
  'not-ready': 409,
  'operation-reused': 409,
  'already-exists': 409,
  'file-refused': 400,
  'file-too-large': 413,
  'no-plan': 409,
  'link-spent': 410,
  'out-of-service': 503,
} satisfies Record<FailureCode, number>

/** Answers every failure in one form; anything that is not a Failure is a defect: logged whole, shown bare. */
export function errorHandler(log: Logger): ErrorRequestHandler {
  return (error: unknown, request, response, next) => {
    if (response.headersSent) {
      log.error({ err: error, requestId: requestIdOf(request) }, 'failed while answering')
      next(error)
      return
    }
    const failure = failureOf(error)
    if (failure === undefined) {
      log.error({ err: error, requestId: requestIdOf(request) }, 'defect')
      send(request, response, 500, {
        code: 'fault',
        says: 'Something went wrong here. Nothing was changed; try again, and tell the workshop the request id.',
      })
      return
    }
    if (failure.code === 'out-of-service') {
      log.warn({ err: error, requestId: requestIdOf(request) }, 'out of service')
    }
    const { retryAfter, ...details } = failure.details
    if (typeof retryAfter === 'number') response.set('Retry-After', String(retryAfter))
    send(request, response, STATUS_OF[failure.code], {
      ...details,
      code: failure.code,
      says: failure.details.says ?? failure.code,
    })
  }
}

function send(request: Request, response: Response, status: number, error: Record<string, unknown>): void {
  response
    .status(status)
    .set('Cache-Control', 'no-store')
    .json({ error, requestId: requestIdOf(request) })
}

const requestIdOf = (request: Request): string => String(request.id)

function failureOf(error: unknown): Failure | undefined {
  if (error instanceof Failure) return error
  if (isDatabaseGone(error)) {
    return new Failure('out-of-service', {
      says: 'The database cannot be reached at the moment. Nothing was changed; try again shortly.',
      retryAfter: 5,
    })
  }
  if (error instanceof OptimisticLockError) {
    return new Failure('version-stale', {
      says: 'Somebody else changed this meanwhile; look at it again, then repeat your change.',
    })
  }
  if (error instanceof MulterError) return uploadFailure(error)
  return bodyFailure(error)
}

function uploadFailure(error: MulterError): Failure {
  if (error.code === 'LIMIT_FILE_SIZE') {
    return new Failure('file-too-large', {
      says: 'The file is larger than is taken here (100 MB); send a smaller copy.',
    })
  }
  return new Failure('input-invalid', { says: `The upload cannot be read: ${error.message}.` })
}

/** What express's own readers of a request throw: an error with a status and a type. */
function bodyFailure(error: unknown): Failure | undefined {
  if (!(error instanceof Error) || !('status' in error) || !('type' in error)) {
    return error instanceof URIError
      ? new Failure('not-found', { says: 'There is nothing here.' })
      : undefined
  }
  switch (error.type) {
    case 'entity.too.large':
      return new Failure('file-too-large', { says: 'What was sent is larger than is taken here.' })
    case 'entity.parse.failed':
      return new Failure('input-invalid', {
        says: 'What was sent is not JSON.',
        faults: [{ path: '', code: 'not-json', says: `is not JSON: ${error.message}` }],
      })
    case 'request.aborted':
    case 'request.size.invalid':
    case 'encoding.unsupported':
    case 'charset.unsupported':
    case 'stream.encoding.set':
      return new Failure('input-invalid', { says: `What was sent cannot be read: ${error.message}.` })
    default:
      return undefined
  }
}

/** Whether the database itself was out of reach, as against having refused a statement. */
export function isDatabaseGone(error: unknown): boolean {
  if (error instanceof ConnectionError || error instanceof ConnectionAcquireTimeoutError) return true
  if (error instanceof DatabaseError) return isFatal(error.original)
  // A transaction's own begin and commit pass the driver's error on as it is.
  return !(error instanceof BaseError) && error instanceof Error && 'sqlState' in error && isFatal(error)
}

const isFatal = (error: unknown): boolean =>
  typeof error === 'object' && error !== null && 'fatal' in error && error.fatal === true
