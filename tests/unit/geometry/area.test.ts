import { describe, expect, it } from 'vitest'
import {
  arcFromBulge,
  arcFromCentre,
  arcFromSweep,
  areaMomentsOf,
  cubicFrom,
  ellipseFrom,
  lineFrom,
  movedBy,
  pointFrom as at,
  quarterEllipseFrom,
  signedAreaOf,
  type Outline,
} from '@shared/geometry'
import { expectWithin } from '../../helpers/expect-within'

const rectangle = (w: number, h: number): Outline => [
  lineFrom(at(0, 0), at(w, 0)),
  lineFrom(at(w, 0), at(w, h)),
  lineFrom(at(w, h), at(0, h)),
  lineFrom(at(0, h), at(0, 0)),
]

/** A sector about the origin from 0 to the sweep. */
const sector = (r: number, sweep: number): Outline => {
  const arc = arcFromCentre(at(0, 0), r, 0, sweep)
  return [lineFrom(at(0, 0), arc.start), arc, lineFrom(arc.end, at(0, 0))]
}

describe('signedAreaOf', () => {
  it('of a rectangle is width × height, negative clockwise', () => {
    expect(signedAreaOf(rectangle(30, 20))).toBe(600)
    expect(signedAreaOf([...rectangle(30, 20)].reverse().map((s) => lineFrom(s.end, s.start)))).toBe(-600)
  })

  // a sector of half angle h in radians is r² h: exact for any sweep, acute or reflex
  it.each([0.1, 0.7, 1, Math.PI / 2, 2, 3, Math.PI, 4, 5.5])(
    'of a sector of %d rad is r²·angle/2',
    (sweep) => {
      expectWithin(signedAreaOf(sector(10, sweep)), 50 * sweep, { withinMm2: 1e-12 })
      expectWithin(signedAreaOf(sector(10, -sweep)), -50 * sweep, { withinMm2: 1e-12 })
    },
  )

  it('of a half disc hollowed out of a rectangle is taken away', () => {
    const hollow = arcFromBulge(at(20, 10), at(0, 10), -1) // turns right: bulges into the wood
    const outline = [
      lineFrom(at(0, 0), at(20, 0)),
      lineFrom(at(20, 0), at(20, 10)),
      hollow,
      lineFrom(at(0, 10), at(0, 0)),
    ]
    expectWithin(signedAreaOf(outline), 200 - (Math.PI * 100) / 2, { withinMm2: 1e-12 })
  })

  it('of the flattest cap keeps all its digits', () => {
    // cap = c² (1+b²)²/(32 b²) · (s − sin s), s = 4 atan b; for small b this is c² (b/3)(1 + b²/5 + …)
    for (const bulge of [1e-2, 1e-4, 1e-6, 1e-9, 1e-10, 1e-200, 5e-324]) {
      const cap = signedAreaOf([arcFromBulge(at(0, 0), at(10, 0), bulge), lineFrom(at(10, 0), at(0, 0))])
      expectWithin(cap, (100 * bulge * (1 + bulge ** 2 / 5)) / 3, { withinRatio: 1e-9 + bulge ** 4 })
    }
  })

  // a tilted quarter of an ellipse has a quarter of π a b whatever the tilt
  it('of an elliptical sector is a·b·sweep/2', () => {
    const ellipse = ellipseFrom({
      centre: at(5, 7),
      semiX: 8,
      semiY: 3,
      rotationRad: 0.6,
      startRad: 0.3,
      sweepRad: 2.1,
    })
    const outline = [lineFrom(at(5, 7), ellipse.start), ellipse, lineFrom(ellipse.end, at(5, 7))]
    expectWithin(signedAreaOf(outline), (24 * 2.1) / 2, { withinMm2: 1e-12 })
  })

  // y = x² from 0 to 6: the cubic (0,0) (2,0) (4,12) (6,36) is that parabola; ∫x² = 72 below it
  it('under a parabola written as a cubic is a third of its rectangle', () => {
    const parabola = cubicFrom(at(0, 0), at(2, 0), at(4, 12), at(6, 36))
    const under = [
      lineFrom(at(0, 0), at(6, 0)),
      lineFrom(at(6, 0), at(6, 36)),
      cubicFrom(at(6, 36), at(4, 12), at(2, 0), at(0, 0)),
    ]
    expectWithin(signedAreaOf(under), 72, { withinMm2: 1e-12 })
    expectWithin(signedAreaOf([parabola, lineFrom(at(6, 36), at(0, 0))]), 36, { withinMm2: 1e-12 })
  })

  it('loses nothing far from the origin', () => {
    expectWithin(signedAreaOf(movedBy(sector(10, 2), at(1e6, -1e6))), 100, { withinMm2: 1e-8 })
  })
})

describe('areaMomentsOf', () => {
  // ∫x = w²h/2, ∫x² = w³h/3, ∫xy = w²h²/4; about the centroid w³h/12, 0
  it('of a rectangle', () => {
    const m = areaMomentsOf(rectangle(30, 20))
    expectWithin(m.firstX, 9000, { withinMm3: 1e-9 })
    expectWithin(m.firstY, 6000, { withinMm3: 1e-9 })
    expectWithin(m.secondXX, 180_000, { withinMm4: 1e-7 })
    expectWithin(m.secondYY, 80_000, { withinMm4: 1e-7 })
    expectWithin(m.secondXY, 90_000, { withinMm4: 1e-7 })
    expectWithin(m.centralXX, 45_000, { withinMm4: 1e-7 })
    expectWithin(m.centralYY, 20_000, { withinMm4: 1e-7 })
    expectWithin(m.centralXY, 0, { withinMm4: 1e-7 })
    expect(m.centroid).toEqual(at(15, 10))
  })

  // polar integrals of a sector 0…s of radius r: ∫x = r³ sin s/3, ∫y = r³ (1 − cos s)/3, ∫x² = r⁴ (s/2 + sin 2s/4)/4,
  // ∫y² = r⁴ (s/2 − sin 2s/4)/4, ∫xy = r⁴ sin² s/8
  it.each([0.05, 0.2, 0.45, 0.55, 1, 2, Math.PI, 4.4, 5.9])(
    'of a sector of %d rad by polar integrals',
    (s) => {
      const r = 7
      const m = areaMomentsOf(sector(r, s))
      expectWithin(m.firstX, (r ** 3 * Math.sin(s)) / 3, { withinMm3: 1e-11 })
      expectWithin(m.firstY, (r ** 3 * (1 - Math.cos(s))) / 3, { withinMm3: 1e-11 })
      expectWithin(m.secondXX, (r ** 4 * (s / 2 + Math.sin(2 * s) / 4)) / 4, { withinMm4: 1e-10 })
      expectWithin(m.secondYY, (r ** 4 * (s / 2 - Math.sin(2 * s) / 4)) / 4, { withinMm4: 1e-10 })
      expectWithin(m.secondXY, (r ** 4 * Math.sin(s) ** 2) / 8, { withinMm4: 1e-10 })
    },
  )

  // the flattest cap is a parabola's: centroid at 2/5 of its height from the chord (3/5 from the vertex), by symmetry at half the chord
  it('of a very flat cap is that of a parabola', () => {
    const bulge = 1e-6
    const m = areaMomentsOf([arcFromBulge(at(0, 0), at(10, 0), bulge), lineFrom(at(10, 0), at(0, 0))])
    const height = (bulge * 10) / 2
    expectWithin(m.centroid.x, 5, { withinMm: 1e-9 })
    expectWithin(m.centroid.y, -0.4 * height, { withinMm: 1e-13 })
    expectWithin(m.secondXX, m.area * (25 + 5), { withinRatio: 1e-9 }) // ∫(x−5)² over the parabola: c²/20 of its area
  })

  // quarter ellipse in the corner: ∫x = a²b/3, ∫x² = πa³b/16, ∫xy = a²b²/8
  it('of a quarter ellipse, upright and level, either way round', () => {
    const quarter = quarterEllipseFrom(at(8, 0), at(0, 3), 'upright')
    const m = areaMomentsOf([lineFrom(at(0, 0), at(8, 0)), quarter, lineFrom(at(0, 3), at(0, 0))])
    expectWithin(m.area, 6 * Math.PI, { withinMm2: 1e-12 })
    expectWithin(m.firstX, 64, { withinMm3: 1e-11 })
    expectWithin(m.firstY, 24, { withinMm3: 1e-11 })
    expectWithin(m.secondXX, (Math.PI * 512 * 3) / 16, { withinMm4: 1e-10 })
    expectWithin(m.secondXY, 72, { withinMm4: 1e-10 })
    const hollow = quarterEllipseFrom(at(8, 0), at(0, 3), 'level') // the complement: centre at (8, 3)
    const rest = areaMomentsOf([lineFrom(at(0, 0), at(8, 0)), hollow, lineFrom(at(0, 3), at(0, 0))])
    expectWithin(rest.area, 24 - 6 * Math.PI, { withinMm2: 1e-12 })
  })

  // under y = x² from 0 to 6: ∫x dA = 6⁴/4, ∫y dA = 6⁵/10, ∫x² dA = 6⁵/5, ∫y² dA = 6⁷/21, ∫xy dA = 6⁶/12
  it('under a parabola written as a cubic', () => {
    const m = areaMomentsOf([
      lineFrom(at(0, 0), at(6, 0)),
      lineFrom(at(6, 0), at(6, 36)),
      cubicFrom(at(6, 36), at(4, 12), at(2, 0), at(0, 0)),
    ])
    expectWithin(m.firstX, 324, { withinMm3: 1e-9 })
    expectWithin(m.firstY, 777.6, { withinMm3: 1e-9 })
    expectWithin(m.secondXX, 1555.2, { withinMm4: 1e-8 })
    expectWithin(m.secondYY, 279_936 / 21, { withinMm4: 1e-8 })
    expectWithin(m.secondXY, 3888, { withinMm4: 1e-8 })
  })

  it('passes over from quadrature to closed form without a step', () => {
    const cap = (sweep: number) =>
      areaMomentsOf([arcFromSweep(at(3, 4), at(13, 4), sweep), lineFrom(at(13, 4), at(3, 4))])
    const below = cap(0.5 - 1e-12)
    const above = cap(0.5 + 1e-12)
    expectWithin(above.secondXX, below.secondXX, { withinRatio: 1e-10 })
    expectWithin(above.secondYY, below.secondYY, { withinRatio: 1e-10 })
    expectWithin(above.centroid.y, below.centroid.y, { withinMm: 1e-11 })
  })

  it('refuses an outline that encloses nothing', () => {
    const line = [lineFrom(at(0, 0), at(5, 5)), lineFrom(at(5, 5), at(0, 0))]
    expect(() => areaMomentsOf(line)).toThrow(/no centroid/)
    expect(() => areaMomentsOf([])).toThrow(/without segments/)
    expect(signedAreaOf(line)).toBe(0)
  })
})
