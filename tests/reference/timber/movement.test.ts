import { describe, expect, it } from 'vitest'
import { mitreGapOf, movementOf, requireSpecies } from '@shared/timber'
import { expectWithin } from '../../helpers/expect-within'
import data from '../data/wood-movement.json'

const MM_PER_INCH = 25.4

describe('movement coefficients, Wood Handbook (FPL-GTR-190, 2010), Table 13-5', () => {
  it.each(data.coefficients.rows)('$species: $radial, $tangential ($status)', (row) => {
    const { movement } = requireSpecies(row.species)
    expect([movement.radial.value, movement.tangential.value]).toEqual([row.radial, row.tangential])
    // White fir's radial figure stands in the text of p. 13-17, which is read; only its tangential one is worked back.
    expect(movement.tangential.status).toBe(row.status)
    if (row.species !== 'white-fir') expect(movement.radial.status).toBe(row.status)
  })
})

describe('shrinkage, Wood Handbook (FPL-GTR-190, 2010), Table 4-3', () => {
  it.each(data.shrinkage.rows)('$species: $radial, $tangential ($status)', (row) => {
    const { shrinkage } = requireSpecies(row.species)
    expect([shrinkage.radial.value, shrinkage.tangential.value]).toEqual([row.radial, row.tangential])
    expect([shrinkage.radial.status, shrinkage.tangential.status]).toEqual([row.status, row.status])
  })

  // Computed, for plausibility: over the 24 points that are left of 30 % less 6, a coefficient is about S/30 and a little more.
  it.each(['basswood', 'black-cherry', 'white-ash', 'beech', 'black-walnut', 'yellow-poplar', 'white-oak'])(
    '%s: coefficient over tangential shrinkage lies between 0.0348 and 0.0362',
    (key) => {
      const { movement, shrinkage } = requireSpecies(key)
      const ratio = movement.tangential.value / (shrinkage.tangential.value / 100)
      expectWithin(ratio, 0.0355, { within: 0.00075 })
    },
  )
})

describe('worked examples of movement', () => {
  // Wood Handbook pp. 13-16 and 13-17 (end read, start from memory): white fir, flat-grained, 9.15 in (232 mm), 8 to 11 %.
  it('white fir: 0.067 in on 9.15 in, final 9.217 in', () => {
    const widthMm = 9.15 * MM_PER_INCH
    const { changeMm, method } = movementOf({
      species: 'white-fir',
      cut: 'flat',
      widthMm,
      fromPercent: 8,
      toPercent: 11,
    })
    expect(method).toBe('coefficient')
    expectWithin(changeMm / MM_PER_INCH, 0.067, { within: 0.0005 })
    expectWithin(changeMm, 1.7, { withinMm: 0.05 })
    expectWithin((widthMm + changeMm) / MM_PER_INCH, 9.217, { within: 0.0005 })
    // In millimetres the book starts from 232, which is 9.15 in rounded down.
    expectWithin((232 * (widthMm + changeMm)) / widthMm, 233.7, { withinMm: 0.05 })
  })

  // The same page: thickness of that board moves by 0.00112.
  it('white fir: its thickness moves by the radial coefficient', () => {
    const { changeMm } = movementOf({
      species: 'white-fir',
      cut: 'flat',
      direction: 'thickness',
      widthMm: 100,
      fromPercent: 8,
      toPercent: 11,
    })
    expectWithin(changeMm, 100 * 0.00112 * 3, { withinMm: 1e-12 })
  })

  // Eq. (13-3), form from memory; computed: D 100, S 8, 12 to 6 % gives −600/(375 − 30 + 12) = −1.681. Western redcedar
  // quarter-sawn has S 2.4 and C; outside 6 to 14 %: 12 to 5 %, −700/(1250 − 30 + 12) = −0.568.
  it('outside 6 to 14 % the straight line of eq. (13-3)', () => {
    const { changeMm, method } = movementOf({
      species: 'western-redcedar',
      cut: 'quarter',
      widthMm: 100,
      fromPercent: 12,
      toPercent: 5,
    })
    expect(method).toBe('shrinkage')
    expectWithin(changeMm, -700 / 1232, { withinMm: 1e-12 })
  })

  // Computed: a mitred rectangle of rails 60 mm wide, drawn swollen by 0.3 mm with its lengths kept, measured across the corner.
  it.each([3, 4, 6, 8])('the opening of a mitre of %i sides, drawn and measured', (sides) => {
    const [widthMm, changeMm] = [60, 0.3]
    const mitre = Math.PI / sides
    const turned = Math.atan((widthMm * Math.tan(mitre)) / (widthMm + changeMm))
    const across = 2 * (mitre - turned) * (widthMm / Math.cos(mitre))
    expectWithin(mitreGapOf(changeMm, sides), across, { withinRatio: 0.01 })
  })
})
