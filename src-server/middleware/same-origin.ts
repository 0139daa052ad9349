import type { RequestHandler } from 'express'
import { Failure } from '@shared/failure'

const READS = new Set(['GET', 'HEAD', 'OPTIONS'])

/**
 * Refuses a write that another site's page has a browser make. Browsers say where a request comes from; programs
 * that are no browser say nothing, and carry no cookie that was not given to them.
 */
export const sameOrigin: RequestHandler = (request, _response, next) => {
  if (READS.has(request.method)) return next()
  const site = request.get('Sec-Fetch-Site')
  const origin = request.get('Origin')
  const isForeignSite = site !== undefined && site !== 'same-origin' && site !== 'none'
  if (isForeignSite || (origin !== undefined && hostOf(origin) !== request.get('Host'))) {
    throw new Failure('right-missing', {
      says: 'This came from a page of another address; open Listel itself and do it there.',
    })
  }
  next()
}

function hostOf(origin: string): string | undefined {
  try {
    return new URL(origin).host
  } catch {
    // "null" and the like: an origin that no page of ours has.
    return undefined
  }
}
