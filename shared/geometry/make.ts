import { Failure } from '@shared/failure'
import { add, rotated } from './point'
import type { ArcSegment, CubicSegment, EllipseSegment, LineSegment, Point } from './segment'

function requireFinite(what: string, ...values: readonly number[]): void {
  if (!values.every(Number.isFinite)) {
    throw new Failure('input-invalid', {
      says: `${what} needs finite numbers; it was given ${values.join(', ')}`,
    })
  }
}

export function lineFrom(start: Point, end: Point): LineSegment {
  requireFinite('a line', start.x, start.y, end.x, end.y)
  return { kind: 'line', start, end }
}

/** An arc by bulge = tan(sweep / 4); 0 is a straight arc, which every measure takes. */
export function arcFromBulge(start: Point, end: Point, bulge: number): ArcSegment {
  requireFinite('an arc', start.x, start.y, end.x, end.y, bulge)
  return { kind: 'arc', start, end, bulge }
}

/** An arc by the angle it turns through from start to end, −2π < sweepRad < 2π, positive to the left. */
export function arcFromSweep(start: Point, end: Point, sweepRad: number): ArcSegment {
  requireSweep(sweepRad)
  return arcFromBulge(start, end, Math.tan(sweepRad / 4))
}

/** An arc about a centre from the direction startRad through sweepRad (−2π < sweepRad < 2π). */
export function arcFromCentre(centre: Point, radius: number, startRad: number, sweepRad: number): ArcSegment {
  requireFinite('an arc', radius, startRad)
  if (radius <= 0)
    throw new Failure('input-invalid', { says: `the radius of an arc must be above 0, not ${radius}` })
  const at = (angle: number): Point => ({
    x: centre.x + radius * Math.cos(angle),
    y: centre.y + radius * Math.sin(angle),
  })
  return arcFromSweep(at(startRad), at(startRad + sweepRad), sweepRad)
}

function requireSweep(sweepRad: number): void {
  if (!(Math.abs(sweepRad) < 2 * Math.PI)) {
    throw new Failure('input-invalid', {
      says: `an arc turns through less than a full circle; ${sweepRad} rad does not`,
    })
  }
}

export interface EllipseShape {
  readonly centre: Point
  readonly semiX: number
  readonly semiY: number
  readonly rotationRad?: number
  readonly startRad: number
  readonly sweepRad: number
}

/** An elliptical arc; start and end are worked out unless they are given, so that neighbours can share the very same numbers. */
export function ellipseFrom(
  shape: EllipseShape,
  ends: { readonly start?: Point; readonly end?: Point } = {},
): EllipseSegment {
  const { centre, semiX, semiY, rotationRad = 0, startRad, sweepRad } = shape
  requireFinite('an ellipse', centre.x, centre.y, semiX, semiY, rotationRad, startRad)
  requireSweep(sweepRad)
  if (semiX <= 0 || semiY <= 0) {
    throw new Failure('input-invalid', {
      says: `the semi-axes of an ellipse must be above 0, not ${semiX} and ${semiY}`,
    })
  }
  const at = (t: number): Point =>
    add(centre, rotated({ x: semiX * Math.cos(t), y: semiY * Math.sin(t) }, rotationRad))
  const start = ends.start ?? at(startRad)
  const end = ends.end ?? at(startRad + sweepRad)
  return { kind: 'ellipse', start, end, centre, semiX, semiY, rotationRad, startRad, sweepRad }
}

/**
 * A quarter ellipse between two points that differ in x and in y, its axes along x and y and its tangents too. It leaves start along x
 * ('level') or along y ('upright'), and so arrives the other way.
 */
export function quarterEllipseFrom(start: Point, end: Point, leaves: 'level' | 'upright'): EllipseSegment {
  const level = leaves === 'level'
  const centre = level ? { x: start.x, y: end.y } : { x: end.x, y: start.y }
  const from = { x: Math.sign(start.x - centre.x), y: Math.sign(start.y - centre.y) }
  const to = { x: Math.sign(end.x - centre.x), y: Math.sign(end.y - centre.y) }
  const startRad = Math.atan2(from.y, from.x)
  const sweepRad = ((from.x * to.y - from.y * to.x) * Math.PI) / 2
  const shape = {
    centre,
    semiX: Math.abs(end.x - start.x),
    semiY: Math.abs(end.y - start.y),
    startRad,
    sweepRad,
  }
  return ellipseFrom(shape, { start, end })
}

export function cubicFrom(start: Point, control1: Point, control2: Point, end: Point): CubicSegment {
  requireFinite('a cubic', start.x, start.y, control1.x, control1.y, control2.x, control2.y, end.x, end.y)
  return { kind: 'cubic', start, control1, control2, end }
}
