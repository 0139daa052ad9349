import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  arcFromCentre,
  boundsOf,
  convexHullOf,
  cross,
  differenceOf,
  ellipseFrom,
  enclosingRectangleAt,
  extentAlong,
  flattened,
  intersectionOf,
  lineFrom,
  minus,
  movedBy,
  offsetPolygon,
  pointFrom as at,
  polygonAreaOf,
  signedAreaOf,
  simplified,
  smallestEnclosingRectangleOf,
  symmetricDifferenceArea,
  turnedBy,
  unionOf,
  type Path,
  type Point,
  type Polygon,
} from '@shared/geometry'
import { anyAngleRad, anyPath, anyPoint, sizeOf } from '../../helpers/arbitraries-geometry'
import { expectWithin } from '../../helpers/expect-within'

const box = (x: number, y: number, w: number, h: number): Polygon => [
  at(x, y),
  at(x + w, y),
  at(x + w, y + h),
  at(x, y + h),
]
const areaOf = (polygons: readonly Polygon[]): number =>
  polygons.reduce((sum, p) => sum + polygonAreaOf(p), 0)
const closedThrough = (corners: readonly Point[]): Path =>
  corners.map((p, i) => lineFrom(p, corners[(i + 1) % corners.length] ?? p))

describe('polygons', () => {
  // boxes 10 × 10 and 10 × 10 shifted by (4, 3): common 6 × 7
  it('union, difference, intersection and what lies between', () => {
    const a = [box(0, 0, 10, 10)]
    const b = [box(4, 3, 10, 10)]
    expectWithin(areaOf(unionOf([...a, ...b])), 158, { withinMm2: 1e-3 })
    expectWithin(areaOf(differenceOf(a, b)), 58, { withinMm2: 1e-3 })
    expectWithin(areaOf(intersectionOf(a, b)), 42, { withinMm2: 1e-3 })
    expectWithin(symmetricDifferenceArea(a, b), 116, { withinMm2: 1e-3 })
    expect(symmetricDifferenceArea(a, a)).toBe(0)
  })

  it('a hole runs clockwise and counts against', () => {
    const ring = differenceOf([box(0, 0, 10, 10)], [box(2, 2, 3, 3)])
    expect(ring.map((p) => Math.sign(polygonAreaOf(p))).sort()).toEqual([-1, 1])
    expectWithin(areaOf(ring), 91, { withinMm2: 1e-3 })
  })

  it('of either direction is the same region', () => {
    const clockwise = [...box(0, 0, 10, 10)].reverse()
    expectWithin(areaOf(unionOf([clockwise])), 100, { withinMm2: 1e-3 })
    expect(polygonAreaOf(clockwise)).toBe(-100)
    expect(polygonAreaOf([])).toBe(0)
  })

  it('a bow tie becomes two triangles', () => {
    const tie = simplified([at(0, 0), at(10, 10), at(10, 0), at(0, 10)])
    expect(tie.length).toBe(2)
    expectWithin(areaOf(tie), 50, { withinMm2: 1e-3 })
  })

  // 10 × 10 grown by 1: mitred 12 × 12; rounded 10 × 10 + 4 × 10 + π; shrunk by 2: 6 × 6; by 5.1: nothing
  it('grow and shrink', () => {
    const square = box(0, 0, 10, 10)
    expectWithin(areaOf(offsetPolygon(square, 1)), 144, { withinMm2: 1e-3 })
    expectWithin(areaOf(offsetPolygon(square, 1, { corners: 'round' })), 140 + Math.PI, { withinMm2: 0.01 })
    expectWithin(areaOf(offsetPolygon(square, -2)), 36, { withinMm2: 1e-3 })
    expect(offsetPolygon(square, -5.1)).toEqual([])
  })

  it('keep coordinates to 10⁻⁵ mm, and refuse what is out of reach', () => {
    const [kept] = unionOf([[at(0.123456, 0), at(5, 0), at(5, 5)]])
    const off = Math.min(...(kept ?? []).map((p) => Math.hypot(p.x - 0.123456, p.y)))
    expect(off).toBeLessThanOrEqual(0.5e-5 + 1e-12)
    expect(() => unionOf([[at(1e12, 0), at(0, 0), at(0, 1)]])).toThrow(/out of reach/)
    expect(() => unionOf([[at(NaN, 0), at(0, 0), at(0, 1)]])).toThrow(/out of reach/)
  })

  it('area of a flattened circle is the circle’s less the slivers', () => {
    const circle = [arcFromCentre(at(0, 0), 10, 0, Math.PI), arcFromCentre(at(0, 0), 10, Math.PI, Math.PI)]
    // each sliver is ⅔ chord × sagitta: at most ⅔ × perimeter × 0.001
    const area = polygonAreaOf(flattened(circle, 1e-3))
    expect(area).toBeLessThan(100 * Math.PI)
    expect(area).toBeGreaterThan(100 * Math.PI - (2 / 3) * 20 * Math.PI * 1e-3)
  })
})

describe('convexHullOf', () => {
  it('leaves out what lies inside or on a side', () => {
    const hull = convexHullOf([at(0, 0), at(4, 0), at(2, 0), at(4, 4), at(0, 4), at(1, 1), at(0, 0)])
    expect(hull).toEqual([at(0, 0), at(4, 0), at(4, 4), at(0, 4)])
    expect(convexHullOf([at(1, 1), at(1, 1)])).toEqual([at(1, 1)])
    expect(convexHullOf([at(0, 0), at(1, 1), at(2, 2)])).toEqual([at(0, 0), at(2, 2)])
  })

  it('turns left all the way and has every point on its left', () => {
    fc.assert(
      fc.property(fc.array(anyPoint(), { minLength: 3, maxLength: 40 }), (points) => {
        const hull = convexHullOf(points)
        if (hull.length < 3) return
        hull.forEach((a, i) => {
          const b = hull[(i + 1) % hull.length] ?? a
          expect(points.every((p) => cross(minus(b, a), minus(p, a)) >= -1e-9)).toBe(true)
        })
      }),
    )
  })
})

describe('extentAlong', () => {
  it('agrees with the bounds of the turned path', () => {
    fc.assert(
      fc.property(anyPath(), anyAngleRad(), (path, angle) => {
        const { min, max } = boundsOf(turnedBy(path, -angle))
        const extent = extentAlong(path, angle)
        expectWithin(extent.least, min.x, { withinMm: 1e-11 * sizeOf(path) })
        expectWithin(extent.greatest, max.x, { withinMm: 1e-11 * sizeOf(path) })
      }),
    )
  })
})

describe('smallestEnclosingRectangleOf', () => {
  it.each([0, 0.3, -0.5, 0.78, 1.2, 2.9])('of a rectangle turned by %d is that rectangle', (angle) => {
    const found = smallestEnclosingRectangleOf(turnedBy(closedThrough(box(0, 0, 30, 10)), angle))
    const sides = [found.widthMm, found.heightMm].sort((a, b) => b - a)
    expectWithin(sides[0] ?? NaN, 30, { withinMm: 1e-9 })
    expectWithin(sides[1] ?? NaN, 10, { withinMm: 1e-9 })
    // the same direction but for quarter turns
    expectWithin(Math.abs(Math.sin(2 * (found.angleRad - angle))), 0, { withinRad: 1e-9 })
    expect(Math.abs(found.angleRad)).toBeLessThanOrEqual(Math.PI / 4 + 1e-12)
  })

  // a right triangle 3-4-5: on a leg 12, on the hypotenuse 5 × 2.4 = 12 as well: the untilted is taken
  it('of a right triangle has twice its area, and stays untilted where tilting saves nothing', () => {
    const found = smallestEnclosingRectangleOf(closedThrough([at(0, 0), at(4, 0), at(0, 3)]))
    expect(found).toEqual({ widthMm: 4, heightMm: 3, angleRad: 0 })
  })

  it('of an ellipse lies along its axes', () => {
    const ellipse = ellipseFrom({
      centre: at(3, 4),
      semiX: 20,
      semiY: 7,
      rotationRad: 0.4,
      startRad: 0,
      sweepRad: 6.28,
    })
    const found = smallestEnclosingRectangleOf([ellipse])
    expectWithin(found.widthMm, 40, { withinMm: 1e-6 })
    expectWithin(found.heightMm, 14, { withinMm: 1e-6 })
  })

  // a half disc: 2r × r upright; any tilt by a: width 2r (one end to the round side 1 + … ) is larger
  it('of a half disc is 2r by r', () => {
    const arc = arcFromCentre(at(0, 0), 10, 0.3, Math.PI)
    const found = smallestEnclosingRectangleOf([arc, lineFrom(arc.end, arc.start)])
    expectWithin(found.widthMm, 20, { withinMm: 1e-6 })
    expectWithin(found.heightMm, 10, { withinMm: 1e-6 })
    expectWithin(found.angleRad, 0.3, { withinRad: 1e-7 })
  })

  it('holds the path and is beaten by no other direction', () => {
    fc.assert(
      fc.property(anyPath(), (path) => {
        const found = smallestEnclosingRectangleOf(path)
        const area = found.widthMm * found.heightMm
        const turned = turnedBy(path, -found.angleRad)
        const { min, max } = boundsOf(turned)
        expectWithin(max.x - min.x, found.widthMm, { withinMm: 1e-10 * sizeOf(path) })
        expectWithin(max.y - min.y, found.heightMm, { withinMm: 1e-10 * sizeOf(path) })
        const others = Array.from({ length: 361 }, (_, i) =>
          enclosingRectangleAt(path, ((i - 180) * Math.PI) / 720),
        )
        expect(others.every((other) => other.widthMm * other.heightMm >= area * (1 - 1e-9))).toBe(true)
      }),
      { numRuns: 30 },
    )
  })

  it('goes with the path', () => {
    fc.assert(
      fc.property(anyPath(), anyPoint(), (path, shift) => {
        const a = smallestEnclosingRectangleOf(path)
        const b = smallestEnclosingRectangleOf(movedBy(path, shift))
        expectWithin(b.widthMm * b.heightMm, a.widthMm * a.heightMm, { withinRatio: 1e-9 })
      }),
      { numRuns: 20 },
    )
  })

  it('is as large as the area at least', () => {
    const outline = closedThrough([at(0, 0), at(30, 5), at(28, 20), at(4, 25)])
    const { widthMm, heightMm } = smallestEnclosingRectangleOf(outline)
    expect(widthMm * heightMm).toBeGreaterThan(signedAreaOf(outline))
    expect(() => smallestEnclosingRectangleOf([])).toThrow(/no extent/)
  })
})
