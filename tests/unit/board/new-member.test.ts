import { describe, expect, it } from 'vitest'
import { faultsOfSection } from '@shared/section'
import type { Member, Section } from '@shared/section'
import { MEMBER_KINDS, asKind, newMemberOf } from '@/board/new-member'
import { memberGlyphOf } from '@/board/member-glyph'

const sectionOf = (member: Member): Section => ({
  sightEdgeHeight: 200,
  rebate: { width: 0, depth: 0 },
  backSplay: { x: 0, height: 0 },
  gesso: 0,
  tolerance: 0.2,
  members: [{ kind: 'fillet', width: 10, rise: 0 }, member, { kind: 'fillet', width: 10, rise: 0 }],
})

describe('a new member', () => {
  it.each(MEMBER_KINDS)('of kind %s is sound, rising or falling, small or large', (kind) => {
    for (const size of [2, 12.5, 40]) {
      for (const sense of [1, -1] as const) {
        expect(faultsOfSection(sectionOf(newMemberOf(kind, size, sense)))).toEqual([])
      }
    }
  })

  it('has each of the fourteen kinds once', () => expect(new Set(MEMBER_KINDS).size).toBe(14))

  it.each(MEMBER_KINDS)('can become any other kind and back to something sound: %s', (kind) => {
    const from = newMemberOf(kind, 12)
    for (const to of MEMBER_KINDS) {
      const became = asKind({ ...from, basis: { width: { kind: 'judged', note: 'x' } } }, to)
      expect(became.kind).toBe(to)
      expect(became.basis).toEqual({ width: { kind: 'judged', note: 'x' } })
      expect(faultsOfSection(sectionOf(became))).toEqual([])
    }
  })

  it('keeps its ends where the other kind can have them', () => {
    expect(asKind({ kind: 'ovolo', width: 12, rise: -9 }, 'cavetto')).toMatchObject({ width: 12, rise: -9 })
    expect(asKind({ kind: 'splay', width: 3, rise: 9 }, 'fillet')).toMatchObject({ width: 0, rise: 9 })
  })

  it.each(MEMBER_KINDS)('is drawn small within its box: %s', (kind) => {
    const { face, wood, viewBox } = memberGlyphOf(kind)
    const [left = 0, top = 0, width = 0, height = 0] = viewBox.split(' ').map(Number)
    const numbers = [...wood.matchAll(/(-?\d+\.\d+) (-?\d+\.\d+)/g)].map(([, x, y]) => [Number(x), Number(y)])
    expect(face.startsWith('M')).toBe(true)
    for (const [x = NaN, y = NaN] of numbers) {
      expect(x).toBeGreaterThanOrEqual(left - 0.01)
      expect(x).toBeLessThanOrEqual(left + width + 0.01)
      expect(y).toBeGreaterThanOrEqual(top - 0.01)
      expect(y).toBeLessThanOrEqual(top + height + 0.01)
    }
  })
})
