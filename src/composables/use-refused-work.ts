import { computed } from 'vue'
import { changesBetween, sectionFromDraft } from '@shared/section'
import { useOpenDraftStore } from '@/stores/open-draft'
import { useMemberWords } from './use-member-words'

const MOST_TOLD = 6

/** What another has changed under a draft whose save was refused for it, in words. */
export function useRefusedWork() {
  const draft = useOpenDraftStore()
  const { nameOf } = useMemberWords()

  const current = computed(() => (draft.trouble?.kind === 'stale' ? draft.trouble.current : undefined))
  const by = computed(() => current.value?.history.at(-1)?.by ?? 'Somebody else')
  const changes = computed(() => {
    const before = draft.session?.base.document
    const now = current.value?.document
    if (before === undefined || now === undefined) return []
    const names = changesBetween(sectionFromDraft(before), sectionFromDraft(now)).map(
      ({ path, before: was, after }) => told(path, was, after),
    )
    const more = names.length - MOST_TOLD
    return more > 0 ? [...names.slice(0, MOST_TOLD), `and ${more} more`] : names
  })
  /** "/members/2/width" as "member 3, width" with what it was and what it is. */
  function told(path: string, was: unknown, after: unknown): string {
    const [first, index, ...rest] = path.split('/').filter(Boolean)
    if (first !== 'members')
      return `${[first, index, ...rest].filter(Boolean).join(' ')}: ${plain(was)} → ${plain(after)}`
    const place = `member ${Number(index) + 1}`
    if (rest.length === 0)
      return was === null ? `${kindOf(after)} put in as ${place}` : `${kindOf(was)}, ${place}, taken out`
    return `${place}, ${rest.join(' ')}: ${plain(was)} → ${plain(after)}`
  }
  const kindOf = (member: unknown): string =>
    typeof member === 'object' && member !== null && 'kind' in member
      ? nameOf(member.kind as Parameters<typeof nameOf>[0])
      : 'a member'
  return { current, by, changes }
}

function plain(value: unknown): string {
  if (value === null || value === undefined) return 'none'
  if (typeof value === 'number') return String(Number(value.toFixed(3)))
  if (typeof value === 'object' && 'kind' in value) return String(value.kind)
  return typeof value === 'string' ? value : 'changed'
}
