import fc from 'fast-check'
import type { default as Library } from 'paper'
import core from 'paper/dist/paper-core.js'
import { beforeAll, describe, it } from 'vitest'
import {
  arcFromCentre,
  boundsOf,
  cubicFrom,
  lengthOf,
  lineFrom,
  pointFrom as at,
  pointAt,
  nearestOnPath,
  signedAreaOf,
  type CubicSegment,
  type Outline,
} from '@shared/geometry'
import { anyPoint } from '../../helpers/arbitraries-geometry'
import { expectWithin } from '../../helpers/expect-within'

// The package types its core, which runs without a page, only by the name of the whole.
const paper = core as unknown as typeof Library

/** The same cubics in a general-purpose vector library (paper 0.12.20), which shares no code with ours: another road to each measure. */
function inLibrary(cubics: readonly CubicSegment[], isClosed: boolean): InstanceType<typeof paper.Path> {
  const segments = cubics.map(({ start, control1 }, i) => {
    const before = cubics[(i + cubics.length - 1) % cubics.length]?.control2 ?? start
    return new paper.Segment(
      [start.x, start.y],
      [before.x - start.x, before.y - start.y],
      [control1.x - start.x, control1.y - start.y],
    )
  })
  const last = cubics.at(-1)
  if (!isClosed && last) {
    const { end, control2 } = last
    segments.push(new paper.Segment([end.x, end.y], [control2.x - end.x, control2.y - end.y]))
  }
  return new paper.Path({ segments, closed: isClosed, insert: false })
}

const anyCubics = (): fc.Arbitrary<readonly CubicSegment[]> =>
  fc.array(fc.tuple(anyPoint(), anyPoint(), anyPoint()), { minLength: 2, maxLength: 7 }).map((rows) =>
    rows.map(([start, control1, control2], i) => {
      const [end] = rows[(i + 1) % rows.length] ?? [start]
      return cubicFrom(start, control1, control2, end)
    }),
  )

beforeAll(() => {
  paper.setup(new paper.Size(1, 1))
})

describe('a general-purpose curve library', () => {
  it('finds the same area of any outline of cubics', () => {
    fc.assert(
      fc.property(anyCubics(), (outline) => {
        expectWithin(signedAreaOf(outline), inLibrary(outline, true).area, { withinMm2: 1e-8 })
      }),
    )
  })

  // the library integrates speed by a fixed rule without halving, so only curves without sharp turns can be compared closely
  it('finds the same length of plain cubics, as far as its own fixed quadrature goes', () => {
    fc.assert(
      fc.property(anyPoint(), anyPoint(), (start, end) => {
        const dx = end.x - start.x
        const dy = end.y - start.y
        const first = at(start.x + dx / 3 - dy / 5, start.y + dy / 3 + dx / 5)
        const second = at(start.x + (2 * dx) / 3 - dy / 9, start.y + (2 * dy) / 3 + dx / 9)
        const cubic = cubicFrom(start, first, second, end)
        expectWithin(lengthOf([cubic], { accuracyMm: 1e-9 }), inLibrary([cubic], false).length, {
          withinMm: 1e-7,
        })
      }),
    )
  })

  it('finds the same bounds and the same nearest places', () => {
    fc.assert(
      fc.property(anyCubics(), anyPoint(), (outline, point) => {
        const path = inLibrary(outline, true)
        const { min, max } = boundsOf(outline)
        expectWithin(min.x, path.bounds.left, { withinMm: 1e-6 })
        expectWithin(max.y, path.bounds.bottom, { withinMm: 1e-6 })
        const theirs = path.getNearestPoint(new paper.Point(point.x, point.y))
        const reached = Math.hypot(theirs.x - point.x, theirs.y - point.y)
        expectWithin(nearestOnPath(outline, point).distance, reached, { withinMm: 1e-2 })
      }),
    )
  })

  // it knows only cubics: its circle of four is out by up to 2.7·10⁻⁴ of the radius, its area 2.8·10⁻⁴ high
  it('finds a circle 0.028 % larger than it is, while ours is exact', () => {
    const ours: Outline = [
      arcFromCentre(at(0, 0), 10, 0, Math.PI),
      arcFromCentre(at(0, 0), 10, Math.PI, Math.PI),
    ]
    const theirs = new paper.Path.Circle({ center: [0, 0], radius: 10, insert: false })
    expectWithin(signedAreaOf(ours), 100 * Math.PI, { withinMm2: 1e-12 })
    expectWithin(Math.abs(theirs.area) / (100 * Math.PI) - 1, 0.00028, { within: 5e-6 })
    expectWithin(theirs.length, lengthOf(ours), { withinRatio: 3e-4 })
  })

  it('agrees on a quarter circle drawn as the very cubic it uses', () => {
    const k = (4 * (Math.SQRT2 - 1)) / 3
    const quarter = cubicFrom(at(10, 0), at(10, 10 * k), at(10 * k, 10), at(0, 10))
    const outline = [quarter, lineFrom(at(0, 10), at(0, 0)), lineFrom(at(0, 0), at(10, 0))]
    expectWithin(signedAreaOf(outline) / (25 * Math.PI) - 1, 0.00028, { within: 5e-6 })
    const { x, y } = pointAt(quarter, 0.5)
    expectWithin(Math.hypot(x, y), 10, { withinMm: 1e-12 })
  })
})
