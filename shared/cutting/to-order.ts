import { printLength } from '@shared/units'
import type { LengthUnit } from '@shared/units'
import type { CutInstance, LengthsToOrder, OrderableLength } from './cut-instance'
import type { Pattern } from './pattern'
import { solve } from './solve'
import type { StepCounter } from './step-counter'
import { stockModelFrom, takenBy } from './stock-model'
import type { StockModel } from './stock-model'

export interface ToOrder {
  readonly toOrder: readonly LengthsToOrder[]
  readonly warnings: readonly string[]
}

export interface ToOrderRequest {
  readonly instance: CutInstance
  readonly model: StockModel
  readonly patterns: readonly Pattern[]
  readonly counter: StepCounter
  readonly unit: LengthUnit
}

/** A share of a whole number that lies above another whole number by less is binary rounding, not another length. */
const ROUNDING = 1e-9

/**
 * Lengths to order: those that the plan opens; with them, where any are ordered at all, set-up pieces and the first-off (each `firstOff`
 * long and square), first on what the ordered lengths have left, then on further ones; then the reserve, of the commonest size.
 */
export function toOrderOf(request: ToOrderRequest): ToOrder {
  const { instance, model, patterns } = request
  const counts = instance.lengths.map(() => 0)
  for (const { stock } of patterns) {
    const { source, members } = model.stocks[stock]!
    if (source === 'order') counts[members[0]!]! += 1
  }
  if (counts.every((count) => count === 0) || instance.order === undefined) {
    return { toOrder: listed(instance.lengths, counts), warnings: [] }
  }
  const warnings = [...addTestPieces(request, counts), ...addReserve(instance, counts)]
  return { toOrder: listed(instance.lengths, counts), warnings }
}

/** Adds the lengths that set-up pieces and first-off need beyond what is left over. */
function addTestPieces(request: ToOrderRequest, counts: number[]): string[] {
  const { instance, counter, unit } = request
  const { setupPieces = 0, firstOff = 0 } = instance.order ?? {}
  const missing = firstOff > 0 ? Math.max(0, setupPieces + 1 - testPiecesOnOffcuts(request, firstOff)) : 0
  if (missing === 0) return []
  const lengths = instance.lengths.map((each, index) =>
    each.count === undefined ? each : { ...each, count: each.count - counts[index]! },
  )
  const demand = [{ id: 'test piece', length: firstOff, count: missing, mitre: 0 }]
  const model = stockModelFrom({ demand, lengths, rack: [], saw: instance.saw })
  const solved = solve(model, { ...counter, steps: 0, hasEnded: false })
  if (solved.kind === 'unsolved') {
    const piece = printLength(firstOff, { unit })
    return [
      `${missing} of the set-up pieces and first-off of ${piece} cannot be had from the lengths that can be ordered; they are not counted.`,
    ]
  }
  for (const { stock } of solved.patterns) counts[model.stocks[stock]!.members[0]!]! += 1
  return []
}

/** Square pieces have the least gap of all: on a piece that carries Σ span, e more fit while Σ span + e · span − gap ≤ usable. */
function testPiecesOnOffcuts({ instance, model, patterns }: ToOrderRequest, firstOff: number): number {
  const { body, gap } = takenBy({ length: firstOff, mitre: 0 }, instance.saw)
  return patterns.reduce((sum, { stock, counts }) => {
    const { source, usable } = model.stocks[stock]!
    if (source === 'rack') return sum
    const spans = counts.reduce((total, count, kind) => total + count * model.kinds[kind]!.span, 0)
    return sum + Math.max(0, Math.floor((usable + gap - spans) / (body + gap)))
  }, 0)
}

/** ⌈share × lengths⌉ more of the commonest size, the longest among equals; of the next where it runs out. */
function addReserve({ lengths, order }: CutInstance, counts: number[]): string[] {
  const ordered = counts.reduce((sum, count) => sum + count, 0)
  const share = (order?.reserve ?? 0) * ordered
  let wanted = Math.max(0, Math.ceil(share - ROUNDING * Math.max(1, share)))
  const commonest = lengths
    .map((each, index) => ({ index, count: counts[index]!, length: each.length }))
    .sort((a, b) => b.count - a.count || b.length - a.length)
  for (const { index } of commonest) {
    const most = (lengths[index]!.count ?? Number.POSITIVE_INFINITY) - counts[index]!
    const added = Math.min(wanted, most)
    counts[index]! += added
    wanted -= added
  }
  return wanted === 0 ? [] : [`The reserve is ${wanted} short: no more lengths than these can be ordered.`]
}

/** One entry for each size, in the order of the lengths given. */
function listed(lengths: readonly OrderableLength[], counts: readonly number[]): LengthsToOrder[] {
  const sizes = new Map<number, number>()
  lengths.forEach(({ length }, index) => sizes.set(length, (sizes.get(length) ?? 0) + counts[index]!))
  return [...sizes].filter(([, count]) => count > 0).map(([length, count]) => ({ length, count }))
}
