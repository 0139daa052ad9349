import { beforeAll, describe, expect, it } from 'vitest'
import { correctedOutline, CORRECTED_NOTE, knifeHeadFrom, knifeTable } from '@shared/knife'
import { measuresOf, woodFaceOf } from '@shared/section'
import { drawingSpaceOf, dxfOf, knifeDrawingOf, pdfOf, sheetsOf, svgOf, textWidthMm } from '@shared/sheet'
import type { Drawing, SheetInput } from '@shared/sheet'
import { expectWithin } from '../../helpers/expect-within'
import { itemsOutside, overlappingTexts } from '../../unit/sheet/layout-check'
import { aSheetInput, sectionOf } from '../../unit/sheet/sheet-cases'
import { boundsOfPoints, greatestDeparture, joinedChain, polygonArea } from './compare'
import { pdfOptions } from './fonts'
import { readDxf } from './read-dxf'
import type { ReadDxf } from './read-dxf'
import { readPdf } from './read-pdf'
import type { ReadPage, ReadPoint } from './read-pdf'
import { readSvg } from './read-svg'

/**
 * A section whose every figure is worked out by hand. Sight edge 30 high, rebate 8 × 24; fillet 4; ovolo of radius 12 up to
 * y = 42; fillet of 10; upright fillet down 6; cavetto of radius 10 down to y = 26. Width 4 + 12 + 10 + 10 = 36, depth 42.
 * Area: under the fillet 4·30; under the ovolo 12·30 + 36π; under the flat 10·42; under the cavetto, hollow to its lower
 * right, 10·36 − 25π; less the rebate 8·24.
 */
const WIDTH = 36
const DEPTH = 42
const AREA_MM2 = 4 * 30 + (12 * 30 + 36 * Math.PI) + 10 * 42 + (10 * 36 - 25 * Math.PI) - 8 * 24

const members = [
  { kind: 'fillet', width: 4, rise: 0 },
  { kind: 'ovolo', width: 12, rise: 12 },
  { kind: 'fillet', width: 10, rise: 0 },
  { kind: 'fillet', width: 0, rise: -6 },
  { kind: 'cavetto', width: 10, rise: -10 },
] as const

const plain = sectionOf({ members })

const inputFor = (section = plain): SheetInput => aSheetInput({ section, measures: measuresOf(section) })

/** The chains of the wood and the rebate put together, seen from the section's own origin. */
const outlineIn = (layers: ReadDxf['layers'], wood: string, rebate: string): ReadPoint[] =>
  joinedChain([...(layers.get(rebate) ?? []), ...(layers.get(wood) ?? [])], 1e-4)

const fromOrigin = (points: readonly ReadPoint[], { model }: Drawing): ReadPoint[] =>
  points.map(({ x, y }) => ({
    x: (x - (model?.origin.x ?? Number.NaN)) / (model?.scale ?? Number.NaN),
    y: (y - (model?.origin.y ?? Number.NaN)) / (model?.scale ?? Number.NaN),
  }))

/** In the PDF nothing has a name: the section is what is drawn wide, lies left of the title block and is no box. */
function outlineInPdf(page: ReadPage, drawing: Drawing): ReadPoint[] {
  const wide = page.paths.filter(
    ({ lineWidthMm, isFilled }) => Math.abs(lineWidthMm - 0.5) < 1e-4 && !isFilled,
  )
  const chains = wide.flatMap(({ stretches }) => stretches).map((points) => fromOrigin(points, drawing))
  const own = chains.filter((points) => {
    const { min, max } = boundsOfPoints(points)
    return min.x > -1 && max.x < WIDTH + 1 && min.y > -1 && max.y < DEPTH + 1
  })
  return joinedChain(
    own.sort((a, b) => a.length - b.length),
    1e-3,
  )
}

function expectBounds(points: readonly ReadPoint[], withinMm: number): void {
  const { min, max } = boundsOfPoints(points)
  expectWithin(min.x, 0, { withinMm })
  expectWithin(min.y, 0, { withinMm })
  expectWithin(max.x, WIDTH, { withinMm })
  expectWithin(max.y, DEPTH, { withinMm })
}

describe('a profile sheet, read back from its three files', () => {
  const pages = sheetsOf(inputFor())
  const [drawing] = pages
  let page: ReadPage
  beforeAll(async () => {
    const [first] = await readPdf(await pdfOf(pages, pdfOptions))
    if (first === undefined) throw new Error('the PDF has no page')
    page = first
  })
  if (drawing === undefined) throw new Error('there is no sheet')
  const dxf = outlineIn(readDxf(dxfOf(drawing)).layers, 'WOOD', 'REBATE')
  const svg = fromOrigin(outlineIn(readSvg(svgOf(drawing)).layers, 'wood', 'rebate'), drawing)

  it('holds the section at 1:1 in each, with the area worked out by hand', () => {
    const pdf = outlineInPdf(page, drawing)
    for (const points of [dxf, svg, pdf]) {
      expectBounds(points, 0.001)
      expectWithin(Math.abs(polygonArea(points)), AREA_MM2, { withinMm2: 0.05 })
    }
  })

  it('agrees between the three within 0.01 mm everywhere', () => {
    const pdf = outlineInPdf(page, drawing)
    for (const [one, other] of [
      [pdf, dxf],
      [dxf, pdf],
      [svg, dxf],
      [dxf, svg],
    ] as const) {
      expect(greatestDeparture(one, other)).toBeLessThan(0.01)
    }
  })

  it('keeps the quarter circles as arcs in the DXF: bulge tan(90°/4)', () => {
    const { bulges } = readDxf(dxfOf(drawing))
    expect(bulges).toHaveLength(2)
    for (const bulge of bulges) expectWithin(Math.abs(bulge), Math.tan(Math.PI / 8), { within: 1e-6 })
  })

  it('has a check bar of 100 mm', () => {
    const bottom = page.paths.filter(({ isFilled, stretches }) => {
      const { min, max } = boundsOfPoints(stretches.flat())
      return isFilled && Math.abs(max.y - min.y - 3) < 1e-3
    })
    const outlined = page.paths.filter(({ isFilled, lineWidthMm, stretches }) => {
      const { min, max } = boundsOfPoints(stretches.flat())
      return !isFilled && Math.abs(max.y - min.y + lineWidthMm - 3) < 1e-3
    })
    expect(bottom).toHaveLength(5)
    const [frame] = outlined
    const { min, max } = boundsOfPoints(frame?.stretches.flat() ?? [])
    // The frame's line lies inside: its outer edges are half a line width beyond its middle at either end.
    expectWithin(max.x - min.x + (frame?.lineWidthMm ?? Number.NaN), 100, { withinMm: 0.01 })
    const left = Math.min(...bottom.map(({ stretches }) => boundsOfPoints(stretches.flat()).min.x))
    expectWithin(left, min.x - (frame?.lineWidthMm ?? Number.NaN) / 2, { withinMm: 0.01 })
  })

  it('has its words as text that can be searched, as wide in the font as they were laid out', () => {
    const words = page.texts.map(({ text }) => text).join(' ')
    for (const text of [
      'Harbour at low water',
      'Wood section 1:1',
      'not scale',
      'cavetto',
      '2: R 12.0',
      '9f2c41d7'.repeat(8),
    ]) {
      expect(words).toContain(text)
    }
    const laidOut = drawing.items.flatMap((item) => (item.kind === 'text' ? [item] : []))
    const compared = page.texts.filter(({ text, widthMm }) => {
      const widths = laidOut
        .filter((item) => item.text === text)
        .map((item) => textWidthMm(text, item.heightMm, item.weight))
      const nearest = widths.toSorted((a, b) => Math.abs(a - widthMm) - Math.abs(b - widthMm))[0]
      if (nearest === undefined) return false
      expectWithin(widthMm, nearest, { withinMm: 0.02 })
      return true
    })
    expect(compared.length).toBeGreaterThan(60)
  })

  it('is a sheet of ISO 5457, with its frame 20 mm from the left edge and 10 mm from the others', () => {
    expectWithin(page.widthMm, 420, { withinMm: 0.01 })
    expectWithin(page.heightMm, 297, { withinMm: 0.01 })
    const frame = page.paths.find(
      ({ lineWidthMm, stretches }) => lineWidthMm > 0.69 && stretches.length === 1,
    )
    const { min, max } = boundsOfPoints(frame?.stretches.flat() ?? [])
    expectWithin(min.x, 20, { withinMm: 0.01 })
    expectWithin(max.x, 410, { withinMm: 0.01 })
    expectWithin(min.y, 10, { withinMm: 0.01 })
    expectWithin(max.y, 287, { withinMm: 0.01 })
  })
})

describe('a sheet with gesso', () => {
  it('draws the finished face beside the wood, the gesso’s thickness away', () => {
    const gesso = 0.6
    const section = sectionOf({ members, gesso })
    const [drawing] = sheetsOf(inputFor(section))
    const { layers } = readDxf(dxfOf(drawing ?? fail()))
    const wood = joinedChain(layers.get('WOOD') ?? [], 1e-4)
    const [finished = []] = layers.get('FINISHED_FACE') ?? []
    // Along the flats the two are parallel: y = 30 over y = 29.4 at the sight edge, 42 over 41.4 on the top.
    for (const [x, y] of [
      [2, 30],
      [20, 42],
    ] as const) {
      expect(greatestDeparture([{ x, y }], finished)).toBeLessThan(1e-3)
      expectWithin(greatestDeparture([{ x, y }], wood), gesso, { withinMm: 1e-3 })
    }
  })
})

describe('a sheet at a reduced scale', () => {
  it('still holds the section at 1:1 in the DXF', () => {
    const section = sectionOf({
      sightEdgeHeight: 60,
      members: [
        { kind: 'fillet', width: 1100, rise: 0 },
        { kind: 'ovolo', width: 200, rise: 200 },
      ],
    })
    const [drawing] = sheetsOf(inputFor(section))
    expect(drawing?.model?.scale).toBe(0.5)
    const points = outlineIn(readDxf(dxfOf(drawing ?? fail())).layers, 'WOOD', 'REBATE')
    const { max } = boundsOfPoints(points)
    expectWithin(max.x, 1300, { withinMm: 1e-4 })
    expectWithin(max.y, 260, { withinMm: 1e-4 })
  })
})

describe('the drawing of the corrected knife', () => {
  const face = woodFaceOf(plain).path
  const head = knifeHeadFrom(125, 20)
  const outline = correctedOutline(face, head)
  const table = knifeTable(face, head)
  if (outline.kind !== 'corrected' || table.kind !== 'table') throw new Error('the head refuses this face')
  const pages = knifeDrawingOf({
    ...inputFor(),
    path: outline.path,
    table: table.rows,
    note: outline.note,
    head: 'Corrected for a cutting circle of 125 mm and a hook of 20°',
  })

  it('says in large letters that it is no template, on every page, and is legible', () => {
    for (const page of pages) {
      const note = page.items.find((item) => item.kind === 'text' && item.text === CORRECTED_NOTE)
      expect(note?.kind === 'text' && note.heightMm >= 3.5).toBe(true)
      expect(overlappingTexts(page)).toEqual([])
      expect(itemsOutside(page, drawingSpaceOf(page))).toEqual([])
    }
  })

  it('holds the edge at 1:1: e = R sin γ, s = √(R² − e²) − √(r² − e²) at the deepest place', () => {
    const [drawing] = pages
    const [knife = []] = readDxf(dxfOf(drawing ?? fail())).layers.get('KNIFE_CORRECTED') ?? []
    const { min, max } = boundsOfPoints(knife)
    const radius = 62.5
    const offset = radius * Math.sin((20 * Math.PI) / 180)
    // The face falls from y = 42 to y = 26: D = 16.
    const height = Math.sqrt(radius ** 2 - offset ** 2) - Math.sqrt((radius - 16) ** 2 - offset ** 2)
    expectWithin(max.y - min.y, height, { withinMm: 0.01 })
    expectWithin(max.x - min.x, WIDTH, { withinMm: 0.01 })
  })

  it('prints every row of the table', () => {
    const cells = pages.flatMap(({ items }) =>
      items.filter((item) => item.kind === 'text' && item.layer === 'table'),
    )
    const headings = cells.filter((item) => item.kind === 'text' && item.weight === 'semibold')
    expect(cells.length - headings.length).toBe(3 * table.rows.length)
  })
})

function fail(): never {
  throw new Error('there is no sheet')
}
