import type { StageName } from '@shared/course'

/** Width of one stage and height of the whole in the drawing's own units; it is stretched to the page. */
export const STAGE_WIDTH = 100
export const COURSE_HEIGHT = 38

/**
 * The upper edge of each stage, as path commands from its left end: together one moulding from the sight edge (picture)
 * to the back edge (finish). y grows downward.
 */
const UPPER_EDGES = {
  picture: { from: 31, draw: 'h100' },
  evidence: { from: 31, draw: 'c46 0 44 -11 100 -11' },
  section: { from: 13, draw: 'h100' },
  review: { from: 13, draw: 'c0 -16 100 -16 100 0' },
  knife: { from: 21, draw: 'h100' },
  lengths: { from: 21, draw: 'c44 0 78 -4 100 -11' },
  bench: { from: 15, draw: 'h100' },
  finish: { from: 15, draw: 'c52 0 48 11 100 11' },
} satisfies Record<StageName, { readonly from: number; readonly draw: string }>

export interface StageShape {
  readonly stage: StageName
  /** The stage's piece of the moulding, closed. */
  readonly area: string
}

export const stageShapesOf = (stages: readonly StageName[]): StageShape[] =>
  stages.map((stage, place) => {
    const { from, draw } = UPPER_EDGES[stage]
    const x = place * STAGE_WIDTH
    return {
      stage,
      area: `M${x} ${from}${draw}V${COURSE_HEIGHT}H${x}Z`,
    }
  })
