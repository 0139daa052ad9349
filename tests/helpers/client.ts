import type { Express } from 'express'
import request from 'supertest'
import type { Response } from 'supertest'
import type { Contract } from '@shared/contracts'
import { FaultAnswer } from '@shared/contracts'
import { ROUTES } from '@server/routes'
import type { Method, Route } from '@server/routes/route'
import { PASSWORD, aPerson } from './factories/people'
import type { PersonWish } from './factories/people'

export interface Upload {
  readonly about: unknown
  readonly file: Buffer
  readonly name: string
}

/** Speaks to the application as one browser would, keeping its cookie. Paths are under /api. */
export interface HttpClient {
  get(path: string): Promise<Response>
  post(path: string, body?: object): Promise<Response>
  put(path: string, body?: object): Promise<Response>
  patch(path: string, body?: object): Promise<Response>
  delete(path: string): Promise<Response>
  upload(path: string, upload: Upload): Promise<Response>
  /** An answer that is a file: its bytes are the body. */
  file(path: string): Promise<Response>
  readonly agent: ReturnType<typeof request.agent>
}

/** A browser that has not signed in. */
export function stranger(app: Express): HttpClient {
  const agent = request.agent(app)
  const sent = async (method: Method, path: string, body?: object) => {
    const asked = agent[method](`/api${path}`)
    return judged(method, path, await (body === undefined ? asked : asked.send(body)))
  }
  return {
    agent,
    get: (path) => sent('get', path),
    post: (path, body = {}) => sent('post', path, body),
    put: (path, body = {}) => sent('put', path, body),
    patch: (path, body = {}) => sent('patch', path, body),
    delete: (path) => sent('delete', path),
    upload: async (path, { about, file, name }) =>
      judged(
        'post',
        path,
        await agent.post(`/api${path}`).field('about', JSON.stringify(about)).attach('file', file, name),
      ),
    file: async (path) => judged('get', path, await agent.get(`/api${path}`).buffer(true).parse(bytesParser)),
  }
}

/** A browser signed in by password as a new person with the role; a curator needs a client, a mill's person a mill. */
export async function signedIn(
  app: Express,
  wish: PersonWish,
): Promise<HttpClient & { readonly personId: string }> {
  const person = await aPerson(wish)
  const client = stranger(app)
  const answer = await client.post('/session', { email: person.email, password: PASSWORD })
  if (answer.status !== 200) throw new Error(`sign-in answered ${answer.status}: ${answer.text}`)
  return { ...client, personId: person.id }
}

/** Holds an answer against the contract of its route; unknown keys are refused, so nothing leaks unseen. */
function judged(method: Method, path: string, response: Response): Response {
  const route = routeOf(method, path)
  if (response.status >= 400) return heldAgainst(FaultAnswer, response, `${method} ${path}`)
  if (route === undefined) throw new Error(`no route for ${method} ${path}`)
  return route.answer === 'file' ? response : heldAgainst(route.answer, response, `${method} ${path}`)
}

function heldAgainst(contract: Contract, response: Response, what: string): Response {
  const body: unknown = Buffer.isBuffer(response.body) ? JSON.parse(response.body.toString()) : response.body
  const result = contract.safeParse(body)
  if (!result.success) throw new Error(`the answer of ${what} breaks its contract: ${result.error.message}`)
  return response
}

function routeOf(method: Method, path: string): Route | undefined {
  const asked = path.split('?')[0] ?? ''
  const fitting = ROUTES.filter((route) => route.method === method && patternOf(route.path).test(asked))
  // An address without a name in it is meant rather than one that would take it for a name.
  return fitting.find((route) => route.path === asked) ?? fitting[0]
}

const patternOf = (path: string): RegExp =>
  new RegExp(`^${path.replaceAll('.', String.raw`\.`).replaceAll(/:[a-z]+/gi, '[^/]+')}$`)

/** Reads a body as bytes. The library types the response as already parsed; here it is still the stream. */
const bytesParser = (response: Response, done: (error: Error | null, body: Buffer) => void): void =>
  bytesOf(response as unknown as NodeJS.ReadableStream, done)

function bytesOf(response: NodeJS.ReadableStream, done: (error: Error | null, body: Buffer) => void): void {
  const chunks: Buffer[] = []
  response.on('data', (chunk: Buffer) => chunks.push(chunk))
  response.on('end', () => done(null, Buffer.concat(chunks)))
}
