import { computed, onScopeDispose, shallowRef, toValue, watch } from 'vue'
import type { MaybeRefOrGetter } from 'vue'
import type { CommissionView } from '@shared/contracts'
import { basisCountsOf, checksOf, measuresOf, missingBasisOf, sectionFromDraft } from '@shared/section'
import type { Check, RebateStack, SectionMeasures } from '@shared/section'
import type { DrawnSection } from '@/board/drawn-section'
import { useSessionStore } from '@/stores/session'

export interface SectionFigures {
  readonly measures: SectionMeasures
  readonly checks: readonly Check[]
}

/** Figures and checks of the section on the board, worked out right after each stroke is on the screen; undefined while it cannot be measured. */
export function useSectionFigures(
  drawn: MaybeRefOrGetter<DrawnSection | undefined>,
  stack: MaybeRefOrGetter<RebateStack>,
) {
  const session = useSessionStore()
  const figures = shallowRef<SectionFigures>()
  let frame: number | undefined

  function workOut(): void {
    frame = undefined
    const now = toValue(drawn)
    if (now === undefined || now.faults.length > 0 || now.members.length === 0) {
      figures.value = undefined
      return
    }
    const section = sectionFromDraft(now.draft)
    const options = { stack: toValue(stack), vocabulary: session.vocabulary }
    figures.value = { measures: measuresOf(section), checks: checksOf(section, options) }
  }
  watch(
    [() => toValue(drawn), () => toValue(stack), () => session.vocabulary],
    () => (frame ??= requestAnimationFrame(workOut)),
    { immediate: true },
  )
  onScopeDispose(() => frame !== undefined && cancelAnimationFrame(frame))

  const section = computed(() => {
    const now = toValue(drawn)
    return now && sectionFromDraft(now.draft)
  })
  const counts = computed(() => section.value && basisCountsOf(section.value))
  const missing = computed(() => [
    ...(toValue(drawn)?.faults ?? []),
    ...(section.value ? missingBasisOf(section.value) : []),
  ])
  return { figures, counts, missing }
}

/** What lies in the rebate of a commission's pictures: of several, the one that needs the most depth. */
export function stackOf(commission: CommissionView | undefined): RebateStack {
  const stacks = (commission?.pictures ?? []).flatMap(({ measurement, state }) => {
    if (measurement === null || state !== 'open') return []
    const { thickness, lining, stack } = measurement.document
    return [partsOf({ lining, thickness, ...stack })]
  })
  const depth = (stack: RebateStack): number =>
    Object.values(stack).reduce<number>((sum, part) => sum + (part ?? 0), 0)
  return stacks.sort((a, b) => depth(b) - depth(a))[0] ?? {}
}

const partsOf = (parts: Readonly<Record<string, number | null>>): RebateStack =>
  Object.fromEntries(Object.entries(parts).filter(([, height]) => height !== null))

/** Half the allowance and the lining: what the picture keeps clear of the rebate's side, mm. */
export function clearanceOf(commission: CommissionView | undefined): number {
  const found = commission?.pictures.find(({ measurement }) => measurement !== null)?.measurement
  return found ? found.document.allowance / 2 + found.document.lining : 0
}
