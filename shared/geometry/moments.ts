import { assertNever, Failure } from '@shared/failure'
import { arcGeometryOf, sweepOf } from './arc'
import { originOf, sineDeficitOf } from './area'
import { derivativeAt, pointAt } from './evaluate'
import { gaussRuleFrom } from './quadrature'
import type { ArcSegment, CubicSegment, EllipseSegment, Outline, Point, Segment } from './segment'

/**
 * Area and its moments about the origin of coordinates; signs go with the area's (all turn over for a clockwise outline).
 * secondXX = ∫x² dA, and so on; central… are the same about the centroid.
 */
export interface AreaMoments {
  /** mm² */
  readonly area: number
  /** ∫x dA, mm³ */
  readonly firstX: number
  /** ∫y dA, mm³ */
  readonly firstY: number
  /** ∫x² dA, mm⁴ */
  readonly secondXX: number
  readonly secondYY: number
  readonly secondXY: number
  readonly centralXX: number
  readonly centralYY: number
  readonly centralXY: number
  /** mm */
  readonly centroid: Point
}

/** Sums over the segments so far, about a local origin; one such record is filled in place, since this runs at every edit. */
interface Sums {
  area: number
  x: number
  y: number
  xx: number
  yy: number
  xy: number
}

/** Area, first and second moments and centroid; closed forms for line, arc and ellipse, exact quadrature of the polynomials of a cubic. */
export function areaMomentsOf(outline: Outline): AreaMoments {
  const origin = originOf(outline)
  const sums: Sums = { area: 0, x: 0, y: 0, xx: 0, yy: 0, xy: 0 }
  for (const segment of outline) {
    addTriangle(sums, segment, origin)
    addCap(sums, segment, origin)
  }
  return aboutOrigin(sums, origin)
}

function aboutOrigin({ area, x, y, xx, yy, xy }: Sums, origin: Point): AreaMoments {
  if (area === 0)
    throw new Failure('input-invalid', { says: 'an outline that encloses no area has no centroid' })
  const { x: ox, y: oy } = origin
  return {
    area,
    firstX: x + ox * area,
    firstY: y + oy * area,
    secondXX: xx + 2 * ox * x + ox * ox * area,
    secondYY: yy + 2 * oy * y + oy * oy * area,
    secondXY: xy + ox * y + oy * x + ox * oy * area,
    centralXX: xx - (x * x) / area,
    centralYY: yy - (y * y) / area,
    centralXY: xy - (x * y) / area,
    centroid: { x: ox + x / area, y: oy + y / area },
  }
}

/** The triangle from the local origin over the segment's chord: vertices 0, a, b. */
function addTriangle(sums: Sums, { start, end }: Segment, origin: Point): void {
  const ax = start.x - origin.x
  const ay = start.y - origin.y
  const bx = end.x - origin.x
  const by = end.y - origin.y
  const area = (ax * by - ay * bx) / 2
  sums.area += area
  sums.x += (area * (ax + bx)) / 3
  sums.y += (area * (ay + by)) / 3
  sums.xx += (area * (ax * ax + ax * bx + bx * bx)) / 6
  sums.yy += (area * (ay * ay + ay * by + by * by)) / 6
  sums.xy += (area * (2 * ax * ay + ax * by + bx * ay + 2 * bx * by)) / 12
}

function addCap(sums: Sums, segment: Segment, origin: Point): void {
  switch (segment.kind) {
    case 'line':
      return
    case 'arc':
      return addArcCap(sums, segment, origin)
    case 'ellipse':
      return addEllipseCap(sums, segment, origin)
    case 'cubic':
      return addCapByQuadrature(sums, segment, origin)
    default:
      return assertNever(segment)
  }
}

/** Below this sweep the centre is so far off that going by it loses digits; there eight-point quadrature is exact to rounding. */
const FLAT_SWEEP_RAD = 0.5

function addArcCap(sums: Sums, arc: ArcSegment, origin: Point): void {
  const sweep = sweepOf(arc)
  if (Math.abs(sweep) < FLAT_SWEEP_RAD) return addCapByQuadrature(sums, arc, origin)
  const { centre, radius, startRad } = arcGeometryOf(arc)
  const map = { a: radius, b: 0, c: 0, d: radius, x: centre.x - origin.x, y: centre.y - origin.y }
  addMappedCap(sums, map, startRad, sweep)
}

function addEllipseCap(sums: Sums, ellipse: EllipseSegment, origin: Point): void {
  const { centre, semiX, semiY, rotationRad, startRad, sweepRad } = ellipse
  const c = Math.cos(rotationRad)
  const s = Math.sin(rotationRad)
  const map = {
    a: semiX * c,
    b: semiX * s,
    c: -semiY * s,
    d: semiY * c,
    x: centre.x - origin.x,
    y: centre.y - origin.y,
  }
  addMappedCap(sums, map, startRad, sweepRad)
}

/** Takes (u, v) to (x + a u + c v, y + b u + d v). */
interface AffineMap {
  readonly a: number
  readonly b: number
  readonly c: number
  readonly d: number
  readonly x: number
  readonly y: number
}

/**
 * What lies between chord and arc, as the image of a cap of the unit circle. With h half the sweep and the axis from the centre through
 * the cap's middle, the unit cap has area h − sin h cos h, first moment ⅔ sin³h along the axis, second moments
 * (h − sin h cos h + 2 sin³h cos h)/4 along and (3h − 3 sin h cos h − 2 sin³h cos h)/12 across it: integrals of the strips across the axis.
 */
function addMappedCap(sums: Sums, map: AffineMap, startRad: number, sweepRad: number): void {
  const half = Math.abs(sweepRad) / 2
  const sine = Math.sin(half)
  const cosine = Math.cos(half)
  const cube = sine ** 3
  const area = sineDeficitOf(2 * half) / 2
  const first = (2 * cube) / 3
  const along = (area + 2 * cube * cosine) / 4
  const across = (3 * area - 2 * cube * cosine) / 12

  const middle = startRad + sweepRad / 2
  const cm = Math.cos(middle)
  const sm = Math.sin(middle)
  const ux = map.a * cm + map.c * sm
  const uy = map.b * cm + map.d * sm
  const vx = map.c * cm - map.a * sm
  const vy = map.d * cm - map.b * sm
  const scale = (map.a * map.d - map.b * map.c) * Math.sign(sweepRad)
  const { x, y } = map

  sums.area += scale * area
  sums.x += scale * (area * x + first * ux)
  sums.y += scale * (area * y + first * uy)
  sums.xx += scale * (area * x * x + 2 * first * x * ux + along * ux * ux + across * vx * vx)
  sums.yy += scale * (area * y * y + 2 * first * y * uy + along * uy * uy + across * vy * vy)
  sums.xy += scale * (area * x * y + first * (x * uy + y * ux) + along * ux * uy + across * vx * vy)
}

const RULE = gaussRuleFrom(8)

/**
 * The cap of a cubic (polynomials of degree up to 11: exact) or of a flat arc, by Green's theorem about the segment's start, where the
 * way back along the chord adds nothing. Only then are the moments carried over to the local origin.
 */
function addCapByQuadrature(sums: Sums, segment: ArcSegment | CubicSegment, origin: Point): void {
  const cap: Sums = { area: 0, x: 0, y: 0, xx: 0, yy: 0, xy: 0 }
  for (let i = 0; i < RULE.nodes.length; i += 1) {
    const t = (1 + (RULE.nodes[i] ?? 0)) / 2
    addGreenTerms(cap, segment, t, (RULE.weights[i] ?? 0) / 2)
  }
  const ox = segment.start.x - origin.x
  const oy = segment.start.y - origin.y
  sums.area += cap.area
  sums.x += cap.x + ox * cap.area
  sums.y += cap.y + oy * cap.area
  sums.xx += cap.xx + 2 * ox * cap.x + ox * ox * cap.area
  sums.yy += cap.yy + 2 * oy * cap.y + oy * oy * cap.area
  sums.xy += cap.xy + ox * cap.y + oy * cap.x + ox * oy * cap.area
}

/** In polar form, with w = x dy − y dx: area ½∮w, ∫x dA = ⅓∮x w, ∫x² dA = ¼∮x² w: the way back along the chord, w = 0, adds nothing. */
function addGreenTerms(cap: Sums, segment: ArcSegment | CubicSegment, t: number, weight: number): void {
  const point = pointAt(segment, t)
  const slope = derivativeAt(segment, t)
  const x = point.x - segment.start.x
  const y = point.y - segment.start.y
  const w = (x * slope.y - y * slope.x) * weight
  cap.area += w / 2
  cap.x += (x * w) / 3
  cap.y += (y * w) / 3
  cap.xx += (x * x * w) / 4
  cap.yy += (y * y * w) / 4
  cap.xy += (x * y * w) / 4
}
