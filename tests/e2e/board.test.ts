import type { Server } from 'node:http'
import type { AddressInfo } from 'node:net'
import { join } from 'node:path'
import { once } from 'node:events'
import AxeBuilder from '@axe-core/playwright'
import { chromium } from 'playwright-core'
import type { Browser, Page } from 'playwright-core'
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { startApplication } from '../helpers/application'
import { signedIn } from '../helpers/client'
import type { HttpClient } from '../helpers/client'
import { emptyDatabase } from '../helpers/database'
import { SOUND_SECTION, aCommission } from '../helpers/factories/commissions'
import { PASSWORD, aPerson } from '../helpers/factories/people'
import { expectWithin } from '../helpers/expect-within'

const FLAGS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
]

/** On a busy machine things take their time. */
const eventually = <Value>(ask: () => Value) => expect.poll(ask, { timeout: 20_000 })

let browser: Browser
let server: Server
let address: string
let designer: HttpClient
let close: () => Promise<void>
let page: Page
let faults: string[]

beforeAll(async () => {
  const build = process.env.LISTEL_TEST_BUILD
  if (build === undefined)
    throw new Error('LISTEL_TEST_BUILD is not set: run these tests by "npm run test:e2e"')
  const { url, drop } = await emptyDatabase()
  const application = await startApplication({ databaseUrl: url, clientDir: join(build, 'client') })
  server = application.app.listen(0, '127.0.0.1')
  await once(server, 'listening')
  address = `http://127.0.0.1:${(server.address() as AddressInfo).port}`
  designer = await signedIn(application.app, { role: 'designer', name: 'Second designer' })
  browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args: FLAGS })
  close = async () => {
    await browser.close()
    server.closeAllConnections()
    server.close()
    await application.stop()
    await drop()
  }
})
afterAll(() => close())
beforeEach(async () => {
  faults = []
  page = await newPage()
})
afterEach(async () => {
  await page.context().close()
  expect(faults).toEqual([])
})

/** A window of a new designer who has signed in. */
async function newPage(): Promise<Page> {
  const { email } = await aPerson({ role: 'designer' })
  const context = await browser.newContext({ viewport: { width: 1440, height: 900 } })
  const opened = await context.newPage()
  opened.on('pageerror', (error) => faults.push(error.message))
  await opened.goto(`${address}/sign-in`)
  await opened.getByLabel('E-mail').fill(email)
  await opened.getByLabel('Password').fill(PASSWORD)
  await opened.getByLabel('Password').press('Enter')
  await opened.waitForURL((url) => !url.pathname.startsWith('/sign-in'))
  return opened
}

async function openBoard(id: string, on: Page = page): Promise<void> {
  await on.goto(`${address}/commissions/${id}/section`)
  await on.getByRole('button', { name: /^Break 0/ }).waitFor({ state: 'attached' })
}
const draftOf = async (id: string) => (await designer.get(`/commissions/${id}/draft`)).body
const saved = () => page.getByText('Saved', { exact: true }).waitFor()
const cells = () => page.locator('.rule__cell')
const handle = () => page.getByRole('button', { name: /^Break \d/ })
const said = async () => (await handle().getAttribute('aria-label')) ?? ''
const putIn = (kind: string) => page.getByRole('button', { name: new RegExp(`: ${kind}$`) })

describe('drawing by the keyboard alone', () => {
  it('puts in, sizes, nudges, moves and takes out members, and the server has it all', async () => {
    const { id } = await aCommission()
    await openBoard(id)
    for (const kind of ['fillet', 'torus', 'cavetto']) await putIn(kind).press('Enter')
    await cells().nth(2).focus()
    await page.keyboard.press('Home')
    await page.keyboard.press('ArrowRight')
    await page.keyboard.press('Enter')
    await page.keyboard.type('1/2*(20 + 8)')
    await page.keyboard.press('Enter')
    await page.keyboard.type('3')
    await page.keyboard.press('Enter')
    await expect
      .poll(() => page.getByRole('button', { name: /^torus, member 2: width 14.0 mm, rise 3.0/ }).count())
      .toBe(1)
    await page.keyboard.press('Alt+ArrowLeft')
    await page.keyboard.press('ArrowRight')
    await page.keyboard.press('Delete')
    await saved()
    const { document, history } = await draftOf(id)
    expect(document.members.map(({ kind, width }: { kind: string; width: number }) => [kind, width])).toEqual(
      [
        ['torus', 14],
        ['cavetto', 12],
      ],
    )
    expect(history.map(({ name }: { name: string }) => name)).toContain('Take out fillet')
  })

  it('nudges a break by the grid, by ten and by a tenth', async () => {
    const { id } = await aCommission({ section: SOUND_SECTION })
    await openBoard(id)
    await cells().nth(1).click()
    await handle().focus()
    const before = placeIn(await said())
    await page.keyboard.press('ArrowRight')
    await page.keyboard.press('Shift+ArrowRight')
    await page.keyboard.press('Alt+ArrowUp')
    await eventually(async () => placeIn(await said()).x).toBe(before.x + 5.5)
    expectWithin(placeIn(await said()).y, before.y + 0.05, { withinMm: 1e-6 })
    await saved()
    const member = (await draftOf(id)).document.members[1]
    expect(member.width).toBe(25.5)
    expect(member.basis.width).toEqual({ kind: 'judged', note: 'moved on the drawing' })
  })

  it('undoes step by step, also after a reload, back to what stood before', async () => {
    const { id } = await aCommission({ section: SOUND_SECTION })
    await openBoard(id)
    await cells().nth(2).focus()
    await page.keyboard.press('Delete')
    await putIn('bead').press('Enter')
    await saved()
    await page.reload()
    const undo = page.getByRole('button', { name: /^Undo/ })
    await eventually(() => undo.innerText()).toContain('Put in bead')
    await undo.press('Enter')
    await eventually(() => undo.innerText()).toContain('Take out torus')
    await undo.press('Enter')
    await eventually(async () => (await draftOf(id)).document).toEqual(SOUND_SECTION)
  })
})

/** What a break's handle says of its place, mm. */
function placeIn(text: string): { readonly x: number; readonly y: number } {
  const [, x = '', y = ''] = /x (-?[\d.]+) mm, y (-?[\d.]+) mm/.exec(text) ?? []
  return { x: Number(x), y: Number(y) }
}

describe('drawing by the mouse', () => {
  async function grip() {
    const box = await handle().boundingBox()
    if (box === null) throw new Error('the break is not on the canvas')
    return { x: box.x + box.width / 2, y: box.y + box.height / 2 }
  }

  it('drags a break to the grid; Escape gives it back', async () => {
    const { id } = await aCommission({ section: SOUND_SECTION })
    await openBoard(id)
    await cells().nth(1).click()
    const from = await grip()
    const before = placeIn(await said())
    await page.mouse.move(from.x, from.y)
    await page.mouse.down()
    await page.mouse.move(from.x + 40, from.y - 9, { steps: 5 })
    await page.keyboard.press('Escape')
    await page.mouse.up()
    await eventually(async () => placeIn(await said())).toEqual(before)

    await page.mouse.move(from.x, from.y)
    await page.mouse.down()
    await page.mouse.move(from.x + 41, from.y, { steps: 5 })
    await page.mouse.up()
    await saved()
    const after = placeIn(await said())
    expect(after.x).toBeGreaterThan(before.x)
    expect(Number.isInteger(after.x * 2)).toBe(true)
    expect((await draftOf(id)).document.members[1].width).toBe(after.x - 4)
  })

  it('selects what is pressed, zooms to the pointer and shows the whole again', async () => {
    const { id } = await aCommission({ section: SOUND_SECTION })
    await openBoard(id)
    await cells().nth(1).click()
    const first = await grip()
    await page.mouse.move(first.x - 60, first.y + 60)
    await page.mouse.wheel(0, -500)
    await eventually(async () => (await grip()).x).toBeGreaterThan(first.x + 10)
    await page.getByRole('button', { name: 'Whole section' }).click()
    await eventually(async () => Math.round((await grip()).x)).toBe(Math.round(first.x))
    await page.mouse.click(first.x + 40, first.y + 80)
    await expect
      .poll(() => page.locator('.rule__cell[aria-pressed="true"]').getAttribute('aria-label'))
      .toContain('torus')
  })
})

describe('what cannot be saved', () => {
  it('is kept here while the server is out of reach, through a reload, and sent when it is back', async () => {
    const { id } = await aCommission({ section: SOUND_SECTION })
    await openBoard(id)
    await page.route('**/draft/edits', (route) => route.abort())
    await putIn('bead').click()
    await page.getByText('Not saved: kept here').waitFor()
    await page.reload()
    await eventually(() => cells().count()).toBe(SOUND_SECTION.members.length + 1)
    expect((await draftOf(id)).version).toBe(1)
    await page.unroute('**/draft/edits')
    await saved()
    expect((await draftOf(id)).document.members).toHaveLength(SOUND_SECTION.members.length + 1)
  })

  it('asks what becomes of one’s own when another has drawn meanwhile', async () => {
    const { id } = await aCommission({ section: SOUND_SECTION })
    await openBoard(id)
    await designer.post(`/commissions/${id}/draft/edits`, {
      version: 1,
      operationId: crypto.randomUUID(),
      steps: [{ act: 'do', name: 'Gesso 0.60 mm', edit: { act: 'set', field: 'gesso', value: 0.6 } }],
    })
    await putIn('bead').click()
    const notice = page.getByRole('alert').filter({ hasText: 'has drawn on this section meanwhile' })
    await notice.waitFor()
    expect(await notice.innerText()).toContain('gesso: 0 → 0.6')
    await page.getByRole('button', { name: 'Put mine on top' }).click()
    await saved()
    const { document } = await draftOf(id)
    expect(document.gesso).toBe(0.6)
    expect(document.members).toHaveLength(SOUND_SECTION.members.length + 1)
  })
})

describe('putting forward', () => {
  it('says what is missing and leads there; once all is told the issue stands', async () => {
    const { id } = await aCommission()
    await openBoard(id)
    for (const kind of ['fillet', 'torus', 'fillet']) await putIn(kind).click()
    await page.getByRole('button', { name: 'Put forward as issue A' }).click()
    await page.getByRole('button', { name: /width of member 2 \(torus\)/ }).click()
    await page.getByLabel('Basis of the width').selectOption('judged')
    await page.getByLabel('Why, in a few words').fill('as its fellows')
    await page.getByLabel('Why, in a few words').press('Enter')
    await page
      .getByRole('button', { name: 'Give this basis to every dimension that has none' })
      .first()
      .click()
    await page.getByRole('button', { name: 'Put forward as issue A' }).click()
    const dialog = page.getByRole('dialog')
    await dialog.getByRole('button', { name: 'Put forward as issue A' }).click()
    await page.waitForURL(/\/review$/)
    const issues = (await designer.get(`/commissions/${id}/issues`)).body
    expect(issues).toHaveLength(1)
    expect(issues[0]).toMatchObject({ letter: 'A', state: 'put-forward' })
  })
})

describe('the board for everyone', () => {
  it.each([1440, 1024, 700])('has no fault that a machine finds in WCAG 2.2 AA, %i wide', async (width) => {
    const { id } = await aCommission({ section: SOUND_SECTION })
    await page.setViewportSize({ width, height: 900 })
    await openBoard(id)
    await cells().nth(1).click()
    const { violations } = await new AxeBuilder({ page })
      .withTags(['wcag2a', 'wcag2aa', 'wcag21aa', 'wcag22aa'])
      .analyze()
    expect(
      violations.map(({ id: rule, nodes }) => [rule, nodes.map(({ html }) => html.slice(0, 160))]),
    ).toEqual([])
  })
})
