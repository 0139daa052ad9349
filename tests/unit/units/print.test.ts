import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  mmFromSixtyFourths,
  parseLength,
  plusMinus95,
  printArea,
  printLength,
  printLengthExact,
  printMass,
  printNumber,
  printPlusMinus,
  printVolume,
  standardDeviationFrom95,
  type InchDivision,
  type LengthUnit,
} from '@shared/units'

const readBack = (text: string, unit: LengthUnit): number => {
  const parsed = parseLength(text, unit)
  if (parsed.kind !== 'length') throw new Error(`${text}: ${parsed.says}`)
  return parsed.mm
}

const anyUnit = () => fc.constantFrom<LengthUnit>('mm', 'in')
const anyLengthMm = () => fc.double({ min: -1e6, max: 1e6, noNaN: true })

describe('printLength', () => {
  it.each<[number, Parameters<typeof printLength>[1], string]>([
    [84.1375, { unit: 'mm' }, '84.14 mm'],
    [84.1375, { unit: 'mm', places: 1 }, '84.1 mm'],
    [84, { unit: 'mm', places: 0 }, '84 mm'],
    [1234567.891, { unit: 'mm', withUnit: false }, '1234567.89'],
    [84.1375, { unit: 'in' }, '3 5/16"'],
    [-84.1375, { unit: 'in' }, '-3 5/16"'],
    [7.9375, { unit: 'in' }, '5/16"'],
    [-7.9375, { unit: 'in' }, '-5/16"'],
    [25.4, { unit: 'in' }, '1"'],
    [12.7, { unit: 'in', withUnit: false }, '1/2'],
    [25.35, { unit: 'in', fraction: 64 }, '1"'],
    [84.5, { unit: 'in', fraction: 8 }, '3 3/8"'],
    [84.1375, { unit: 'in', places: 3 }, '3.313"'],
    [0, { unit: 'mm' }, '0.00 mm'],
    [-0, { unit: 'mm' }, '0.00 mm'],
    [-0.001, { unit: 'mm' }, '0.00 mm'],
    [-0.001, { unit: 'in' }, '0"'],
    [0, { unit: 'in' }, '0"'],
  ])('prints %d mm with %j as %s', (mm, options, text) => {
    expect(printLength(mm, options)).toBe(text)
  })

  it.each([NaN, Infinity, -Infinity])('refuses %d', (value) => {
    expect(() => printLength(value, { unit: 'mm' })).toThrow(/not a number/)
    expect(() => printLength(value, { unit: 'in' })).toThrow(/not a length/)
    expect(() => printLengthExact(value, 'mm')).toThrow(/not a length/)
  })

  it('is read back exactly for every decimal of so many places', () => {
    fc.assert(
      fc.property(fc.integer({ min: -1e8, max: 1e8 }), fc.integer({ min: 0, max: 6 }), (steps, places) => {
        const mm = Number(`${steps}e-${places}`)
        expect(readBack(printLength(mm, { unit: 'mm', places }), 'mm')).toBe(mm === 0 ? 0 : mm)
        expect(readBack(printLength(mm, { unit: 'mm', places, withUnit: false }), 'mm')).toBe(
          mm === 0 ? 0 : mm,
        )
      }),
    )
  })

  it('is read back exactly for every whole number of 64ths of an inch', () => {
    fc.assert(
      fc.property(fc.integer({ min: -1e6, max: 1e6 }), (sixtyFourths) => {
        const mm = mmFromSixtyFourths(sixtyFourths)
        expect(readBack(printLength(mm, { unit: 'in' }), 'in')).toBe(mm === 0 ? 0 : mm)
      }),
    )
  })

  it('is read back within half the last place for every other length', () => {
    fc.assert(
      fc.property(anyLengthMm(), fc.integer({ min: 0, max: 6 }), (mm, places) => {
        const off = Math.abs(readBack(printLength(mm, { unit: 'mm', places }), 'mm') - mm)
        expect(off).toBeLessThanOrEqual(0.5 * 10 ** -places + 1e-9)
      }),
    )
    fc.assert(
      fc.property(anyLengthMm(), fc.constantFrom<InchDivision>(64, 32, 16, 8), (mm, fraction) => {
        const off = Math.abs(readBack(printLength(mm, { unit: 'in', fraction }), 'in') - mm)
        expect(off).toBeLessThanOrEqual(25.4 / fraction / 2 + 1e-9)
      }),
    )
  })
})

describe('printLengthExact', () => {
  it.each<[number, LengthUnit, string]>([
    [84.1, 'mm', '84.1 mm'],
    [1e-7, 'mm', '0.0000001 mm'],
    [-1.5e-7, 'mm', '-0.00000015 mm'],
    [1e9, 'mm', '1000000000 mm'],
    [0, 'mm', '0 mm'],
    [-0, 'in', '0"'],
    [84.1375, 'in', '3.3125"'],
    [-25.4, 'in', '-1"'],
  ])('prints %d mm in %s as %s', (mm, unit, text) => expect(printLengthExact(mm, unit)).toBe(text))

  it('is read back as the very same double', () => {
    fc.assert(
      fc.property(fc.double({ min: -1e9, max: 1e9, noNaN: true }), anyUnit(), (mm, unit) => {
        expect(readBack(printLengthExact(mm, unit), unit)).toBe(mm === 0 ? 0 : mm)
      }),
      { numRuns: 2000 },
    )
    fc.assert(
      fc.property(anyLengthMm(), anyUnit(), (mm, unit) => {
        expect(readBack(printLengthExact(mm, unit), unit)).toBe(mm === 0 ? 0 : mm)
      }),
      { numRuns: 2000 },
    )
  })
})

describe('other quantities', () => {
  it('print with a point, no thousands comma and no −0', () => {
    expect(printNumber(1234567.5, 1)).toBe('1234567.5')
    expect(printNumber(-0.04, 1)).toBe('0.0')
    expect(printNumber(-0, 0)).toBe('0')
    expect(printNumber(-0.05, 2)).toBe('-0.05')
  })

  // 1 in² = 645.16 mm², 1 in³ = 16 387.064 mm³, 1 lb = 0.453 592 37 kg
  it('print in the units of the workshop', () => {
    expect(printArea(645.16, { unit: 'mm' })).toBe('645.2 mm²')
    expect(printArea(645.16, { unit: 'in' })).toBe('1.000 in²')
    expect(printVolume(8_000_000, { unit: 'mm' })).toBe('8.00 dm³')
    expect(printVolume(163_870.64, { unit: 'in' })).toBe('10.0 in³')
    expect(printMass(0.45359237, { unit: 'in' })).toBe('1.00 lb')
    expect(printMass(4.2, { unit: 'mm', places: 1 })).toBe('4.2 kg')
  })

  it('print ± as twice the standard deviation, and take it back', () => {
    expect(plusMinus95(0.2)).toBe(0.4)
    expect(standardDeviationFrom95(0.4)).toBe(0.2)
    expect(printPlusMinus(0.2, { unit: 'mm' })).toBe('±0.40 mm')
    expect(printPlusMinus(0.254, { unit: 'in' })).toBe('±0.020"')
  })
})
