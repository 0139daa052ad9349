import { describe, it } from 'vitest'
import { equilibriumMoistureOf } from '@shared/timber'
import { expectWithin } from '../../helpers/expect-within'
import data from '../data/equilibrium-moisture.json'

describe('equilibrium moisture, Wood Handbook (FPL-GTR-282, 2021), Table 4-2', () => {
  it.each(data.rows)(
    '$temperatureC °C, $humidityPercent %: $moisturePercent % ($status)',
    ({ moisturePercent, ...climate }) => {
      expectWithin(equilibriumMoistureOf(climate), moisturePercent, { within: data.toleranceMoisturePercent })
    },
  )

  // The handbook gives the equation twice; its constants for °F, read in a second text, are a check on those for °C.
  it.each([
    [30, 75],
    [70, 5],
    [70, 50],
    [70, 95],
    [100, 90],
    [160, 40],
  ])('%i °F, %i %%: the constants for °F agree', (fahrenheit, humidityPercent) => {
    const t = fahrenheit
    const [w, k] = [330 + 0.452 * t + 0.00415 * t * t, 0.791 + 0.000463 * t - 0.000000844 * t * t]
    const [k1, k2] = [6.34 + 0.000775 * t - 0.0000935 * t * t, 1.09 + 0.0284 * t - 0.0000904 * t * t]
    const a = (k * humidityPercent) / 100
    const bound = (k1 * a + 2 * k1 * k2 * a ** 2) / (1 + k1 * a + k1 * k2 * a ** 2)
    const expected = (1800 / w) * (a / (1 - a) + bound)
    const temperatureC = ((t - 32) * 5) / 9
    expectWithin(equilibriumMoistureOf({ temperatureC, humidityPercent }), expected, { within: 0.05 })
  })

  // The table alone would not notice a slip in a small constant: eq. (4-5) with the printed constants, written out once more.
  it.each([-1, 4.5, 15, 21.1, 37.8, 80, 130])(
    '%f °C: the printed constants, to the last digit',
    (temperatureC) => {
      const { W, K, K1, K2 } = data.constantsCelsius
      const at = (constants: readonly number[]) =>
        constants.reduce((sum, constant, power) => sum + constant * temperatureC ** power, 0)
      for (const humidityPercent of [5, 35, 65, 95]) {
        const a = at(K) * (humidityPercent / 100)
        const [first, second] = [at(K1) * a, at(K1) * at(K2) * a ** 2]
        const expected = (1800 / at(W)) * (a / (1 - a) + (first + 2 * second) / (1 + first + second))
        expectWithin(equilibriumMoistureOf({ temperatureC, humidityPercent }), expected, { within: 1e-10 })
      }
    },
  )
})
