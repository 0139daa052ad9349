import { assertNever } from '@shared/failure'
import type { Point } from '@shared/geometry'

/** What lies under the pointer. */
export type Hit =
  | {
      readonly kind: 'break'
      readonly key: string
      /** Where the break itself lies. */ readonly place: Point
    }
  | { readonly kind: 'member'; readonly key: string }
  | { readonly kind: 'photograph' }
  | { readonly kind: 'nothing' }

/** The pointer on the board, all places in CSS pixels of the canvas. */
export type PointerState =
  | { readonly kind: 'idle' }
  | { readonly kind: 'pressed'; readonly on: Hit; readonly from: Point }
  | { readonly kind: 'dragging'; readonly key: string; readonly grip: Point }
  | { readonly kind: 'laying'; readonly last: Point }
  | { readonly kind: 'panning'; readonly last: Point }

export type PointerEventIn =
  | { readonly kind: 'press'; readonly at: Point; readonly on: Hit; readonly isPan: boolean }
  | { readonly kind: 'move'; readonly at: Point }
  | { readonly kind: 'release' }
  | { readonly kind: 'give-back' }

/** What the board is to do about it. */
export type PointerAct =
  | { readonly kind: 'select'; readonly on: Hit }
  | { readonly kind: 'drag'; readonly key: string; readonly to: Point }
  | { readonly kind: 'keep-drag' }
  | { readonly kind: 'drop-drag' }
  | { readonly kind: 'lay'; readonly across: number; readonly down: number }
  | { readonly kind: 'pan'; readonly across: number; readonly down: number }

export interface PointerStep {
  readonly state: PointerState
  readonly acts: readonly PointerAct[]
}

export const POINTER_IDLE: PointerState = { kind: 'idle' }

/** A press that moves less than this is a tap, CSS pixels. */
const TAP_REACH = 4

/** One event through the machine: press, perhaps drag, release or give back. Nothing but this decides what a gesture means. */
export function pointerStep(state: PointerState, event: PointerEventIn): PointerStep {
  switch (event.kind) {
    case 'press':
      return pressed(event)
    case 'move':
      return moved(state, event.at)
    case 'release':
      return released(state)
    case 'give-back':
      return { state: POINTER_IDLE, acts: state.kind === 'dragging' ? [{ kind: 'drop-drag' }] : [] }
    default:
      return assertNever(event)
  }
}

function pressed({ at, on, isPan }: Extract<PointerEventIn, { kind: 'press' }>): PointerStep {
  if (isPan) return { state: { kind: 'panning', last: at }, acts: [] }
  const state: PointerState = { kind: 'pressed', on, from: at }
  return { state, acts: on.kind === 'break' || on.kind === 'member' ? [{ kind: 'select', on }] : [] }
}

function moved(state: PointerState, at: Point): PointerStep {
  switch (state.kind) {
    case 'idle':
      return { state, acts: [] }
    case 'pressed':
      return isTap(state.from, at) ? { state, acts: [] } : beginning(state, at)
    case 'dragging':
      return { state, acts: [{ kind: 'drag', key: state.key, to: lessGrip(at, state.grip) }] }
    case 'laying':
      return { state: { ...state, last: at }, acts: [{ kind: 'lay', ...between(state.last, at) }] }
    case 'panning':
      return { state: { ...state, last: at }, acts: [{ kind: 'pan', ...between(state.last, at) }] }
    default:
      return assertNever(state)
  }
}

/** A drag of a break keeps hold of it where it was taken; on anything else the whole drawing (or the photograph) moves. */
function beginning({ on, from }: Extract<PointerState, { kind: 'pressed' }>, at: Point): PointerStep {
  if (on.kind === 'break') {
    const grip = { x: from.x - on.place.x, y: from.y - on.place.y }
    return moved({ kind: 'dragging', key: on.key, grip }, at)
  }
  return moved(
    on.kind === 'photograph' ? { kind: 'laying', last: from } : { kind: 'panning', last: from },
    at,
  )
}

function released(state: PointerState): PointerStep {
  if (state.kind === 'dragging') return { state: POINTER_IDLE, acts: [{ kind: 'keep-drag' }] }
  const isTapOnNothing = state.kind === 'pressed' && state.on.kind === 'nothing'
  return { state: POINTER_IDLE, acts: isTapOnNothing ? [{ kind: 'select', on: state.on }] : [] }
}

const isTap = (from: Point, at: Point): boolean => Math.hypot(at.x - from.x, at.y - from.y) < TAP_REACH
const lessGrip = (at: Point, grip: Point): Point => ({ x: at.x - grip.x, y: at.y - grip.y })
const between = (from: Point, to: Point) => ({ across: to.x - from.x, down: to.y - from.y })
