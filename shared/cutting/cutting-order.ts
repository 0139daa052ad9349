import type { Pattern } from './pattern'
import type { StockModel } from './stock-model'

/** A piece with its rails in the order in which they are cut, by kind. */
export interface OrderedPiece {
  readonly stock: number
  readonly kinds: readonly number[]
}

/** Up to so many pieces every one is tried as the first. */
const STARTS_TRIED = 60

/**
 * The order of the pieces and of the cuts on each, with few changes of the stop: equal rails follow one another on a piece, and where two
 * pieces share a kind the one ends with it and the next begins with it. Longest first otherwise. Where gaps differ, the larger gaps come
 * first on each piece: only so do the rails take no more than the plan counts.
 */
export function cuttingOrderOf(model: StockModel, patterns: readonly Pattern[]): OrderedPiece[] {
  const pieces = patterns
    .map(({ stock, counts }) => ({ stock, counts, kinds: kindsIn(counts) }))
    .sort((a, b) => compareKinds(a.kinds, b.kinds) || a.stock - b.stock)
  if (!model.hasOneGap) return pieces.map((piece) => orderedPiece(piece, byGap(model, piece.kinds)))
  let best: OrderedPiece[] = []
  let fewest = Number.POSITIVE_INFINITY
  for (let start = 0; start < Math.min(pieces.length, STARTS_TRIED); start += 1) {
    const chained = chainFrom(pieces, start)
    const changes = stopChangesOf(chained)
    if (changes < fewest) [best, fewest] = [chained, changes]
  }
  return best
}

/** How often the next cut is of another kind than the one before, over all pieces in their order. */
export function stopChangesOf(pieces: readonly OrderedPiece[]): number {
  const sequence = pieces.flatMap(({ kinds }) => kinds)
  return sequence.filter((kind, index) => index > 0 && kind !== sequence[index - 1]).length
}

interface Piece extends Pattern {
  readonly kinds: readonly number[]
}

const kindsIn = (counts: readonly number[]) => counts.flatMap((count, kind) => (count > 0 ? [kind] : []))

function compareKinds(a: readonly number[], b: readonly number[]): number {
  for (let place = 0; place < Math.min(a.length, b.length); place += 1) {
    if (a[place] !== b[place]) return a[place]! - b[place]!
  }
  return a.length - b.length
}

const byGap = ({ kinds }: StockModel, list: readonly number[]) =>
  [...list].sort((a, b) => kinds[b]!.gap - kinds[a]!.gap || a - b)

const orderedPiece = ({ stock, counts }: Piece, kinds: readonly number[]): OrderedPiece => ({
  stock,
  kinds: kinds.flatMap((kind) => Array.from({ length: counts[kind]! }, () => kind)),
})

/** Nearest neighbour: next the piece that begins with a kind that the last may end with. */
function chainFrom(pieces: readonly Piece[], start: number): OrderedPiece[] {
  const left = [...pieces]
  const chained: OrderedPiece[] = []
  let entry: number | undefined
  let [piece] = left.splice(start, 1)
  while (piece !== undefined) {
    const exits = piece.kinds.length === 1 ? piece.kinds : piece.kinds.filter((kind) => kind !== entry)
    const next = left.findIndex(({ kinds }) => kinds.some((kind) => exits.includes(kind)))
    const following: Piece | undefined = left[Math.max(0, next)]
    const exit = next < 0 ? undefined : exits.find((kind) => following?.kinds.includes(kind))
    chained.push(orderedPiece(piece, kindsBetween(piece.kinds, entry, exit)))
    entry = exit
    left.splice(Math.max(0, next), 1)
    piece = following
  }
  return chained
}

function kindsBetween(
  kinds: readonly number[],
  entry: number | undefined,
  exit: number | undefined,
): number[] {
  const ends = kinds.length === 1 ? [] : [entry, exit]
  const middle = kinds.filter((kind) => !ends.includes(kind))
  const isThere = (kind: number | undefined): kind is number => kind !== undefined && kinds.length > 1
  return [...[entry].filter(isThere), ...middle, ...[exit].filter(isThere)]
}
