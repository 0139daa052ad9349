import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Express } from 'express'
import { Client } from '@server/models/person'
import { startApplication } from '../helpers/application'
import { signedIn, stranger } from '../helpers/client'
import type { HttpClient } from '../helpers/client'
import { cuttableLineTo } from '../helpers/cuttable-line'
import type { CuttableLine } from '../helpers/cuttable-line'
import { testDatabaseUrl } from '../helpers/database'
import { aClient, unique } from '../helpers/factories/people'

let line: CuttableLine
let app: Express
let stop: () => Promise<void>
let manager: HttpClient

beforeAll(async () => {
  line = await cuttableLineTo(await testDatabaseUrl())
  const started = await startApplication({ databaseUrl: line.url })
  app = started.app
  stop = started.stop
  manager = await signedIn(app, { role: 'manager' })
})
afterAll(async () => {
  line.mend()
  await stop()
  await line.close()
})

describe('when the database goes away', () => {
  it('every request is told so, at once, and all is well when it is back', async () => {
    line.cut()
    const before = Date.now()
    const sent = [
      await manager.get('/commissions'),
      await manager.post('/clients', { name: 'Lost' }),
      await stranger(app).get('/ready'),
      await stranger(app).post('/session', { email: 'a@listel.example', password: 'x' }),
    ]
    expect(Date.now() - before).toBeLessThan(8000)
    for (const answer of sent) {
      expect(answer.status).toBe(503)
      expect(answer.body.error.code).toBe('out-of-service')
      expect(answer.body.error.says).toMatch(/database cannot be reached/)
      expect(answer.get('Retry-After')).toBe('5')
      expect(JSON.stringify(answer.body)).not.toMatch(/ECONN|mariadb|socket|sql/i)
    }
    expect((await stranger(app).get('/health')).status).toBe(200)
    line.mend()
    expect((await stranger(app).get('/ready')).status).toBe(200)
    expect((await manager.get('/commissions')).status).toBe(200)
    expect((await manager.post('/clients', { name: 'Found' })).status).toBe(200)
  })

  it('under a request, the request is told so and nothing of it is half done', async () => {
    const clientId = (await aClient()).id
    const title = `Cut ${unique()}`
    const bodies = Array.from({ length: 12 }, () => ({
      operationId: randomUUID(),
      clientId,
      title,
      artist: '',
      accession: '',
      due: null,
    }))
    const sent = bodies.map((body) => manager.post('/commissions', body))
    setTimeout(() => line.cut(), 15)
    const answers = await Promise.all(sent)
    for (const { status } of answers) expect([200, 503]).toContain(status)
    line.mend()
    // Asked again under the same operation ids, each is there exactly once.
    for (const body of bodies) expect((await manager.post('/commissions', body)).status).toBe(200)
    const list = await manager.get(`/commissions?clientId=${clientId}`)
    expect(list.body).toHaveLength(12)
    for (const { id } of list.body) {
      expect((await manager.get(`/commissions/${id}/draft`)).status).toBe(200)
      expect((await manager.get(`/commissions/${id}/trail`)).body).toHaveLength(1)
    }
  })

  it('and back many times over, no connection is lost for good', async () => {
    for (let n = 0; n < 4; n += 1) {
      const under = Array.from({ length: 10 }, () => manager.get('/clients'))
      line.cut()
      await Promise.all(under)
      line.mend()
    }
    const after = await Promise.all(Array.from({ length: 15 }, () => manager.get('/clients')))
    expect(after.map(({ status }) => status)).toEqual(Array.from({ length: 15 }, () => 200))
    expect(await Client.count()).toBeGreaterThan(0)
  })
})
