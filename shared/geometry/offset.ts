import { assertNever } from '@shared/failure'
import { CURVE_TO_ARC_MM } from '@shared/units'
import { radiusOf } from './arc'
import { arcsFromCurve } from './biarc'
import { endTangentOf, startTangentOf } from './evaluate'
import { isSamePoint } from './point'
import type { ArcSegment, LineSegment, Path, Point, Segment } from './segment'

/**
 * The curve at a distance (mm) to the left of a segment, to the right where it is negative. A line gives a line, an arc one arc about the same
 * centre, or [] where the distance reaches its centre. Ellipses and cubics are followed by arcs within accuracyMm and these offset: stretches
 * curved too sharply for the distance are left out, so that the pieces on either side of such a stretch do not join.
 */
export function offsetSegment(
  segment: Segment,
  distanceMm: number,
  accuracyMm: number = CURVE_TO_ARC_MM,
): Path {
  switch (segment.kind) {
    case 'line':
      return isSamePoint(segment.start, segment.end) ? [] : [shiftedLine(segment, distanceMm)]
    case 'arc':
      return offsetArc(segment, distanceMm)
    case 'ellipse':
    case 'cubic':
      return joined(arcsFromCurve(segment, accuracyMm).map((piece) => offsetSegment(piece, distanceMm)))
    default:
      return assertNever(segment)
  }
}

const beside = (point: Point, tangent: Point, distanceMm: number): Point => ({
  x: point.x - tangent.y * distanceMm,
  y: point.y + tangent.x * distanceMm,
})

function shiftedLine(line: LineSegment, distanceMm: number): LineSegment {
  const tangent = startTangentOf(line)
  return {
    kind: 'line',
    start: beside(line.start, tangent, distanceMm),
    end: beside(line.end, tangent, distanceMm),
  }
}

/** A left turn has its centre on the left: its radius shrinks by a distance to the left, a right turn's grows. */
function offsetArc(arc: ArcSegment, distanceMm: number): Path {
  if (isSamePoint(arc.start, arc.end)) return []
  const remains = radiusOf(arc) - distanceMm * Math.sign(arc.bulge)
  if (!(remains > 0)) return []
  const start = beside(arc.start, startTangentOf(arc), distanceMm)
  const end = beside(arc.end, endTangentOf(arc), distanceMm)
  return [{ kind: 'arc', start, end, bulge: arc.bulge }]
}

/** Pieces of smooth neighbours end at the same place but for rounding: the next is made to start at the very same numbers. */
function joined(pieces: readonly Path[]): Path {
  const path: Segment[] = []
  let isUnbroken = false
  for (const [piece] of pieces) {
    const last = path.at(-1)
    if (piece) path.push(last && isUnbroken ? { ...piece, start: last.end } : piece)
    isUnbroken = piece !== undefined
  }
  return path
}
