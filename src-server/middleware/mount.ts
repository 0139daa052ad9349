import type { Request, Response, Router } from 'express'
import { can, isEverGranted } from '@shared/access'
import type { Actor } from '@shared/access'
import type { RawCall, Route } from '../routes/route'
import { notFound, rightMissing } from '../services/rights'
import type { authenticator } from './authenticate'
import { dropUpload, readJson, readUpload } from './body'
import { isFileAnswer, sendFileAnswer } from '../files/file-answer'
import { sessionCookieOf } from './session-token'
import type { TokenSettings } from './session-token'

export interface MountOptions {
  readonly authenticate: ReturnType<typeof authenticator>
  readonly token: TokenSettings
}

/** Hangs a route into the router: who asks, whether they may at all, what they sent, then the handler and its answer. */
export function mount(router: Router, route: Route, options: MountOptions): void {
  router[route.method](route.path, async (request, response) => {
    const signedIn = route.right === 'public' ? undefined : await options.authenticate(request, response)
    if (signedIn !== undefined) requireDoor(route, signedIn.actor)
    const { body, upload } = await readBody(route, request, response)
    try {
      const call: RawCall = {
        actor: signedIn?.actor,
        params: { ...request.params },
        query: { ...request.query },
        body,
        upload,
        request: {
          from: request.ip ?? '',
          sessionId: signedIn?.sessionId,
          cookie: sessionCookieOf(response, options.token),
        },
      }
      await send(response, await route.run(call))
    } finally {
      if (upload !== undefined) await dropUpload(upload)
    }
  })
}

/**
 * Turns away whoever has the right for no row whatever. Where it hangs on the row whether the thing may even be seen,
 * the service decides between 403 and 404: it alone knows the row.
 */
function requireDoor({ right, see }: Route, actor: Actor): void {
  if (right === 'public' || isEverGranted(actor, right)) return
  if (see === undefined || !isEverGranted(actor, see)) throw notFound()
  if (can(actor, see)) throw rightMissing(right)
}

async function readBody(route: Route, request: Request, response: Response) {
  if (route.takesUpload !== undefined) return readUpload(request, response, route.takesUpload)
  const body = route.takesBody ? await readJson(request, response, route.bodyBytes) : undefined
  return { body, upload: undefined }
}

async function send(response: Response, answer: unknown): Promise<void> {
  if (isFileAnswer(answer)) return sendFileAnswer(response, answer)
  response.set('Cache-Control', 'no-store').json(answer)
}
