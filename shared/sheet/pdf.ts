import type { jsPDF } from 'jspdf'
import { assertNever, Failure } from '@shared/failure'
import { arcGeometryOf } from '@shared/geometry'
import type { Path, Point, Segment } from '@shared/geometry'
import { dashPattern } from './drawing'
import type { Drawing, DrawingItem, LinesItem, PathItem, TextItem, Tone, Weight } from './drawing'
import { emOf, plainLine, textWidthMm } from './lettering'

/** What the PDF needs from outside, so that the same drawing always gives the same bytes. */
export interface PdfOptions {
  /** The lettering's TrueType files (Work Sans 400 and 600), base64. */
  readonly fonts: Readonly<Record<Weight, string>>
  /** Written as the file's date: an instant in UTC, such as 2026-12-01T09:30:00Z. */
  readonly createdAt: string
  /** 32 hexadecimal digits that name the file, such as the first half of the hash. */
  readonly fileId: string
  readonly title: string
  readonly author: string
}

const FONT_FAMILY = 'WorkSans'
const STYLES: Record<Weight, string> = { regular: 'normal', semibold: 'bold' }
const GREYS: Record<Tone, number> = { ink: 0, grey: 150, pale: 232, white: 255 }
const POINTS_PER_MM = 72 / 25.4
/** Widest stretch of a circle drawn as one cubic: at π/8 the cubic leaves the circle by less than 10⁻⁷ of its radius. */
const WIDEST_CUBIC_RAD = Math.PI / 8

/**
 * The pages as one PDF at true size: vector paths, selectable text in the embedded font, and a request to the viewer
 * not to scale when printing. The package is loaded when first asked for, since no screen needs it before.
 */
export async function pdfOf(pages: readonly Drawing[], options: PdfOptions): Promise<Uint8Array> {
  const [first, ...rest] = pages
  if (first === undefined) throw new Failure('input-invalid', { says: 'a document needs at least one page' })
  const createdAt = pdfDateOf(options.createdAt)
  if (!/^[0-9a-f]{32}$/i.test(options.fileId)) {
    throw new Failure('input-invalid', { says: 'the file id must be 32 hexadecimal digits' })
  }
  const { jsPDF: Document } = await import('jspdf')
  const document = new Document({
    unit: 'mm',
    format: formatOf(first),
    orientation: orientationOf(first),
    compress: true,
    putOnlyUsedFonts: true,
  })
  document.setFileId(options.fileId.toUpperCase())
  document.setCreationDate(createdAt)
  document.setProperties({
    title: plainLine(options.title),
    author: plainLine(options.author),
    creator: 'Listel',
  })
  document.viewerPreferences({ PrintScaling: 'None' })
  for (const weight of ['regular', 'semibold'] as const) {
    document.addFileToVFS(`${FONT_FAMILY}-${weight}.ttf`, options.fonts[weight])
    document.addFont(`${FONT_FAMILY}-${weight}.ttf`, FONT_FAMILY, STYLES[weight])
  }
  drawPage(document, first)
  for (const page of rest) {
    document.addPage(formatOf(page), orientationOf(page))
    drawPage(document, page)
  }
  return new Uint8Array(document.output('arraybuffer'))
}

const formatOf = (page: Drawing): [number, number] => [page.widthMm, page.heightMm]
const orientationOf = (page: Drawing) => (page.widthMm > page.heightMm ? 'landscape' : 'portrait')

/** The PDF form of an instant: D:YYYYMMDDHHmmSS+00'00'. */
function pdfDateOf(instant: string): string {
  const parts = /^(\d{4})-(\d{2})-(\d{2})T(\d{2}):(\d{2}):(\d{2})(?:\.\d+)?Z$/.exec(instant)
  if (parts === null) {
    throw new Failure('input-invalid', {
      says: `the date of a file must be an instant in UTC such as 2026-12-01T09:30:00Z; it is ${instant}`,
    })
  }
  return `D:${parts.slice(1).join('')}+00'00'`
}

function drawPage(document: jsPDF, page: Drawing): void {
  document.setLineCap('round')
  document.setLineJoin('round')
  for (const item of page.items) drawItem(document, item, page.heightMm)
}

function drawItem(document: jsPDF, item: DrawingItem, pageHeightMm: number): void {
  switch (item.kind) {
    case 'path':
      return drawPath(document, item, pageHeightMm)
    case 'lines':
      return drawLines(document, item, pageHeightMm)
    case 'text':
      return drawText(document, item, pageHeightMm)
    default:
      return assertNever(item)
  }
}

function drawPath(document: jsPDF, item: PathItem, pageHeightMm: number): void {
  const start = item.path[0]?.start
  if (start === undefined || (item.lineWidthMm === 0 && item.fill === 'none')) return
  setLine(document, item)
  document.moveTo(start.x, pageHeightMm - start.y)
  traceSegments(document, item.path, pageHeightMm)
  if (item.closed) document.close()
  if (item.fill === 'none') {
    document.stroke()
    return
  }
  const fill = GREYS[item.fill]
  document.setFillColor(fill, fill, fill)
  if (item.lineWidthMm === 0) document.fill()
  else document.fillStroke()
}

function drawLines(document: jsPDF, item: LinesItem, pageHeightMm: number): void {
  if (item.lines.length === 0) return
  setLine(document, item)
  for (const [from, to] of item.lines) {
    document.moveTo(from.x, pageHeightMm - from.y)
    document.lineTo(to.x, pageHeightMm - to.y)
  }
  document.stroke()
}

function setLine(document: jsPDF, { lineWidthMm, tone, dash }: PathItem | LinesItem): void {
  document.setLineWidth(lineWidthMm)
  document.setDrawColor(GREYS[tone])
  document.setLineDashPattern(dash === 'dashed' ? [...dashPattern(lineWidthMm)] : [], 0)
}

function traceSegments(document: jsPDF, path: Path, pageHeightMm: number): void {
  for (const segment of path) {
    if (segment.kind === 'line') {
      document.lineTo(segment.end.x, pageHeightMm - segment.end.y)
      continue
    }
    for (const [control1, control2, end] of cubicsOf(segment)) {
      document.curveTo(
        control1.x,
        pageHeightMm - control1.y,
        control2.x,
        pageHeightMm - control2.y,
        end.x,
        pageHeightMm - end.y,
      )
    }
  }
}

type Cubic = readonly [Point, Point, Point]

function cubicsOf(segment: Exclude<Segment, { kind: 'line' }>): readonly Cubic[] {
  switch (segment.kind) {
    case 'cubic':
      return [[segment.control1, segment.control2, segment.end]]
    case 'arc': {
      const { centre, radius, startRad, sweepRad } = arcGeometryOf(segment)
      return ellipseCubics(
        { centre, semiX: radius, semiY: radius, rotationRad: 0, startRad, sweepRad },
        segment.end,
      )
    }
    case 'ellipse':
      return ellipseCubics(segment, segment.end)
    default:
      return assertNever(segment)
  }
}

interface EllipseShape {
  readonly centre: Point
  readonly semiX: number
  readonly semiY: number
  readonly rotationRad: number
  readonly startRad: number
  readonly sweepRad: number
}

/** Cubics along an elliptical arc; handles of length 4/3·tan(θ/4) on the unit circle. The last ends on the very end point. */
function ellipseCubics(shape: EllipseShape, end: Point): Cubic[] {
  const count = Math.max(1, Math.ceil(Math.abs(shape.sweepRad) / WIDEST_CUBIC_RAD))
  const step = shape.sweepRad / count
  const handle = (4 / 3) * Math.tan(step / 4)
  return Array.from({ length: count }, (_, index) => {
    const from = shape.startRad + index * step
    const to = from + step
    const control1 = fromUnitCircle(
      shape,
      Math.cos(from) - handle * Math.sin(from),
      Math.sin(from) + handle * Math.cos(from),
    )
    const control2 = fromUnitCircle(
      shape,
      Math.cos(to) + handle * Math.sin(to),
      Math.sin(to) - handle * Math.cos(to),
    )
    return [
      control1,
      control2,
      index === count - 1 ? end : fromUnitCircle(shape, Math.cos(to), Math.sin(to)),
    ] as const
  })
}

function fromUnitCircle(shape: EllipseShape, u: number, v: number): Point {
  const along = shape.semiX * u
  const across = shape.semiY * v
  const cos = Math.cos(shape.rotationRad)
  const sin = Math.sin(shape.rotationRad)
  return { x: shape.centre.x + along * cos - across * sin, y: shape.centre.y + along * sin + across * cos }
}

/** Text is placed by its start, from our own widths, so that the anchor means the same in all three files. */
function drawText(document: jsPDF, item: TextItem, pageHeightMm: number): void {
  const text = plainLine(item.text)
  if (text === '') return
  const width = textWidthMm(text, item.heightMm, item.weight)
  const back = item.anchor === 'start' ? 0 : item.anchor === 'middle' ? width / 2 : width
  const x = item.at.x - back * Math.cos(item.rotationRad)
  const y = item.at.y - back * Math.sin(item.rotationRad)
  document.setFont(FONT_FAMILY, STYLES[item.weight])
  document.setFontSize(emOf(item.heightMm) * POINTS_PER_MM)
  document.setTextColor(GREYS[item.tone])
  document.text(text, x, pageHeightMm - y, { angle: (item.rotationRad * 180) / Math.PI })
}
