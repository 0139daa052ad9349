import { createHash, randomUUID } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { Draft } from '@server/models/draft'
import { Letter } from '@server/models/letter'
import { Decision, Issue } from '@server/models/review'
import { TrailEntry } from '@server/models/trail'
import { useApplication } from '../helpers/application'
import { signedIn } from '../helpers/client'
import type { HttpClient } from '../helpers/client'
import { aCommission, aMeasurement, aPicture, SOUND_SECTION } from '../helpers/factories/commissions'
import { anOrder } from '../helpers/factories/orders'
import { aClient, aPerson } from '../helpers/factories/people'
import { aPhotograph } from '../helpers/factories/photographs'
import { anIssue } from '../helpers/factories/review'

const listel = useApplication()

async function aReview() {
  const client = await aClient()
  const commission = await aCommission({ clientId: client.id, section: SOUND_SECTION })
  const designer = await signedIn(listel.app, { role: 'designer' })
  const curator = await signedIn(listel.app, { role: 'curator', clientId: client.id })
  return { client, commission, designer, curator }
}

const putForwardBody = (version = 1) => ({
  version,
  operationId: randomUUID(),
  note: 'The hollow is as seen.',
  openOrders: null,
})
const decision = (kind: 'approve' | 'return' | 'withdraw', sha256: string) => ({
  operationId: randomUUID(),
  kind,
  typedName: 'Ada Wren',
  statement: 'As we looked at it together.',
  sha256,
})
const put = (http: HttpClient, id: string, body: object = putForwardBody()) =>
  http.post(`/commissions/${id}/issues`, body)

describe('putting forward', () => {
  it('freezes the draft as issue A under the hash of its canonical text, with its evidence under another', async () => {
    const { commission, designer } = await aReview()
    const picture = await aPicture(commission, { name: 'Harbour', copies: 2 })
    await aMeasurement(picture)
    const photograph = await aPhotograph(commission)
    const { status, body } = await put(designer, commission.id)
    expect(status).toBe(200)
    expect([body.letter, body.state, body.latest]).toEqual(['A', 'put-forward', true])

    const row = await Issue.findByPk(body.id, { rejectOnEmpty: true })
    const sha256 = (text: string) => createHash('sha256').update(text, 'utf8').digest('hex')
    expect(row.sha256).toBe(sha256(row.canonicalText))
    expect(body.sha256).toBe(row.sha256)
    expect(JSON.parse(row.canonicalText).listel).toBe(1)
    expect(row.canonicalText).not.toContain('"key"')
    expect(body.evidence.pictures).toMatchObject([{ name: 'Harbour', copies: 2, measurementNo: 1 }])
    expect(body.photographIds[photograph.key]).toBe(photograph.id)
    const trail = await TrailEntry.findAll({ where: { commissionId: commission.id } })
    expect(trail.map(({ act }) => act)).toContain('issue-put-forward')
  })

  it('tells each of the client’s curators by letter, in the same act', async () => {
    const { client, commission, designer } = await aReview()
    const other = await aPerson({ role: 'curator', clientId: client.id })
    const stranger = await aPerson({ role: 'curator' })
    await put(designer, commission.id)
    const letters = await Letter.findAll({ where: { commissionId: commission.id } })
    const to = letters.map(({ toAddress }) => toAddress)
    expect(to).toContain(other.email)
    expect(to).not.toContain(stranger.email)
    expect(letters.every(({ kind, state }) => kind === 'issue-put-forward' && state === 'queued')).toBe(true)
  })

  it('refuses a drawing with faults or without a basis, naming every place, and freezes nothing', async () => {
    const { designer } = await aReview()
    const [first, ...rest] = SOUND_SECTION.members
    if (first === undefined) throw new Error('the section has members')
    const { basis: _, ...bare } = first
    const commission = await aCommission({ section: { ...SOUND_SECTION, members: [bare, ...rest] } })
    const { status, body } = await put(designer, commission.id)
    expect(status).toBe(409)
    expect(body.error.code).toBe('not-ready')
    expect(body.error.faults.map(({ path }: { path: string }) => path)).toContain('/members/0/basis/width')
    expect(await Issue.count({ where: { commissionId: commission.id } })).toBe(0)
  })

  it('refuses a draft that moved on since it was looked at', async () => {
    const { commission, designer } = await aReview()
    await Draft.update({ version: 2 }, { where: { commissionId: commission.id } })
    const { status, body } = await put(designer, commission.id)
    expect([status, body.error.code]).toEqual([409, 'version-stale'])
  })

  it('answers a repeat of the same act with the first issue, and makes no second', async () => {
    const { commission, designer } = await aReview()
    const body = putForwardBody()
    const first = await put(designer, commission.id, body)
    const again = await put(designer, commission.id, body)
    expect(again.body.id).toBe(first.body.id)
    expect(await Issue.count({ where: { commissionId: commission.id } })).toBe(1)
  })

  it('gives the same hash whoever draws the same section: no key of the database is in it', async () => {
    const { commission, designer } = await aReview()
    const twin = await aCommission({
      section: {
        ...SOUND_SECTION,
        members: SOUND_SECTION.members.map((member, i) => ({ ...member, key: `other-${i}` })),
      },
    })
    const [one, two] = [await put(designer, commission.id), await put(designer, twin.id)]
    expect(one.body.sha256).toBe(two.body.sha256)
    expect(one.body.shapeSha256).toBe(two.body.shapeSha256)
  })

  it('asks what becomes of an order that is open for an earlier issue; holding sends the mill a notice', async () => {
    const { commission, designer } = await aReview()
    const order = await anOrder({
      issue: await anIssue({ commission, state: 'approved' }),
      state: 'acknowledged',
    })
    const asked = await put(designer, commission.id)
    expect([asked.status, asked.body.error.code]).toEqual([409, 'not-ready'])
    expect(asked.body.error.openOrders).toMatchObject([{ number: order.number }])
    expect(await Issue.count({ where: { commissionId: commission.id } })).toBe(1)

    const openOrders = { act: 'hold', reason: 'the hollow will change' }
    const { status, body } = await put(designer, commission.id, { ...putForwardBody(), openOrders })
    expect([status, body.letter]).toEqual([200, 'B'])
    await order.reload()
    expect([order.state, order.heldFrom]).toEqual(['held', 'acknowledged'])
    expect(await Letter.count({ where: { aboutId: order.id, kind: 'order-held' } })).toBe(1)
  })

  it('lets an order go on when the person says so, and sends nothing to the mill', async () => {
    const { commission, designer } = await aReview()
    const order = await anOrder({ issue: await anIssue({ commission, state: 'approved' }), state: 'quoted' })
    const openOrders = { act: 'continue', reason: 'only the basis was mended' }
    await put(designer, commission.id, { ...putForwardBody(), openOrders })
    await order.reload()
    expect(order.state).toBe('quoted')
    expect(await Letter.count({ where: { aboutId: order.id } })).toBe(0)
  })
})

describe('deciding', () => {
  it('returns A with a remark, and approves B, which supersedes it', async () => {
    const { commission, designer, curator } = await aReview()
    const a = (await put(designer, commission.id)).body
    const remark = await curator.post(`/issues/${a.id}/remarks`, {
      operationId: randomUUID(),
      place: { x: 12, y: 34 },
      text: 'Deeper here?',
    })
    expect([remark.status, remark.body.no, remark.body.state]).toEqual([200, 1, 'open'])
    const returned = await curator.post(`/issues/${a.id}/decisions`, decision('return', a.sha256))
    expect([returned.status, returned.body.state]).toEqual([200, 'returned'])
    const answered = await designer.post(`/remarks/${remark.body.id}/entries`, {
      operationId: randomUUID(),
      text: 'It is now.',
      state: 'answered',
    })
    expect(answered.body.entries).toHaveLength(2)

    const b = (await put(designer, commission.id)).body
    expect(b.letter).toBe('B')
    const approved = await curator.post(`/issues/${b.id}/decisions`, decision('approve', b.sha256))
    expect(approved.body.state).toBe('approved')
    expect(approved.body.decisions).toMatchObject([
      { kind: 'approve', typedName: 'Ada Wren', sha256: b.sha256 },
    ])
    const list = (await designer.get(`/commissions/${commission.id}/issues`)).body
    expect(list.map(({ letter, state }: { letter: string; state: string }) => `${letter} ${state}`)).toEqual([
      'B approved',
      'A superseded',
    ])
    const told = await Letter.findAll({ where: { commissionId: commission.id, kind: 'issue-decided' } })
    expect(told).toHaveLength(2)
  })

  it('takes no decision on anything but the latest issue, nor on another hash than was seen', async () => {
    const { commission, designer, curator } = await aReview()
    const a = (await put(designer, commission.id)).body
    const b = (await put(designer, commission.id)).body
    const late = await curator.post(`/issues/${a.id}/decisions`, decision('approve', a.sha256))
    expect([late.status, late.body.error.code]).toEqual([409, 'transition-not-allowed'])
    const other = await curator.post(`/issues/${b.id}/decisions`, decision('approve', 'f'.repeat(64)))
    expect([other.status, other.body.error.code]).toEqual([409, 'version-stale'])
    expect(await Decision.count({ where: { issueId: [a.id, b.id] } })).toBe(0)
  })

  it('never lets a curator decide on what that very person put forward', async () => {
    const { commission, curator } = await aReview()
    const issue = await anIssue({ commission, putForwardById: curator.personId })
    const { status } = await curator.post(`/issues/${issue.id}/decisions`, decision('approve', issue.sha256))
    expect(status).toBe(403)
  })

  it('records the withdrawal of an approval as a new act', async () => {
    const { commission, curator } = await aReview()
    const issue = await anIssue({ commission, state: 'approved' })
    const { body } = await curator.post(`/issues/${issue.id}/decisions`, decision('withdraw', issue.sha256))
    expect(body.state).toBe('withdrawn')
    expect(body.decisions.map(({ kind }: { kind: string }) => kind)).toEqual(['approve', 'withdraw'])
  })

  it.each([
    ['typedName', ''],
    ['statement', ' '],
    ['sha256', 'abc'],
    ['kind', 'nod'],
    ['operationId', 'one'],
  ])('refuses a decision with a bad %s, naming it', async (field, value) => {
    const { commission, curator } = await aReview()
    const issue = await anIssue({ commission })
    const { status, body } = await curator.post(`/issues/${issue.id}/decisions`, {
      ...decision('approve', issue.sha256),
      [field]: value,
    })
    expect(status).toBe(400)
    expect(body.error.faults.map(({ path }: { path: string }) => path)).toEqual([`/${field}`])
  })
})

describe('what an issue shows', () => {
  it('tells how it differs from the last approved one', async () => {
    const { commission, designer } = await aReview()
    await anIssue({ commission, state: 'superseded' })
    const wider = SOUND_SECTION.members.map((member) =>
      member.key === 'c' ? { ...member, width: member.width + 2 } : member,
    )
    const b = await anIssue({ commission, section: { ...SOUND_SECTION, members: wider } })
    const { body } = await designer.get(`/issues/${b.id}/difference`)
    expect(body.from.letter).toBe('A')
    expect(body.areaBetweenMm2).toBeGreaterThan(0)
    expect(body.changes).toEqual([{ says: 'member 3, width: 14 → 16' }])
  })

  it.each([
    ['pdf', '%PDF-'],
    ['dxf', '  0'],
    ['svg', '<svg'],
  ])('has a sheet as %s, the same bytes each time, with the hash on it', async (format, head) => {
    const { commission, designer } = await aReview()
    const issue = await anIssue({ commission, state: 'approved' })
    const one = await designer.file(`/issues/${issue.id}/sheet.${format}`)
    const two = await designer.file(`/issues/${issue.id}/sheet.${format}`)
    expect(one.status).toBe(200)
    const bytes: Buffer = one.body
    expect(bytes.subarray(0, 200).toString('latin1')).toContain(head)
    expect(bytes.equals(two.body)).toBe(true)
    if (format !== 'pdf') expect(bytes.toString('utf8')).toContain(issue.sha256.slice(0, 16))
  })
})
