import { assertNever } from '@shared/failure'
import { derivativeAt, pointAt, sweepOf } from '@shared/geometry'
import type { CubicSegment, Path, Point, Segment } from '@shared/geometry'

/** A quarter turn as one cubic is 0.03 % of the radius off the circle: a hundredth of a pixel on any screen. For drawing only. */
const QUARTER_RAD = Math.PI / 2

/** Segments as lines and cubics for the canvas and for SVG, which know no others that both agree on. Measures never come from these. */
export function drawableOf(segment: Segment): readonly CubicSegment[] | 'line' {
  switch (segment.kind) {
    case 'line':
      return 'line'
    case 'cubic':
      return [segment]
    case 'arc':
      return segment.bulge === 0 ? 'line' : turnedCubics(segment, sweepOf(segment))
    case 'ellipse':
      return turnedCubics(segment, segment.sweepRad)
    default:
      return assertNever(segment)
  }
}

/** Cubics with the same ends and tangents, at most a quarter turn each; a derivative is the radius times the angle, so 4/3 tan(a/4) / a of it is the handle. */
function turnedCubics(segment: Segment, sweepRad: number): CubicSegment[] {
  const count = Math.max(1, Math.ceil(Math.abs(sweepRad) / QUARTER_RAD - 1e-9))
  const angle = sweepRad / count
  const handle = ((4 / 3) * Math.tan(angle / 4)) / sweepRad
  return Array.from({ length: count }, (_, index) => {
    const [from, to] = [index / count, (index + 1) / count]
    const start = pointAt(segment, from)
    const end = pointAt(segment, to)
    return {
      kind: 'cubic',
      start,
      control1: along(start, derivativeAt(segment, from), handle),
      control2: along(end, derivativeAt(segment, to), -handle),
      end,
    }
  })
}

const along = (point: Point, direction: Point, by: number): Point => ({
  x: point.x + direction.x * by,
  y: point.y + direction.y * by,
})

/** A path as the `d` of SVG, y turned down; `scale` in units per mm. */
export function svgPathOf(path: Path, scale = 1): string {
  const first = path[0]
  if (first === undefined) return ''
  const at = ({ x, y }: Point): string => `${(x * scale).toFixed(2)} ${(-y * scale).toFixed(2)}`
  const parts = path.map((segment) => {
    const drawable = drawableOf(segment)
    if (drawable === 'line') return `L${at(segment.end)}`
    return drawable
      .map(({ control1, control2, end }) => `C${at(control1)} ${at(control2)} ${at(end)}`)
      .join('')
  })
  return `M${at(first.start)}${parts.join('')}`
}
