/**
 * Plane geometry in millimetres and radians, y up, counter-clockwise positive.
 * Segments are plain readonly data: they serialise, compare, and sit in a shallow ref without proxies.
 */

/** A point or a vector of the plane, mm. */
export interface Point {
  readonly x: number
  readonly y: number
}

/** A straight line from start to end. */
export interface LineSegment {
  readonly kind: 'line'
  readonly start: Point
  readonly end: Point
}

/** A circular arc; bulge = tan(sweep / 4), positive when it turns left (counter-clockwise) from start to end, |bulge| = 1 a half circle. */
export interface ArcSegment {
  readonly kind: 'arc'
  readonly start: Point
  readonly end: Point
  readonly bulge: number
}

/**
 * An elliptical arc. A point of it is centre + R(rotationRad)·(semiX·cos t, semiY·sin t), t from startRad to startRad + sweepRad;
 * start and end are stored so that neighbours share them exactly.
 */
export interface EllipseSegment {
  readonly kind: 'ellipse'
  readonly start: Point
  readonly end: Point
  readonly centre: Point
  readonly semiX: number
  readonly semiY: number
  readonly rotationRad: number
  readonly startRad: number
  readonly sweepRad: number
}

/** A cubic Bézier. */
export interface CubicSegment {
  readonly kind: 'cubic'
  readonly start: Point
  readonly control1: Point
  readonly control2: Point
  readonly end: Point
}

export type Segment = LineSegment | ArcSegment | EllipseSegment | CubicSegment

/** Segments that follow one another, each starting where the one before ends (the very same numbers). */
export type Path = readonly Segment[]

/** A closed path: the last segment ends where the first starts. Counter-clockwise when its area is positive. */
export type Outline = Path
