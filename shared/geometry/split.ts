import { assertNever, Failure } from '@shared/failure'
import { sweepOf } from './arc'
import { extremaOf, type Axis } from './bounds'
import { pointAt } from './evaluate'
import { bracketedRootOf } from './roots'
import { between } from './point'
import type { CubicSegment, Path, Point, Segment } from './segment'

/** A segment cut at 0 < t < 1 into two that run the same curve and share the very same point. */
export function splitAt(segment: Segment, t: number): readonly [Segment, Segment] {
  if (!(t > 0 && t < 1))
    throw new Failure('input-invalid', { says: `a segment is cut between 0 and 1, not at ${t}` })
  const joint = pointAt(segment, t)
  return [stretchOf(segment, 0, t, { end: joint }), stretchOf(segment, t, 1, { start: joint })]
}

/** The stretch of a segment from t0 to t1, 0 ≤ t0 < t1 ≤ 1, on the same curve. */
export function subSegment(segment: Segment, t0: number, t1: number): Segment {
  if (!(t0 >= 0 && t0 < t1 && t1 <= 1)) {
    throw new Failure('input-invalid', { says: `a stretch runs from 0 up to 1, not from ${t0} to ${t1}` })
  }
  return t0 === 0 && t1 === 1 ? segment : stretchOf(segment, t0, t1, {})
}

function stretchOf(
  segment: Segment,
  t0: number,
  t1: number,
  ends: { readonly start?: Point; readonly end?: Point },
): Segment {
  const start = ends.start ?? pointAt(segment, t0)
  const end = ends.end ?? pointAt(segment, t1)
  switch (segment.kind) {
    case 'line':
      return { kind: 'line', start, end }
    case 'arc':
      return { kind: 'arc', start, end, bulge: Math.tan((sweepOf(segment) * (t1 - t0)) / 4) }
    case 'ellipse':
      return {
        ...segment,
        start,
        end,
        startRad: segment.startRad + t0 * segment.sweepRad,
        sweepRad: (t1 - t0) * segment.sweepRad,
      }
    case 'cubic':
      return {
        kind: 'cubic',
        start,
        control1: blossomOf(segment, t0, t0, t1),
        control2: blossomOf(segment, t0, t1, t1),
        end,
      }
    default:
      return assertNever(segment)
  }
}

/** The cubic's polar form: de Casteljau's construction with its own parameter at each of the three steps. */
function blossomOf({ start, control1, control2, end }: CubicSegment, r: number, s: number, t: number): Point {
  const a = between(start, control1, r)
  const b = between(control1, control2, r)
  const c = between(control2, end, r)
  return between(between(a, b, s), between(b, c, s), t)
}

/** Stretches of a segment, in order, in which neither x (or the axis given) turns back. */
export function monotonePiecesOf(segment: Segment, axis: Axis = 'x'): readonly Segment[] {
  return cutAt(segment, extremaOf(segment, axis))
}

/** A segment cut at several increasing parameters. */
export function cutAt(segment: Segment, parameters: readonly number[]): readonly Segment[] {
  const inside = parameters.filter((t) => t > 0 && t < 1)
  const joints = inside.map((t) => pointAt(segment, t))
  const stations = [0, ...inside, 1]
  return stations.slice(1).map((t1, i) => {
    const start = joints[i - 1]
    const end = joints[i]
    return stretchOf(segment, stations[i] ?? 0, t1, { ...(start && { start }), ...(end && { end }) })
  })
}

/** Parameters, increasing, at which a segment has the given x (or y); a stretch that lies wholly on it gives its two ends. */
export function parametersAt(segment: Segment, axis: Axis, value: number): readonly number[] {
  const stations = [0, ...extremaOf(segment, axis), 1]
  const found: number[] = []
  const include = (t: number): void => {
    if (found.at(-1) !== t) found.push(t)
  }
  for (let i = 1; i < stations.length; i += 1) {
    const from = stations[i - 1] ?? 0
    const to = stations[i] ?? 1
    const before = pointAt(segment, from)[axis] - value
    const after = pointAt(segment, to)[axis] - value
    if (before === 0) include(from)
    if (before * after < 0) include(bracketedRootOf((t) => pointAt(segment, t)[axis] - value, from, to))
    if (after === 0) include(to)
  }
  return found
}

/** A segment cut wherever it crosses the vertical line at x; the joints have that very x. */
export function splitAtX(segment: Segment, x: number): readonly Segment[] {
  const inside = parametersAt(segment, 'x', x).filter((t) => t > 0 && t < 1)
  const joints = inside.map((t): Point => ({ x, y: pointAt(segment, t).y }))
  const stations = [0, ...inside, 1]
  return stations.slice(1).map((t1, i) => {
    const start = joints[i - 1]
    const end = joints[i]
    return stretchOf(segment, stations[i] ?? 0, t1, { ...(start && { start }), ...(end && { end }) })
  })
}

/** A path cut wherever it crosses the vertical line at x. */
export const pathSplitAtX = (path: Path, x: number): Path => path.flatMap((segment) => splitAtX(segment, x))
