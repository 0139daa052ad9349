import { ROUGHLY } from './best-fill'
import { bestFillOn } from './dual-prices'
import type { Pattern } from './pattern'
import { improve, rowPricesOf, simplexFrom } from './simplex'
import type { Simplex, SparseColumn } from './simplex'
import { hasEndedAfterStep } from './step-counter'
import type { StepCounter } from './step-counter'
import type { StockModel } from './stock-model'

/** The relaxed plan, in which a pattern may be cut a fraction of a time. Floating point: a guide, not a proof. */
export interface RelaxedPlan {
  /** Worth of one rail of each kind, in units of cost. */
  readonly prices: readonly number[]
  readonly cuts: readonly { readonly pattern: Pattern; readonly times: number }[]
  /** Patterns met on the way, to start the next from. */
  readonly patterns: readonly Pattern[]
}

export interface PriceOutRequest {
  readonly model: StockModel
  readonly costs: readonly number[]
  readonly demand: readonly number[]
  readonly available: readonly number[]
  readonly patterns?: readonly Pattern[]
}

/** Costs are scaled so that the dearest is 1: a rail that no pattern serves costs this much. */
const UNSERVED = 1000
const GAIN_NOISE = 1e-7
const ROUNDS_AT_MOST = 2000

interface Master extends PriceOutRequest {
  readonly dearest: number
  /** Kinds still wanted, each a row; then one row for each scarce stock. */
  readonly rowOfKind: readonly number[]
  readonly rowOfStock: readonly number[]
  readonly simplex: Simplex
  readonly patterns: Pattern[]
  readonly patternOfColumn: (Pattern | undefined)[]
}

/** Column generation: cuts what the prices of the moment favour most, until no pattern is worth more than its piece. */
export function pricedOut(request: PriceOutRequest, counter: StepCounter): RelaxedPlan {
  const master = masterFrom(request)
  for (let round = 0; round < ROUNDS_AT_MOST; round += 1) {
    improve(master.simplex, Number.MAX_SAFE_INTEGER)
    const added = addBestPatterns(master)
    if (added === 0 || hasEndedAfterStep(counter)) break
  }
  return relaxedPlanOf(master)
}

function masterFrom(request: PriceOutRequest): Master {
  const { model, costs, demand, available } = request
  const wanted = demand.flatMap((count, kind) => (count > 0 ? [kind] : []))
  const scarce = model.stocks.flatMap(({ isUnlimited }, stock) => (isUnlimited ? [] : [stock]))
  const rowOfKind = demand.map((_, kind) => wanted.indexOf(kind))
  const rowOfStock = model.stocks.map((_, stock) =>
    scarce.includes(stock) ? wanted.length + scarce.indexOf(stock) : -1,
  )
  const unit = (row: number, sign: number, cost: number): SparseColumn => ({
    rows: [row],
    coefficients: [sign],
    cost,
  })
  const starts = [
    ...wanted.map((_, row) => unit(row, 1, UNSERVED)),
    ...scarce.map((_, index) => unit(wanted.length + index, 1, 0)),
  ]
  const amounts = [...wanted.map((kind) => demand[kind]!), ...scarce.map((stock) => available[stock]!)]
  const simplex = simplexFrom(amounts, starts)
  wanted.forEach((_, row) => simplex.columns.push(unit(row, -1, 0)))
  const master: Master = {
    ...request,
    dearest: Math.max(1, ...costs),
    rowOfKind,
    rowOfStock,
    simplex,
    patterns: [],
    patternOfColumn: simplex.columns.map(() => undefined),
  }
  for (const pattern of request.patterns ?? []) addPattern(master, pattern)
  return master
}

/** A pattern of an earlier round may hold more than is wanted now: only what is wanted counts. */
function addPattern(master: Master, pattern: Pattern): void {
  const { rowOfKind, rowOfStock, demand, available, simplex } = master
  if (available[pattern.stock]! <= 0) return
  const counts = pattern.counts.map((count, kind) => Math.min(count, demand[kind]!))
  const kinds = counts.flatMap((count, kind) => (count > 0 ? [kind] : []))
  if (kinds.length === 0) return
  const stockRow = rowOfStock[pattern.stock]!
  const scarce = stockRow < 0 ? [] : [stockRow]
  simplex.columns.push({
    rows: [...kinds.map((kind) => rowOfKind[kind]!), ...scarce],
    coefficients: [...kinds.map((kind) => counts[kind]!), ...scarce.map(() => 1)],
    cost: master.costs[pattern.stock]! / master.dearest,
  })
  master.patternOfColumn.push({ stock: pattern.stock, counts })
  master.patterns.push(pattern)
}

function addBestPatterns(master: Master): number {
  const { model, costs, demand, available, dearest, rowOfKind, rowOfStock } = master
  const rowPrices = rowPricesOf(master.simplex)
  const values = rowOfKind.map((row) => (row < 0 ? 0 : Math.max(0, rowPrices[row]!)))
  let added = 0
  model.stocks.forEach((_, stock) => {
    if (available[stock]! <= 0) return
    const row = rowOfStock[stock]!
    const asked = costs[stock]! / dearest - (row < 0 ? 0 : rowPrices[row]!)
    const fill = bestFillOn(model, stock, { values, counts: demand, effort: ROUGHLY })
    if (fill.value <= asked + GAIN_NOISE) return
    addPattern(master, { stock, counts: fill.counts })
    added += 1
  })
  return added
}

function relaxedPlanOf(master: Master): RelaxedPlan {
  const { simplex, rowOfKind, dearest, patternOfColumn, patterns } = master
  const rowPrices = rowPricesOf(simplex)
  const prices = rowOfKind.map((row) => (row < 0 ? 0 : Math.max(0, rowPrices[row]!) * dearest))
  const cuts = simplex.basis.flatMap((column, row) => {
    const pattern = patternOfColumn[column]
    const times = simplex.amounts[row]!
    return pattern === undefined || times <= GAIN_NOISE ? [] : [{ pattern, times }]
  })
  return { prices, cuts, patterns }
}
