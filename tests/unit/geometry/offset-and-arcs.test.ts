import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  arcFromCentre,
  arcGeometryOf,
  arcsFromCurve,
  curvatureAt,
  cubicFrom,
  ellipseFrom,
  endTangentOf,
  flattened,
  greatestDistanceBetween,
  lineFrom,
  movedBy,
  nearestOnPath,
  offsetSegment,
  pointAt,
  pointFrom as at,
  startTangentOf,
  turnedBy,
  type Path,
  type Segment,
} from '@shared/geometry'
import { anyEllipse, anyPath, anyPlainCubic, anySegment } from '../../helpers/arbitraries-geometry'
import { expectWithin } from '../../helpers/expect-within'

const anyCurve = () => fc.oneof(anyEllipse(), anyPlainCubic())

/** Greatest distance from many places of a segment to a path, mm. */
const farthestOff = (segment: Segment, path: Path): number =>
  Math.max(...Array.from({ length: 211 }, (_, i) => nearestOnPath(path, pointAt(segment, i / 210)).distance))

describe('arcsFromCurve', () => {
  it.each([1e-1, 1e-3, 1e-5])('stays within %d mm of the curve, both ways', (accuracyMm) => {
    fc.assert(
      fc.property(anyCurve(), (curve) => {
        const arcs = arcsFromCurve(curve, accuracyMm)
        expect(farthestOff(curve, arcs)).toBeLessThanOrEqual(accuracyMm)
        for (const arc of arcs) {
          for (const t of [0.2, 0.5, 0.8]) {
            expect(nearestOnPath([curve], pointAt(arc, t)).distance).toBeLessThanOrEqual(accuracyMm)
          }
        }
      }),
      { numRuns: 20 },
    )
  })

  it('runs from end to end without a gap or an arris, by the very same points', () => {
    fc.assert(
      fc.property(anyCurve(), (curve) => {
        const arcs = arcsFromCurve(curve, 1e-2)
        expect(arcs[0]?.start).toEqual(curve.start)
        expect(arcs.at(-1)?.end).toEqual(curve.end)
        arcs.slice(1).forEach((arc, i) => {
          const before = arcs[i]
          if (!before) throw new Error('there is one before')
          expect(arc.start).toEqual(before.end)
          const [u, v] = [endTangentOf(before), startTangentOf(arc)]
          expectWithin(Math.hypot(u.x - v.x, u.y - v.y), 0, { withinRad: 1e-6 })
        })
      }),
      { numRuns: 60 },
    )
  })

  it('makes few arcs: a quarter of an ordinary ellipse at a micrometre takes under 25', () => {
    const quarter = ellipseFrom({
      centre: at(0, 0),
      semiX: 20,
      semiY: 12,
      startRad: 0,
      sweepRad: Math.PI / 2,
    })
    expect(arcsFromCurve(quarter, 1e-3).length).toBeLessThan(25)
    expect(
      arcsFromCurve(cubicFrom(at(0, 0), at(1, 1), at(2, 2), at(3, 3)), 1e-3).every((s) => s.kind === 'line'),
    ).toBe(true)
  })

  it('gives lines and arcs back, and refuses no accuracy', () => {
    const arc = arcFromCentre(at(0, 0), 5, 0, 1)
    expect(arcsFromCurve(arc, 1e-3)).toEqual([arc])
    expect(() => arcsFromCurve(arc, 0)).toThrow(/accuracy/)
  })

  it('gets past a cusp', () => {
    const cusp = cubicFrom(at(-1, 1), at(1, -1 / 3), at(-1, -1 / 3), at(1, 1))
    expect(farthestOff(cusp, arcsFromCurve(cusp, 1e-3))).toBeLessThanOrEqual(1e-3)
  })
})

describe('offsetSegment', () => {
  it('shifts a line to its left', () => {
    expect(offsetSegment(lineFrom(at(0, 0), at(10, 0)), 2)).toEqual([lineFrom(at(0, 2), at(10, 2))])
    expect(offsetSegment(lineFrom(at(0, 0), at(0, 10)), -2)).toEqual([lineFrom(at(2, 0), at(2, 10))])
  })

  it.each([
    [1.5, 2, 3],
    [-1.5, 2, 7],
    [1.5, -2, 7],
    [-1.5, 4.999, 9.999],
    [2.5, 4.999, 0.001],
  ])(
    'an arc of radius 5 turning %d offset by %d has radius %d about the same centre',
    (sweep, by, radius) => {
      const [piece, ...rest] = offsetSegment(arcFromCentre(at(3, 4), 5, 0.7, sweep), by)
      expect(rest).toEqual([])
      if (piece?.kind !== 'arc') throw new Error('an arc gives an arc')
      const arc = arcGeometryOf(piece)
      expectWithin(arc.radius, radius, { withinMm: 1e-12 })
      expectWithin(arc.centre.x, 3, { withinMm: 1e-12 })
      expectWithin(arc.centre.y, 4, { withinMm: 1e-12 })
      expectWithin(arc.sweepRad, sweep, { withinRad: 1e-14 })
    },
  )

  it('swallows an arc whose centre it reaches', () => {
    const arc = arcFromCentre(at(0, 0), 5, 0, 1)
    expect(offsetSegment(arc, 6)).toEqual([])
    expect(offsetSegment(arc, 5 + 1e-9)).toEqual([])
    expect(offsetSegment(arcFromCentre(at(0, 0), 5, 0, -1), -6)).toEqual([])
  })

  it('keeps its distance from ellipses and cubics that are nowhere too sharp', () => {
    fc.assert(
      fc.property(anyCurve(), fc.double({ min: -3, max: 3, noNaN: true }), (curve, by) => {
        const sharpest = Math.max(...Array.from({ length: 201 }, (_, i) => curvatureAt(curve, i / 200) * by))
        if (sharpest > 0.8 || Math.abs(by) < 0.01) return
        const pieces = offsetSegment(curve, by, 1e-3)
        for (const piece of pieces) {
          for (const t of [0, 0.3, 0.7, 1]) {
            const off = nearestOnPath([curve], pointAt(piece, t)).distance
            expect(off).toBeLessThanOrEqual(Math.abs(by) + 1.0e-3)
          }
        }
        // and every place of the curve finds the offset at that distance: none of it is missing
        for (let i = 0; i <= 60; i += 1) {
          const off = nearestOnPath(pieces, pointAt(curve, i / 60)).distance
          expect(off).toBeLessThanOrEqual(Math.abs(by) + 1.0e-3)
        }
        pieces.slice(1).forEach((piece, i) => expect(piece.start).toEqual(pieces[i]?.end))
      }),
      { numRuns: 60 },
    )
  })
})

describe('flattened', () => {
  it.each([1, 1e-2, 1e-4])('leaves no curve by more than %d mm', (chordErrorMm) => {
    fc.assert(
      fc.property(anySegment(), (segment) => {
        const points = flattened([segment], chordErrorMm)
        const chords = points.slice(1).map((p, i) => lineFrom(points[i] ?? p, p))
        const count = chords.length
        for (let i = 0; i < Math.min(count, 60); i += 1) {
          const chord = chords[Math.floor((i * count) / Math.min(count, 60))]
          const place = Math.floor((i * count) / Math.min(count, 60))
          if (!chord) continue
          for (const part of [0.25, 0.5, 0.75]) {
            const p = pointAt(segment, (place + part) / count)
            expect(nearestOnPath([chord], p).distance).toBeLessThanOrEqual(chordErrorMm * 1.000001)
          }
        }
      }),
      { numRuns: 60 },
    )
  })

  it('keeps every joint and does not repeat the first of a closed path', () => {
    const square = [at(0, 0), at(4, 0), at(4, 4), at(0, 4)]
    expect(flattened(square.map((p, i) => lineFrom(p, square[(i + 1) % 4] ?? p)))).toEqual(square)
    expect(flattened([])).toEqual([])
  })

  it('takes no more chords of a circle than it must', () => {
    // r = 10, sagitta 0.001: each chord may turn 4·asin(√(e/2r)) = 0.028285 rad
    const arc = arcFromCentre(at(0, 0), 10, 0, Math.PI)
    expect(flattened([arc], 1e-3).length).toBe(Math.ceil(Math.PI / (4 * Math.asin(Math.sqrt(5e-5)))) + 1)
  })

  it.each([0, -1, NaN, 1e-12])('refuses a chord error of %d', (error) => {
    expect(() => flattened([lineFrom(at(0, 0), at(1, 0))], error)).toThrow(/chord error/)
  })
})

describe('greatestDistanceBetween', () => {
  it('of two parallel lines is their distance, of a line and half of it the other half', () => {
    const line = [lineFrom(at(0, 0), at(10, 0))]
    expectWithin(greatestDistanceBetween(line, movedBy(line, at(0, 3))).distance, 3, { withinMm: 1e-12 })
    const half = greatestDistanceBetween(line, [lineFrom(at(0, 0), at(5, 0))])
    expect(half).toMatchObject({ distance: 5, on: 'a', from: at(10, 0), to: at(5, 0) })
    expect(greatestDistanceBetween([lineFrom(at(0, 0), at(5, 0))], line).on).toBe('b')
  })

  it('of concentric quarter circles is the difference of their radii', () => {
    const a = [arcFromCentre(at(0, 0), 10, 0, Math.PI / 2)]
    const b = [arcFromCentre(at(0, 0), 12, 0, Math.PI / 2)]
    expectWithin(greatestDistanceBetween(a, b).distance, 2, { withinMm: 1e-4 })
  })

  // an arc of radius 10 over a chord of 12: sagitta 10 − 8 = 2
  it.each([1e-2, 1e-4, 1e-6])('of an arc and its chord is the sagitta, within %d mm', (accuracyMm) => {
    const half = Math.asin(0.6)
    const arc = arcFromCentre(at(0, 0), 10, Math.PI / 2 + half, -2 * half)
    const found = greatestDistanceBetween([arc], [lineFrom(arc.start, arc.end)], { accuracyMm })
    expectWithin(found.distance, 2, { withinMm: accuracyMm })
    expect(found.distance).toBeLessThanOrEqual(2 + 1e-12)
  })

  // the rest of that circle over the same chord rises 10 + 8 = 18; from the chord back to it there is nowhere near as far
  it('of the greater arc and its chord is its height, though both ends coincide', () => {
    const half = Math.PI - Math.asin(0.6)
    const arc = arcFromCentre(at(0, 0), 10, Math.PI / 2 + half, -2 * half)
    const found = greatestDistanceBetween([arc], [lineFrom(arc.start, arc.end)])
    expectWithin(found.distance, 18, { withinMm: 1e-4 })
    expect(found.on).toBe('a')
  })

  it('of a path and itself is nothing; it is alike both ways and unmoved by a turn', () => {
    fc.assert(
      fc.property(anyPath(), anyPath(), (a, b) => {
        expectWithin(greatestDistanceBetween(a, a).distance, 0, { withinMm: 1e-4 })
        const accuracyMm = 0.01
        const there = greatestDistanceBetween(a, b, { accuracyMm }).distance
        expectWithin(greatestDistanceBetween(b, a, { accuracyMm }).distance, there, { withinMm: accuracyMm })
        const turned = greatestDistanceBetween(turnedBy(a, 1), turnedBy(b, 1), { accuracyMm }).distance
        expectWithin(turned, there, { withinMm: accuracyMm })
      }),
      { numRuns: 25 },
    )
  })
})
