import { assertNever, Failure } from '@shared/failure'
import { CHORD_ERROR_MM } from '@shared/units'
import { isStraight, radiusOf, sweepOf } from './arc'
import { bendOf, pointAt } from './evaluate'
import type { Path, Point, Segment } from './segment'

/** Finer chords would only add rounding, and points without number. */
const LEAST_CHORD_ERROR_MM = 1e-9

/**
 * Points on a path whose chords leave it nowhere by more than chordErrorMm. Each segment's own ends are among them; a closed path's first point
 * is not repeated at the end.
 */
export function flattened(path: Path, chordErrorMm: number = CHORD_ERROR_MM): readonly Point[] {
  if (!(chordErrorMm >= LEAST_CHORD_ERROR_MM)) {
    throw new Failure('input-invalid', {
      says: `a chord error must be at least ${LEAST_CHORD_ERROR_MM} mm, not ${chordErrorMm}`,
    })
  }
  const first = path[0]
  if (!first) return []
  const points: Point[] = [first.start]
  for (const segment of path) {
    const count = chordsOf(segment, chordErrorMm)
    for (let i = 1; i <= count; i += 1) points.push(pointAt(segment, i === count ? 1 : i / count))
  }
  const last = points.at(-1)
  if (points.length > 1 && last && last.x === first.start.x && last.y === first.start.y) points.pop()
  return points
}

/** Equal steps of the parameter that keep every chord within the error. */
function chordsOf(segment: Segment, chordErrorMm: number): number {
  switch (segment.kind) {
    case 'line':
      return 1
    case 'arc': {
      if (isStraight(segment)) return 1
      // sagitta of a step: r (1 − cos(step/2)) = 2 r sin²(step/4)
      const sine = Math.sqrt(Math.min(1, chordErrorMm / (2 * radiusOf(segment))))
      const step = Math.min(4 * Math.asin(sine), (2 * Math.PI) / 3)
      return Math.max(1, Math.ceil(Math.abs(sweepOf(segment)) / step))
    }
    case 'ellipse':
    case 'cubic':
      return Math.max(
        segment.kind === 'ellipse' ? 2 : 1,
        Math.ceil(Math.sqrt(bendOf(segment) / (8 * chordErrorMm))),
      )
    default:
      return assertNever(segment)
  }
}
