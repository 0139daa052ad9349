import { assertNever } from '@shared/failure'
import { arcGeometryOf, pointAt } from '@shared/geometry'
import type { Outline, Point, Segment } from '@shared/geometry'
import { canonicalText } from './canonical'
import { sha256Hex } from './digest'
import type { Section } from './document'
import { woodOutlineOf } from './outline'

/** Whole units to a millimetre: a nanometre. */
const UNITS_PER_MM = 1e6

/**
 * Rounding turns over here instead of at ½, so that decimal sizes and their halves never lie on the edge: engines whose sines and tangents differ
 * in the last digit then still round alike.
 */
const ROUND_OFF = 0.137

/** mm. Joints at which the curve runs on unchanged within this are no joints of the shape. */
const SAME_MM = 1e-7

/**
 * SHA-256 of the shape that a knife cuts: the wood outline with its rebate, whatever its members, gesso and basis are called. The text is the
 * canonical JSON of its segments' places in whole nanometres, from the sight edge round; stretches that run straight on, or along one circle, count
 * as one segment.
 */
export const shapeSha256 = (section: Section): string => sha256Hex(shapeTextOf(section))

/** The text that the shape's hash is taken of. */
export const shapeTextOf = (section: Section): string =>
  canonicalText({ listelShape: 1, outline: joinedStretches(woodOutlineOf(section)).map(placesOf) })

/** Neighbours on one straight line or one circle made one segment. */
function joinedStretches(outline: Outline): readonly Segment[] {
  const joined: Segment[] = []
  for (const segment of outline) {
    const last = joined.at(-1)
    const both = last && joinedPair(last, segment)
    if (both) joined[joined.length - 1] = both
    else joined.push(segment)
  }
  return joined
}

function joinedPair(a: Segment, b: Segment): Segment | undefined {
  if (a.kind === 'line' && b.kind === 'line')
    return runsStraightOn(a, b) ? { kind: 'line', start: a.start, end: b.end } : undefined
  if (a.kind !== 'arc' || b.kind !== 'arc' || a.bulge === 0 || b.bulge === 0) return undefined
  const first = arcGeometryOf(a)
  const second = arcGeometryOf(b)
  const apart = Math.hypot(first.centre.x - second.centre.x, first.centre.y - second.centre.y)
  const sweep = first.sweepRad + second.sweepRad
  if (a.bulge * b.bulge < 0 || apart > SAME_MM || Math.abs(sweep) > 1.9 * Math.PI) return undefined
  return { kind: 'arc', start: a.start, end: b.end, bulge: Math.tan(sweep / 4) }
}

function runsStraightOn(a: Segment, b: Segment): boolean {
  const ux = a.end.x - a.start.x
  const uy = a.end.y - a.start.y
  const vx = b.end.x - b.start.x
  const vy = b.end.y - b.start.y
  const span = Math.hypot(ux + vx, uy + vy)
  return ux * vx + uy * vy > 0 && Math.abs(ux * vy - uy * vx) <= SAME_MM * span
}

/** Kind and places of a segment, enough to tell it from any other of its kind. */
function placesOf(segment: Segment): readonly (string | readonly number[])[] {
  return [segment.kind, ...pointsThatFix(segment).map(({ x, y }) => [units(x), units(y)])]
}

function pointsThatFix(segment: Segment): readonly Point[] {
  const { start, end } = segment
  switch (segment.kind) {
    case 'line':
      return [start, end]
    case 'arc':
      return [start, pointAt(segment, 0.5), end]
    case 'ellipse':
      return [start, pointAt(segment, 0.25), pointAt(segment, 0.5), pointAt(segment, 0.75), end]
    case 'cubic':
      return [start, segment.control1, segment.control2, end]
    default:
      return assertNever(segment)
  }
}

const units = (mm: number): number => Math.floor(mm * UNITS_PER_MM + 0.5 + ROUND_OFF)
