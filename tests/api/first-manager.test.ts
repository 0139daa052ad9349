import { afterEach, describe, expect, it } from 'vitest'
import { Link } from '@server/models/session'
import { startApplication } from '../helpers/application'
import { stranger } from '../helpers/client'
import { emptyDatabase } from '../helpers/database'
import { aFirstManagerToken } from '../helpers/factories/links'
import { pathsOf } from '../helpers/faults'

const cleanings: (() => Promise<void>)[] = []
afterEach(async () => {
  for (const clean of cleanings.splice(0)) await clean()
})

/** An installation that nobody has entered yet. */
async function emptyInstallation() {
  const { url, drop } = await emptyDatabase()
  const { app, stop } = await startApplication({ databaseUrl: url })
  cleanings.push(stop, drop)
  return app
}

const welcome = (token: string) => ({
  token,
  name: 'Maren Pell',
  email: 'maren@listel.example',
  password: 'long enough',
  workshop: 'Pell & Daughter',
})

describe('the first manager', () => {
  it('signs up by the one-time link, which then opens nothing', async () => {
    const app = await emptyInstallation()
    const token = (await aFirstManagerToken()) ?? ''
    const http = stranger(app)
    const answer = await http.post('/first-manager', welcome(token))
    expect(answer.status).toBe(200)
    expect(answer.body).toMatchObject({
      memberships: [{ role: 'manager' }],
      workshop: { name: 'Pell & Daughter' },
    })
    expect((await http.get('/people')).body).toHaveLength(1)
    const again = await stranger(app).post('/first-manager', { ...welcome(token), email: 'x@listel.example' })
    expect(again.status).toBe(410)
    expect(again.body.error.code).toBe('link-spent')
    expect(await aFirstManagerToken()).toBeUndefined()
  })

  it('is let in once, even when the link is used twice at the same moment', async () => {
    const app = await emptyInstallation()
    const token = (await aFirstManagerToken()) ?? ''
    const sent = await Promise.all(
      ['a', 'b', 'c'].map((name) =>
        stranger(app).post('/first-manager', { ...welcome(token), email: `${name}@listel.example` }),
      ),
    )
    expect(sent.map(({ status }) => status).sort()).toEqual([200, 410, 410])
  })

  it('needs the latest link, unspent and in time; the table holds only its digest', async () => {
    const app = await emptyInstallation()
    const replaced = (await aFirstManagerToken()) ?? ''
    const latest = (await aFirstManagerToken()) ?? ''
    const refused = async (token: string) =>
      (await stranger(app).post('/first-manager', welcome(token))).status
    expect(await refused(replaced)).toBe(410)
    expect(await refused('x'.repeat(43))).toBe(410)
    expect(JSON.stringify(await Link.findAll())).not.toContain(latest)
    await Link.update({ expiresAt: new Date(Date.now() - 1000) }, { where: { revokedAt: null } })
    expect(await refused(latest)).toBe(410)
  })

  it('is told every field that lacks', async () => {
    const app = await emptyInstallation()
    const answer = await stranger(app).post('/first-manager', { token: 'short' })
    expect(answer.status).toBe(400)
    expect([...pathsOf(answer)].sort()).toEqual(['/email', '/name', '/password', '/token', '/workshop'])
  })
})
