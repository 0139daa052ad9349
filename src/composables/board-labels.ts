import { arcGeometryOf, leftOf, pointAt, tangentAt } from '@shared/geometry'
import type { DrawnMember } from '@/board/drawn-section'
import type { SceneLabel } from '@/board/scene'

/** How far off its arc a radius is written, CSS pixels. */
const OFF = 20

/** The radii of the selected member's arcs, each beside its arc on the side of the air. */
export function selectedLabels(
  member: DrawnMember | undefined,
  print: (mm: number) => string,
): readonly SceneLabel[] {
  if (member === undefined || member.member.kind === 'reeds' || member.member.kind === 'flutes') return []
  return member.path.flatMap((segment): SceneLabel[] => {
    if (segment.kind !== 'arc' || segment.bulge === 0) return []
    const { radius } = arcGeometryOf(segment)
    // The wood lies on the right of the face, so the air is on its left; the canvas has y down.
    const { x, y } = leftOf(tangentAt(segment, 0.5))
    return [{ at: pointAt(segment, 0.5), text: `r ${print(radius)}`, shift: { x: x * OFF, y: -y * OFF + 4 } }]
  })
}
