import type { Request, RequestHandler } from 'express'
import { Failure } from '@shared/failure'

const READS = new Set(['GET', 'HEAD', 'OPTIONS'])

/**
 * Refuses a write that another site's page has a browser make. Browsers say where a request comes from: by
 * Sec-Fetch-Site, which no page can set and no proxy between changes, or the older ones and those on plain http by
 * Origin. Programs that are no browser say neither, and carry no cookie that was not given to them.
 */
export const sameOrigin: RequestHandler = (request, _response, next) => {
  if (READS.has(request.method) || isOwn(request)) return next()
  throw new Failure('right-missing', {
    says: 'This came from a page of another address; open Listel itself and do it there.',
  })
}

function isOwn(request: Request): boolean {
  const site = request.get('Sec-Fetch-Site')
  if (site !== undefined) return site === 'same-origin' || site === 'none'
  const origin = request.get('Origin')
  return origin === undefined || hostOf(origin) === request.get('Host')
}

function hostOf(origin: string): string | undefined {
  try {
    return new URL(origin).host
  } catch {
    // "null" and the like: an origin that no page of ours has.
    return undefined
  }
}
