import type { Reading } from '@shared/contracts'
import { distance } from '@shared/geometry'
import type { Point } from '@shared/geometry'

export type Lay = NonNullable<Reading['lay']>
export type Scale = NonNullable<Reading['scale']>

/** Millimetres that one pixel of the upright original covers, by the two points a known distance apart; undefined when they are one. */
export function mmPerPixelOf({ from, to, distance: distanceMm }: Scale): number | undefined {
  const pixels = distance({ x: from[0], y: from[1] }, { x: to[0], y: to[1] })
  return pixels > 0 ? distanceMm / pixels : undefined
}

/** x = a u + c v + e, y = b u + d v + f: from the original's pixels (v down) to the section's millimetres (y up). */
export interface Affine {
  readonly a: number
  readonly b: number
  readonly c: number
  readonly d: number
  readonly e: number
  readonly f: number
}

/** How a photograph lies under the drawing: its point `at` on the section's origin (the sight edge's foot), turned counter-clockwise, perhaps mirrored left to right. */
export function affineOf(mmPerPixel: number, { at, turn, mirrored }: Lay): Affine {
  const angle = (turn * Math.PI) / 180
  const cos = Math.cos(angle) * mmPerPixel
  const sin = Math.sin(angle) * mmPerPixel
  const side = mirrored ? -1 : 1
  const [u, v] = at
  const [a, b, c, d] = [side * cos, side * sin, sin, -cos]
  return { a, b, c, d, e: -(a * u + c * v), f: -(b * u + d * v) }
}

/** The lay after the photograph was moved under the drawing by so many millimetres: the point under the origin moves the other way. */
export function layMovedBy(mmPerPixel: number, lay: Lay, byMm: Point): Lay {
  const { a, b, c, d } = affineOf(mmPerPixel, lay)
  const determinant = a * d - b * c
  const u = (byMm.x * d - byMm.y * c) / determinant
  const v = (byMm.y * a - byMm.x * b) / determinant
  return { ...lay, at: [lay.at[0] - u, lay.at[1] - v] }
}

/** Where a photograph lies before anybody has laid it: its middle on the sight edge's foot, upright. */
export const firstLay = (width: number, height: number): Lay => ({
  at: [width / 2, height / 2],
  turn: 0,
  mirrored: false,
})
