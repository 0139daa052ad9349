import { extremaOf, nearestOnPath, pointAt, startTangentOf } from '@shared/geometry'
import type { Path, Point } from '@shared/geometry'
import type { Section } from './document'
import { rebatePointsOf } from './outline'

/** The least wood between the rebate and the face. */
export interface LeastWood {
  /** mm */
  readonly thicknessMm: number
  /** Where on the wood face. */
  readonly at: Point
  /** Only where the wood is least at the sight edge itself: the angle at which the face rises there from the rebate's ceiling, degrees. */
  readonly featherAngleDeg?: number
}

/** mm. Least wood this near to the lip's is the lip's. */
const LIP_MM = 1e-9

/**
 * Exact least distance between the rebate's sides and a wood face: it lies at a corner of the rebate, or where the face ends or runs along a side.
 * Without a rebate, the distance from the sight edge's foot.
 */
export function leastWoodOf({ rebate }: Section, face: Path): LeastWood {
  const corners = rebatePointsOf(rebate)
  let thicknessMm = Infinity
  let at: Point = { x: 0, y: 0 }
  const take = (distanceMm: number, place: Point): void => {
    if (distanceMm >= thicknessMm) return
    thicknessMm = distanceMm
    at = place
  }
  const first = face[0]
  if (first) take(distanceToChain(corners, first.start), first.start)
  for (const corner of corners) {
    const near = nearestOnPath(face, corner)
    take(near.distance, near.point)
  }
  for (const place of turningPlacesOf(face)) take(distanceToChain(corners, place), place)
  return { thicknessMm, at, ...featherOf(face, corners, thicknessMm) }
}

function featherOf(
  face: Path,
  corners: readonly Point[],
  thicknessMm: number,
): { readonly featherAngleDeg?: number } {
  const first = face[0]
  if (!first || corners.length === 1) return {}
  if (distanceToChain(corners, first.start) > thicknessMm + LIP_MM) return {}
  const { x, y } = startTangentOf(first)
  return { featherAngleDeg: (Math.atan2(y, x) * 180) / Math.PI }
}

/** Ends of segments and the places where they run level or upright. */
function turningPlacesOf(face: Path): readonly Point[] {
  return face.flatMap((segment) => {
    if (segment.kind === 'line') return [segment.end]
    const turns = [...extremaOf(segment, 'x'), ...extremaOf(segment, 'y')]
    return [...turns.map((t) => pointAt(segment, t)), segment.end]
  })
}

/** Distance from a point to a chain of level and upright sides, mm. */
function distanceToChain(corners: readonly Point[], { x, y }: Point): number {
  let least = Infinity
  for (const [index, corner] of corners.entries()) {
    const next = corners[index + 1] ?? corner
    const beyondX = Math.max(Math.min(corner.x, next.x) - x, 0, x - Math.max(corner.x, next.x))
    const beyondY = Math.max(Math.min(corner.y, next.y) - y, 0, y - Math.max(corner.y, next.y))
    least = Math.min(least, Math.hypot(beyondX, beyondY))
  }
  return least
}
