import { describe, expect, it } from 'vitest'
import {
  arcGeometryOf,
  endTangentOf,
  isSamePoint,
  pointAt,
  startTangentOf,
  tangentAt,
  type ArcSegment,
  type Point,
  type Segment,
} from '@shared/geometry'
import { defaultArcOf, memberEndOf, memberSegments } from '@shared/section'
import type { Member } from '@shared/section'
import { expectWithin } from '../../helpers/expect-within'

const START: Point = { x: 3, y: 20 }
const segmentsOf = (member: Member): Segment[] => memberSegments(member, START)

function arcAt(segments: readonly Segment[], index: number): ArcSegment {
  const segment = segments[index]
  if (segment?.kind !== 'arc') throw new Error(`segment ${index} is no arc`)
  return segment
}

function expectPoint(actual: Point, x: number, y: number): void {
  expectWithin(actual.x, x, { withinMm: 1e-12 })
  expectWithin(actual.y, y, { withinMm: 1e-12 })
}

const EVERY_KIND: readonly Member[] = [
  { kind: 'fillet', width: 4, rise: 0 },
  { kind: 'splay', width: 4, rise: -2 },
  { kind: 'cavetto', width: 5, rise: 3 },
  { kind: 'ovolo', width: 5, rise: -7 },
  { kind: 'thumb', width: 8, rise: 5 },
  { kind: 'cyma-recta', width: 20, rise: 15 },
  { kind: 'cyma-reversa', width: 20, rise: -15 },
  { kind: 'scotia', width: 9, rise: 2 },
  { kind: 'torus', width: 9, rise: -2 },
  { kind: 'bead', width: 3, rise: 0 },
  { kind: 'reeds', width: 10, rise: 0, count: 3, fillet: 0.7 },
  { kind: 'flutes', width: 10, rise: 0, count: 3, fillet: 0.7, depth: 1 },
  { kind: 'quirk', width: 2, rise: 0, depth: 3, shape: 'square' },
  {
    kind: 'free',
    width: 12,
    rise: -9,
    curves: [
      [
        [3, 0],
        [6, -2],
        [8, -5],
      ],
      [
        [9, -6.5],
        [11, -9],
        [12, -9],
      ],
    ],
  },
]

describe('memberSegments', () => {
  it.each(EVERY_KIND)('draws a $kind from its start to start + (width, rise) without a gap', (member) => {
    const segments = segmentsOf(member)
    expect(segments[0]?.start).toBe(START)
    expect(segments.at(-1)?.end).toEqual({ x: 3 + member.width, y: 20 + member.rise })
    expect(segments.at(-1)?.end).toEqual(memberEndOf(member, START))
    for (const [index, segment] of segments.slice(1).entries())
      expect(isSamePoint(segment.start, (segments[index] as Segment).end)).toBe(true)
  })

  it('makes a cavetto of equal parts a hollow quarter circle, level at the foot and upright at the head', () => {
    const segments = segmentsOf({ kind: 'cavetto', width: 5, rise: 5 })
    const { centre, radius } = arcGeometryOf(arcAt(segments, 0))
    expectPoint(centre, 3, 25)
    expectWithin(radius, 5, { withinMm: 1e-12 })
    expectPoint(startTangentOf(segments), 1, 0)
    expectPoint(endTangentOf(segments), 0, 1)
  })

  it('makes an ovolo round: its centre lies in the wood', () => {
    const { centre, radius } = arcGeometryOf(arcAt(segmentsOf({ kind: 'ovolo', width: 5, rise: 5 }), 0))
    expectPoint(centre, 8, 20)
    expectWithin(radius, 5, { withinMm: 1e-12 })
  })

  it('gives a thumb the tangents of its axes, convex unless hollow, rising and falling', () => {
    const rising = segmentsOf({ kind: 'thumb', width: 8, rise: 5 })
    expectPoint(startTangentOf(rising), 0, 1)
    expectPoint(endTangentOf(rising), 1, 0)
    const falling = segmentsOf({ kind: 'thumb', width: 8, rise: -5 })
    expectPoint(startTangentOf(falling), 1, 0)
    expectPoint(endTangentOf(falling), 0, -1)
    const hollow = segmentsOf({ kind: 'thumb', width: 8, rise: 5, hollow: true })
    expectPoint(startTangentOf(hollow), 1, 0)
    expectPoint(endTangentOf(hollow), 0, 1)
    // an ellipse of semi-axes 8 and 5 about (11, 20), at 45° of its parameter
    expectPoint(pointAt(rising[0] as Segment, 0.5), 11 - 8 * Math.SQRT1_2, 20 + 5 * Math.SQRT1_2)
  })

  it('puts the hollow of a cyma recta at its higher end, of a cyma reversa at its lower', () => {
    const bulges = (member: Member): number[] =>
      segmentsOf(member).map((_, i) => arcAt(segmentsOf(member), i).bulge)
    const sixty = Math.tan(Math.PI / 12)
    expect(bulges({ kind: 'cyma-recta', width: 20, rise: 15 })).toEqual([-sixty, sixty])
    expect(bulges({ kind: 'cyma-recta', width: 20, rise: -15 })).toEqual([sixty, -sixty])
    expect(bulges({ kind: 'cyma-reversa', width: 20, rise: 15 })).toEqual([sixty, -sixty])
    expect(bulges({ kind: 'cyma-reversa', width: 20, rise: -15 })).toEqual([-sixty, sixty])
  })

  it('meets a cyma’s arcs at the chord’s midpoint with one tangent', () => {
    const [first, second] = segmentsOf({ kind: 'cyma-reversa', width: 20, rise: -15 }) as [Segment, Segment]
    expectPoint(first.end, 13, 12.5)
    const before = tangentAt(first, 1)
    expectPoint(tangentAt(second, 0), before.x, before.y)
  })

  it('stands a scotia and a torus upright at their ends and level at their joint', () => {
    for (const kind of ['scotia', 'torus'] as const) {
      const down = kind === 'scotia' ? -1 : 1
      const [first, second] = segmentsOf({ kind, width: 9, rise: 2 }) as [Segment, Segment]
      expectPoint(tangentAt(first, 0), 0, down)
      expectPoint(tangentAt(first, 1), 1, 0)
      expectPoint(tangentAt(second, 0), 1, 0)
      expectPoint(tangentAt(second, 1), 0, -down)
    }
    // scotia: r1 = (9 − 2)/2 down, r2 = (9 + 2)/2 up; torus the other way round
    expectPoint((segmentsOf({ kind: 'scotia', width: 9, rise: 2 })[0] as Segment).end, 6.5, 16.5)
    expectPoint((segmentsOf({ kind: 'torus', width: 9, rise: 2 })[0] as Segment).end, 8.5, 25.5)
  })

  it('sets reeds of diameter (width − (n − 1) f)/n between their fillets', () => {
    const segments = segmentsOf({ kind: 'reeds', width: 10, rise: 0, count: 3, fillet: 0.5 })
    expect(segments.map(({ kind }) => kind)).toEqual(['arc', 'line', 'arc', 'line', 'arc'])
    for (const index of [0, 2, 4])
      expectWithin(arcGeometryOf(arcAt(segments, index)).radius, 1.5, { withinMm: 1e-12 })
    expectPoint(pointAt(segments[2] as Segment, 0.5), 3 + 3.5 + 1.5, 21.5)
    expect(segmentsOf({ kind: 'reeds', width: 9, rise: 0, count: 3, fillet: 0 })).toHaveLength(3)
  })

  it('sinks flutes by their depth, a half round where that is half their chord', () => {
    const shallow = segmentsOf({ kind: 'flutes', width: 10, rise: 0, count: 2, fillet: 2, depth: 1 })
    expectPoint(pointAt(shallow[0] as Segment, 0.5), 5, 19)
    // sagitta 1 on a chord of 4: r = (4² + 4·1²)/(8·1) = 2.5
    expectWithin(arcGeometryOf(arcAt(shallow, 0)).radius, 2.5, { withinMm: 1e-12 })
    const deep = segmentsOf({ kind: 'flutes', width: 10, rise: 0, count: 2, fillet: 2, depth: 2 })
    expectWithin(arcAt(deep, 0).bulge, 1, { within: 1e-15 })
  })

  it('sinks a quirk square or as a V', () => {
    const corners = (shape: 'square' | 'v'): Point[] =>
      segmentsOf({ kind: 'quirk', width: 2, rise: 0, depth: 3, shape }).map(({ end }) => end)
    expect(corners('square')).toEqual([
      { x: 3, y: 17 },
      { x: 5, y: 17 },
      { x: 5, y: 20 },
    ])
    expect(corners('v')).toEqual([
      { x: 4, y: 17 },
      { x: 5, y: 20 },
    ])
  })

  it('takes an explicit arc up to a half circle', () => {
    const [arc] = segmentsOf({ kind: 'cavetto', width: 6, rise: 8, arc: 180 })
    expectWithin(arcGeometryOf(arc as ArcSegment).radius, 5, { withinMm: 1e-12 })
  })
})

describe('defaultArcOf', () => {
  const of = (kind: 'cavetto' | 'cyma-recta', width: number, rise: number) =>
    defaultArcOf({ kind, width, rise })

  it('is 90° where width and rise are equal and 2·atan(lesser/greater) otherwise', () => {
    expectWithin(of('cavetto', 5, -5) ?? NaN, 90, { withinDeg: 1e-12 })
    const narrow = (2 * Math.atan(3 / 5) * 180) / Math.PI
    expectWithin(of('cavetto', 5, 3) ?? NaN, narrow, { withinDeg: 1e-12 })
    expectWithin(of('cavetto', 3, 5) ?? NaN, narrow, { withinDeg: 1e-12 })
  })

  it('meets one axis squarely and passes none', () => {
    const flat = segmentsOf({ kind: 'cavetto', width: 5, rise: 3 })
    expectPoint(startTangentOf(flat), 1, 0)
    const tall = segmentsOf({ kind: 'cavetto', width: 3, rise: 5 })
    expectPoint(endTangentOf(tall), 0, 1)
  })

  it('is 60° for a cyma, less where that would dip or undercut', () => {
    expect(of('cyma-recta', 20, 15)).toBe(60)
    expectWithin(of('cyma-recta', 20, 2) ?? NaN, (2 * Math.atan(0.1) * 180) / Math.PI, { withinDeg: 1e-12 })
    expectWithin(of('cyma-recta', 2, -20) ?? NaN, 180 - (2 * Math.atan(10) * 180) / Math.PI, {
      withinDeg: 1e-12,
    })
  })

  it('is undefined for kinds without an arc of their own', () => {
    expect(defaultArcOf({ kind: 'torus', width: 5, rise: 0 })).toBeUndefined()
  })
})
