import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  arcFromBulge,
  arcFromCentre,
  cubicFrom,
  ellipseFrom,
  flattened,
  lengthOf,
  lineFrom,
  lineMomentsOf,
  pointFrom as at,
  segmentLengthOf,
  type Segment,
} from '@shared/geometry'
import { anyCubic, anyEllipse } from '../../helpers/arbitraries-geometry'
import { expectWithin } from '../../helpers/expect-within'

const ACCURACIES = [1e-3, 1e-5, 1e-7, 1e-9]

/** y = x² from 0 to 6 as a cubic; its length is [2x√(1+4x²) + asinh 2x]/4. */
const PARABOLA = cubicFrom(at(0, 0), at(2, 0), at(4, 12), at(6, 36))
const PARABOLA_LENGTH = (12 * Math.sqrt(145) + Math.asinh(12)) / 4

/** Perimeter of an ellipse by the arithmetic-geometric mean M: 2π/M · (a² − Σ 2ⁿ⁻¹ cₙ²), c₀² = a² − b²; another road than quadrature. */
function ellipsePerimeter(a: number, b: number): number {
  let x = a
  let y = b
  let sum = a * a - (a * a - b * b) / 2
  let power = 1
  for (let i = 0; i < 12; i += 1) {
    const c = (x - y) / 2
    ;[x, y] = [(x + y) / 2, Math.sqrt(x * y)]
    sum -= power * c * c
    power *= 2
  }
  return (2 * Math.PI * sum) / x
}

describe('segmentLengthOf', () => {
  it('of a line is Pythagoras’, of both legs', () => {
    expect(segmentLengthOf(lineFrom(at(1, 2), at(4, 6)))).toBe(5)
  })

  it.each([0.001, 0.5, Math.PI / 2, 3, 5.9])('of an arc of %d rad is radius × angle', (sweep) => {
    expectWithin(segmentLengthOf(arcFromCentre(at(3, -2), 12, 0.4, sweep)), 12 * sweep, { withinMm: 1e-12 })
    expectWithin(segmentLengthOf(arcFromCentre(at(3, -2), 12, 0.4, -sweep)), 12 * sweep, { withinMm: 1e-12 })
  })

  it('of a nearly straight arc is its chord and a little: c (1 + 2b²/3)', () => {
    for (const bulge of [0, 5e-324, 1e-200, 1e-9, 1e-4]) {
      expectWithin(
        segmentLengthOf(arcFromBulge(at(0, 0), at(10, 0), bulge)),
        10 * (1 + (2 * bulge ** 2) / 3),
        {
          withinMm: 1e-13,
        },
      )
    }
  })

  it.each(ACCURACIES)('of a parabola within %d mm', (accuracyMm) => {
    expectWithin(segmentLengthOf(PARABOLA, { accuracyMm }), PARABOLA_LENGTH, { withinMm: accuracyMm + 1e-13 })
  })

  it.each(ACCURACIES)('of half an ellipse within %d mm, however thin', (accuracyMm) => {
    for (const semiY of [10, 7, 1, 0.05, 2e-3, 2e-4, 1e-5]) {
      const half = ellipseFrom({
        centre: at(0, 0),
        semiX: 10,
        semiY,
        rotationRad: 1,
        startRad: 0,
        sweepRad: Math.PI,
      })
      expectWithin(segmentLengthOf(half, { accuracyMm }), ellipsePerimeter(10, semiY) / 2, {
        withinMm: accuracyMm + 1e-12,
      })
    }
  })

  // at its end it turns within its thinness, which every halving finds a little more of
  it.each(ACCURACIES)('of a quarter ellipse as thin as a hair within %d mm', (accuracyMm) => {
    for (const semiX of [0.1, 0.03, 0.01, 0.002, 1e-3, 3e-4]) {
      const hair = ellipseFrom({
        centre: at(0, 0),
        semiX,
        semiY: 98.142,
        startRad: -Math.PI / 2,
        sweepRad: -Math.PI / 2,
      })
      expectWithin(segmentLengthOf(hair, { accuracyMm }), ellipsePerimeter(98.142, semiX) / 4, {
        withinMm: accuracyMm + 1e-12,
      })
    }
  })

  // the curve (t³, t²) has speed t√(9t² + 4), whose integral from 0 to 1 is (13√13 − 8)/27
  it.each(ACCURACIES)('of a cusped cubic within %d mm', (accuracyMm) => {
    const cusp = cubicFrom(at(0, 0), at(0, 0), at(0, 1 / 3), at(1, 1))
    expectWithin(segmentLengthOf(cusp, { accuracyMm }), (13 * Math.sqrt(13) - 8) / 27, {
      withinMm: accuracyMm,
    })
    // run on through the cusp: t from −1 to 1, twice as long
    const through = cubicFrom(at(-1, 1), at(1, -1 / 3), at(-1, -1 / 3), at(1, 1))
    expectWithin(segmentLengthOf(through, { accuracyMm }), (2 * (13 * Math.sqrt(13) - 8)) / 27, {
      withinMm: accuracyMm,
    })
  })

  it.each(ACCURACIES)('of a straight cubic that doubles back within %d mm', (accuracyMm) => {
    // controls 0, 3, −2, 1: x′ = 3 (3 − 16t + 16t²), which vanishes at the two turning points
    const back = cubicFrom(at(0, 0), at(3, 0), at(-2, 0), at(1, 0))
    const x = (t: number) => 9 * t * (1 - t) ** 2 - 6 * t * t * (1 - t) + t ** 3
    const root = (sign: number) => (48 + sign * Math.sqrt(48 ** 2 - 4 * 48 * 9)) / 96
    const [first, second] = [root(-1), root(1)]
    const expected = x(first) + (x(first) - x(second)) + (x(1) - x(second))
    expectWithin(segmentLengthOf(back, { accuracyMm }), expected, { withinMm: accuracyMm })
  })

  it('is never less than its chords, and close to them when they are fine', () => {
    fc.assert(
      fc.property(fc.oneof(anyCubic(), anyEllipse()), (segment) => {
        const points = flattened([segment], 1e-4)
        let chords = 0
        points.slice(1).forEach((p, i) => {
          const before = points[i] ?? p
          chords += Math.hypot(p.x - before.x, p.y - before.y)
        })
        const length = segmentLengthOf(segment, { accuracyMm: 1e-8 })
        expect(length).toBeGreaterThanOrEqual(chords - 1e-7)
        expect(length - chords).toBeLessThan(0.02)
      }),
    )
  })

  it.each([0, -1, NaN])('refuses an accuracy of %d', (accuracyMm) => {
    const every: readonly Segment[] = [lineFrom(at(0, 0), at(1, 0)), PARABOLA]
    for (const segment of every) expect(() => segmentLengthOf(segment, { accuracyMm })).toThrow(/accuracy/)
  })
})

describe('lengthOf', () => {
  it('shares its accuracy out among the curves', () => {
    const path = Array.from({ length: 40 }, () => PARABOLA)
    expectWithin(lengthOf(path, { accuracyMm: 1e-6 }), 40 * PARABOLA_LENGTH, { withinMm: 1e-6 })
    expect(lengthOf([])).toBe(0)
  })
})

describe('lineMomentsOf', () => {
  // two legs 6 and 8 along the axes: ((6·3 + 8·6)/14, (8·4)/14)
  it('of two legs weighs each by its length', () => {
    const { length, centroid } = lineMomentsOf([lineFrom(at(0, 0), at(6, 0)), lineFrom(at(6, 0), at(6, 8))])
    expect(length).toBe(14)
    expectWithin(centroid.x, 66 / 14, { withinMm: 1e-12 })
    expectWithin(centroid.y, 32 / 14, { withinMm: 1e-12 })
  })

  // an arc's centroid lies at r sin h / h from the centre on the axis of symmetry
  it.each([1e-5, 0.05, 0.07, 1, 3, 5])('of an arc of %d rad lies r·sin h/h from the centre', (sweep) => {
    const h = sweep / 2
    const { centroid } = lineMomentsOf([arcFromCentre(at(0, 0), 10, -h, sweep)])
    expectWithin(centroid.x, (10 * Math.sin(h)) / h, { withinMm: 1e-13 * 100 })
    expectWithin(centroid.y, 0, { withinMm: 1e-12 })
  })

  // a half circle written as an ellipse must agree with the closed form of the arc: 2r/π
  it.each(ACCURACIES)('of an ellipse that is a circle is the circle’s within %d mm', (accuracyMm) => {
    const half = ellipseFrom({ centre: at(50, 60), semiX: 10, semiY: 10, startRad: 0, sweepRad: Math.PI })
    const { centroid } = lineMomentsOf([half], { accuracyMm })
    expectWithin(centroid.x, 50, { withinMm: accuracyMm })
    expectWithin(centroid.y, 60 + 20 / Math.PI, { withinMm: accuracyMm })
  })

  // arc length centroid of y = x² on 0…6: ∫x√(1+4x²)dx = [(1+4x²)^1.5]/12
  it.each(ACCURACIES)('of a parabola within %d mm', (accuracyMm) => {
    const { centroid } = lineMomentsOf([PARABOLA], { accuracyMm })
    expectWithin(centroid.x, (145 ** 1.5 - 1) / 12 / PARABOLA_LENGTH, { withinMm: accuracyMm + 1e-12 })
  })

  it('of a path of no length is its start', () => {
    expect(lineMomentsOf([lineFrom(at(3, 4), at(3, 4))])).toEqual({ length: 0, centroid: at(3, 4) })
    expect(() => lineMomentsOf([])).toThrow(/without segments/)
  })
})
