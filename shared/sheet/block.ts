import type { Point } from '@shared/geometry'
import { shiftedItems } from './placement'
import type { DrawingItem } from './drawing'

/** A part of a sheet that is laid out by itself: its items hang from (0, 0), its upper left corner, y down to −heightMm. */
export interface Block {
  readonly widthMm: number
  readonly heightMm: number
  readonly items: readonly DrawingItem[]
}

/** The block's items with its upper left corner at a place of the sheet. */
export function hungAt(block: Block, corner: Point): DrawingItem[] {
  return shiftedItems(block.items, corner)
}

/** Blocks one under the other, with a blank between. */
export function stacked(blocks: readonly Block[], gapMm: number): Block {
  const items: DrawingItem[] = []
  let heightMm = 0
  blocks.forEach((block, index) => {
    if (index > 0) heightMm += gapMm
    items.push(...hungAt(block, { x: 0, y: -heightMm }))
    heightMm += block.heightMm
  })
  return { widthMm: Math.max(0, ...blocks.map(({ widthMm }) => widthMm)), heightMm, items }
}
