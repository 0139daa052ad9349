import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  arcGeometryOf,
  endTangentOf,
  flattened,
  nearestOnPath,
  offsetPolygon,
  polygonAreaOf,
  reversed,
  signedAreaOf,
  startTangentOf,
  type Point,
  type Polygon,
  type Segment,
} from '@shared/geometry'
import { faceOf, faultsOfSection, woodFaceOf, woodOutlineOf } from '@shared/section'
import type { Member, PartialSection, Section, WoodFace } from '@shared/section'
import { anySection } from '../../helpers/arbitraries-section'
import { expectWithin } from '../../helpers/expect-within'
import { between, fillet, sectionWith } from '../../helpers/sections'

const G = 0.6
const woodOf = (members: readonly Member[], parts: Partial<PartialSection> = {}): WoodFace =>
  woodFaceOf(sectionWith({ members, gesso: G, ...parts }))

/** Start of the face and every segment's end. */
const cornersOf = ({ path }: WoodFace): Point[] => [path[0]?.start as Point, ...path.map(({ end }) => end)]

function expectCorners(wood: WoodFace, expected: readonly (readonly [number, number])[]): void {
  const corners = cornersOf(wood)
  expect(corners).toHaveLength(expected.length)
  for (const [index, [x, y]] of expected.entries()) {
    expectWithin((corners[index] as Point).x, x, { withinMm: 1e-9 })
    expectWithin((corners[index] as Point).y, y, { withinMm: 1e-9 })
  }
}

describe('woodFaceOf', () => {
  it('is the finished face where there is no gesso', () => {
    const section = between({ kind: 'thumb', width: 5, rise: 3 })
    const { swallowed, ...face } = woodFaceOf(section)
    expect(face).toEqual(faceOf(section))
    expect(swallowed).toEqual([])
    expect(woodFaceOf({ ...section, gesso: [{ from: 0, to: 3, thickness: 0 }] }).path).toEqual(face.path)
  })

  it('lowers a level face from edge to edge', () => {
    expectCorners(woodOf([fillet(40)]), [
      [0, 29.4],
      [40, 29.4],
    ])
  })

  it('moves walls in, mitres inner corners and cuts outer ones', () => {
    const wood = woodOf([fillet(10), fillet(0, 5), fillet(10), fillet(0, -8), fillet(10)])
    expectCorners(wood, [
      [0, 29.4],
      [10.6, 29.4],
      [10.6, 34.4],
      [19.4, 34.4],
      [19.4, 26.4],
      [30, 26.4],
    ])
    expect(wood.memberOf).toEqual([0, 1, 2, 3, 4])
    expect(wood.breaks).toEqual(cornersOf(wood))
  })

  it('keeps arcs about their centres: a round shrinks by the gesso, a hollow grows', () => {
    const radius = (kind: 'cavetto' | 'ovolo'): number => {
      const { path } = woodOf([fillet(10), { kind, width: 5, rise: 5 }, fillet(10)])
      const arc = path.find((segment) => segment.kind === 'arc')
      if (arc?.kind !== 'arc') throw new Error('no arc')
      const { centre, radius } = arcGeometryOf(arc)
      expectWithin(centre.x, kind === 'cavetto' ? 10 : 15, { withinMm: 1e-9 })
      expectWithin(centre.y, kind === 'cavetto' ? 35 : 30, { withinMm: 1e-9 })
      return radius
    }
    expectWithin(radius('cavetto'), 5.6, { withinMm: 1e-9 })
    expectWithin(radius('ovolo'), 4.4, { withinMm: 1e-9 })
  })

  it('meets a bead standing on a fillet in mitred corners', () => {
    // half round of radius 3 about (13, 30): radius 2.4 in the wood, walls straight down to 29.4
    expectCorners(woodOf([fillet(10), { kind: 'bead', width: 6, rise: 0 }, fillet(10)]), [
      [0, 29.4],
      [10.6, 29.4],
      [10.6, 30],
      [15.4, 30],
      [15.4, 29.4],
      [26, 29.4],
    ])
  })

  it('mitres a V at g·√2 below a right-angled root', () => {
    const wood = woodOf([fillet(10), { kind: 'quirk', width: 2, rise: 0, depth: 1, shape: 'v' }, fillet(10)])
    const deep = G * Math.SQRT2
    const inset = G * (Math.SQRT2 - 1)
    expectCorners(wood, [
      [0, 29.4],
      [10 - inset, 29.4],
      [11, 29 - deep],
      [12 + inset, 29.4],
      [22, 29.4],
    ])
  })

  it('cuts an inner corner square, one gesso deep, where its mitre would reach beyond four', () => {
    // half angle of the V: atan(1/6), mitre g/sin = 6.08 g
    const wood = woodOf([fillet(10), { kind: 'quirk', width: 2, rise: 0, depth: 6, shape: 'v' }, fillet(10)])
    const flat = cornersOf(wood).filter(({ y }) => Math.abs(y - (24 - G)) < 1e-9)
    expect(flat).toHaveLength(2)
    // half angle with a mitre of just under 4 g: asin(0.2505)
    const depth = 1 / Math.tan(Math.asin(0.2505))
    const mitred = woodOf([fillet(10), { kind: 'quirk', width: 2, rise: 0, depth, shape: 'v' }, fillet(10)])
    const root = cornersOf(mitred)[2] as Point
    expectWithin(root.y, 30 - depth - G / 0.2505, { withinMm: 1e-9 })
  })

  it('leaves a flat two gessoes wide in the cleft between two reeds', () => {
    const reeds: Member = { kind: 'reeds', width: 12, rise: 0, count: 2, fillet: 0 }
    const flat = cornersOf(woodOf([fillet(10), reeds, fillet(10)])).filter(
      ({ x, y }) => x > 15 && x < 17 && Math.abs(y - 29.4) < 1e-9,
    )
    expect(flat.map(({ x }) => Math.round(x * 1e6) / 1e6)).toEqual([15.4, 16.6])
  })

  it('says which members the gesso swallows and closes over them', () => {
    const bead = woodOf([fillet(10), { kind: 'bead', width: 1, rise: 0 }, fillet(10)])
    expect(bead.swallowed.map(({ member }) => member)).toEqual([1])
    expect(bead.swallowed[0]?.says).toContain('Member 2 (bead)')
    expectWithin(
      signedAreaOf(
        reversed(
          woodOutlineOf(
            sectionWith({ members: [fillet(10), { kind: 'bead', width: 1, rise: 0 }, fillet(10)], gesso: G }),
          ),
        ),
      ),
      21 * 29.4 - 6 * 12,
      { withinMm2: 1e-9 },
    )
    const lip = woodOf([fillet(10), fillet(0, 5), fillet(1), fillet(0, -7), fillet(10)])
    expect(lip.swallowed.map(({ member }) => member)).toEqual([1, 2])
    expect(lip.breaks[1]).toEqual(lip.breaks[2])
  })

  it('swallows a bead exactly as round as the gesso is thick', () => {
    const wood = woodOf([fillet(10), { kind: 'bead', width: 1.2, rise: 0 }, fillet(10)])
    expect(wood.swallowed.map(({ member }) => member)).toEqual([1])
    expect(cornersOf(wood).every(({ y }) => Math.abs(y - 29.4) < 1e-9)).toBe(true)
  })

  it('steps at the breaks where the gesso changes', () => {
    const wood = woodOf([fillet(10), fillet(10), fillet(10)], { gesso: [{ from: 1, to: 2, thickness: G }] })
    expectCorners(wood, [
      [0, 30],
      [10, 30],
      [10, 29.4],
      [20, 29.4],
      [20, 30],
      [30, 30],
    ])
  })

  it('ends gesso at a corner on the bare wall beside it', () => {
    const wood = woodOf([fillet(10), fillet(0, 5), fillet(10)], { gesso: [{ from: 2, to: 3, thickness: G }] })
    expectCorners(wood, [
      [0, 30],
      [10, 30],
      [10, 34.4],
      [20, 34.4],
    ])
  })

  it('ends on the lines of sight edge and back edge, whatever way the face leaves them', () => {
    const splay: Member = { kind: 'splay', width: 5, rise: 5 }
    const ovolo: Member = { kind: 'ovolo', width: 5, rise: -5 }
    const corners = cornersOf(woodOf([splay, fillet(10), ovolo]))
    // the splay's offset comes down to x = 0 at g·√2 below its start; the ovolo ends upright, so that its gesso stands beside the back edge
    expectWithin(corners[0]?.x ?? NaN, 0, { withinMm: 0 })
    expectWithin(corners[0]?.y ?? NaN, 30 - G * Math.SQRT2, { withinMm: 1e-9 })
    expectWithin(corners.at(-1)?.x ?? NaN, 20, { withinMm: 0 })
    expectWithin(corners.at(-1)?.y ?? NaN, 30, { withinMm: 1e-9 })
    expectCorners(woodOf([fillet(0, 5), fillet(10)]), [
      [0, 30],
      [0.6, 30],
      [0.6, 34.4],
      [10, 34.4],
    ])
  })

  it('lies the gesso’s thickness inside the finished face, an ellipse’s within 10⁻³ mm', () => {
    const section = { ...between({ kind: 'thumb', width: 12, rise: 7 }), gesso: G }
    const { path, memberOf } = woodFaceOf(section)
    const finished = faceOf(section).path
    const thumb = path.filter((segment, index) => memberOf[index] === 1 && segment.kind === 'arc')
    for (const point of flattened(thumb, 1e-3))
      expectWithin(nearestOnPath(finished, point).distance, G, { withinMm: 1e-3 })
  })
})

describe('any wood face', () => {
  const gessoed = () => anySection(fc.integer({ min: 1, max: 15 }).map((tenths) => tenths / 10))

  it('runs without a gap from the sight-edge line to the back-edge line', () => {
    fc.assert(
      fc.property(gessoed(), (section) => {
        const { path, breaks } = woodFaceOf(section)
        const last = faceOf(section).breaks.at(-1) as Point
        expect(path[0]?.start.x).toBe(0)
        expect(path.at(-1)?.end.x).toBe(last.x)
        expect(breaks).toHaveLength(section.members.length + 1)
        for (const [index, { start }] of path.slice(1).entries()) expect(start).toEqual(path[index]?.end)
      }),
    )
  })

  /** With level ends, where the edges cut the offset off squarely; a gesso thicker than a round at the very edge has no true offset there. */
  const levelEnded = (gesso: number) =>
    anySection(fc.constant(gesso))
      .map((section) => ({
        ...section,
        members: [...section.members, fillet(12)],
        backSplay: { x: 0, height: 0 },
      }))
      .filter((section) => faultsOfSection(section).length === 0)

  it('is nowhere nearer to the finished face than its gesso, nor further than its longest mitre', () => {
    fc.assert(
      fc.property(fc.constantFrom(0.2, 0.6, 1.2).chain(levelEnded), (section) => {
        const finished = faceOf(section).path
        const g = section.gesso as number
        for (const point of flattened(woodFaceOf(section).path, 0.01)) {
          const { distance } = nearestOnPath(finished, point)
          expect(distance).toBeGreaterThan(g - 1e-3)
          expect(distance).toBeLessThanOrEqual(4 * g + 1e-6)
        }
      }),
    )
  })

  /** Longest mitre of the face in multiples of the gesso: 1/cos of half the turn at its inner corners. */
  const mitresOf = (section: Section): number[] => {
    const { path } = faceOf(section)
    return path.slice(1).map((segment, index) => {
      const before = endTangentOf(path[index] as Segment)
      const after = startTangentOf(segment)
      const turn = Math.atan2(
        before.x * after.y - before.y * after.x,
        before.x * after.x + before.y * after.y,
      )
      return 1 / Math.cos(turn / 2)
    })
  }

  /** A face made into a region far deeper than any gesso, its ends carried on level beyond the edges. */
  const regionUnder = (points: readonly Point[], deep: number): Polygon => {
    const first = points[0] as Point
    const last = points.at(-1) as Point
    return [{ x: first.x, y: -deep }, ...points, { x: last.x, y: -deep }]
  }

  it('has the area that polygon clipping leaves of the wood, mitred alike', () => {
    fc.assert(
      fc.property(fc.constantFrom(0.3, 0.8).chain(levelEnded), (section) => {
        // a mitre right at the limit is cut square or not by the last digit of its angle
        fc.pre(mitresOf(section).every((mitre) => mitre < 3 || mitre > 5))
        const g = section.gesso as number
        const clipped = offsetPolygon(regionUnder(flattened(faceOf(section).path, 1e-4), 20), -g)
        const clippedArea = clipped.reduce((sum, polygon) => sum + polygonAreaOf(polygon), 0)
        const wood = [...flattened(woodFaceOf(section).path, 1e-4)]
        const width = (wood.at(-1) as Point).x
        // the region shrinks at its sides and bottom as well
        const own = Math.abs(polygonAreaOf(regionUnder(wood, 20)))
        const sides =
          g * ((wood[0] as Point).y + 20) + g * ((wood.at(-1) as Point).y + 20) + g * (width - 2 * g)
        expectWithin(clippedArea, own - sides, { withinMm2: 0.25 })
      }),
      { numRuns: 15 },
    )
  })
})
