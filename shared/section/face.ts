import { memberEndOf, memberSegments } from './member-segments'
import type { Path, Point } from '@shared/geometry'
import type { Section } from './document'

/** A face from break 0 to break n, sight edge outward, the wood on its right. */
export interface Face {
  readonly path: Path
  /** For each segment of the path the number of the member (from 0) it belongs to. */
  readonly memberOf: readonly number[]
  /** Breaks 0…n, mm. */
  readonly breaks: readonly Point[]
}

/** The finished face, exact: what a photograph shows and the curator approves. */
export function faceOf(section: Section): Face {
  const path = []
  const memberOf: number[] = []
  const breaks: Point[] = [{ x: 0, y: section.sightEdgeHeight }]
  let start = breaks[0] as Point
  for (const [index, member] of section.members.entries()) {
    for (const segment of memberSegments(member, start)) {
      path.push(segment)
      memberOf.push(index)
    }
    start = memberEndOf(member, start)
    breaks.push(start)
  }
  return { path, memberOf, breaks }
}
