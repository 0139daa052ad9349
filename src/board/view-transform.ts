import type { Point } from '@shared/geometry'

/** How the section lies on the canvas: pixels per millimetre, and the canvas place (CSS pixels, y down) of the section's origin. */
export interface View {
  readonly pixelsPerMm: number
  readonly originX: number
  readonly originY: number
}

export interface CanvasSize {
  readonly width: number
  readonly height: number
}

/** What is to be seen whole, mm. */
export interface Extent {
  readonly min: Point
  readonly max: Point
}

/** Room left free round the section, CSS pixels. */
export interface Margins {
  readonly left: number
  readonly right: number
  readonly top: number
  readonly bottom: number
}

/** Closest and farthest looks, pixels per millimetre: a tenth of a millimetre fills a finger's width; 4 m of wall fit a small screen. */
const CLOSEST = 120
const FARTHEST = 0.2

export const toCanvas = ({ pixelsPerMm, originX, originY }: View, { x, y }: Point): Point => ({
  x: originX + x * pixelsPerMm,
  y: originY - y * pixelsPerMm,
})

export const toSection = ({ pixelsPerMm, originX, originY }: View, { x, y }: Point): Point => ({
  x: (x - originX) / pixelsPerMm,
  y: (originY - y) / pixelsPerMm,
})

export const pannedBy = (view: View, across: number, down: number): View => ({
  ...view,
  originX: view.originX + across,
  originY: view.originY + down,
})

/** Nearer or farther by a factor; what lies under the place on the canvas stays there. */
export function zoomedAt(view: View, place: Point, factor: number): View {
  const pixelsPerMm = Math.min(CLOSEST, Math.max(FARTHEST, view.pixelsPerMm * factor))
  const ratio = pixelsPerMm / view.pixelsPerMm
  return {
    pixelsPerMm,
    originX: place.x - (place.x - view.originX) * ratio,
    originY: place.y - (place.y - view.originY) * ratio,
  }
}

/** The whole of an extent in the middle of the canvas, less its margins. */
export function fittedTo({ min, max }: Extent, { width, height }: CanvasSize, margins: Margins): View {
  const across = Math.max(1, width - margins.left - margins.right)
  const up = Math.max(1, height - margins.top - margins.bottom)
  const wanted = Math.min(across / Math.max(1, max.x - min.x), up / Math.max(1, max.y - min.y))
  const pixelsPerMm = Math.min(CLOSEST, Math.max(FARTHEST, wanted))
  return {
    pixelsPerMm,
    originX: margins.left + across / 2 - ((min.x + max.x) / 2) * pixelsPerMm,
    originY: margins.top + up / 2 + ((min.y + max.y) / 2) * pixelsPerMm,
  }
}

/** Least space between two lines of the grid, CSS pixels. */
const LEAST_GRID = 9

/** Spacing of the drawn grid, mm: the unit's own divisions, as fine as can be told apart. Every `major`-th line is stronger. */
export function gridOf(view: View, unit: 'mm' | 'in'): { readonly stepMm: number; readonly major: number } {
  const steps = unit === 'mm' ? METRIC_STEPS : INCH_STEPS
  const found = steps.find(({ stepMm }) => stepMm * view.pixelsPerMm >= LEAST_GRID)
  return found ?? (steps.at(-1) as (typeof steps)[number])
}

const METRIC_STEPS = [
  { stepMm: 0.5, major: 10 },
  { stepMm: 1, major: 10 },
  { stepMm: 5, major: 2 },
  { stepMm: 10, major: 5 },
  { stepMm: 50, major: 2 },
  { stepMm: 100, major: 10 },
] as const
const INCH_STEPS = [
  { stepMm: 25.4 / 32, major: 8 },
  { stepMm: 25.4 / 16, major: 8 },
  { stepMm: 25.4 / 8, major: 8 },
  { stepMm: 25.4 / 2, major: 2 },
  { stepMm: 25.4, major: 12 },
  { stepMm: 304.8, major: 10 },
] as const
