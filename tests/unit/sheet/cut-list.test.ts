import { describe, expect, it } from 'vitest'
import { cutListPagesOf } from '@shared/sheet'
import type { CutListInput, Drawing } from '@shared/sheet'
import { expectWithin } from '../../helpers/expect-within'
import { itemsOutside, overlappingTexts } from './layout-check'
import { aCutList } from './sheet-cases'

const PAGE = { left: 10, bottom: 5, right: 200, top: 287 }

const textsOf = (pages: readonly Drawing[]): string[] =>
  pages.flatMap(({ items }) => items.flatMap((item) => (item.kind === 'text' ? [item.text] : [])))

function expectLegible(pages: readonly Drawing[]): void {
  for (const page of pages) {
    expect(overlappingTexts(page)).toEqual([])
    expect(itemsOutside(page, PAGE)).toEqual([])
  }
}

/** Boxes to tick: the only closed squares drawn with a wide line. */
const boxesOn = (pages: readonly Drawing[]): number =>
  pages
    .flatMap(({ items }) => items)
    .filter((item) => {
      if (item.kind !== 'path' || item.lineWidthMm !== 0.5) return false
      const xs = item.path.map(({ start }) => start.x)
      const ys = item.path.map(({ start }) => start.y)
      return Math.abs(Math.max(...xs) - Math.min(...xs) - (Math.max(...ys) - Math.min(...ys))) < 1e-9
    }).length

describe('the printed cut list', () => {
  it('has a box for every cut and every offcut, and all sizes', () => {
    const pages = cutListPagesOf(aCutList())
    expect(boxesOn(pages)).toBe(4 + 2)
    const texts = textsOf(pages)
    for (const text of ['1119.0', '815.0', '514.4', '1545.5', '45°', '3.2', '2.0'])
      expect(texts).toContain(text)
    expectLegible(pages)
  })

  it('draws each rail true along the length: long points on the back edge, mitres in across the width', () => {
    const { items } = cutListPagesOf(aCutList())[0] ?? { items: [] }
    const rails = items.filter((item) => item.kind === 'path' && item.fill === 'white')
    const first = rails[0]
    if (first?.kind !== 'path') throw new Error('no rail is drawn')
    const [a, b, c, d] = first.path.map(({ start }) => start)
    // The longest length, 3660 mm, is 180 mm wide on the page, whose strip starts at 18 mm.
    const scale = 180 / 3660
    expectWithin(a?.x ?? Number.NaN, 18 + 75 * scale, { withinMm: 1e-9 })
    expectWithin(b?.x ?? Number.NaN, 18 + (75 + 1119) * scale, { withinMm: 1e-9 })
    expectWithin(c?.x ?? Number.NaN, 18 + (75 + 1119 - 110) * scale, { withinMm: 1e-9 })
    expectWithin(d?.x ?? Number.NaN, 18 + (75 + 110) * scale, { withinMm: 1e-9 })
    expect((a?.y ?? 0) > (d?.y ?? 0)).toBe(true)
  })

  it('names rails too short to hold by hand', () => {
    const rails = aCutList().rails.map((rail) =>
      rail.side === 'left' ? { ...rail, longPointMm: 180 } : rail,
    )
    expect(textsOf(cutListPagesOf(aCutList({ rails }))).join(' ')).toContain('frame 1 left (180.0)')
    expect(textsOf(cutListPagesOf(aCutList())).join(' ')).not.toContain('Too short to hold')
  })

  it('says in large letters when it must not be cut', () => {
    const barred = 'Not to be cut: the first-off has not been accepted.'
    const pages = cutListPagesOf(aCutList({ barred }))
    expect(textsOf(pages).join(' ')).toContain(barred)
    expectLegible(pages)
  })

  it('flows over pages, every cut once, heading and drawing together', () => {
    const lengths = Array.from({ length: 14 }, (_, length) => ({
      ...{
        name: `rack R-${200 + length}`,
        lengthMm: 3660,
        startTrimMm: 75,
        offcutMm: 20,
        offcutMark: `R-${300 + length}`,
      },
      cuts: Array.from({ length: 12 }, (_, cut) => ({
        ...{ frame: `study ${cut}`, side: 'top', longPointMm: 280 + cut, mitreDeg: 45 },
        atMm: 75 + cut * 295,
      })),
    }))
    const rails = Array.from({ length: 90 }, (_, index) => ({
      ...{ frame: `study ${index}`, side: 'top', count: 2, longPointMm: 280, rebateMm: 120, sightMm: 110 },
      mitreDeg: 45,
    }))
    const pages = cutListPagesOf(aCutList({ lengths, rails }))
    expect(pages.length).toBeGreaterThan(8)
    expect(boxesOn(pages)).toBe(14 * 13)
    expectLegible(pages)
    pages.forEach((_, index) => expect(textsOf(pages)).toContain(`sheet ${index + 1}/${pages.length}`))
  })

  it('stays legible with the longest words and in inches', () => {
    const long = 'Wharves and warehouses seen across the inner harbour '.repeat(9)
    const input: Partial<CutListInput> = {
      unit: 'in',
      vocabulary: 'molding',
      title: long,
      workshop: long,
      batch: long,
    }
    const pages = cutListPagesOf(
      aCutList({ ...input, saw: { ...aCutList().saw, name: long }, cautions: [long, long] }),
    )
    expectLegible(pages)
    expect(textsOf(pages).join(' ')).not.toMatch(/\bmm\b/)
  })

  it('refuses a plan that opens no length', () => {
    expect(() => cutListPagesOf(aCutList({ lengths: [] }))).toThrow(/make a plan first/)
  })
})
