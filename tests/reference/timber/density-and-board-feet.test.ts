import { describe, expect, it } from 'vitest'
import {
  NOMINAL_THICKNESSES,
  basicGravityFrom,
  boardFeetOf,
  densityFromGravity,
  gravityFromBasic,
  nominalThicknessMmOf,
  requireSpecies,
} from '@shared/timber'
import { expectWithin } from '../../helpers/expect-within'

const MM_PER_INCH = 25.4
const FOOT_MM = 12 * MM_PER_INCH

describe('density', () => {
  // Wood Handbook, ch. 4 (second-party): specific gravity 0.40 at 12 % is 448 kg/m³, 27.968 lb/ft³.
  it('gravity 0.40 at 12 % is 448 kg/m³', () => {
    const density = densityFromGravity(0.4, 12)
    expectWithin(density, 448, { within: 1e-9 })
    expectWithin((density / 1000) * 62.43, 27.968, { within: 0.001 })
  })

  // Simpson, FPL-GTR-76 (1993), form from memory; computed: basic 0.50 is 0.5432 at 12 %.
  it('basic gravity 0.50 is 0.5432 at 12 %, and back', () => {
    expectWithin(gravityFromBasic(0.5, 12), 0.5432, { within: 0.00005 })
    expectWithin(basicGravityFrom(gravityFromBasic(0.5, 12), 12), 0.5, { within: 1e-12 })
  })

  // The second form in print (second-party), from ovendry gravity: 62.4·G/(1 + 0.009·G·m)·(1 + m/100); 0.50 at 12 % is 33.154 lb/ft³.
  it('agrees with the form from ovendry gravity within a hundredth', () => {
    const ovendry = 0.5
    const basic = basicGravityFrom(ovendry, 0)
    const density = densityFromGravity(gravityFromBasic(basic, 12), 12)
    expectWithin((density / 1000) * 62.4, 33.154, { withinRatio: 0.01 })
  })

  // Specific gravity at 12 %, Wood Handbook Tables 5-3 (second-party).
  it.each([
    ['red-oak', 0.63],
    ['white-oak', 0.68],
    ['sugar-maple', 0.63],
    ['black-walnut', 0.55],
    ['black-cherry', 0.5],
    ['white-ash', 0.6],
    ['yellow-poplar', 0.42],
    ['eastern-white-pine', 0.35],
    ['beech', 0.64],
    ['yellow-birch', 0.62],
    ['red-maple', 0.54],
    ['douglas-fir', 0.48],
    ['basswood', 0.37],
    ['butternut', 0.38],
    ['chestnut', 0.43],
  ])('%s has %f at 12 %%', (key, gravity) => {
    expect(requireSpecies(key).gravity).toEqual({ value: gravity, status: 'second-party', at: 12 })
  })

  // From memory of the same tables.
  it.each([
    ['ponderosa-pine', 0.4, 12],
    ['mahogany', 0.45, 'green'],
  ])('%s has %f', (key, value, at) => {
    expect(requireSpecies(key).gravity).toEqual({ value, status: 'from memory', at })
  })
})

describe('board feet', () => {
  const boardFeet = (thicknessIn: 1 | 1.5 | 2, widthIn: number, lengthMm: number) => {
    const nominal = ({ 1: '4/4', 1.5: '6/4', 2: '8/4' } as const)[thicknessIn]
    return boardFeetOf({ nominal, layers: 1, widthMm: widthIn * MM_PER_INCH }, lengthMm)
  }

  // A woodworking page's examples, thickness × width × length in inches ÷ 144 (read): 1 × 9 × 96 is 6, 1½ × 9 × 96 is 9.
  it('1 × 9 × 96 in is 6, 1½ × 9 × 96 in is 9', () => {
    expectWithin(boardFeet(1, 9, 96 * MM_PER_INCH), 6, { within: 1e-9 })
    expectWithin(boardFeet(1.5, 9, 96 * MM_PER_INCH), 9, { within: 1e-9 })
  })

  // The American hardwood rules (NHLA, read): 6¼ in × 8 ft has a surface of 4 1/6, tallied as 4; 2 in thick the tally is 8. Here nothing is rounded.
  it('6¼ in × 8 ft × 2 in is 8⅓ before the tally rounds it to 8', () => {
    const exact = boardFeet(2, 6.25, 8 * FOOT_MM)
    expectWithin(exact, 2 * (4 + 1 / 6), { within: 1e-9 })
    expectWithin(2 * Math.round(exact / 2), 8, { within: 0 })
  })

  // The same rules in an importer's words (read): 6½ × 8 is 4⅓, 8 × 12 is 8, 10 × 13 is 10 10/12.
  it.each([
    [6.5, 8, 4 + 1 / 3],
    [8, 12, 8],
    [10, 13, 10 + 10 / 12],
  ])('%f in × %f ft × 1 in', (widthIn, lengthFt, expected) => {
    expectWithin(boardFeet(1, widthIn, lengthFt * FOOT_MM), expected, { within: 1e-9 })
  })

  // Metric figures of the export trade (from memory), printed to a tenth: 25.4, 31.8, 38.1, 50.8.
  it('quarters in millimetres', () => {
    const printed = [25.4, 31.8, 38.1, 50.8]
    NOMINAL_THICKNESSES.slice(0, 4).forEach((nominal, index) =>
      expectWithin(nominalThicknessMmOf(nominal), printed[index] ?? Number.NaN, { withinMm: 0.0501 }),
    )
  })
})
