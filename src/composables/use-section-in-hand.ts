import { computed, toValue } from 'vue'
import type { MaybeRefOrGetter } from 'vue'
import { faultsOfSection, sectionFromDraft } from '@shared/section'
import type { Section } from '@shared/section'
import { readDraft } from '@/api/drafts'
import { useSessionStore } from '@/stores/session'
import { KEYS } from './query-keys'
import { useAsked } from './use-asked'
import { useIssue, useIssues } from './use-issues'

export interface SectionInHand {
  readonly section: Section
  /** Where it comes from, in words: “issue B” or “the draft”. */
  readonly from: string
  readonly isDraft: boolean
}

/**
 * The section that everything else of a commission goes by: the latest issue's, or the draft's while nothing has been put
 * forward and as far as it is sound. Undefined while there is none, or none that this person may see.
 */
export function useSectionInHand(commissionId: MaybeRefOrGetter<string>) {
  const session = useSessionStore()
  const { value: issues, isAsking, failure, askAgain } = useIssues(commissionId)
  const latest = computed(() => issues.value?.find((issue) => issue.latest))
  const { value: issue } = useIssue(() => latest.value?.id ?? null)
  const { value: draft } = useAsked(
    () => KEYS.draft(toValue(commissionId)),
    (signal) => readDraft(toValue(commissionId), signal),
    { when: () => session.mayDo('draft.read') && issues.value?.length === 0 },
  )
  const inHand = computed((): SectionInHand | undefined => {
    if (issue.value !== undefined)
      return { section: issue.value.section, from: `issue ${issue.value.letter}`, isDraft: false }
    if (draft.value === undefined || issues.value?.length !== 0) return undefined
    const section = sectionFromDraft(draft.value.document)
    const isSound = section.members.length > 0 && faultsOfSection(section).length === 0
    return isSound ? { section, from: 'the draft', isDraft: true } : undefined
  })
  /** Whether it is known what there is: only then may a page say that there is none. */
  const isKnown = computed(
    () =>
      inHand.value !== undefined ||
      (issues.value?.length === 0 && (draft.value !== undefined || !session.mayDo('draft.read'))),
  )
  return { inHand, isKnown, issues, issue, isAsking, failure, askAgain }
}
