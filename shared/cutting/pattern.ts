import type { StockModel } from './stock-model'

/** What is cut from one piece: how many of each kind, and the stock it is cut from. */
export interface Pattern {
  readonly stock: number
  readonly counts: readonly number[]
}

export const weightOf = ({ stocks }: StockModel, patterns: readonly Pattern[]): number =>
  patterns.reduce((sum, { stock }) => sum + stocks[stock]!.weight, 0)

export const valueOf = ({ stocks }: StockModel, patterns: readonly Pattern[]): number =>
  patterns.reduce((sum, { stock }) => sum + stocks[stock]!.value, 0)

/** What the rails take between the trims, nm: Σ body + Σ gap − least gap. */
export function takenByPattern({ kinds }: StockModel, counts: readonly number[]): number {
  let taken = 0
  let leastGap = Number.POSITIVE_INFINITY
  counts.forEach((count, kind) => {
    if (count === 0) return
    taken += count * kinds[kind]!.span
    leastGap = Math.min(leastGap, kinds[kind]!.gap)
  })
  return taken === 0 ? 0 : taken - leastGap
}
