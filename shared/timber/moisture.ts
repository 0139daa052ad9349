import { Failure } from '@shared/failure'

/** The air of a room. */
export interface Climate {
  readonly temperatureC: number
  /** Relative humidity, per cent. */
  readonly humidityPercent: number
}

/** The temperatures that the published table of equilibrium moisture covers (Table 4-2): 30 to 270 °F, in °C. */
export const EMC_TEMPERATURES_C = { least: -10 / 9, greatest: 1190 / 9 } as const
/** The humidities that the published table covers, per cent; beyond them the equation still answers. */
export const EMC_HUMIDITIES_PERCENT = { least: 5, greatest: 95 } as const

/**
 * Equilibrium moisture content, per cent of ovendry mass: Wood Handbook (FPL-GTR-282, 2021), eq. (4-5), p. 4-3, with its
 * constants for °C. Good to about 0.1 against Table 4-2. Failure 'input-invalid' outside the table's temperatures, where
 * nothing published stands behind the equation, and for a humidity outside 0 to 100 %.
 */
export function equilibriumMoistureOf({ temperatureC: t, humidityPercent }: Climate): number {
  refuseClimate(t, humidityPercent)
  const w = 349 + 1.29 * t + 0.0135 * t * t
  const k = 0.805 + 0.000736 * t - 0.00000273 * t * t
  const k1 = 6.27 - 0.00938 * t - 0.000303 * t * t
  const k2 = 1.91 + 0.0407 * t - 0.000293 * t * t
  const a = (k * humidityPercent) / 100
  const bound = (k1 * a + 2 * k1 * k2 * a * a) / (1 + k1 * a + k1 * k2 * a * a)
  return (1800 / w) * (a / (1 - a) + bound)
}

function refuseClimate(temperatureC: number, humidityPercent: number): void {
  const { least, greatest } = EMC_TEMPERATURES_C
  if (!(temperatureC >= least && temperatureC <= greatest)) {
    refuse(
      '/temperature',
      `The temperature is ${temperatureC} °C; the published moisture table runs from ${least.toFixed(1)} to ${greatest.toFixed(1)} °C, give one between them.`,
    )
  }
  if (!(humidityPercent >= 0 && humidityPercent <= 100)) {
    refuse('/humidity', `The relative humidity is ${humidityPercent} %; give one from 0 to 100 %.`)
  }
}

function refuse(path: string, says: string): never {
  throw new Failure('input-invalid', { says, faults: [{ path, code: 'out-of-range', says }] })
}
