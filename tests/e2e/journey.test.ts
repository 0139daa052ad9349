import type { Locator } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { BENCH_SCREEN, openBrowser } from '../helpers/browser'
import type { OpenBrowser, Page, Visit } from '../helpers/browser'
import { startProduct } from '../helpers/product'
import type { Product } from '../helpers/product'

/**
 * The main job from the first reading of a picture to the first cut rail, by five people in browsers of their own.
 * Each part goes on from where the one before it ended.
 */
const TITLE = 'Ferry at first light'
const CLIENT = 'Harbour Museum, Osterlay'
const MILL = 'Riverside Planing Mill'
/** That client's own; the demo has another who is not. */
const CURATOR = 'hanna.weft@harbour-museum.example'

const REMARK = 'The round is heavier in the photograph'

interface Drawn {
  readonly kind: string
  readonly width: string
  readonly rise: string
}
/** From the sight edge outward, mm: up to the top by a hollow and a round, down the back by a splay. */
const MEMBERS: readonly Drawn[] = [
  { kind: 'fillet', width: '4', rise: '0' },
  { kind: 'cavetto', width: '10', rise: '8' },
  { kind: 'fillet', width: '5', rise: '0' },
  { kind: 'ovolo', width: '8', rise: '6' },
  { kind: 'splay', width: '21', rise: '-10' },
]

let product: Product
let browser: OpenBrowser
let designer: Visit
let curator: Visit
let manager: Visit
let bench: Visit
let commissionPath: string
let orderPath: string

beforeAll(async () => {
  product = await startProduct()
  browser = await openBrowser()
  designer = await browser.signedIn(product, product.signInOf('designer'))
  curator = await browser.signedIn(product, signInBy(CURATOR))
  manager = await browser.signedIn(product, product.signInOf('manager'))
  bench = await browser.signedIn(product, product.signInOf('bench'), BENCH_SCREEN)
}, 400_000)
afterAll(async () => {
  await browser?.close()
  await product?.stop()
})

function signInBy(email: string) {
  const found = product.signIns.find((signIn) => signIn.email === email)
  if (found === undefined) throw new Error(`the demo has nobody who signs in as ${email}`)
  return found
}

const openStage = async (page: Page, stage: string) => {
  await page.goto(`${commissionPath}/${stage}`)
}
const dialogOf = (page: Page, name: string | RegExp) => page.getByRole('dialog', { name })
const press = (page: Page, name: string | RegExp) => page.getByRole('button', { name, exact: true }).click()
const reading = async (page: Page, label: string, mm: string) => {
  const field = page.getByLabel(label)
  await field.fill(mm)
  await field.press('Enter')
}

describe('a commission, from picture to bench', () => {
  it('is taken on by the designer, and its picture measured', async () => {
    const { page } = designer
    await page.goto('/commissions/new')
    await page.getByLabel('Client').selectOption({ label: CLIENT })
    await page.getByLabel('Title of the picture').fill(TITLE)
    await page.getByLabel('Artist').fill('A. Morrow')
    await page.getByLabel('Accession number').fill('HM 1907.14')
    await page.getByLabel('Due').fill('2027-03-01')
    await press(page, 'Take it on')
    await page.waitForURL(/\/commissions\/[0-9a-f-]{36}\/picture$/)
    commissionPath = new URL(page.url()).pathname.replace(/\/picture$/, '')

    await press(page, 'Put in a picture')
    await page.getByLabel('Picture', { exact: true }).fill(TITLE)
    await press(page, 'Put it in')
    for (const mm of ['612', '611.5', '612.4']) await reading(page, 'Width, each reading', mm)
    for (const mm of ['18 1/8 in', '460']) await reading(page, 'Height, each reading', mm)
    await page.getByLabel('Thickness at the edge').fill('5')
    await press(page, 'Save the measurement')
    await page.getByText('One frame, measurement 1').waitFor()
  })

  it('has a photograph brought in as evidence', async () => {
    const { page } = designer
    await openStage(page, 'evidence')
    await press(page, 'Bring in a photograph')
    await page.getByLabel('Photograph').setInputFiles('examples/photographs/upland-from-the-right.jpg')
    await page.getByLabel('What it shows').fill('The lost frame, from the right')
    await page.getByLabel('Where it is from').fill('Our own camera')
    await press(page, 'Bring it in')
    await page.getByRole('heading', { name: 'The lost frame, from the right' }).waitFor()
  })

  it('has its section drawn on the board, each dimension with its basis', async () => {
    const { page } = designer
    await openStage(page, 'section')
    for (const [place, member] of MEMBERS.entries()) await putIn(page, member, place)
    await page.getByLabel('Sight edge, height').fill('16')
    await page.getByLabel('Rebate, width').fill('8')
    await page.getByLabel('Rebate, depth').fill('10')
    await page.getByLabel('Rebate, depth').press('Enter')
    await page.getByLabel('Basis of the sight edge').selectOption({ label: 'Judged' })
    await page.getByLabel('Why, in a few words').last().fill('as deep as its fellows of the same room')
    await page.getByLabel('Why, in a few words').last().press('Enter')
    await press(page, 'Give this basis to every dimension that has none')
    await page.getByText('Saved', { exact: true }).waitFor()
    await page.reload()
    const rule = page.getByRole('group', { name: /^Member rule/ })
    await rule.getByRole('button', { name: 'splay, member 5: width 21.0 mm, rise -10.0 mm' }).waitFor()
    expect(await rule.getByRole('button').count()).toBe(MEMBERS.length)
  })

  it('is put forward as issue A, and returned by the curator with a remark pinned to it', async () => {
    await putForward(designer.page, 'A')
    const { page } = curator
    await openStage(page, 'review')
    await page.getByRole('heading', { name: 'Drawing A' }).waitFor()
    await page.getByText('The lost frame, from the right').first().waitFor()
    await press(page, 'Pin a remark')
    await page.getByLabel('Where').selectOption({ index: 4 })
    await page.getByLabel('Remark', { exact: true }).fill(REMARK)
    await press(page, 'Pin the remark')
    await page.getByRole('listitem').filter({ hasText: REMARK }).waitFor()
    await press(page, 'Return')
    await decide(page, 'Return A', 'Not before the round is as heavy as in the photograph.')
    await page.getByText(`Returned by ${curatorName()}`).waitFor()
  })

  it('is changed where the curator asked, put forward as issue B, and approved', async () => {
    const { page } = designer
    await openStage(page, 'review')
    await page.getByText(REMARK).waitFor()
    await openStage(page, 'section')
    await page.getByRole('table').getByRole('button', { name: 'ovolo', exact: true }).click()
    const details = page.getByRole('group', { name: 'ovolo, member 4', exact: true })
    await details.getByLabel('Width', { exact: true }).fill('10')
    await details.getByLabel('Width', { exact: true }).press('Enter')
    await page.getByText('Saved', { exact: true }).waitFor()
    await putForward(page, 'B')

    await openStage(curator.page, 'review')
    await curator.page.getByRole('heading', { name: 'Drawing B' }).waitFor()
    await press(curator.page, 'Approve B')
    await decide(curator.page, 'Approve B')
    await curator.page.getByText(`Approved by ${curatorName()}`).waitFor()
    const said = 'I have compared drawing B with its evidence and agree that it be made.'
    expect(await curator.page.getByText(said).count()).toBe(1)
    expect(await curator.page.getByRole('button', { name: /^Approve/ }).count()).toBe(0)
  })

  it('has its knife ordered from B, by a letter with three drawings that the manager finds under post', async () => {
    const { page } = designer
    await openStage(page, 'knife')
    await page.getByLabel('Mill', { exact: true }).selectOption({ label: MILL })
    const wanted = page.getByRole('group', { name: 'Wanted', exact: true })
    await wanted.getByLabel('How many').fill('3')
    await wanted.getByLabel('Length', { exact: true }).fill('2440')
    await press(page, `Send to ${MILL}`)
    await dialogOf(page, 'Send the knife order').getByRole('button', { name: 'Send it' }).click()
    await page.waitForURL(/\/orders\/[0-9a-f-]{36}$/)
    await page.getByRole('heading', { name: /^Knife order / }).waitFor()
    orderPath = new URL(page.url()).pathname
    await untilShown(page, page.getByRole('button', { name: 'Acknowledge' }))

    const post = manager.page
    await post.goto('/post')
    const row = post
      .getByRole('row')
      .filter({ hasText: TITLE })
      .filter({ hasText: 'orders@riverside-planing' })
    await row.getByRole('link').first().click()
    await post.getByRole('heading', { name: 'Enclosed' }).waitFor()
    const saves = await post.getByRole('link', { name: /^Save .*\.(pdf|dxf|svg)$/ }).all()
    const endings = await Promise.all(saves.map(async (save) => (await save.innerText()).split('.').at(-1)))
    expect(endings.sort()).toEqual(['dxf', 'pdf', 'svg'])
    const caught = post.getByRole('link', { name: 'Save as it arrived' })
    const letter = await manager.context.request.get((await caught.getAttribute('href')) ?? '')
    expect(letter.status()).toBe(200)
    expect((await letter.body()).includes('Content-Disposition: attachment')).toBe(true)
  })

  it('has the mill’s answers recorded by the workshop, up to the delivery as it was measured', async () => {
    const { page } = designer
    await page.goto(orderPath)
    await record(page, 'Acknowledge', { 'How the mill’s word reached you': 'Jon telephoned on the same day' })
    await record(page, 'Go on without a price', { Reason: 'by the price list of this year' })
    await record(page, 'Go on without a first-off', { Reason: 'the knife was seen at the mill' })
    await record(page, 'All delivered', {
      'True width': '49.8',
      'True rebate width': '8.1',
      'How the mill’s word reached you': 'the delivery note, measured at the door',
    })
    await page.getByText('Delivered', { exact: true }).first().waitFor()
  })

  it('has its rails planned from what came, and the list opened to the bench', async () => {
    const { page } = designer
    await openStage(page, 'lengths')
    await press(page, 'Plan the rails')
    await press(page, 'Open to the bench')
    await dialogOf(page, 'Open to the bench').getByRole('button', { name: 'Open it' }).click()
    await page.getByRole('button', { name: 'Open to the bench' }).waitFor({ state: 'detached' })
  })

  it('is cut at the bench, a rail ticked with its true length', async () => {
    const { page } = bench
    await page.goto('/cut-lists')
    await page.getByRole('link').filter({ hasText: TITLE }).click()
    await page.getByRole('heading', { name: `${TITLE}, drawing B` }).waitFor()
    await page.getByText('0 of 4 rails cut.').waitFor()
    await page.getByLabel('True length, if measured').fill('700.5')
    await press(page, 'Cut')
    await page.getByText('cut 700.5').waitFor()
    await page.reload()
    await page.getByText('1 of 4 rails cut.').waitFor()
    await page.getByText('cut 700.5').waitFor()
    expect(await page.getByRole('checkbox', { checked: true }).count()).toBe(1)
    const overflowPx = await page.evaluate(
      () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
    )
    expect(overflowPx).toBeLessThanOrEqual(0)
  })

  it('stands among the manager’s commissions at the bench, by issue B', async () => {
    const { page } = manager
    await page.goto('/commissions')
    const row = page.getByRole('row').filter({ hasText: TITLE })
    await row.getByText('Bench, issue B').waitFor()
    expect(await row.innerText()).toContain(CLIENT)
  })

  it('went by without an error on anybody’s page', () => {
    expect([designer, curator, manager, bench].flatMap(({ faults }) => faults())).toEqual([])
  })
})

const curatorName = () => signInBy(CURATOR).name

async function putIn(page: Page, { kind, width, rise }: Drawn, place: number): Promise<void> {
  await page.getByRole('button', { name: new RegExp(`^Put in .*: ${kind}$`) }).click()
  const details = page.getByRole('group', { name: `${kind}, member ${place + 1}`, exact: true })
  for (const [side, mm] of Object.entries({ Width: width, Rise: rise })) {
    await details.getByLabel(side, { exact: true }).fill(mm)
    await details.getByLabel(side, { exact: true }).press('Enter')
  }
}

async function putForward(page: Page, letter: string): Promise<void> {
  const act = `Put forward as issue ${letter}`
  await page.getByRole('banner').getByRole('button', { name: act }).click()
  await dialogOf(page, act).getByRole('button', { name: act }).click()
  await page.getByRole('heading', { name: `Drawing ${letter}` }).waitFor()
}

/** Decides on an issue with the curator's typed name; the statement offered stands unless another is given. */
async function decide(page: Page, act: string, statement?: string): Promise<void> {
  const dialog = dialogOf(page, act)
  if (statement !== undefined) await dialog.getByLabel('Statement').fill(statement)
  await dialog.getByLabel('Your name, typed in full').fill(curatorName())
  await dialog.getByRole('button', { name: act }).click()
  await dialog.waitFor({ state: 'detached' })
}

/** Records one step of the order that is shown. */
async function record(page: Page, act: string, fields: Readonly<Record<string, string>>): Promise<void> {
  await press(page, act)
  const dialog = dialogOf(page, act)
  for (const [label, text] of Object.entries(fields)) await dialog.getByLabel(label).fill(text)
  await dialog.getByRole('button', { name: act }).click()
  await dialog.waitFor({ state: 'detached' })
}

/** Looks again until it is there: what another process does in the background is not pushed to the page. */
async function untilShown(page: Page, what: Locator): Promise<void> {
  await expect
    .poll(
      async () => {
        await page.reload()
        return what.waitFor({ timeout: 5_000 }).then(
          () => true,
          () => false,
        )
      },
      { timeout: 60_000 },
    )
    .toBe(true)
}
