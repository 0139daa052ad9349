import { arcGeometryOf } from './arc'
import { add, cross, distance, dot, leftOf, magnitudeOf, minus, scaled } from './point'
import type { ArcSegment, LineSegment, Point } from './segment'

/** Places where two whole lines or circles may meet; whether they lie on the segments is for the caller to see. */

/** Lines as parallel as this (sine of the angle between them) meet nowhere in particular; overlaps are found from their ends. */
const PARALLEL_SINE = 1e-14

export function lineLinePlaces(a: LineSegment, b: LineSegment): readonly Point[] {
  const u = minus(a.end, a.start)
  const v = minus(b.end, b.start)
  const z = cross(u, v)
  if (Math.abs(z) <= PARALLEL_SINE * magnitudeOf(u) * magnitudeOf(v)) return []
  return [add(a.start, scaled(u, cross(minus(b.start, a.start), v) / z))]
}

export function lineArcPlaces(line: LineSegment, arc: ArcSegment): readonly Point[] {
  const { centre, radius } = arcGeometryOf(arc)
  const along = minus(line.end, line.start)
  const length = magnitudeOf(along)
  if (length === 0) return []
  const unit = scaled(along, 1 / length)
  const foot = add(line.start, scaled(unit, dot(minus(centre, line.start), unit)))
  return placesBeside(foot, unit, halfChordOf(radius, distance(centre, foot)))
}

export function arcArcPlaces(a: ArcSegment, b: ArcSegment): readonly Point[] {
  const first = arcGeometryOf(a)
  const second = arcGeometryOf(b)
  const between = minus(second.centre, first.centre)
  const apart = magnitudeOf(between)
  if (apart <= 1e-15 * first.radius) return []
  const unit = scaled(between, 1 / apart)
  // the common chord stands square on the line of centres, this far from the first centre
  const along = (apart + ((first.radius - second.radius) * (first.radius + second.radius)) / apart) / 2
  const foot = add(first.centre, scaled(unit, along))
  return placesBeside(foot, leftOf(unit), halfChordOf(first.radius, Math.abs(along)))
}

/** Half the chord that a line leaves at a distance from a circle's centre; 0 where it passes outside (it may still touch within rounding). */
const halfChordOf = (radius: number, off: number): number =>
  Math.sqrt(Math.max(0, (radius - off) * (radius + off)))

const placesBeside = (foot: Point, unit: Point, half: number): readonly Point[] =>
  half === 0 ? [foot] : [add(foot, scaled(unit, -half)), foot, add(foot, scaled(unit, half))]
