import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { openBrowser, PHONE } from '../helpers/browser'
import type { OpenBrowser } from '../helpers/browser'
import { startProduct } from '../helpers/product'
import type { Product } from '../helpers/product'

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

describe('the mill, on a phone', () => {
  it('finds what waits for it, opens the sheet at 1:1, reports the first-off, and is shown nothing else', async () => {
    const { page, context, faults } = await browser.signedIn(product, product.signInOf('mill'), PHONE)
    await page.getByRole('heading', { name: 'What waits for you' }).waitFor()
    await page.getByRole('link').filter({ hasText: 'report the first-off' }).first().click()
    await page.getByRole('heading', { name: /^Knife order K-/ }).waitFor()

    const sheet = await page.getByRole('link', { name: /^PDF/ }).getAttribute('href')
    const pdf = await context.request.get(sheet ?? '')
    expect([pdf.status(), (await pdf.body()).subarray(0, 5).toString()]).toEqual([200, '%PDF-'])

    await page.getByRole('button', { name: 'Report the first-off' }).click()
    const dialog = page.getByRole('dialog', { name: 'Report the first-off' })
    await dialog.getByRole('button', { name: 'Report the first-off' }).click()
    await dialog.waitFor({ state: 'detached' })
    await page.getByText('First-off reported', { exact: true }).first().waitFor()
    expect(faults()).toEqual([])

    for (const path of ['/api/commissions', '/api/rack', '/api/letters', '/api/people']) {
      expect((await context.request.get(path)).status(), path).toBe(404)
    }
  })
})
