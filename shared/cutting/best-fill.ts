/** The most valuable filling of one capacity by kinds of which there are so many: a bounded knapsack, by depth-first search. */

export interface FillRequest {
  readonly spans: readonly number[]
  /** Not negative. */
  readonly values: readonly number[]
  readonly counts: readonly number[]
  readonly capacity: number
  readonly effort: FillEffort
}

export interface FillEffort {
  /** How far below the best the answer may lie, as a share of it. */
  readonly slack: number
  /** Branches tried; past them the answer is what was found and the upper bound the fractional one. */
  readonly branches: number
}

export interface Fill {
  readonly value: number
  /** No filling is worth more than this. */
  readonly upper: number
  readonly counts: readonly number[]
}

/** To find a good filling quickly, and to bound the best one closely. */
export const ROUGHLY: FillEffort = { slack: 1e-4, branches: 2000 }
export const CLOSELY: FillEffort = { slack: 1e-7, branches: 20_000 }

interface Search extends FillRequest {
  readonly order: readonly number[]
  readonly taken: number[]
  best: number
  bestCounts: readonly number[]
  nodes: number
}

/** Best filling: kinds in the order of value per span, branches cut where even a fractional rest cannot beat the best. */
export function bestFillOf(request: FillRequest): Fill {
  const { spans, values, counts, capacity } = request
  const order = spans
    .map((_, kind) => kind)
    .filter((kind) => values[kind]! > 0 && counts[kind]! > 0 && spans[kind]! <= capacity)
    .sort((a, b) => values[b]! / spans[b]! - values[a]! / spans[a]!)
  const none = spans.map(() => 0)
  const search: Search = { ...request, order, taken: [...none], best: 0, bestCounts: none, nodes: 0 }
  branch(search, 0, capacity, 0)
  const isWhole = search.nodes <= request.effort.branches
  const upper = isWhole ? search.best * (1 + request.effort.slack) : fractionalFill(search, 0, capacity)
  return { value: search.best, upper, counts: search.bestCounts }
}

function branch(search: Search, place: number, room: number, value: number): void {
  if (value > search.best) {
    search.best = value
    search.bestCounts = [...search.taken]
  }
  search.nodes += 1
  const kind = search.order[place]
  if (kind === undefined || search.nodes > search.effort.branches) return
  if (value + fractionalFill(search, place, room) <= search.best * (1 + search.effort.slack)) return
  const span = search.spans[kind]!
  const most = Math.min(search.counts[kind]!, Math.floor(room / span))
  for (let count = most; count >= 0; count -= 1) {
    search.taken[kind] = count
    branch(search, place + 1, room - count * span, value + count * search.values[kind]!)
  }
  search.taken[kind] = 0
}

/** Value if rails could be cut anywhere: the best kinds in whole, the next in part. Never less than any filling is worth. */
function fractionalFill({ order, spans, values, counts }: Search, place: number, room: number): number {
  let value = 0
  let left = room
  for (let index = place; index < order.length && left > 0; index += 1) {
    const kind = order[index]!
    const span = spans[kind]!
    const whole = counts[kind]! * span
    value += whole <= left ? counts[kind]! * values[kind]! : (left / span) * values[kind]!
    left -= whole
  }
  return value
}
