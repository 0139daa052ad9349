import { FaultAnswer } from '@shared/contracts'
import type { Contract, OutputOf } from '@shared/contracts'
import { Failure } from '@shared/failure'
import type { FailureCode } from '@shared/failure'

/** The one door to the server: everything else in this folder goes through `ask`, `send` or `addressOf`. */

export type QueryValues = Readonly<Record<string, string | undefined>>

export interface Sending {
  readonly body?: unknown
  readonly query?: QueryValues
  readonly signal?: AbortSignal
}

/** All codes the server may give; a code that is not here is a defect on its side. */
const CODES = {
  'input-invalid': true,
  'not-signed-in': true,
  'sign-in-refused': true,
  'too-many-tries': true,
  'right-missing': true,
  'not-found': true,
  'version-stale': true,
  'transition-not-allowed': true,
  'not-ready': true,
  'operation-reused': true,
  'already-exists': true,
  'file-refused': true,
  'file-too-large': true,
  'no-plan': true,
  'link-spent': true,
  'out-of-service': true,
} satisfies Record<FailureCode, true>

const isFailureCode = (code: string): code is FailureCode => Object.hasOwn(CODES, code)

/** Address of something under /api, for a link or an image. Parts are escaped. */
export function addressOf(parts: readonly (string | number)[], query: QueryValues = {}): string {
  const path = ['', 'api', ...parts.map((part) => encodeURIComponent(part))].join('/')
  const pairs = Object.entries(query).flatMap(([name, value]) =>
    value === undefined || value === '' ? [] : [`${name}=${encodeURIComponent(value)}`],
  )
  return pairs.length === 0 ? path : `${path}?${pairs.join('&')}`
}

/** Reads; gives what the contract makes of the answer. Throws Failure for everything that can go wrong. */
export function ask<C extends Contract>(
  answer: C,
  parts: readonly (string | number)[],
  sending: Omit<Sending, 'body'> = {},
): Promise<OutputOf<C>> {
  return exchange(answer, 'GET', parts, sending)
}

/** Writes; as `ask`. */
export function send<C extends Contract>(
  answer: C,
  method: 'POST' | 'PUT' | 'PATCH' | 'DELETE',
  parts: readonly (string | number)[],
  sending: Sending = {},
): Promise<OutputOf<C>> {
  return exchange(answer, method, parts, sending)
}

async function exchange<C extends Contract>(
  answer: C,
  method: string,
  parts: readonly (string | number)[],
  { body, query = {}, signal }: Sending,
): Promise<OutputOf<C>> {
  const response = await reach(addressOf(parts, query), {
    method,
    credentials: 'same-origin',
    ...(signal === undefined ? {} : { signal }),
    ...bodyOf(body),
  })
  const read = await jsonOf(response)
  if (!response.ok) throw failureFrom(response, read)
  const result = answer.safeParse(read)
  if (result.success) return result.data as OutputOf<C>
  throw new Failure(
    'out-of-service',
    { says: 'The server answers in a form this page does not know. Reload the page to bring it up to date.' },
    { cause: result.error },
  )
}

/** A form goes as it is (a file with words about it), anything else as JSON. */
function bodyOf(body: unknown): RequestInit {
  if (body === undefined) return {}
  if (body instanceof FormData) return { body }
  return { body: JSON.stringify(body), headers: { 'Content-Type': 'application/json' } }
}

async function reach(address: string, init: RequestInit): Promise<Response> {
  try {
    return await fetch(address, init)
  } catch (error) {
    if (error instanceof DOMException && error.name === 'AbortError') throw error
    throw new Failure(
      'out-of-service',
      { says: 'The workshop’s server cannot be reached. What you entered is still here: try again shortly.' },
      { cause: error },
    )
  }
}

async function jsonOf(response: Response): Promise<unknown> {
  const text = await response.text()
  try {
    return JSON.parse(text) as unknown
  } catch {
    // A page of something between here and the server; the status says all there is to know.
    return undefined
  }
}

function failureFrom(response: Response, read: unknown): Failure {
  const result = FaultAnswer.safeParse(read)
  if (!result.success) {
    return new Failure('out-of-service', {
      says: `The workshop’s server cannot answer at the moment (${response.status}). Try again shortly.`,
    })
  }
  const { error, requestId } = result.data
  const { code, faults, ...details } = error
  const given = { ...details, requestId, ...(faults === undefined ? {} : { faults }) }
  if (isFailureCode(code)) return new Failure(code, given)
  return new Failure('out-of-service', { ...given, says: `${error.says} (request ${requestId})` })
}
