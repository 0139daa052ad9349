/**
 * A small revised simplex: minimise cost · x subject to A x = b, x ≥ 0, columns added as they are found. Works in float64 with the
 * basis inverse held whole; what is claimed from it is proved elsewhere in whole numbers (dual-prices).
 */

export interface SparseColumn {
  readonly rows: readonly number[]
  readonly coefficients: readonly number[]
  readonly cost: number
}

export interface Simplex {
  readonly size: number
  readonly columns: SparseColumn[]
  /** Column in each row's place. */
  readonly basis: number[]
  /** Row by row. */
  readonly inverse: Float64Array
  /** Amount of each basic column. */
  readonly amounts: Float64Array
  pivots: number
}

const COST_NOISE = 1e-9
const PIVOT_NOISE = 1e-9

/** Starts from columns that are the unit vectors, one for each row; b must not be negative. */
export function simplexFrom(b: readonly number[], units: readonly SparseColumn[]): Simplex {
  const size = b.length
  const inverse = new Float64Array(size * size)
  for (let row = 0; row < size; row += 1) inverse[row * size + row] = 1
  return {
    size,
    columns: [...units],
    basis: units.map((_, row) => row),
    inverse,
    amounts: Float64Array.from(b),
    pivots: 0,
  }
}

/** Price of one unit of each row: cost of the basis × its inverse. */
export function rowPricesOf({ size, columns, basis, inverse }: Simplex): Float64Array {
  const prices = new Float64Array(size)
  for (let row = 0; row < size; row += 1) {
    const cost = columns[basis[row]!]!.cost
    if (cost === 0) continue
    for (let column = 0; column < size; column += 1) prices[column]! += cost * inverse[row * size + column]!
  }
  return prices
}

export function reducedCostOf({ rows, coefficients, cost }: SparseColumn, prices: Float64Array): number {
  let reduced = cost
  for (let index = 0; index < rows.length; index += 1) reduced -= coefficients[index]! * prices[rows[index]!]!
  return reduced
}

/** Pivots until no column improves or the limit is reached. */
export function improve(simplex: Simplex, pivotLimit: number): void {
  while (simplex.pivots < pivotLimit) {
    const entering = enteringColumn(simplex)
    if (entering === undefined) return
    const direction = solvedColumn(simplex, simplex.columns[entering]!)
    const row = leavingRow(simplex, direction)
    if (row === undefined) return
    pivot(simplex, entering, row, direction)
  }
}

/** The column that gains most per unit. */
function enteringColumn(simplex: Simplex): number | undefined {
  const prices = rowPricesOf(simplex)
  let least = -COST_NOISE
  let entering: number | undefined
  simplex.columns.forEach((column, index) => {
    const reduced = reducedCostOf(column, prices)
    if (reduced < least) {
      least = reduced
      entering = index
    }
  })
  return entering
}

function solvedColumn({ size, inverse }: Simplex, { rows, coefficients }: SparseColumn): Float64Array {
  const solved = new Float64Array(size)
  for (let row = 0; row < size; row += 1) {
    let sum = 0
    for (let index = 0; index < rows.length; index += 1) {
      sum += inverse[row * size + rows[index]!]! * coefficients[index]!
    }
    solved[row] = sum
  }
  return solved
}

/** The first basic column to run out; among equals the one with the largest pivot, which is the steadiest. */
function leavingRow({ size, amounts }: Simplex, direction: Float64Array): number | undefined {
  let least = Number.POSITIVE_INFINITY
  let leaving: number | undefined
  for (let row = 0; row < size; row += 1) {
    const step = direction[row]!
    if (step <= PIVOT_NOISE) continue
    const ratio = Math.max(0, amounts[row]!) / step
    if (
      ratio < least - COST_NOISE ||
      (leaving !== undefined && ratio <= least && step > direction[leaving]!)
    ) {
      least = Math.min(least, ratio)
      leaving = row
    }
  }
  return leaving
}

function pivot(simplex: Simplex, entering: number, row: number, direction: Float64Array): void {
  const { size, inverse, amounts, basis } = simplex
  const by = direction[row]!
  const amount = amounts[row]! / by
  for (let column = 0; column < size; column += 1) inverse[row * size + column]! /= by
  for (let other = 0; other < size; other += 1) {
    const factor = direction[other]!
    if (other === row || factor === 0) continue
    amounts[other]! -= factor * amount
    for (let column = 0; column < size; column += 1) {
      inverse[other * size + column]! -= factor * inverse[row * size + column]!
    }
  }
  amounts[row] = amount
  basis[row] = entering
  simplex.pivots += 1
}
