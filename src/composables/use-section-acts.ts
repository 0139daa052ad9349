import { v7 as newKey } from 'uuid'
import type { Basis, DraftMember, Member, MemberKind, SectionEdit, SetEdit } from '@shared/section'
import { breakNumberOf, resized } from '@shared/section'
import { draggedBreak } from '@/board/break-drag'
import { asKind, newMemberOf } from '@/board/new-member'
import { onGrid, GRID_MM } from '@/board/snapping'
import type { BoardDesk } from './use-board-desk'
import { useLengths } from './use-lengths'
import { useMemberWords } from './use-member-words'

/** A member put in is about this part of the section's height wide, and falls once the face is higher than this part of it. */
const NEW_PART = 0.4
const LEAST_NEW_MM = 2

/** Everything that can be done to the section, each as one named step of its history. */
export function useSectionActs(desk: BoardDesk) {
  const { print, unit } = useLengths()
  const { nameOf } = useMemberWords()
  const { draft } = desk

  const memberBy = (key: string): DraftMember | undefined =>
    draft.document?.members.find((member) => member.key === key)

  function take(name: string, edit: SectionEdit): void {
    draft.take(name, edit)
    desk.said.value = name
  }

  function putIn(kind: MemberKind): void {
    const document = draft.document
    if (document === undefined) return
    const at = desk.selectedIndex.value === -1 ? document.members.length : desk.selectedIndex.value + 1
    const size = Math.max(LEAST_NEW_MM, onGrid(document.sightEdgeHeight * NEW_PART, GRID_MM[unit.value] * 4))
    const member: DraftMember = { ...newMemberOf(kind, size, senseAt(at)), key: newKey() }
    take(`Put in ${nameOf(kind)}`, { act: 'put-in', at, member })
    desk.select(member.key)
  }
  /** New members rise, but fall again beyond the section's middle, so that a drawing begun from nothing comes back to the wall. */
  function senseAt(at: number): 1 | -1 {
    const height = desk.drawn.value?.breaks[at]?.y ?? 0
    return height > (draft.document?.sightEdgeHeight ?? 0) * 1.6 ? -1 : 1
  }

  function takeOut(key: string): void {
    const member = memberBy(key)
    const at = desk.members.value.findIndex((each) => each.member.key === key)
    if (member === undefined) return
    take(`Take out ${nameOf(member.kind)}`, { act: 'take-out', key })
    desk.select(desk.members.value[Math.min(at, desk.members.value.length - 1)]?.member.key)
  }

  function moveBy(key: string, by: number): void {
    const member = memberBy(key)
    const at = desk.members.value.findIndex((each) => each.member.key === key)
    const to = at + by
    if (member === undefined || to < 0 || to >= desk.members.value.length) return
    take(`Move ${nameOf(member.kind)} ${by < 0 ? 'toward the sight edge' : 'outward'}`, {
      act: 'move',
      key,
      to,
    })
  }

  function resize(key: string, size: { readonly width?: number; readonly rise?: number }): void {
    const member = memberBy(key)
    const document = draft.document
    if (member === undefined || document === undefined) return
    const { width, rise } = size
    const isSame = (width ?? member.width) === member.width && (rise ?? member.rise) === member.rise
    if (isSame) return
    const told = [
      ...(width === undefined ? [] : [`width ${print(width, { places: 2 })}`]),
      ...(rise === undefined ? [] : [`rise ${print(rise, { places: 2 })}`]),
    ]
    take(`${sentence(nameOf(member.kind))} ${told.join(', ')}`, resized(document, key, size))
  }

  function change(key: string, what: string, to: (member: DraftMember) => Member): void {
    const member = memberBy(key)
    if (member === undefined) return
    take(`${sentence(nameOf(member.kind))}: ${what}`, {
      act: 'change',
      key,
      member: { ...to(member), key },
    })
  }
  function changeKind(key: string, kind: MemberKind): void {
    const member = memberBy(key)
    if (member === undefined || member.kind === kind) return
    const { key: _, ...bare } = member
    take(`${sentence(nameOf(member.kind))} becomes ${nameOf(kind)}`, {
      act: 'change',
      key,
      member: { ...asKind(bare, kind), key },
    })
  }

  /** undefined takes the basis away. */
  function setBasis(key: string, side: 'width' | 'rise', basis: Basis | undefined): void {
    change(key, `basis of its ${side}`, ({ basis: before, ...member }) => {
      const { [side]: _, ...others } = before ?? {}
      const after = basis === undefined ? others : { ...others, [side]: basis }
      return Object.keys(after).length === 0 ? member : { ...member, basis: after }
    })
  }
  /** Gives one basis to every dimension that has none yet. */
  function spreadBasis(basis: Basis): void {
    const document = draft.document
    if (document === undefined) return
    const edits = document.members.flatMap((member): SectionEdit[] => {
      const { width, rise } = member.basis ?? {}
      const isWhole = (member.width === 0 || width !== undefined) && (member.rise === 0 || rise !== undefined)
      if (isWhole) return []
      const given = {
        ...(member.width === 0 ? {} : { width: width ?? basis }),
        ...(member.rise === 0 ? {} : { rise: rise ?? basis }),
      }
      return [{ act: 'change', key: member.key, member: { ...member, basis: given } }]
    })
    if (document.basis?.sightEdgeHeight === undefined)
      edits.push({ act: 'set', field: 'basis', value: { sightEdgeHeight: basis } })
    if (edits.length > 0) take(`All without a basis: ${basis.kind}`, { act: 'together', edits })
  }
  function setSightEdgeBasis(basis: Basis | undefined): void {
    set('Basis of the sight edge’s height', {
      act: 'set',
      field: 'basis',
      value: basis === undefined ? {} : { sightEdgeHeight: basis },
    })
  }
  const set = (name: string, edit: SetEdit): void => take(name, edit)

  /** Moves a break by so many steps of the grid; the step may be told as a part of it. */
  function nudgeBreak(key: string, steps: { readonly x: number; readonly y: number }): void {
    const document = draft.document
    if (document === undefined || desk.drawn.value === undefined) return
    const number = breakNumberOf(document, key)
    const at = desk.drawn.value.breaks[number]
    if (at === undefined) return
    const grid = GRID_MM[unit.value]
    const to = { x: at.x + steps.x * grid, y: at.y + steps.y * grid }
    const options = { neighbourGives: desk.neighbourGives.value }
    const edit = draggedBreak(document, key, to, at, options)
    if (edit !== undefined) take(moveName(number, to), edit)
    else desk.said.value = `Break ${number} can go no farther that way.`
  }
  const moveName = (number: number, { x, y }: { readonly x: number; readonly y: number }): string =>
    `Move break ${number} to x ${print(x, { places: 2 })}, y ${print(y, { places: 2 })}`

  return {
    take,
    putIn,
    takeOut,
    moveBy,
    resize,
    change,
    changeKind,
    setBasis,
    spreadBasis,
    setSightEdgeBasis,
    set,
    nudgeBreak,
    moveName,
  }
}

const sentence = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1)
