import { randomUUID } from 'node:crypto'
import { beforeAll, describe, expect, it } from 'vitest'
import { Commission } from '@server/models/commission'
import { TrailEntry } from '@server/models/trail'
import { canonicalText, sha256Hex } from '@shared/section'
import { useApplication } from '../helpers/application'
import { signedIn } from '../helpers/client'
import type { HttpClient } from '../helpers/client'
import { SOUND_SECTION, aCommission, aMeasurement, aPicture } from '../helpers/factories/commissions'
import { aClient, unique } from '../helpers/factories/people'
import { aPhotograph } from '../helpers/factories/photographs'
import { pathsOf } from '../helpers/faults'

const listel = useApplication()
let designer: HttpClient
beforeAll(async () => {
  designer = await signedIn(listel.app, { role: 'designer' })
})

const newCommission = async (change: object = {}) => ({
  operationId: randomUUID(),
  clientId: (await aClient()).id,
  title: 'Harbour at low water',
  artist: 'Unknown, about 1890',
  accession: '1910.14',
  due: '2027-03-01',
  ...change,
})

describe('taking on a commission', () => {
  it('gives it a number, a bare draft and the first entry of its trail', async () => {
    const body = await newCommission()
    const answer = await designer.post('/commissions', body)
    expect(answer.status).toBe(200)
    expect(answer.body).toMatchObject({
      title: 'Harbour at low water',
      due: '2027-03-01',
      stage: 'picture',
      waitsForRole: 'designer',
      stuck: false,
      latestIssue: null,
      pictures: [],
      photographs: [],
    })
    expect(answer.body.number).toMatch(/^C-\d{4,}$/)
    const draft = await designer.get(`/commissions/${answer.body.id}/draft`)
    expect(draft.body).toMatchObject({ version: 1, undo: null, redo: null, history: [] })
    expect(draft.body.document).toEqual({
      sightEdgeHeight: 30,
      rebate: { width: 8, depth: 20 },
      backSplay: { x: 0, height: 0 },
      gesso: 0,
      tolerance: 0.2,
      members: [],
    })
    const trail = await designer.get(`/commissions/${answer.body.id}/trail`)
    expect(trail.body).toHaveLength(1)
    expect(trail.body[0]).toMatchObject({ seq: 1, act: 'commission-taken-on' })
  })

  it('happens once for an operation, however often it is asked, also at the same time', async () => {
    const body = await newCommission()
    const answers = await Promise.all(Array.from({ length: 5 }, () => designer.post('/commissions', body)))
    expect(answers.map(({ status }) => status)).toEqual([200, 200, 200, 200, 200])
    expect(new Set(answers.map((answer) => answer.body.id)).size).toBe(1)
    expect(await Commission.count({ where: { clientId: body.clientId } })).toBe(1)
  })

  it('refuses an operation id that was used for something else, or by somebody else', async () => {
    const body = await newCommission()
    await designer.post('/commissions', body)
    const other = await designer.post('/commissions', { ...body, title: 'Another' })
    expect(other.status).toBe(409)
    expect(other.body.error.code).toBe('operation-reused')
    const another = await signedIn(listel.app, { role: 'designer' })
    expect((await another.post('/commissions', body)).body.error.code).toBe('operation-reused')
    expect(await Commission.count({ where: { clientId: body.clientId } })).toBe(1)
  })

  it('gives numbers without a gap or a repeat when many come at once', async () => {
    const bodies = await Promise.all(Array.from({ length: 8 }, () => newCommission()))
    const answers = await Promise.all(bodies.map((body) => designer.post('/commissions', body)))
    const numbers = answers.map((answer) => Number(answer.body.number.slice(2))).sort((a, b) => a - b)
    expect(numbers).toEqual(numbers.map((_, index) => (numbers[0] ?? 0) + index))
  })

  it.each([
    ['/clientId', { clientId: randomUUID() }],
    ['/clientId', { clientId: 'x' }],
    ['/title', { title: '   ' }],
    ['/title', { title: 'x'.repeat(201) }],
    ['/artist', { artist: 7 }],
    ['/accession', { accession: null }],
    ['/due', { due: '2027-02-30' }],
    ['/due', { due: 'soon' }],
    ['/operationId', { operationId: 'again' }],
    ['/price', { price: '1.00' }],
  ])('names the field %s', async (path, change) => {
    const answer = await designer.post('/commissions', await newCommission(change))
    expect(answer.status).toBe(400)
    expect(pathsOf(answer)).toEqual([path])
  })

  it('refuses an archived client', async () => {
    const client = await aClient({ state: 'archived' })
    const answer = await designer.post('/commissions', await newCommission({ clientId: client.id }))
    expect(pathsOf(answer)).toEqual(['/clientId'])
  })
})

describe('the list of commissions', () => {
  it('shows a curator those of the own client and no other', async () => {
    const client = await aClient()
    const own = await aCommission({ clientId: client.id })
    await aCommission()
    const curator = await signedIn(listel.app, { role: 'curator', clientId: client.id })
    const answer = await curator.get('/commissions?state=all')
    expect(answer.body.map((line: { id: string }) => line.id)).toEqual([own.id])
  })

  it('is narrowed by state, client, stage and words, and words are never a pattern', async () => {
    const client = await aClient({ name: `Museum ${unique()}` })
    const tag = unique()
    const measured = await aCommission({ clientId: client.id, title: `Quay ${tag}` })
    await aMeasurement(await aPicture(measured))
    const bare = await aCommission({ clientId: client.id, title: `100% ${tag}` })
    const archived = await aCommission({ clientId: client.id, state: 'archived' })
    const idsOf = async (query: string) =>
      (await designer.get(`/commissions?${query}`)).body.map((line: { id: string }) => line.id).sort()
    expect(await idsOf(`clientId=${client.id}`)).toEqual([measured.id, bare.id].sort())
    expect(await idsOf(`clientId=${client.id}&state=archived`)).toEqual([archived.id])
    expect(await idsOf(`clientId=${client.id}&stage=picture`)).toEqual([bare.id])
    expect(await idsOf(`find=quay%20${tag}`)).toEqual([measured.id])
    expect(await idsOf(`find=${encodeURIComponent(client.name)}`)).toEqual([measured.id, bare.id].sort())
    expect(await idsOf(`find=100%25%20${tag}`)).toEqual([bare.id])
    expect(await idsOf(`find=${tag}%20%25`)).toEqual([bare.id])
    expect(await idsOf(`find=${tag}%20_`)).toEqual([])
  })

  it.each([
    ['/state', 'state=gone'],
    ['/clientId', 'clientId=1'],
    ['/stage', 'stage=glue'],
    ['/find', `find=${'x'.repeat(201)}`],
    ['/order', 'order=title'],
  ])('names the fault %s in what is asked', async (path, query) => {
    expect(pathsOf(await designer.get(`/commissions?${query}`))).toEqual([path])
  })

  it('says where each stands and which are overdue', async () => {
    const late = await aCommission({ due: '2020-01-01', section: SOUND_SECTION })
    await aMeasurement(await aPicture(late))
    await aPhotograph(late)
    const answer = await designer.get(`/commissions/${late.id}`)
    expect(answer.body).toMatchObject({ stage: 'section', stuck: true, waitsForRole: 'designer' })
  })
})

describe('changing a commission', () => {
  it('writes what changed, counts the version and enters it in the trail', async () => {
    const { id } = await aCommission()
    const answer = await designer.patch(`/commissions/${id}`, { version: 0, title: 'New title', due: null })
    expect(answer.body).toMatchObject({ title: 'New title', due: null, version: 1 })
    expect((await designer.get(`/commissions/${id}/trail`)).body.at(-1)).toMatchObject({
      act: 'commission-changed',
      says: 'Changed title',
    })
  })

  it('refuses a change made from an older version', async () => {
    const { id } = await aCommission()
    const sent = await Promise.all(
      ['One', 'Two', 'Three'].map((title) => designer.patch(`/commissions/${id}`, { version: 0, title })),
    )
    expect(sent.map(({ status }) => status).sort()).toEqual([200, 409, 409])
    expect(sent.find(({ status }) => status === 409)?.body.error).toMatchObject({
      code: 'version-stale',
      version: 1,
    })
  })

  it.each([
    ['/version', { title: 'x' }],
    ['/state', { version: 0, state: 'deleted' }],
    ['/clientId', { version: 0, clientId: randomUUID() }],
    ['/due', { version: 0, due: '01/02/2027' }],
  ])('names the field %s', async (path, body) => {
    const { id } = await aCommission()
    expect(pathsOf(await designer.patch(`/commissions/${id}`, body))).toEqual([path])
  })

  it('answers 404 for what is not there and 400 for what can be no key', async () => {
    expect((await designer.get(`/commissions/${randomUUID()}`)).status).toBe(404)
    expect(pathsOf(await designer.get('/commissions/1'))).toEqual(['/id'])
  })
})

describe('the trail', () => {
  it('is a chain of hashes: each takes in the one before', async () => {
    const answer = await designer.post('/commissions', await newCommission())
    const { id } = answer.body
    for (const title of ['One', 'Two', 'Three'].entries()) {
      await designer.patch(`/commissions/${id}`, { version: title[0], title: title[1] })
    }
    const rows = await TrailEntry.findAll({ where: { commissionId: id }, order: [['seq', 'ASC']] })
    expect(rows.map(({ seq }) => seq)).toEqual([1, 2, 3, 4])
    rows.forEach((row, index) => {
      expect(row.prevHash).toBe(rows[index - 1]?.hash ?? null)
      const { commissionId, seq, actorId, actorName, act, says, document, prevHash } = row
      const at = row.at.toISOString()
      const text = canonicalText({ commissionId, seq, at, actorId, actorName, act, says, document, prevHash })
      expect(row.hash).toBe(sha256Hex(text))
    })
  })
})

describe('what waits', () => {
  it('tells the designer what to measure and draw, the manager what is overdue', async () => {
    const late = await aCommission({ due: '2020-01-01' })
    const lines = (await designer.get('/waiting')).body
    expect(
      lines.find((line: { commission: { id: string } }) => line.commission?.id === late.id),
    ).toMatchObject({
      kind: 'measure',
      to: `/commissions/${late.id}/picture`,
      urgent: true,
    })
    const manager = await signedIn(listel.app, { role: 'manager' })
    const seen = (await manager.get('/waiting')).body
    expect(
      seen.filter((line: { commission: { id: string } }) => line.commission?.id === late.id),
    ).toMatchObject([{ kind: 'overdue', urgent: true, since: '2020-01-01T00:00:00.000Z' }])
  })
})
