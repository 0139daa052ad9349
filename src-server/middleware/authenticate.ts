import type { NextFunction, Request, Response } from 'express'
import { Passport } from 'passport'
import { Strategy } from 'passport-jwt'
import type { Actor } from '@shared/access'
import { Failure } from '@shared/failure'
import { liveSession } from '../services/sessions'
import { tokenIn } from './session-token'

export interface SignedIn {
  readonly actor: Actor
  readonly sessionId: string
}

/** Finds who asks: the token must be signed by us and name a session that is still live. */
export function authenticator(secret: string) {
  const passport = new Passport()
  passport.use(
    new Strategy(
      { jwtFromRequest: tokenIn, secretOrKey: secret, algorithms: ['HS256'] },
      (payload: { readonly sub?: unknown }, done) => {
        const id = typeof payload.sub === 'string' ? payload.sub : ''
        liveSession(id).then(
          (session) => done(null, session ?? false),
          (error: unknown) => done(error, false),
        )
      },
    ),
  )
  return (request: Request, response: Response): Promise<SignedIn> =>
    new Promise((resolve, reject) => {
      const decide = (error: unknown, found: SignedIn | false | undefined) => {
        if (error !== null && error !== undefined) reject(error)
        else if (found === false || found === undefined) reject(notSignedIn())
        else resolve(found)
      }
      const ask = passport.authenticate('jwt', { session: false }, decide) as (
        request: Request,
        response: Response,
        next: NextFunction,
      ) => void
      ask(request, response, (error?: unknown) => reject(error))
    })
}

const notSignedIn = () => new Failure('not-signed-in', { says: 'Sign in first; the session may have ended.' })
