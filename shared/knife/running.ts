import { Failure } from '@shared/failure'
import type { Fault } from '@shared/failure'

const MM_PER_INCH = 25.4
const MM_PER_METRE = 1000
const SECONDS_PER_MINUTE = 60

/** A head as it is run; what is not known is left out and so is what would follow from it. */
export interface HeadRunning {
  readonly cuttingDiameterMm: number
  readonly knives?: number
  /** Knives that leave a mark: 1 (the default) unless they are jointed. */
  readonly finishingKnives?: number
  readonly rpm?: number
  /** The greatest speed marked on the head. */
  readonly maxRpm?: number
  readonly feedMmPerMin?: number
  readonly feedBy?: 'mechanical' | 'manual'
}

export interface RunningFigures {
  /** Distance between neighbouring marks along the wood, mm: feed / (rpm × finishing knives). */
  readonly feedPerMarkMm?: number
  readonly marksPerInch?: number
  /** Height of the waves between marks, mm; absent where a mark is longer than the cutting circle. */
  readonly waveHeightMm?: number
  readonly peripheralSpeedMPerS?: number
}

/** Figures of the run. Sizes that are not positive, or more finishing knives than knives, are Failure 'input-invalid'. */
export function runningFiguresOf(running: HeadRunning): RunningFigures {
  refuseRunning(running)
  const { cuttingDiameterMm, finishingKnives = 1, rpm, feedMmPerMin } = running
  if (rpm === undefined) return {}
  const peripheralSpeedMPerS = peripheralSpeedOf(cuttingDiameterMm, rpm)
  if (feedMmPerMin === undefined) return { peripheralSpeedMPerS }
  const feedPerMarkMm = feedMmPerMin / (rpm * finishingKnives)
  const waveHeightMm = waveHeightOf(feedPerMarkMm, cuttingDiameterMm / 2)
  return {
    feedPerMarkMm,
    marksPerInch: MM_PER_INCH / feedPerMarkMm,
    ...(waveHeightMm !== undefined && { waveHeightMm }),
    peripheralSpeedMPerS,
  }
}

/** Speed of the knife's tip, m/s: π·D·n. */
export const peripheralSpeedOf = (cuttingDiameterMm: number, rpm: number): number =>
  (Math.PI * cuttingDiameterMm * rpm) / (MM_PER_METRE * SECONDS_PER_MINUTE)

/**
 * Height of the wave that a cutting circle of this radius leaves between marks f apart, mm: R − √(R² − f²/4), about f²/(8R);
 * the wood's own travel during the cut, which is thousands of times slower than the knife, is left out.
 */
export function waveHeightOf(feedPerMarkMm: number, cuttingRadiusMm: number): number | undefined {
  const halfMm = feedPerMarkMm / 2
  if (halfMm > cuttingRadiusMm) return undefined
  const rootMm = Math.sqrt((cuttingRadiusMm - halfMm) * (cuttingRadiusMm + halfMm))
  return (halfMm * halfMm) / (cuttingRadiusMm + rootMm)
}

function refuseRunning(running: HeadRunning): void {
  const { knives, finishingKnives = 1 } = running
  const sizes = [
    ['/cuttingDiameter', 'The cutting circle', running.cuttingDiameterMm],
    ['/rpm', 'The speed', running.rpm],
    ['/maxRpm', 'The speed marked on the head', running.maxRpm],
    ['/feed', 'The feed', running.feedMmPerMin],
    ['/knives', 'The number of knives', knives],
    ['/finishingKnives', 'The number of finishing knives', finishingKnives],
  ] as const
  const faults: Fault[] = sizes
    .filter(([, , value]) => value !== undefined && !(Number.isFinite(value) && value > 0))
    .map(([path, name, value]) => ({
      path,
      code: 'out-of-range',
      says: `${name} is ${value}; it must be more than 0.`,
    }))
  if (knives !== undefined && finishingKnives > knives) {
    faults.push({
      path: '/finishingKnives',
      code: 'too-many',
      says: `${finishingKnives} finishing knives are given for a head of ${knives}; give at most ${knives}.`,
    })
  }
  if (faults.length === 0) return
  throw new Failure('input-invalid', { says: faults.map(({ says }) => says).join(' '), faults })
}
