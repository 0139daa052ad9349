import {
  boundsOf,
  convexHullOf,
  extremaOf,
  flattened,
  isSamePoint,
  pointAt,
  smallestEnclosingRectangleOf,
} from '@shared/geometry'
import type { Outline, Path, Point, Segment } from '@shared/geometry'

/** The smallest rectangle of timber that the wood section comes out of, finished sizes, mm. */
export interface SectionBlank {
  readonly widthMm: number
  readonly thicknessMm: number
  /** How far the blank's width leans from the wall plane, counter-clockwise positive, −45° to 45°; 0 where leaning saves nothing. */
  readonly tiltDeg: number
  /** As run flat. */
  readonly flat: { readonly widthMm: number; readonly thicknessMm: number }
}

/** A tilt must save more than this part of the flat blank's area: less is rounding. */
const SAVING = 1e-6

/** The blank of an outline: run flat, or tilted where that is smaller. */
export function blankOf(outline: Outline): SectionBlank {
  const { min, max } = boundsOf(outline)
  const flat = { widthMm: max.x - min.x, thicknessMm: max.y - min.y }
  const enough = flat.widthMm * flat.thicknessMm * (1 - SAVING)
  const hull = convexHullOf(pointsOn(outline))
  // The polygon lies within the outline, so that no rectangle round the outline is smaller than the polygon's.
  if (leastRectangleAreaOf(hull) >= enough) return { ...flat, tiltDeg: 0, flat }
  const least = smallestEnclosingRectangleOf(outermostOf(outline, hull))
  if (least.widthMm * least.heightMm >= enough) return { ...flat, tiltDeg: 0, flat }
  const tiltDeg = (least.angleRad * 180) / Math.PI
  return { widthMm: least.widthMm, thicknessMm: least.heightMm, tiltDeg, flat }
}

/** mm. Chords that only tell where to look, and a reach of more than these can be wrong by. */
const SCOUT_CHORD_MM = 0.02
const SCOUT_REACH_MM = 0.05

/** Points on the outline, its true extremes along x and y among them. */
function pointsOn(outline: Outline): readonly Point[] {
  const extremes = outline.flatMap((segment) =>
    [...extremaOf(segment, 'x'), ...extremaOf(segment, 'y')].map((t) => pointAt(segment, t)),
  )
  return [...flattened(outline, SCOUT_CHORD_MM), ...extremes]
}

/** Least area of a rectangle round a convex polygon, mm²: one of its sides lies along a side of the polygon. */
function leastRectangleAreaOf(hull: readonly Point[]): number {
  let least = Infinity
  for (const [i, corner] of hull.entries()) {
    const next = hull[(i + 1) % hull.length] ?? corner
    const size = Math.hypot(next.x - corner.x, next.y - corner.y)
    const c = (next.x - corner.x) / size
    const s = (next.y - corner.y) / size
    let left = Infinity
    let right = -Infinity
    let height = 0
    for (const { x, y } of hull) {
      const along = c * x + s * y
      if (along < left) left = along
      if (along > right) right = along
      height = Math.max(height, Math.abs(c * (y - corner.y) - s * (x - corner.x)))
    }
    least = Math.min(least, (right - left) * height)
  }
  return least
}

/** The segments that a rectangle round the outline can touch, joined by lines which lie inside of them: the same rectangle, found sooner. */
function outermostOf(outline: Outline, hull: readonly Point[]): Path {
  const path: Segment[] = []
  for (const segment of outline) {
    if (!isNearHull(segment, hull)) continue
    const end = path.at(-1)?.end
    if (end && !isSamePoint(end, segment.start)) path.push({ kind: 'line', start: end, end: segment.start })
    path.push(segment)
  }
  return path
}

function isNearHull(segment: Segment, hull: readonly Point[]): boolean {
  const points = [segment.start, ...flattened([segment], SCOUT_CHORD_MM), segment.end]
  return points.some((point) =>
    hull.some((corner, i) => isNearSide(point, corner, hull[(i + 1) % hull.length])),
  )
}

function isNearSide(point: Point, from: Point, to: Point = from): boolean {
  const dx = to.x - from.x
  const dy = to.y - from.y
  const off = dx * (point.y - from.y) - dy * (point.x - from.x)
  return Math.abs(off) <= SCOUT_REACH_MM * Math.hypot(dx, dy)
}
