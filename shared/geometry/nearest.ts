import { assertNever, Failure } from '@shared/failure'
import { arcGeometryOf, sweepOf } from './arc'
import { derivativeAt, pointAt, secondDerivativeAt } from './evaluate'
import { distance, distanceSquared, dot, minus, rotated, wrappedTurn } from './point'
import { bernsteinProductOf, bernsteinRootsOf } from './roots'
import type { ArcSegment, CubicSegment, EllipseSegment, LineSegment, Path, Point, Segment } from './segment'

/** The place of a segment nearest to a point, and how far off it is, mm. */
export interface NearestOnSegment {
  readonly t: number
  readonly point: Point
  readonly distance: number
}

/** segment is the index in the path. */
export interface NearestOnPath extends NearestOnSegment {
  readonly segment: number
}

/** Place of a path nearest to a point; the first of several equally near. */
export function nearestOnPath(path: Path, point: Point): NearestOnPath {
  let best: NearestOnPath | undefined
  path.forEach((segment, index) => {
    if (best && leastDistanceTo(segment, point) > best.distance) return
    const nearest = nearestOnSegment(segment, point)
    if (!best || nearest.distance < best.distance) best = { segment: index, ...nearest }
  })
  if (!best) throw new Failure('input-invalid', { says: 'a path without segments has no nearest point' })
  return best
}

/** No point of the segment is nearer than this: the distance to the disc about the chord's middle that holds the segment. */
function leastDistanceTo(segment: Segment, point: Point): number {
  const middle = { x: (segment.start.x + segment.end.x) / 2, y: (segment.start.y + segment.end.y) / 2 }
  return distance(middle, point) - reachOf(segment)
}

function reachOf(segment: Segment): number {
  const half = distance(segment.start, segment.end) / 2
  switch (segment.kind) {
    case 'line':
      return half
    case 'arc':
      return half * Math.max(1, Math.abs(segment.bulge))
    case 'ellipse':
      return 2 * Math.max(segment.semiX, segment.semiY) + half
    case 'cubic': {
      const middle = { x: (segment.start.x + segment.end.x) / 2, y: (segment.start.y + segment.end.y) / 2 }
      return Math.max(half, distance(middle, segment.control1), distance(middle, segment.control2))
    }
    default:
      return assertNever(segment)
  }
}

/** Nearest place of one segment: closed form for line and arc; for the others every place where the distance may be least is looked at. */
export function nearestOnSegment(segment: Segment, point: Point): NearestOnSegment {
  let best = placeAt(segment, 0, point)
  for (const t of [...stationsOf(segment, point), 1]) {
    const place = placeAt(segment, t, point)
    if (place.distance < best.distance) best = place
  }
  return best
}

function placeAt(segment: Segment, t: number, to: Point): NearestOnSegment {
  const point = pointAt(segment, t)
  return { t, point, distance: distance(point, to) }
}

/** Parameters within 0 < t < 1 at which the line to the point may stand square on the segment. */
function stationsOf(segment: Segment, point: Point): readonly number[] {
  switch (segment.kind) {
    case 'line':
      return inside([lineStationOf(segment, point)])
    case 'arc':
      return inside([arcStationOf(segment, point)])
    case 'ellipse':
      return inside(ellipseStationsOf(segment, point).map((t) => polished(segment, t, point)))
    case 'cubic':
      return inside(cubicStationsOf(segment, point).map((t) => polished(segment, t, point)))
    default:
      return assertNever(segment)
  }
}

const inside = (stations: readonly number[]): readonly number[] => stations.filter((t) => t > 0 && t < 1)

function lineStationOf({ start, end }: LineSegment | ArcSegment, point: Point): number {
  const along = minus(end, start)
  const squared = dot(along, along)
  return squared === 0 ? 0 : dot(minus(point, start), along) / squared
}

/** Flatter than this the centre is too far off to take directions from; the chord's foot is then within a step of Newton's method. */
const FLAT_BULGE = 1e-5

function arcStationOf(arc: ArcSegment, point: Point): number {
  if (Math.abs(arc.bulge) < FLAT_BULGE)
    return polished(arc, polished(arc, lineStationOf(arc, point), point), point)
  const { centre, startRad } = arcGeometryOf(arc)
  const sweep = sweepOf(arc)
  const angle = Math.atan2(point.y - centre.y, point.x - centre.x)
  const turned = wrappedTurn(sweep > 0 ? angle - startRad : startRad - angle) / Math.abs(sweep)
  return turned > 0 && turned < 1 ? polished(arc, turned, point) : turned
}

/** One step of Newton's method on (P − q)·P′, kept only where it brings the place nearer to square. */
function polished(segment: Segment, t: number, point: Point): number {
  const from = minus(pointAt(segment, t), point)
  const first = derivativeAt(segment, t)
  const slope = dot(first, first) + dot(from, secondDerivativeAt(segment, t))
  if (!(slope > 0)) return t
  const next = t - dot(from, first) / slope
  if (!(next > 0 && next < 1)) return t
  const better = distanceSquared(pointAt(segment, next), point) <= distanceSquared(pointAt(segment, t), point)
  return better ? next : t
}

/** (P − q)·P′ of a cubic is a polynomial of degree 5; its Bernstein coefficients are the product's. */
function cubicStationsOf(cubic: CubicSegment, q: Point): readonly number[] {
  const { start, control1, control2, end } = cubic
  const points = [start, control1, control2, end]
  const product = (axis: 'x' | 'y'): readonly number[] => {
    const values = points.map((p) => p[axis] - q[axis])
    const slopes = values.slice(1).map((value, i) => value - (values[i] ?? 0))
    return bernsteinProductOf(values, slopes)
  }
  const y = product('y')
  return bernsteinRootsOf(product('x').map((value, i) => value + (y[i] ?? 0)))
}

/**
 * On an ellipse (P − q)·P′ is a quartic in u = tan(w/2), w the angle from the middle of a stretch; stretches of at most a half turn are taken,
 * so that |u| ≤ 1, and their joints are looked at as well.
 */
function ellipseStationsOf(ellipse: EllipseSegment, point: Point): readonly number[] {
  const q = rotated(minus(point, ellipse.centre), -ellipse.rotationRad)
  const parts = Math.ceil(Math.abs(ellipse.sweepRad) / Math.PI)
  return Array.from({ length: parts }, (_, part) => {
    const half = ellipse.sweepRad / (2 * parts)
    const middle = ellipse.startRad + (2 * part + 1) * half
    const roots = bernsteinRootsOf(ellipseQuartic(ellipse, q, { middle, u: Math.tan(half / 2) }))
    const stations = roots.map((root) => {
      const angle = middle + 2 * Math.atan((2 * root - 1) * Math.tan(half / 2))
      return (angle - ellipse.startRad) / ellipse.sweepRad
    })
    return [part / parts, ...stations]
  }).flat()
}

/** With N = 1 + u², N cos and N sin of middle + w are quadratics in u; the quartic is N² times the derivative of half the distance squared. */
function ellipseQuartic(
  { semiX, semiY }: EllipseSegment,
  q: Point,
  { middle, u }: { readonly middle: number; readonly u: number },
): readonly number[] {
  const cm = Math.cos(middle)
  const sm = Math.sin(middle)
  const cosine = quadraticInBernstein([cm, -2 * sm, -cm], u)
  const sine = quadraticInBernstein([sm, 2 * cm, -sm], u)
  const one = quadraticInBernstein([1, 0, 1], u)
  const both = bernsteinProductOf(sine, cosine)
  const sineOnly = bernsteinProductOf(sine, one)
  const cosineOnly = bernsteinProductOf(cosine, one)
  return both.map(
    (value, i) =>
      (semiY ** 2 - semiX ** 2) * value +
      semiX * q.x * (sineOnly[i] ?? 0) -
      semiY * q.y * (cosineOnly[i] ?? 0),
  )
}

/** c0 + c1 u + c2 u² on −u…u in Bernstein form: its values at the ends, and its polar form between. */
const quadraticInBernstein = (
  [c0, c1, c2]: readonly [number, number, number],
  u: number,
): readonly number[] => [c0 - c1 * u + c2 * u * u, c0 - c2 * u * u, c0 + c1 * u + c2 * u * u]
