import { Failure } from '@shared/failure'
import type { Point } from '@shared/geometry'
import { breakNumberOf } from './draft'
import type { DraftMember, DraftSection, Free, FreeCurve } from './document'
import type { SectionEdit } from './edit'

/** neighbourGives: the next member takes up the change as far as its kind allows, so that what follows stays; otherwise it all moves along. */
export interface ResizeOptions {
  readonly neighbourGives?: boolean
}

export interface MemberSize {
  readonly width?: number
  readonly rise?: number
}

/** The edit that gives a member another width, rise or both. A free member's curves are stretched with it; everything else is kept. */
export function resized(
  draft: DraftSection,
  key: string,
  size: MemberSize,
  { neighbourGives = false }: ResizeOptions = {},
): SectionEdit {
  const index = breakNumberOf(draft, key) - 1
  const member = draft.members[index]
  if (!member) throw new Failure('input-invalid', { says: `There is no member with the key “${key}”.` })
  const { width = member.width, rise = member.rise } = size
  const edits: SectionEdit[] = [changeOf(member, width, rise)]
  const next = draft.members[index + 1]
  if (neighbourGives && next) edits.push(...givingEdits(next, width - member.width, rise - member.rise))
  return together(edits)
}

/**
 * The edit that brings a break to a place, mm. The member that ends there is resized as its kind allows (a level fillet stays level, a bead stays
 * without rise) and never to less than no width; break 0 moves up and down with the sight edge.
 */
export function dragBreak(
  draft: DraftSection,
  breakKey: string,
  to: Point,
  { neighbourGives = false }: ResizeOptions = {},
): SectionEdit {
  const number = breakNumberOf(draft, breakKey)
  if (number === 0) return dragSightEdge(draft, to.y, neighbourGives)
  const member = draft.members[number - 1] as DraftMember
  const next = draft.members[number]
  const start = breakPlaceOf(draft, number - 1)
  const most = neighbourGives && next ? member.width + next.width : Infinity
  const width = widthMayChange(member) ? Math.min(Math.max(0, to.x - start.x), most) : member.width
  const rise = riseMayChange(member) ? to.y - start.y : member.rise
  return resized(draft, breakKey, { width, rise }, { neighbourGives })
}

function dragSightEdge(draft: DraftSection, y: number, neighbourGives: boolean): SectionEdit {
  const edits: SectionEdit[] = [{ act: 'set', field: 'sightEdgeHeight', value: y }]
  const first = draft.members[0]
  if (neighbourGives && first) edits.push(...givingEdits(first, 0, y - draft.sightEdgeHeight))
  return together(edits)
}

/** Place of a break by the members' sizes, mm. */
function breakPlaceOf({ members, sightEdgeHeight }: DraftSection, number: number): Point {
  let x = 0
  let y = sightEdgeHeight
  for (const { width, rise } of members.slice(0, number)) {
    x += width
    y += rise
  }
  return { x, y }
}

/** An upright fillet has no width to give, a level one no rise, and neither have the kinds that are level by nature. */
const widthMayChange = (member: DraftMember): boolean => member.kind !== 'fillet' || member.rise === 0

function riseMayChange(member: DraftMember): boolean {
  switch (member.kind) {
    case 'bead':
    case 'reeds':
    case 'flutes':
    case 'quirk':
      return false
    case 'fillet':
      return member.width === 0
    default:
      return true
  }
}

function givingEdits(next: DraftMember, byWidth: number, byRise: number): readonly SectionEdit[] {
  const width = widthMayChange(next) ? next.width - byWidth : next.width
  const rise = riseMayChange(next) ? next.rise - byRise : next.rise
  return width === next.width && rise === next.rise ? [] : [changeOf(next, width, rise)]
}

function changeOf(member: DraftMember, width: number, rise: number): SectionEdit {
  const sized = member.kind === 'free' ? stretched(member, width, rise) : { ...member, width, rise }
  return { act: 'change', key: member.key, member: sized }
}

/** Stretched along x and y in proportion; where there was no rise to stretch the curve is sheared to it (and alike for width). */
function stretched<M extends Free>(free: M, width: number, rise: number): M {
  const x = (from: number, across: number): number => stretchedTo(from, across, free.width, width, free.rise)
  const y = (from: number, across: number): number => stretchedTo(from, across, free.rise, rise, free.width)
  const last = free.curves.length - 1
  const curves = free.curves.map((curve, index): FreeCurve => {
    const [control1, control2, end] = curve.map(([px, py]) => [x(px, py), y(py, px)] as const)
    return [control1 ?? [0, 0], control2 ?? [0, 0], index === last ? [width, rise] : (end ?? [0, 0])]
  })
  return { ...free, width, rise, curves }
}

function stretchedTo(value: number, across: number, before: number, after: number, span: number): number {
  if (before === after) return value
  if (before !== 0) return (value * after) / before
  return span === 0 ? value : value + (after * across) / span
}

function together(edits: readonly SectionEdit[]): SectionEdit {
  const [only] = edits
  return edits.length === 1 && only ? only : { act: 'together', edits }
}
