import { frameRailsOf } from '@shared/answer'
import type { FrameRails } from '@shared/answer'
import { measuresOf } from '@shared/section'
import type { Section, SectionMeasures } from '@shared/section'
import type { Measurement, Picture } from '../models/commission'
import type { Batch } from '../models/rack'

export interface RailedPicture {
  readonly picture: Picture
  readonly measurement: Measurement
  readonly frame: FrameRails
}

/** The rails of each measured picture in the section; long points follow the batch where one was measured. */
export function railsOfPictures(
  section: Section,
  pictures: readonly { readonly picture: Picture; readonly measurement: Measurement }[],
  batch: Batch | null,
): RailedPicture[] {
  const measures = measuresOf(section)
  return pictures.map(({ picture, measurement }) => ({
    picture,
    measurement,
    frame: railsOfPicture(section, measures, { picture, measurement, batch }),
  }))
}

function railsOfPicture(
  section: Section,
  measures: SectionMeasures,
  {
    picture,
    measurement,
    batch,
  }: { readonly picture: Picture; readonly measurement: Measurement; readonly batch: Batch | null },
): FrameRails {
  const { width, height, diagonals, allowance, lining } = measurement.document
  const trueWidthMm = batch?.trueWidthMm ?? null
  const trueRebateMm = batch?.trueRebateMm ?? null
  return frameRailsOf({
    picture: { width, height, diagonals, allowance, lining },
    sides: 4,
    count: picture.copies,
    rebateWidthMm: section.rebate.width,
    measures,
    ...(trueWidthMm !== null && trueRebateMm !== null && { batch: { trueWidthMm, trueRebateMm } }),
  })
}
