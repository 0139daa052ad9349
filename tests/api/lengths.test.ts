import { randomUUID } from 'node:crypto'
import { beforeAll, describe, expect, it } from 'vitest'
import { CutFact, CutList } from '@server/models/cut-list'
import { RackMovement, RackPiece } from '@server/models/rack'
import { expectWithin } from '../helpers/expect-within'
import { useApplication } from '../helpers/application'
import { signedIn } from '../helpers/client'
import { aCommission, aMeasurement, aPicture, SOUND_SECTION } from '../helpers/factories/commissions'
import { aCutList, aRackPiece } from '../helpers/factories/lengths'
import { anOrder } from '../helpers/factories/orders'
import { aSawCard } from '../helpers/factories/people'
import { anIssue } from '../helpers/factories/review'

const listel = useApplication()
let designer: Awaited<ReturnType<typeof signedIn>>
let bench: Awaited<ReturnType<typeof signedIn>>
beforeAll(async () => {
  await aSawCard()
  designer = await signedIn(listel.app, { role: 'designer' })
  bench = await signedIn(listel.app, { role: 'bench' })
})

/** Its own rebate, so that no other test's rack has its shape. */
let rebates = 8
async function anApproved(copies = 1) {
  rebates += 0.001
  const section = { ...SOUND_SECTION, rebate: { width: rebates, depth: 20 } }
  const commission = await aCommission({ section })
  const picture = await aPicture(commission, { copies })
  await aMeasurement(picture, { width: [900], height: [600], diagonals: [], allowance: 3, lining: 0.5 })
  const issue = await anIssue({ commission, section, state: 'approved' })
  return { commission, picture, issue }
}
const planBody = (issueId: string, more: object = {}) => ({
  operationId: randomUUID(),
  issueId,
  lengths: [
    { length: 2440, price: '18.50', count: null },
    { length: 3660, price: '26.00', count: null },
  ],
  useRack: true,
  order: { setupPieces: 2, firstOff: 300, reserve: 0.1 },
  ...more,
})
const fact = (kind: string, more: object = {}) => ({
  operationId: randomUUID(),
  listVersion: 0,
  kind,
  cutId: null,
  lengthNo: null,
  trueLength: null,
  deviceTime: new Date().toISOString(),
  ...more,
})

describe('rails', () => {
  it('come from the measured picture and the section: long point = opening + 2 × (width − rebate)', async () => {
    const { commission, issue } = await anApproved()
    const { body } = await bench.get(`/commissions/${commission.id}/rails`)
    const [picture] = body.pictures
    expect(body.issue.id).toBe(issue.id)
    // Opening 900 + 3 + 2 × 0.5; the section is 50 wide.
    expect(picture.rebateOpening).toEqual([904, 604])
    expectWithin(picture.rails[0].longPoint, 904 + 2 * (50 - rebates), { withinMm: 1e-9 })
    expectWithin(picture.sight[0], 904 - 2 * rebates, { withinMm: 1e-9 })
  })

  it('follow the moulding as it was delivered and measured', async () => {
    const { commission, issue } = await anApproved()
    await aRackPiece({ issue, trueWidthMm: 50.4, trueRebateMm: 8.2 })
    const { body } = await designer.get(`/commissions/${commission.id}/rails`)
    expectWithin(body.pictures[0].rails[0].longPoint, 904 + 2 * (50.4 - 8.2), { withinMm: 1e-9 })
  })

  it('say in words what lacks', async () => {
    const commission = await aCommission()
    const { body } = await designer.get(`/commissions/${commission.id}/rails`)
    expect(body.missing).toHaveLength(2)
  })
})

describe('a plan', () => {
  it('puts every rail of every frame on a length, says how many to order, and whether that is proven', async () => {
    const { commission, issue } = await anApproved(2)
    const { status, body } = await designer.post(`/commissions/${commission.id}/plans`, planBody(issue.id))
    expect(status).toBe(200)
    const cuts = body.lengths.flatMap(({ cuts: own }: { cuts: unknown[] }) => own)
    expect(cuts).toHaveLength(8)
    expect([body.state, body.proven]).toEqual(['closed', true])
    expect(body.cost).toMatch(/^\d+\.\d\d$/)
    expect(body.closedBecause).toContain('first-off')
  })

  it('takes what lies on the rack first, reserves it, and frees it when another plan takes its place', async () => {
    const { commission, issue } = await anApproved()
    const piece = await aRackPiece({ issue, lengthMm: 3660 })
    const first = await designer.post(`/commissions/${commission.id}/plans`, planBody(issue.id))
    expect(first.body.lengths.map(({ from }: { from: string }) => from)).toContain(piece.code)
    expect((await piece.reload()).state).toBe('reserved')
    await designer.post(`/commissions/${commission.id}/plans`, planBody(issue.id, { useRack: false }))
    expect((await piece.reload()).state).toBe('on-rack')
    expect((await CutList.findByPk(first.body.id))?.state).toBe('superseded')
    const moves = await RackMovement.findAll({ where: { pieceId: piece.id }, order: [['at', 'ASC']] })
    expect(moves.map(({ act }) => act)).toEqual(['reserved', 'released'])
  })

  it('names the length that a rail would need when it is longer than every one', async () => {
    const { commission, issue } = await anApproved()
    const lengths = [{ length: 900, price: null, count: null }]
    const { status, body } = await designer.post(
      `/commissions/${commission.id}/plans`,
      planBody(issue.id, { lengths, useRack: false }),
    )
    expect([status, body.error.code]).toEqual([409, 'no-plan'])
    // The long rail with the saw's end trim of 75 mm at either end.
    expectWithin(body.error.neededLengthMm, 904 + 2 * (50 - rebates) + 150, { withinMm: 0.001 })
  })

  it('is refused from an issue that is not approved', async () => {
    const { commission } = await anApproved()
    const later = await anIssue({ commission })
    const { status, body } = await designer.post(`/commissions/${commission.id}/plans`, planBody(later.id))
    expect([status, body.error.code]).toEqual([409, 'not-ready'])
  })

  it('hides its cost from the bench', async () => {
    const { commission, issue } = await anApproved()
    const made = await designer.post(`/commissions/${commission.id}/plans`, planBody(issue.id))
    const { body } = await bench.get(`/cut-lists/${made.body.id}`)
    expect(body).not.toHaveProperty('cost')
    expect(JSON.stringify(body)).not.toContain(made.body.cost)
  })
})

describe('opening a list', () => {
  it('waits for the first-off; then a designer opens it', async () => {
    const { issue } = await anApproved()
    const list = await aCutList(issue)
    const open = (http: typeof bench, reason = '') =>
      http.post(`/cut-lists/${list.id}/open`, { operationId: randomUUID(), reason })
    expect((await open(designer)).status).toBe(403)
    const manager = await signedIn(listel.app, { role: 'manager' })
    expect((await open(manager)).body.error.faults).toMatchObject([{ path: '/reason' }])
    await anOrder({ issue, state: 'first-off-accepted' })
    expect((await open(designer)).body.state).toBe('open')
  })
})

describe('at the saw', () => {
  const cutsOf = async (id: string) => {
    const { body } = await bench.get(`/cut-lists/${id}`)
    return body.lengths[0].cuts as {
      id: string
      fact: null | { trueLength: number; conflict: boolean; by: string }
    }[]
  }

  it('ticks cuts with their true lengths; the list is done with the last, and open again when one is taken back', async () => {
    const { issue } = await anApproved()
    const list = await aCutList(issue, 'open')
    const [one, two] = await cutsOf(list.id)
    await bench.post(`/cut-lists/${list.id}/facts`, fact('cut', { cutId: one?.id, trueLength: 800.2 }))
    const done = await bench.post(
      `/cut-lists/${list.id}/facts`,
      fact('cut', { cutId: two?.id, trueLength: 799.9 }),
    )
    expect(done.body.state).toBe('done')
    expect((await cutsOf(list.id))[0]?.fact?.trueLength).toBe(800.2)
    const back = await bench.post(`/cut-lists/${list.id}/facts`, fact('undo', { cutId: two?.id }))
    expect(back.body.state).toBe('open')
  })

  it('counts a repeat once, and shows a second person’s tick as a conflict instead of refusing it', async () => {
    const { issue } = await anApproved()
    const list = await aCutList(issue, 'open')
    const [one] = await cutsOf(list.id)
    const tick = fact('cut', { cutId: one?.id, trueLength: 800 })
    await bench.post(`/cut-lists/${list.id}/facts`, tick)
    await bench.post(`/cut-lists/${list.id}/facts`, tick)
    expect(await CutFact.count({ where: { cutListId: list.id } })).toBe(1)
    const other = await designer.post(
      `/cut-lists/${list.id}/facts`,
      fact('cut', { cutId: one?.id, trueLength: 801 }),
    )
    expect(other.status).toBe(200)
    expect((await cutsOf(list.id))[0]?.fact?.conflict).toBe(true)
  })

  it('keeps facts of a list that has moved on, marked', async () => {
    const { commission, issue } = await anApproved()
    const list = await aCutList(issue, 'open')
    await anIssue({ commission })
    const [one] = await cutsOf(list.id)
    const { status, body } = await bench.post(
      `/cut-lists/${list.id}/facts`,
      fact('mis-cut', { cutId: one?.id, trueLength: 790 }),
    )
    expect(status).toBe(200)
    expect(body.outOfDate.join(' ')).toContain('has been put forward since')
    expect(body.lengths[0].cuts[0].fact).toMatchObject({ kind: 'mis-cut', conflict: true })
  })

  it('puts an offcut on the rack under a code of its own, its mitred end without trim', async () => {
    const { issue } = await anApproved()
    await aRackPiece({ issue, state: 'used' })
    const list = await aCutList(issue, 'open')
    const { body } = await bench.post(
      `/cut-lists/${list.id}/facts`,
      fact('offcut', { lengthNo: 0, trueLength: 756 }),
    )
    const { code } = body.lengths[0].offcutFact
    const piece = await RackPiece.findOne({ where: { code }, rejectOnEmpty: true })
    expect([piece.lengthMm, piece.trimStartMm, piece.trimEndMm]).toEqual([756, 0, 75])
  })

  it.each([
    ['a cut of another list', fact('cut', { cutId: randomUUID(), trueLength: 800 }), '/cutId'],
    ['an offcut longer than its length', fact('offcut', { lengthNo: 0, trueLength: 9000 }), '/trueLength'],
    ['an offcut of no length', fact('offcut', { lengthNo: 7, trueLength: 500 }), '/lengthNo'],
    ['a negative length', fact('offcut', { lengthNo: 0, trueLength: -5 }), '/trueLength'],
  ])('refuses %s, naming the field', async (_name, body, path) => {
    const { issue } = await anApproved()
    await aRackPiece({ issue, state: 'used' })
    const list = await aCutList(issue, 'open')
    const answer = await bench.post(`/cut-lists/${list.id}/facts`, body)
    expect([answer.status, answer.body.error.faults[0].path]).toEqual([400, path])
  })

  it('prints as a PDF', async () => {
    const { issue } = await anApproved()
    const list = await aCutList(issue, 'open')
    const { body } = await bench.file(`/cut-lists/${list.id}/print.pdf`)
    expect((body as Buffer).subarray(0, 5).toString()).toBe('%PDF-')
  })
})

describe('the rack', () => {
  it('takes in what was in the workshop, corrects and scraps with a reason, and loses nothing', async () => {
    const { issue } = await anApproved()
    const added = await designer.post('/rack', {
      operationId: randomUUID(),
      length: 1830,
      count: 2,
      endTrim: [0, 75],
      species: 'basswood',
      finish: 'bare',
      issueId: issue.id,
      trueWidth: 50,
      trueRebate: 8,
    })
    expect(added.status).toBe(200)
    const own = async () =>
      (await bench.get('/rack')).body.filter(
        ({ shapeSha256 }: { shapeSha256: string }) => shapeSha256 === issue.shapeSha256,
      )
    const [piece] = await own()
    const move = {
      operationId: randomUUID(),
      pieceId: piece.id,
      act: 'scrap',
      length: null,
      reason: 'a shake right through',
    }
    expect((await designer.post('/rack/movements', move)).status).toBe(200)
    const again = await designer.post('/rack/movements', { ...move, operationId: randomUUID() })
    expect(again.body.error.code).toBe('transition-not-allowed')
    expect((await own()).map(({ state }: { state: string }) => state).sort()).toEqual(['on-rack', 'scrapped'])
  })
})
