import { hasEndedAfterStep } from './step-counter'
import type { StepCounter } from './step-counter'
import type { StockModel } from './stock-model'
import { slackOf } from './worths'
import type { Worths } from './worths'

/** So many pieces of each stock, and their weight. */
export interface PieceSet {
  readonly pieces: readonly number[]
  readonly weight: number
}

export interface PieceSetsRequest {
  readonly model: StockModel
  readonly demand: readonly number[]
  readonly available: readonly number[]
  readonly worths: readonly Worths[]
  /** Weights from and to, both included. */
  readonly from: number
  readonly to: number
}

const SETS_AT_MOST = 4000

interface Walk extends PieceSetsRequest {
  /** For each test, what the rails are worth, and for the stocks from each place on the most that one unit of weight carries. */
  readonly needs: readonly number[]
  readonly carriedFrom: readonly (readonly number[])[]
  readonly rails: number
  readonly pieces: number[]
  readonly found: PieceSet[]
  readonly counter: StepCounter
}

/**
 * Sets of pieces that pass every test, lightest first; undefined where they are too many to list. A set is left out where one of its
 * pieces could be exchanged for one that is not shorter and not heavier and not in it: whatever the first carries the other carries too.
 */
export function pieceSetsOf(request: PieceSetsRequest, counter: StepCounter): PieceSet[] | undefined {
  const { model, demand, worths } = request
  const rails = demand.reduce((sum, count) => sum + count, 0)
  const walk: Walk = {
    ...request,
    needs: worths.map(({ worth }) => demand.reduce((sum, count, kind) => sum + count * worth[kind]!, 0)),
    carriedFrom: worths.map((each) => carriedPerWeightFrom(model, each)),
    rails,
    pieces: model.stocks.map(() => 0),
    found: [],
    counter,
  }
  visit(walk, 0, { weight: 0, count: 0, carried: worths.map(() => 0) })
  if (walk.found.length > SETS_AT_MOST || counter.hasEnded) return undefined
  return walk.found.sort((a, b) => a.weight - b.weight)
}

function carriedPerWeightFrom({ stocks }: StockModel, { fullest }: Worths): number[] {
  const carried = [...stocks.map(() => 0), 0]
  for (let place = stocks.length - 1; place >= 0; place -= 1) {
    const { weight } = stocks[place]!
    const own = weight === 0 ? Number.POSITIVE_INFINITY : fullest[place]! / weight
    carried[place] = Math.max(carried[place + 1]!, own)
  }
  return carried
}

interface Sum {
  readonly weight: number
  readonly count: number
  readonly carried: readonly number[]
}

function visit(walk: Walk, place: number, sum: Sum): void {
  if (walk.found.length > SETS_AT_MOST || hasEndedAfterStep(walk.counter)) return
  const left = walk.to - sum.weight
  const falls = walk.needs.some(
    (need, test) => sum.carried[test]! + mostCarried(walk.carriedFrom[test]![place]!, left) < need,
  )
  if (falls) return
  const stock = walk.model.stocks[place]
  if (stock === undefined) {
    enter(walk, sum.weight)
    return
  }
  const byWeight = stock.weight === 0 ? Number.POSITIVE_INFINITY : Math.floor(left / stock.weight)
  const most = Math.min(walk.available[place]!, byWeight, walk.rails - sum.count)
  for (let count = 0; count <= most; count += 1) {
    walk.pieces[place] = count
    visit(walk, place + 1, {
      weight: sum.weight + count * stock.weight,
      count: sum.count + count,
      carried: sum.carried.map((carried, test) => carried + count * walk.worths[test]!.fullest[place]!),
    })
  }
  walk.pieces[place] = 0
}

/** Rounding in the quotient must not cut a set off: a hair is added. */
const mostCarried = (perWeight: number, left: number) => (left === 0 ? 0 : left * perWeight * (1 + 1e-12) + 1)

function enter(walk: Walk, weight: number): void {
  if (weight < walk.from || isExchangeable(walk)) return
  if (walk.worths.some((each) => slackOf(each, walk.demand, walk.pieces) < 0)) return
  walk.found.push({ pieces: [...walk.pieces], weight })
}

function isExchangeable({ model: { stocks }, pieces, available }: Walk): boolean {
  return stocks.some((stock, index) => {
    if (pieces[index] === 0) return false
    return stocks.some((other, better) => {
      if (better === index || pieces[better]! >= available[better]!) return false
      if (other.usable < stock.usable || other.weight > stock.weight) return false
      const isSame = other.usable === stock.usable && other.weight === stock.weight
      return !isSame || better < index
    })
  })
}
