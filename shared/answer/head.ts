import { knifeHeadFrom } from '@shared/knife'
import type { HeadRunning, KnifeHead } from '@shared/knife'

/** A head as a mill's card and the commission file write it: mm, degrees, rpm, mm/min. */
export interface WrittenHead {
  readonly cuttingDiameter: number
  readonly hookAngle: number
  readonly knives?: number | undefined
  readonly finishingKnives?: number | undefined
  readonly rpm?: number | undefined
  readonly maxRpm?: number | undefined
  readonly feed?: number | undefined
  readonly feedBy?: 'mechanical' | 'manual' | undefined
}

/** The head as far as it shapes the knife. */
export const knifeHeadOf = ({ cuttingDiameter, hookAngle }: WrittenHead): KnifeHead =>
  knifeHeadFrom(cuttingDiameter, hookAngle)

/** The head as it is run. */
export function headRunningOf(head: WrittenHead): HeadRunning {
  const { cuttingDiameter, knives, finishingKnives, rpm, maxRpm, feed, feedBy } = head
  return {
    cuttingDiameterMm: cuttingDiameter,
    ...(knives !== undefined && { knives }),
    ...(finishingKnives !== undefined && { finishingKnives }),
    ...(rpm !== undefined && { rpm }),
    ...(maxRpm !== undefined && { maxRpm }),
    ...(feed !== undefined && { feedMmPerMin: feed }),
    ...(feedBy !== undefined && { feedBy }),
  }
}
