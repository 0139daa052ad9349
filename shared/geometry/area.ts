import { assertNever, Failure } from '@shared/failure'
import type { ArcSegment, CubicSegment, Outline, Point, Segment } from './segment'

/** sin s subtracted from s, without the loss of digits for small s: below 0.7 by its series, whose last term is under 10⁻¹⁷ of the first. */
export function sineDeficitOf(s: number): number {
  if (Math.abs(s) > 0.7) return s - Math.sin(s)
  const square = s * s
  let term = (s * square) / 6
  let sum = term
  for (let k = 4; k <= 16; k += 2) {
    term *= -square / (k * (k + 1))
    sum += term
  }
  return sum
}

/** Signed area, mm²; positive when the outline runs counter-clockwise. Exact up to rounding: nothing is flattened. */
export function signedAreaOf(outline: Outline): number {
  const origin = originOf(outline)
  let sum = 0
  for (const segment of outline) sum += areaTermOf(segment, origin.x, origin.y)
  return sum
}

/** The point areas and moments are taken about: on the outline, so that an outline far from the origin loses no digits. */
export function originOf(outline: Outline): Point {
  const first = outline[0]
  if (!first) throw new Failure('input-invalid', { says: 'an outline without segments has no area' })
  return first.start
}

/** Green's ½∮(x dy − y dx) of one segment about an origin near it: the triangle on its chord and what lies between chord and curve. */
function areaTermOf(segment: Segment, x0: number, y0: number): number {
  const ax = segment.start.x - x0
  const ay = segment.start.y - y0
  const bx = segment.end.x - x0
  const by = segment.end.y - y0
  const triangle = (ax * by - ay * bx) / 2
  switch (segment.kind) {
    case 'line':
      return triangle
    case 'arc':
      return triangle + arcCapAreaOf(segment)
    case 'ellipse':
      return triangle + (segment.semiX * segment.semiY * sineDeficitOf(segment.sweepRad)) / 2
    case 'cubic':
      return triangle + cubicCapAreaOf(segment)
    default:
      return assertNever(segment)
  }
}

/** Below it a cap's area is c² b/3 to the last digit: the next term is b²/5 of that. */
const FLAT_BULGE = 1e-9

/** Area between an arc and its chord, r²(s − sin s)/2, signed like the sweep; r² from the chord, so that flat arcs lose nothing. */
function arcCapAreaOf({ start, end, bulge }: ArcSegment): number {
  const chordSquared = (end.x - start.x) ** 2 + (end.y - start.y) ** 2
  if (Math.abs(bulge) < FLAT_BULGE) return (chordSquared * bulge) / 3
  const oneAndSquare = 1 + bulge * bulge
  const sweep = 4 * Math.atan(bulge)
  return (((chordSquared * oneAndSquare) / (32 * bulge)) * oneAndSquare * sineDeficitOf(sweep)) / bulge
}

/** Green's integral of a cubic's Bernstein products, taken about its start: with a, b, c from there to the other three points. */
function cubicCapAreaOf({ start, control1, control2, end }: CubicSegment): number {
  const ax = control1.x - start.x
  const ay = control1.y - start.y
  const bx = control2.x - start.x
  const by = control2.y - start.y
  const cx = end.x - start.x
  const cy = end.y - start.y
  return (3 * (ax * by - ay * bx) + 3 * (ax * cy - ay * cx) + 6 * (bx * cy - by * cx)) / 20
}
