import { chromium } from 'playwright-core'
import type { Browser, BrowserContext, ConsoleMessage, Page } from 'playwright-core'
import type { Product, SignIn } from './product'

export type { Page } from 'playwright-core'

/** Debian's Chromium, quiet and without the network services it would start by itself. */
const PROGRAM = '/usr/bin/chromium'
const FLAGS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
]
/** A page that has not shown what is waited for by then is taken not to show it: a busy machine is slow. */
const LONGEST_WAIT_MS = 20_000

export interface WindowSize {
  readonly width: number
  readonly height: number
}
export const DESK: WindowSize = { width: 1440, height: 1000 }
export const BENCH_SCREEN: WindowSize = { width: 820, height: 1180 }
export const PHONE: WindowSize = { width: 390, height: 844 }

/** One person's own browser: nothing is shared with another's. */
export interface Visit {
  readonly page: Page
  readonly context: BrowserContext
  /** What went wrong in the page so far: errors on its console and uncaught ones. */
  readonly faults: () => readonly string[]
}

export interface OpenBrowser {
  /** A fresh browser profile of this size that has only reached the front door. */
  visit(product: Product, size?: WindowSize): Promise<Visit>
  /** The same, signed in. */
  signedIn(product: Product, signIn: SignIn, size?: WindowSize): Promise<Visit>
  close(): Promise<void>
}

export async function openBrowser(): Promise<OpenBrowser> {
  const browser = await chromium.launch({ executablePath: PROGRAM, args: FLAGS })
  const visit = (product: Product, size: WindowSize = DESK) => visitOf(browser, product, size)
  return {
    visit,
    signedIn: async (product, signIn, size) => {
      const visitor = await visit(product, size)
      await signInOn(visitor.page, signIn)
      return visitor
    },
    close: () => browser.close(),
  }
}

async function visitOf(browser: Browser, product: Product, viewport: WindowSize): Promise<Visit> {
  const context = await browser.newContext({
    baseURL: product.url,
    viewport,
    timezoneId: 'UTC',
    locale: 'en-GB',
  })
  context.setDefaultTimeout(LONGEST_WAIT_MS)
  context.setDefaultNavigationTimeout(LONGEST_WAIT_MS)
  const page = await context.newPage()
  const faults: string[] = []
  page.on('pageerror', (error) => faults.push(`uncaught: ${error.message}`))
  page.on('console', (message) => {
    if (message.type() === 'error' && !isFirstQuestion(message)) faults.push(`console: ${message.text()}`)
  })
  await page.goto('/')
  return { page, context, faults: () => faults }
}

/** Before anybody has signed in the page asks who is there, and the browser itself notes the 401. */
const isFirstQuestion = (message: ConsoleMessage) =>
  message.text().includes('401') && new URL(message.location().url).pathname === '/api/session'

export async function signInOn(page: Page, { email, password }: SignIn): Promise<void> {
  await page.getByLabel('E-mail').fill(email)
  await page.getByLabel('Password').fill(password)
  await page.getByRole('button', { name: 'Sign in' }).click()
  await page.getByRole('button', { name: 'Sign in' }).waitFor({ state: 'detached' })
}
