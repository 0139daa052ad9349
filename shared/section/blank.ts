import { boundsOf, smallestEnclosingRectangleOf } from '@shared/geometry'
import type { Outline } from '@shared/geometry'

/** The smallest rectangle of timber that the wood section comes out of, finished sizes, mm. */
export interface SectionBlank {
  readonly widthMm: number
  readonly thicknessMm: number
  /** How far the blank's width leans from the wall plane, counter-clockwise positive, −45° to 45°; 0 where leaning saves nothing. */
  readonly tiltDeg: number
  /** As run flat. */
  readonly flat: { readonly widthMm: number; readonly thicknessMm: number }
}

/** A tilt must save more than this part of the flat blank's area: less is rounding. */
const SAVING = 1e-6

/** The blank of an outline: run flat, or tilted where that is smaller. */
export function blankOf(outline: Outline): SectionBlank {
  const { min, max } = boundsOf(outline)
  const flat = { widthMm: max.x - min.x, thicknessMm: max.y - min.y }
  const least = smallestEnclosingRectangleOf(outline)
  const flatArea = flat.widthMm * flat.thicknessMm
  if (least.widthMm * least.heightMm >= flatArea * (1 - SAVING)) return { ...flat, tiltDeg: 0, flat }
  const tiltDeg = (least.angleRad * 180) / Math.PI
  return { widthMm: least.widthMm, thicknessMm: least.heightMm, tiltDeg, flat }
}
