import { cutAt, extremaOf, tangentAt, turnedBy } from '@shared/geometry'
import type { Path, Point, Segment } from '@shared/geometry'

/** A stretch of the face that stands nearer to upright than an angle. */
export interface SteepWall {
  readonly heightMm: number
  /** Half way up. */
  readonly at: Point
}

/** A slope this near to the limit is within it: rounding of sines. */
const ROUNDING = 1e-12

/** The highest unbroken stretch, rising or falling, within angleRad of upright; undefined where there is none. */
export function findSteepestWall(face: Path, angleRad: number): SteepWall | undefined {
  let highest: SteepWall | undefined
  let foot: Point | undefined
  let sense = 0
  for (const piece of face.flatMap((segment) => piecesBySlope(segment, angleRad))) {
    const tangent = tangentAt(piece, 0.5)
    const isSteep = Math.abs(tangent.x) < Math.sin(angleRad) - ROUNDING
    if (!isSteep || Math.sign(tangent.y) !== sense) foot = isSteep ? piece.start : undefined
    sense = isSteep ? Math.sign(tangent.y) : 0
    if (!foot) continue
    const heightMm = Math.abs(piece.end.y - foot.y)
    if (heightMm > (highest?.heightMm ?? 0))
      highest = { heightMm, at: { x: (foot.x + piece.end.x) / 2, y: (foot.y + piece.end.y) / 2 } }
  }
  return highest
}

/** A segment cut wherever its slope passes the angle from upright: there it stands upright once turned by that angle. */
function piecesBySlope(segment: Segment, angleRad: number): readonly Segment[] {
  if (segment.kind === 'line') return [segment]
  const stations = [angleRad, -angleRad].flatMap((turn) =>
    turnedBy([segment], turn).flatMap((turned) => extremaOf(turned, 'x')),
  )
  return cutAt(
    segment,
    [...new Set(stations)].sort((s, t) => s - t),
  )
}
