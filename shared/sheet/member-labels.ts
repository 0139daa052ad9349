import { pointAt, tangentAt } from '@shared/geometry'
import type { Point, Segment } from '@shared/geometry'
import { LETTER_MM, LINE_WIDTH_MM, linesItem, pathItem, polygonPath, textItem } from './drawing'
import type { DrawingItem } from './drawing'
import { textWidthMm } from './lettering'
import { spreadApart } from './spread'

/** A label above the section and the place of the face that it points to. Paper mm. */
export interface MemberLabel {
  readonly target: Point
  /** Direction of the leader's last stretch, a unit vector toward the target. */
  readonly toward: Point
  readonly text: string
}

const PITCH_MM = 3.8
const CLEAR_MM = 3
const LEAST_SLANT_MM = 3
const SLANT_PER_SHIFT = 0.35
const STUB_MM = 1.5
const LETTER_GAP_MM = 0.8
const ARROW_LENGTH_MM = 1.8
const ARROW_HALF_WIDTH_MM = 0.35
/** How far the leader of a steep face stands off it before it turns in. */
const STEEP_STANDOFF_MM = 1.5
/** A face steeper than this (from x) is approached from the side. */
const STEEP_RAD = (70 * Math.PI) / 180

/** Where the label of a stretch of face points, and from which side: from above, or aslant onto a steep face. */
export function labelTargetOf(segment: Segment): { target: Point; toward: Point } {
  const target = pointAt(segment, 0.5)
  const tangent = tangentAt(segment, 0.5)
  const steepness = Math.atan2(Math.abs(tangent.y), Math.abs(tangent.x))
  if (steepness < STEEP_RAD) return { target, toward: { x: 0, y: -1 } }
  // The face runs outward with the wood on its right, so a rising wall has its air on the left.
  const fromLeft = tangent.y > 0
  return { target, toward: { x: (fromLeft ? 1 : -1) * Math.SQRT1_2, y: -Math.SQRT1_2 } }
}

export interface MemberLabels {
  readonly items: readonly DrawingItem[]
  readonly reachMm: number
  readonly from: number
  readonly to: number
}

/** Labels in a row above `limit`, the highest place of the drawing, each with an arrow to its member; none meet or cross. */
export function memberLabelsAbove(labels: readonly MemberLabel[], limit: number): MemberLabels {
  const legs = labels
    .map((label) => ({ ...label, entry: entryOf(label) }))
    .sort((a, b) => a.entry.x - b.entry.x)
  const places = spreadApart(
    legs.map(({ entry }) => entry.x),
    PITCH_MM,
  )
  const greatest = Math.max(0, ...legs.map(({ entry }, index) => Math.abs((places[index] ?? 0) - entry.x)))
  const slant = greatest < 0.05 ? 0 : Math.max(LEAST_SLANT_MM, greatest * SLANT_PER_SHIFT)
  const knee = limit + CLEAR_MM
  const foot = knee + slant
  const end = foot + STUB_MM
  const lines = legs.flatMap(({ entry, target }, index) => {
    const place = places[index] ?? entry.x
    return [
      [target, entry],
      [entry, { x: entry.x, y: knee }],
      [
        { x: entry.x, y: knee },
        { x: place, y: foot },
      ],
      [
        { x: place, y: foot },
        { x: place, y: end },
      ],
    ] as const
  })
  const texts = legs.map(({ text }, index) => {
    const at = { x: (places[index] ?? 0) + LETTER_MM.dimension / 2, y: end + LETTER_GAP_MM }
    return textItem('labels', at, text, LETTER_MM.dimension, { rotationRad: Math.PI / 2 })
  })
  const widest = Math.max(0, ...legs.map(({ text }) => textWidthMm(text, LETTER_MM.dimension)))
  return {
    items: [linesItem('labels', lines, LINE_WIDTH_MM.fine), ...legs.map(arrowhead), ...texts],
    reachMm: CLEAR_MM + slant + STUB_MM + LETTER_GAP_MM + widest,
    from: Math.min(...places) - LETTER_MM.dimension / 2,
    to: Math.max(...places) + LETTER_MM.dimension / 2,
  }
}

/** Where the leader leaves the vertical to turn onto its target. */
function entryOf({ target, toward }: MemberLabel): Point {
  if (toward.x === 0) return target
  const back = STEEP_STANDOFF_MM / Math.abs(toward.x)
  return { x: target.x - toward.x * back, y: target.y - toward.y * back }
}

function arrowhead({ target, toward }: MemberLabel): DrawingItem {
  const along = (distance: number, aside: number): Point => ({
    x: target.x - toward.x * distance - toward.y * aside,
    y: target.y - toward.y * distance + toward.x * aside,
  })
  const corners = [
    target,
    along(ARROW_LENGTH_MM, ARROW_HALF_WIDTH_MM),
    along(ARROW_LENGTH_MM, -ARROW_HALF_WIDTH_MM),
  ]
  return pathItem('labels', polygonPath(corners), 0, { closed: true, fill: 'ink' })
}
