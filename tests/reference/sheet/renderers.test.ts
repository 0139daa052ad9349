import { describe, expect, it } from 'vitest'
import { arcFromBulge, cubicFrom, lineFrom, quarterEllipseFrom } from '@shared/geometry'
import type { Path } from '@shared/geometry'
import { dxfOf, linesItem, pathItem, pdfOf, svgOf, textItem } from '@shared/sheet'
import type { Drawing } from '@shared/sheet'
import { expectWithin } from '../../helpers/expect-within'
import { boundsOfPoints, greatestDeparture, polygonArea } from './compare'
import { pdfOptions } from './fonts'
import { readDxf } from './read-dxf'
import { readPdf } from './read-pdf'
import { readSvg } from './read-svg'

/**
 * One closed outline with every kind of segment, on paper at (50, 60): a bottom of 40, a half circle of radius 10 out at the
 * right, a quarter ellipse 16 × 8 rising to the left, a cubic, and the way back. Its area has a closed form.
 */
const at = (x: number, y: number) => ({ x: 50 + x, y: 60 + y })
const outline: Path = [
  lineFrom(at(0, 0), at(40, 0)),
  arcFromBulge(at(40, 0), at(40, 20), 1),
  quarterEllipseFrom(at(40, 20), at(24, 28), 'upright'),
  cubicFrom(at(24, 28), at(16, 28), at(8, 28), at(0, 20)),
  lineFrom(at(0, 20), at(0, 0)),
]
// Rectangle 40 × 20; half disc 50π; quarter ellipse 32π over [24, 40]; under the cubic, above y = 20: with
// x = 24 − 24t exactly, y = 8(1 − t³), the area is 24·8·(1 − 1/4) = 144.
const AREA_MM2 = 40 * 20 + 50 * Math.PI + 32 * Math.PI + 144

const drawing: Drawing = {
  title: 'Every kind of segment',
  widthMm: 210,
  heightMm: 148,
  items: [
    pathItem('wood', outline, 0.5, { closed: true }),
    pathItem('rebate', [arcFromBulge(at(0, -20), at(20, -20), -0.5)], 0.25),
    linesItem('dimensions', [[at(0, -5), at(40, -5)]], 0.18, { dash: 'dashed' }),
    textItem('labels', at(5, 5), 'R 10 ± ½ – “é” <&>', 2.5),
    textItem('labels', at(60, 5), 'upright', 2.5, { rotationRad: Math.PI / 2, anchor: 'end' }),
    textItem('title-block', { x: 20, y: 20 }, 'on paper only', 3.5, { weight: 'semibold' }),
  ],
  model: { origin: at(0, 0), scale: 0.5, notes: ['half size on paper'] },
}

/** x = 50 … 100, y = 60 … 88. */
const BOUNDS = { min: at(0, 0), max: at(50, 28) }

describe('the drawing as PDF, read by an independent reader', () => {
  it('holds the outline at true size', async () => {
    const [page] = await readPdf(await pdfOf([drawing], pdfOptions))
    const wood = page?.paths.find(({ lineWidthMm }) => Math.abs(lineWidthMm - 0.5) < 1e-6)?.stretches[0] ?? []
    const bounds = boundsOfPoints(wood)
    expectWithin(bounds.min.x, BOUNDS.min.x, { withinMm: 1e-3 })
    expectWithin(bounds.min.y, BOUNDS.min.y, { withinMm: 1e-3 })
    expectWithin(bounds.max.x, BOUNDS.max.x, { withinMm: 1e-3 })
    expectWithin(bounds.max.y, BOUNDS.max.y, { withinMm: 1e-3 })
    expectWithin(polygonArea(wood), AREA_MM2, { withinMm2: 0.02 })
    expectWithin(page?.widthMm ?? Number.NaN, 210, { withinMm: 1e-3 })
    expectWithin(page?.heightMm ?? Number.NaN, 148, { withinMm: 1e-3 })
  })

  it('holds its text as text, as wide as we measure it', async () => {
    const [page] = await readPdf(await pdfOf([drawing], pdfOptions))
    expect(page?.texts.map(({ text }) => text)).toEqual(['R 10 ± ½ – “é” <&>', 'upright', 'on paper only'])
    expectWithin(page?.texts[0]?.at.x ?? Number.NaN, 55, { withinMm: 1e-3 })
    // 'upright' ends at its anchor and reads upward.
    const upright = page?.texts[1]
    expectWithin((upright?.at.y ?? Number.NaN) + (upright?.widthMm ?? Number.NaN), 65, { withinMm: 0.02 })
  })

  it('is the same, byte for byte, each time', async () => {
    const first = await pdfOf([drawing, drawing], pdfOptions)
    const second = await pdfOf([drawing, drawing], pdfOptions)
    expect(Buffer.from(first).equals(Buffer.from(second))).toBe(true)
    const other = await pdfOf([drawing], { ...pdfOptions, fileId: 'f'.repeat(32) })
    expect(Buffer.from(first).equals(Buffer.from(other))).toBe(false)
  })

  it('embeds its font and no other, and asks not to be scaled when printed', async () => {
    const text = Buffer.from(await pdfOf([drawing], pdfOptions)).toString('latin1')
    expect(text).toMatch(/\/FontFile2/)
    expect(
      [...text.matchAll(/\/BaseFont\s*\/([\w-]+)/g)].every(([, name]) => name?.includes('WorkSans')),
    ).toBe(true)
    expect(text).toMatch(/\/PrintScaling\s*\/None/)
    expect(text).toContain("D:20261201093000+00'00'")
  })

  it('refuses a date or a file id that it cannot write', async () => {
    await expect(pdfOf([drawing], { ...pdfOptions, createdAt: 'yesterday' })).rejects.toThrow(
      /instant in UTC/,
    )
    await expect(pdfOf([drawing], { ...pdfOptions, fileId: 'x' })).rejects.toThrow(/32 hexadecimal/)
    await expect(pdfOf([], pdfOptions)).rejects.toThrow(/at least one page/)
  })
})

describe('the drawing as SVG, read by an XML parser', () => {
  it('holds the outline at true size, and every arc as an arc', () => {
    const svg = readSvg(svgOf(drawing))
    const [wood = []] = svg.layers.get('wood') ?? []
    const bounds = boundsOfPoints(wood)
    expectWithin(bounds.min.x, BOUNDS.min.x, { withinMm: 1e-4 })
    expectWithin(bounds.min.y, BOUNDS.min.y, { withinMm: 1e-4 })
    expectWithin(bounds.max.x, BOUNDS.max.x, { withinMm: 1e-4 })
    expectWithin(bounds.max.y, BOUNDS.max.y, { withinMm: 1e-4 })
    expectWithin(polygonArea(wood), AREA_MM2, { withinMm2: 0.02 })
    expect(svgOf(drawing).match(/ A /g)).toHaveLength(3)
  })

  it('lets no text become markup', () => {
    const hostile = '</text><script>alert(1)</script>&"\''
    const svg = readSvg(
      svgOf({ ...drawing, title: hostile, items: [textItem('notes', at(0, 0), hostile, 2.5)] }),
    )
    expect(svg.texts).toEqual([hostile])
    expect(svg.elementNames).not.toContain('script')
  })
})

describe('the drawing as DXF, read by an independent parser', () => {
  const dxf = readDxf(dxfOf(drawing))

  it('says what it is: the 2000 form, millimetres', () => {
    expect(dxf.version).toBe('AC1015')
    expect(dxf.units).toBe(4)
    expect(dxf.layerNames).toEqual(
      expect.arrayContaining(['WOOD', 'REBATE', 'FINISHED_FACE', 'DIMENSIONS', 'TEXT']),
    )
  })

  it('holds the outline at twice the paper’s size, since the paper has it at 1:2, from its own origin', () => {
    const [wood = []] = dxf.layers.get('WOOD') ?? []
    const bounds = boundsOfPoints(wood)
    expectWithin(bounds.min.x, 0, { withinMm: 0.005 })
    expectWithin(bounds.min.y, 0, { withinMm: 0.005 })
    expectWithin(bounds.max.x, 100, { withinMm: 0.005 })
    expectWithin(bounds.max.y, 56, { withinMm: 0.005 })
    expectWithin(polygonArea(wood), 4 * AREA_MM2, { withinMm2: 0.2 })
  })

  it('keeps arcs as arcs: a half circle has the bulge 1', () => {
    expect(dxf.bulges.some((bulge) => Math.abs(bulge - 1) < 1e-6)).toBe(true)
    expect(dxf.entityKinds).toEqual(new Set(['LWPOLYLINE', 'ARC', 'LINE', 'TEXT']))
  })

  it('runs a clockwise arc the right way round', () => {
    // Chord 40 at true size, bulge −0.5: sagitta 10, and a clockwise arc from left to right lies above its chord.
    const [arc = []] = dxf.layers.get('REBATE') ?? []
    const bounds = boundsOfPoints(arc)
    expectWithin(bounds.min.y, -40, { withinMm: 1e-3 })
    expectWithin(bounds.max.y, -30, { withinMm: 1e-3 })
  })

  it('makes curves into arcs that stay within 0.005 mm', async () => {
    const [page] = await readPdf(await pdfOf([drawing], pdfOptions))
    const paper =
      page?.paths.find(({ lineWidthMm }) => Math.abs(lineWidthMm - 0.5) < 1e-6)?.stretches[0] ?? []
    const trueSize = paper.map(({ x, y }) => ({ x: (x - 50) * 2, y: (y - 60) * 2 }))
    const [wood = []] = dxf.layers.get('WOOD') ?? []
    expect(greatestDeparture(trueSize, wood)).toBeLessThan(0.0055)
  })

  it('leaves the paper out and takes its notes along', () => {
    expect(dxf.texts.some((text) => text.includes('on paper only'))).toBe(false)
    expect(dxf.texts.some((text) => text.includes('half size on paper'))).toBe(true)
  })

  it('refuses a page without a drawing to scale', () => {
    const { model: _, ...page } = drawing
    expect(() => dxfOf(page)).toThrow(/no DXF/)
  })
})
