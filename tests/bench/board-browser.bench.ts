import { build } from 'esbuild'
import { chromium } from 'playwright-core'
import { draftFromSection } from '@shared/section'
import type { DraftSection } from '@shared/section'
import { ROOT } from '../helpers/source-files'
import type { EditTimes } from './board-page'
import { benchSection } from './section.bench'
import type { BenchRow } from './section.bench'

const EDITS = 300
/** The first strokes compile the code and fill its caches. */
const WARM_UP = 60

/** From an edit to the painted canvas, and the figures and checks after it, in a real Chromium, ms. */
export async function run(): Promise<BenchRow[]> {
  const script = await pageScript()
  const browser = await chromium.launch({
    executablePath: '/usr/bin/chromium',
    args: [
      '--no-sandbox',
      '--disable-gpu',
      '--no-first-run',
      '--disable-background-networking',
      '--disable-sync',
    ],
  })
  try {
    const rows: BenchRow[] = []
    for (const count of [12, 200]) {
      const page = await browser.newPage({ viewport: { width: 1000, height: 700 } })
      await page.setContent('<!doctype html><body></body>')
      await page.addScriptTag({ content: script })
      const times = await page.evaluate(
        ([draft, edits]) =>
          (
            globalThis as unknown as {
              timeEdits: (draft: DraftSection, edits: number) => Promise<EditTimes[]>
            }
          ).timeEdits(draft, edits),
        [draftOf(count), EDITS + WARM_UP] as const,
      )
      rows.push(...rowsOf(count, times.slice(WARM_UP)))
      await page.close()
    }
    return rows
  } finally {
    await browser.close()
  }
}

function draftOf(count: number): DraftSection {
  let made = 0
  return draftFromSection(benchSection(count), () => `k${(made += 1)}`)
}

async function pageScript(): Promise<string> {
  const { outputFiles } = await build({
    entryPoints: [`${ROOT}/tests/bench/board-page.ts`],
    bundle: true,
    write: false,
    format: 'iife',
    target: 'es2022',
    alias: { '@': `${ROOT}/src`, '@shared': `${ROOT}/shared` },
    logLevel: 'silent',
  })
  return outputFiles[0]?.text ?? ''
}

const STEPS = {
  paint: 'edit to painted canvas',
  figures: 'figures and checks',
  frame: 'edit to next frame',
} as const

function rowsOf(count: number, times: readonly EditTimes[]): BenchRow[] {
  return Object.entries(STEPS).flatMap(([key, name]) => {
    const sorted = times.map((time) => time[key as keyof EditTimes]).sort((a, b) => a - b)
    return [50, 95].map((percent) => ({
      name: `board, ${count} members: ${name}, p${percent}`,
      value: sorted[Math.floor(((sorted.length - 1) * percent) / 100)] as number,
      unit: 'ms',
    }))
  })
}
