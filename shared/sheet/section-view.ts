import type { Point, Segment } from '@shared/geometry'
import { boundsOf, extremaOf, pointAt } from '@shared/geometry'
import { faceOf, woodFaceOf, woodOutlineOf } from '@shared/section'
import type { Member, Section } from '@shared/section'
import { LINE_WIDTH_MM, linesItem, pathItem } from './drawing'
import type { DrawingItem } from './drawing'
import { hatchingLines } from './hatching'
import { labelTargetOf, memberLabelsAbove } from './member-labels'
import type { MemberLabel } from './member-labels'
import { curveText } from './member-text'
import { ordinatesBeside } from './ordinates'
import type { Ordinate, Ordinates } from './ordinates'
import { pathOnPaper } from './placement'
import type { LengthPrinter } from './printing'

/** More breaks than this are given in the table alone (coordinate dimensioning in a table), every tenth member numbered. */
export const MOST_DRAWN_BREAKS = 60
const NUMBERED_EVERY = 10
const NOWHERE: Point = { x: 0, y: 0 }

/** The section with its dimensions; the section's origin lies at the paper's (0, 0). Extents are of everything drawn. */
export interface SectionView {
  readonly items: readonly DrawingItem[]
  readonly left: number
  readonly right: number
  readonly bottom: number
  readonly top: number
  /** Whether the breaks' places stand in the table only. */
  readonly isTabulated: boolean
}

/** The wood section at a scale, hatched, with the finished face beside it, ordinates along x and y, and the members' labels. */
export function sectionViewOf(section: Section, printer: LengthPrinter, scale: number): SectionView {
  const isTabulated = section.members.length > MOST_DRAWN_BREAKS
  const shape = shapeItems(section, scale)
  const { min, max } = boundsOf(
    pathOnPaper([...woodOutlineOf(section), ...faceOf(section).path], NOWHERE, scale),
  )
  const values = ordinateValues(section, printer, scale, isTabulated)
  const below = ordinatesBeside('below', values.below, min.y)
  const labels = memberLabelsAbove(labelsOf(section, printer, scale, isTabulated), max.y)
  const spreadFrom = Math.min(min.x, below.from, labels.from)
  const spreadTo = Math.max(max.x, below.to, labels.to)
  const left = ordinatesClearOf('left', values.left, [min.x, spreadFrom], [min.y, max.y])
  const right = ordinatesClearOf('right', values.right, [max.x, spreadTo], [min.y, max.y])
  return {
    items: [...shape, ...below.items, ...left.items, ...right.items, ...labels.items],
    left: Math.min(left.edge, spreadFrom),
    right: Math.max(right.edge, spreadTo),
    bottom: Math.min(min.y - below.reachMm, left.from, right.from),
    top: Math.max(max.y + labels.reachMm, left.to, right.to),
    isTabulated,
  }
}

/** Heights of values that reach this far above or below the drawing would come among the labels there, mm. */
const CORNER_MM = 2

/** Values at a side; where they spread higher or lower than the drawing they stand outside of what is above and below it. */
function ordinatesClearOf(
  side: 'left' | 'right',
  values: readonly Ordinate[],
  [near, far]: readonly [number, number],
  [lowest, highest]: readonly [number, number],
): Ordinates & { readonly edge: number } {
  const close = ordinatesBeside(side, values, near)
  const staysBetween = close.from > lowest - CORNER_MM && close.to < highest + CORNER_MM
  const limit = staysBetween ? near : far
  const placed = staysBetween ? close : ordinatesBeside(side, values, far)
  return { ...placed, edge: limit + (side === 'left' ? -placed.reachMm : placed.reachMm) }
}

function shapeItems(section: Section, scale: number): DrawingItem[] {
  const outline = pathOnPaper(woodOutlineOf(section), NOWHERE, scale)
  const { rebate, rest } = partedOutline(section, scale)
  const hasGesso = section.gesso !== 0
  const finished = pathOnPaper(faceOf(section).path, NOWHERE, scale)
  return [
    linesItem('hatching', hatchingLines(outline), LINE_WIDTH_MM.fine, { tone: 'grey' }),
    pathItem('wood', rest, LINE_WIDTH_MM.wide, { closed: rebate.length === 0 }),
    ...(rebate.length > 0 ? [pathItem('rebate', rebate, LINE_WIDTH_MM.wide)] : []),
    ...(hasGesso ? [pathItem('finished-face', finished, LINE_WIDTH_MM.narrow)] : []),
  ]
}

/** The wood's outline on paper as two chains that meet at their ends: the rebate's two sides, and all the rest. */
function partedOutline(section: Section, scale: number): { rebate: Segment[]; rest: Segment[] } {
  const outline = woodOutlineOf(section)
  const { width, depth } = section.rebate
  const inRebate = ({ x, y }: Point) => x <= width && y <= depth
  const isRebate = (segment: Segment) =>
    segment.kind === 'line' && inRebate(segment.start) && inRebate(segment.end)
  const first = outline.findIndex(
    (segment, index) => isRebate(segment) && !isRebate(outline.at(index - 1) ?? segment),
  )
  if (first === -1) return { rebate: [], rest: [...pathOnPaper(outline, NOWHERE, scale)] }
  const turned = pathOnPaper([...outline.slice(first), ...outline.slice(0, first)], NOWHERE, scale)
  const count = [...outline.slice(first), ...outline.slice(0, first)].filter(isRebate).length
  return { rebate: turned.slice(0, count), rest: turned.slice(count) }
}

interface OrdinateValues {
  readonly below: readonly Ordinate[]
  readonly left: readonly Ordinate[]
  readonly right: readonly Ordinate[]
}

/** Every place worth a value once per axis: breaks of the wood face, rebate, back splay, and the true extremes. */
function ordinateValues(
  section: Section,
  printer: LengthPrinter,
  scale: number,
  isTabulated: boolean,
): OrdinateValues {
  const { breaks, path } = woodFaceOf(section)
  const outline = woodOutlineOf(section)
  const { min, max } = boundsOf(outline)
  const first = breaks[0] ?? NOWHERE
  const last = breaks.at(-1) ?? NOWHERE
  const shown = isTabulated ? [first, last] : breaks
  const { rebate, backSplay } = section
  const low = (x: number): Point => ({ x, y: 0 })
  const hasSplay = backSplay.x > 0 && backSplay.height > 0
  const hasRebate = rebate.width > 0 && rebate.depth > 0
  const widest = max.x > last.x ? [extremePoint(path, 'x')] : []
  const highest = [extremePoint(path, 'y')]
  const onX = [
    ...shown,
    ...widest,
    ...(hasRebate ? [low(rebate.width)] : []),
    ...(hasSplay ? [low(last.x - backSplay.x)] : []),
    low(min.x),
  ]
  const onLeft = [
    { x: 0, y: first.y },
    ...(hasRebate ? [{ x: 0, y: rebate.depth }] : []),
    { x: hasRebate ? rebate.width : 0, y: 0 },
  ]
  const onRight = [...shown.slice(1), ...highest, ...(hasSplay ? [{ x: last.x, y: backSplay.height }] : [])]
  const left = distinctOrdinates(onLeft, 'y', printer, scale)
  const alreadyLeft = new Set([...left].map(({ text }) => text))
  return {
    below: distinctOrdinates(onX, 'x', printer, scale),
    left,
    right: distinctOrdinates(onRight, 'y', printer, scale).filter(({ text }) => !alreadyLeft.has(text)),
  }
}

/** The point of a face where it reaches farthest along an axis. */
function extremePoint(path: readonly Segment[], axis: 'x' | 'y'): Point {
  const candidates = path.flatMap((segment) => [
    segment.start,
    segment.end,
    ...extremaOf(segment, axis).map((t) => pointAt(segment, t)),
  ])
  return candidates.reduce(
    (best, point) => (point[axis] > best[axis] ? point : best),
    candidates[0] ?? NOWHERE,
  )
}

/** Of the points that would print the same value, the one nearest the value's side stands for all. */
function distinctOrdinates(
  points: readonly Point[],
  axis: 'x' | 'y',
  printer: LengthPrinter,
  scale: number,
): Ordinate[] {
  const nearest = new Map<string, Point>()
  for (const point of points) {
    const text = printer.length(point[axis])
    const known = nearest.get(text)
    const isNearer = known === undefined || (axis === 'x' ? point.y < known.y : point.x > known.x)
    if (isNearer) nearest.set(text, point)
  }
  return [...nearest].map(([text, { x, y }]) => ({ text, feature: { x: x * scale, y: y * scale } }))
}

function labelsOf(
  section: Section,
  printer: LengthPrinter,
  scale: number,
  isTabulated: boolean,
): MemberLabel[] {
  const { path, memberOf } = woodFaceOf(section)
  return section.members.flatMap((member, index) => {
    const number = index + 1
    if (isTabulated && number % NUMBERED_EVERY !== 0 && number !== 1) return []
    const segments = path.filter((_, place) => memberOf[place] === index)
    const pointed = segments[pointedSegment(member, segments.length)]
    if (pointed === undefined) return []
    const [onPaper] = pathOnPaper([pointed], NOWHERE, scale)
    if (onPaper === undefined) return []
    const radius = isTabulated ? '' : radiusText(member, segments, section, index, printer)
    return [{ ...labelTargetOf(onPaper), text: radius === '' ? `${number}` : `${number}: ${radius}` }]
  })
}

/** The stretch of a member that its label points to: the first of two arcs or of a row, else the middle one. */
function pointedSegment(member: Member, count: number): number {
  switch (member.kind) {
    case 'reeds':
    case 'flutes':
    case 'scotia':
    case 'torus':
    case 'cyma-recta':
    case 'cyma-reversa':
      return 0
    default:
      return Math.floor(count / 2)
  }
}

/** Radii are written at the drawing too where the member is made of arcs. */
function radiusText(
  member: Member,
  segments: readonly Segment[],
  section: Section,
  index: number,
  printer: LengthPrinter,
): string {
  const text = curveText(member, segments, gessoOver(section, index), printer)
  return text.includes('R ') ? text : ''
}

/** The gesso over a member, mm: what lies between its two breaks. */
export function gessoOver(section: Section, index: number): number {
  if (typeof section.gesso === 'number') return section.gesso
  return section.gesso.find(({ from, to }) => from <= index && index < to)?.thickness ?? 0
}
