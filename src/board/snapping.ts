import type { Point } from '@shared/geometry'

/** Steps that breaks snap to and nudges go by, mm: half a millimetre, or a thirty-second of an inch. */
export const GRID_MM = { mm: 0.5, in: 25.4 / 32 } as const

export interface SnapOptions {
  readonly gridMm: number
  /** Other breaks, whose x and y a dragged one falls in with. */
  readonly breaks: readonly Point[]
  /** How near is near enough to fall in with another break, mm. */
  readonly reachMm: number
  /** Off while the user asks for a free hand. */
  readonly isFree?: boolean
}

export interface Snapped {
  readonly point: Point
  /** What it fell in with, along each axis. */
  readonly x: 'break' | 'grid' | 'free'
  readonly y: 'break' | 'grid' | 'free'
}

/** The nearest x and the nearest y that a break may snap to, each by itself: another break's within reach, else the grid's. */
export function snapped(point: Point, options: SnapOptions): Snapped {
  if (options.isFree === true) return { point, x: 'free', y: 'free' }
  const x = snappedAlong('x', point, options)
  const y = snappedAlong('y', point, options)
  return { point: { x: x.value, y: y.value }, x: x.to, y: y.to }
}

function snappedAlong(axis: 'x' | 'y', point: Point, { gridMm, breaks, reachMm }: SnapOptions) {
  const wanted = point[axis]
  let best: number | undefined
  for (const { [axis]: value } of breaks) {
    if (Math.abs(value - wanted) > reachMm) continue
    if (best === undefined || Math.abs(value - wanted) < Math.abs(best - wanted)) best = value
  }
  return best === undefined
    ? { value: onGrid(wanted, gridMm), to: 'grid' as const }
    : { value: best, to: 'break' as const }
}

/** The nearest place of a grid; the product is taken back to the decimal that people read, so that 0.1 steps do not gather dust. */
export function onGrid(value: number, gridMm: number): number {
  const steps = Math.round(value / gridMm)
  const place = steps * gridMm
  return steps === 0 ? 0 : Number(place.toPrecision(12))
}
