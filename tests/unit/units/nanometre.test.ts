import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  mmFromNanometres,
  mmFromSixtyFourths,
  nanometresDown,
  nanometresFrom,
  nanometresUp,
} from '@shared/units'

describe('nanometres', () => {
  it('hold 1/64 in and its multiples exactly: 396 875 nm', () => {
    const wrong = Array.from({ length: 64 * 240 }, (_, n) => n).filter((n) => {
      const mm = mmFromSixtyFourths(n)
      return nanometresUp(mm) !== n * 396_875 || nanometresDown(mm) !== n * 396_875
    })
    expect(wrong).toEqual([])
  })

  it('take the double nearest to a decimal of six places as that decimal, up and down', () => {
    expect(nanometresUp(1119.1)).toBe(1_119_100_000)
    expect(nanometresDown(1119.1)).toBe(1_119_100_000)
    fc.assert(
      fc.property(fc.integer({ min: -1e15, max: 1e15 }), (whole) => {
        const mm = Number(`${whole}e-6`)
        expect(nanometresUp(mm)).toBe(whole)
        expect(nanometresDown(mm)).toBe(whole)
        expect(mmFromNanometres(nanometresUp(mm))).toBe(mm)
      }),
      { numRuns: 2000 },
    )
  })

  it('take the noise of a sum of doubles for what it is', () => {
    const sum = 0.1 + 0.2 // 0.30000000000000004
    expect(nanometresUp(sum)).toBe(300_000)
    expect(nanometresDown(1119.1 - 1e-12)).toBe(1_119_100_000)
  })

  it('else round needs up and stock down', () => {
    expect(nanometresUp(1.0000001)).toBe(1_000_001)
    expect(nanometresDown(1.0000009)).toBe(1_000_000)
    expect(nanometresUp(-1.0000009)).toBe(-1_000_000)
    expect(nanometresDown(-1.0000001)).toBe(-1_000_001)
    fc.assert(
      fc.property(fc.double({ min: 0, max: 1e5, noNaN: true }), (mm) => {
        const up = nanometresUp(mm)
        const down = nanometresDown(mm)
        expect(up - down === 0 || up - down === 1).toBe(true)
        expect(up / 1e6).toBeGreaterThanOrEqual(mm - 2e-9)
        expect(down / 1e6).toBeLessThanOrEqual(mm + 2e-9)
      }),
    )
  })

  it.each([NaN, Infinity, -Infinity, 1.1e9, 1e308])('refuse %d mm', (mm) => {
    expect(() => nanometresUp(mm)).toThrow(/not a length/)
    expect(() => nanometresDown(mm)).toThrow(/not a length/)
  })

  it.each([1.5, NaN, 2 ** 53])('refuse %d as a whole number', (value) => {
    expect(() => nanometresFrom(value)).toThrow(/not a whole number/)
  })
})
