/** A cell of the member rule along the canvas, CSS pixels. */
export interface RuleCell {
  readonly key: string
  readonly left: number
  readonly width: number
  /** Where its member really begins and ends. */
  readonly from: number
  readonly to: number
  /** Whether it had to be widened or moved, so that a leader must lead to its place. */
  readonly isMoved: boolean
}

/** No cell is narrower, so that a finger can meet it and its number be read, CSS pixels. */
export const LEAST_CELL = 24
/** Inches and fractions take more room to be read. */
export const LEAST_INCH_CELL = 42

interface Stretch {
  readonly key: string
  readonly from: number
  readonly to: number
}

/**
 * A cell under each member. A member that is too narrow takes the least width, and its neighbours make room, outward from the anchor, whose own
 * cell stays where its member is; a wide neighbour takes the push up, so that those beyond it lie true again.
 */
export function ruleCells(
  stretches: readonly Stretch[],
  anchorKey: string | undefined,
  least: number = LEAST_CELL,
): readonly RuleCell[] {
  const found = stretches.findIndex(({ key }) => key === anchorKey)
  const anchor = Math.max(0, found)
  const cells: RuleCell[] = []
  let right = -Infinity
  for (const stretch of stretches.slice(anchor)) {
    const cell = cellRightOf(stretch, right, least)
    cells.push(cell)
    right = cell.left + cell.width
  }
  let left = cells[0]?.left ?? 0
  for (const stretch of stretches.slice(0, anchor).reverse()) {
    const cell = cellLeftOf(stretch, left, least)
    cells.unshift(cell)
    left = cell.left
  }
  return cells
}

function cellRightOf({ key, from, to }: Stretch, free: number, least: number): RuleCell {
  const isAnchor = free === -Infinity
  const left = isAnchor ? centred(from, to, least) : Math.max(from, free)
  const width = Math.max(least, to - left)
  return { key, left, width, from, to, isMoved: isOff(left, width, from, to) }
}

function cellLeftOf({ key, from, to }: Stretch, free: number, least: number): RuleCell {
  const right = Math.min(to, free)
  const left = Math.min(from, right - least)
  return { key, left, width: right - left, from, to, isMoved: isOff(left, right - left, from, to) }
}

/** The left side of the anchor's cell: its member's own, or the least cell about its middle. */
const centred = (from: number, to: number, least: number): number =>
  to - from >= least ? from : (from + to) / 2 - least / 2

const isOff = (left: number, width: number, from: number, to: number): boolean =>
  Math.abs(left - from) > 0.5 || Math.abs(left + width - to) > 0.5
