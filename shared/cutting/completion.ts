import { raisedToAttainable } from './attainable'
import type { AttainableTotals } from './attainable'
import { boundFrom, worthOf } from './dual-prices'
import type { DualPrices } from './dual-prices'
import { fillingsOf } from './fillings'
import { takenByPattern } from './pattern'
import type { Pattern } from './pattern'
import type { StepCounter } from './step-counter'
import type { StockModel } from './stock-model'

/** Rails that are still wanted, and pieces that are still there. */
export interface Rest {
  readonly demand: number[]
  readonly available: number[]
}

/** What is known of a model while its rests are searched. */
export interface CompletionSearch {
  readonly model: StockModel
  /** Each a lower bound of every rest's weight. */
  readonly duals: readonly DualPrices[]
  readonly attainable: AttainableTotals | undefined
  /** For a rest: no way of cutting it weighs less than this. */
  readonly proved: Map<string | number, number>
  readonly counter: StepCounter
}

export type Completed =
  | { readonly kind: 'found'; readonly patterns: readonly Pattern[] }
  | { readonly kind: 'none' }
  | { readonly kind: 'ended' }

const RESTS_AT_MOST = 1_000_000

interface Choice {
  readonly pattern: Pattern
  /** Lower bound of the plan's weight from here on with this choice, not rounded: less is more promising. */
  readonly promise: number
}

/**
 * Looks for a way to cut a rest that weighs no more than the budget, piece by piece: the next piece always carries the longest rail that is
 * left. 'none' is a proof, 'ended' only says that the steps ran out.
 */
export function completedWithin(search: CompletionSearch, rest: Rest, budget: number): Completed {
  const patterns: Pattern[] = []
  const isFound = canComplete(search, rest, budget, patterns)
  if (isFound) return { kind: 'found', patterns: patterns.reverse() }
  return search.counter.hasEnded ? { kind: 'ended' } : { kind: 'none' }
}

/** Lower bound of a rest's weight. */
export function leastWeightOf(search: CompletionSearch, rest: Rest): number {
  let bound = 0
  for (const dual of search.duals) bound = Math.max(bound, boundFrom(dual, rest.demand, rest.available))
  return raisedToAttainable(search.attainable, bound)
}

function canComplete(search: CompletionSearch, rest: Rest, budget: number, chosen: Pattern[]): boolean {
  const first = rest.demand.findIndex((count) => count > 0)
  if (first < 0) return budget >= 0
  if (leastWeightOf(search, rest) > budget) return false
  const key = keyOf(search.model, rest)
  if ((search.proved.get(key) ?? 0) > budget) return false
  for (const { pattern } of choicesFor(search, rest, first, budget)) {
    const { weight } = search.model.stocks[pattern.stock]!
    take(search.model, rest, pattern, 1)
    const isDone = canComplete(search, rest, budget - weight, chosen)
    take(search.model, rest, pattern, -1)
    if (isDone) chosen.push(pattern)
    if (isDone || search.counter.hasEnded) return isDone
  }
  if (search.counter.hasEnded) return false
  if (search.proved.size < RESTS_AT_MOST) search.proved.set(key, budget + 1)
  return false
}

function take({ stocks }: StockModel, { demand, available }: Rest, { stock, counts }: Pattern, sign: 1 | -1) {
  for (let kind = 0; kind < counts.length; kind += 1) demand[kind]! -= sign * counts[kind]!
  if (!stocks[stock]!.isUnlimited) available[stock]! -= sign
}

/** Every piece and filling that may come next, the most promising first. */
function choicesFor(search: CompletionSearch, rest: Rest, first: number, budget: number): Choice[] {
  const { model, counter } = search
  const dual = tightestFor(search, rest)
  const restWorth = worthOf(dual, rest.demand, rest.available)
  const choices: Choice[] = []
  model.stocks.forEach(({ weight }, stock) => {
    if (rest.available[stock]! <= 0 || weight > budget) return
    const due = restWorth + dual.rents[stock]!
    const leastWorth = due - (budget - weight) * dual.scale
    const request = { model, stock, demand: rest.demand, first, worth: dual.worth, leastWorth }
    for (const { counts, worth } of fillingsOf(request, counter)) {
      if (fitsLighter(model, rest, stock, counts)) continue
      choices.push({ pattern: { stock, counts }, promise: weight + (due - worth) / dual.scale })
    }
  })
  return choices.sort((a, b) => a.promise - b.promise)
}

function tightestFor({ duals }: CompletionSearch, { demand, available }: Rest): DualPrices {
  let best = duals[0]!
  for (const dual of duals) {
    if (boundFrom(dual, demand, available) > boundFrom(best, demand, available)) best = dual
  }
  return best
}

/**
 * True where a piece that is no longer and no heavier takes the filling too. If that piece is cut elsewhere in the plan the two can
 * change places, otherwise it can take this one's: nothing is lost by leaving this choice out.
 */
function fitsLighter(
  model: StockModel,
  { available }: Rest,
  stock: number,
  counts: readonly number[],
): boolean {
  const { stocks } = model
  const taken = takenByPattern(model, counts)
  for (let other = 0; other < stock; other += 1) {
    const { usable, weight } = stocks[other]!
    if (available[other]! > 0 && usable >= taken && weight <= stocks[stock]!.weight) return true
  }
  return false
}

/** The rest as one number where that is exact, else as text. */
function keyOf({ kinds, stocks }: StockModel, { demand, available }: Rest): string | number {
  let key = 0
  let size = 1
  for (let kind = 0; kind < kinds.length; kind += 1) {
    key += demand[kind]! * size
    size *= kinds[kind]!.demand + 1
  }
  for (let stock = 0; stock < stocks.length; stock += 1) {
    const { isUnlimited, limit } = stocks[stock]!
    if (isUnlimited) continue
    key += available[stock]! * size
    size *= limit + 1
  }
  return size <= Number.MAX_SAFE_INTEGER ? key : `${demand.join()}/${available.join()}`
}
