import { computed, onScopeDispose, shallowRef, toValue, watch } from 'vue'
import type { MaybeRefOrGetter, Ref } from 'vue'
import { useResizeObserver } from '@vueuse/core'
import type { Point } from '@shared/geometry'
import type { RebateStack } from '@shared/section'
import { stackBoxesOf } from '@/board/picture-stack'
import { sceneOn } from '@/board/scene'
import type { Scene, SceneModel } from '@/board/scene'
import { fittedTo, pannedBy, toCanvas, zoomedAt } from '@/board/view-transform'
import type { CanvasSize, Extent, View } from '@/board/view-transform'
import { paletteOf } from './board-palette'
import { selectedLabels } from './board-labels'
import type { BoardDesk } from './use-board-desk'
import { useLengths } from './use-lengths'
import type { UnderDrawing } from './use-photograph-under'

export interface StageGiven {
  readonly stack: MaybeRefOrGetter<RebateStack>
  readonly clearMm: MaybeRefOrGetter<number>
  readonly photograph: UnderDrawing
}

/** Room round the whole section: for the picture's names on the left, the dimension above and the wall below, CSS pixels. */
const MARGINS = { left: 96, right: 56, top: 104, bottom: 46 }
/** How near to the canvas's edge the drawing may come, CSS pixels, and how small against its best scale, before it is shown whole anew. */
const TIGHT = 30
const LEAST_SHARE = 0.6
const STACK_NAMES = {
  glazing: 'glazing',
  airGap: 'air',
  thickness: 'picture',
  backing: 'backing',
  fixings: 'fixings',
} as const

/** The canvas of the board: its size, how the section lies on it, and its painting, at most once a frame. */
export function useBoardStage(
  holder: Ref<HTMLElement | null>,
  canvas: Ref<HTMLCanvasElement | null>,
  desk: BoardDesk,
  given: StageGiven,
) {
  const { print, unit } = useLengths()
  const size = shallowRef<CanvasSize>({ width: 0, height: 0 })
  const view = shallowRef<View>({ pixelsPerMm: 4, originX: MARGINS.left, originY: 300 })
  /** Until the user has moved the drawing it is kept whole. */
  const isWhole = shallowRef(true)
  let scene: Scene | undefined
  let frame: number | undefined

  const model = computed<SceneModel | undefined>(() => {
    const drawn = desk.drawn.value
    if (drawn === undefined) return undefined
    return {
      drawn,
      selected: desk.selected.value,
      selectedBreak: desk.selectedBreak.value,
      stack: stackBoxesOf(drawn.draft, toValue(given.stack), toValue(given.clearMm)),
      stackNames: STACK_NAMES,
      wallName: 'wall',
      labels: selectedLabels(desk.selectedMember.value, (mm) => print(mm, { withUnit: false })),
      place: desk.place.value,
      photograph: given.photograph.under.value,
      isLaying: given.photograph.isLaying.value,
      unit: unit.value,
    }
  })
  const extent = computed<Extent>(() => {
    const places = desk.drawn.value?.breaks ?? []
    const first = { min: { x: 0, y: 0 }, max: { x: 20, y: 20 } }
    return places.reduce(
      ({ min, max }, { x, y }) => ({
        min: { x: Math.min(min.x, x), y: Math.min(min.y, y) },
        max: { x: Math.max(max.x, x), y: Math.max(max.y, y) },
      }),
      first,
    )
  })

  useResizeObserver(holder, ([entry]) => {
    const box = entry?.contentRect
    if (box !== undefined) size.value = { width: Math.round(box.width), height: Math.round(box.height) }
  })
  watch(size, () => isWhole.value && fit())
  watch(extent, () => isWhole.value && desk.draft.preview === undefined && !stillSits() && fit())
  watch([model, view, size], askForPaint)
  onScopeDispose(() => {
    if (frame !== undefined) cancelAnimationFrame(frame)
    scene?.close()
  })

  function askForPaint(): void {
    frame ??= requestAnimationFrame(paint)
  }
  function paint(): void {
    frame = undefined
    if (canvas.value === null || model.value === undefined || size.value.width === 0) return
    scene ??= sceneOn(canvas.value, paletteOf(canvas.value))
    scene.paint(model.value, view.value, size.value)
  }
  function fitted(): View {
    const margins = size.value.width < 560 ? { ...MARGINS, left: 64, right: 28 } : MARGINS
    return fittedTo(extent.value, size.value, margins)
  }
  function fit(): void {
    if (size.value.width > 0) view.value = fitted()
  }
  /** A drawing that still lies well on the canvas is left where it is, so that it does not jump at every stroke. */
  function stillSits(): boolean {
    const { min, max } = extent.value
    const [lowest, highest] = [toCanvas(view.value, min), toCanvas(view.value, max)]
    const isInside = highest.y >= TIGHT && highest.x <= size.value.width - TIGHT && lowest.x >= TIGHT
    return isInside && view.value.pixelsPerMm > fitted().pixelsPerMm * LEAST_SHARE
  }
  function showWhole(): void {
    isWhole.value = true
    fit()
  }
  function pan(across: number, down: number): void {
    isWhole.value = false
    view.value = pannedBy(view.value, across, down)
  }
  function zoom(factor: number, at?: Point): void {
    isWhole.value = false
    const middle = { x: size.value.width / 2, y: size.value.height / 2 }
    view.value = zoomedAt(view.value, at ?? middle, factor)
  }
  /** Brings a stretch of the section back into sight, if it has left. */
  function bringIn(from: Point, to: Point): void {
    const middle = (toCanvas(view.value, from).x + toCanvas(view.value, to).x) / 2
    if (middle < 0 || middle > size.value.width) pan(size.value.width / 2 - middle, 0)
  }

  return {
    size,
    view,
    zoom,
    pan,
    showWhole,
    bringIn,
    hitAt: (place: Point) => scene?.hitAt(place) ?? { kind: 'nothing' as const },
  }
}

export type BoardStage = ReturnType<typeof useBoardStage>
