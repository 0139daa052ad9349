import { leastWeightOf, lightestWithin } from './lightest'
import type { LightestRequest, LightestSearch } from './lightest'
import { takenByPattern, weightOf } from './pattern'
import type { Pattern } from './pattern'
import { withAllowance } from './step-counter'
import type { StockModel } from './stock-model'

/** Fillings of a piece tried for a longer offcut, and steps for each and for all of them. */
const CANDIDATES_AT_MOST = 3000
const STEPS_PER_CANDIDATE = 20_000
const STEPS_IN_ALL = 200_000

/** What is left of a piece after its last kerf, nm; none where the last rail ends too near the piece's end for a cut. */
export function offcutOf(model: StockModel, { stock, counts }: Pattern): number {
  const { length, startTrim } = model.stocks[stock]!
  const last = model.kinds.filter((_, kind) => counts[kind]! > 0).reduce((a, b) => (b.gap < a.gap ? b : a))
  return Math.max(0, length - startTrim - takenByPattern(model, counts) - last.kerf)
}

/**
 * Among plans of the same weight one whose longest usable offcut is longest, as far as the steps go: tries what a single piece could
 * carry, least first, and whether the rest can still be cut as cheaply.
 */
export function withLongestOffcut(
  search: LightestSearch,
  { patterns, isProven }: { readonly patterns: readonly Pattern[]; readonly isProven: boolean },
  smallestUsable: number,
): readonly Pattern[] {
  const { model } = search
  const longest = Math.max(0, ...patterns.map((pattern) => offcutOf(model, pattern)))
  const budget = weightOf(model, patterns)
  const candidates = lightFillings(model, Math.max(longest, smallestUsable - 1))
  return withAllowance(search.counter, STEPS_IN_ALL, (whole) => {
    for (const candidate of candidates) {
      if (whole.hasEnded) break
      const rest = restBeside(model, candidate)
      const left = budget - model.stocks[candidate.stock]!.weight
      if (leastWeightOf(search, rest) > left) continue
      // Of a proven weight no part can be bettered: the rest weighs what is left exactly or cannot be cut for it.
      const { patterns: others } = withAllowance(whole, STEPS_PER_CANDIDATE, (counter) =>
        lightestWithin({ ...search, counter }, { ...rest, from: isProven ? left : 0, to: left }),
      )
      if (others !== undefined) return [candidate, ...others]
    }
    return patterns
  })
}

function restBeside(
  { kinds, stocks }: StockModel,
  { stock, counts }: Pattern,
): Pick<LightestRequest, 'demand' | 'available'> {
  return {
    demand: kinds.map(({ demand }, kind) => demand - counts[kind]!),
    available: stocks.map(({ limit, isUnlimited }, index) =>
      index === stock && !isUnlimited ? limit - 1 : limit,
    ),
  }
}

/** Every filling that leaves more than so much of its piece, longest offcut first; as many as are worth trying. */
function lightFillings(model: StockModel, longerThan: number): Pattern[] {
  const found: Pattern[] = []
  const counts = model.kinds.map(() => 0)
  const visit = (stock: number, kind: number) => {
    if (found.length >= CANDIDATES_AT_MOST || kind === counts.length) return
    const { demand } = model.kinds[kind]!
    visit(stock, kind + 1)
    for (let count = 1; count <= demand; count += 1) {
      counts[kind] = count
      const pattern = { stock, counts: [...counts] }
      const { usable } = model.stocks[stock]!
      if (takenByPattern(model, counts) > usable || offcutOf(model, pattern) <= longerThan) break
      found.push(pattern)
      visit(stock, kind + 1)
    }
    counts[kind] = 0
  }
  model.stocks.forEach((_, stock) => visit(stock, 0))
  return found.sort((a, b) => offcutOf(model, b) - offcutOf(model, a))
}
