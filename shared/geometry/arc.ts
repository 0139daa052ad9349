import { Failure } from '@shared/failure'
import type { ArcSegment, Point } from './segment'

/** centre and radius (> 0), mm; startRad the direction from the centre to the start; sweepRad positive to the left, |sweepRad| < 2π. */
export interface ArcGeometry {
  readonly centre: Point
  readonly radius: number
  readonly startRad: number
  readonly sweepRad: number
}

/** So flat that its sagitta is lost in rounding many times over, and its radius beyond the doubles: taken as a line. */
export const isStraight = ({ bulge }: ArcSegment): boolean => Math.abs(bulge) < 1e-100

/** Angle turned through from start to end, rad. */
export const sweepOf = (arc: ArcSegment): number => 4 * Math.atan(arc.bulge)

/** Radius, mm; Infinity for a straight arc, bulge 0. From chord c and bulge b: c (1 + b²) / 4|b|, which is the handbook's (c² + 4h²)/8h with h = bc/2. */
export function radiusOf(arc: ArcSegment): number {
  const chord = Math.hypot(arc.end.x - arc.start.x, arc.end.y - arc.start.y)
  return (chord * (1 + arc.bulge ** 2)) / (4 * Math.abs(arc.bulge))
}

/** Length, mm, exact: the chord times (s/2)/sin(s/2), which needs no radius and stays right for the flattest arc. */
export function arcLengthOf(arc: ArcSegment): number {
  const chord = Math.hypot(arc.end.x - arc.start.x, arc.end.y - arc.start.y)
  const half = 2 * Math.atan(arc.bulge)
  return isStraight(arc) ? chord : chord * (half / (2 * arc.bulge)) * (1 + arc.bulge ** 2)
}

/** Centre, radius, start direction and sweep. A straight arc (bulge 0) has none and is refused. */
export function arcGeometryOf(arc: ArcSegment): ArcGeometry {
  const { start, end, bulge } = arc
  if (bulge === 0)
    throw new Failure('input-invalid', { says: 'an arc without a bulge is straight and has no centre' })
  const offChord = (1 - bulge ** 2) / (4 * bulge)
  const centre = {
    x: (start.x + end.x) / 2 - (end.y - start.y) * offChord,
    y: (start.y + end.y) / 2 + (end.x - start.x) * offChord,
  }
  const startRad = Math.atan2(start.y - centre.y, start.x - centre.x)
  return { centre, radius: radiusOf(arc), startRad, sweepRad: sweepOf(arc) }
}
