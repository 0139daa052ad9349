import { ROUGHLY } from './best-fill'
import { fillingsOf } from './fillings'
import { takenByPattern } from './pattern'
import type { Pattern } from './pattern'
import { pricedOut } from './price-out'
import type { StepCounter } from './step-counter'
import type { StockModel } from './stock-model'
import { slackOf, worthsFrom } from './worths'
import type { Worths } from './worths'

/** What is known of a model while sets of pieces are tried. */
export interface PackingSearch {
  readonly model: StockModel
  /** Tests that any packing must pass; more are found on the way. */
  readonly worths: Worths[]
  /** Rails and pieces, as keys, that are proved not to go together. */
  readonly refuted: Set<string | number>
  readonly counter: StepCounter
}

export type Packed =
  | { readonly kind: 'packed'; readonly patterns: readonly Pattern[] }
  | { readonly kind: 'impossible' }
  | { readonly kind: 'ended' }

const REFUTED_AT_MOST = 1_000_000
const WORTHS_AT_MOST = 24

interface Rest {
  readonly demand: number[]
  readonly pieces: number[]
}

/**
 * Whether so many rails of each kind can be cut from so many pieces of each stock, and how. 'impossible' is proved; 'ended' only says that
 * the steps ran out.
 */
export function packedInto(
  search: PackingSearch,
  demand: readonly number[],
  pieces: readonly number[],
): Packed {
  const rest = { demand: [...demand], pieces: [...pieces] }
  if (isOverfull(search, rest)) return { kind: 'impossible' }
  if (search.refuted.has(keyOf(search.model, rest))) return { kind: 'impossible' }
  addWorthsFor(search, rest)
  const patterns: Pattern[] = []
  if (canPack(search, rest, patterns)) return { kind: 'packed', patterns: patterns.reverse() }
  return { kind: search.counter.hasEnded ? 'ended' : 'impossible' }
}

const isOverfull = ({ worths }: PackingSearch, { demand, pieces }: Rest) =>
  worths.some((each) => slackOf(each, demand, pieces) < 0)

/** Prices the rails on just these pieces: where even fractions of patterns do not suffice, the prices are a test that shows it. */
function addWorthsFor({ model, worths, counter }: PackingSearch, { demand, pieces }: Rest): void {
  if (worths.length >= WORTHS_AT_MOST) return
  const scarce = model.stocks.map((stock, index) => ({ ...stock, limit: pieces[index]!, isUnlimited: false }))
  const costs = scarce.map(() => 0)
  const relaxed = pricedOut(
    { model: { ...model, stocks: scarce }, costs, demand, available: pieces },
    counter,
  )
  const found = worthsFrom(model, relaxed.prices, ROUGHLY)
  if (found !== undefined && slackOf(found, demand, pieces) < 0) worths.push(found)
}

/** Piece by piece: the next always carries the longest rail that is left. */
function canPack(search: PackingSearch, rest: Rest, chosen: Pattern[]): boolean {
  const { model, refuted, counter } = search
  const first = rest.demand.findIndex((count) => count > 0)
  if (first < 0) return true
  if (isOverfull(search, rest)) return false
  const key = keyOf(model, rest)
  if (refuted.has(key)) return false
  for (const pattern of choicesFor(search, rest, first)) {
    take(rest, pattern, 1)
    const isDone = canPack(search, rest, chosen)
    take(rest, pattern, -1)
    if (isDone) chosen.push(pattern)
    if (isDone || counter.hasEnded) return isDone
  }
  if (counter.hasEnded) return false
  if (refuted.size < REFUTED_AT_MOST) refuted.add(key)
  return false
}

function take({ demand, pieces }: Rest, { stock, counts }: Pattern, sign: 1 | -1): void {
  for (let kind = 0; kind < counts.length; kind += 1) demand[kind]! -= sign * counts[kind]!
  pieces[stock]! -= sign
}

/** Every piece and filling that may come next, those that waste least first. */
function choicesFor(search: PackingSearch, rest: Rest, first: number): Pattern[] {
  const { model, counter } = search
  const { worths, slack } = tightestFor(search, rest)
  const choices: { readonly pattern: Pattern; readonly loss: number }[] = []
  rest.pieces.forEach((count, stock) => {
    if (count <= 0) return
    const fullest = worths.fullest[stock]!
    const request = {
      model,
      stock,
      demand: rest.demand,
      first,
      worth: worths.worth,
      leastWorth: fullest - slack,
    }
    for (const { counts, worth } of fillingsOf(request, counter)) {
      if (fitsShorter(model, rest, stock, counts)) continue
      choices.push({ pattern: { stock, counts }, loss: fullest - worth })
    }
  })
  return choices.sort((a, b) => a.loss - b.loss).map(({ pattern }) => pattern)
}

/** The test that leaves least room, measured by what the pieces carry. */
function tightestFor({ worths, model }: PackingSearch, { demand, pieces }: Rest) {
  let tightest = {
    worths: { worth: model.kinds.map(() => 0), fullest: model.stocks.map(() => 0) } as Worths,
    slack: 0,
  }
  let least = Number.POSITIVE_INFINITY
  for (const each of worths) {
    const slack = slackOf(each, demand, pieces)
    const carried = pieces.reduce((sum, count, stock) => sum + count * each.fullest[stock]!, 0)
    if (slack / carried >= least) continue
    least = slack / carried
    tightest = { worths: each, slack }
  }
  return tightest
}

/** True where a shorter piece that is left takes the filling too: the two could change places, so this choice need not be tried. */
function fitsShorter(model: StockModel, { pieces }: Rest, stock: number, counts: readonly number[]): boolean {
  const taken = takenByPattern(model, counts)
  for (let other = 0; other < stock; other += 1) {
    if (pieces[other]! > 0 && model.stocks[other]!.usable >= taken) return true
  }
  return false
}

/** Rails and pieces as one number where that is exact, else as text. */
function keyOf({ kinds, stocks, railCount }: StockModel, { demand, pieces }: Rest): string | number {
  let key = 0
  let size = 1
  for (let kind = 0; kind < kinds.length; kind += 1) {
    key += demand[kind]! * size
    size *= kinds[kind]!.demand + 1
  }
  for (let stock = 0; stock < stocks.length; stock += 1) {
    key += pieces[stock]! * size
    size *= railCount + 1
  }
  return size <= Number.MAX_SAFE_INTEGER ? key : `${demand.join()}/${pieces.join()}`
}
