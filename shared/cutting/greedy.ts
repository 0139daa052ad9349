import { weightOf } from './pattern'
import type { Pattern } from './pattern'
import type { StockModel } from './stock-model'

/** First-fit and best-fit plans, longest rail first: quick, never claimed to be best. */

interface OpenPiece {
  stock: number
  readonly counts: number[]
  /** Σ span of the rails so far, nm, and the least of their gaps. */
  spans: number
  leastGap: number
}

interface Strategy {
  /** Preferred for a new piece, else the least that takes the rail. */
  readonly stock: number | undefined
  readonly usesRack: boolean
  readonly isBestFit: boolean
}

/** The lightest of several greedy plans; undefined where none places every rail. */
export function greedyPlanOf(
  model: StockModel,
  demand: readonly number[],
  available: readonly number[],
): Pattern[] | undefined {
  const orderable = model.stocks.flatMap(({ source }, stock) => (source === 'order' ? [stock] : []))
  const strategies = [undefined, ...orderable].flatMap((stock) =>
    [true, false].flatMap((usesRack) =>
      [true, false].map((isBestFit): Strategy => ({ stock, usesRack, isBestFit })),
    ),
  )
  let best: Pattern[] | undefined
  for (const strategy of strategies) {
    const plan = planBy(strategy, model, demand, available)
    if (plan !== undefined && (best === undefined || weightOf(model, plan) < weightOf(model, best)))
      best = plan
  }
  return best
}

function planBy(
  strategy: Strategy,
  model: StockModel,
  demand: readonly number[],
  available: readonly number[],
): Pattern[] | undefined {
  const left = [...available]
  const open: OpenPiece[] = []
  for (let kind = 0; kind < demand.length; kind += 1) {
    for (let copy = 0; copy < demand[kind]!; copy += 1) {
      const piece = openPieceFor(model, open, kind, strategy) ?? newPieceFor(model, left, kind, strategy)
      if (piece === undefined) return undefined
      if (piece.spans === 0) open.push(piece)
      put(model, piece, kind)
    }
  }
  lightenPieces(model, open, left)
  return open.map(({ stock, counts }) => ({ stock, counts }))
}

function put({ kinds }: StockModel, piece: OpenPiece, kind: number): void {
  const { span, gap } = kinds[kind]!
  piece.counts[kind]! += 1
  piece.spans += span
  piece.leastGap = Math.min(piece.leastGap, gap)
}

/** Room that would be left on a piece with one more rail of a kind, nm; negative: it does not fit. */
const roomWith = ({ kinds, stocks }: StockModel, piece: OpenPiece, kind: number): number =>
  stocks[piece.stock]!.usable - piece.spans - kinds[kind]!.span + Math.min(piece.leastGap, kinds[kind]!.gap)

function openPieceFor(
  model: StockModel,
  open: readonly OpenPiece[],
  kind: number,
  { isBestFit }: Strategy,
): OpenPiece | undefined {
  if (!isBestFit) return open.find((piece) => roomWith(model, piece, kind) >= 0)
  let best: OpenPiece | undefined
  let least = Number.POSITIVE_INFINITY
  for (const piece of open) {
    const room = roomWith(model, piece, kind)
    if (room < 0 || room >= least) continue
    best = piece
    least = room
  }
  return best
}

function newPieceFor(
  model: StockModel,
  left: number[],
  kind: number,
  strategy: Strategy,
): OpenPiece | undefined {
  const takes = (stock: number) => left[stock]! > 0 && model.stocks[stock]!.usable >= model.kinds[kind]!.body
  const all = model.stocks.map((_, stock) => stock).filter(takes)
  const ofRack = all.find((stock) => model.stocks[stock]!.source === 'rack')
  const ofOrder = all.filter((stock) => model.stocks[stock]!.source === 'order')
  const preferred =
    strategy.stock !== undefined && ofOrder.includes(strategy.stock) ? strategy.stock : ofOrder[0]
  const stock = (strategy.usesRack ? ofRack : undefined) ?? preferred ?? ofRack
  if (stock === undefined) return undefined
  left[stock]! -= 1
  return { stock, counts: model.kinds.map(() => 0), spans: 0, leastGap: Number.POSITIVE_INFINITY }
}

/** Each piece gives way to the lightest that is left and takes its rails. */
function lightenPieces({ stocks }: StockModel, open: readonly OpenPiece[], left: number[]): void {
  for (const piece of open) {
    const taken = piece.spans - piece.leastGap
    for (let stock = 0; stock < stocks.length; stock += 1) {
      const isLighter = stocks[stock]!.weight < stocks[piece.stock]!.weight
      if (!isLighter || left[stock]! <= 0 || stocks[stock]!.usable < taken) continue
      left[piece.stock]! += 1
      left[stock]! -= 1
      piece.stock = stock
    }
  }
}
