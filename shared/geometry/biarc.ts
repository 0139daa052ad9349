import { assertNever, Failure } from '@shared/failure'
import { CURVE_TO_ARC_MM } from '@shared/units'
import { pointAt, tangentAt } from './evaluate'
import { nearestOnPath } from './nearest'
import { add, cross, distance, dot, minus, scaled } from './point'
import { quadraticRootsOf } from './roots'
import type { ArcSegment, CubicSegment, EllipseSegment, LineSegment, Path, Point, Segment } from './segment'

type LineOrArc = LineSegment | ArcSegment

/** Below this bulge an arc of ordinary size is straight to rounding. */
const STRAIGHT_BULGE = 1e-12
const DEEPEST = 24
/** Places of a stretch at which the arcs are held against the curve. */
const PROBES = [0.08, 0.18, 0.29, 0.4, 0.5, 0.6, 0.71, 0.82, 0.92]
/** Part of the accuracy that the probes may use up; the rest covers what lies between them. */
const MARGIN = 0.8

/**
 * Lines and arcs that follow a segment within accuracyMm, with its own end points and its own tangents at every joint (so that they run
 * on smoothly and can be offset). Lines and arcs are given back as they are; ellipses and cubics become pairs of arcs with a common tangent.
 */
export function arcsFromCurve(segment: Segment, accuracyMm: number = CURVE_TO_ARC_MM): readonly LineOrArc[] {
  if (!(accuracyMm > 0)) {
    throw new Failure('input-invalid', { says: `an accuracy must be above 0 mm, not ${accuracyMm}` })
  }
  switch (segment.kind) {
    case 'line':
    case 'arc':
      return [segment]
    case 'ellipse':
    case 'cubic': {
      const stations = [0, ...turningStationsOf(segment), 1]
      return stations.slice(1).flatMap((to, i) => {
        const from = stations[i] ?? 0
        return arcsOfStretch(segment, { from, to }, accuracyMm, DEEPEST)
      })
    }
    default:
      return assertNever(segment)
  }
}

/** Where a curve turns the other way, or an ellipse is sharpest or flattest: between such places pairs of arcs fit well. */
function turningStationsOf(segment: EllipseSegment | CubicSegment): readonly number[] {
  if (segment.kind === 'cubic') return inflectionsOf(segment).filter((t) => t > 1e-9 && t < 1 - 1e-9)
  const { startRad, sweepRad } = segment
  const quarter = Math.PI / 2
  const least = Math.min(startRad, startRad + sweepRad)
  const greatest = Math.max(startRad, startRad + sweepRad)
  const stations: number[] = []
  for (let k = Math.ceil(least / quarter); k * quarter <= greatest; k += 1) {
    const t = (k * quarter - startRad) / sweepRad
    if (t > 1e-9 && t < 1 - 1e-9) stations.push(t)
  }
  return stations.sort((s, t) => s - t)
}

/** Roots of cross(P′, P″), which for a cubic is a quadratic. */
function inflectionsOf({ start, control1, control2, end }: CubicSegment): readonly number[] {
  const a = minus(control1, start)
  const b = minus(minus(control2, control1), a)
  const c = minus(minus(minus(end, control2), minus(control2, control1)), b)
  return quadraticRootsOf(cross(b, c), cross(a, c), cross(a, b))
}

function arcsOfStretch(
  segment: Segment,
  { from, to }: { readonly from: number; readonly to: number },
  accuracyMm: number,
  depth: number,
): readonly LineOrArc[] {
  const start = pointAt(segment, from)
  const end = pointAt(segment, to)
  if (distance(start, end) === 0 && depth < DEEPEST - 4) return []
  const pair = biarcBetween({ start, end }, tangentAt(segment, from), tangentAt(segment, to))
  if (pair && (depth === 0 || isClose(segment, { from, to }, pair, accuracyMm * MARGIN))) return pair
  if (depth === 0) return [{ kind: 'line', start, end }]
  const middle = (from + to) / 2
  return [
    ...arcsOfStretch(segment, { from, to: middle }, accuracyMm, depth - 1),
    ...arcsOfStretch(segment, { from: middle, to }, accuracyMm, depth - 1),
  ]
}

function isClose(
  segment: Segment,
  { from, to }: { readonly from: number; readonly to: number },
  arcs: Path,
  within: number,
): boolean {
  return PROBES.every((part) => {
    return nearestOnPath(arcs, pointAt(segment, from + part * (to - from))).distance <= within
  })
}

/**
 * Two arcs from start to end with the given unit tangents there and a common one where they meet. Their tangent lengths are taken equal, d: the
 * corner points start + d T0 and end − d T1 must lie 2d apart, which gives k d² + 2 (v·t) d − v·v = 0 with v from start to end, t = T0 + T1 and
 * k = 2 (1 − T0·T1). Undefined where no such pair turns less than a half circle.
 */
function biarcBetween(
  { start, end }: { readonly start: Point; readonly end: Point },
  t0: Point,
  t1: Point,
): readonly LineOrArc[] | undefined {
  const v = minus(end, start)
  const vt = dot(v, add(t0, t1))
  const vv = dot(v, v)
  const k = 2 * (1 - dot(t0, t1))
  const denominator = vt + Math.sqrt(vt * vt + Math.max(0, k) * vv)
  if (!(denominator > 0) || vv === 0) return undefined
  const d = vv / denominator
  const corner0 = add(start, scaled(t0, d))
  const corner1 = minus(end, scaled(t1, d))
  const joint = { x: (corner0.x + corner1.x) / 2, y: (corner0.y + corner1.y) / 2 }
  const bulge0 = bulgeBetween(t0, minus(joint, start))
  const bulge1 = bulgeBetween(minus(end, joint), t1)
  if (Math.abs(bulge0) > 1 || Math.abs(bulge1) > 1) return undefined
  return [lineOrArc(start, joint, bulge0), lineOrArc(joint, end, bulge1)]
}

/** An arc's tangent and chord stand at half its sweep, so the bulge is the tangent of half that angle. */
const bulgeBetween = (first: Point, second: Point): number =>
  Math.tan(Math.atan2(cross(first, second), dot(first, second)) / 2)

const lineOrArc = (start: Point, end: Point, bulge: number): LineOrArc =>
  Math.abs(bulge) < STRAIGHT_BULGE ? { kind: 'line', start, end } : { kind: 'arc', start, end, bulge }
