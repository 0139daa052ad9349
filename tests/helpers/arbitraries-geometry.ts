import fc from 'fast-check'
import {
  arcFromSweep,
  cubicFrom,
  ellipseFrom,
  lineFrom,
  pointAt,
  quarterEllipseFrom,
  reversed,
  signedAreaOf,
  type Outline,
  type Path,
  type Point,
  type Segment,
} from '@shared/geometry'

/** Coordinates of sections, mm, on a micrometre grid so that counterexamples are readable. */
const anyCoordinate = () =>
  fc.integer({ min: -100_000, max: 100_000 }).map((micrometres) => micrometres / 1000)

export const anyPoint = (): fc.Arbitrary<Point> => fc.record({ x: anyCoordinate(), y: anyCoordinate() })

export const anyAngleRad = (): fc.Arbitrary<number> =>
  fc.double({ min: -2 * Math.PI, max: 2 * Math.PI, noNaN: true })

/** Two points at least a tenth of a millimetre apart. */
const anyEnds = () =>
  fc.tuple(anyPoint(), anyPoint()).filter(([a, b]) => Math.hypot(b.x - a.x, b.y - a.y) > 0.1)

const anySweepRad = () =>
  fc.oneof(
    fc.double({ min: -5.8, max: 5.8, noNaN: true }).filter((sweep) => Math.abs(sweep) > 0.01),
    fc.double({ min: -1e-3, max: 1e-3, noNaN: true }),
    fc.constantFrom(Math.PI / 2, -Math.PI / 2, Math.PI, -Math.PI, 0),
  )

export const anyLine = (): fc.Arbitrary<Segment> => anyEnds().map(([a, b]) => lineFrom(a, b))

export const anyArc = (): fc.Arbitrary<Segment> =>
  fc.tuple(anyEnds(), anySweepRad()).map(([[a, b], sweep]) => arcFromSweep(a, b, sweep))

export const anyEllipse = (): fc.Arbitrary<Segment> =>
  fc
    .record({
      centre: anyPoint(),
      semiX: fc.double({ min: 1, max: 60, noNaN: true }),
      semiY: fc.double({ min: 1, max: 60, noNaN: true }),
      rotationRad: anyAngleRad(),
      startRad: anyAngleRad(),
      sweepRad: fc.double({ min: -5.8, max: 5.8, noNaN: true }).filter((sweep) => Math.abs(sweep) > 0.05),
    })
    .map((shape) => ellipseFrom(shape))

export const anyCubic = (): fc.Arbitrary<Segment> =>
  fc.tuple(anyEnds(), anyPoint(), anyPoint()).map(([[a, b], c, d]) => cubicFrom(a, c, d, b))

/** A cubic without loop or cusp: its controls lie near thirds of the chord. */
export const anyPlainCubic = (): fc.Arbitrary<Segment> =>
  fc
    .tuple(
      anyEnds(),
      fc.double({ min: -0.5, max: 0.5, noNaN: true }),
      fc.double({ min: -0.5, max: 0.5, noNaN: true }),
    )
    .map(([[a, b], p, q]) => {
      const dx = b.x - a.x
      const dy = b.y - a.y
      const first = { x: a.x + dx * 0.3 - dy * p, y: a.y + dy * 0.3 + dx * p }
      const second = { x: a.x + dx * 0.7 - dy * q, y: a.y + dy * 0.7 + dx * q }
      return cubicFrom(a, first, second, b)
    })

export const anySegment = (): fc.Arbitrary<Segment> => fc.oneof(anyLine(), anyArc(), anyEllipse(), anyCubic())

/** A segment between two given points, of any kind. */
const joiningSegment = (a: Point, b: Point): fc.Arbitrary<Segment> => {
  const kinds: fc.Arbitrary<Segment>[] = [
    fc.constant(lineFrom(a, b)),
    anySweepRad().map((sweep) => arcFromSweep(a, b, sweep)),
    fc.tuple(anyPoint(), anyPoint()).map(([c, d]) => cubicFrom(a, c, d, b)),
  ]
  if (a.x !== b.x && a.y !== b.y) {
    kinds.push(
      fc
        .constantFrom<'level' | 'upright'>('level', 'upright')
        .map((leaves) => quarterEllipseFrom(a, b, leaves)),
    )
  }
  return fc.oneof(...kinds)
}

/** A closed path of three to eight segments of every kind; it may cross itself, which no measure minds. */
export const anyOutline = (): fc.Arbitrary<Outline> =>
  fc
    .uniqueArray(anyPoint(), { minLength: 3, maxLength: 8, selector: ({ x, y }) => `${x},${y}` })
    .chain((corners) =>
      fc.tuple(
        ...corners.map((corner, i) => joiningSegment(corner, corners[(i + 1) % corners.length] ?? corner)),
      ),
    )

/** An outline that encloses something, counter-clockwise. */
export const anySolidOutline = (): fc.Arbitrary<Outline> =>
  anyOutline()
    .filter((outline) => Math.abs(signedAreaOf(outline)) > 1)
    .map((outline) => (signedAreaOf(outline) > 0 ? outline : reversed(outline)))

export const anyPath = (): fc.Arbitrary<Path> => anyOutline().map((outline) => outline.slice(0, -1))

/** Greatest coordinate that appears in a path or on its curves, mm: the scale of its rounding. */
export function sizeOf(path: Path): number {
  const points = path.flatMap((segment) => [0, 0.25, 0.5, 0.75, 1].map((t) => pointAt(segment, t)))
  return Math.max(1, ...points.map(({ x, y }) => Math.max(Math.abs(x), Math.abs(y))))
}
