import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { startMailWorker } from '@server/mail/worker'
import { Commission } from '@server/models/commission'
import { KnifeOrder, OrderEvent } from '@server/models/order'
import { Letter, LetterTry } from '@server/models/letter'
import { RackPiece } from '@server/models/rack'
import type { RunningWorker } from '@server/services/running-worker'
import { useApplication } from '../helpers/application'
import { signedIn, stranger } from '../helpers/client'
import { MILL_CARD } from '../helpers/factories/cards'
import { anAcknowledgeToken, anOrder, ORDER } from '../helpers/factories/orders'
import { aMill, aSawCard } from '../helpers/factories/people'
import { anIssue } from '../helpers/factories/review'
import { listenForLetters } from '../helpers/smtp'
import type { LetterListener } from '../helpers/smtp'
import { MillCard } from '@server/models/workshop'

const listel = useApplication()
let post: LetterListener
let worker: RunningWorker | undefined

const startWorker = (url = post.url) =>
  startMailWorker({
    smtpUrl: url,
    log: (error) => {
      throw error
    },
  })

beforeAll(async () => {
  post = await listenForLetters()
  worker = startWorker()
})
afterAll(async () => {
  await worker?.stop()
  await post.stop()
})

const send = async (
  http: Awaited<ReturnType<typeof signedIn>>,
  wish: { millId?: string; issueId?: string } = {},
) => {
  const millId = wish.millId ?? (await aMill()).id
  const issueId = wish.issueId ?? (await anIssue({ state: 'approved' })).id
  return http.post(`/issues/${issueId}/orders`, { operationId: randomUUID(), millId, document: ORDER })
}
const event = (name: string, more: object = {}) => ({
  operationId: randomUUID(),
  event: name,
  note: 'by telephone',
  price: null,
  promised: null,
  batch: null,
  ...more,
})
const until = async <T>(look: () => Promise<T | undefined>): Promise<T> => {
  for (let tries = 0; tries < 200; tries += 1) {
    const seen = await look()
    if (seen !== undefined) return seen
    await new Promise((resolve) => setTimeout(resolve, 50))
  }
  throw new Error('it did not happen in ten seconds')
}

describe('sending a knife order', () => {
  it('puts a letter with three attachments into the mail server’s hands, and notes that it was taken', async () => {
    const designer = await signedIn(listel.app, { role: 'designer' })
    const mill = await aMill()
    const issue = await anIssue({ state: 'approved' })
    const { status, body } = await send(designer, { millId: mill.id, issueId: issue.id })
    expect([status, body.state === 'queued' || body.state === 'sent']).toEqual([200, true])

    const { mail } = await post.letterWhere(({ to }) => to.includes(mill.email))
    expect(mail.subject).toContain(body.number)
    expect(mail.attachments.map(({ contentType }) => contentType)).toEqual([
      'application/pdf',
      'image/vnd.dxf',
      'image/svg+xml',
    ])
    expect(mail.text).toContain(issue.sha256)
    expect(mail.text).toContain('Run no timber before the first-off is accepted in writing')
    expect(mail.text).toMatch(/http:\/\/127\.0\.0\.1:4700\/link\/[\w-]{40,}/)
    const order = await until(async () => {
      const row = await KnifeOrder.findByPk(body.id, { rejectOnEmpty: true })
      return row.state === 'sent' ? row : undefined
    })
    const events = await OrderEvent.findAll({ where: { orderId: order.id }, order: [['seq', 'ASC']] })
    expect(events.map((one) => one.event)).toEqual(['send', 'mail-taken'])
  })

  it('says the same words in plain text and in HTML', async () => {
    const designer = await signedIn(listel.app, { role: 'designer' })
    const mill = await aMill({ name: 'Tarn & <Sons>' })
    await send(designer, { millId: mill.id })
    const { mail } = await post.letterWhere(({ to }) => to.includes(mill.email))
    const html = typeof mail.html === 'string' ? mail.html : ''
    const body = html.slice(html.indexOf('<body'))
    const plain = body
      .replace(/<[^>]*>/g, ' ')
      .replaceAll('&lt;', '<')
      .replaceAll('&gt;', '>')
      .replaceAll('&quot;', '"')
      .replaceAll('&#39;', "'")
      .replaceAll('&amp;', '&')
    const words = (text: string) =>
      text
        .replaceAll(/^- /gm, '')
        .split(/\s+/)
        .filter((word) => word !== '')
    expect(words(plain)).toEqual(words(mail.text ?? ''))
    expect(mail.text).toContain('Tarn & <Sons>')
  })

  it('keeps the sheets as they went out: the mill reads the very bytes of the letter', async () => {
    const designer = await signedIn(listel.app, { role: 'designer' })
    const mill = await aMill()
    const hand = await signedIn(listel.app, { role: 'mill', millId: mill.id })
    const { body } = await send(designer, { millId: mill.id })
    const { mail } = await post.letterWhere(({ to }) => to.includes(mill.email))
    const sheet = await hand.file(`/orders/${body.id}/sheet.pdf`)
    expect(mail.attachments[0]?.content.equals(sheet.body)).toBe(true)
  })

  it.each(['put-forward', 'returned', 'withdrawn', 'superseded'] as const)(
    'refuses an issue that is %s',
    async (state) => {
      const designer = await signedIn(listel.app, { role: 'designer' })
      const { status, body } = await send(designer, { issueId: (await anIssue({ state })).id })
      expect([status, body.error.code]).toEqual([409, 'not-ready'])
    },
  )

  it('refuses an approved issue that is not the latest', async () => {
    const designer = await signedIn(listel.app, { role: 'designer' })
    const issue = await anIssue({ state: 'approved' })
    await anIssue({ commission: await Commission.findByPk(issue.commissionId, { rejectOnEmpty: true }) })
    const { status, body } = await send(designer, { issueId: issue.id })
    expect([status, body.error.code]).toEqual([409, 'not-ready'])
  })

  it('is barred by a check that says stop, against the mill’s own card, and writes nothing', async () => {
    const designer = await signedIn(listel.app, { role: 'designer' })
    const mill = await aMill()
    await MillCard.create({
      millId: mill.id,
      no: 2,
      document: { ...MILL_CARD, maxWidth: 20 },
      byId: randomUUID(),
      at: new Date(),
    })
    const before = await Letter.count()
    const { status, body } = await send(designer, { millId: mill.id })
    expect([status, body.error.code]).toEqual([409, 'not-ready'])
    expect(body.error.faults.map(({ code }: { code: string }) => code)).toContain('head-width')
    expect(await KnifeOrder.count({ where: { millId: mill.id } })).toBe(0)
    expect(await Letter.count()).toBe(before)
  })

  it('shows the letter beforehand and sends nothing', async () => {
    const designer = await signedIn(listel.app, { role: 'designer' })
    const mill = await aMill()
    const issue = await anIssue({ state: 'approved' })
    const { status, body } = await designer.post(`/issues/${issue.id}/orders/preview`, {
      operationId: randomUUID(),
      millId: mill.id,
      document: ORDER,
    })
    expect([status, body.to, body.attachments.length]).toEqual([200, mill.email, 3])
    expect(await KnifeOrder.count({ where: { issueId: issue.id } })).toBe(0)
  })
})

describe('the post', () => {
  it('keeps an order queued while the mail server is down, and sends it once when it comes back', async () => {
    await worker?.stop()
    const silent = await listenForLetters()
    const port = Number(new URL(silent.url).port)
    await silent.stop()
    worker = startWorker(silent.url)
    const designer = await signedIn(listel.app, { role: 'designer' })
    const mill = await aMill()
    const { body } = await send(designer, { millId: mill.id })
    const letter = await until(async () => {
      const row = await Letter.findOne({ where: { aboutId: body.id } })
      return row !== null && row.tries > 0 && row.state === 'queued' ? row : undefined
    })
    expect((await KnifeOrder.findByPk(body.id))?.state).toBe('queued')

    const back = await listenForLetters({ port })
    await letter.update({ dueAt: new Date() })
    await back.letterWhere(({ to }) => to.includes(mill.email))
    await until(async () => ((await letter.reload()).state === 'sent' ? true : undefined))
    expect(back.letters.filter(({ to }) => to.includes(mill.email))).toHaveLength(1)
    expect(await LetterTry.count({ where: { letterId: letter.id } })).toBeGreaterThanOrEqual(2)
    await worker?.stop()
    await back.stop()
    worker = startWorker()
  })

  it('has a letter sent once, however many workers look for it', async () => {
    const others = [startWorker(), startWorker(), startWorker()]
    const designer = await signedIn(listel.app, { role: 'designer' })
    const mills = await Promise.all([aMill(), aMill(), aMill(), aMill()])
    for (const mill of mills) await send(designer, { millId: mill.id })
    for (const mill of mills) await post.letterWhere(({ to }) => to.includes(mill.email))
    await Promise.all(others.map((other) => other.stop()))
    for (const mill of mills) expect(post.letters.filter(({ to }) => to.includes(mill.email))).toHaveLength(1)
  })

  it('takes a letter from a worker that died with it, once its claim is over', async () => {
    const designer = await signedIn(listel.app, { role: 'designer' })
    const mill = await aMill()
    await worker?.stop()
    const { body } = await send(designer, { millId: mill.id })
    await Letter.update(
      { state: 'sending', claimedBy: randomUUID(), claimedUntil: new Date(Date.now() - 1000) },
      { where: { aboutId: body.id } },
    )
    worker = startWorker()
    await post.letterWhere(({ to }) => to.includes(mill.email))
  })

  it('marks a letter that is refused for good as failed, and tells the manager', async () => {
    const designer = await signedIn(listel.app, { role: 'designer' })
    const manager = await signedIn(listel.app, { role: 'manager' })
    post.refuseWith(550)
    const { body } = await send(designer)
    const letter = await until(async () => {
      const row = await Letter.findOne({ where: { aboutId: body.id } })
      return row?.state === 'failed' ? row : undefined
    })
    post.refuseWith(undefined)
    const waiting = (await manager.get('/waiting')).body
    expect(waiting.map(({ to }: { to: string }) => to)).toContain(`/post/${letter.id}`)
    const again = await manager.post(`/letters/${letter.id}/send-again`)
    expect(again.status).toBe(200)
    await until(async () => ((await letter.reload()).state === 'sent' ? true : undefined))
  })
})

describe('the course of an order', () => {
  it('goes by the mill’s answers to the delivery, which fills the rack', async () => {
    await aSawCard()
    const designer = await signedIn(listel.app, { role: 'designer' })
    const manager = await signedIn(listel.app, { role: 'manager' })
    const mill = await aMill()
    const hand = await signedIn(listel.app, { role: 'mill', millId: mill.id })
    const order = await anOrder({ millId: mill.id })
    const record = async (http: typeof hand, body: object) => {
      const answer = await http.post(`/orders/${order.id}/events`, body)
      expect([answer.status, answer.body.error?.says]).toEqual([200, undefined])
      return answer.body.state
    }
    expect(await record(hand, event('acknowledge', { note: '' }))).toBe('acknowledged')
    expect(await record(hand, event('quote', { note: '', price: '240.50', promised: '2026-12-20' }))).toBe(
      'quoted',
    )
    expect(await record(manager, event('accept-price', { note: '' }))).toBe('price-accepted')
    expect(await record(hand, event('report-first-off', { note: 'cut at 19.9 mm' }))).toBe(
      'first-off-reported',
    )
    expect(await record(designer, event('refuse-first-off', { note: 'the quirk is shallow' }))).toBe(
      'price-accepted',
    )
    expect(await record(hand, event('report-first-off', { note: 'again' }))).toBe('first-off-reported')
    expect(await record(designer, event('accept-first-off', { note: '' }))).toBe('first-off-accepted')
    const batch = { trueWidth: 50.2, trueRebate: 8.1, lengths: [{ length: 2440, count: 3 }] }
    expect(await record(hand, event('deliver-rest', { note: '', batch }))).toBe('delivered')
    const pieces = await RackPiece.findAll({ where: { lengthMm: 2440 } })
    expect(pieces.length).toBeGreaterThanOrEqual(3)
    const { body } = await manager.get(`/orders/${order.id}`)
    expect([body.price, body.refusals]).toEqual(['240.50', 1])
  })

  it('holds and resumes where it was, with a reason', async () => {
    const designer = await signedIn(listel.app, { role: 'designer' })
    const order = await anOrder({ state: 'quoted' })
    const nameless = await designer.post(`/orders/${order.id}/events`, event('hold', { note: '' }))
    expect(nameless.body.error.faults).toMatchObject([{ path: '/note' }])
    const held = await designer.post(
      `/orders/${order.id}/events`,
      event('hold', { note: 'the client wavers' }),
    )
    expect([held.body.state, held.body.heldFrom]).toEqual(['held', 'quoted'])
    const resumed = await designer.post(`/orders/${order.id}/events`, event('resume', { note: '' }))
    expect([resumed.body.state, resumed.body.heldFrom]).toEqual(['quoted', null])
  })

  it.each([
    ['quote without a price', event('quote'), '/price'],
    ['a price where none belongs', event('acknowledge', { price: '1.00' }), '/price'],
    ['a price in words', event('quote', { price: 'ten' }), '/price'],
    ['staff for the mill without saying how they know', event('acknowledge', { note: '' }), '/note'],
    ['cancelling without a reason', event('cancel', { note: '' }), '/note'],
  ])('refuses %s, naming the field', async (_name, body, path) => {
    const manager = await signedIn(listel.app, { role: 'manager' })
    const order = await anOrder({ state: body.event === 'quote' ? 'acknowledged' : 'sent' })
    const answer = await manager.post(`/orders/${order.id}/events`, body)
    expect([answer.status, answer.body.error.faults.map((fault: { path: string }) => fault.path)]).toEqual([
      400,
      [path],
    ])
  })

  it('lets a manager alone accept the price and cancel', async () => {
    const designer = await signedIn(listel.app, { role: 'designer' })
    const order = await anOrder({ state: 'quoted' })
    for (const name of ['accept-price', 'cancel']) {
      expect((await designer.post(`/orders/${order.id}/events`, event(name))).status).toBe(403)
    }
  })
})

describe('the link in the letter', () => {
  it('shows the order, changes nothing by being looked at, and acknowledges once', async () => {
    const order = await anOrder()
    const token = await anAcknowledgeToken(order)
    const mill = stranger(listel.app)
    const shown = await mill.get(`/links/${token}`)
    expect([shown.status, shown.body.used, shown.body.order.number]).toEqual([200, false, order.number])
    expect((await order.reload()).state).toBe('sent')
    expect(
      (await mill.post(`/links/${token}/acknowledge`, { name: 'Jo Tarn', note: 'thank you' })).status,
    ).toBe(200)
    expect((await order.reload()).state).toBe('acknowledged')
    const again = await mill.post(`/links/${token}/acknowledge`, { name: 'Jo Tarn', note: '' })
    expect([again.status, again.body.error.code]).toEqual([410, 'link-spent'])
  })

  it('knows no token that was never given out', async () => {
    expect((await stranger(listel.app).get(`/links/${'x'.repeat(43)}`)).status).toBe(404)
  })
})
