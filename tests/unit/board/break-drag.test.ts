import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { applyEdit, faultsOfSection, sectionFromDraft } from '@shared/section'
import type { DraftMember, DraftSection } from '@shared/section'
import { MOVED_NOTE, draggedBreak } from '@/board/break-drag'

const draftOf = (members: readonly DraftMember[]): DraftSection => ({
  sightEdgeHeight: 30,
  rebate: { width: 6, depth: 12 },
  backSplay: { x: 0, height: 0 },
  gesso: 0,
  tolerance: 0.2,
  members,
})
const SPLAY = { key: 'a', kind: 'splay', width: 10, rise: 4 } as const
const SCOTIA = { key: 'b', kind: 'scotia', width: 20, rise: 2 } as const
const drag = (draft: DraftSection, key: string, x: number, y: number, at: { x: number; y: number }) => {
  const edit = draggedBreak(draft, key, { x, y }, at, { neighbourGives: true })
  return edit && applyEdit(draft, edit).draft.members
}

describe('a dragged break', () => {
  it('goes where it is dragged, the next member giving way', () => {
    const members = drag(draftOf([SPLAY, SCOTIA]), 'a', 12, 35, { x: 10, y: 34 })
    expect(members).toMatchObject([
      { width: 12, rise: 5 },
      { width: 18, rise: 1 },
    ])
  })

  it('keeps to the way that is sound where both are not: a splay may not become level', () => {
    const members = drag(draftOf([SPLAY, SCOTIA]), 'a', 13, 30, { x: 10, y: 34 })
    expect(members).toMatchObject([
      { width: 13, rise: 4 },
      { width: 17, rise: 2 },
    ])
  })

  it('does not go at all where its members cannot follow', () => {
    expect(drag(draftOf([SPLAY]), 'a', 0, 30, { x: 10, y: 34 })).toBeUndefined()
  })

  it('is judged from then on, in what has changed and only there', () => {
    const basis = {
      width: { kind: 'measured', plusMinus: 0.2 },
      rise: { kind: 'precedent', citation: 'the old frame' },
    } as const
    const members = drag(draftOf([{ ...SPLAY, basis }, SCOTIA]), 'a', 12, 34, { x: 10, y: 34 })
    expect(members?.[0]?.basis).toEqual({
      width: { kind: 'judged', note: MOVED_NOTE },
      rise: basis.rise,
    })
    expect(members?.[1]?.basis).toBeUndefined()
  })

  it('never leaves a member that breaks the rules of its kind, wherever it is dragged', () => {
    const place = fc.double({ min: -60, max: 60, noNaN: true })
    fc.assert(
      fc.property(place, place, (x, y) => {
        const draft = draftOf([SPLAY, SCOTIA])
        const edit = draggedBreak(draft, 'a', { x, y }, { x: 10, y: 34 }, { neighbourGives: true })
        if (edit === undefined) return
        const { members } = applyEdit(draft, edit).draft
        const high = sectionFromDraft({ ...draft, sightEdgeHeight: 4000, members })
        expect(faultsOfSection(high)).toEqual([])
      }),
    )
  })
})
