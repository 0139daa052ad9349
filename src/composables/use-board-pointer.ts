import { shallowRef } from 'vue'
import type { Ref } from 'vue'
import { assertNever } from '@shared/failure'
import type { Point } from '@shared/geometry'
import { breakNumberOf } from '@shared/section'
import { draggedBreak } from '@/board/break-drag'
import { POINTER_IDLE, pointerStep } from '@/board/pointer-tool'
import type { PointerAct, PointerEventIn, PointerState } from '@/board/pointer-tool'
import { GRID_MM, snapped } from '@/board/snapping'
import { toSection } from '@/board/view-transform'
import type { BoardDesk } from './use-board-desk'
import type { BoardStage } from './use-board-stage'
import type { UnderDrawing } from './use-photograph-under'
import { useLengths } from './use-lengths'

/** How near another break must be for a dragged one to fall in with it, CSS pixels. */
const FALL_IN_REACH = 5
const WHEEL_PACE = 0.0016

/** Pointer and wheel on the canvas: each event goes through the machine of `pointer-tool`, and what it says is done here. */
export function useBoardPointer(
  canvas: Ref<HTMLCanvasElement | null>,
  desk: BoardDesk,
  stage: BoardStage,
  photograph: UnderDrawing,
  moveName: (number: number, place: Point) => string,
) {
  const { unit } = useLengths()
  /** Where the pointer is on the section, mm; undefined while it is elsewhere. */
  const pointer = shallowRef<Point>()
  const state = shallowRef<PointerState>(POINTER_IDLE)
  const fingers = new Map<number, Point>()
  let reached: Point | undefined
  let isFree = false

  const placeOf = (event: PointerEvent | WheelEvent): Point => {
    const box = canvas.value?.getBoundingClientRect()
    return { x: event.clientX - (box?.left ?? 0), y: event.clientY - (box?.top ?? 0) }
  }
  function step(event: PointerEventIn): void {
    const next = pointerStep(state.value, event)
    state.value = next.state
    next.acts.forEach(act)
  }

  function onDown(event: PointerEvent): void {
    const at = placeOf(event)
    fingers.set(event.pointerId, at)
    if (fingers.size > 1) return step({ kind: 'give-back' })
    if (event.button > 1) return
    canvas.value?.setPointerCapture(event.pointerId)
    step({ kind: 'press', at, on: stage.hitAt(at), isPan: event.button === 1 })
  }
  function onMove(event: PointerEvent): void {
    const at = placeOf(event)
    pointer.value = toSection(stage.view.value, at)
    isFree = event.altKey
    if (fingers.size === 2 && fingers.has(event.pointerId)) return pinch(event.pointerId, at)
    step({ kind: 'move', at })
  }
  function onUp(event: PointerEvent): void {
    fingers.delete(event.pointerId)
    step({ kind: 'release' })
  }
  function onCancel(event: PointerEvent): void {
    fingers.delete(event.pointerId)
    giveBack()
  }
  /** Two fingers hold two places of the drawing. */
  function pinch(id: number, at: Point): void {
    const was = fingers.get(id)
    const other = [...fingers].find(([key]) => key !== id)?.[1]
    fingers.set(id, at)
    if (was === undefined || other === undefined) return
    const apart = (point: Point): number => Math.max(1, Math.hypot(point.x - other.x, point.y - other.y))
    stage.zoom(apart(at) / apart(was), other)
  }
  function onWheel(event: WheelEvent): void {
    const lines = event.deltaMode === WheelEvent.DOM_DELTA_LINE ? 16 : 1
    stage.zoom(Math.exp(-event.deltaY * lines * WHEEL_PACE), placeOf(event))
  }
  function giveBack(): void {
    step({ kind: 'give-back' })
  }

  function act(what: PointerAct): void {
    switch (what.kind) {
      case 'select':
        if (what.on.kind === 'break') desk.selectBreak(what.on.key)
        else desk.select(what.on.kind === 'member' ? what.on.key : undefined)
        return
      case 'drag':
        return drag(what.key, what.to)
      case 'keep-drag':
        return keepDrag()
      case 'drop-drag':
        desk.draft.preview = undefined
        return
      case 'lay': {
        const { pixelsPerMm } = stage.view.value
        return photograph.moveBy({ x: what.across / pixelsPerMm, y: -what.down / pixelsPerMm })
      }
      case 'pan':
        return stage.pan(what.across, what.down)
      default:
        return assertNever(what)
    }
  }

  function drag(key: string, to: Point): void {
    const drawn = desk.draft.session?.document
    if (drawn === undefined || !desk.draft.canDraw) return
    const number = breakNumberOf(drawn, key)
    const breaks = breaksOf(drawn)
    const at = breaks[number]
    if (at === undefined) return
    const others = breaks.filter((_, index) =>
      desk.neighbourGives.value ? index !== number : index < number,
    )
    const { point } = snapped(toSection(stage.view.value, to), {
      gridMm: GRID_MM[unit.value],
      breaks: others,
      reachMm: FALL_IN_REACH / stage.view.value.pixelsPerMm,
      isFree,
    })
    const edit = draggedBreak(drawn, key, point, at, { neighbourGives: desk.neighbourGives.value })
    if (edit === undefined) return
    desk.draft.preview = edit
    reached = desk.drawn.value?.breaks[number]
  }
  function keepDrag(): void {
    const { preview, document } = desk.draft
    const key = desk.selectedBreak.value
    if (preview === undefined || document === undefined || key === undefined || reached === undefined) return
    const name = moveName(breakNumberOf(document, key), reached)
    desk.draft.take(name, preview)
    desk.said.value = name
  }

  return {
    pointer,
    state,
    giveBack,
    on: {
      pointerdown: onDown,
      pointermove: onMove,
      pointerup: onUp,
      pointercancel: onCancel,
      pointerleave: () => (pointer.value = undefined),
    },
    onWheel,
  }
}

/** Breaks by the members' sizes alone, mm. */
function breaksOf({
  sightEdgeHeight,
  members,
}: {
  readonly sightEdgeHeight: number
  readonly members: readonly { readonly width: number; readonly rise: number }[]
}): Point[] {
  const breaks: Point[] = [{ x: 0, y: sightEdgeHeight }]
  for (const { width, rise } of members) {
    const last = breaks.at(-1) as Point
    breaks.push({ x: last.x + width, y: last.y + rise })
  }
  return breaks
}
