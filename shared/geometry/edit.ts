import { assertNever, Failure } from '@shared/failure'
import type { Path, Point, Segment } from './segment'

/** The same path run the other way. */
export const reversed = (path: Path): Path => path.map(reversedSegment).reverse()

export function reversedSegment(segment: Segment): Segment {
  const { start, end } = segment
  switch (segment.kind) {
    case 'line':
      return { kind: 'line', start: end, end: start }
    case 'arc':
      return { kind: 'arc', start: end, end: start, bulge: -segment.bulge }
    case 'ellipse': {
      const { startRad, sweepRad } = segment
      return { ...segment, start: end, end: start, startRad: startRad + sweepRad, sweepRad: -sweepRad }
    }
    case 'cubic':
      return { kind: 'cubic', start: end, control1: segment.control2, control2: segment.control1, end: start }
    default:
      return assertNever(segment)
  }
}

/** How points, and the angles and sizes that go with them, change under a similarity. */
interface Similarity {
  readonly point: (point: Point) => Point
  readonly mirrors: boolean
  readonly turnRad: number
  readonly factor: number
}

const mapped = (path: Path, by: Similarity): Path => path.map((segment) => mappedSegment(segment, by))

function mappedSegment(segment: Segment, by: Similarity): Segment {
  const start = by.point(segment.start)
  const end = by.point(segment.end)
  switch (segment.kind) {
    case 'line':
      return { kind: 'line', start, end }
    case 'arc':
      return { kind: 'arc', start, end, bulge: by.mirrors ? -segment.bulge : segment.bulge }
    case 'ellipse':
      return {
        kind: 'ellipse',
        start,
        end,
        centre: by.point(segment.centre),
        semiX: segment.semiX * by.factor,
        semiY: segment.semiY * by.factor,
        rotationRad: by.turnRad + (by.mirrors ? -segment.rotationRad : segment.rotationRad),
        startRad: by.mirrors ? Math.PI - segment.startRad : segment.startRad,
        sweepRad: by.mirrors ? -segment.sweepRad : segment.sweepRad,
      }
    case 'cubic':
      return {
        kind: 'cubic',
        start,
        control1: by.point(segment.control1),
        control2: by.point(segment.control2),
        end,
      }
    default:
      return assertNever(segment)
  }
}

/** The path shifted by a vector. */
export function movedBy(path: Path, by: Point): Path {
  const point = (p: Point): Point => ({ x: p.x + by.x, y: p.y + by.y })
  return mapped(path, { point, mirrors: false, turnRad: 0, factor: 1 })
}

/** The path turned counter-clockwise about a point (the origin unless given). */
export function turnedBy(path: Path, angleRad: number, about: Point = { x: 0, y: 0 }): Path {
  const c = Math.cos(angleRad)
  const s = Math.sin(angleRad)
  const point = (p: Point): Point => {
    const dx = p.x - about.x
    const dy = p.y - about.y
    return { x: about.x + c * dx - s * dy, y: about.y + s * dx + c * dy }
  }
  return mapped(path, { point, mirrors: false, turnRad: angleRad, factor: 1 })
}

/** The path mirrored in the vertical line at x (0 unless given): left and right change places, so its area changes sign. */
export function mirrored(path: Path, atX = 0): Path {
  const point = (p: Point): Point => ({ x: 2 * atX - p.x, y: p.y })
  return mapped(path, { point, mirrors: true, turnRad: 0, factor: 1 })
}

/** The path grown or shrunk alike in all directions about a point (the origin unless given); factor > 0. */
export function scaledBy(path: Path, factor: number, about: Point = { x: 0, y: 0 }): Path {
  if (!(factor > 0 && factor < Infinity)) {
    throw new Failure('input-invalid', { says: `a path is scaled by a number above 0, not ${factor}` })
  }
  const point = (p: Point): Point => ({
    x: about.x + (p.x - about.x) * factor,
    y: about.y + (p.y - about.y) * factor,
  })
  return mapped(path, { point, mirrors: false, turnRad: 0, factor })
}
