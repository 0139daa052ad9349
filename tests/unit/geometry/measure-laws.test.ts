import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  areaMomentsOf,
  boundsOf,
  lengthOf,
  lineMomentsOf,
  mirrored,
  movedBy,
  pointAt,
  reversed,
  scaledBy,
  signedAreaOf,
  splitAt,
  turnedBy,
  type Outline,
} from '@shared/geometry'
import {
  anyAngleRad,
  anyOutline,
  anyPath,
  anyPoint,
  anySolidOutline,
  sizeOf,
} from '../../helpers/arbitraries-geometry'
import { expectWithin } from '../../helpers/expect-within'

/** What rounding may add up to, as powers of the size times a few hundred roundings. */
const roundingOf = (outline: Outline, power: number): number => 1e-13 * sizeOf(outline) ** power
const ACCURACY_MM = 1e-7

describe('area', () => {
  it('stays when the outline is turned or shifted, and turns over when it is mirrored or reversed', () => {
    fc.assert(
      fc.property(anyOutline(), anyAngleRad(), anyPoint(), (outline, angle, shift) => {
        const area = signedAreaOf(outline)
        const within = { withinMm2: 20 * roundingOf(outline, 2) }
        expectWithin(signedAreaOf(turnedBy(outline, angle, shift)), area, within)
        expectWithin(signedAreaOf(movedBy(outline, shift)), area, within)
        expectWithin(signedAreaOf(mirrored(outline, shift.x)), -area, within)
        expectWithin(signedAreaOf(reversed(outline)), -area, within)
      }),
    )
  })

  it('grows with the square of the scale', () => {
    fc.assert(
      fc.property(
        anyOutline(),
        fc.double({ min: 0.1, max: 10, noNaN: true }),
        anyPoint(),
        (outline, factor, about) => {
          expectWithin(signedAreaOf(scaledBy(outline, factor, about)), factor ** 2 * signedAreaOf(outline), {
            withinMm2: 2e-12 * (factor * sizeOf(outline) + 300) ** 2,
          })
        },
      ),
    )
  })

  it('is the sum of its parts when a segment is split', () => {
    fc.assert(
      fc.property(anyOutline(), fc.double({ min: 0.01, max: 0.99, noNaN: true }), (outline, t) => {
        const split = outline.flatMap((segment) => splitAt(segment, t))
        expectWithin(signedAreaOf(split), signedAreaOf(outline), { withinMm2: 20 * roundingOf(outline, 2) })
      }),
    )
  })

  it('agrees with the area among its moments', () => {
    fc.assert(
      fc.property(anySolidOutline(), (outline) => {
        expectWithin(areaMomentsOf(outline).area, signedAreaOf(outline), {
          withinMm2: 20 * roundingOf(outline, 2),
        })
      }),
    )
  })
})

describe('moments', () => {
  it('of the centroid move with the outline; those about it stay', () => {
    fc.assert(
      fc.property(anySolidOutline(), anyPoint(), (outline, shift) => {
        const before = areaMomentsOf(outline)
        const after = areaMomentsOf(movedBy(outline, shift))
        const first = 50 * roundingOf(outline, 3)
        expectWithin(after.centroid.x * after.area, (before.centroid.x + shift.x) * before.area, {
          withinMm3: first,
        })
        expectWithin(after.centroid.y * after.area, (before.centroid.y + shift.y) * before.area, {
          withinMm3: first,
        })
        // about the centroid second moments are differences: they may lose the centroid's own square
        const second = { withinMm4: 200 * centralRoundingOf(outline) }
        expectWithin(after.centralXX, before.centralXX, second)
        expectWithin(after.centralYY, before.centralYY, second)
        expectWithin(after.centralXY, before.centralXY, second)
      }),
    )
  })

  it('turn as a tensor does', () => {
    fc.assert(
      fc.property(anySolidOutline(), anyAngleRad(), (outline, angle) => {
        const m = areaMomentsOf(outline)
        const turned = areaMomentsOf(turnedBy(outline, angle))
        const c = Math.cos(angle)
        const s = Math.sin(angle)
        const within = { withinMm4: 200 * roundingOf(outline, 4) }
        expectWithin(
          turned.secondXX,
          c * c * m.secondXX - 2 * c * s * m.secondXY + s * s * m.secondYY,
          within,
        )
        expectWithin(
          turned.secondYY,
          s * s * m.secondXX + 2 * c * s * m.secondXY + c * c * m.secondYY,
          within,
        )
        const mixed = c * s * (m.secondXX - m.secondYY) + (c * c - s * s) * m.secondXY
        expectWithin(turned.secondXY, mixed, within)
      }),
    )
  })

  it('turn over with the direction, all alike, and the centroid stays', () => {
    fc.assert(
      fc.property(anySolidOutline(), (outline) => {
        const m = areaMomentsOf(outline)
        const r = areaMomentsOf(reversed(outline))
        expectWithin(r.firstX, -m.firstX, { withinMm3: 50 * roundingOf(outline, 3) })
        expectWithin(r.secondXY, -m.secondXY, { withinMm4: 200 * roundingOf(outline, 4) })
        expectWithin(r.centroid.x * m.area, m.centroid.x * m.area, { withinMm3: 50 * roundingOf(outline, 3) })
      }),
    )
  })

  it('are the sums of the parts when segments are split', () => {
    fc.assert(
      fc.property(anySolidOutline(), fc.double({ min: 0.01, max: 0.99, noNaN: true }), (outline, t) => {
        const m = areaMomentsOf(outline)
        const parts = areaMomentsOf(outline.flatMap((segment) => splitAt(segment, t)))
        expectWithin(parts.firstX, m.firstX, { withinMm3: 50 * roundingOf(outline, 3) })
        expectWithin(parts.firstY, m.firstY, { withinMm3: 50 * roundingOf(outline, 3) })
        expectWithin(parts.secondXX, m.secondXX, { withinMm4: 200 * roundingOf(outline, 4) })
        expectWithin(parts.secondYY, m.secondYY, { withinMm4: 200 * roundingOf(outline, 4) })
        expectWithin(parts.secondXY, m.secondXY, { withinMm4: 200 * roundingOf(outline, 4) })
      }),
    )
  })
})

/** Second moments about a centroid far outside a thin crossing outline are differences of (first moment)²/area. */
function centralRoundingOf(outline: Outline): number {
  const { area } = areaMomentsOf(outline)
  const size = sizeOf(outline) + 200
  return 1e-13 * size ** 4 * Math.max(1, size ** 2 / Math.abs(area)) ** 2
}

describe('length', () => {
  it('stays when a path is turned, shifted, mirrored, reversed or split', () => {
    fc.assert(
      fc.property(anyPath(), anyAngleRad(), anyPoint(), (path, angle, shift) => {
        const length = lengthOf(path, { accuracyMm: ACCURACY_MM })
        const within = { withinMm: 2 * ACCURACY_MM }
        const paths = [
          turnedBy(path, angle, shift),
          movedBy(path, shift),
          mirrored(path, shift.x),
          reversed(path),
          path.flatMap((segment) => splitAt(segment, 0.37)),
        ]
        for (const other of paths) expectWithin(lengthOf(other, { accuracyMm: ACCURACY_MM }), length, within)
      }),
    )
  })

  it('grows with the scale', () => {
    fc.assert(
      fc.property(anyPath(), fc.double({ min: 0.1, max: 10, noNaN: true }), (path, factor) => {
        const scaled = lengthOf(scaledBy(path, factor), { accuracyMm: ACCURACY_MM })
        expectWithin(scaled, factor * lengthOf(path, { accuracyMm: ACCURACY_MM }), {
          withinMm: 11 * ACCURACY_MM,
        })
      }),
    )
  })

  it('has a centroid that moves with the path', () => {
    fc.assert(
      fc.property(anyPath(), anyAngleRad(), (path, angle) => {
        const { length, centroid } = lineMomentsOf(path, { accuracyMm: ACCURACY_MM })
        const turned = lineMomentsOf(turnedBy(path, angle), { accuracyMm: ACCURACY_MM })
        expectWithin(turned.length, length, { withinMm: 2 * ACCURACY_MM })
        const expectedX = centroid.x * Math.cos(angle) - centroid.y * Math.sin(angle)
        const expectedY = centroid.x * Math.sin(angle) + centroid.y * Math.cos(angle)
        expectWithin(turned.centroid.x, expectedX, { withinMm: 4 * ACCURACY_MM })
        expectWithin(turned.centroid.y, expectedY, { withinMm: 4 * ACCURACY_MM })
      }),
    )
  })
})

describe('bounds', () => {
  it('hold every point of the path and are reached on all four sides', () => {
    fc.assert(
      fc.property(anyPath(), (path) => {
        const { min, max } = boundsOf(path)
        const points = path.flatMap((segment) =>
          Array.from({ length: 401 }, (_, i) => pointAt(segment, i / 400)),
        )
        const slack = 1e-12 * sizeOf(path)
        const isInside = points.every(
          ({ x, y }) => x >= min.x - slack && x <= max.x + slack && y >= min.y - slack && y <= max.y + slack,
        )
        expect(isInside).toBe(true)
        const coarse = 1e-2 * sizeOf(path)
        expectWithin(Math.min(...points.map((p) => p.x)), min.x, { withinMm: coarse })
        expectWithin(Math.max(...points.map((p) => p.y)), max.y, { withinMm: coarse })
      }),
    )
  })
})

describe('a path kept as JSON', () => {
  it('comes back equal, measure for measure', () => {
    fc.assert(
      fc.property(anySolidOutline(), (outline) => {
        const back = JSON.parse(JSON.stringify(outline)) as Outline
        expect(back).toEqual(JSON.parse(JSON.stringify(outline.map((segment) => ({ ...segment })))))
        expect(signedAreaOf(back)).toBe(signedAreaOf(outline))
        expect(areaMomentsOf(back)).toEqual(areaMomentsOf(outline))
        expect(lengthOf(back)).toBe(lengthOf(outline))
      }),
    )
  })
})
