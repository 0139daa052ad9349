import { Failure } from '@shared/failure'
import { DIFFERENCE_ACCURACY_MM } from '@shared/units'
import { bendOf, pointAt } from './evaluate'
import { nearestOnPath, type NearestOnPath } from './nearest'
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

/**
 * No point between two samples is farther from the other path than this. Always: distance changes no faster than one moves. Where both are
 * nearest to one segment: a point and the point of that segment running beside it (both evenly in their parameters) are never farther apart
 * than the farther pair of ends, but for what each curve leaves its chord: which is of second order, and 0 for lines.
 */
function mostBetween(from: Sample, to: Sample, other: Path, bend: number): number {
  const sag = (bend * (to.t - from.t) ** 2) / 8
  const chord = Math.hypot(to.at.x - from.at.x, to.at.y - from.at.y)
  const byMoving = (from.near.distance + to.near.distance + chord) / 2 + sag
  if (from.near.segment !== to.near.segment) return byMoving
  const beside = other[from.near.segment] as Segment
  const sagBeside = (bendOf(beside) * (to.near.t - from.near.t) ** 2) / 8
  return Math.min(byMoving, Math.max(from.near.distance, to.near.distance) + sag + sagBeside)
}
