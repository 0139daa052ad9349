/**
 * Trimmed sheets of ISO 5457:1999: A4 upright, the others lying. The frame stands 20 mm from the left edge (for filing)
 * and 10 mm from the others; the title block, 180 mm wide, lies in its lower right corner.
 */
export interface Paper {
  readonly name: 'A4' | 'A3' | 'A2' | 'A1' | 'A0'
  readonly widthMm: number
  readonly heightMm: number
}

export const PAPERS: readonly Paper[] = [
  { name: 'A4', widthMm: 210, heightMm: 297 },
  { name: 'A3', widthMm: 420, heightMm: 297 },
  { name: 'A2', widthMm: 594, heightMm: 420 },
  { name: 'A1', widthMm: 841, heightMm: 594 },
  { name: 'A0', widthMm: 1189, heightMm: 841 },
]

export const BORDER_MM = { left: 20, other: 10 } as const
export const TITLE_BLOCK_WIDTH_MM = 180

/** The drawing space: inside the frame. */
export interface Space {
  readonly left: number
  readonly bottom: number
  readonly right: number
  readonly top: number
}

export const drawingSpaceOf = ({ widthMm, heightMm }: Pick<Paper, 'widthMm' | 'heightMm'>): Space => ({
  left: BORDER_MM.left,
  bottom: BORDER_MM.other,
  right: widthMm - BORDER_MM.other,
  top: heightMm - BORDER_MM.other,
})

/** One scale of ISO 5455:1979, as drawn size over true size. */
export interface Scale {
  readonly ratio: number
  readonly text: string
}

export const FULL_SIZE: Scale = { ratio: 1, text: '1:1' }

/** Full size first, then the reductions of ISO 5455. */
export const SCALES: readonly Scale[] = [
  FULL_SIZE,
  { ratio: 1 / 2, text: '1:2' },
  { ratio: 1 / 5, text: '1:5' },
  { ratio: 1 / 10, text: '1:10' },
  { ratio: 1 / 20, text: '1:20' },
  { ratio: 1 / 50, text: '1:50' },
]
