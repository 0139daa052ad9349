import {
  boundsOf,
  cross,
  distance,
  dot,
  endTangentOf,
  intersectionsOf,
  startTangentOf,
  subSegment,
} from '@shared/geometry'
import type { Bounds, Segment } from '@shared/geometry'
import type { FacePiece } from './wood-offset'

/** mm. Meetings nearer than this are one, and a piece shorter than this is a point. */
const POINT_MM = 1e-9
/** Boxes this much apart hold no meeting, mm. */
const BOX_REACH_MM = 1e-8

/** A place of the chain: a piece and the parameter on it. */
interface Place {
  readonly index: number
  readonly t: number
}

/** The first place at which the walk meets the chain further on. */
interface Jump {
  readonly at: number
  readonly to: Place
}

/**
 * The chain with its loops cut off: it is walked from its start, and wherever it meets itself further on the walk goes on from there. At such a
 * place what lies between is nearer to the face than its gesso is thick; of several places met at once the furthest on counts.
 */
export function withoutLoops(chain: readonly FacePiece[]): readonly FacePiece[] {
  const boxes = chain.map(({ segment }) => boundsOf(segment))
  const walked: FacePiece[] = []
  let place: Place = { index: 0, t: 0 }
  while (place.index < chain.length) {
    const jump = jumpFrom(chain, boxes, place)
    take(walked, chain[place.index] as FacePiece, place.t, jump?.at ?? 1)
    place = jump ? jump.to : { index: place.index + 1, t: 0 }
    if (place.t === 1) place = { index: place.index + 1, t: 0 }
  }
  return walked
}

function take(walked: FacePiece[], { segment, member }: FacePiece, from: number, to: number): void {
  if (to <= from) return
  const piece = subSegment(segment, from, to)
  if (distance(piece.start, piece.end) <= POINT_MM && piece.kind === 'line') return
  const last = walked.at(-1)
  const joined = last ? { ...piece, start: last.segment.end } : piece
  walked.push({ segment: joined, member })
}

function jumpFrom(
  chain: readonly FacePiece[],
  boxes: readonly Bounds[],
  { index, t }: Place,
): Jump | undefined {
  const { segment } = chain[index] as FacePiece
  const box = boxes[index] as Bounds
  let best: (Jump & { readonly length: number }) | undefined
  for (let other = index + 1; other < chain.length; other += 1) {
    if (isApart(box, boxes[other] as Bounds)) continue
    if (other === index + 1 && meetsAtJointAlone(segment, (chain[other] as FacePiece).segment)) continue
    for (const { tA, tB, point } of intersectionsOf(segment, (chain[other] as FacePiece).segment)) {
      const isJoint = other === index + 1 && tA === 1 && tB === 0
      if (isJoint || tA < t || distance(point, subStart(chain, { index, t })) <= POINT_MM) continue
      const length = tA
      const isFirst = !best || length < best.length - nearness(segment)
      const isAsFar = best !== undefined && Math.abs(length - best.length) <= nearness(segment)
      if (isFirst || isAsFar) best = { at: tA, to: { index: other, t: tB }, length }
    }
  }
  return best
}

/**
 * Neighbours that meet nowhere but at their joint, so that there is nothing to look for: lines that do not run straight back on one another, and
 * lines and arcs that run smoothly on (tangent circles have one point in common).
 */
function meetsAtJointAlone(a: Segment, b: Segment): boolean {
  if (!isLineOrArc(a) || !isLineOrArc(b)) return false
  const before = endTangentOf(a)
  const after = startTangentOf(b)
  const sine = Math.abs(cross(before, after))
  const isAhead = dot(before, after) > 0
  if (a.kind === 'line' && b.kind === 'line') return isAhead || sine > STRAIGHT_SINE
  return isAhead && sine <= SMOOTH_SINE
}

const isLineOrArc = ({ kind }: Segment): boolean => kind === 'line' || kind === 'arc'

/** Sines of the angles below which one line runs straight back along another, and a joint is smooth. */
const STRAIGHT_SINE = 1e-6
const SMOOTH_SINE = 1e-9

/** Parameters of a segment that differ by less are one place. */
const nearness = (segment: Segment): number =>
  (2 * POINT_MM) / Math.max(distance(segment.start, segment.end), POINT_MM)

function subStart(chain: readonly FacePiece[], { index, t }: Place) {
  const { segment } = chain[index] as FacePiece
  return t === 0 ? segment.start : subSegment(segment, 0, t).end
}

const isApart = (a: Bounds, b: Bounds): boolean =>
  a.min.x > b.max.x + BOX_REACH_MM ||
  b.min.x > a.max.x + BOX_REACH_MM ||
  a.min.y > b.max.y + BOX_REACH_MM ||
  b.min.y > a.max.y + BOX_REACH_MM
