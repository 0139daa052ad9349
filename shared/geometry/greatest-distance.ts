import { Failure } from '@shared/failure'
import { DIFFERENCE_ACCURACY_MM } from '@shared/units'
import { bendOf, pointAt } from './evaluate'
import { nearestOnPath, nearestOnSegment, type NearestOnPath, type NearestOnSegment } from './nearest'
import { distance, isSamePoint } from './point'
import type { Path, Point, Segment } from './segment'

/** How far two paths are from being the same: the greatest distance from a point of either to the other, and where. */
export interface GreatestDistance {
  readonly distance: number
  /** On the path named. */
  readonly from: Point
  readonly to: Point
  readonly on: 'a' | 'b'
}

/** Greatest distance between two paths (Hausdorff's), mm, to within accuracyMm; nothing is flattened. */
export function greatestDistanceBetween(
  a: Path,
  b: Path,
  { accuracyMm = DIFFERENCE_ACCURACY_MM }: { readonly accuracyMm?: number } = {},
): GreatestDistance {
  if (!(accuracyMm > 0)) {
    throw new Failure('input-invalid', { says: `an accuracy must be above 0 mm, not ${accuracyMm}` })
  }
  const there = farthestFrom(a, b, accuracyMm)
  const back = farthestFrom(b, a, accuracyMm)
  return there.distance >= back.distance ? { ...there, on: 'a' } : { ...back, on: 'b' }
}

interface Sample {
  readonly t: number
  readonly at: Point
  readonly near: NearestOnPath
}

type Farthest = Omit<GreatestDistance, 'on'>

function farthestFrom(path: Path, other: Path, accuracyMm: number): Farthest {
  let best: Farthest | undefined
  const take = ({ at, near }: Sample): void => {
    if (!best || near.distance > best.distance) best = { distance: near.distance, from: at, to: near.point }
  }
  for (const segment of path) {
    if (other.some((candidate) => isSameSegment(candidate, segment))) {
      best ??= { distance: 0, from: segment.start, to: segment.start }
      continue
    }
    const sample = (t: number): Sample => {
      const at = pointAt(segment, t)
      return { t, at, near: nearestOnPath(other, at) }
    }
    const bend = bendOf(segment)
    const first = sample(0)
    const last = sample(1)
    take(first)
    take(last)
    const pending: [Sample, Sample][] = [[first, last]]
    for (let pair = pending.pop(); pair; pair = pending.pop()) {
      const [from, to] = pair
      if (mostBetween(from, to, other, bend) <= (best?.distance ?? 0) + accuracyMm) continue
      const middle = sample((from.t + to.t) / 2)
      take(middle)
      pending.push([from, middle], [middle, to])
    }
  }
  if (!best)
    throw new Failure('input-invalid', { says: 'a path without segments has no distance to another' })
  return best
}

/** Segments of two issues of a drawing are mostly the very same. */
function isSameSegment(a: Segment, b: Segment): boolean {
  if (a === b) return true
  if (a.kind !== b.kind || !isSamePoint(a.start, b.start) || !isSamePoint(a.end, b.end)) return false
  return JSON.stringify(a) === JSON.stringify(b)
}

/**
 * No point between two samples is farther from the other path than this. Always: distance changes no faster than one moves. And against any
 * one segment of the other path: a point and the point of that segment running beside it (both evenly in their parameters) are never farther
 * apart than the farther pair of ends, but for what each curve leaves its chord: which is of second order, and 0 for lines.
 */
function mostBetween(from: Sample, to: Sample, other: Path, bend: number): number {
  const sag = (bend * (to.t - from.t) ** 2) / 8
  const chord = distance(from.at, to.at)
  const byMoving = (from.near.distance + to.near.distance + chord) / 2 + sag
  const first = other[from.near.segment]
  const second = other[to.near.segment]
  if (!first || !second) return byMoving
  if (first === second) return Math.min(byMoving, sag + mostBeside(first, from.near, to.near))
  const besideFirst = mostBeside(first, from.near, nearestOnSegment(first, to.at))
  const besideSecond = mostBeside(second, nearestOnSegment(second, from.at), to.near)
  return Math.min(byMoving, sag + besideFirst, sag + besideSecond)
}

function mostBeside(segment: Segment, from: NearestOnSegment, to: NearestOnSegment): number {
  const sag = (bendOf(segment) * (to.t - from.t) ** 2) / 8
  return Math.max(from.distance, to.distance) + sag
}
