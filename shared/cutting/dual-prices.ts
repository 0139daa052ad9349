import { CLOSELY, bestFillOf } from './best-fill'
import type { Fill, FillRequest } from './best-fill'
import type { StockModel } from './stock-model'

/**
 * What each rail is worth and what each scarce piece is worth, in whole numbers, so that no way of cutting a piece holds rails worth more
 * than the piece's cost and rent. Whatever is cut, the rails' worth less the rents is then a lower bound of its cost: nothing in the proof
 * rests on rounding.
 */
export interface DualPrices {
  /** Whole units of worth in one unit of cost. */
  readonly scale: number
  /** Worth of one rail of each kind. */
  readonly worth: readonly number[]
  /** Rent of one piece of each stock; 0 where there is no limit. */
  readonly rents: readonly number[]
}

/** Sums of worth stay below this, so that they are exact. */
const GREATEST_WORTH = 2 ** 50

/** Lower bound of the cost of cutting so many rails from so many pieces. */
export function boundFrom(dual: DualPrices, demand: readonly number[], available: readonly number[]): number {
  return Math.max(0, Math.ceil(worthOf(dual, demand, available) / dual.scale))
}

/** Worth of the rails less the rents of the scarce pieces, in the scale's units. */
export function worthOf(
  { worth, rents }: DualPrices,
  demand: readonly number[],
  available: readonly number[],
): number {
  let sum = 0
  for (let kind = 0; kind < worth.length; kind += 1) sum += demand[kind]! * worth[kind]!
  for (let stock = 0; stock < rents.length; stock += 1) sum -= available[stock]! * rents[stock]!
  return sum
}

/** The most valuable filling of one piece of a stock: for each least gap on it, the kinds of that gap or more. */
export function bestFillOn(
  model: StockModel,
  stock: number,
  { values, counts, effort }: Pick<FillRequest, 'values' | 'counts' | 'effort'>,
): Fill {
  const { kinds, stocks } = model
  const { usable } = stocks[stock]!
  const spans = kinds.map(({ span }) => span)
  const fills = [...new Set(kinds.map(({ gap }) => gap))].map((leastGap) =>
    bestFillOf({
      spans,
      values,
      counts: counts.map((count, kind) => (kinds[kind]!.gap >= leastGap ? count : 0)),
      capacity: usable + leastGap,
      effort,
    }),
  )
  const best = fills.reduce((one, other) => (other.value > one.value ? other : one))
  return { ...best, upper: Math.max(...fills.map(({ upper }) => upper)) }
}

/**
 * Makes prices, found in floating point, hold for certain: rounds them down to whole numbers, lowers them all until every filling of a
 * piece without limit is worth no more than it costs, and charges scarce pieces what is left over as rent.
 */
export function dualPricesFrom(
  model: StockModel,
  costs: readonly number[],
  prices: readonly number[],
): DualPrices {
  const { kinds, stocks, railCount } = model
  const demand = kinds.map(({ demand: count }) => count)
  const total = demand.reduce((sum, count, kind) => sum + count * prices[kind]!, 0)
  const scale = Math.max(
    1,
    Math.floor(GREATEST_WORTH / 16 / Math.max(1, total, railCount * Math.max(0, ...costs))),
  )
  const worth = prices.map((price) => Math.max(0, Math.floor(price * scale)))
  const fullest = stocks.map(
    (_, stock) =>
      Math.ceil(bestFillOn(model, stock, { values: worth, counts: demand, effort: CLOSELY }).upper) + 1,
  )
  const share = stocks.reduce(
    (least, { isUnlimited }, stock) =>
      isUnlimited ? Math.min(least, (costs[stock]! * scale) / fullest[stock]!) : least,
    1,
  )
  const lowered = worth.map((amount) => (share < 1 ? Math.max(0, Math.floor(amount * share) - 1) : amount))
  const rents = stocks.map(({ isUnlimited }, stock) =>
    isUnlimited ? 0 : Math.max(0, Math.ceil(fullest[stock]! * share) + 1 - costs[stock]! * scale),
  )
  const dual = { scale, worth: lowered, rents }
  return isExact(model, dual) ? dual : { scale, worth: lowered.map(() => 0), rents: rents.map(() => 0) }
}

const isExact = ({ kinds, stocks }: StockModel, { worth, rents }: DualPrices) =>
  kinds.reduce((sum, { demand }, kind) => sum + demand * worth[kind]!, 0) <= GREATEST_WORTH &&
  stocks.reduce((sum, { limit }, stock) => sum + limit * rents[stock]!, 0) <= GREATEST_WORTH

/** Prices in proportion to the length that a rail takes, as dear as the cheapest length without limit: the material bound. */
export function materialPricesOf({ kinds, stocks }: StockModel, costs: readonly number[]): number[] {
  const leastGap = Math.min(...kinds.map(({ gap }) => gap))
  const perLength = Math.min(
    ...stocks.map(({ usable, isUnlimited }, stock) =>
      isUnlimited ? costs[stock]! / (usable + leastGap) : Number.POSITIVE_INFINITY,
    ),
  )
  return kinds.map(({ span }) => (Number.isFinite(perLength) ? span * perLength : 0))
}
