import type { Point } from './segment'

/** Vectors and points of the plane, mm; angles in radians, counter-clockwise positive. */
export const pointFrom = (x: number, y: number): Point => ({ x, y })

export const add = (a: Point, b: Point): Point => ({ x: a.x + b.x, y: a.y + b.y })

export const minus = (a: Point, b: Point): Point => ({ x: a.x - b.x, y: a.y - b.y })

export const scaled = (a: Point, factor: number): Point => ({ x: a.x * factor, y: a.y * factor })

export const dot = (a: Point, b: Point): number => a.x * b.x + a.y * b.y

/** z of the cross product: positive when b lies to the left of a. */
export const cross = (a: Point, b: Point): number => a.x * b.y - a.y * b.x

/** Length of a vector. */
export const magnitudeOf = (a: Point): number => Math.hypot(a.x, a.y)

export const distance = (a: Point, b: Point): number => Math.hypot(b.x - a.x, b.y - a.y)

export const distanceSquared = (a: Point, b: Point): number => (b.x - a.x) ** 2 + (b.y - a.y) ** 2

/** The point a fraction t of the way from a to b. */
export const between = (a: Point, b: Point, t: number): Point => ({
  x: a.x + (b.x - a.x) * t,
  y: a.y + (b.y - a.y) * t,
})

/** A quarter turn counter-clockwise: what lies to the left of a. */
export const leftOf = (a: Point): Point => ({ x: -a.y, y: a.x })

/** Direction of a vector, −π to π. */
export const angleOf = (a: Point): number => Math.atan2(a.y, a.x)

/** Unit vector in a direction. */
export const directionFrom = (angleRad: number): Point => ({ x: Math.cos(angleRad), y: Math.sin(angleRad) })

/** Unit vector along a; undefined where a has no direction. */
export function unitOf(a: Point): Point | undefined {
  const size = Math.hypot(a.x, a.y)
  return size > 0 ? { x: a.x / size, y: a.y / size } : undefined
}

/** A vector turned counter-clockwise about the origin. */
export function rotated(a: Point, angleRad: number): Point {
  const c = Math.cos(angleRad)
  const s = Math.sin(angleRad)
  return { x: a.x * c - a.y * s, y: a.x * s + a.y * c }
}

export const isSamePoint = (a: Point, b: Point): boolean => a.x === b.x && a.y === b.y

/** An angle brought to 0 ≤ angle < 2π. */
export function wrappedTurn(angleRad: number): number {
  const turn = 2 * Math.PI
  const rest = angleRad % turn
  return rest < 0 ? rest + turn : rest
}
