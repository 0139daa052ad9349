import type { Point } from '@shared/geometry'
import { applyEdit, dragBreak, faultsOfSection } from '@shared/section'
import type { Basis, DraftMember, DraftSection, ResizeOptions, SectionEdit } from '@shared/section'

/** Said of a dimension that was told by something else until it was moved on the drawing. */
export const MOVED_NOTE = 'moved on the drawing'

/**
 * The edit that brings a break as near to a place as its members can follow: both ways, else along the wall, else up and down; undefined where
 * they can follow neither. A dimension so moved no longer is what was measured or cited: from then on it is judged.
 */
export function draggedBreak(
  draft: DraftSection,
  key: string,
  to: Point,
  at: Point,
  options: ResizeOptions,
): SectionEdit | undefined {
  for (const place of [to, { x: to.x, y: at.y }, { x: at.x, y: to.y }]) {
    const edit = dragBreak(draft, key, place, options)
    const { draft: after } = applyEdit(draft, edit)
    if (isSound(draft, after)) return withJudged(draft, after, edit)
  }
  return undefined
}

/** Whether every member that the edit has changed keeps the rules of its kind. */
function isSound(before: DraftSection, after: DraftSection): boolean {
  const changed = after.members.filter((member, index) => member !== before.members[index])
  if (after.sightEdgeHeight <= after.rebate.depth) return false
  return changed.every((member) => faultsOfSection(aloneIn(member)).length === 0)
}

/** High enough above the wall that only the member's own rules can be broken, mm. */
const ALONE_HEIGHT = 5000

const aloneIn = (member: DraftMember) => {
  const { key: _, basis: __, ...bare } = member
  return {
    sightEdgeHeight: ALONE_HEIGHT,
    rebate: { width: 0, depth: 0 },
    backSplay: { x: 0, height: 0 },
    gesso: 0,
    tolerance: 0.2,
    members: [bare],
  }
}

function withJudged(before: DraftSection, after: DraftSection, edit: SectionEdit): SectionEdit {
  const edits: SectionEdit[] = [edit]
  for (const [index, member] of after.members.entries()) {
    const was = before.members[index]
    if (was === undefined || was === member) continue
    const basis = judgedBasis(was, member)
    if (basis !== undefined && basis !== member.basis)
      edits.push({ act: 'change', key: member.key, member: { ...member, basis } })
  }
  const sightEdge = before.basis?.sightEdgeHeight
  if (after.sightEdgeHeight !== before.sightEdgeHeight && sightEdge !== undefined) {
    edits.push({ act: 'set', field: 'basis', value: { sightEdgeHeight: judged(sightEdge) } })
  }
  return edits.length === 1 ? edit : { act: 'together', edits }
}

function judgedBasis(was: DraftMember, member: DraftMember): DraftMember['basis'] {
  const { basis } = member
  if (basis === undefined) return undefined
  const { width, rise } = basis
  const [widthNow, riseNow] = [
    width === undefined || was.width === member.width ? width : judged(width),
    rise === undefined || was.rise === member.rise ? rise : judged(rise),
  ]
  if (widthNow === width && riseNow === rise) return basis
  return {
    ...(widthNow === undefined ? {} : { width: widthNow }),
    ...(riseNow === undefined ? {} : { rise: riseNow }),
  }
}

const judged = (basis: Basis): Basis =>
  basis.kind === 'judged' ? basis : { kind: 'judged', note: MOVED_NOTE }
