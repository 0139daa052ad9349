import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { Failure } from '@shared/failure'
import {
  applyEdit,
  breakNumberOf,
  canonicalText,
  draftFromSection,
  dragBreak,
  faultsOfSection,
  issueTextOf,
  resized,
  sectionFromDraft,
  SIGHT_EDGE_KEY,
} from '@shared/section'
import type { DraftMember, DraftSection, Member, SectionEdit } from '@shared/section'
import { anyMember, anySection } from '../../helpers/arbitraries-section'
import { draftWith, fillet } from '../../helpers/sections'

const three = (parts: Partial<DraftSection> = {}): DraftSection =>
  draftWith([fillet(10), fillet(0, 5), fillet(20)], parts)
const keysOf = ({ members }: DraftSection): string => members.map(({ key }) => key).join('')
const sizesOf = ({ members }: DraftSection) => members.map(({ width, rise }) => [width, rise])

function appliedTo(draft: DraftSection, edit: SectionEdit): DraftSection {
  const before = canonicalText(draft)
  const applied = applyEdit(draft, edit)
  expect(canonicalText(draft)).toBe(before)
  expect(canonicalText(applyEdit(applied.draft, applied.inverse).draft)).toBe(before)
  return applied.draft
}

describe('drafts and sections', () => {
  it('turn into one another, keys into numbers', () => {
    const draft = three({ gesso: [{ from: SIGHT_EDGE_KEY, to: 'b', thickness: 0.5 }] })
    const section = sectionFromDraft(draft)
    expect(section.gesso).toEqual([{ from: 0, to: 2, thickness: 0.5 }])
    expect(section.members[0]).toEqual(fillet(10))
    expect([SIGHT_EDGE_KEY, 'a', 'c'].map((key) => breakNumberOf(draft, key))).toEqual([0, 1, 3])
    const keys = ['a', 'b', 'c'].values()
    expect(draftFromSection(section, () => keys.next().value ?? '?')).toEqual(draft)
  })

  it('refuse unknown breaks', () => {
    expect(() => breakNumberOf(three(), 'x')).toThrow(Failure)
    expect(() => sectionFromDraft(three({ gesso: [{ from: 'a', to: 'x', thickness: 1 }] }))).toThrow(Failure)
    const section = { ...sectionFromDraft(three()), gesso: [{ from: 0, to: 4, thickness: 1 }] }
    expect(() => draftFromSection(section, () => 'k')).toThrow(Failure)
  })

  it('keep the issue’s text there and back', () => {
    fc.assert(
      fc.property(anySection(fc.constantFrom(0, 0.5)), (section) => {
        let next = 0
        const draft = draftFromSection(section, () => `k${(next += 1)}`)
        expect(issueTextOf(sectionFromDraft(draft))).toBe(issueTextOf(section))
      }),
    )
  })
})

describe('applyEdit', () => {
  it('puts in, takes out, moves and changes members', () => {
    const put = appliedTo(three(), { act: 'put-in', at: 1, member: { ...fillet(3), key: 'd' } })
    expect(keysOf(put)).toBe('adbc')
    expect(keysOf(appliedTo(three(), { act: 'take-out', key: 'b' }))).toBe('ac')
    expect(keysOf(appliedTo(three(), { act: 'move', key: 'a', to: 2 }))).toBe('bca')
    const changed = appliedTo(three(), { act: 'change', key: 'c', member: { ...fillet(7), key: 'c' } })
    expect(sizesOf(changed)).toEqual([
      [10, 0],
      [0, 5],
      [7, 0],
    ])
  })

  it('sets the section’s own fields', () => {
    expect(appliedTo(three(), { act: 'set', field: 'sightEdgeHeight', value: 25 }).sightEdgeHeight).toBe(25)
    expect(
      appliedTo(three(), { act: 'set', field: 'rebate', value: { width: 5, depth: 9 } }).rebate.depth,
    ).toBe(9)
    expect(appliedTo(three(), { act: 'set', field: 'gesso', value: 0.4 }).gesso).toBe(0.4)
    const based = appliedTo(three(), {
      act: 'set',
      field: 'basis',
      value: { sightEdgeHeight: { kind: 'judged', note: 'by eye' } },
    })
    expect(appliedTo(based, { act: 'set', field: 'basis', value: {} }).basis).toBeUndefined()
    appliedTo(three({ basis: {} }), { act: 'set', field: 'basis', value: {} })
  })

  it('moves a stretch of gesso to the break before when its member is taken out, and back', () => {
    const held = three({
      gesso: [
        { from: 'a', to: 'b', thickness: 1 },
        { from: 'b', to: 'c', thickness: 2 },
      ],
    })
    expect(appliedTo(held, { act: 'take-out', key: 'b' }).gesso).toEqual([
      { from: 'a', to: 'c', thickness: 2 },
    ])
    expect(appliedTo(held, { act: 'take-out', key: 'a' }).gesso).toEqual([
      { from: SIGHT_EDGE_KEY, to: 'b', thickness: 1 },
      { from: 'b', to: 'c', thickness: 2 },
    ])
  })

  it.each<[string, SectionEdit]>([
    ['an unknown key', { act: 'take-out', key: 'x' }],
    ['moving an unknown key', { act: 'move', key: 'x', to: 0 }],
    ['a place beyond the end', { act: 'put-in', at: 4, member: { ...fillet(1), key: 'd' } }],
    ['a place between places', { act: 'move', key: 'a', to: 0.5 }],
    ['a key already used', { act: 'put-in', at: 0, member: { ...fillet(1), key: 'a' } }],
    ['the sight edge’s key', { act: 'put-in', at: 0, member: { ...fillet(1), key: SIGHT_EDGE_KEY } }],
    ['a change of key', { act: 'change', key: 'a', member: { ...fillet(1), key: 'b' } }],
    [
      'gesso on an unknown break',
      { act: 'set', field: 'gesso', value: [{ from: 'a', to: 'x', thickness: 1 }] },
    ],
    [
      'a section with one key twice',
      {
        act: 'replace-all',
        section: draftWith([fillet(1)], {
          members: [
            { ...fillet(1), key: 'a' },
            { ...fillet(1), key: 'a' },
          ],
        }),
      },
    ],
    [
      'the second of two together',
      {
        act: 'together',
        edits: [
          { act: 'take-out', key: 'a' },
          { act: 'take-out', key: 'a' },
        ],
      },
    ],
  ])('refuses %s', (_, edit) => {
    expect(() => applyEdit(three(), edit)).toThrow(Failure)
  })

  it('is undone exactly by the inverses in reverse, whatever was done', () => {
    fc.assert(
      fc.property(anySection(), fc.array(anyStep(), { minLength: 1, maxLength: 25 }), (section, steps) => {
        let next = 0
        let draft = draftFromSection(section, () => `k${(next += 1)}`)
        const first = canonicalText(draft)
        const inverses: SectionEdit[] = []
        for (const [index, step] of steps.entries()) {
          const edit = editFrom(step, draft, `new${index}`)
          if (!edit) continue
          const applied = applyEdit(draft, edit)
          draft = applied.draft
          inverses.unshift(applied.inverse)
        }
        for (const inverse of inverses) draft = applyEdit(draft, inverse).draft
        expect(canonicalText(draft)).toBe(first)
      }),
    )
  })
})

interface Step {
  readonly act: 'put-in' | 'take-out' | 'move' | 'change' | 'gesso' | 'drag' | 'together' | 'height'
  readonly member: Member
  readonly at: number
  readonly to: number
}

const anyStep = (): fc.Arbitrary<Step> =>
  fc.record({
    act: fc.constantFrom('put-in', 'take-out', 'move', 'change', 'gesso', 'drag', 'together', 'height'),
    member: anyMember(),
    at: fc.nat(30),
    to: fc.nat(30),
  })

/** A step as an edit of this draft; none where the draft has no member to do it to. */
function editFrom({ act, member, at, to }: Step, draft: DraftSection, key: string): SectionEdit | undefined {
  const count = draft.members.length
  if (act === 'put-in') return { act, at: at % (count + 1), member: { ...member, key } }
  const own = draft.members[at % Math.max(1, count)]
  if (!own) return undefined
  const other = draft.members[to % count] as DraftMember
  switch (act) {
    case 'take-out':
      return { act, key: own.key }
    case 'move':
      return { act, key: own.key, to: to % count }
    case 'change':
      return { act, key: own.key, member: { ...member, key: own.key } }
    case 'gesso':
      return {
        act: 'set',
        field: 'gesso',
        value: [
          { from: SIGHT_EDGE_KEY, to: own.key, thickness: 0.3 },
          { from: own.key, to: other.key, thickness: 0.1 },
        ],
      }
    case 'drag':
      return dragBreak(draft, own.key, { x: at + 3.3, y: 40 + to }, { neighbourGives: to % 2 === 0 })
    case 'together':
      return {
        act,
        edits: [
          { act: 'move', key: own.key, to: 0 },
          { act: 'take-out', key: other.key },
        ],
      }
    default:
      return { act: 'set', field: 'sightEdgeHeight', value: 30 + to }
  }
}

describe('resized', () => {
  const done = (draft: DraftSection, edit: SectionEdit): DraftSection => appliedTo(draft, edit)

  it('gives a member the size typed, all else moving along', () => {
    expect(sizesOf(done(three(), resized(three(), 'a', { width: 12 })))).toEqual([
      [12, 0],
      [0, 5],
      [20, 0],
    ])
  })

  it('lets the neighbour give what its kind can', () => {
    const draft = draftWith([fillet(10), { kind: 'splay', width: 6, rise: 4 }, fillet(20)])
    const wider = done(draft, resized(draft, 'a', { width: 12 }, { neighbourGives: true }))
    expect(sizesOf(wider)).toEqual([
      [12, 0],
      [4, 4],
      [20, 0],
    ])
    const higher = done(draft, resized(draft, 'b', { rise: 5 }, { neighbourGives: true }))
    expect(sizesOf(higher)).toEqual([
      [10, 0],
      [6, 5],
      [20, 0],
    ])
  })

  it('stretches a free member’s curves with it, and shears a level one to a rise', () => {
    const free: Member = {
      kind: 'free',
      width: 4,
      rise: 2,
      curves: [
        [
          [1, 0],
          [3, 2],
          [4, 2],
        ],
      ],
    }
    const draft = draftWith([free])
    expect(done(draft, resized(draft, 'a', { width: 8, rise: 1 })).members[0]).toMatchObject({
      curves: [
        [
          [2, 0],
          [6, 1],
          [8, 1],
        ],
      ],
    })
    const level = draftWith([
      {
        ...free,
        rise: 0,
        curves: [
          [
            [1, 1],
            [3, 1],
            [4, 0],
          ],
        ],
      },
    ])
    expect(done(level, resized(level, 'a', { rise: 4 })).members[0]).toMatchObject({
      curves: [
        [
          [1, 2],
          [3, 4],
          [4, 4],
        ],
      ],
    })
  })

  it('refuses an unknown member and the sight edge, which has no width', () => {
    expect(() => resized(three(), 'x', { width: 1 })).toThrow(Failure)
    expect(() => resized(three(), SIGHT_EDGE_KEY, { width: 1 })).toThrow(Failure)
  })
})

describe('dragBreak', () => {
  const dragged = (draft: DraftSection, key: string, x: number, y: number, neighbourGives: boolean) =>
    appliedTo(draft, dragBreak(draft, key, { x, y }, { neighbourGives }))
  const splays = draftWith([
    { kind: 'splay', width: 10, rise: 4 },
    { kind: 'splay', width: 6, rise: -3 },
  ])

  it('brings the break where it is dragged; what follows stays or moves along', () => {
    expect(sizesOf(dragged(splays, 'a', 8, 36, true))).toEqual([
      [8, 6],
      [8, -5],
    ])
    expect(sizesOf(dragged(splays, 'a', 8, 36, false))).toEqual([
      [8, 6],
      [6, -3],
    ])
  })

  it('never makes a width less than 0, its own or the neighbour’s', () => {
    expect(sizesOf(dragged(splays, 'a', -5, 34, true))).toEqual([
      [0, 4],
      [16, -3],
    ])
    expect(sizesOf(dragged(splays, 'a', 50, 34, true))).toEqual([
      [16, 4],
      [0, -3],
    ])
  })

  it('keeps fillets level or upright and level kinds level', () => {
    expect(sizesOf(dragged(three(), 'a', 12, 33, false))).toEqual([
      [12, 0],
      [0, 5],
      [20, 0],
    ])
    expect(sizesOf(dragged(three(), 'b', 12, 33, false))).toEqual([
      [10, 0],
      [0, 3],
      [20, 0],
    ])
    const bead = draftWith([fillet(5), { kind: 'bead', width: 4, rise: 0 }])
    expect(sizesOf(dragged(bead, 'b', 11, 44, false))).toEqual([
      [5, 0],
      [6, 0],
    ])
  })

  it('moves the sight edge up and down', () => {
    const up = dragged(splays, SIGHT_EDGE_KEY, 3, 32, true)
    expect([up.sightEdgeHeight, ...sizesOf(up)]).toEqual([32, [10, 2], [6, -3]])
    expect(dragged(splays, SIGHT_EDGE_KEY, 3, 32, false).sightEdgeHeight).toBe(32)
  })

  it('leaves what follows in place wherever the break is dragged between its neighbours', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1, max: 15, noNaN: true }),
        fc.double({ min: 31.5, max: 33.5, noNaN: true }),
        (x, y) => {
          const after = sectionFromDraft(dragged(splays, 'a', x, y, true))
          const sum = (side: 'width' | 'rise') =>
            after.members.reduce((total, member) => total + member[side], 0)
          expect(Math.abs(sum('width') - 16) + Math.abs(sum('rise') - 1)).toBeLessThan(1e-9)
          expect(faultsOfSection(after)).toEqual([])
        },
      ),
    )
  })
})
