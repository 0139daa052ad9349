import { assertNever, Failure } from '@shared/failure'
import { LENGTH_ACCURACY_MM } from '@shared/units'
import { arcLengthOf, sweepOf } from './arc'
import { derivativeAt, pointAt } from './evaluate'
import { distance } from './point'
import { integralOf } from './quadrature'
import type { ArcSegment, Path, Point, Segment } from './segment'

/** accuracyMm: greatest error of the answer, mm; above 0. Lines and arcs are exact whatever it is. */
export interface LengthOptions {
  readonly accuracyMm?: number
}

function requireAccuracy(accuracyMm: number): void {
  if (!(accuracyMm > 0)) {
    throw new Failure('input-invalid', { says: `an accuracy must be above 0 mm, not ${accuracyMm}` })
  }
}

/** Arc length of one segment, mm. */
export function segmentLengthOf(segment: Segment, options: LengthOptions = {}): number {
  const { accuracyMm = LENGTH_ACCURACY_MM } = options
  requireAccuracy(accuracyMm)
  switch (segment.kind) {
    case 'line':
      return distance(segment.start, segment.end)
    case 'arc':
      return arcLengthOf(segment)
    case 'ellipse':
    case 'cubic':
      return integralOf((t) => speedAt(segment, t), accuracyMm)
    default:
      return assertNever(segment)
  }
}

function speedAt(segment: Segment, t: number): number {
  const { x, y } = derivativeAt(segment, t)
  return Math.sqrt(x * x + y * y)
}

/** Arc length of a path, mm; the accuracy is that of the whole. */
export function lengthOf(path: Path, options: LengthOptions = {}): number {
  const { accuracyMm = LENGTH_ACCURACY_MM } = options
  const share = shareOf(path, accuracyMm)
  let sum = 0
  for (const segment of path) sum += segmentLengthOf(segment, { accuracyMm: share })
  return sum
}

/** Each curve that needs quadrature may be wrong by its part of the whole. */
function shareOf(path: Path, accuracyMm: number): number {
  const curves = path.filter((segment) => segment.kind === 'ellipse' || segment.kind === 'cubic').length
  return accuracyMm / Math.max(1, curves)
}

/** Length of a line in the plane and the centroid of that length (of a thin wire, not of an area), mm. */
export interface LineMoments {
  readonly length: number
  readonly centroid: Point
}

/** Length and arc-length centroid of a path, both within accuracyMm. A path of no length has its start for centroid. */
export function lineMomentsOf(path: Path, options: LengthOptions = {}): LineMoments {
  const { accuracyMm = LENGTH_ACCURACY_MM } = options
  requireAccuracy(accuracyMm)
  const first = path[0]
  if (!first) throw new Failure('input-invalid', { says: 'a path without segments has no centroid' })
  const share = shareOf(path, accuracyMm)
  let length = 0
  let x = 0
  let y = 0
  for (const segment of path) {
    const part = segmentMomentsOf(segment, share)
    length += part.length
    x += part.length * (part.centroid.x - first.start.x)
    y += part.length * (part.centroid.y - first.start.y)
  }
  if (length === 0) return { length, centroid: first.start }
  return { length, centroid: { x: first.start.x + x / length, y: first.start.y + y / length } }
}

function segmentMomentsOf(segment: Segment, accuracyMm: number): LineMoments {
  switch (segment.kind) {
    case 'line': {
      const { start, end } = segment
      return {
        length: distance(start, end),
        centroid: { x: (start.x + end.x) / 2, y: (start.y + end.y) / 2 },
      }
    }
    case 'arc':
      return { length: arcLengthOf(segment), centroid: arcLineCentroidOf(segment) }
    case 'ellipse':
    case 'cubic':
      return curveMomentsOf(segment, accuracyMm)
    default:
      return assertNever(segment)
  }
}

/** The centroid of an arc lies r sin h / h from the centre (h half the sweep), so c/2 · (1/h − cot h) off the chord's midpoint. */
function arcLineCentroidOf(arc: ArcSegment): Point {
  const { start, end } = arc
  const half = sweepOf(arc) / 2
  const off = half === 0 ? 0 : inverseLessCotangent(half) / 2
  return {
    x: (start.x + end.x) / 2 + off * (end.y - start.y),
    y: (start.y + end.y) / 2 - off * (end.x - start.x),
  }
}

/** 1/h − cot h; by its series h/3 + h³/45 + 2h⁵/945 + h⁷/4725 near 0, where the two terms would cancel. */
function inverseLessCotangent(h: number): number {
  if (Math.abs(h) > 0.03) return 1 / h - 1 / Math.tan(h)
  const square = h * h
  return h * (1 / 3 + square * (1 / 45 + square * (2 / 945 + square / 4725)))
}

/** Moments are taken about the start, so that their error, at most accuracy × length, moves the centroid by no more than the accuracy. */
function curveMomentsOf(segment: Segment, accuracyMm: number): LineMoments {
  const { start } = segment
  const length = segmentLengthOf(segment, { accuracyMm })
  if (length === 0) return { length, centroid: start }
  const accuracy = (accuracyMm * length) / 2
  const x = integralOf((t) => (pointAt(segment, t).x - start.x) * speedAt(segment, t), accuracy)
  const y = integralOf((t) => (pointAt(segment, t).y - start.y) * speedAt(segment, t), accuracy)
  return { length, centroid: { x: start.x + x / length, y: start.y + y / length } }
}
