import type { Member } from '@shared/section'
import { useWords } from '@/composables/use-words'

/** Names of members as the workshop says them. */
export function useMemberNames() {
  const { word } = useWords()
  const nameOf = ({ kind }: Member): string => {
    const name = kind === 'splay' ? word('splay') : kind.replace('-', ' ')
    return name.charAt(0).toUpperCase() + name.slice(1)
  }
  /** “3, Cavetto”: numbers exist on the screen only. */
  const numberedNameOf = (member: Member, index: number) => `${index + 1}, ${nameOf(member)}`
  return { nameOf, numberedNameOf }
}
