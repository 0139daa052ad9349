import { assertNever, Failure } from '@shared/failure'
import { findBreakNumber, breakKeyOf } from './draft'
import { SIGHT_EDGE_KEY } from './document'
import type { DraftGessoStretch, DraftMember, DraftSection } from './document'

/** A field of the section itself, set to a new value; the basis of no dimension is {}. */
export type SetEdit =
  | { readonly act: 'set'; readonly field: 'sightEdgeHeight'; readonly value: number }
  | { readonly act: 'set'; readonly field: 'rebate'; readonly value: DraftSection['rebate'] }
  | { readonly act: 'set'; readonly field: 'backSplay'; readonly value: DraftSection['backSplay'] }
  | { readonly act: 'set'; readonly field: 'gesso'; readonly value: DraftSection['gesso'] }
  | { readonly act: 'set'; readonly field: 'tolerance'; readonly value: number }
  | { readonly act: 'set'; readonly field: 'basis'; readonly value: NonNullable<DraftSection['basis']> }

/** One step of drawing. `at` and `to` are places in the list of members, from 0, as it is after the step. */
export type SectionEdit =
  | SetEdit
  | { readonly act: 'put-in'; readonly at: number; readonly member: DraftMember }
  | { readonly act: 'take-out'; readonly key: string }
  | { readonly act: 'move'; readonly key: string; readonly to: number }
  | { readonly act: 'change'; readonly key: string; readonly member: DraftMember }
  | { readonly act: 'together'; readonly edits: readonly SectionEdit[] }
  | { readonly act: 'replace-all'; readonly section: DraftSection }

/** The draft after a step, and the step that takes it back exactly. */
export interface AppliedEdit {
  readonly draft: DraftSection
  readonly inverse: SectionEdit
}

/**
 * Applies one step; the draft given is left as it is. What cannot be done (an unknown or repeated key, a place outside the list) is Failure
 * 'input-invalid', and then nothing of a 'together' has happened. Whether the dimensions make sense is for faultsOfSection to say.
 */
export function applyEdit(draft: DraftSection, edit: SectionEdit): AppliedEdit {
  switch (edit.act) {
    case 'put-in':
      return putIn(draft, edit.at, edit.member)
    case 'take-out':
      return takeOut(draft, edit.key)
    case 'move':
      return move(draft, edit.key, edit.to)
    case 'change':
      return change(draft, edit.key, edit.member)
    case 'set':
      return set(draft, edit)
    case 'together':
      return together(draft, edit.edits)
    case 'replace-all':
      refuseKeys(edit.section)
      return { draft: edit.section, inverse: { act: 'replace-all', section: draft } }
    default:
      return assertNever(edit)
  }
}

function putIn(draft: DraftSection, at: number, member: DraftMember): AppliedEdit {
  refusePlace(at, draft.members.length)
  const members = draft.members.toSpliced(at, 0, member)
  refuseKeys({ ...draft, members })
  return { draft: { ...draft, members }, inverse: { act: 'take-out', key: member.key } }
}

function takeOut(draft: DraftSection, key: string): AppliedEdit {
  const at = requireIndex(draft, key)
  const member = draft.members[at] as DraftMember
  const gesso = gessoWithout(draft, key, breakKeyOf(draft, at))
  const taken = { ...draft, members: draft.members.toSpliced(at, 1), gesso }
  const back: SectionEdit = { act: 'put-in', at, member }
  if (gesso === draft.gesso) return { draft: taken, inverse: back }
  const before: SectionEdit = { act: 'set', field: 'gesso', value: draft.gesso }
  return { draft: taken, inverse: { act: 'together', edits: [back, before] } }
}

/** Stretches of gesso that held on to a break now hold on to the one before it; one that has lost its last member is gone. */
function gessoWithout({ gesso }: DraftSection, key: string, instead: string): DraftSection['gesso'] {
  if (typeof gesso === 'number' || !gesso.some(({ from, to }) => from === key || to === key)) return gesso
  const held = (end: string): string => (end === key ? instead : end)
  return gesso
    .map((stretch): DraftGessoStretch => ({ ...stretch, from: held(stretch.from), to: held(stretch.to) }))
    .filter(({ from, to }) => from !== to)
}

function move(draft: DraftSection, key: string, to: number): AppliedEdit {
  const from = requireIndex(draft, key)
  refusePlace(to, draft.members.length - 1)
  const member = draft.members[from] as DraftMember
  const members = draft.members.toSpliced(from, 1).toSpliced(to, 0, member)
  return { draft: { ...draft, members }, inverse: { act: 'move', key, to: from } }
}

function change(draft: DraftSection, key: string, member: DraftMember): AppliedEdit {
  const at = requireIndex(draft, key)
  if (member.key !== key) {
    refuse(`A changed member keeps its key: it is “${member.key}” and must be “${key}”.`)
  }
  const before = draft.members[at] as DraftMember
  return {
    draft: { ...draft, members: draft.members.with(at, member) },
    inverse: { act: 'change', key, member: before },
  }
}

function set(draft: DraftSection, edit: SetEdit): AppliedEdit {
  if (edit.field === 'basis') return setBasis(draft, edit.value)
  if (edit.field === 'gesso') refuseStretches(draft, edit.value)
  const before = { act: 'set', field: edit.field, value: draft[edit.field] } as SetEdit
  return { draft: { ...draft, [edit.field]: edit.value }, inverse: before }
}

/** An empty basis is left out of the document, so that it reads as if none had ever been set; a document that did hold an empty one gets it back. */
function setBasis(draft: DraftSection, value: NonNullable<DraftSection['basis']>): AppliedEdit {
  const { basis: before, ...rest } = draft
  const changed = isEmpty(value) ? rest : { ...rest, basis: value }
  const inverse: SectionEdit =
    before !== undefined && isEmpty(before)
      ? { act: 'replace-all', section: draft }
      : { act: 'set', field: 'basis', value: before ?? {} }
  return { draft: changed, inverse }
}

const isEmpty = (basis: NonNullable<DraftSection['basis']>): boolean => basis.sightEdgeHeight === undefined

function together(draft: DraftSection, edits: readonly SectionEdit[]): AppliedEdit {
  let current = draft
  const inverses: SectionEdit[] = []
  for (const edit of edits) {
    const applied = applyEdit(current, edit)
    current = applied.draft
    inverses.unshift(applied.inverse)
  }
  return { draft: current, inverse: { act: 'together', edits: inverses } }
}

function requireIndex({ members }: DraftSection, key: string): number {
  const index = members.findIndex((member) => member.key === key)
  if (index === -1) refuse(`There is no member with the key “${key}”; it may have been taken out.`)
  return index
}

function refusePlace(place: number, greatest: number): void {
  if (!Number.isInteger(place) || place < 0 || place > greatest) {
    refuse(`The place in the list of members is ${place}; it must be a whole number from 0 to ${greatest}.`)
  }
}

function refuseKeys(draft: DraftSection): void {
  const keys = new Set([SIGHT_EDGE_KEY])
  for (const { key } of draft.members) {
    if (keys.has(key)) refuse(`The key “${key}” is used already; every member needs its own.`)
    keys.add(key)
  }
  refuseStretches(draft, draft.gesso)
}

function refuseStretches(draft: DraftSection, gesso: DraftSection['gesso']): void {
  if (typeof gesso === 'number') return
  for (const key of gesso.flatMap(({ from, to }) => [from, to])) {
    if (findBreakNumber(draft, key) === undefined)
      refuse(`A stretch of gesso holds on to the break “${key}”, which is not in the section.`)
  }
}

function refuse(says: string): never {
  throw new Failure('input-invalid', { says })
}
