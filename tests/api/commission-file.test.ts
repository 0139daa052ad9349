import { randomUUID } from 'node:crypto'
import { readFile } from 'node:fs/promises'
import { beforeAll, describe, expect, it } from 'vitest'
import { Commission } from '@server/models/commission'
import { readCommissionText } from '@shared/contracts'
import { sectionFromDraft, sectionSha256, shapeSha256 } from '@shared/section'
import { useApplication } from '../helpers/application'
import { signedIn } from '../helpers/client'
import type { HttpClient } from '../helpers/client'
import { SOUND_SECTION, aCommission, aMeasurement, aPicture } from '../helpers/factories/commissions'
import { aClient } from '../helpers/factories/people'
import { aPhotograph } from '../helpers/factories/photographs'
import { pathsOf } from '../helpers/faults'

const listel = useApplication()
let designer: HttpClient
beforeAll(async () => {
  designer = await signedIn(listel.app, { role: 'designer' })
})

const exported = async (id: string) => {
  const answer = await designer.file(`/commissions/${id}/file`)
  expect(answer.status).toBe(200)
  return (answer.body as Buffer).toString('utf8')
}
const taken = async (file: unknown, change: object = {}) =>
  designer.post('/commissions/import', {
    operationId: randomUUID(),
    clientId: (await aClient()).id,
    file,
    ...change,
  })
const example = async (name: string): Promise<Record<string, unknown>> =>
  JSON.parse(await readFile(new URL(`../../examples/${name}`, import.meta.url), 'utf8'))

describe('a commission file', () => {
  it('goes out and comes back to the same section, hash for hash, and the same file', async () => {
    const commission = await aCommission({ section: SOUND_SECTION, due: '2027-05-01' })
    await aMeasurement(await aPicture(commission, { name: 'Left', copies: 2 }))
    await aMeasurement(await aPicture(commission, { name: 'Right' }), { thickness: null, diagonals: [] })
    await aPicture(commission, { name: 'Not measured' })
    await aPhotograph(commission)
    const text = await exported(commission.id)
    const reading = readCommissionText(text, text.length)
    if (reading.kind === 'refused') throw new Error(JSON.stringify(reading.faults))
    const answer = await taken(JSON.parse(text))
    expect(answer.status).toBe(200)
    expect(answer.body.sectionSha256).toBe(sectionSha256(sectionFromDraft(SOUND_SECTION)))
    const draft = (await designer.get(`/commissions/${answer.body.commissionId}/draft`)).body.document
    expect(sectionSha256(sectionFromDraft(draft))).toBe(answer.body.sectionSha256)
    expect(shapeSha256(sectionFromDraft(draft))).toBe(shapeSha256(sectionFromDraft(SOUND_SECTION)))
    const { photographs, ...rest } = JSON.parse(text) as Record<string, unknown>
    expect(photographs).toEqual([{ id: 'p1', width: 64, height: 48, reference: {} }])
    expect(JSON.parse(await exported(answer.body.commissionId))).toEqual(rest)
  })

  it('of a commission that has nothing yet is still one', async () => {
    const commission = await aCommission()
    const text = await exported(commission.id)
    expect(readCommissionText(text, text.length).kind).toBe('read')
    const answer = await taken(JSON.parse(text))
    expect(answer.body.sectionSha256).toBeNull()
  })

  it('brings its pictures with their readings, and says what is not kept', async () => {
    const file = await example('harbour-at-low-water.json')
    const answer = await taken(file)
    expect(answer.status).toBe(200)
    const commission = (await designer.get(`/commissions/${answer.body.commissionId}`)).body
    expect(commission.title).toBe(file.title)
    expect(commission.pictures[0].measurement.document.measuredBy).toMatch(/from a file$/)
    const trail = (await designer.get(`/commissions/${answer.body.commissionId}/trail`)).body
    expect(trail.at(-1)).toMatchObject({ act: 'commission-imported' })
    expect(trail.at(-1).says).toMatch(/not kept: .*mill/)
  })

  it('is taken in once for an operation', async () => {
    const operationId = randomUUID()
    const clientId = (await aClient()).id
    const send = () => taken({ listel: 1, title: 'Once' }, { operationId, clientId })
    const answers = await Promise.all([send(), send(), send()])
    expect(new Set(answers.map((answer) => answer.body.commissionId)).size).toBe(1)
    expect(await Commission.count({ where: { clientId } })).toBe(1)
  })
})

describe('a commission file that cannot be taken in', () => {
  const section = {
    sightEdgeHeight: 30,
    rebate: { width: 8, depth: 20 },
    members: [{ kind: 'fillet', width: 40, rise: 0 }],
  }
  const withMember = (member: object) => ({
    listel: 1,
    section: { ...section, members: [...section.members, member] },
  })
  it.each<[string, unknown]>([
    ['/file/surprise', { listel: 1, surprise: true }],
    ['/file/listel', { listel: 2 }],
    ['/file/listel', {}],
    ['/file', 'not an object'],
    ['/file', null],
    ['/file/due', { listel: 1, due: 'soon' }],
    ['/file/title', { listel: 1, title: 'x'.repeat(300) }],
    ['/file/section/members/1/width', withMember({ kind: 'fillet', width: -4, rise: 0 })],
    ['/file/section/members/1/rise', withMember({ kind: 'scotia', width: 4, rise: 4 })],
    ['/file/section/members/1/rise', withMember({ kind: 'cyma-recta', width: 4, rise: 0 })],
    ['/file/section/members/1/kind', withMember({ kind: 'swag', width: 4, rise: 0 })],
    ['/file/section/rebate/depth', { listel: 1, section: { ...section, rebate: { width: 8, depth: 31 } } }],
    ['/file/picture/width', { listel: 1, picture: { height: 600 } }],
    ['/file/frame/sides', { listel: 1, frame: { sides: 6 } }],
  ])('says what is wrong at %s, and nothing is made', async (path, file) => {
    const clientId = (await aClient()).id
    const answer = await taken(file, { clientId })
    expect(answer.status).toBe(400)
    expect(pathsOf(answer)).toContain(path)
    expect(await Commission.count({ where: { clientId } })).toBe(0)
  })

  it('is cut off when it is larger than 8 MB, or nested without end', async () => {
    const operationId = randomUUID()
    const clientId = (await aClient()).id
    const send = (file: string) =>
      designer.agent
        .post('/api/commissions/import')
        .set('Content-Type', 'application/json')
        .send(`{"operationId":"${operationId}","clientId":"${clientId}","file":${file}}`)
    const large = await send(`{"listel":1,"title":"${'x'.repeat(9 * 1024 * 1024)}"}`)
    expect(large.status).toBe(413)
    const deep = await send('[{"a":'.repeat(600_000) + '1' + '}]'.repeat(600_000))
    expect(deep.status).toBe(400)
    expect(deep.body.error.code).toBe('input-invalid')
  })

  it('needs a client that is there', async () => {
    const answer = await taken({ listel: 1 }, { clientId: randomUUID() })
    expect(pathsOf(answer)).toEqual(['/clientId'])
  })
})
