import { rebateOpeningOf, totalRailLengthAt } from '@shared/cutting'
import type { Measurement } from '@shared/contracts'
import { gildedAreaOf } from '@shared/finish'
import type { GildedStretch } from '@shared/finish'
import { girthOf } from '@shared/section'
import type { Section } from '@shared/section'

/** Frames that are to be finished: a picture as measured and how many frames are made for it. */
export interface FramedPicture {
  readonly measurement: Measurement
  readonly copies: number
}

/** A stretch of the face from one break to a later one, over all rails of all frames. */
export interface FinishZone extends GildedStretch {
  readonly from: number
  readonly to: number
  readonly areaMm2: number
}

/** Girth of the stretch, Σ rail length at its own centroid, and its area; breaks as numbers, from < to. */
export function finishZoneOf(
  section: Section,
  pictures: readonly FramedPicture[],
  [from, to]: readonly [number, number],
): FinishZone {
  const { lengthMm, centroid } = girthOf(section, from, to)
  const totalRailLengthMm = pictures.reduce(
    (sum, { measurement, copies }) =>
      sum +
      totalRailLengthAt(
        { opening: rebateOpeningOf(measurement).opening, sides: 4, count: copies },
        section.rebate.width,
        centroid.x,
      ),
    0,
  )
  const stretch = { girthMm: lengthMm, totalRailLengthMm }
  return { from, to, ...stretch, areaMm2: gildedAreaOf(stretch) }
}
