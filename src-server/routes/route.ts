import type { Actor, Right } from '@shared/access'
import { Nothing, requireValid } from '@shared/contracts'
import type { Contract, OutputOf } from '@shared/contracts'
import type { Upload, UploadLimits } from '../middleware/body'
import type { FileAnswer } from '../files/file-answer'
import type { SessionCookie } from '../middleware/session-token'

export type Method = 'get' | 'post' | 'put' | 'patch' | 'delete'

/** What a handler may know of the request besides what it carries. */
export interface RequestFacts {
  /** Address that it came from. */
  readonly from: string
  /** Undefined at a public door. */
  readonly sessionId: string | undefined
  readonly cookie: SessionCookie
}

/** A request as it came in, read but not yet judged. */
export interface RawCall {
  readonly actor: Actor | undefined
  readonly params: unknown
  readonly query: unknown
  readonly body: unknown
  readonly upload: Upload | undefined
  readonly request: RequestFacts
}

export interface Call<Who, Params, Query, Body, Sent> {
  readonly actor: Who
  readonly params: Params
  readonly query: Query
  readonly body: Body
  readonly upload: Sent
  readonly request: RequestFacts
}

type AnswerContract = Contract | 'file'
type AnswerOf<A extends AnswerContract> = A extends Contract ? OutputOf<A> : FileAnswer
type WhoOf<R extends Right | 'public'> = R extends 'public' ? undefined : Actor
type SentOf<U extends UploadLimits | undefined> = U extends UploadLimits ? Upload : undefined
type BodyOf<B extends Contract | undefined> = B extends Contract ? OutputOf<B> : undefined

export interface Definition<
  R extends Right | 'public',
  P extends Contract,
  Q extends Contract,
  B extends Contract | undefined,
  A extends AnswerContract,
  U extends UploadLimits | undefined,
> {
  readonly method: Method
  /** Under /api, with :names. */
  readonly path: string
  /** What one must be allowed to do; 'public' is open to whoever comes. */
  readonly right: R
  /** What one must be allowed to see, to be told of a missing right (403) and not that nothing is there (404). */
  readonly see?: Right
  readonly params?: P
  readonly query?: Q
  readonly body?: B
  /** Most bytes of a JSON body; 1 MB where absent. */
  readonly bodyBytes?: number
  /** The body is multipart: a file, and JSON about it which `body` reads. */
  readonly takesUpload?: U
  readonly answer: A
  handle(call: Call<WhoOf<R>, OutputOf<P>, OutputOf<Q>, BodyOf<B>, SentOf<U>>): Promise<AnswerOf<A>>
}

/** A route as data, so that tests can walk all of them. */
export interface Route {
  readonly method: Method
  readonly path: string
  readonly right: Right | 'public'
  readonly see: Right | undefined
  readonly takesBody: boolean
  readonly bodyBytes: number | undefined
  readonly takesUpload: UploadLimits | undefined
  readonly answer: AnswerContract
  /** Judges what came by the contracts, and handles it. Throws input-invalid with every fault. */
  run(call: RawCall): Promise<unknown>
}

/** Declares a route. The frame has let nobody through who is not signed in or never has the right. */
export function route<
  R extends Right | 'public',
  A extends AnswerContract,
  P extends Contract = typeof Nothing,
  Q extends Contract = typeof Nothing,
  B extends Contract | undefined = undefined,
  U extends UploadLimits | undefined = undefined,
>(definition: Definition<R, P, Q, B, A, U>): Route {
  const { method, path, right, see, params, query, body, bodyBytes, takesUpload, answer } = definition
  return {
    method,
    path,
    right,
    see: see ?? (right === 'public' ? undefined : right),
    takesBody: body !== undefined,
    bodyBytes,
    takesUpload,
    answer,
    run: async ({ actor, upload, request, ...raw }) =>
      definition.handle({
        actor: requireWho(right, actor) as WhoOf<R>,
        params: requireValid(params ?? Nothing, raw.params) as OutputOf<P>,
        query: requireValid(query ?? Nothing, raw.query) as OutputOf<Q>,
        body: (body === undefined ? undefined : requireValid(body, raw.body)) as BodyOf<B>,
        upload: upload as SentOf<U>,
        request,
      }),
  }
}

function requireWho(right: Right | 'public', actor: Actor | undefined): Actor | undefined {
  if (right === 'public') return undefined
  if (actor === undefined) throw new Error('a route that needs a right was run for nobody')
  return actor
}
