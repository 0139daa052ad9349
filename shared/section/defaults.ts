import type { Member, Section } from './document'

/** What a section takes where nothing is said: no splay, bare wood, and the tolerance, mm, that common practice holds a moulding to. */
export const SECTION_DEFAULTS = {
  backSplay: { x: 0, height: 0 },
  gesso: 0,
  tolerance: 0.2,
} as const satisfies Partial<Section>

type WithoutFillet<M> = M extends { readonly fillet: number }
  ? Omit<M, 'fillet'> & { readonly fillet?: number }
  : M

/** A member as it may be written: the fillets between reeds or flutes default to none. */
export type PartialMember = WithoutFillet<Member>

/** A section as it may be written: what has a default may be left out. */
export type PartialSection = Omit<Section, 'members' | keyof typeof SECTION_DEFAULTS> &
  Partial<Pick<Section, keyof typeof SECTION_DEFAULTS>> & { readonly members: readonly PartialMember[] }

/** The section with every default filled in. An arc's default is no number of the document: it follows width and rise. */
export function withDefaults(partial: PartialSection): Section {
  return { ...SECTION_DEFAULTS, ...partial, members: partial.members.map(wholeMember) }
}

function wholeMember(member: PartialMember): Member {
  if (member.kind === 'reeds' || member.kind === 'flutes') return { ...member, fillet: member.fillet ?? 0 }
  return member
}
