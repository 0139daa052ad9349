import { assertNever } from '@shared/failure'
import { arcGeometryOf } from '@shared/geometry'
import type { Path, Point, Segment } from '@shared/geometry'
import { dashPattern } from './drawing'
import type { Dash, Drawing, DrawingItem, LinesItem, PathItem, TextItem, Tone } from './drawing'
import { emOf, plainLine } from './lettering'

const TONES: Record<Tone, string> = { ink: '#000', grey: '#969696', pale: '#e8e8e8', white: '#fff' }
const WEIGHTS: Record<TextItem['weight'], number> = { regular: 400, semibold: 600 }
const ANCHORS: Record<TextItem['anchor'], string> = { start: 'start', middle: 'middle', end: 'end' }

/** Places kept of a coordinate, mm: a nanometre. */
const PLACES = 6

/**
 * The drawing as SVG 1.1, one user unit to the millimetre and the page in millimetres; arcs stay arcs. All text is
 * escaped: nothing in a title can become markup.
 */
export function svgOf(drawing: Drawing): string {
  const { widthMm, heightMm } = drawing
  const body = drawing.items.map((item) => itemOf(item, heightMm)).join('\n')
  return [
    '<?xml version="1.0" encoding="UTF-8"?>',
    `<svg xmlns="http://www.w3.org/2000/svg" width="${numberOf(widthMm)}mm" height="${numberOf(heightMm)}mm" viewBox="0 0 ${numberOf(widthMm)} ${numberOf(heightMm)}" font-family="'Work Sans', sans-serif" stroke-linecap="round" stroke-linejoin="round" role="img">`,
    `<title>${escaped(plainLine(drawing.title))}</title>`,
    `<rect width="${numberOf(widthMm)}" height="${numberOf(heightMm)}" fill="#fff"/>`,
    body,
    '</svg>',
    '',
  ].join('\n')
}

function itemOf(item: DrawingItem, pageHeightMm: number): string {
  switch (item.kind) {
    case 'path':
      return pathOf(item, pageHeightMm)
    case 'lines':
      return linesOf(item, pageHeightMm)
    case 'text':
      return textOf(item, pageHeightMm)
    default:
      return assertNever(item)
  }
}

function pathOf(item: PathItem, pageHeightMm: number): string {
  const fill = item.fill === 'none' ? 'none' : TONES[item.fill]
  const data = `${pathDataOf(item.path, pageHeightMm)}${item.closed ? ' Z' : ''}`
  return `<path data-layer="${item.layer}" d="${data}" fill="${fill}"${strokeOf(item)}/>`
}

function linesOf(item: LinesItem, pageHeightMm: number): string {
  const place = placeOn(pageHeightMm)
  const data = item.lines.map(([from, to]) => `M ${place(from)} L ${place(to)}`).join(' ')
  return `<path data-layer="${item.layer}" d="${data}" fill="none"${strokeOf(item)}/>`
}

function strokeOf({ lineWidthMm, tone, dash }: { lineWidthMm: number; tone: Tone; dash: Dash }): string {
  if (lineWidthMm === 0) return ''
  const dashes =
    dash === 'dashed' ? ` stroke-dasharray="${dashPattern(lineWidthMm).map(numberOf).join(' ')}"` : ''
  return ` stroke="${TONES[tone]}" stroke-width="${numberOf(lineWidthMm)}"${dashes}`
}

function textOf(item: TextItem, pageHeightMm: number): string {
  const place = placeOn(pageHeightMm)
  const [x, y] = place(item.at).split(' ')
  const turn =
    item.rotationRad === 0
      ? ''
      : ` transform="rotate(${numberOf((-item.rotationRad * 180) / Math.PI)} ${place(item.at)})"`
  return (
    `<text data-layer="${item.layer}" x="${x}" y="${y}" font-size="${numberOf(emOf(item.heightMm))}" ` +
    `font-weight="${WEIGHTS[item.weight]}" text-anchor="${ANCHORS[item.anchor]}" fill="${TONES[item.tone]}"${turn}>` +
    `${escaped(plainLine(item.text))}</text>`
  )
}

function pathDataOf(path: Path, pageHeightMm: number): string {
  const place = placeOn(pageHeightMm)
  const first = path[0]
  if (first === undefined) return ''
  return [`M ${place(first.start)}`, ...path.map((segment) => commandOf(segment, place))].join(' ')
}

function commandOf(segment: Segment, place: (point: Point) => string): string {
  switch (segment.kind) {
    case 'line':
      return `L ${place(segment.end)}`
    case 'arc': {
      const { radius, sweepRad } = arcGeometryOf(segment)
      return `A ${numberOf(radius)} ${numberOf(radius)} 0 ${flagsOf(sweepRad)} ${place(segment.end)}`
    }
    case 'ellipse': {
      const turnDeg = (-segment.rotationRad * 180) / Math.PI
      const axes = `${numberOf(Math.abs(segment.semiX))} ${numberOf(Math.abs(segment.semiY))}`
      return `A ${axes} ${numberOf(turnDeg)} ${flagsOf(segment.sweepRad)} ${place(segment.end)}`
    }
    case 'cubic':
      return `C ${place(segment.control1)} ${place(segment.control2)} ${place(segment.end)}`
    default:
      return assertNever(segment)
  }
}

/** Large-arc and sweep flags; the page's y runs down, so that a left turn of ours is SVG's negative direction. */
const flagsOf = (sweepRad: number): string =>
  `${Math.abs(sweepRad) > Math.PI ? 1 : 0} ${sweepRad > 0 ? 0 : 1}`

const placeOn = (pageHeightMm: number) => (point: Point) =>
  `${numberOf(point.x)} ${numberOf(pageHeightMm - point.y)}`

/** A number without exponent and without a lone minus zero. */
function numberOf(value: number): string {
  const text = value.toFixed(PLACES).replace(/\.?0+$/, '')
  return text === '-0' ? '0' : text
}

const ESCAPES: Record<string, string> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
}

const escaped = (text: string): string =>
  text.replace(/[&<>"']/g, (character) => ESCAPES[character] ?? character)
