import { randomUUID } from 'node:crypto'
import { beforeAll, describe, expect, it } from 'vitest'
import { Client, Membership } from '@server/models/person'
import { ROUTES } from '@server/routes'
import { useApplication } from '../helpers/application'
import { signedIn, stranger } from '../helpers/client'
import type { HttpClient } from '../helpers/client'
import { aCommission } from '../helpers/factories/commissions'
import { aClient } from '../helpers/factories/people'

const listel = useApplication()
let manager: HttpClient
beforeAll(async () => {
  const person = await signedIn(listel.app, { role: 'manager' })
  // A curator as well, so that every door is open and what was sent is looked at.
  const { id: clientId } = await aClient()
  await Membership.create({
    personId: person.personId,
    role: 'curator',
    clientId,
    millId: null,
    createdAt: new Date(),
  })
  manager = person
})

/** Texts that have broken programs before. */
const NASTY = [
  `'; DROP TABLE client; --`,
  `" OR 1=1 #`,
  String.raw`\'; SELECT SLEEP(5); --`,
  `:name ? %s $1 {{7*7}} \${7*7}`,
  `<script>alert(1)</script><img src=x onerror=alert(1)>`,
  `漢字 ✍🏽 ‮right to left‬ é`,
  `a\tb\r\nc`,
  `__proto__`,
]

describe('texts that look like something else', () => {
  it.each(NASTY)('are kept and given back as they are: %j', async (name) => {
    const made = await manager.post('/clients', { name })
    expect(made.status).toBe(200)
    expect(made.body.name).toBe(name)
    expect((await Client.findByPk(made.body.id))?.name).toBe(name)
    const found = await manager.get(`/commissions?find=${encodeURIComponent(name)}`)
    expect(found.status).toBe(200)
  })

  it('are refused by nobody but the contract: a text with a NUL or half a character is no defect', async () => {
    for (const name of ['a\u0000b', '\ud800']) {
      const answer = await manager.post('/clients', { name })
      expect(answer.status).toBeLessThan(500)
    }
  })

  it('cannot reach a prototype through a key', async () => {
    const body = '{"name":"x","__proto__":{"polluted":true},"constructor":{"prototype":{"polluted":true}}}'
    const answer = await manager.agent.post('/api/clients').set('Content-Type', 'application/json').send(body)
    expect(answer.status).toBeLessThan(500)
    expect(({} as { polluted?: boolean }).polluted).toBeUndefined()
  })
})

/** Every route that takes a JSON body, with its ids made up. */
const WRITES = ROUTES.filter(
  ({ takesBody, takesUpload, right }) => takesBody && !takesUpload && right !== 'public',
)
const pathOf = (path: string) => path.replaceAll(/:[a-z]+/gi, () => randomUUID())

describe.each(WRITES.map((route) => [`${route.method} ${route.path}`, route] as const))(
  '%s',
  (_name, route) => {
    /** What is no JSON object of any contract. */
    const rubbish: readonly (readonly [string, string])[] = [
      ['broken JSON', '{"name": '],
      ['a list', '[]'],
      ['a number', '17'],
      ['nothing', ''],
      ['an unknown key', '{"surprise":true}'],
      ['a huge number', '{"version":1e999,"operationId":1e308}'],
      ['deep nesting', '{"a":'.repeat(5_000) + '1' + '}'.repeat(5_000)],
    ]
    it.each(rubbish)('refuses %s with a message and no defect', async (_what, body) => {
      const answer = await manager.agent[route.method](`/api${pathOf(route.path)}`)
        .set('Content-Type', 'application/json')
        .send(body)
      expect(answer.status).toBe(400)
      expect(answer.body.error.code).toBe('input-invalid')
      expect(answer.body.error.says.length).toBeGreaterThan(10)
      expect(answer.body.requestId).toMatch(/^[0-9a-f-]{36}$/)
    })

    it('refuses a body of another kind', async () => {
      const answer = await manager.agent[route.method](`/api${pathOf(route.path)}`)
        .set('Content-Type', 'text/plain')
        .send('name=x')
      expect(answer.status).toBe(400)
    })
  },
)

describe('requests that are out of bounds', () => {
  it('are cut off beyond a megabyte', async () => {
    const answer = await manager.post('/clients', { name: 'x'.repeat(1_100_000) })
    expect(answer.status).toBe(413)
    expect(answer.body.error.code).toBe('file-too-large')
  })

  it.each(['%00', '%E0%A4%A', '..%2f..%2fetc%2fpasswd', '{}', "1' OR '1'='1"])(
    'find nothing by the key %j',
    async (key) => {
      const answer = await manager.agent.get(`/api/commissions/${key}`)
      expect([400, 404]).toContain(answer.status)
      expect(answer.body.error.code).toMatch(/^(input-invalid|not-found)$/)
    },
  )

  it('find nothing at addresses that are none', async () => {
    for (const path of ['/api', '/api/', '/api/nothing', '/api/commissions/a/b/c', '/nothing']) {
      const answer = await stranger(listel.app).agent.get(path)
      expect(answer.status).toBe(404)
      expect(answer.body.error.code).toBe('not-found')
    }
  })

  it('are told the same thing twice in a query', async () => {
    const answer = await manager.agent.get('/api/commissions?state=open&state=archived')
    expect(answer.status).toBe(400)
  })
})

describe('a race for one row', () => {
  it('ends with one winner, and the others are told', async () => {
    const client = await aClient()
    const sent = await Promise.all(
      Array.from({ length: 8 }, (_, n) =>
        manager.patch(`/clients/${client.id}`, { version: 0, name: `N${n}` }),
      ),
    )
    expect(sent.filter(({ status }) => status === 200)).toHaveLength(1)
    expect(sent.filter(({ status }) => status === 409)).toHaveLength(7)
    await client.reload()
    expect(client.version).toBe(1)
  })

  it('leaves the trail whole when many write on one commission', async () => {
    const { id } = await aCommission()
    const sent = await Promise.all(
      Array.from({ length: 10 }, (_, n) =>
        manager.post(`/commissions/${id}/pictures`, { operationId: randomUUID(), name: `P${n}`, copies: 1 }),
      ),
    )
    expect(sent.map(({ status }) => status)).toEqual(Array.from({ length: 10 }, () => 200))
    const trail = await manager.get(`/commissions/${id}/trail`)
    expect(trail.body.map(({ seq }: { seq: number }) => seq)).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9, 10])
  })
})
