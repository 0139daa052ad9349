import fc from 'fast-check'
import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import { answerOf } from '@shared/answer'
import { readCommissionFile, readCommissionText } from '@shared/contracts'
import { sectionSha256 } from '@shared/section'
import { expectWithin } from '../../helpers/expect-within'
import { ROOT } from '../../helpers/source-files'

const harbour = JSON.parse(readFileSync(join(ROOT, 'examples', 'harbour-at-low-water.json'), 'utf8'))

function read(content: unknown) {
  const reading = readCommissionFile(content)
  if (reading.kind === 'refused')
    throw new Error(reading.faults.map(({ path, says }) => `${path} ${says}`).join('\n'))
  return reading.file
}
const faultsOf = (content: unknown) => {
  const reading = readCommissionFile(content)
  return reading.kind === 'refused' ? reading.faults.map(({ path, code }) => `${path} ${code}`) : []
}

describe('reading a commission file', () => {
  it('fills in the defaults of the contract', () => {
    const { section, frame } = read({
      listel: 1,
      section: {
        sightEdgeHeight: 30,
        rebate: { width: 8, depth: 20 },
        members: [{ kind: 'fillet', width: 40, rise: 0 }],
      },
      frame: {},
    })
    expect([section?.gesso, section?.tolerance, section?.backSplay, frame]).toEqual([
      0,
      0.2,
      { x: 0, height: 0 },
      { sides: 4, count: 1 },
    ])
  })

  it('takes one reading or several', () => {
    const { picture } = read({ listel: 1, picture: { width: 914, height: [610, 609.5] } })
    expect([picture?.width, picture?.height]).toEqual([[914], [610, 609.5]])
  })

  it('reads inches as numbers and as written, and gives millimetres; pixels and feed stay what they are', () => {
    const file = read({
      listel: 1,
      units: 'in',
      picture: { width: '36 1/4', height: 24 },
      head: { cuttingDiameter: 5, hookAngle: 20, feed: 9000 },
      photographs: [
        {
          id: 'p1',
          width: 2400,
          height: 1700,
          reference: { width: '36"', height: 24, corners: [[1, 2], [3, 4], [5, 6], null] },
        },
      ],
    })
    expect(file.picture?.width).toEqual([36.25 * 25.4])
    expectWithin(file.head?.cuttingDiameter ?? 0, 127, { withinMm: 1e-12 })
    expect(file.head?.feed).toBe(9000)
    expect(file.photographs?.[0]?.width).toBe(2400)
    expect(file.photographs?.[0]?.reference.corners?.[1]).toEqual([3, 4])
  })

  it('answers the same for a file in inches as for the same file in millimetres', () => {
    const inInches = (value: unknown, key = ''): unknown => {
      const lengths = /^(width|rise|depth|height|sightEdgeHeight|gesso|plusMinus|tolerance|x)$/
      if (typeof value === 'number') return lengths.test(key) ? value / 25.4 : value
      if (Array.isArray(value)) return value.map((one) => inInches(one, key))
      if (typeof value !== 'object' || value === null) return value
      return Object.fromEntries(Object.entries(value).map(([name, one]) => [name, inInches(one, name)]))
    }
    const mm = answerOf(read({ listel: 1, section: harbour.section }))
    const inches = answerOf(read({ listel: 1, units: 'in', section: inInches(harbour.section) }))
    expectWithin(inches.section?.area ?? 0, mm.section?.area ?? 1, { withinRatio: 1e-12 })
    expectWithin(inches.wood?.area ?? 0, mm.wood?.area ?? 1, { withinRatio: 1e-9 })
  })

  it('refuses texts as lengths in a file of millimetres, and names every fault at once', () => {
    expect(
      faultsOf({ listel: 1, lengths: [{ length: '2440' }, { length: -1 }], colour: 1, saw: { kerf: null } }),
    ).toEqual(
      expect.arrayContaining([
        '/colour unknown-key',
        '/saw/kerf invalid-type',
        '/lengths/0/length invalid-type',
      ]),
    )
  })

  it('wants across flats for a polygon and width and height for a rectangle', () => {
    expect(faultsOf({ listel: 1, frame: { sides: 6 }, picture: { width: 1, height: 1 } })).toEqual([
      '/picture/acrossFlats missing',
      '/picture/width not-wanted',
      '/picture/height not-wanted',
    ])
    expect(faultsOf({ listel: 1, picture: { acrossFlats: 400 } })).toContain('/picture/width missing')
  })

  it('refuses an id that stands twice', () => {
    expect(
      faultsOf({
        listel: 1,
        rack: [
          { id: 'R-1', length: 900 },
          { id: 'R-1', length: 800 },
        ],
      }),
    ).toEqual(['/rack/1/id repeated'])
  })

  it('never throws, whatever JSON it is given', () => {
    fc.assert(
      fc.property(fc.jsonValue(), (value) => {
        expect(['read', 'refused']).toContain(readCommissionFile(value).kind)
      }),
    )
  })

  it('never throws on a known file with any one value replaced', () => {
    const paths = (value: unknown, path: readonly string[] = []): string[][] =>
      typeof value === 'object' && value !== null
        ? [[...path], ...Object.entries(value).flatMap(([key, one]) => paths(one, [...path, key]))]
        : [[...path]]
    const all = paths(harbour).filter((path) => path.length > 0)
    fc.assert(
      fc.property(fc.constantFrom(...all), fc.jsonValue(), (path, value) => {
        const changed = structuredClone(harbour)
        const parent = path.slice(0, -1).reduce((at, key) => at[key], changed)
        parent[path.at(-1) ?? ''] = value
        const reading = readCommissionFile(changed)
        if (reading.kind === 'refused') expect(reading.faults.length).toBeGreaterThan(0)
      }),
    )
  })

  it('knows a file that is too large or not JSON', () => {
    expect(readCommissionText('{}', 9 * 1024 * 1024)).toMatchObject({
      kind: 'refused',
      faults: [{ code: 'too-large' }],
    })
    expect(readCommissionText('{', 1)).toMatchObject({ kind: 'refused', faults: [{ code: 'not-json' }] })
  })

  it('has the hash of a section whatever else the file holds and in whatever order its keys stand', () => {
    const { section } = read(harbour)
    const shuffled = read({
      section: Object.fromEntries(Object.entries(harbour.section).toReversed()),
      listel: 1,
    })
    expect(section && sectionSha256(section)).toBe(shuffled.section && sectionSha256(shuffled.section))
  })
})
