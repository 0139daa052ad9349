import type { Member, MemberKind } from '@shared/section'
import { useWords } from './use-words'

const NAMES = {
  fillet: 'fillet',
  splay: 'splay',
  cavetto: 'cavetto',
  ovolo: 'ovolo',
  thumb: 'thumb',
  'cyma-recta': 'cyma recta',
  'cyma-reversa': 'cyma reversa',
  scotia: 'scotia',
  torus: 'torus',
  bead: 'bead',
  reeds: 'reeds',
  flutes: 'flutes',
  quirk: 'quirk',
  free: 'free curve',
} as const satisfies Record<MemberKind, string>

const SHORT_NAMES: Partial<Record<MemberKind, string>> = {
  'cyma-recta': 'recta',
  'cyma-reversa': 'reversa',
  free: 'free',
}

/** Members as this workshop calls them. */
export function useMemberWords() {
  const { word } = useWords()
  const nameOf = (kind: MemberKind): string => (kind === 'splay' ? word('splay') : NAMES[kind])
  const shortNameOf = (kind: MemberKind): string => SHORT_NAMES[kind] ?? nameOf(kind)
  /** "scotia, member 5" */
  const nameInPlace = (member: Pick<Member, 'kind'>, index: number): string =>
    `${nameOf(member.kind)}, member ${index + 1}`
  return { nameOf, shortNameOf, nameInPlace }
}
