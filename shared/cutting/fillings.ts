import { hasEndedAfterStep } from './step-counter'
import type { StepCounter } from './step-counter'
import type { StockModel } from './stock-model'

export interface FillingsRequest {
  readonly model: StockModel
  readonly stock: number
  readonly demand: readonly number[]
  /** The kind that must be on the piece: the first with demand. */
  readonly first: number
  /** Worth of one rail of each kind, and the least that the filling must be worth in all. */
  readonly worth: readonly number[]
  readonly leastWorth: number
}

export interface Filling {
  readonly counts: readonly number[]
  readonly worth: number
  /** Room that is left, nm. */
  readonly room: number
}

interface Walk extends FillingsRequest {
  readonly kinds: readonly number[]
  /** For the kinds from each place on: their span in all, and the greatest worth per span. */
  readonly spanFrom: readonly number[]
  readonly densityFrom: readonly number[]
  readonly counts: number[]
  readonly found: Filling[]
  readonly counter: StepCounter
}

interface Step {
  readonly place: number
  readonly room: number
  readonly worth: number
  readonly leastGap: number
  /** The room must end below this, nm: else a rail left out would have fitted, or a larger one in place of a smaller. */
  readonly roomBelow: number
  /** Span of the last kind of which a rail was left out. */
  readonly skippedSpan: number | undefined
}

/**
 * Every filling of a piece that may stand in a best plan: none that another rail would still fit on, and none in which a rail can be
 * exchanged for a larger one that is left over; either change would leave the rest of the plan no harder. The exchange is only used where
 * all gaps are equal: otherwise a larger span may bring a smaller gap.
 */
export function fillingsOf(request: FillingsRequest, counter: StepCounter): Filling[] {
  const { model, demand, first, stock, worth } = request
  const kinds = demand.flatMap((count, kind) => (kind >= first && count > 0 ? [kind] : []))
  const spanFrom = [...kinds.map(() => 0), 0]
  const densityFrom = [...spanFrom]
  for (let place = kinds.length - 1; place >= 0; place -= 1) {
    const kind = kinds[place]!
    const { span } = model.kinds[kind]!
    spanFrom[place] = spanFrom[place + 1]! + demand[kind]! * span
    densityFrom[place] = Math.max(densityFrom[place + 1]!, worth[kind]! / span)
  }
  const counts = demand.map(() => 0)
  const walk: Walk = { ...request, kinds, spanFrom, densityFrom, counts, found: [], counter }
  const { usable } = model.stocks[stock]!
  const { gap } = model.kinds[first]!
  const start = { room: usable + gap, worth: 0, leastGap: gap, roomBelow: Number.POSITIVE_INFINITY }
  visit(walk, { ...start, place: 0, skippedSpan: undefined })
  return walk.found
}

function visit(walk: Walk, step: Step): void {
  if (hasEndedAfterStep(walk.counter)) return
  const { place, room, worth } = step
  if (worth + room * walk.densityFrom[place]! + 1 < walk.leastWorth) return
  if (walk.model.hasOneGap && room - walk.spanFrom[place]! >= step.roomBelow) return
  const kind = walk.kinds[place]
  if (kind === undefined) {
    enter(walk, step)
    return
  }
  const least = kind === walk.first ? 1 : 0
  for (let count = mostOf(walk, step, kind); count >= least; count -= 1) {
    walk.counts[kind] = count
    visit(walk, stepWith(walk, step, kind, count))
  }
  walk.counts[kind] = 0
}

function mostOf({ model, demand }: Walk, { room, leastGap }: Step, kind: number): number {
  const { span, gap } = model.kinds[kind]!
  return Math.max(0, Math.min(demand[kind]!, Math.floor((room - Math.max(0, leastGap - gap)) / span)))
}

function stepWith({ model, demand, worth }: Walk, step: Step, kind: number, count: number): Step {
  const { span, gap } = model.kinds[kind]!
  const narrowed = count > 0 ? Math.max(0, step.leastGap - gap) : 0
  const isLeftOver = count < demand[kind]!
  const roomBelow = Math.min(
    step.roomBelow,
    isLeftOver ? span : Number.POSITIVE_INFINITY,
    count > 0 && step.skippedSpan !== undefined ? step.skippedSpan - span : Number.POSITIVE_INFINITY,
  )
  return {
    place: step.place + 1,
    room: step.room - count * span - narrowed,
    worth: step.worth + count * worth[kind]!,
    leastGap: step.leastGap - narrowed,
    roomBelow,
    skippedSpan: isLeftOver ? span : step.skippedSpan,
  }
}

function enter(walk: Walk, { room, worth, leastGap, roomBelow }: Step): void {
  const { model, kinds, demand, counts } = walk
  const isDominated = model.hasOneGap
    ? room >= roomBelow
    : kinds.some((kind) => {
        const { span, gap } = model.kinds[kind]!
        return counts[kind]! < demand[kind]! && span + Math.max(0, leastGap - gap) <= room
      })
  if (!isDominated) walk.found.push({ counts: [...counts], worth, room })
}
