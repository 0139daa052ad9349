import { describe, expect, it } from 'vitest'
import { POINTER_IDLE, pointerStep } from '@/board/pointer-tool'
import type { Hit, PointerAct, PointerEventIn, PointerState } from '@/board/pointer-tool'

const at = (x: number, y: number) => ({ x, y })
const BREAK: Hit = { kind: 'break', key: 'c', place: at(102, 50) }
const MEMBER: Hit = { kind: 'member', key: 'b' }
const NOTHING: Hit = { kind: 'nothing' }
const press = (on: Hit, isPan = false): PointerEventIn => ({ kind: 'press', at: at(100, 50), on, isPan })
const move = (x: number, y: number): PointerEventIn => ({ kind: 'move', at: at(x, y) })
const RELEASE: PointerEventIn = { kind: 'release' }
const GIVE_BACK: PointerEventIn = { kind: 'give-back' }

function through(...events: readonly PointerEventIn[]) {
  let state: PointerState = POINTER_IDLE
  const acts: PointerAct[] = []
  for (const event of events) {
    const next = pointerStep(state, event)
    state = next.state
    acts.push(...next.acts)
  }
  return { state, acts }
}

describe('the pointer on the board', () => {
  it('selects what it presses', () => {
    expect(through(press(MEMBER), RELEASE)).toEqual({
      state: POINTER_IDLE,
      acts: [{ kind: 'select', on: MEMBER }],
    })
  })

  it('lets go of the selection by a tap beside the section, but not by moving the drawing', () => {
    expect(through(press(NOTHING), RELEASE).acts).toEqual([{ kind: 'select', on: NOTHING }])
    expect(through(press(NOTHING), move(140, 60), RELEASE).acts).toEqual([
      { kind: 'pan', across: 40, down: 10 },
    ])
  })

  it('takes a shaking hand for a tap', () => {
    expect(through(press(BREAK), move(102, 51), RELEASE).acts).toEqual([{ kind: 'select', on: BREAK }])
  })

  it('drags a break by where it was taken, and keeps it on release', () => {
    expect(through(press(BREAK), move(120, 40), move(130, 30), RELEASE)).toEqual({
      state: POINTER_IDLE,
      acts: [
        { kind: 'select', on: BREAK },
        { kind: 'drag', key: 'c', to: at(122, 40) },
        { kind: 'drag', key: 'c', to: at(132, 30) },
        { kind: 'keep-drag' },
      ],
    })
  })

  it('gives a drag back, after which moving and letting go do nothing', () => {
    const { acts, state } = through(press(BREAK), move(120, 40), GIVE_BACK, move(150, 10), RELEASE)
    expect(acts.slice(2)).toEqual([{ kind: 'drop-drag' }])
    expect(state).toEqual(POINTER_IDLE)
  })

  it('has nothing to give back before a drag', () => {
    expect(through(GIVE_BACK).acts).toEqual([])
    expect(through(press(MEMBER), GIVE_BACK).acts).toEqual([{ kind: 'select', on: MEMBER }])
  })

  it('moves the drawing with the middle button, whatever lies under it', () => {
    const { acts } = through(press(BREAK, true), move(90, 50), move(80, 55), RELEASE)
    expect(acts).toEqual([
      { kind: 'pan', across: -10, down: 0 },
      { kind: 'pan', across: -10, down: 5 },
    ])
  })

  it('moves the photograph while that is being laid', () => {
    const { acts } = through(press({ kind: 'photograph' }), move(110, 50), move(112, 47), RELEASE)
    expect(acts).toEqual([
      { kind: 'lay', across: 10, down: 0 },
      { kind: 'lay', across: 2, down: -3 },
    ])
  })

  it('does nothing while it only hovers', () => {
    expect(through(move(1, 2), move(3, 4)).acts).toEqual([])
  })
})
