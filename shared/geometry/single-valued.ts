import { TURN_BACK_MM } from '@shared/units'
import { extremaOf } from './bounds'
import { pointAt } from './evaluate'
import type { Path } from './segment'

/**
 * Whether x never turns back along a path (upright walls are allowed), so that a head coming straight down reaches all of it.
 * Falling back by less than TURN_BACK_MM is rounding: a quarter circle ends upright.
 */
export function isSingleValuedInX(path: Path): boolean {
  const first = path[0]
  const last = path.at(-1)
  if (!first || !last) return true
  const sense = last.end.x < first.start.x ? -1 : 1
  let furthest = sense * first.start.x
  for (const segment of path) {
    for (const t of [...extremaOf(segment, 'x'), 1]) {
      const x = sense * pointAt(segment, t).x
      if (x < furthest - TURN_BACK_MM) return false
      if (x > furthest) furthest = x
    }
  }
  return true
}
