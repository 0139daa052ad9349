import { describe, expect, it } from 'vitest'
import { measuresOf } from '@shared/section'
import { drawingSpaceOf, sheetOf, sheetsOf } from '@shared/sheet'
import type { Drawing, SheetInput } from '@shared/sheet'
import { expectWithin } from '../../helpers/expect-within'
import { itemsOutside, overlappingTexts, struckTexts } from './layout-check'
import { aSheetInput, climbingMembers, sectionOf } from './sheet-cases'

const sheetWith = (members: ReturnType<typeof climbingMembers>, changes: Partial<SheetInput> = {}) => {
  const section = sectionOf({ members, gesso: 0.6 })
  return sheetsOf(aSheetInput({ section, measures: measuresOf(section), ...changes }))
}

function expectLegible(pages: readonly Drawing[]): void {
  for (const page of pages) {
    expect(overlappingTexts(page)).toEqual([])
    expect(struckTexts(page)).toEqual([])
    expect(itemsOutside(page, drawingSpaceOf(page))).toEqual([])
  }
}

const textsOf = (pages: readonly Drawing[]): string[] =>
  pages.flatMap(({ items }) => items.flatMap((item) => (item.kind === 'text' ? [item.text] : [])))

describe('the layout of the profile sheet', () => {
  it.each([
    [1, 40],
    [2, 30],
    [12, 8],
    [12, 1.5],
    [40, 3],
    [59, 2],
    [61, 4],
    [200, 2],
  ])('keeps every text apart and inside the frame with %i members of %f mm', (count, widthMm) => {
    const pages = sheetWith(climbingMembers(count, widthMm))
    expectLegible(pages)
    for (let number = 1; number <= count; number += 1) expect(textsOf(pages)).toContain(`${number}`)
  })

  it.each(['mm', 'in'] as const)(
    'keeps them apart in %s, as a draft and as an issue not yet approved',
    (unit) => {
      const drafts = sheetWith(climbingMembers(20, 5), {
        unit,
        vocabulary: 'molding',
        state: { kind: 'draft' },
      })
      const { approval: _, ...waiting } = { ...aSheetInput().state } as Extract<
        SheetInput['state'],
        { kind: 'issue' }
      >
      const issue = sheetWith(climbingMembers(20, 5), { unit, state: waiting })
      expectLegible([...drafts, ...issue])
      expect(textsOf(drafts)).toContain('draft, not approved')
      expect(textsOf(issue)).toContain('not approved')
    },
  )

  it('says on every sheet of a draft, in large letters, that it is one', () => {
    const pages = sheetWith(climbingMembers(200, 2), { state: { kind: 'draft' } })
    expect(pages.length).toBeGreaterThan(1)
    for (const { items } of pages) {
      const large = items.filter((item) => item.kind === 'text' && item.heightMm >= 10)
      expect(large.map((item) => item.kind === 'text' && item.text)).toEqual(['draft, not approved'])
    }
    expectLegible(pages)
  })

  it('keeps them apart when every field is as long as it may be', () => {
    const long = 'Wharves and warehouses seen across the inner harbour at low water, toward evening '
      .repeat(6)
      .slice(0, 500)
    const state = {
      ...aSheetInput().state,
      putForwardBy: long,
      approval: { by: long, on: '2026-11-24' },
    } as SheetInput['state']
    const mill = { timber: long, grade: 'W'.repeat(500), notes: long.repeat(10) }
    const pages = sheetWith(climbingMembers(12, 8), {
      ...{ title: long, client: long, accession: 'X'.repeat(500), workshop: long, state, mill },
      cautions: [long, long],
    })
    expectLegible(pages)
    const words = textsOf(pages).join(' ')
    expect(words.split('toward evening').length).toBeGreaterThan(50)
  })

  it('keeps them apart where the face falls, stands upright and undercuts', () => {
    const section = sectionOf({
      sightEdgeHeight: 50,
      members: [
        { kind: 'fillet', width: 0, rise: -6 },
        { kind: 'scotia', width: 20, rise: -8 },
        { kind: 'fillet', width: 0, rise: 12 },
        { kind: 'bead', width: 6, rise: 0 },
        { kind: 'quirk', width: 2, rise: 0, depth: 3, shape: 'square' },
        { kind: 'reeds', width: 20, rise: 0, count: 4, fillet: 1 },
        { kind: 'flutes', width: 20, rise: 0, count: 3, fillet: 1, depth: 1.5 },
        { kind: 'thumb', width: 14, rise: -9 },
      ],
      backSplay: { x: 6, height: 15 },
    })
    expectLegible(sheetsOf(aSheetInput({ section, measures: measuresOf(section) })))
  })

  it('takes the smallest sheet at 1:1, and a larger one for a wider section', () => {
    const narrow = sheetWith(climbingMembers(12, 6))[0]
    const wide = sheetWith(climbingMembers(12, 40))[0]
    expect(narrow?.model?.scale).toBe(1)
    expect(wide?.model?.scale).toBe(1)
    expect(narrow?.widthMm).toBe(420)
    expect(wide?.widthMm ?? 0).toBeGreaterThan(420)
  })

  it('takes A4 for a small section of few members with little to say', () => {
    const section = sectionOf({ members: climbingMembers(2, 12) })
    const { mill: _, ...input } = aSheetInput({ section, measures: measuresOf(section) })
    const page = sheetOf(input)
    expect([page.widthMm, page.heightMm]).toEqual([210, 297])
  })

  it('states the scale where no sheet takes the section at 1:1', () => {
    const pages = sheetWith(climbingMembers(12, 150))
    expect(pages[0]?.model?.scale).toBe(0.5)
    expect(textsOf(pages)).toContain('Wood section 1:2')
    expect(textsOf(pages).filter((text) => text === '1:2')).toHaveLength(1)
    expectLegible(pages)
  })

  it('carries every member over to further sheets, each once, and numbers the sheets', () => {
    const pages = sheetWith(climbingMembers(200, 2))
    expect(pages.length).toBeGreaterThan(1)
    const rows = pages.flatMap(({ items }) =>
      items.flatMap((item) =>
        item.kind === 'text' && item.layer === 'table' && item.anchor === 'end' && /^\d+$/.test(item.text)
          ? [Number(item.text)]
          : [],
      ),
    )
    expect(rows).toEqual(Array.from({ length: 201 }, (_, index) => index))
    pages.forEach((_, index) => expect(textsOf(pages)).toContain(`${index + 1}/${pages.length}`))
  })
})

describe('what the profile sheet says', () => {
  const texts = textsOf(sheetsOf(aSheetInput()))
  const words = texts.join(' ')

  it('names the issue, its hash, its approval and the picture', () => {
    for (const text of [
      'B',
      '9f2c41d7'.repeat(8),
      'approved',
      'M. Okafor-Lindqvist, 2026-11-24',
      'NC 1912.4',
      '1/1',
    ]) {
      expect(texts).toContain(text)
    }
  })

  it('warns: do not scale, no timber before the first-off, the bar to measure', () => {
    expect(words).toContain('Do not scale')
    expect(words).toContain('Run no timber before the first-off is accepted in writing.')
    expect(words).toContain('Measure this bar: it must be 100 mm long.')
  })

  it('speaks the workshop’s other vocabulary and unit without mixing them', () => {
    const american = textsOf(sheetsOf(aSheetInput({ unit: 'in', vocabulary: 'molding', mill: {} }))).join(' ')
    expect(american).toContain('Run no lumber before the first piece is accepted in writing.')
    expect(american).toContain('it must be 4 in long')
    expect(american).not.toMatch(/\bmm\b|rebate|timber/)
  })

  it('prints ± at about 95 %, twice the standard deviation of the file', () => {
    const section = sectionOf({
      members: [
        {
          ...{ kind: 'ovolo', width: 20, rise: 12 },
          basis: {
            width: { kind: 'measured', plusMinus: 0.3 },
            rise: { kind: 'precedent', citation: 'Pattern drawer of the workshop, no. 14' },
          },
        },
      ],
    })
    const found = textsOf(sheetsOf(aSheetInput({ section, measures: measuresOf(section) })))
    expect(found.some((text) => /^± 0\.60?$/.test(text))).toBe(true)
    expect(found).toContain('precedent')
    expect(found).toContain('not given')
  })

  it('gives no tolerance or gesso that a coarse fraction of an inch would change', () => {
    const inches = textsOf(sheetsOf(aSheetInput({ unit: 'in' })))
    // 0.2 mm is 0.008 in and 0.6 mm is 0.024 in; a 64th would make them 0.4 and 0.8 mm.
    expect(inches).toContain('± 0.008 on the wood section')
    expect(inches.some((text) => text.startsWith('0.024 over the whole face'))).toBe(true)
  })

  it('places the section by the drawing’s own origin', () => {
    const { model, items } = sheetOf(aSheetInput())
    const wood = items.find((item) => item.layer === 'wood')
    const lowest = wood?.kind === 'path' ? Math.min(...wood.path.map(({ start }) => start.y)) : Number.NaN
    expectWithin(lowest, model?.origin.y ?? Number.NaN, { withinMm: 1e-9 })
  })
})
