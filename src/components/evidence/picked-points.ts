/** A place on a photograph, in pixels of the upright original: (0, 0) is the outer corner of the top-left pixel. */
export type ImagePoint = readonly [number, number]

export interface Picked {
  readonly from: ImagePoint | null
  readonly to: ImagePoint | null
}

export const NOTHING_PICKED: Picked = { from: null, to: null }

/** The next pick: first the one end, then the other, then the nearer of both is moved. */
export function withPick({ from, to }: Picked, at: ImagePoint): Picked {
  if (from === null) return { from: at, to }
  if (to === null) return { from, to: at }
  return distanceOf(from, at) <= distanceOf(to, at) ? { from: at, to } : { from, to: at }
}

export const distanceOf = ([ax, ay]: ImagePoint, [bx, by]: ImagePoint) => Math.hypot(bx - ax, by - ay)

export interface Size {
  readonly width: number
  readonly height: number
}

export const keptWithin = ([x, y]: ImagePoint, { width, height }: Size): ImagePoint => [
  Math.min(Math.max(x, 0), width),
  Math.min(Math.max(y, 0), height),
]
