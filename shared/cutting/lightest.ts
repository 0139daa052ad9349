import { raisedToAttainable } from './attainable'
import type { AttainableTotals } from './attainable'
import { boundFrom } from './dual-prices'
import type { DualPrices } from './dual-prices'
import { packedInto } from './packing'
import type { PackingSearch } from './packing'
import type { Pattern } from './pattern'
import { pieceSetsOf } from './piece-sets'

/** What is known of a model while the lightest plan is sought. */
export interface LightestSearch extends PackingSearch {
  /** Each a lower bound of every rest's weight. */
  readonly duals: readonly DualPrices[]
  readonly attainable: AttainableTotals | undefined
}

export interface LightestRequest {
  readonly demand: readonly number[]
  readonly available: readonly number[]
  /** No plan is known to be lighter than `from`; none heavier than `to` is wanted. */
  readonly from: number
  readonly to: number
}

export interface Lightest {
  /** The lightest plan within the limits, if one was found. */
  readonly patterns: readonly Pattern[] | undefined
  /** No plan weighs less than this: the found plan's own weight, or past `to` where there is none. */
  readonly provedBound: number
}

/** Lower bound of the weight of cutting so many rails from so many pieces. */
export function leastWeightOf(
  { duals, attainable }: LightestSearch,
  { demand, available }: Pick<LightestRequest, 'demand' | 'available'>,
): number {
  const bound = duals.reduce((most, dual) => Math.max(most, boundFrom(dual, demand, available)), 0)
  return raisedToAttainable(attainable, bound)
}

/** Tries sets of pieces in the order of their weight until one takes all rails, or the steps end. */
export function lightestWithin(search: LightestSearch, request: LightestRequest): Lightest {
  const { to } = request
  let from = Math.max(request.from, leastWeightOf(search, request))
  while (from <= to) {
    const part = listedPart(search, request, from)
    if (part === undefined) return { patterns: undefined, provedBound: from }
    for (const { pieces, weight } of part.sets) {
      const packed = packedInto(search, request.demand, pieces)
      if (packed.kind === 'packed') return { patterns: packed.patterns, provedBound: weight }
      if (packed.kind === 'ended') return { patterns: undefined, provedBound: weight }
    }
    from = part.upTo + 1
  }
  return { patterns: undefined, provedBound: from }
}

/** Sets from a weight up to as far as they can be listed; undefined where the steps end or too many weigh the same. */
function listedPart(search: LightestSearch, { demand, available, to }: LightestRequest, from: number) {
  const { model, worths, counter } = search
  for (let upTo = to; upTo >= from; upTo = from + Math.floor((upTo - from) / 4)) {
    const sets = pieceSetsOf({ model, demand, available, worths, from, to: upTo }, counter)
    if (sets !== undefined) return { sets, upTo }
    if (counter.hasEnded || upTo === from) return undefined
  }
  return undefined
}
