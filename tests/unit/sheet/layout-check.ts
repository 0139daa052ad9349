import { flattened } from '@shared/geometry'
import type { Point } from '@shared/geometry'
import { textCorners } from '@shared/sheet'
import type { Drawing, DrawingItem, TextItem } from '@shared/sheet'

/** Written from the rules of a legible drawing, not from the layout: what a reader would find wrong with a page. */
interface Box {
  readonly left: number
  readonly right: number
  readonly bottom: number
  readonly top: number
}

const boxOf = (points: readonly Point[]): Box => ({
  left: Math.min(...points.map(({ x }) => x)),
  right: Math.max(...points.map(({ x }) => x)),
  bottom: Math.min(...points.map(({ y }) => y)),
  top: Math.max(...points.map(({ y }) => y)),
})

const textsOf = (drawing: Drawing): TextItem[] =>
  drawing.items.filter((item): item is TextItem => item.kind === 'text')

/** Letters turned by other than a right angle would make boxes meaningless. */
const textBox = (item: TextItem): Box => {
  const quarterTurns = item.rotationRad / (Math.PI / 2)
  if (Math.abs(quarterTurns - Math.round(quarterTurns)) > 1e-9) throw new Error(`${item.text} stands askew`)
  return boxOf(textCorners(item))
}

const meet = (a: Box, b: Box): boolean =>
  a.left < b.right && b.left < a.right && a.bottom < b.top && b.bottom < a.top

/** Pairs of texts that share room. */
export function overlappingTexts(drawing: Drawing): string[] {
  const boxes = textsOf(drawing)
    .map((item) => ({ text: item.text, box: textBox(item) }))
    .sort((a, b) => a.box.left - b.box.left)
  const found: string[] = []
  boxes.forEach((one, index) => {
    for (const other of boxes.slice(index + 1)) {
      if (other.box.left >= one.box.right) break
      if (meet(one.box, other.box)) found.push(`“${one.text}” on “${other.text}”`)
    }
  })
  return found
}

/** Items that leave the frame, whose own line and centring marks apart. */
export function itemsOutside(drawing: Drawing, frame: Box): string[] {
  const within = (box: Box) =>
    box.left >= frame.left - 1e-6 &&
    box.right <= frame.right + 1e-6 &&
    box.bottom >= frame.bottom - 1e-6 &&
    box.top <= frame.top + 1e-6
  return drawing.items
    .filter((item) => item.layer !== 'frame')
    .filter((item) => !within(item.kind === 'text' ? textBox(item) : boxOf(strokesOf(item).flat())))
    .map((item) => (item.kind === 'text' ? item.text : `${item.kind} on ${item.layer}`))
}

function strokesOf(item: DrawingItem): (readonly [Point, Point])[] {
  switch (item.kind) {
    case 'text':
      return []
    case 'lines':
      return [...item.lines]
    case 'path': {
      const points = flattened(item.path, 0.05)
      return points.slice(1).map((point, index) => [points[index] ?? point, point] as const)
    }
  }
}

/** A line this near to letters touches them, mm. */
const CLEARANCE_MM = 0.25

const grown = ({ left, right, bottom, top }: Box): Box => ({
  left: left - CLEARANCE_MM,
  right: right + CLEARANCE_MM,
  bottom: bottom - CLEARANCE_MM,
  top: top + CLEARANCE_MM,
})

/** Texts with a line through them or against them. Filled grounds under letters are meant; only strokes count. */
export function struckTexts(drawing: Drawing): string[] {
  const strokes = drawing.items
    .filter((item) => item.kind === 'lines' || (item.kind === 'path' && item.lineWidthMm > 0))
    .flatMap(strokesOf)
  return textsOf(drawing)
    .filter((item) => strokes.some(([from, to]) => crosses(from, to, grown(textBox(item)))))
    .map(({ text }) => text)
}

/** Whether a stroke enters a box (Liang and Barsky's clipping of a segment against a rectangle). */
function crosses(from: Point, to: Point, box: Box): boolean {
  let enter = 0
  let leave = 1
  const sides = [
    [from.x - to.x, from.x - box.left],
    [to.x - from.x, box.right - from.x],
    [from.y - to.y, from.y - box.bottom],
    [to.y - from.y, box.top - from.y],
  ] as const
  for (const [slope, room] of sides) {
    if (slope === 0) {
      if (room <= 0) return false
    } else if (slope < 0) {
      enter = Math.max(enter, room / slope)
    } else {
      leave = Math.min(leave, room / slope)
    }
  }
  return enter < leave
}
