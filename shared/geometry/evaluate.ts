import { assertNever } from '@shared/failure'
import { arcLengthOf, isStraight, sweepOf } from './arc'
import { cross, leftOf, magnitudeOf, minus, rotated, scaled, unitOf } from './point'
import type { ArcSegment, CubicSegment, EllipseSegment, Path, Point, Segment } from './segment'

/**
 * A point of a segment, t from 0 (the start, the very same numbers) to 1 (the end). t is a fraction of the way on a line, of the angle on an arc
 * or ellipse (its own parameter), and the Bézier parameter on a cubic.
 */
export function pointAt(segment: Segment, t: number): Point {
  if (t === 0) return segment.start
  if (t === 1) return segment.end
  switch (segment.kind) {
    case 'line':
      return {
        x: segment.start.x + (segment.end.x - segment.start.x) * t,
        y: segment.start.y + (segment.end.y - segment.start.y) * t,
      }
    case 'arc':
      return arcPointAt(segment, t)
    case 'ellipse':
      return ellipsePointAt(segment, segment.startRad + t * segment.sweepRad)
    case 'cubic':
      return cubicPointAt(segment, t)
    default:
      return assertNever(segment)
  }
}

/**
 * By the inscribed angle: the chord to the point is sin(t s/2)/sin(s/2) of the whole chord, turned by (t − 1) s/2 from it. No centre is
 * used, so that an arc of any radius, even a straight one, is evaluated to rounding.
 */
function arcPointAt(arc: ArcSegment, t: number): Point {
  const { start, end, bulge } = arc
  const half = 2 * Math.atan(bulge)
  const ratio = isStraight(arc) ? t : (Math.sin(t * half) * (1 + bulge * bulge)) / (2 * bulge)
  const turn = (t - 1) * half
  const c = ratio * Math.cos(turn)
  const s = ratio * Math.sin(turn)
  const dx = end.x - start.x
  const dy = end.y - start.y
  return { x: start.x + c * dx - s * dy, y: start.y + s * dx + c * dy }
}

function ellipsePointAt({ centre, semiX, semiY, rotationRad }: EllipseSegment, angle: number): Point {
  const u = semiX * Math.cos(angle)
  const v = semiY * Math.sin(angle)
  const c = Math.cos(rotationRad)
  const s = Math.sin(rotationRad)
  return { x: centre.x + c * u - s * v, y: centre.y + s * u + c * v }
}

function cubicPointAt({ start, control1, control2, end }: CubicSegment, t: number): Point {
  const r = 1 - t
  const a = r * r * r
  const b = 3 * r * r * t
  const c = 3 * r * t * t
  const d = t * t * t
  return {
    x: a * start.x + b * control1.x + c * control2.x + d * end.x,
    y: a * start.y + b * control1.y + c * control2.y + d * end.y,
  }
}

/** First derivative by t, mm. */
export function derivativeAt(segment: Segment, t: number): Point {
  switch (segment.kind) {
    case 'line':
      return minus(segment.end, segment.start)
    case 'arc': {
      const direction = arcDirectionAt(segment, t)
      return scaled(direction, arcLengthOf(segment))
    }
    case 'ellipse': {
      const angle = segment.startRad + t * segment.sweepRad
      const own = { x: -segment.semiX * Math.sin(angle), y: segment.semiY * Math.cos(angle) }
      return scaled(rotated(own, segment.rotationRad), segment.sweepRad)
    }
    case 'cubic': {
      const { start, control1, control2, end } = segment
      const r = 1 - t
      const a = 3 * r * r
      const b = 6 * r * t
      const c = 3 * t * t
      return {
        x: a * (control1.x - start.x) + b * (control2.x - control1.x) + c * (end.x - control2.x),
        y: a * (control1.y - start.y) + b * (control2.y - control1.y) + c * (end.y - control2.y),
      }
    }
    default:
      return assertNever(segment)
  }
}

/** Unit tangent of an arc: the chord's direction turned by (t − ½) of the sweep. */
function arcDirectionAt(arc: ArcSegment, t: number): Point {
  const chord = unitOf(minus(arc.end, arc.start)) ?? { x: 0, y: 0 }
  return rotated(chord, (t - 0.5) * sweepOf(arc))
}

/** Second derivative by t, mm. */
export function secondDerivativeAt(segment: Segment, t: number): Point {
  switch (segment.kind) {
    case 'line':
      return { x: 0, y: 0 }
    case 'arc':
      return scaled(leftOf(arcDirectionAt(segment, t)), arcLengthOf(segment) * sweepOf(segment))
    case 'ellipse': {
      const angle = segment.startRad + t * segment.sweepRad
      const own = { x: -segment.semiX * Math.cos(angle), y: -segment.semiY * Math.sin(angle) }
      return scaled(rotated(own, segment.rotationRad), segment.sweepRad ** 2)
    }
    case 'cubic': {
      const { start, control1, control2, end } = segment
      const r = 6 * (1 - t)
      const s = 6 * t
      return {
        x: r * (control2.x - 2 * control1.x + start.x) + s * (end.x - 2 * control2.x + control1.x),
        y: r * (control2.y - 2 * control1.y + start.y) + s * (end.y - 2 * control2.y + control1.y),
      }
    }
    default:
      return assertNever(segment)
  }
}

/** A derivative shorter than this part of the segment's own size has no direction of its own: a cusp, or a control point on its end. */
const VANISHING = 1e-12

/**
 * Unit tangent in the sense of travel. Where the derivative vanishes (a control point on its end, a cusp) the limit from inside the
 * segment; at an inner cusp the direction in which it leaves. A segment of no extent has the direction of x.
 */
export function tangentAt(segment: Segment, t: number): Point {
  const first = derivativeAt(segment, t)
  const size = sizeOf(segment)
  if (magnitudeOf(first) > VANISHING * size) return unitOf(first) ?? { x: 1, y: 0 }
  const second = secondDerivativeAt(segment, t)
  if (magnitudeOf(second) > VANISHING * size)
    return unitOf(t === 1 ? scaled(second, -1) : second) ?? { x: 1, y: 0 }
  return unitOf(minus(segment.end, segment.start)) ?? { x: 1, y: 0 }
}

const sizeOf = (segment: Segment): number =>
  segment.kind === 'cubic'
    ? magnitudeOf(minus(segment.control1, segment.start)) +
      magnitudeOf(minus(segment.control2, segment.control1)) +
      magnitudeOf(minus(segment.end, segment.control2))
    : magnitudeOf(minus(segment.end, segment.start))

export const startTangentOf = (path: Path | Segment): Point => tangentAt(firstOf(path), 0)

export const endTangentOf = (path: Path | Segment): Point => tangentAt(lastOf(path), 1)

const isPath = (path: Path | Segment): path is Path => Array.isArray(path)

function firstOf(path: Path | Segment): Segment {
  const segment = isPath(path) ? path[0] : path
  if (!segment) throw new RangeError('a path without segments has no start')
  return segment
}

function lastOf(path: Path | Segment): Segment {
  const segment = isPath(path) ? path.at(-1) : path
  if (!segment) throw new RangeError('a path without segments has no end')
  return segment
}

/** Signed curvature, 1/mm, positive where the path turns left; not a number at a cusp. */
export function curvatureAt(segment: Segment, t: number): number {
  if (segment.kind === 'line') return 0
  if (segment.kind === 'arc') return sweepOf(segment) / arcLengthOf(segment)
  const first = derivativeAt(segment, t)
  return cross(first, secondDerivativeAt(segment, t)) / magnitudeOf(first) ** 3
}

/** Upper bound of the second derivative's size over the whole segment, mm: between t and t + d a curve leaves its chord by at most bend·d²/8. */
export function bendOf(segment: Segment): number {
  switch (segment.kind) {
    case 'line':
      return 0
    case 'arc':
      return arcLengthOf(segment) * Math.abs(sweepOf(segment))
    case 'ellipse':
      return Math.max(segment.semiX, segment.semiY) * segment.sweepRad ** 2
    case 'cubic':
      return Math.max(
        magnitudeOf(secondDerivativeAt(segment, 0)),
        magnitudeOf(secondDerivativeAt(segment, 1)),
      )
    default:
      return assertNever(segment)
  }
}
