/** Totals that plans can have at all: every sum of weights. A lower bound may be raised to the next of them. */
export interface AttainableTotals {
  /** Ascending, from 0, up to the limit they were made for. */
  readonly totals: readonly number[]
}

const TOTALS_AT_MOST = 5000

/** All sums of weights up to a limit; undefined where they are too many to be of use. */
export function attainableTotalsOf(weights: readonly number[], limit: number): AttainableTotals | undefined {
  const steps = [...new Set(weights)].filter((weight) => weight > 0)
  const seen = new Set([0])
  for (const total of seen) {
    for (const step of steps) if (total + step <= limit) seen.add(total + step)
    if (seen.size > TOTALS_AT_MOST) return undefined
  }
  return { totals: [...seen].sort((a, b) => a - b) }
}

/** The least total that is not below a bound; infinity past the limit. The bound itself where the totals are not known. */
export function raisedToAttainable(attainable: AttainableTotals | undefined, bound: number): number {
  if (attainable === undefined) return bound
  const { totals } = attainable
  let [low, high] = [0, totals.length]
  while (low < high) {
    const middle = (low + high) >> 1
    if (totals[middle]! < bound) low = middle + 1
    else high = middle
  }
  return totals[low] ?? Number.POSITIVE_INFINITY
}
