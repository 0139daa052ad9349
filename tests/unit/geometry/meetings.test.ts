import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  arcFromBulge,
  arcFromCentre,
  arcFromSweep,
  cubicFrom,
  curvatureAt,
  ellipseFrom,
  intersectionsOf,
  lineFrom,
  nearestOnPath,
  pathIntersectionsOf,
  pointAt,
  pointFrom as at,
  reversedSegment,
  selfCrossingsOf,
  splitAt,
  subSegment,
  tangentAt,
  type Point,
  type Segment,
} from '@shared/geometry'
import { anyEllipse, anyPlainCubic, anyPoint, anySegment, sizeOf } from '../../helpers/arbitraries-geometry'
import { expectWithin } from '../../helpers/expect-within'

const placesOf = (a: Segment, b: Segment): readonly Point[] =>
  [...intersectionsOf(a, b).map(({ point }) => point)].sort((p, q) =>
    Math.abs(p.x - q.x) > 1e-3 ? p.x - q.x : p.y - q.y,
  )

/** Where curves touch, rounding leaves the place open by the root of itself; crossings are far better. */
const TOUCH_MM = 1e-6

const expectPlaces = (a: Segment, b: Segment, expected: readonly Point[]): void => {
  for (const [first, second] of [
    [a, b],
    [b, a],
    [reversedSegment(a), b],
    [b, reversedSegment(a)],
  ] as const) {
    const places = placesOf(first, second)
    expect(places.length).toBe(expected.length)
    places.forEach((place, i) => {
      expectWithin(place.x, expected[i]?.x ?? NaN, { withinMm: TOUCH_MM })
      expectWithin(place.y, expected[i]?.y ?? NaN, { withinMm: TOUCH_MM })
    })
  }
}

const CIRCLE = arcFromCentre(at(0, 0), 5, 0.1, 6.1)
const PARABOLA = cubicFrom(at(0, 0), at(2, 0), at(4, 12), at(6, 36)) // y = x²

describe('intersectionsOf', () => {
  it('two lines: a crossing, none, end to end, end on side', () => {
    expectPlaces(lineFrom(at(0, 0), at(4, 4)), lineFrom(at(0, 4), at(4, 0)), [at(2, 2)])
    expectPlaces(lineFrom(at(0, 0), at(4, 4)), lineFrom(at(5, 4), at(9, 0)), [])
    expectPlaces(lineFrom(at(0, 0), at(4, 4)), lineFrom(at(4, 4), at(9, 0)), [at(4, 4)])
    expectPlaces(lineFrom(at(0, 0), at(4, 0)), lineFrom(at(1, 0), at(1, 5)), [at(1, 0)])
    expectPlaces(lineFrom(at(0, 0), at(4, 0)), lineFrom(at(0, 1), at(4, 1)), [])
  })

  it('two lines that overlap: the ends of what they share', () => {
    expectPlaces(lineFrom(at(0, 0), at(4, 0)), lineFrom(at(1, 0), at(9, 0)), [at(1, 0), at(4, 0)])
    expectPlaces(lineFrom(at(0, 0), at(4, 0)), lineFrom(at(1, 0), at(2, 0)), [at(1, 0), at(2, 0)])
    expectPlaces(lineFrom(at(0, 0), at(4, 0)), lineFrom(at(5, 0), at(9, 0)), [])
  })

  // 3-4-5: the line y = 3 cuts the circle of radius 5 at x = ±4; y = 5 touches it
  it('line and circle: two, one, none', () => {
    expectPlaces(lineFrom(at(-9, 3), at(9, 3)), CIRCLE, [at(-4, 3), at(4, 3)])
    expectPlaces(lineFrom(at(0, 3), at(9, 3)), CIRCLE, [at(4, 3)])
    expectPlaces(lineFrom(at(-9, 5), at(9, 5)), CIRCLE, [at(0, 5)])
    expectPlaces(lineFrom(at(-9, 5.001), at(9, 5.001)), CIRCLE, [])
  })

  // circles of radius 5 about (0, 0) and (8, 0) meet at (4, ±3)
  it('two circles: two, touching from outside and inside, none', () => {
    expectPlaces(CIRCLE, arcFromCentre(at(8, 0), 5, 0.1, 6.1), [at(4, -3), at(4, 3)])
    expectPlaces(CIRCLE, arcFromCentre(at(0, 8), 3, 0.1, 6.1), [at(0, 5)])
    expectPlaces(CIRCLE, arcFromCentre(at(0, 2), 3, 0.1, 6.1), [at(0, 5)])
    expectPlaces(CIRCLE, arcFromCentre(at(0, 0), 4, 0.1, 6.1), [])
  })

  it('two arcs of one circle: the ends of what they share', () => {
    const a = arcFromCentre(at(0, 0), 5, 0, 2)
    const b = arcFromCentre(at(0, 0), 5, 1, 2)
    expectPlaces(a, b, [a.end, b.start])
    expectPlaces(a, a, [a.end, a.start])
  })

  it('nearly straight arcs are met as surely as lines', () => {
    for (const bulge of [0, 1e-12, 1e-7, 1e-4, 2e-4]) {
      const arc = arcFromBulge(at(-10, 0), at(10, 0), bulge)
      // the sagitta is bulge × half the chord, below the chord for a left turn
      expectPlaces(arc, lineFrom(at(0, -5), at(0, 5)), [at(0, -10 * bulge)])
    }
  })

  // x² = x + 2 at x = 2 (and −1, off the stretch); x² = 2x − 1 touches at x = 1
  it('a parabola with a chord and with a tangent', () => {
    expectPlaces(PARABOLA, lineFrom(at(-1, 1), at(5, 7)), [at(2, 4)])
    expectPlaces(PARABOLA, lineFrom(at(0.3, -0.4), at(1.7, 2.4)), [at(1, 1)])
    expectPlaces(PARABOLA, lineFrom(at(0.3, -0.401), at(1.7, 2.399)), [])
  })

  // x² = 2x − 1 + d at x = 1 ± √d
  it('a line that all but touches a parabola meets it twice', () => {
    for (const d of [1e-2, 1e-4, 1e-6]) {
      const line = lineFrom(at(0.3, -0.4 + d), at(1.7, 2.4 + d))
      const [low, high] = [1 - Math.sqrt(d), 1 + Math.sqrt(d)]
      expectPlaces(PARABOLA, line, [at(low, low ** 2), at(high, high ** 2)])
    }
  })

  it('a line just inside a tangent meets the curve on both sides of it', () => {
    const depth = fc.constantFrom(1e-4, 1e-5, 1e-7)
    fc.assert(
      fc.property(anyEllipse(), fc.double({ min: 0.2, max: 0.8, noNaN: true }), depth, (ellipse, t, deep) => {
        const curvature = curvatureAt(ellipse, t)
        if (Math.abs(curvature) < 0.005 || Math.abs(curvature) > 0.2) return
        const { x, y } = pointAt(ellipse, t)
        const along = tangentAt(ellipse, t)
        const inward = deep * Math.sign(curvature)
        // far enough to leave the curve by twice the depth on either side, were it a circle
        const reach = 2 * Math.sqrt((2 * deep) / Math.abs(curvature))
        const onLine = (s: number): Point =>
          at(x + along.x * s - along.y * inward, y + along.y * s + along.x * inward)
        expect(intersectionsOf(ellipse, lineFrom(onLine(-reach), onLine(reach))).length).toBe(2)
      }),
      { numRuns: 300 },
    )
  })

  it('an ellipse with a circle of its short axis touches at its two ends', () => {
    const ellipse = ellipseFrom({ centre: at(0, 0), semiX: 8, semiY: 5, startRad: 0.1, sweepRad: 6 })
    expectPlaces(ellipse, CIRCLE, [at(0, -5), at(0, 5)])
  })

  it('a curve with itself: its two ends; with a stretch of itself: the stretch’s', () => {
    expectPlaces(PARABOLA, PARABOLA, [at(0, 0), at(6, 36)])
    const stretch = subSegment(PARABOLA, 0.25, 0.75)
    expectPlaces(PARABOLA, stretch, [stretch.start, stretch.end])
  })

  // y = 5 + 8 T₃(2t − 1) over x = 10t, with Chebyshev's T₃ (Bernstein −1, 5, −5, 1), passes the square 0…10 from edge to edge three times
  it('nine crossings of two cubics are all found', () => {
    const level = cubicFrom(at(0, -3), at(10 / 3, 45), at(20 / 3, -35), at(10, 13))
    const upright = cubicFrom(at(-3, 0), at(45, 10 / 3), at(-35, 20 / 3), at(13, 10))
    expect(intersectionsOf(level, upright).length).toBe(9)
    expect(intersectionsOf(upright, level).length).toBe(9)
  })

  it('what is planted is found: two segments made to pass through one point', () => {
    fc.assert(
      fc.property(anySegment(), anySegment(), fc.double({ min: 0.05, max: 0.95, noNaN: true }), (a, b, t) => {
        const target = pointAt(a, t)
        const source = pointAt(b, 0.6)
        const shift = at(target.x - source.x, target.y - source.y)
        const shifted = shiftedBy(b, shift)
        const meetings = intersectionsOf(a, shifted)
        const off = Math.min(
          ...meetings.map(({ point }) => Math.hypot(point.x - target.x, point.y - target.y)),
        )
        expect(off).toBeLessThan(1e-4)
      }),
      { numRuns: 300 },
    )
  })

  it('every meeting lies on both', () => {
    fc.assert(
      fc.property(anySegment(), anySegment(), (a, b) => {
        for (const { tA, tB, point } of intersectionsOf(a, b)) {
          const onA = pointAt(a, tA)
          const onB = pointAt(b, tB)
          expectWithin(Math.hypot(onA.x - onB.x, onA.y - onB.y), 0, { withinMm: 2e-9 })
          expectWithin(Math.hypot(onA.x - point.x, onA.y - point.y), 0, { withinMm: 2e-9 })
        }
      }),
    )
  })

  it('are as many as the sign changes seen by fine sampling against a line', () => {
    fc.assert(
      fc.property(anySegment(), anyPoint(), anyPoint(), (segment, a, b) => {
        if (Math.hypot(b.x - a.x, b.y - a.y) < 1) return
        const far = (t: number): Point => at(a.x + (b.x - a.x) * t, a.y + (b.y - a.y) * t)
        const line = lineFrom(far(-500), far(500))
        const side = (p: Point): number => Math.sign((b.x - a.x) * (p.y - a.y) - (b.y - a.y) * (p.x - a.x))
        const sides = Array.from({ length: 1001 }, (_, i) => side(pointAt(segment, i / 1000)))
        const changes = sides.filter((s, i) => i > 0 && s !== sides[i - 1]).length
        expect(intersectionsOf(segment, line).length).toBeGreaterThanOrEqual(changes)
      }),
    )
  })
})

function shiftedBy(segment: Segment, { x, y }: Point): Segment {
  const moved = (p: Point): Point => at(p.x + x, p.y + y)
  const ends = { start: moved(segment.start), end: moved(segment.end) }
  switch (segment.kind) {
    case 'line':
    case 'arc':
      return { ...segment, ...ends }
    case 'ellipse':
      return { ...segment, ...ends, centre: moved(segment.centre) }
    case 'cubic':
      return { ...segment, ...ends, control1: moved(segment.control1), control2: moved(segment.control2) }
  }
}

describe('selfCrossingsOf', () => {
  it('passes a closed outline over, whatever its joints', () => {
    const lower = arcFromBulge(at(0, 0), at(10, 0), 1)
    expect(selfCrossingsOf([lower, arcFromBulge(at(10, 0), at(0, 0), 1)])).toEqual([])
    const cyma = [arcFromSweep(at(0, 0), at(5, 5), 1.2), arcFromSweep(at(5, 5), at(10, 10), -1.2)]
    expect(selfCrossingsOf(cyma)).toEqual([])
    const same = [arcFromCentre(at(0, 0), 5, 0, 1), arcFromCentre(at(0, 0), 5, 1, 1)] as const
    expect(selfCrossingsOf([same[0], { ...same[1], start: same[0].end }])).toEqual([])
    for (const sliver of [1e-3, 1e-6, 1e-9]) {
      const first = arcFromCentre(at(0, 0), 10, 0, 1)
      const second = arcFromCentre(at(-sliver * Math.cos(1), -sliver * Math.sin(1)), 10 + sliver, 1, 1)
      expect(selfCrossingsOf([first, { ...second, start: first.end }])).toEqual([])
    }
  })

  it('passes smooth cuts of one curve over', () => {
    fc.assert(
      fc.property(anyPlainCubic(), fc.double({ min: 0.05, max: 0.95, noNaN: true }), (cubic, t) => {
        expect(selfCrossingsOf([...splitAt(cubic, t)])).toEqual([])
      }),
    )
  })

  it('finds a bow tie', () => {
    const tie = [at(0, 0), at(10, 10), at(10, 0), at(0, 10)]
    const path = tie.map((p, i) => lineFrom(p, tie[(i + 1) % 4] ?? p))
    const [crossing, ...rest] = selfCrossingsOf(path)
    expect(rest).toEqual([])
    expect(crossing).toMatchObject({ segmentA: 0, segmentB: 2, tA: 0.5, tB: 0.5 })
  })

  // symmetric loop: x(t) = x(1 − t) where it crosses, on the axis x = 5/2
  it('finds the loop of a single cubic', () => {
    const crossings = selfCrossingsOf([cubicFrom(at(0, 0), at(6, 4), at(-1, 4), at(5, 0))])
    expect(crossings.length).toBe(1)
    expectWithin(crossings[0]?.point.x ?? NaN, 2.5, { withinMm: 1e-9 })
    expectWithin((crossings[0]?.tA ?? NaN) + (crossings[0]?.tB ?? NaN), 1, { within: 1e-9 })
  })

  it('finds a path that folds back on itself, and one that touches itself', () => {
    const fold = [lineFrom(at(0, 0), at(10, 0)), lineFrom(at(10, 0), at(4, 0)), lineFrom(at(4, 0), at(4, 5))]
    const places = selfCrossingsOf(fold).map(({ segmentA, segmentB, point }) => [segmentA, segmentB, point.x])
    expect(places).toContainEqual([0, 1, 4])
    const touch = [
      lineFrom(at(0, 0), at(10, 0)),
      lineFrom(at(10, 0), at(10, 5)),
      lineFrom(at(10, 5), at(5, 0)),
      lineFrom(at(5, 0), at(0, 5)),
    ]
    expect(selfCrossingsOf(touch).every(({ point }) => point.x === 5)).toBe(true)
    expect(selfCrossingsOf(touch).length).toBeGreaterThan(0)
  })

  it('between two paths names both segments', () => {
    const a = [lineFrom(at(0, 0), at(10, 0)), lineFrom(at(10, 0), at(10, 10))]
    const b = [lineFrom(at(-5, 5), at(5, 5)), lineFrom(at(5, 5), at(15, 5))]
    expect(pathIntersectionsOf(a, b)).toMatchObject([{ segmentA: 1, segmentB: 1, tA: 0.5, tB: 0.5 }])
  })
})

describe('nearestOnPath', () => {
  it('on a line: its foot, or an end', () => {
    const line = [lineFrom(at(0, 0), at(10, 0))]
    expect(nearestOnPath(line, at(3, 4))).toMatchObject({ segment: 0, t: 0.3, distance: 4 })
    expect(nearestOnPath(line, at(13, 4))).toMatchObject({ t: 1, distance: 5 })
  })

  it('on an arc: along the radius, or an end', () => {
    const arc = [arcFromCentre(at(0, 0), 5, 0, Math.PI / 2)]
    expectWithin(nearestOnPath(arc, at(6, 8)).distance, 5, { withinMm: 1e-12 })
    expectWithin(nearestOnPath(arc, at(0.3, 0.4)).distance, 4.5, { withinMm: 1e-12 })
    expectWithin(nearestOnPath(arc, at(8, -4)).distance, 5, { withinMm: 1e-12 })
    expectWithin(nearestOnPath(arc, at(0, 0)).distance, 5, { withinMm: 1e-12 })
  })

  // on the long axis inside its centre of curvature (a − b²/a from the centre) the end of the axis is nearest
  it('on an ellipse: the end of the axis, or beside it', () => {
    const ellipse = [ellipseFrom({ centre: at(0, 0), semiX: 10, semiY: 5, startRad: -3, sweepRad: 6 })]
    expectWithin(nearestOnPath(ellipse, at(8, 0)).distance, 2, { withinMm: 1e-10 })
    // at x = 3 on the axis: foot at cos t = a x/(a² − b²) = 0.4, distance² = b² (1 − x²/(a² − b²)) = 25 (1 − 9/75)
    expectWithin(nearestOnPath(ellipse, at(3, 0)).distance, Math.sqrt(22), { withinMm: 1e-10 })
  })

  // symmetric about x = 5/2, its top at y = 9/4 for t = 1/2: there a quarter of a millimetre off, farther on both sides
  it('on a cubic just at the middle of it', () => {
    const bow = cubicFrom(at(0, 0), at(1, 3), at(4, 3), at(5, 0))
    expect(nearestOnPath([bow], at(2.5, 2))).toMatchObject({ t: 0.5, distance: 0.25 })
  })

  it('is never beaten by sampling, and reached by it', () => {
    fc.assert(
      fc.property(anySegment(), anyPoint(), (segment, point) => {
        const nearest = nearestOnPath([segment], point)
        let sampled = Infinity
        for (let i = 0; i <= 2000; i += 1) {
          const p = pointAt(segment, i / 2000)
          sampled = Math.min(sampled, Math.hypot(p.x - point.x, p.y - point.y))
        }
        const slack = 1e-9 * sizeOf([segment])
        expect(nearest.distance).toBeLessThanOrEqual(sampled + slack)
        expect(nearest.distance).toBeGreaterThanOrEqual(sampled - 0.01 * sizeOf([segment]))
        const there = pointAt(segment, nearest.t)
        expectWithin(Math.hypot(there.x - point.x, there.y - point.y), nearest.distance, { withinMm: slack })
      }),
    )
  })
})
