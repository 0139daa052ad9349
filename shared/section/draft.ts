import { Failure } from '@shared/failure'
import { SIGHT_EDGE_KEY } from './document'
import type { DraftMember, DraftSection, Member, Section } from './document'

/** Number of the break with a key: 0 at the sight edge, else that of the member which ends there. An unknown key is Failure 'input-invalid'. */
export function breakNumberOf(draft: DraftSection, key: string): number {
  const number = findBreakNumber(draft, key)
  if (number === undefined) {
    throw new Failure('input-invalid', { says: `There is no break with the key “${key}” in this section.` })
  }
  return number
}

export function findBreakNumber({ members }: DraftSection, key: string): number | undefined {
  if (key === SIGHT_EDGE_KEY) return 0
  const index = members.findIndex((member) => member.key === key)
  return index === -1 ? undefined : index + 1
}

/** Key of a break by its number, 0…n. */
export function breakKeyOf({ members }: DraftSection, number: number): string {
  if (number === 0) return SIGHT_EDGE_KEY
  const member = members[number - 1]
  if (!member) {
    throw new Failure('input-invalid', {
      says: `There is no break ${number}; the section has breaks 0 to ${members.length}.`,
    })
  }
  return member.key
}

/** The draft as a section of the commission file: keys become numbers. Whether it is sound is for faultsOfSection to say. */
export function sectionFromDraft(draft: DraftSection): Section {
  const { gesso } = draft
  return {
    ...draft,
    members: draft.members.map(memberWithoutKey),
    gesso:
      typeof gesso === 'number'
        ? gesso
        : gesso.map(({ from, to, thickness }) => ({
            from: breakNumberOf(draft, from),
            to: breakNumberOf(draft, to),
            thickness,
          })),
  }
}

function memberWithoutKey(keyed: DraftMember): Member {
  const { key: _, ...member } = keyed
  return member
}

/** The section with stable keys: makeKey gives one that is new each time. A stretch of gesso on a break that does not exist is Failure 'input-invalid'. */
export function draftFromSection(section: Section, makeKey: () => string): DraftSection {
  const members = section.members.map((member): DraftMember => ({ ...member, key: makeKey() }))
  const { gesso } = section
  const bare: DraftSection = { ...section, members, gesso: 0 }
  if (typeof gesso === 'number') return { ...bare, gesso }
  const stretches = gesso.map(({ from, to, thickness }) => ({
    from: breakKeyOf(bare, from),
    to: breakKeyOf(bare, to),
    thickness,
  }))
  return { ...bare, gesso: stretches }
}
