import { CLOSELY } from './best-fill'
import type { FillEffort } from './best-fill'
import { bestFillOn } from './dual-prices'
import type { StockModel } from './stock-model'

/**
 * A worth for each kind of rail, in whole numbers, and what at most one piece of each stock can carry of it. Rails can only be cut from a
 * set of pieces if they are worth no more than the pieces carry: with any worths at all that is a certain test.
 */
export interface Worths {
  readonly worth: readonly number[]
  readonly fullest: readonly number[]
}

/** All rails together: small enough that the sum over any set of pieces is exact. */
const TOTAL_WORTH = 2 ** 38

/** Rounds floating prices to worths; undefined where they are all nothing. */
export function worthsFrom(
  model: StockModel,
  prices: readonly number[],
  effort: FillEffort = CLOSELY,
): Worths | undefined {
  const demand = model.kinds.map((kind) => kind.demand)
  const total = demand.reduce((sum, count, kind) => sum + count * prices[kind]!, 0)
  if (!(total > 0)) return undefined
  const worth = prices.map((price) => Math.max(0, Math.floor((price / total) * TOTAL_WORTH)))
  const fullest = model.stocks.map(
    (_, stock) => Math.floor(bestFillOn(model, stock, { values: worth, counts: demand, effort }).upper) + 1,
  )
  return { worth, fullest }
}

/** How much more the pieces carry than the rails are worth; below 0 the rails cannot be cut from them. */
export function slackOf(
  { worth, fullest }: Worths,
  demand: readonly number[],
  pieces: readonly number[],
): number {
  let slack = 0
  for (let stock = 0; stock < fullest.length; stock += 1) slack += pieces[stock]! * fullest[stock]!
  for (let kind = 0; kind < worth.length; kind += 1) slack -= demand[kind]! * worth[kind]!
  return slack
}
