import type { Measurement } from '@shared/contracts'

/** Words of a measurement that a save would refuse; undefined when it can be saved. */
export function missingOf({ width, height, diagonals, measuredBy }: Measurement): string | undefined {
  if (width.length === 0) return 'Give at least one reading of the width.'
  if (height.length === 0) return 'Give at least one reading of the height.'
  if (diagonals.length === 1) return 'One diagonal tells nothing about squareness: give both, or none.'
  if (measuredBy.trim() === '') return 'Say who measured.'
  return undefined
}

export interface MeasurementStart {
  /** The workshop's usual clearance, mm. */
  readonly allowance: number
  readonly by: string
  readonly today: string
}

/** A new measurement begins where the last one ended, or bare; who and when are always now. */
export function measurementFrom(
  last: Measurement | undefined,
  { allowance, by, today }: MeasurementStart,
): Measurement {
  const bare: Measurement = {
    width: [],
    height: [],
    diagonals: [],
    thickness: null,
    allowance,
    lining: 0,
    stack: { glazing: null, airGap: null, backing: null, fixings: null },
    measuredBy: by,
    measuredOn: today,
    inFrame: false,
  }
  return { ...(last ?? bare), measuredBy: by, measuredOn: today }
}
