import ClipperLib, { type IntPath, type IntPaths } from 'clipper-lib'
import { Failure } from '@shared/failure'
import { CHORD_ERROR_MM, POLYGON_UNITS_PER_MM } from '@shared/units'
import type { Point } from './segment'

/** Corners of a closed polygon, mm, the first not repeated. In answers outer rings run counter-clockwise and holes clockwise. */
export type Polygon = readonly Point[]

/** Coordinates beyond this would not be whole units that multiply exactly, mm. */
const GREATEST_MM = 4e10

/** What lies in any of the polygons. */
export const unionOf = (polygons: readonly Polygon[]): readonly Polygon[] =>
  combined(ClipperLib.ClipType.ctUnion, polygons, [])

/** What lies in the first but in none of the second. */
export const differenceOf = (from: readonly Polygon[], less: readonly Polygon[]): readonly Polygon[] =>
  combined(ClipperLib.ClipType.ctDifference, from, less)

/** What lies in both. */
export const intersectionOf = (a: readonly Polygon[], b: readonly Polygon[]): readonly Polygon[] =>
  combined(ClipperLib.ClipType.ctIntersection, a, b)

/** What lies in one but not in both. */
export const symmetricDifferenceOf = (a: readonly Polygon[], b: readonly Polygon[]): readonly Polygon[] =>
  combined(ClipperLib.ClipType.ctXor, a, b)

/** Area between two regions, mm². */
export const symmetricDifferenceArea = (a: readonly Polygon[], b: readonly Polygon[]): number =>
  symmetricDifferenceOf(a, b).reduce((sum, polygon) => sum + polygonAreaOf(polygon), 0)

/** A polygon without self-crossings: the region it winds round at least once, as rings that only touch. */
export const simplified = (polygon: Polygon): readonly Polygon[] => unionOf([polygon])

/** Regions are what polygons wind round at all, whichever way they run, so that a hole must be taken away by difference. */
function combined(
  clipType: number,
  subject: readonly Polygon[],
  clip: readonly Polygon[],
): readonly Polygon[] {
  const clipper = new ClipperLib.Clipper()
  clipper.StrictlySimple = true
  const { ptSubject, ptClip } = ClipperLib.PolyType
  clipper.AddPaths(subject.map(toUnits), ptSubject, true)
  clipper.AddPaths(clip.map(toUnits), ptClip, true)
  const solution: IntPaths = []
  const fill = ClipperLib.PolyFillType.pftNonZero
  if (!clipper.Execute(clipType, solution, fill, fill)) throw new TypeError('polygon clipping did not finish')
  return solution.map(toMm)
}

export interface OffsetPolygonOptions {
  /** Outer corners: mitred (the default) or rounded. */
  readonly corners?: 'mitred' | 'round'
  /** Longest mitre, in multiples of the distance (default 4); longer ones are cut square. */
  readonly mitreLimit?: number
}

/** A polygon grown by a distance, or shrunk where it is negative; shrinking may leave nothing or several. */
export function offsetPolygon(
  polygon: Polygon,
  distanceMm: number,
  { corners = 'mitred', mitreLimit = 4 }: OffsetPolygonOptions = {},
): readonly Polygon[] {
  const { jtMiter, jtRound } = ClipperLib.JoinType
  const offset = new ClipperLib.ClipperOffset(mitreLimit, CHORD_ERROR_MM * POLYGON_UNITS_PER_MM)
  const rings = simplified(polygon).map(toUnits)
  offset.AddPaths(rings, corners === 'round' ? jtRound : jtMiter, ClipperLib.EndType.etClosedPolygon)
  const solution: IntPaths = []
  offset.Execute(solution, distanceMm * POLYGON_UNITS_PER_MM)
  return solution.map(toMm)
}

/** Signed area of a polygon, mm², positive counter-clockwise; taken about its first corner. */
export function polygonAreaOf(polygon: Polygon): number {
  const origin = polygon[0]
  if (!origin) return 0
  let twice = 0
  let before = origin
  for (const corner of polygon) {
    twice += (before.x - origin.x) * (corner.y - origin.y) - (before.y - origin.y) * (corner.x - origin.x)
    before = corner
  }
  return twice / 2
}

const toUnits = (polygon: Polygon): IntPath =>
  polygon.map(({ x, y }) => {
    if (!(Math.abs(x) <= GREATEST_MM && Math.abs(y) <= GREATEST_MM)) {
      throw new Failure('input-invalid', { says: `a polygon corner at ${x}, ${y} mm is out of reach` })
    }
    return { X: Math.round(x * POLYGON_UNITS_PER_MM), Y: Math.round(y * POLYGON_UNITS_PER_MM) }
  })

const toMm = (path: IntPath): Polygon =>
  path.map(({ X, Y }) => ({ x: X / POLYGON_UNITS_PER_MM, y: Y / POLYGON_UNITS_PER_MM }))
