import { computed, inject, provide, shallowRef, watch } from 'vue'
import type { InjectionKey } from 'vue'
import type { Point } from '@shared/geometry'
import { SIGHT_EDGE_KEY } from '@shared/section'
import { drawnSection } from '@/board/drawn-section'
import { useOpenDraftStore } from '@/stores/open-draft'

/** What the parts of the board have in common while it is open: the drawing, what is selected, what is pointed out. */
function makeDesk() {
  const draft = useOpenDraftStore()
  const selected = shallowRef<string>()
  const selectedBreak = shallowRef<string>()
  /** A place of the section that is being pointed out, mm. */
  const place = shallowRef<Point>()
  /** Whether the next member takes up a change of size, or all that follows moves along. */
  const neighbourGives = shallowRef(true)
  /** What has just happened to the drawing, for those who listen. */
  const said = shallowRef('')
  /** Counts the times that the selected member's size was asked to be typed. */
  const sizeAsked = shallowRef(0)

  const drawn = computed(() => draft.document && drawnSection(draft.document))
  const members = computed(() => drawn.value?.members ?? [])
  const selectedIndex = computed(() => members.value.findIndex(({ member }) => member.key === selected.value))
  const selectedMember = computed(() => members.value[selectedIndex.value])

  function select(key: string | undefined): void {
    selected.value = key
    selectedBreak.value = undefined
  }
  function selectBreak(key: string): void {
    selectedBreak.value = key
    if (key !== SIGHT_EDGE_KEY) selected.value = key
  }
  /** The member so many places on; at an end it stays there. */
  function selectBeside(by: number): void {
    const at = selectedIndex.value === -1 ? (by > 0 ? -1 : members.value.length) : selectedIndex.value
    const next = members.value[Math.min(members.value.length - 1, Math.max(0, at + by))]
    if (next !== undefined) select(next.member.key)
  }
  // What was taken out cannot stay selected; an undo may bring it back, but not the selection.
  watch(members, (now) => {
    const keys = new Set(now.map(({ member }) => member.key))
    if (selected.value !== undefined && !keys.has(selected.value)) selected.value = undefined
    const isGone = selectedBreak.value !== undefined && !keys.has(selectedBreak.value)
    if (isGone && selectedBreak.value !== SIGHT_EDGE_KEY) selectedBreak.value = undefined
  })

  return {
    draft,
    selected,
    selectedBreak,
    selectedIndex,
    selectedMember,
    place,
    neighbourGives,
    said,
    sizeAsked,
    drawn,
    members,
    select,
    selectBreak,
    selectBeside,
  }
}

export type BoardDesk = ReturnType<typeof makeDesk>
const DESK: InjectionKey<BoardDesk> = Symbol('board desk')

export function provideBoardDesk(): BoardDesk {
  const desk = makeDesk()
  provide(DESK, desk)
  return desk
}

export function useBoardDesk(): BoardDesk {
  const desk = inject(DESK)
  if (desk === undefined) throw new Error('a part of the board stands outside of it')
  return desk
}
