import { boundsOf, extremaOf, type Bounds } from './bounds'
import { intersectionsOf, type Meeting } from './intersect'
import { isSamePoint } from './point'
import { subSegment } from './split'
import type { Path, Segment } from './segment'

/** A place where two segments of paths meet; segments are named by their index. */
export interface PathMeeting extends Meeting {
  readonly segmentA: number
  readonly segmentB: number
}

/** All places where path a meets path b, in order along a. */
export function pathIntersectionsOf(a: Path, b: Path): readonly PathMeeting[] {
  const boxesB = b.map(boundsOf)
  return a.flatMap((segmentA, indexA) => {
    const box = boundsOf(segmentA)
    const meetings = b.flatMap((segmentB, indexB) => {
      const other = boxesB[indexB]
      if (!other || isApart(box, other)) return []
      return intersectionsOf(segmentA, segmentB).map((m) => ({ segmentA: indexA, segmentB: indexB, ...m }))
    })
    return meetings.sort((m, n) => m.tA - n.tA)
  })
}

/** mm; boxes this much apart hold no meeting. */
const BOX_REACH_MM = 1e-8

const isApart = (a: Bounds, b: Bounds): boolean =>
  a.min.x > b.max.x + BOX_REACH_MM ||
  b.min.x > a.max.x + BOX_REACH_MM ||
  a.min.y > b.max.y + BOX_REACH_MM ||
  b.min.y > a.max.y + BOX_REACH_MM

/** A part of a segment that cannot meet itself, with the parameters it has there. */
interface Piece {
  readonly segment: number
  readonly from: number
  readonly to: number
  readonly curve: Segment
  readonly box: Bounds
}

/**
 * Places where a path meets itself other than at the joints of neighbours (nor where a closed path closes), segmentA ≤ segmentB. Overlaps count:
 * a path that folds back on itself is reported at the ends of the common stretch, joints excepted.
 */
export function selfCrossingsOf(path: Path): readonly PathMeeting[] {
  const pieces = path.flatMap(piecesOf)
  const byX = pieces.map((_, i) => i).sort((i, j) => leftOfPiece(pieces, i) - leftOfPiece(pieces, j))
  const crossings: PathMeeting[] = []
  byX.forEach((i, place) => {
    const piece = pieces[i]
    if (!piece) return
    for (let next = place + 1; next < byX.length; next += 1) {
      const other = pieces[byX[next] ?? 0]
      if (!other || other.box.min.x > piece.box.max.x + BOX_REACH_MM) break
      if (isApart(piece.box, other.box)) continue
      if (onlyMeetAtJoint(piece, other)) continue
      const [first, second] = comesBefore(piece, other) ? [piece, other] : [other, piece]
      crossings.push(...crossingsOf(first, second))
    }
  })
  return crossings.sort(
    (m, n) => m.segmentA + m.tA - n.segmentA - n.tA || m.segmentB + m.tB - n.segmentB - n.tB,
  )
}

/** mm; less than this across is upright as far as boxes can tell. */
const NARROW_MM = 1e-6

/** Neighbours that both run on in x, to either side of their joint, share nothing else: most neighbours of a face. */
function onlyMeetAtJoint(a: Piece, b: Piece): boolean {
  const common = Math.min(a.box.max.x, b.box.max.x) - Math.max(a.box.min.x, b.box.min.x)
  if (common > 0) return false
  const isJoined = isSamePoint(a.curve.end, b.curve.start) || isSamePoint(b.curve.end, a.curve.start)
  return isJoined && runsOnInX(a.curve) && runsOnInX(b.curve)
}

const runsOnInX = (curve: Segment): boolean =>
  Math.abs(curve.end.x - curve.start.x) > NARROW_MM && extremaOf(curve, 'x').length === 0

const leftOfPiece = (pieces: readonly Piece[], i: number): number => pieces[i]?.box.min.x ?? 0

const comesBefore = (a: Piece, b: Piece): boolean => a.segment + a.from < b.segment + b.from

/** A cubic can loop: between its turns in x and y it cannot. The other kinds turn less than a full circle and never meet themselves. */
function piecesOf(segment: Segment, index: number): readonly Piece[] {
  const turns = segment.kind === 'cubic' ? [...extremaOf(segment, 'x'), ...extremaOf(segment, 'y')] : []
  const stations = [0, ...turns.sort((s, t) => s - t), 1].filter(
    (t, i, all) => i === 0 || t > (all[i - 1] ?? 0),
  )
  return stations.slice(1).map((to, i) => {
    const from = stations[i] ?? 0
    const curve = subSegment(segment, from, to)
    return { segment: index, from, to, curve, box: boundsOf(curve) }
  })
}

function crossingsOf(a: Piece, b: Piece): readonly PathMeeting[] {
  return intersectionsOf(a.curve, b.curve)
    .filter(
      ({ tA, tB, point }) =>
        !isAtJoint(a, b, { tA, tB, point }) && !isAtJoint(b, a, { tA: tB, tB: tA, point }),
    )
    .map(({ tA, tB, point }) => ({
      segmentA: a.segment,
      segmentB: b.segment,
      tA: a.from + tA * (a.to - a.from),
      tB: b.from + tB * (b.to - b.from),
      point,
    }))
}

/** Whether a meeting is where `first` ends and `second` starts. */
const isAtJoint = (first: Piece, second: Piece, { tA, tB }: Meeting): boolean =>
  tA === 1 && tB === 0 && isSamePoint(first.curve.end, second.curve.start)
