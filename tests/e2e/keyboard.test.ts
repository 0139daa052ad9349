import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { openBrowser } from '../helpers/browser'
import type { OpenBrowser, Page } from '../helpers/browser'
import { startProduct } from '../helpers/product'
import type { Product } from '../helpers/product'

/** The board by keyboard alone: no pointer is used once the page stands. */
let product: Product
let browser: OpenBrowser

beforeAll(async () => {
  product = await startProduct()
  browser = await openBrowser()
}, 400_000)
afterAll(async () => {
  await browser?.close()
  await product?.stop()
})

const ruleOf = (page: Page) => page.getByRole('group', { name: /^Member rule/ })
const saved = (page: Page) => page.getByText('Saved', { exact: true }).waitFor()
/** Name of the cell that has the focus, or of whatever else has it. */
const focused = (page: Page) =>
  page.evaluate(
    () => document.activeElement?.getAttribute('aria-label') ?? document.activeElement?.tagName ?? '',
  )

/** Tabs on until the focus is where `isThere` says; a way longer than the page's own controls is no way. */
async function tabTo(page: Page, isThere: (name: string) => boolean): Promise<string> {
  for (let steps = 0; steps < 80; steps += 1) {
    await page.keyboard.press('Tab')
    const name = await focused(page)
    if (isThere(name)) return name
  }
  throw new Error(`not reached by the tab key; the focus is on ${await focused(page)}`)
}

const cellNamed = (page: Page, name: string) => ruleOf(page).getByRole('button', { name, exact: true })

/** Opens the cell that has the focus, types a width over its own, and goes past the rise. */
async function typeWidth(page: Page, mm: string): Promise<void> {
  await page.keyboard.press('Enter')
  await page.getByRole('group', { name: /^Size of fillet, member 1$/ }).waitFor()
  await expect.poll(() => page.evaluate(() => document.activeElement?.tagName)).toBe('INPUT')
  await page.keyboard.press('Control+A')
  await page.keyboard.type(mm)
  await page.keyboard.press('Enter')
  await page.keyboard.press('Enter')
}

/** A new commission with a section of two members, put in by the keys. */
async function openBoard(page: Page): Promise<void> {
  await page.goto('/commissions/new')
  await page.getByLabel('Client').selectOption({ index: 1 })
  await page.getByLabel('Title of the picture').fill('A study of clouds')
  await page.getByRole('button', { name: 'Take it on' }).click()
  await page.waitForURL(/\/commissions\/[0-9a-f-]{36}\/picture$/)
  await page.goto(page.url().replace(/picture$/, 'section'))
  await ruleOf(page).waitFor()
}

describe('the board without a pointer', () => {
  it('changes a member, and undoes another change; each shows after a reload', async () => {
    const { page, faults } = await browser.signedIn(product, product.signInOf('designer'))
    await openBoard(page)
    for (const kind of ['fillet', 'cavetto']) {
      await tabTo(page, (name) => name.startsWith('Put in') && name.endsWith(`: ${kind}`))
      await page.keyboard.press('Enter')
      await ruleOf(page)
        .getByRole('button', { name: new RegExp(`^${kind}, `) })
        .waitFor()
      await page.evaluate(() => (document.activeElement as HTMLElement).blur())
    }
    const cell = (kind: string) => ruleOf(page).getByRole('button', { name: new RegExp(`^${kind}, `) })
    const before = (await cell('fillet').getAttribute('aria-label')) ?? ''
    expect(before).not.toContain('width 7.3 mm')

    await page.evaluate(() => (document.activeElement as HTMLElement).blur())
    await tabTo(page, (name) => name.startsWith('cavetto, member 2'))
    await page.keyboard.press('ArrowLeft')
    await expect.poll(() => focused(page)).toBe(before)
    const changed = before.replace(/width [^,]+/, 'width 7.3 mm')
    await typeWidth(page, '7.3')
    await expect.poll(() => focused(page)).toBe(changed)
    await saved(page)
    await page.reload()
    await cellNamed(page, changed).waitFor()

    await tabTo(page, (name) => name === changed)
    await typeWidth(page, '9.1')
    await cellNamed(page, changed.replace('7.3', '9.1')).waitFor()
    await page.keyboard.press('Control+Z')
    await cellNamed(page, changed).waitFor()
    await saved(page)
    await page.reload()
    await cellNamed(page, changed).waitFor()
    expect(await ruleOf(page).getByRole('button').count()).toBe(2)
    expect(faults()).toEqual([])
  }, 300_000)
})
