import { describe, it } from 'vitest'
import {
  arcGeometryOf,
  endTangentOf,
  lengthOf,
  startTangentOf,
  type ArcSegment,
  type Segment,
} from '@shared/geometry'
import { measuresOf, memberSegments, withDefaults } from '@shared/section'
import type { Member } from '@shared/section'
import { expectWithin } from '../../helpers/expect-within'

/**
 * The builders' constructions of the classical members with ruler and compass. Sources (public domain, all seen in print unless marked):
 * N = Peter Nicholson, Mechanic's Companion (1831), mouldings, figs. 1–12; Sh = Thomas Sheraton, Cabinet-Maker and Upholsterer's Drawing-Book
 * (London 1793); H = R. G. Hatfield, American House Carpenter, figs. 210–221; B = ICS Building Trades Pocketbook, Roman mouldings.
 * They draw a moulding against a wall: p out from it, h up it, the figures printed beside each being computed from the construction. A frame lies
 * with its wall below, so that p is the rise and h the width (or, seen the other way, the width and the rise): both are tried where they differ.
 */
const START = { x: 0, y: 0 }
const arcsOf = (member: Member): ArcSegment[] => memberSegments(member, START) as ArcSegment[]
const radiiOf = (member: Member): number[] => arcsOf(member).map((arc) => arcGeometryOf(arc).radius)

describe('the ovolo', () => {
  it('of equal parts is a quadrant: length π/2 of its radius (N 6, B c)', () => {
    expectWithin(lengthOf(arcsOf({ kind: 'ovolo', width: 1, rise: 1 })), Math.PI / 2, { withinMm: 1e-12 })
  })

  it.each([
    // H 210: p < h, the curve upright at the projecting end, R = (p² + h²)/(2p)
    ['H 210', 0.6, 1, 1.133333],
    ['H 210', 0.8, 1.2, 1.3],
    // H 212: p > h, R = (p² + h²)/(2h)
    ['H 212', 1, 0.6, 1.133333],
  ])('of unequal parts has the radius of %s: p %s, h %s → %s', (_, p, h, radius) => {
    for (const [width, rise] of [
      [p, h],
      [h, p],
      [p, -h],
    ] as const) {
      const [own] = radiiOf({ kind: 'ovolo', width, rise })
      expectWithin(own ?? NaN, radius, { withinMm: 5e-7 })
    }
  })

  it('drawn about a centre as far from both ends as it is high turns through 73.87238° (N 7)', () => {
    // p 0.8, h 1.2, radius 1.2: given as an explicit arc, its radius and length come back
    const member: Member = { kind: 'ovolo', width: 0.8, rise: 1.2, arc: 73.87238 }
    expectWithin(radiiOf(member)[0] ?? NaN, 1.2, { withinMm: 1e-6 })
    expectWithin(lengthOf(arcsOf(member)), 1.54718, { withinMm: 1e-6 })
  })
})

describe('the cavetto', () => {
  it('of equal parts is a hollow quadrant: 1 − π/4 of its square is solid (N 8, B b)', () => {
    const section = withDefaults({
      sightEdgeHeight: 1,
      rebate: { width: 0, depth: 0 },
      members: [{ kind: 'cavetto', width: 1, rise: 1 }],
    })
    expectWithin(measuresOf(section).section.areaMm2 - 1, 1 - Math.PI / 4, { withinMm2: 1e-12 })
  })
})

describe('the cyma', () => {
  const kinds = ['cyma-recta', 'cyma-reversa'] as const

  it('of any parts is two sixths of circles of half the chord (N 11, Sh, H 220–221)', () => {
    // p 0.6, h 1: r 0.583095, length π/3 of the chord
    for (const kind of kinds) {
      const member: Member = { kind, width: 1, rise: 0.6 }
      for (const radius of radiiOf(member)) expectWithin(radius, 0.583095, { withinMm: 5e-7 })
      expectWithin(lengthOf(arcsOf(member)), 1.221231, { withinMm: 1e-6 })
    }
  })

  it('leaves and takes alike: its area is that of the straight chord', () => {
    for (const kind of kinds) {
      const section = withDefaults({
        sightEdgeHeight: 2,
        rebate: { width: 0, depth: 0 },
        members: [{ kind, width: 1, rise: 0.6 }],
      })
      expectWithin(measuresOf(section).section.areaMm2, 2.3, { withinMm2: 1e-12 })
    }
  })

  it('of equal parts by quadrants has its centres on level and plumb lines: r = h/2, length π/2 (N 10, B d)', () => {
    const member: Member = { kind: 'cyma-recta', width: 1, rise: 1, arc: 90 }
    for (const radius of radiiOf(member)) expectWithin(radius, 0.5, { withinMm: 1e-12 })
    expectWithin(lengthOf(arcsOf(member)), Math.PI / 2, { withinMm: 1e-12 })
  })

  it('is recta where its ends run with the wall’s breadth, reversa where they stand square to it (N; W. R. Ware, The American Vignola)', () => {
    // quadrants: the ends of the one are level, of the other upright. Against a wall the projecting half of a recta is hollow, and so is the higher here.
    const upright = memberSegments({ kind: 'cyma-recta', width: 1, rise: 1, arc: 90 }, START)
    expectWithin(Math.abs(startTangentOf(upright).y), 1, { within: 1e-12 })
    expectWithin(Math.abs(endTangentOf(upright).y), 1, { within: 1e-12 })
    const level = memberSegments({ kind: 'cyma-reversa', width: 1, rise: 1, arc: 90 }, START)
    expectWithin(Math.abs(startTangentOf(level).x), 1, { within: 1e-12 })
    expectWithin(Math.abs(endTangentOf(level).x), 1, { within: 1e-12 })
  })
})

describe('the scotia', () => {
  it('of height 3 has quadrants of 1 and 2, the lower lip standing 1 beyond the upper, and length 3π/2 (N 9)', () => {
    for (const rise of [1, -1]) {
      const member: Member = { kind: 'scotia', width: 3, rise }
      const expected = rise > 0 ? [1, 2] : [2, 1]
      for (const [index, radius] of radiiOf(member).entries())
        expectWithin(radius, expected[index] ?? NaN, { withinMm: 1e-12 })
      expectWithin(lengthOf(arcsOf(member)), (3 * Math.PI) / 2, { withinMm: 1e-12 })
    }
  })
})

describe('torus, bead and astragal', () => {
  it('are half rounds on their width: length πh/2 (N 1–5, B a, H 317)', () => {
    for (const kind of ['torus', 'bead'] as const) {
      const segments: Segment[] = memberSegments({ kind, width: 5, rise: 0 }, START)
      expectWithin(lengthOf(segments), 2.5 * Math.PI, { withinMm: 1e-12 })
    }
  })
})
