import type { Request, Response } from 'express'
import jwt from 'jsonwebtoken'

const COOKIE = 'listel_session'
/** A session ends for good this long after sign-in, whatever is done in it. */
const ABSOLUTE_SECONDS = 14 * 24 * 60 * 60

export interface TokenSettings {
  readonly secret: string
  /** Whether people reach the server by https, so that the cookie may refuse anything else. */
  readonly secure: boolean
}

/** What a signed-in browser carries: the key of its session, signed; the session itself is a row. */
export interface SessionCookie {
  keep(sessionId: string): void
  drop(): void
}

export function sessionCookieOf(response: Response, { secret, secure }: TokenSettings): SessionCookie {
  const options = { httpOnly: true, sameSite: 'strict', secure, path: '/api' } as const
  return {
    keep(sessionId) {
      const token = jwt.sign({}, secret, {
        algorithm: 'HS256',
        subject: sessionId,
        expiresIn: ABSOLUTE_SECONDS,
      })
      response.cookie(COOKIE, token, { ...options, maxAge: ABSOLUTE_SECONDS * 1000 })
    },
    drop() {
      response.clearCookie(COOKIE, options)
    },
  }
}

/** The token that a request carries, unread. */
export function tokenIn(request: Request): string | null {
  const cookies = request.cookies as Record<string, unknown> | undefined
  const token = cookies?.[COOKIE]
  return typeof token === 'string' ? token : null
}
