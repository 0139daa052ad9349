import type { Path, Segment } from '@shared/geometry'
import { KNIFE_OUTLINE_MM } from '@shared/units'
import { arcsWithin, isArcOrLine } from './arc-fit'
import type { ArcOrLine } from './arc-fit'
import { faceDepthOf, faceExtentOf, knifeCurveOf, mirroredX, turnsOf } from './face-curve'
import type { FaceExtent } from './face-curve'
import { faceOffsetOf, findDepthRefusal } from './head'
import type { DepthRefused, KnifeHead } from './head'

/** Stands on every drawing of the corrected outline. */
export const CORRECTED_NOTE = 'already corrected for the hook; not a template'

export interface CorrectedOutline {
  readonly kind: 'corrected'
  /**
   * Lines and arcs from the sight edge to the back edge as seen on the knife's face: X = −x, the mirror of the section;
   * Y = height on the knife from the tip line back. Neighbours share their ends; the ends of face segments are exact.
   */
  readonly path: readonly ArcOrLine[]
  readonly note: typeof CORRECTED_NOTE
}

/** The edge that cuts a wood face, corrected for the hook, within KNIFE_OUTLINE_MM; refused where the head cannot cut it. */
export function correctedOutline(face: Path, head: KnifeHead): CorrectedOutline | DepthRefused {
  const extent = faceExtentOf(face)
  const refusal = findDepthRefusal(head, faceDepthOf(extent))
  if (refusal !== undefined) return refusal
  const path = face.flatMap((segment) => edgeOf(segment, extent, head))
  return { kind: 'corrected', path, note: CORRECTED_NOTE }
}

function edgeOf(segment: Segment, extent: FaceExtent, head: KnifeHead): ArcOrLine[] {
  if (faceOffsetOf(head) === 0 && isArcOrLine(segment)) return [mirroredEdge(segment, extent)]
  const curve = knifeCurveOf(segment, extent, head)
  const turns = turnsOf(segment)
  return turns.slice(1).flatMap((to, index) => arcsWithin(curve, turns[index] ?? 0, to, KNIFE_OUTLINE_MM))
}

/** Without hook the knife is the section's own mirror: lines stay lines, arcs stay arcs. */
function mirroredEdge(segment: ArcOrLine, { leastY }: FaceExtent): ArcOrLine {
  const start = { x: mirroredX(segment.start.x), y: segment.start.y - leastY }
  const end = { x: mirroredX(segment.end.x), y: segment.end.y - leastY }
  return segment.kind === 'line'
    ? { kind: 'line', start, end }
    : { kind: 'arc', start, end, bulge: -segment.bulge }
}
