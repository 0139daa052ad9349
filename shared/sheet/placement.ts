import { assertNever } from '@shared/failure'
import type { Path, Point, Segment } from '@shared/geometry'
import type { DrawingItem } from './drawing'

/** A point of the model on paper: origin + scale × point. */
export const pointOnPaper = (point: Point, origin: Point, scale: number): Point => ({
  x: origin.x + scale * point.x,
  y: origin.y + scale * point.y,
})

/** A path of the model on paper; scale is positive, so that turns keep their sign. An arc without a bulge becomes the line it is. */
export function pathOnPaper(path: Path, origin: Point, scale: number): Path {
  return path.map((segment) => segmentOnPaper(segment, origin, scale))
}

function segmentOnPaper(segment: Segment, origin: Point, scale: number): Segment {
  const place = (point: Point) => pointOnPaper(point, origin, scale)
  const ends = { start: place(segment.start), end: place(segment.end) }
  switch (segment.kind) {
    case 'line':
      return { ...segment, ...ends }
    case 'arc':
      return segment.bulge === 0 ? { kind: 'line', ...ends } : { ...segment, ...ends }
    case 'ellipse':
      return {
        ...segment,
        ...ends,
        centre: place(segment.centre),
        semiX: segment.semiX * scale,
        semiY: segment.semiY * scale,
      }
    case 'cubic':
      return { ...segment, ...ends, control1: place(segment.control1), control2: place(segment.control2) }
    default:
      return assertNever(segment)
  }
}

/** The same items, moved by (x, y) on the paper. */
export function shiftedItems(items: readonly DrawingItem[], by: Point): DrawingItem[] {
  return items.map((item) => shiftedItem(item, by))
}

function shiftedItem(item: DrawingItem, by: Point): DrawingItem {
  const move = (point: Point): Point => ({ x: point.x + by.x, y: point.y + by.y })
  switch (item.kind) {
    case 'path':
      return { ...item, path: pathOnPaper(item.path, by, 1) }
    case 'lines':
      return { ...item, lines: item.lines.map(([from, to]) => [move(from), move(to)] as const) }
    case 'text':
      return { ...item, at: move(item.at) }
    default:
      return assertNever(item)
  }
}
