import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  EMC_TEMPERATURES_C,
  FIBRE_SATURATION_PERCENT,
  equilibriumMoistureOf,
  timberCautionsOf,
} from '@shared/timber'
import { expectWithin } from '../../helpers/expect-within'

describe('equilibriumMoistureOf', () => {
  it('is 0 in air without any moisture', () => {
    expectWithin(equilibriumMoistureOf({ temperatureC: 20, humidityPercent: 0 }), 0, { within: 0 })
  })

  it('rises with humidity', () => {
    const humidity = fc.double({ min: 0, max: 99, noNaN: true })
    const temperature = fc.double({ min: 0, max: 40, noNaN: true })
    fc.assert(
      fc.property(humidity, temperature, (humidityPercent, temperatureC) => {
        const drier = equilibriumMoistureOf({ temperatureC, humidityPercent })
        const damper = equilibriumMoistureOf({ temperatureC, humidityPercent: humidityPercent + 1 })
        expect(damper).toBeGreaterThan(drier)
      }),
    )
  })

  it('stays within what movement can take, over the whole range it answers for', () => {
    const { least, greatest } = EMC_TEMPERATURES_C
    fc.assert(
      fc.property(
        fc.double({ min: least, max: greatest, noNaN: true }),
        fc.double({ min: 0, max: 100, noNaN: true }),
        (temperatureC, humidityPercent) => {
          const moisture = equilibriumMoistureOf({ temperatureC, humidityPercent })
          expect(moisture).toBeGreaterThanOrEqual(0)
          expect(moisture).toBeLessThanOrEqual(FIBRE_SATURATION_PERCENT)
        },
      ),
    )
  })

  it.each([
    [-5, 50, /-1\.1 to 132\.2 °C/],
    [140, 50, /-1\.1 to 132\.2 °C/],
    [Number.NaN, 50, /temperature is NaN/],
    [20, -1, /0 to 100 %/],
    [20, 100.5, /0 to 100 %/],
    [20, Number.NaN, /humidity is NaN/],
  ])('refuses %f °C, %f %%', (temperatureC, humidityPercent, says) => {
    expect(() => equilibriumMoistureOf({ temperatureC, humidityPercent })).toThrow(says)
  })
})

describe('timberCautionsOf', () => {
  const climate = { temperatureC: 20, humidityPercent: 50 }

  it('defers hanging to the institution whenever a mass is told', () => {
    const cautions = timberCautionsOf({ species: 'basswood', climates: [climate], hasMass: true })
    expect(cautions.join(' ')).toMatch(/institution’s own rigging practice/)
  })

  it('says when a figure is from memory, a moisture outside 6 to 14 % or a humidity beyond the table', () => {
    const cautions = timberCautionsOf({
      species: 'mahogany',
      climates: [{ temperatureC: 20, humidityPercent: 97 }],
      hasMass: true,
      movement: { changeMm: 1, method: 'shrinkage', status: 'from memory' },
    })
    const all = cautions.join('\n')
    expect(all).toMatch(/The density of Mahogany is given from memory/)
    expect(all).toMatch(/The movement of Mahogany is given from memory/)
    expect(all).toMatch(/outside 6 to 14 %/)
    expect(all).toMatch(/outside 5 to 95 %/)
  })

  it('has nothing to add to moistures alone', () => {
    expect(timberCautionsOf({ species: 'mahogany', climates: [climate], hasMass: false })).toEqual([])
  })
})
