import { expect } from 'vitest'

/** How far a measured value may lie from the expected one; the unit is part of the name. */
export type Within =
  | { readonly withinMm: number }
  | { readonly withinMm2: number }
  | { readonly withinMm3: number }
  | { readonly withinMm4: number }
  | { readonly withinRad: number }
  | { readonly withinDeg: number }
  | { readonly withinRatio: number }
  | { readonly within: number }

/**
 * The only comparison of floating-point numbers in the tests: |actual − expected| ≤ the stated amount.
 * withinRatio is relative to |expected|. Not a number is never within anything.
 */
export function expectWithin(actual: number, expected: number, within: Within): void {
  const allowed = 'withinRatio' in within ? within.withinRatio * Math.abs(expected) : Object.values(within)[0]
  const off = Math.abs(actual - expected)
  expect(
    allowed !== undefined && allowed >= 0 && off <= allowed,
    `expected ${actual} to lie within ${allowed} of ${expected}; it is ${off} off`,
  ).toBe(true)
}
