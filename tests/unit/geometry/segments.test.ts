import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  arcFromBulge,
  arcFromCentre,
  arcFromSweep,
  arcGeometryOf,
  bendOf,
  cubicFrom,
  curvatureAt,
  cutAt,
  derivativeAt,
  ellipseFrom,
  endTangentOf,
  extremaOf,
  isSingleValuedInX,
  lineFrom,
  mirrored,
  monotonePiecesOf,
  movedBy,
  parametersAt,
  pathSplitAtX,
  pointAt,
  pointFrom as at,
  quarterEllipseFrom,
  reversed,
  scaledBy,
  secondDerivativeAt,
  splitAt,
  splitAtX,
  startTangentOf,
  subSegment,
  tangentAt,
  turnedBy,
  type Path,
  type Point,
  type Segment,
} from '@shared/geometry'
import { anyAngleRad, anyEllipse, anySegment, sizeOf } from '../../helpers/arbitraries-geometry'
import { expectWithin } from '../../helpers/expect-within'

const expectPoint = (actual: Point, expected: Point, withinMm: number): void => {
  expectWithin(actual.x, expected.x, { withinMm })
  expectWithin(actual.y, expected.y, { withinMm })
}

const anyT = () => fc.double({ min: 0, max: 1, noNaN: true })
const anyInnerT = () => fc.double({ min: 0.02, max: 0.98, noNaN: true })

describe('makers', () => {
  it('an arc of bulge 1 over 20 is a half circle of radius 10, to the right of its chord', () => {
    const arc = arcGeometryOf(arcFromBulge(at(0, 0), at(20, 0), 1))
    expectPoint(arc.centre, at(10, 0), 1e-13)
    expectWithin(arc.radius, 10, { withinMm: 1e-13 })
    expectWithin(arc.sweepRad, Math.PI, { withinRad: 1e-14 })
    expectPoint(pointAt(arcFromBulge(at(0, 0), at(20, 0), 1), 0.5), at(10, -10), 1e-12)
  })

  it.each([0.3, -0.3, Math.PI / 2, 3, -3, 5.5, -5.5])(
    'an arc by centre with a sweep of %d comes back',
    (sweepRad) => {
      const geometry = arcGeometryOf(arcFromCentre(at(3, 4), 7, 1.1, sweepRad))
      expectPoint(geometry.centre, at(3, 4), 1e-12)
      expectWithin(geometry.radius, 7, { withinMm: 1e-12 })
      expectWithin(geometry.startRad, 1.1, { withinRad: 1e-13 })
      expectWithin(geometry.sweepRad, sweepRad, { withinRad: 1e-13 })
    },
  )

  it('a quarter ellipse leaves one end level and the other upright', () => {
    for (const [dx, dy] of [
      [8, 3],
      [-8, 3],
      [8, -3],
      [-8, -3],
    ] as const) {
      for (const leaves of ['level', 'upright'] as const) {
        const quarter = quarterEllipseFrom(at(1, 2), at(1 + dx, 2 + dy), leaves)
        const along = leaves === 'level' ? at(Math.sign(dx), 0) : at(0, Math.sign(dy))
        const arriving = leaves === 'level' ? at(0, Math.sign(dy)) : at(Math.sign(dx), 0)
        expectPoint(startTangentOf(quarter), along, 1e-15)
        expectPoint(endTangentOf(quarter), arriving, 1e-15)
        expectPoint(pointAt(quarter, 1 - 1e-12), quarter.end, 1e-10)
      }
    }
  })

  it('refuse what cannot be drawn', () => {
    expect(() => lineFrom(at(NaN, 0), at(1, 1))).toThrow(/finite/)
    expect(() => arcFromBulge(at(0, 0), at(1, 1), Infinity)).toThrow(/finite/)
    expect(() => arcFromSweep(at(0, 0), at(1, 1), 2 * Math.PI)).toThrow(/full circle/)
    expect(() => arcFromCentre(at(0, 0), 0, 0, 1)).toThrow(/radius/)
    expect(() => ellipseFrom({ centre: at(0, 0), semiX: 1, semiY: -1, startRad: 0, sweepRad: 1 })).toThrow(
      /semi-axes/,
    )
    expect(() => quarterEllipseFrom(at(0, 0), at(0, 5), 'level')).toThrow(/semi-axes/)
    expect(() => cubicFrom(at(0, 0), at(0, Infinity), at(0, 0), at(0, 0))).toThrow(/finite/)
    expect(() => arcGeometryOf(arcFromBulge(at(0, 0), at(1, 0), 0))).toThrow(/straight/)
  })
})

describe('pointAt and its derivatives', () => {
  it('start and end are the very points', () => {
    fc.assert(
      fc.property(anySegment(), (segment) => {
        expect(pointAt(segment, 0)).toBe(segment.start)
        expect(pointAt(segment, 1)).toBe(segment.end)
        expectPoint(pointAt(segment, 1e-15), segment.start, 1e-11 * sizeOf([segment]))
        expectPoint(pointAt(segment, 1 - 1e-15), segment.end, 1e-11 * sizeOf([segment]))
      }),
    )
  })

  it('agree with differences of the points', () => {
    fc.assert(
      fc.property(anySegment(), anyInnerT(), (segment, t) => {
        const step = 1e-4
        const before = pointAt(segment, t - step)
        const here = pointAt(segment, t)
        const after = pointAt(segment, t + step)
        const scale = 1 + bendOf(segment) + sizeOf([segment])
        expectPoint(
          derivativeAt(segment, t),
          at((after.x - before.x) / (2 * step), (after.y - before.y) / (2 * step)),
          2e-6 * scale,
        )
        const second = at(
          (after.x - 2 * here.x + before.x) / step ** 2,
          (after.y - 2 * here.y + before.y) / step ** 2,
        )
        expectPoint(secondDerivativeAt(segment, t), second, 1e-4 * scale)
      }),
    )
  })

  it('every point of an arc lies a radius from its centre', () => {
    const arc = arcFromCentre(at(3, 4), 7, 1.1, 4)
    for (let i = 0; i <= 20; i += 1) {
      const p = pointAt(arc, i / 20)
      expectPoint(p, at(3 + 7 * Math.cos(1.1 + i / 5), 4 + 7 * Math.sin(1.1 + i / 5)), 1e-13 * 10)
    }
  })

  it('the bend bounds how far a curve leaves its chord', () => {
    fc.assert(
      fc.property(anySegment(), fc.double({ min: 0, max: 0.9, noNaN: true }), (segment, t) => {
        const a = pointAt(segment, t)
        const b = pointAt(segment, t + 0.1)
        const m = pointAt(segment, t + 0.05)
        const off = Math.hypot(m.x - (a.x + b.x) / 2, m.y - (a.y + b.y) / 2)
        expect(off).toBeLessThanOrEqual((bendOf(segment) * 0.01) / 8 + 1e-11 * sizeOf([segment]))
      }),
    )
  })
})

describe('tangents and curvature', () => {
  it('of a circle: square to the radius, 1/r, negative to the right', () => {
    expectPoint(tangentAt(arcFromCentre(at(0, 0), 5, 0, 1), 0), at(0, 1), 1e-15)
    expectWithin(curvatureAt(arcFromCentre(at(0, 0), 5, 0, 1), 0.3), 0.2, { within: 1e-15 })
    expectWithin(curvatureAt(arcFromCentre(at(0, 0), 5, 0, -1), 0.3), -0.2, { within: 1e-15 })
    const asEllipse = ellipseFrom({ centre: at(0, 0), semiX: 5, semiY: 5, startRad: 0, sweepRad: -1 })
    expectWithin(curvatureAt(asEllipse, 0.3), -0.2, { within: 1e-14 })
    expect(curvatureAt(lineFrom(at(0, 0), at(1, 1)), 0.5)).toBe(0)
  })

  // an ellipse is curved a/b² at the end of its long axis
  it('of an ellipse at the end of its axis', () => {
    const ellipse = ellipseFrom({ centre: at(0, 0), semiX: 8, semiY: 3, startRad: 0, sweepRad: 1 })
    expectWithin(curvatureAt(ellipse, 0), 8 / 9, { within: 1e-14 })
  })

  it('where a control point lies on its end, as the limit', () => {
    const cubic = cubicFrom(at(0, 0), at(0, 0), at(3, 4), at(6, 4))
    expectPoint(tangentAt(cubic, 0), at(0.6, 0.8), 1e-12)
    const late = cubicFrom(at(0, 0), at(3, 4), at(6, 8), at(6, 8))
    expectPoint(tangentAt(late, 1), at(0.6, 0.8), 1e-12)
    const bothOnEnds = cubicFrom(at(0, 0), at(0, 0), at(6, 8), at(6, 8))
    expectPoint(tangentAt(bothOnEnds, 0), at(0.6, 0.8), 1e-12)
    expectPoint(tangentAt(bothOnEnds, 1), at(0.6, 0.8), 1e-12)
  })

  it('turn about when a path is reversed', () => {
    fc.assert(
      fc.property(anySegment(), anyInnerT(), (segment, t) => {
        const [back] = reversed([segment])
        if (!back) throw new Error('a segment reversed is a segment')
        expectPoint(pointAt(back, 1 - t), pointAt(segment, t), 1e-11 * sizeOf([segment]))
        if (Math.hypot(derivativeAt(segment, t).x, derivativeAt(segment, t).y) < 1e-3) return
        const forth = tangentAt(segment, t)
        expectPoint(tangentAt(back, 1 - t), at(-forth.x, -forth.y), 1e-8)
      }),
    )
  })
})

describe('edits', () => {
  it('move every point of a segment as they say, at its own parameter', () => {
    fc.assert(
      fc.property(anySegment(), anyT(), anyAngleRad(), (segment, t, angle) => {
        const p = pointAt(segment, t)
        const withinMm = 1e-11 * sizeOf([segment])
        const only = (path: Path): Segment => {
          const [first] = path
          if (!first) throw new Error('a path of one has a first')
          return first
        }
        expectPoint(pointAt(only(movedBy([segment], at(7, -3))), t), at(p.x + 7, p.y - 3), withinMm)
        expectPoint(pointAt(only(mirrored([segment], 5)), t), at(10 - p.x, p.y), withinMm)
        expectPoint(
          pointAt(only(scaledBy([segment], 0.4, at(1, 2))), t),
          at(1 + 0.4 * (p.x - 1), 2 + 0.4 * (p.y - 2)),
          withinMm,
        )
        const [c, s] = [Math.cos(angle), Math.sin(angle)]
        expectPoint(
          pointAt(only(turnedBy([segment], angle, at(1, 2))), t),
          at(1 + c * (p.x - 1) - s * (p.y - 2), 2 + s * (p.x - 1) + c * (p.y - 2)),
          withinMm,
        )
      }),
    )
    expect(() => scaledBy([], 0)).toThrow(/above 0/)
    expect(() => scaledBy([], -1)).toThrow(/above 0/)
  })
})

describe('splitting', () => {
  it('gives two stretches of the same curve that share the very same point', () => {
    fc.assert(
      fc.property(anySegment(), anyInnerT(), anyT(), (segment, t, u) => {
        const [first, second] = splitAt(segment, t)
        expect(first.end).toBe(second.start)
        expect(first.start).toBe(segment.start)
        expect(second.end).toBe(segment.end)
        const withinMm = 1e-11 * sizeOf([segment])
        expectPoint(pointAt(first, u), pointAt(segment, t * u), withinMm)
        expectPoint(pointAt(second, u), pointAt(segment, t + (1 - t) * u), withinMm)
      }),
    )
  })

  it('takes any stretch', () => {
    fc.assert(
      fc.property(anySegment(), fc.double({ min: 0, max: 0.5, noNaN: true }), anyT(), (segment, t0, u) => {
        const t1 = t0 + 0.4
        const part = subSegment(segment, t0, t1)
        expectPoint(pointAt(part, u), pointAt(segment, t0 + u * 0.4), 1e-11 * sizeOf([segment]))
      }),
    )
    expect(() => subSegment(lineFrom(at(0, 0), at(1, 0)), 0.5, 0.5)).toThrow(/stretch/)
    expect(() => splitAt(lineFrom(at(0, 0), at(1, 0)), 1)).toThrow(/between 0 and 1/)
  })

  it('at several places gives the pieces in order', () => {
    const pieces = cutAt(lineFrom(at(0, 0), at(10, 0)), [0, 0.25, 0.5, 1])
    expect(pieces.map((piece) => piece.end.x)).toEqual([2.5, 5, 10])
  })

  it('at an x gives joints of that very x, wherever the segment crosses it', () => {
    fc.assert(
      fc.property(anySegment(), anyInnerT(), (segment, t) => {
        const { x } = pointAt(segment, t)
        const pieces = splitAtX(segment, x)
        const joints = pieces.slice(1).map((piece) => piece.start)
        for (const joint of joints) expect(joint.x).toBe(x)
        pieces.slice(1).forEach((piece, i) => expect(piece.start).toBe(pieces[i]?.end))
        // on either side of the line a piece stays on its side
        for (const piece of pieces) {
          const sides = [0.25, 0.5, 0.75].map((u) => pointAt(piece, u).x - x)
          const slack = 1e-9 * sizeOf([segment])
          expect(Math.max(...sides) < slack || Math.min(...sides) > -slack).toBe(true)
        }
      }),
    )
  })

  it('a path at an x cuts only what crosses it', () => {
    const path = [
      lineFrom(at(0, 0), at(10, 0)),
      lineFrom(at(10, 0), at(10, 5)),
      lineFrom(at(10, 5), at(0, 5)),
    ]
    expect(pathSplitAtX(path, 4).length).toBe(5)
    expect(pathSplitAtX(path, 11)).toEqual(path)
    expect(parametersAt(path[1] as Segment, 'x', 10)).toEqual([0, 1])
  })
})

describe('monotone pieces', () => {
  it('never turn back', () => {
    fc.assert(
      fc.property(
        fc.oneof(anySegment(), anyEllipse()),
        fc.constantFrom<'x' | 'y'>('x', 'y'),
        (segment, axis) => {
          const slack = 1e-10 * sizeOf([segment])
          for (const piece of monotonePiecesOf(segment, axis)) {
            const values = Array.from({ length: 33 }, (_, i) => pointAt(piece, i / 32)[axis])
            const rises = values.every((value, i) => i === 0 || value >= (values[i - 1] ?? value) - slack)
            const falls = values.every((value, i) => i === 0 || value <= (values[i - 1] ?? value) + slack)
            expect(rises || falls).toBe(true)
          }
        },
      ),
    )
  })

  it('of a full half circle turn at the middle', () => {
    const [t = NaN] = extremaOf(arcFromCentre(at(0, 0), 5, 0, Math.PI), 'y')
    expectWithin(t, 0.5, { within: 1e-15 })
    expect(extremaOf(lineFrom(at(0, 0), at(3, 4)), 'x')).toEqual([])
  })
})

describe('isSingleValuedInX', () => {
  it('lets upright walls and quarter circles pass, either way along', () => {
    const quarter = arcFromCentre(at(10, 0), 10, Math.PI, -Math.PI / 2)
    const path = [quarter, lineFrom(quarter.end, at(10, 20)), lineFrom(at(10, 20), at(15, 20))]
    expect(isSingleValuedInX(path)).toBe(true)
    expect(isSingleValuedInX(reversed(path))).toBe(true)
    expect(isSingleValuedInX([])).toBe(true)
  })

  it('sees an arc that passes upright by a hundredth of a degree', () => {
    const beyond = arcFromCentre(at(10, 0), 10, Math.PI + 0.0002, -2)
    expect(isSingleValuedInX([beyond])).toBe(false)
  })

  it('sees a line that goes back under what came before', () => {
    expect(
      isSingleValuedInX([
        lineFrom(at(0, 0), at(10, 0)),
        lineFrom(at(10, 0), at(9, 5)),
        lineFrom(at(9, 5), at(20, 5)),
      ]),
    ).toBe(false)
  })
})
