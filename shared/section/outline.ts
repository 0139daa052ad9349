import type { LineSegment, Outline, Path, Point } from '@shared/geometry'
import { faceOf } from './face'
import type { Section } from './document'
import { woodFaceOf } from './wood-face'

/**
 * The closed outline of a section with its finished face, in this order: face from the sight edge outward, back edge down (with its splay),
 * along the back to the rebate, up the rebate's side, along its ceiling, up the sight edge. It runs clockwise: its signed area is negative.
 * Sides of no length are left out. A rebate without width or depth is none.
 */
export const outlineOf = (section: Section): Outline => outlineWith(section, faceOf(section).path)

/** The same outline with the wood face: what the mill cuts. */
export const woodOutlineOf = (section: Section): Outline => outlineWith(section, woodFaceOf(section).path)

/** The outline round any face of a section that starts on its sight edge and ends on its back edge. */
export function outlineWith(section: Section, face: Path): Outline {
  const first = face[0]
  const last = face.at(-1)
  if (!first || !last) return []
  return [...face, ...chainOf([last.end, ...backPointsOf(section, last.end), first.start])]
}

/** Corners of the outline from the back edge round to the sight edge, which the wood and the finished face have in common. */
function backPointsOf({ rebate, backSplay }: Section, backEdge: Point): Point[] {
  const { x } = backEdge
  const isSplayed = backSplay.x > 0 && backSplay.height > 0
  const back = isSplayed
    ? [
        { x, y: backSplay.height },
        { x: x - backSplay.x, y: 0 },
      ]
    : [{ x, y: 0 }]
  return [...back, ...rebatePointsOf(rebate)]
}

/** Corners of the rebate, from the back to the sight edge's foot. */
export function rebatePointsOf({ width, depth }: Section['rebate']): Point[] {
  if (width === 0 || depth === 0) return [{ x: 0, y: 0 }]
  return [
    { x: width, y: 0 },
    { x: width, y: depth },
    { x: 0, y: depth },
  ]
}

function chainOf(points: readonly Point[]): LineSegment[] {
  const lines: LineSegment[] = []
  for (let i = 1; i < points.length; i += 1) {
    const start = points[i - 1] as Point
    const end = points[i] as Point
    if (start.x !== end.x || start.y !== end.y) lines.push({ kind: 'line', start, end })
  }
  return lines
}
