import { withDefaults } from '@shared/section'
import type { DraftMember, DraftSection, Fillet, Member, PartialSection, Section } from '@shared/section'

export const fillet = (width: number, rise = 0): Fillet => ({ kind: 'fillet', width, rise })

/** A plain block 40 wide and 30 high with a rebate of 6 × 12, and of it what a test says. */
export function sectionWith(parts: Partial<PartialSection> = {}): Section {
  return withDefaults({
    sightEdgeHeight: 30,
    rebate: { width: 6, depth: 12 },
    members: [fillet(40)],
    ...parts,
  })
}

/** A block with a member set between two fillets 10 wide. */
export const between = (member: Member, parts: Partial<PartialSection> = {}): Section =>
  sectionWith({ members: [fillet(10), member, fillet(10)], ...parts })

/** A draft whose members have the keys a, b, c and so on. */
export function draftWith(members: readonly Member[], parts: Partial<DraftSection> = {}): DraftSection {
  const keyed = members.map((member, index): DraftMember => ({
    ...member,
    key: String.fromCharCode(97 + index),
  }))
  return { ...sectionWith({ members: [] }), gesso: 0, members: keyed, ...parts }
}
