import { randomUUID } from 'node:crypto'
import { beforeAll, describe, expect, it } from 'vitest'
import { Client, Membership, Mill, Person } from '@server/models/person'
import { MillCard, SawCard, Setting } from '@server/models/workshop'
import { useApplication } from '../helpers/application'
import { signedIn, stranger } from '../helpers/client'
import type { HttpClient } from '../helpers/client'
import { MILL_CARD, SAW_CARD } from '../helpers/factories/cards'
import { PASSWORD, aClient, aMill, aPerson, unique } from '../helpers/factories/people'
import { pathsOf } from '../helpers/faults'

const listel = useApplication()
let manager: HttpClient
beforeAll(async () => {
  manager = await signedIn(listel.app, { role: 'manager' })
})

const newPerson = (change: object = {}) => ({
  name: 'Nora Pell',
  email: `nora-${unique()}@listel.example`,
  password: 'long enough',
  memberships: [{ role: 'bench', clientId: null, millId: null }],
  ...change,
})

describe('people', () => {
  it('are taken in with their memberships and can sign in at once', async () => {
    const client = await aClient()
    const body = newPerson({
      memberships: [
        { role: 'designer', clientId: null, millId: null },
        { role: 'curator', clientId: client.id, millId: null },
      ],
    })
    const answer = await manager.post('/people', body)
    expect(answer.status).toBe(200)
    expect(answer.body.memberships).toEqual(
      expect.arrayContaining([
        { role: 'designer', client: null, mill: null },
        { role: 'curator', client: { id: client.id, name: client.name }, mill: null },
      ]),
    )
    expect(JSON.stringify(answer.body)).not.toContain('argon2')
    const person = await Person.findByPk(answer.body.id, { rejectOnEmpty: true })
    expect(person.passwordHash).toMatch(/^\$argon2id\$/)
    const { email, password } = body
    expect((await stranger(listel.app).post('/session', { email, password })).status).toBe(200)
  })

  it('have an address of their own, whatever its case', async () => {
    const person = await aPerson({ role: 'bench' })
    const answer = await manager.post('/people', newPerson({ email: person.email.toUpperCase() }))
    expect(answer.status).toBe(409)
    expect(answer.body.error.code).toBe('already-exists')
    expect(pathsOf(answer)).toEqual(['/email'])
  })

  it.each([
    ['/memberships', { memberships: [] }],
    ['/memberships/0/role', { memberships: [{ role: 'owner', clientId: null, millId: null }] }],
    ['/memberships/0/clientId', { memberships: [{ role: 'curator', clientId: null, millId: null }] }],
    ['/memberships/0/clientId', { memberships: [{ role: 'curator', clientId: randomUUID(), millId: null }] }],
    ['/memberships/0/clientId', { memberships: [{ role: 'bench', clientId: randomUUID(), millId: null }] }],
    ['/memberships/0/millId', { memberships: [{ role: 'mill', clientId: null, millId: null }] }],
    ['/password', { password: 'short' }],
    ['/email', { email: 'nora' }],
    ['/name', { name: '' }],
    ['/state', { state: 'active' }],
  ])('name the field %s, and then nobody is taken in', async (path, change) => {
    const body = newPerson(change)
    const answer = await manager.post('/people', body)
    expect(answer.status).toBe(400)
    expect(pathsOf(answer)).toEqual([path])
    expect(await Person.count({ where: { email: body.email } })).toBe(0)
  })

  it('lose at once what is taken from them, and the rows stay', async () => {
    const person = await aPerson({ role: 'designer' })
    const http = stranger(listel.app)
    await http.post('/session', { email: person.email, password: PASSWORD })
    expect((await http.get('/commissions')).status).toBe(200)
    const memberships = [{ role: 'bench', clientId: null, millId: null }]
    const answer = await manager.patch(`/people/${person.id}`, { version: 0, memberships })
    expect(answer.body).toMatchObject({ version: 1, memberships: [{ role: 'bench' }] })
    expect((await http.get('/clients')).status).toBe(404)
    const rows = await Membership.findAll({ where: { personId: person.id } })
    expect(rows.map(({ role, state }) => `${role} ${state}`).sort()).toEqual([
      'bench active',
      'designer archived',
    ])
  })

  it.each([
    ['a new password', { password: 'another one' }],
    ['the archive', { state: 'archived' }],
  ])('are signed out everywhere by %s', async (_what, change) => {
    const http = await signedIn(listel.app, { role: 'bench' })
    const answer = await manager.patch(`/people/${http.personId}`, { version: 0, ...change })
    expect(answer.status).toBe(200)
    expect((await http.get('/session')).status).toBe(401)
  })

  it('are changed from the latest version only', async () => {
    const person = await aPerson({ role: 'bench' })
    await manager.patch(`/people/${person.id}`, { version: 0, name: 'One' })
    const answer = await manager.patch(`/people/${person.id}`, { version: 0, name: 'Two' })
    expect(answer.body.error.code).toBe('version-stale')
    expect((await manager.patch(`/people/${randomUUID()}`, { version: 0 })).status).toBe(404)
  })

  it('are listed by state', async () => {
    const archived = await aPerson({ role: 'bench', state: 'archived' })
    const idsIn = async (state: string) =>
      (await manager.get(`/people?state=${state}`)).body.map((person: { id: string }) => person.id)
    expect(await idsIn('archived')).toContain(archived.id)
    expect(await idsIn('active')).not.toContain(archived.id)
    expect(await idsIn('active')).toContain((manager as HttpClient & { personId: string }).personId)
  })
})

describe('clients', () => {
  it('are taken on, renamed and archived', async () => {
    const made = await manager.post('/clients', { name: '  Tarn College ' })
    expect(made.body).toMatchObject({ name: 'Tarn College', state: 'active', version: 0 })
    const changed = await manager.patch(`/clients/${made.body.id}`, { version: 0, state: 'archived' })
    expect(changed.body).toMatchObject({ state: 'archived', version: 1 })
    expect((await Client.findByPk(made.body.id))?.state).toBe('archived')
    expect(pathsOf(await manager.post('/clients', { name: '' }))).toEqual(['/name'])
    expect(pathsOf(await manager.patch(`/clients/${made.body.id}`, { name: 'x' }))).toEqual(['/version'])
  })
})

describe('mills', () => {
  it('get numbered cards; the earlier ones stay as they were', async () => {
    const made = await manager.post('/mills', { name: 'Mill', email: 'mill@mill.example', card: null })
    expect(made.body.card).toBeNull()
    const { id } = made.body
    const add = (maxWidth: number, operationId = randomUUID()) =>
      manager.post(`/mills/${id}/cards`, { operationId, document: { ...MILL_CARD, maxWidth } })
    await add(150)
    const again = randomUUID()
    await add(180, again)
    const second = await add(180, again)
    expect(second.body.card).toMatchObject({ no: 2, document: { maxWidth: 180 } })
    const cards = await manager.get(`/mills/${id}/cards`)
    expect(cards.body.map((card: { document: { maxWidth: number } }) => card.document.maxWidth)).toEqual([
      180, 150,
    ])
    expect(await MillCard.count({ where: { millId: id } })).toBe(2)
    expect((await manager.get(`/mills/${id}`)).body.card.no).toBe(2)
  })

  it('are changed from the latest version only', async () => {
    const mill = await aMill()
    const changed = await manager.patch(`/mills/${mill.id}`, { version: 0, email: 'new@mill.example' })
    expect(changed.body).toMatchObject({ email: 'new@mill.example', version: 1 })
    expect((await manager.patch(`/mills/${mill.id}`, { version: 0, name: 'x' })).status).toBe(409)
    expect((await Mill.findByPk(mill.id))?.email).toBe('new@mill.example')
  })

  it.each([
    ['/document/maxWidth', { maxWidth: 0 }],
    ['/document/head/knives', { head: { ...MILL_CARD.head, knives: 1.5 } }],
    ['/document/head/feedBy', { head: { ...MILL_CARD.head, feedBy: 'steam' } }],
    ['/document/lengths/0/price', { lengths: [{ length: 2400, price: 18.5 }] }],
    ['/document/sideClearance/angle', { sideClearance: { angle: 90, over: 3 } }],
  ])('name the field %s of a card', async (path, change) => {
    const mill = await aMill()
    const answer = await manager.post(`/mills/${mill.id}/cards`, {
      operationId: randomUUID(),
      document: { ...MILL_CARD, ...change },
    })
    expect(answer.status).toBe(400)
    expect(pathsOf(answer)).toEqual([path])
  })
})

describe('saws', () => {
  it('are known by name; the latest card of each is what holds', async () => {
    const name = `Saw ${unique()}`
    const add = (kerf: number) =>
      manager.post('/saws/cards', { operationId: randomUUID(), document: { ...SAW_CARD, name, kerf } })
    await add(3.2)
    const answer = await add(2.8)
    const mine = answer.body.filter((card: { document: { name: string } }) => card.document.name === name)
    expect(mine).toMatchObject([{ no: 2, document: { kerf: 2.8 } }])
    expect(await SawCard.count({ where: { name } })).toBe(2)
    const wrong = await manager.post('/saws/cards', {
      operationId: randomUUID(),
      document: { ...SAW_CARD, kerf: -1 },
    })
    expect(pathsOf(wrong)).toEqual(['/document/kerf'])
  })
})

describe('settings', () => {
  it('are changed from the latest version, and everybody is shown them', async () => {
    const before = (await manager.get('/settings')).body
    const document = { ...before.document, workshop: 'Ashgrove', currency: 'CHF', units: 'in' }
    const after = await manager.put('/settings', { version: before.version, document })
    expect(after.body).toEqual({ version: before.version + 1, document })
    const bench = await signedIn(listel.app, { role: 'bench' })
    expect((await bench.get('/session')).body.workshop).toMatchObject({
      name: 'Ashgrove',
      currency: 'CHF',
      units: 'in',
    })
    const stale = await manager.put('/settings', { version: before.version, document })
    expect(stale.body.error.code).toBe('version-stale')
    expect((await Setting.findByPk('workshop'))?.version).toBe(before.version + 1)
  })

  it.each([
    ['/document/currency', { currency: 'euro' }],
    ['/document/units', { units: 'ell' }],
    ['/document/workshop', { workshop: '' }],
    ['/document/allowance', { allowance: -1 }],
  ])('name the field %s', async (path, change) => {
    const { version, document } = (await manager.get('/settings')).body
    const answer = await manager.put('/settings', { version, document: { ...document, ...change } })
    expect(pathsOf(answer)).toEqual([path])
  })
})
