import type { BasisKind } from './drawn-section'

/** The colours of the house, as the page has them. */
export interface Palette {
  readonly gesso: string
  readonly gesso2: string
  readonly line: string
  readonly ink: string
  readonly ink2: string
  readonly bole: string
  readonly boleTint: string
  readonly leaf: string
  readonly slate: string
  readonly madder: string
}

/** How the line of a dimension's basis looks: told apart by line as well as by colour. */
export interface FaceLine {
  readonly color: string
  readonly width: number
  readonly dash: number[]
}

export function faceLineOf(basis: BasisKind, palette: Palette): FaceLine {
  switch (basis) {
    case 'measured':
      return { color: palette.slate, width: 3, dash: [] }
    case 'precedent':
      return { color: palette.leaf, width: 3, dash: [] }
    case 'judged':
      return { color: palette.ink, width: 3, dash: [5, 3] }
    case 'none':
      return { color: palette.madder, width: 2, dash: [1.5, 3] }
  }
}
