import { describe, expect, it } from 'vitest'
import { densityOf, massOf } from '@shared/timber'
import { expectWithin } from '../../helpers/expect-within'

describe('densityOf', () => {
  // Basswood: 0.37 at 12 %, so 1000 · 0.37 · 1.12 = 414.4 kg/m³.
  it('at 12 % is the table’s gravity with its water', () => {
    expectWithin(densityOf('basswood'), 414.4, { within: 1e-9 })
    expectWithin(densityOf('basswood', 12), 414.4, { within: 1e-9 })
  })

  // Basic gravity from 0.37 at 12 %: 0.37/(1 + 0.265·0.6·0.37) = 0.349442. At 6 %, a = 0.8: 0.349442/(1 − 0.265·0.8·0.349442)
  // = 0.377401; density 1000 · 0.377401 · 1.06 = 400.045.
  it('at another moisture goes by the basic gravity', () => {
    expectWithin(densityOf('basswood', 6), 400.045, { within: 0.001 })
  })

  // Above 30 % the volume no longer changes: 1000 · 0.349442 · 1.5 at 50 %.
  it('above 30 % gains water only', () => {
    expectWithin(densityOf('basswood', 50), 524.163, { within: 0.001 })
  })

  // Mahogany is tabled green: 0.45, so at 12 % 0.45/(1 − 0.159·0.45) = 0.484679, 542.840 kg/m³.
  it('takes a gravity that is tabled green', () => {
    expectWithin(densityOf('mahogany'), 542.84, { within: 0.001 })
  })

  it('rises with moisture without a step at the table’s own 12 %', () => {
    expect(densityOf('basswood', 11.999)).toBeLessThan(densityOf('basswood'))
    expect(densityOf('basswood', 12.001)).toBeGreaterThan(densityOf('basswood'))
    expectWithin(densityOf('basswood', 12.001), densityOf('basswood'), { within: 0.01 })
  })

  it.each([-1, 301, Number.NaN])('refuses a moisture of %f %%', (percent) => {
    expect(() => densityOf('basswood', percent)).toThrow(/from 0 to 300 %/)
  })
})

describe('massOf', () => {
  // A litre of basswood at 12 %: 0.4144 kg.
  it('is volume times density', () => {
    expectWithin(massOf(1e6, 'basswood'), 0.4144, { within: 1e-12 })
  })
})
