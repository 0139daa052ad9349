import { curvatureAt, endTangentOf, extremaOf, pointAt, startTangentOf, tangentAt } from '@shared/geometry'
import type { CubicSegment, Path, Point, Segment } from '@shared/geometry'

/** rad. Tangents as near to opposed as this make a cusp. */
const CUSP_RAD = 1e-6

/**
 * Angle from one segment's end to the next one's start, rad, −π to π: right turns (outer corners of the wood) negative. At a cusp curvature
 * tells a cleft in the wood (+π) from a fin of it (−π).
 */
export function turnAt(before: Segment, after: Segment): number {
  const a = endTangentOf(before)
  const b = startTangentOf(after)
  const turn = Math.atan2(a.x * b.y - a.y * b.x, a.x * b.x + a.y * b.y)
  if (Math.PI - Math.abs(turn) > CUSP_RAD) return turn
  return curvatureAt(before, 1) + curvatureAt(after, 0) > 0 ? -Math.PI : Math.PI
}

/** How far the face turns back under itself for a head coming straight down, mm, and where. */
export interface Overhang {
  readonly overhangMm: number
  readonly at: Point
}

/** The greatest distance by which x falls back behind what lies before it on the face. */
export function overhangOf(face: Path): Overhang {
  const start = face[0]?.start ?? { x: 0, y: 0 }
  let furthest = start.x
  let overhangMm = 0
  let at = start
  for (const segment of face) {
    for (const t of [...extremaOf(segment, 'x'), 1]) {
      const point = pointAt(segment, t)
      furthest = Math.max(furthest, point.x)
      if (furthest - point.x > overhangMm) {
        overhangMm = furthest - point.x
        at = point
      }
    }
  }
  return { overhangMm, at }
}

/** The directions a face takes, rad from x, followed round its turns: an overhang goes beyond ±π/2. */
export interface DirectionRange {
  readonly least: number
  readonly greatest: number
}

export function directionRangeOf(face: Path): DirectionRange {
  let direction = 0
  let least = Infinity
  let greatest = -Infinity
  let before: Segment | undefined
  for (const segment of face) {
    direction = before ? turned(direction, turnAt(before, segment)) : directionOf(startTangentOf(segment))
    let last = directionOf(startTangentOf(segment))
    for (const t of [0, ...inflectionsOf(segment), 1]) {
      const now = directionOf(tangentAt(segment, t))
      direction += wrapped(now - last)
      last = now
      least = Math.min(least, direction)
      greatest = Math.max(greatest, direction)
    }
    before = segment
  }
  return { least, greatest }
}

const directionOf = ({ x, y }: Point): number => Math.atan2(y, x)

/** At a cusp either way round is the same direction; the one nearer to straight on along x is taken. */
function turned(direction: number, turn: number): number {
  if (Math.PI - Math.abs(turn) > CUSP_RAD) return direction + turn
  return direction > 0 ? direction - Math.PI : direction + Math.PI
}

function wrapped(angle: number): number {
  return angle - 2 * Math.PI * Math.round(angle / (2 * Math.PI))
}

/** Parameters 0 < t < 1 between which the tangent turns one way only and by less than a half turn: arcs and ellipses are halved, cubics cut at inflections. */
function inflectionsOf(segment: Segment): readonly number[] {
  if (segment.kind === 'line') return []
  if (segment.kind !== 'cubic') return [1 / 3, 2 / 3]
  const turns = [...cubicInflectionsOf(segment), ...extremaOf(segment, 'x'), ...extremaOf(segment, 'y')]
  return turns.filter((t) => t > 0 && t < 1).sort((a, b) => a - b)
}

/** Roots of cross(P′, P″), a quadratic: with a, b, c the control polygon's sides, (a×b)(1−t)² + (a×c) t(1−t) + (b×c) t². */
function cubicInflectionsOf({ start, control1, control2, end }: CubicSegment): readonly number[] {
  const a = { x: control1.x - start.x, y: control1.y - start.y }
  const b = { x: control2.x - control1.x, y: control2.y - control1.y }
  const c = { x: end.x - control2.x, y: end.y - control2.y }
  const ab = a.x * b.y - a.y * b.x
  const ac = a.x * c.y - a.y * c.x
  const bc = b.x * c.y - b.y * c.x
  const second = ab - ac + bc
  const first = ac - 2 * ab
  if (second === 0) return first === 0 ? [] : [-ab / first]
  const discriminant = first * first - 4 * second * ab
  if (discriminant < 0) return []
  const root = Math.sqrt(discriminant)
  return [(-first - root) / (2 * second), (-first + root) / (2 * second)]
}
