import { greedyPlanOf } from './greedy'
import { lightestWithin } from './lightest'
import type { LightestSearch } from './lightest'
import { weightOf } from './pattern'
import type { Pattern } from './pattern'
import { pricedOut } from './price-out'
import type { RelaxedPlan } from './price-out'
import { withAllowance } from './step-counter'
import type { StockModel } from './stock-model'

interface Rest {
  readonly demand: number[]
  readonly available: number[]
}

export interface DiveRequest {
  readonly search: LightestSearch
  readonly costs: readonly number[]
  /** Relaxed plan of the whole. */
  readonly relaxed: RelaxedPlan
  readonly demand: readonly number[]
  readonly available: readonly number[]
  /** Reached weight at which the dive may stop. */
  readonly target: number
}

/** A rest of no more rails than this is worth searching through. */
const SEARCHED_RAILS = 40
const STEPS_PER_SEARCH = 20_000
/** Times a pattern is cut in the relaxed plan count as whole within this. */
const WHOLE_NOISE = 1e-6

/**
 * A plan by rounding: keeps what the relaxed plan cuts in whole numbers (or else its most certain pattern, once), relaxes the rest again,
 * and so on; small rests are searched for what would still meet the target. The best plan met on the way down; undefined if none.
 */
export function dive(request: DiveRequest): Pattern[] | undefined {
  const { search, costs, target } = request
  const { model, counter } = search
  const rest: Rest = { demand: [...request.demand], available: [...request.available] }
  const fixed: Pattern[] = []
  let relaxed = request.relaxed
  let best: Pattern[] | undefined
  const keep = (tail: readonly Pattern[]) => {
    const plan = [...fixed, ...tail]
    if (best === undefined || weightOf(model, plan) < weightOf(model, best)) best = plan
  }
  while (rest.demand.some((count) => count > 0)) {
    const greedy = greedyPlanOf(model, rest.demand, rest.available)
    if (greedy !== undefined) keep(greedy)
    const tail = searchedTail(search, rest, target - weightOf(model, fixed))
    if (tail !== undefined) keep(tail)
    if (best !== undefined && weightOf(model, best) <= target) return best
    const chosen = roundedFrom(model, relaxed, rest)
    if (chosen.length === 0 || counter.hasEnded) return best
    fixed.push(...chosen)
    relaxed = pricedOut({ model, costs, ...rest, patterns: relaxed.patterns }, counter)
  }
  keep([])
  return best
}

function searchedTail(search: LightestSearch, rest: Rest, budget: number): readonly Pattern[] | undefined {
  const rails = rest.demand.reduce((sum, count) => sum + count, 0)
  if (rails > SEARCHED_RAILS) return undefined
  return withAllowance(
    search.counter,
    STEPS_PER_SEARCH,
    (counter) => lightestWithin({ ...search, counter }, { ...rest, from: 0, to: budget }).patterns,
  )
}

/** Takes the whole parts of the relaxed plan off the rest; where there are none, the pattern that is cut nearest to once. */
function roundedFrom(model: StockModel, { cuts }: RelaxedPlan, rest: Rest): Pattern[] {
  const chosen: Pattern[] = []
  for (const { pattern, times } of cuts) {
    const whole = Math.floor(times + WHOLE_NOISE)
    for (let copy = 0; copy < whole && canTake(rest, pattern); copy += 1)
      chosen.push(taken(model, rest, pattern))
  }
  if (chosen.length > 0) return chosen
  const byTimes = [...cuts].sort((a, b) => b.times - a.times)
  const likeliest = byTimes.find(({ pattern }) => canTake(rest, pattern))
  return likeliest === undefined ? [] : [taken(model, rest, likeliest.pattern)]
}

const canTake = ({ demand, available }: Rest, { stock, counts }: Pattern): boolean =>
  available[stock]! > 0 && counts.every((count, kind) => count <= demand[kind]!)

function taken({ stocks }: StockModel, rest: Rest, pattern: Pattern): Pattern {
  pattern.counts.forEach((count, kind) => (rest.demand[kind]! -= count))
  if (!stocks[pattern.stock]!.isUnlimited) rest.available[pattern.stock]! -= 1
  return pattern
}
