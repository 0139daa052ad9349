import { computed, toValue } from 'vue'
import type { MaybeRefOrGetter } from 'vue'
import { LEAST_CELL, LEAST_INCH_CELL, ruleCells } from '@/board/rule-cells'
import { toCanvas } from '@/board/view-transform'
import type { BoardDesk } from './use-board-desk'
import type { BoardStage } from './use-board-stage'
import { useLengths } from './use-lengths'

/** Cells beyond the canvas by more than this are not made, CSS pixels. */
const BEYOND = 60

/** The member rule's cells as the section lies on the canvas now; only those in sight, and the selected one. */
export function useRuleCells(desk: BoardDesk, stage: MaybeRefOrGetter<Pick<BoardStage, 'view' | 'size'>>) {
  const { unit } = useLengths()
  const cells = computed(() => {
    const { view, size } = toValue(stage)
    const members = desk.members.value
    const stretches = members.map(({ member, start, end }) => ({
      key: member.key,
      from: toCanvas(view.value, start).x,
      to: toCanvas(view.value, end).x,
    }))
    const least = unit.value === 'mm' ? LEAST_CELL : LEAST_INCH_CELL
    return ruleCells(stretches, desk.selected.value, least)
      .map((cell, index) => ({ ...cell, index, member: members[index]?.member }))
      .filter(({ key, left, width }) => {
        const isInSight = left + width > -BEYOND && left < size.value.width + BEYOND
        return isInSight || key === desk.selected.value
      })
  })
  return { cells }
}
