import { flattened } from '@shared/geometry'
import type { Outline, Point } from '@shared/geometry'

/** Distance of hatching lines, and how far they may stop short of a curved edge, mm on paper. */
const HATCH_PITCH_MM = 3
const HATCH_ACCURACY_MM = 0.02

/** Lines at 45° across the inside of a closed outline on paper (ISO 128-3's general convention for a cut). */
export function hatchingLines(outline: Outline): (readonly [Point, Point])[] {
  const corners = flattened(outline, HATCH_ACCURACY_MM)
  const offsets = corners.map(({ x, y }) => y - x)
  const lines: (readonly [Point, Point])[] = []
  const lowest = Math.ceil(Math.min(...offsets) / HATCH_PITCH_MM - 0.5)
  const highest = Math.floor(Math.max(...offsets) / HATCH_PITCH_MM - 0.5)
  for (let line = lowest; line <= highest; line += 1) {
    const crossings = crossingsOf(corners, (line + 0.5) * HATCH_PITCH_MM)
    for (let index = 0; index + 1 < crossings.length; index += 2) {
      const from = crossings[index]
      const to = crossings[index + 1]
      if (from !== undefined && to !== undefined) lines.push([from, to])
    }
  }
  return lines
}

/** Where the line y = x + offset meets the polygon, from left to right; each vertex counts once (half-open edges). */
function crossingsOf(corners: readonly Point[], offset: number): Point[] {
  const found: Point[] = []
  corners.forEach((from, index) => {
    const to = corners[(index + 1) % corners.length] ?? from
    const before = from.y - from.x - offset
    const after = to.y - to.x - offset
    if (before < 0 === after < 0) return
    const share = before / (before - after)
    const x = from.x + share * (to.x - from.x)
    found.push({ x, y: x + offset })
  })
  return found.sort((a, b) => a.x - b.x)
}
