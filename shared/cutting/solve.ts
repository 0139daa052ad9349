import { attainableTotalsOf } from './attainable'
import { dive } from './dive'
import { boundFrom, dualPricesFrom, materialPricesOf } from './dual-prices'
import type { DualPrices } from './dual-prices'
import { greedyPlanOf } from './greedy'
import { leastWeightOf, lightestWithin } from './lightest'
import type { LightestSearch } from './lightest'
import { valueOf, weightOf } from './pattern'
import type { Pattern } from './pattern'
import { pricedOut } from './price-out'
import type { RelaxedPlan } from './price-out'
import type { StepCounter } from './step-counter'
import type { StockModel } from './stock-model'
import { worthsFrom } from './worths'
import type { Worths } from './worths'

export type Solved =
  | {
      readonly kind: 'solved'
      readonly patterns: readonly Pattern[]
      readonly isProven: boolean
      /** Lower bound of the first objective, in the model's units of value. */
      readonly valueBound: number
      readonly search: LightestSearch
    }
  /** Proved that no plan exists, or, not proved, none was found. */
  | { readonly kind: 'unsolved'; readonly isProven: boolean }

/** Up to so many rails everything is searched through; above, plans are rounded from relaxed ones first. */
const SEARCHED_THROUGH = 24
/** Kinds and scarce stocks in all up to which the relaxed plan is worked out. */
const RELAXED_ROWS = 250

/** The best plan that the steps allow for a model with at least one rail, and what is proved of it. */
export function solve(model: StockModel, counter: StepCounter): Solved {
  const demand = model.kinds.map((kind) => kind.demand)
  const available = model.stocks.map(({ limit }) => limit)
  const weights = model.stocks.map(({ weight }) => weight)
  const greedy = greedyPlanOf(model, demand, available)
  const relaxed = relaxedOf(model, weights, counter)
  const most = greedy === undefined ? heaviestOf(model) : weightOf(model, greedy)
  const search: LightestSearch = {
    model,
    duals: dualsOf(model, weights, relaxed),
    worths: [materialPricesOf(model, weights), relaxed?.prices ?? []].flatMap((prices) =>
      worthsOf(model, prices),
    ),
    attainable: attainableTotalsOf(weights, most),
    refuted: new Set(),
    counter,
  }
  const bound = leastWeightOf(search, { demand, available })
  let best: readonly Pattern[] | undefined = greedy
  const isOpen = () => best === undefined || weightOf(model, best) > bound
  if (isOpen() && model.railCount > SEARCHED_THROUGH && relaxed !== undefined) {
    best = lighter(model, best, dive({ search, costs: weights, relaxed, demand, available, target: bound }))
  }
  if (!isOpen()) return solvedFrom(search, { best, provedBound: bound })
  const to = best === undefined ? most : weightOf(model, best) - 1
  const { patterns, provedBound } = lightestWithin(search, { demand, available, from: bound, to })
  return solvedFrom(search, { best: patterns ?? best, provedBound })
}

interface Searched {
  readonly best: readonly Pattern[] | undefined
  /** No plan weighs less. */
  readonly provedBound: number
}

function solvedFrom(search: LightestSearch, { best, provedBound }: Searched): Solved {
  const { model, counter } = search
  if (best === undefined) return { kind: 'unsolved', isProven: !counter.hasEnded }
  const value = valueOf(model, best)
  const meetsWeight = weightOf(model, best) <= provedBound
  if (meetsWeight && model.countsPieces) {
    return { kind: 'solved', patterns: best, isProven: true, valueBound: value, search }
  }
  const valueBound = meetsWeight ? value : Math.min(value, valueBoundOf(model, counter))
  const isProven = valueBound === value && best.length === piecesBoundOf(model)
  return { kind: 'solved', patterns: best, isProven, valueBound, search }
}

/** Lower bound of the first objective alone. */
function valueBoundOf(model: StockModel, counter: StepCounter): number {
  return rootBoundOf(
    model,
    model.stocks.map(({ value }) => value),
    counter,
  )
}

/** Lower bound of the number of pieces, whatever they cost. */
const piecesBoundOf = (model: StockModel): number => {
  const ones = model.stocks.map(() => 1)
  const demand = model.kinds.map((kind) => kind.demand)
  return boundFrom(
    dualPricesFrom(model, ones, materialPricesOf(model, ones)),
    demand,
    model.stocks.map(({ limit }) => limit),
  )
}

function rootBoundOf(model: StockModel, costs: readonly number[], counter: StepCounter): number {
  const demand = model.kinds.map((kind) => kind.demand)
  const available = model.stocks.map(({ limit }) => limit)
  const relaxed = relaxedOf(model, costs, counter)
  const duals = dualsOf(model, costs, relaxed)
  return Math.max(...duals.map((dual) => boundFrom(dual, demand, available)))
}

function relaxedOf(
  model: StockModel,
  costs: readonly number[],
  counter: StepCounter,
): RelaxedPlan | undefined {
  if (model.kinds.length + model.stocks.length > RELAXED_ROWS) return undefined
  const demand = model.kinds.map((kind) => kind.demand)
  const available = model.stocks.map(({ limit }) => limit)
  // Bounds are wanted even when the steps have run out; whoever stops the work still stops this.
  const unlimited = { ...counter, stepLimit: Number.POSITIVE_INFINITY, hasEnded: false }
  return pricedOut({ model, costs, demand, available }, unlimited)
}

const dualsOf = (
  model: StockModel,
  costs: readonly number[],
  relaxed: RelaxedPlan | undefined,
): DualPrices[] =>
  [materialPricesOf(model, costs), ...(relaxed === undefined ? [] : [relaxed.prices])].map((prices) =>
    dualPricesFrom(model, costs, prices),
  )

function worthsOf(model: StockModel, prices: readonly number[]): Worths[] {
  const worths = prices.length === 0 ? undefined : worthsFrom(model, prices)
  return worths === undefined ? [] : [worths]
}

/** As heavy as any plan can be that opens no more pieces than there are rails. */
const heaviestOf = ({ stocks, railCount }: StockModel): number =>
  Math.max(0, ...stocks.map(({ weight }) => weight)) * railCount

function lighter(
  model: StockModel,
  one: readonly Pattern[] | undefined,
  other: readonly Pattern[] | undefined,
): readonly Pattern[] | undefined {
  if (one === undefined || other === undefined) return one ?? other
  return weightOf(model, other) < weightOf(model, one) ? other : one
}
