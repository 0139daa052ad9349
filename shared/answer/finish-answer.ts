import type { CommissionAnswerData, CommissionFile } from '@shared/contracts'
import { totalRailLengthAt } from '@shared/cutting'
import { gildedAreaOf, leafPlanFor } from '@shared/finish'
import { girthOf } from '@shared/section'
import type { Section } from '@shared/section'
import type { FrameRails } from './frame-rails'
import { placed } from './rails-answer'

type Zone = NonNullable<CommissionFile['finish']>['zones'][number]

/** Girth of each gilded stretch; with frames its area, and with a leaf's size how many leaves and books. */
export function finishAnswerOf(
  zones: readonly Zone[],
  section: Section,
  frames: readonly FrameRails[],
): NonNullable<CommissionAnswerData['finish']> {
  return {
    zones: zones.map((zone, index) =>
      placed(`/finish/zones/${index}`, () => zoneAnswer(zone, section, frames)),
    ),
  }
}

function zoneAnswer(zone: Zone, section: Section, frames: readonly FrameRails[]) {
  const { lengthMm, centroid } = girthOf(section, zone.from, zone.to)
  if (frames.length === 0) return { girth: lengthMm }
  const totalRailLengthMm = frames.reduce(
    (sum, { request }) => sum + totalRailLengthAt(request, request.rebateWidthFinishedMm, centroid.x),
    0,
  )
  const stretch = { girthMm: lengthMm, totalRailLengthMm }
  const area = gildedAreaOf(stretch)
  if (zone.leaf === undefined) return { girth: lengthMm, area }
  const { leaves, books } = leafPlanFor(stretch, { leafMm: zone.leaf, lapMm: zone.lap, waste: zone.waste })
  return { girth: lengthMm, area, leaves, books }
}
