import { Failure } from '@shared/failure'
import { FIBRE_SATURATION_PERCENT } from './movement'
import { requireSpecies } from './species'

/** Moisture at which mass is told when no climate is given, per cent. */
export const USUAL_MOISTURE_PERCENT = 12
const WATER_KG_PER_M3 = 1000
const MM3_PER_M3 = 1e9

/**
 * Specific gravity at a moisture (ovendry mass, volume at that moisture) from the basic one (volume green):
 * G = Gb / (1 − 0.265·a·Gb) with a = (30 − M)/30, and a = 0 from 30 % up. Simpson, FPL-GTR-76 (1993).
 */
export function gravityFromBasic(basicGravity: number, moisturePercent: number): number {
  return basicGravity / (1 - 0.265 * drynessOf(moisturePercent) * basicGravity)
}

/** The same relation turned round: the basic specific gravity of wood whose gravity at a moisture is known. */
export function basicGravityFrom(gravity: number, moisturePercent: number): number {
  return gravity / (1 + 0.265 * drynessOf(moisturePercent) * gravity)
}

/** Density of wood and its water, kg/m³: ρ = 1000·G·(1 + M/100), G at that moisture. Wood Handbook, ch. 4, density. */
export function densityFromGravity(gravity: number, moisturePercent: number): number {
  return WATER_KG_PER_M3 * gravity * (1 + moisturePercent / 100)
}

/** Density of a species at a moisture, kg/m³, the mean of the species: a piece of it may be a tenth and more heavier or lighter. */
export function densityOf(speciesKey: string, moisturePercent: number = USUAL_MOISTURE_PERCENT): number {
  if (!(moisturePercent >= 0 && moisturePercent <= 300)) {
    const says = `The moisture content is ${moisturePercent} %; give one from 0 to 300 %.`
    throw new Failure('input-invalid', { says, faults: [{ path: '/moisture', code: 'out-of-range', says }] })
  }
  const { gravity } = requireSpecies(speciesKey)
  if (moisturePercent === gravity.at) return densityFromGravity(gravity.value, moisturePercent)
  const basic = gravity.at === 'green' ? gravity.value : basicGravityFrom(gravity.value, gravity.at)
  return densityFromGravity(gravityFromBasic(basic, moisturePercent), moisturePercent)
}

/** Mass of a volume of wood, kg; the volume, mm³, as it is at that moisture. */
export function massOf(
  volumeMm3: number,
  speciesKey: string,
  moisturePercent: number = USUAL_MOISTURE_PERCENT,
): number {
  return (volumeMm3 / MM3_PER_M3) * densityOf(speciesKey, moisturePercent)
}

/** How far below fibre saturation, as a fraction of it. */
const drynessOf = (moisturePercent: number) =>
  Math.max(0, FIBRE_SATURATION_PERCENT - moisturePercent) / FIBRE_SATURATION_PERCENT
