import { afterEach, describe, expect, it, vi } from 'vitest'
import { ClientAnswer, ClientsAnswer } from '@shared/contracts'
import type { Failure } from '@shared/failure'
import { addressOf, ask, send } from '@/api/request'

const CLIENT = { id: '0195d0a0-0000-7000-8000-000000000001', name: 'Tarn', state: 'active', version: 1 }

/** Answers every request with this, and keeps what was asked. */
function answering(status: number, body: string) {
  const asked = vi.fn<(address: string, init: RequestInit) => Promise<Response>>(() =>
    Promise.resolve(new Response(body, { status })),
  )
  vi.stubGlobal('fetch', asked)
  return asked
}
async function failureOf(request: Promise<unknown>): Promise<Failure> {
  const thrown = await request.then(
    () => undefined,
    (error: unknown) => error,
  )
  if (!(thrown instanceof Error) || thrown.name !== 'Failure') throw new Error('no failure was thrown')
  return thrown as Failure
}
const fault = (error: object) => JSON.stringify({ error, requestId: 'r-1' })

afterEach(() => vi.unstubAllGlobals())

describe('an address', () => {
  it('escapes its parts and leaves out what is not asked', () => {
    expect(addressOf(['links', 'a/b ?'], { find: 'x&y', stage: undefined, state: '' })).toBe(
      '/api/links/a%2Fb%20%3F?find=x%26y',
    )
  })
})

describe('a request', () => {
  it('gives what the contract makes of the answer', async () => {
    const asked = answering(200, JSON.stringify([CLIENT]))
    await expect(ask(ClientsAnswer, ['clients'], { query: { state: 'all' } })).resolves.toEqual([CLIENT])
    expect(asked.mock.calls[0]?.[0]).toBe('/api/clients?state=all')
  })

  it('sends JSON as JSON and a form as it is', async () => {
    const asked = answering(200, JSON.stringify(CLIENT))
    await send(ClientAnswer, 'POST', ['clients'], { body: { name: 'Tarn' } })
    expect(asked.mock.calls[0]?.[1]).toMatchObject({
      method: 'POST',
      body: '{"name":"Tarn"}',
      headers: { 'Content-Type': 'application/json' },
    })
    const form = new FormData()
    await send(ClientAnswer, 'POST', ['clients'], { body: form })
    expect(asked.mock.calls[1]?.[1].body).toBe(form)
    expect(asked.mock.calls[1]?.[1].headers).toBeUndefined()
  })

  it('tells a refusal with its code, words, faults and whatever goes with it', async () => {
    const faults = [{ path: '/name', code: 'too-small', says: 'is empty' }]
    answering(
      409,
      fault({ code: 'version-stale', says: 'Somebody was first.', faults, draft: { version: 4 } }),
    )
    const failure = await failureOf(ask(ClientsAnswer, ['clients']))
    expect(failure.code).toBe('version-stale')
    expect(failure.details).toMatchObject({ says: 'Somebody was first.', faults, draft: { version: 4 } })
  })

  it.each([
    ['a defect of the server', 500, fault({ code: 'fault', says: 'Something went wrong.' }), /request r-1/],
    ['a page of something in between', 502, '<html>Bad gateway</html>', /\(502\)/],
    ['an answer in a form that is not known', 200, JSON.stringify([{ ...CLIENT, secret: 1 }]), /Reload/],
    ['an answer that is no JSON', 200, 'ok', /Reload/],
  ])('takes %s for out of service', async (_, status, body, says) => {
    answering(status, body)
    const failure = await failureOf(ask(ClientsAnswer, ['clients']))
    expect(failure.code).toBe('out-of-service')
    expect(failure.details.says).toMatch(says)
  })

  it('says that the server cannot be reached', async () => {
    vi.stubGlobal('fetch', () => Promise.reject(new TypeError('Failed to fetch')))
    const failure = await failureOf(ask(ClientsAnswer, ['clients']))
    expect(failure.code).toBe('out-of-service')
    expect(failure.details.says).toMatch(/cannot be reached/)
  })

  it('lets a request that was given up be just that', async () => {
    vi.stubGlobal('fetch', () => Promise.reject(new DOMException('given up', 'AbortError')))
    await expect(ask(ClientsAnswer, ['clients'])).rejects.toThrow(DOMException)
  })
})
