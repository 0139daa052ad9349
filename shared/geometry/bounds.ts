import { assertNever, Failure } from '@shared/failure'
import { sweepOf } from './arc'
import { pointAt } from './evaluate'
import { quadraticRootsOf } from './roots'
import type { ArcSegment, CubicSegment, EllipseSegment, Path, Point, Segment } from './segment'

export type Axis = 'x' | 'y'

/** Least box along the axes, mm. */
export interface Bounds {
  readonly min: Point
  readonly max: Point
}

/** Parameters 0 < t < 1, in increasing order, at which a segment turns back in x (or in y); between them it is monotone. */
export function extremaOf(segment: Segment, axis: Axis): readonly number[] {
  switch (segment.kind) {
    case 'line':
      return []
    case 'arc':
      return arcExtremaOf(segment, axis)
    case 'ellipse':
      return ellipseExtremaOf(segment, axis)
    case 'cubic':
      return cubicExtremaOf(segment, axis)
    default:
      return assertNever(segment)
  }
}

/** An arc turns back in x where its tangent stands upright; the tangent's angle runs evenly from chord − s/2 to chord + s/2. */
function arcExtremaOf(arc: ArcSegment, axis: Axis): readonly number[] {
  const sweep = sweepOf(arc)
  const chordRad = Math.atan2(arc.end.y - arc.start.y, arc.end.x - arc.start.x)
  return stationsWithin(axis === 'x' ? Math.PI / 2 : 0, chordRad - sweep / 2, sweep)
}

function ellipseExtremaOf(ellipse: EllipseSegment, axis: Axis): readonly number[] {
  const { semiX, semiY, rotationRad, startRad, sweepRad } = ellipse
  const c = Math.cos(rotationRad)
  const s = Math.sin(rotationRad)
  const angle = axis === 'x' ? Math.atan2(-semiY * s, semiX * c) : Math.atan2(semiY * c, semiX * s)
  return stationsWithin(angle, startRad, sweepRad)
}

/** Fractions 0 < t < 1 at which startRad + t sweepRad is angleRad or half a turn from it. */
function stationsWithin(angleRad: number, startRad: number, sweepRad: number): readonly number[] {
  if (sweepRad === 0) return []
  const stations: number[] = []
  const least = Math.min(startRad, startRad + sweepRad)
  const greatest = Math.max(startRad, startRad + sweepRad)
  for (let k = Math.ceil((least - angleRad) / Math.PI); angleRad + k * Math.PI <= greatest; k += 1) {
    const t = (angleRad + k * Math.PI - startRad) / sweepRad
    if (t > 0 && t < 1) stations.push(t)
  }
  return sweepRad > 0 ? stations : stations.reverse()
}

function cubicExtremaOf({ start, control1, control2, end }: CubicSegment, axis: Axis): readonly number[] {
  const d0 = control1[axis] - start[axis]
  const d1 = control2[axis] - control1[axis]
  const d2 = end[axis] - control2[axis]
  const roots = quadraticRootsOf(d0 - 2 * d1 + d2, 2 * (d1 - d0), d0)
  const inside = roots.filter((t) => t > 0 && t < 1)
  return inside.length === 2 && inside[0] === inside[1] ? [] : inside
}

/** Least box of a path along the axes, by true extrema of the curves. */
export function boundsOf(path: Path | Segment): Bounds {
  const segments = 'kind' in path ? [path] : path
  if (segments.length === 0)
    throw new Failure('input-invalid', { says: 'a path without segments has no bounds' })
  let minX = Infinity
  let minY = Infinity
  let maxX = -Infinity
  let maxY = -Infinity
  const include = (x: number, y: number): void => {
    if (x < minX) minX = x
    if (x > maxX) maxX = x
    if (y < minY) minY = y
    if (y > maxY) maxY = y
  }
  for (const segment of segments) {
    include(segment.start.x, segment.start.y)
    include(segment.end.x, segment.end.y)
    if (segment.kind === 'line') continue
    for (const axis of ['x', 'y'] as const) {
      for (const t of extremaOf(segment, axis)) {
        const { x, y } = pointAt(segment, t)
        include(x, y)
      }
    }
  }
  return { min: { x: minX, y: minY }, max: { x: maxX, y: maxY } }
}
