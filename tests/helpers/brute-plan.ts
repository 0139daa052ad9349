import type { CutInstance, DemandedRail } from '@shared/cutting'

/** What the best plan of a small instance is worth: found by trying every way of sharing out the rails and every piece for each share. */
export interface BruteBest {
  /** Cost in cents, or millimetres opened. */
  readonly value: number
  readonly pieces: number
  readonly piecesOrdered: number
  /** Longest usable offcut among all plans that are equal in the three above, mm. */
  readonly longestOffcut: number
}

interface Piece {
  readonly length: number
  readonly usable: number
  readonly startTrim: number
  readonly value: number
  readonly isOrdered: boolean
  readonly most: number
}

/** For whole millimetres and at most six rails. Undefined where nothing can be planned. */
export function bruteBestOf(instance: CutInstance): BruteBest | undefined {
  const rails = instance.demand.flatMap((rail) => Array.from({ length: rail.count }, () => rail))
  const pieces = piecesOf(instance)
  let best: BruteBest | undefined
  for (const shares of sharesOf(rails)) {
    const used = pieces.map(() => 0)
    const assign = (place: number, so: BruteBest): void => {
      const share = shares[place]
      if (share === undefined) {
        if (best === undefined || isBetter(instance, so, best)) best = so
        return
      }
      const { taken, lastKerf } = shortestRow(share, instance)
      pieces.forEach((piece, index) => {
        if (used[index]! >= piece.most || taken > piece.usable + 1e-7) return
        const left = Math.max(0, piece.length - piece.startTrim - taken - lastKerf)
        const isUsable = left >= instance.saw.smallestUsableOffcut
        used[index]! += 1
        assign(place + 1, {
          value: so.value + piece.value,
          pieces: so.pieces + 1,
          piecesOrdered: so.piecesOrdered + (piece.isOrdered ? 1 : 0),
          longestOffcut: isUsable ? Math.max(so.longestOffcut, left) : so.longestOffcut,
        })
        used[index]! -= 1
      })
    }
    assign(0, { value: 0, pieces: 0, piecesOrdered: 0, longestOffcut: 0 })
  }
  return best
}

function isBetter({ lengths }: CutInstance, a: BruteBest, b: BruteBest): boolean {
  const isPriced = lengths.some(({ price }) => price !== undefined)
  const order = [a.value - b.value, a.pieces - b.pieces, isPriced ? 0 : a.piecesOrdered - b.piecesOrdered]
  return (order.find((difference) => difference !== 0) ?? b.longestOffcut - a.longestOffcut) < 0
}

function piecesOf({ lengths, rack, saw }: CutInstance): Piece[] {
  const isPriced = lengths.some(({ price }) => price !== undefined)
  return [
    ...rack.map(({ length, endTrim = [saw.endTrim, saw.endTrim] }) => ({
      length,
      usable: length - endTrim[0] - endTrim[1],
      startTrim: endTrim[0],
      value: isPriced ? 0 : length,
      isOrdered: false,
      most: 1,
    })),
    ...lengths.map(({ length, price, count = Number.POSITIVE_INFINITY }) => ({
      length,
      usable: length - 2 * saw.endTrim,
      startTrim: saw.endTrim,
      value: price === undefined ? length : Math.round(Number(price) * 100),
      isOrdered: true,
      most: count,
    })),
  ]
}

/** Every way of parting the rails into shares, none empty. */
function sharesOf(rails: readonly DemandedRail[]): DemandedRail[][][] {
  const [first, ...others] = rails
  if (first === undefined) return [[]]
  return sharesOf(others).flatMap((shares) => [
    [[first], ...shares],
    ...shares.map((share, index) => [
      ...shares.slice(0, index),
      [first, ...share],
      ...shares.slice(index + 1),
    ]),
  ])
}

/** The shortest row of rails over all their orders, and with it the least last kerf. */
function shortestRow(rails: readonly DemandedRail[], { saw }: CutInstance) {
  const kerf = ({ mitre }: DemandedRail) => saw.kerf / Math.cos((mitre * Math.PI) / 180)
  let best = { taken: Number.POSITIVE_INFINITY, lastKerf: 0 }
  for (const row of ordersOf(rails)) {
    const taken = row.reduce(
      (sum, rail, index) =>
        sum + rail.length + (index === 0 ? 0 : Math.max(kerf(rail), kerf(row[index - 1]!)) + saw.margin),
      0,
    )
    const lastKerf = kerf(row.at(-1)!)
    const shorter = taken + lastKerf < best.taken + best.lastKerf - 1e-9
    if (taken < best.taken - 1e-9 || (taken < best.taken + 1e-9 && shorter)) best = { taken, lastKerf }
  }
  return best
}

function ordersOf<T>(list: readonly T[]): T[][] {
  if (list.length <= 1) return [[...list]]
  return list.flatMap((one, index) =>
    ordersOf([...list.slice(0, index), ...list.slice(index + 1)]).map((others) => [one, ...others]),
  )
}
