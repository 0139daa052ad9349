import type { DraftSection, RebateStack } from '@shared/section'

/** A part of what lies in the rebate, as a box of the section, mm: from the rebate's ceiling down towards the wall. */
export interface StackBox {
  readonly part: 'glazing' | 'airGap' | 'thickness' | 'backing' | 'fixings'
  readonly top: number
  readonly bottom: number
  /** The side that faces the rebate's wall. */
  readonly right: number
}

const PARTS = ['glazing', 'airGap', 'thickness', 'backing', 'fixings'] as const

/** The parts that are known, one under another; the picture keeps clear of the rebate's side by `clearMm`, glazing by half of it. */
export function stackBoxesOf(
  { rebate }: Pick<DraftSection, 'rebate'>,
  stack: RebateStack,
  clearMm: number,
): readonly StackBox[] {
  const boxes: StackBox[] = []
  let top = rebate.depth - (stack.lining ?? 0)
  for (const part of PARTS) {
    const height = stack[part] ?? 0
    if (height <= 0) continue
    const clear = part === 'thickness' || part === 'backing' ? clearMm : clearMm / 2
    boxes.push({ part, top, bottom: top - height, right: rebate.width - clear })
    top -= height
  }
  return boxes
}
