import { FREE_END_MM, FREE_JOINT_RAD } from '@shared/units'
import { cross, dot, endTangentOf, startTangentOf } from '@shared/geometry'
import { LEAST_MM } from './breach'
import type { Breach } from './breach'
import type { Free } from './document'
import { memberSegments } from './member-segments'

/** Every rule that a free member's curves break: they end where they must, run smoothly on, and none is a point. */
export function freeBreaches(free: Free): readonly Breach[] {
  const { curves, corners = [] } = free
  if (curves.length === 0)
    return [{ field: 'curves', code: 'curves-missing', says: 'it has no curves; it needs at least one.' }]
  const breaches: Breach[] = corners
    .filter((joint) => !Number.isInteger(joint) || joint < 1 || joint >= curves.length)
    .map((joint) => ({
      field: 'corners',
      code: 'corner-unknown',
      says: `there is no joint ${joint} to be an arris; its joints are 1 to ${curves.length - 1}.`,
    }))
  return [...breaches, ...freeEndBreaches(free), ...freeJointBreaches(free)]
}

function freeEndBreaches({ curves, width, rise }: Free): readonly Breach[] {
  const [x, y] = curves.at(-1)?.[2] ?? [0, 0]
  if (Math.abs(x - width) <= FREE_END_MM && Math.abs(y - rise) <= FREE_END_MM) return []
  return [
    {
      field: `curves/${curves.length - 1}`,
      code: 'free-end-apart',
      says: `its last curve ends at (${x}, ${y}); it must end at width and rise, (${width}, ${rise}).`,
    },
  ]
}

function freeJointBreaches(free: Free): readonly Breach[] {
  const segments = memberSegments(free, { x: 0, y: 0 })
  const pointless = segments.findIndex(
    (cubic) =>
      cubic.kind === 'cubic' &&
      [cubic.control1, cubic.control2, cubic.end].every(
        ({ x, y }) => Math.hypot(x - cubic.start.x, y - cubic.start.y) < LEAST_MM,
      ),
  )
  if (pointless !== -1)
    return [
      {
        field: `curves/${pointless}`,
        code: 'zero-length',
        says: `its curve ${pointless + 1} is a point; give it a length or take it out.`,
      },
    ]
  return segments.slice(1).flatMap((segment, index) => {
    const joint = index + 1
    if (free.corners?.includes(joint)) return []
    const before = endTangentOf(segments[index] as (typeof segments)[number])
    const after = startTangentOf(segment)
    const turn = Math.abs(Math.atan2(cross(before, after), dot(before, after)))
    if (turn <= FREE_JOINT_RAD) return []
    const degrees = ((turn * 180) / Math.PI).toFixed(2)
    return [
      {
        field: `curves/${joint}`,
        code: 'free-joint-turns',
        says: `its curves turn by ${degrees}° at joint ${joint}; make them tangent within 0.1° or list the joint in corners.`,
      },
    ]
  })
}
