import { describe, it } from 'vitest'
import { arcGeometryOf, arcLengthOf, type ArcSegment } from '@shared/geometry'
import { girthOf, measuresOf, memberSegments, withDefaults } from '@shared/section'
import type { Member, Section } from '@shared/section'
import { expectWithin } from '../../helpers/expect-within'

/**
 * Sections reduced to the plane figures of Machinery's Handbook, 31st ed. (Industrial Press, 2020), pp. 78–80 and 230. The handbook's factors are
 * printed to four figures (quarter circle 0.7854, spandrel 0.2146 and 0.2234); its closed forms π/4, 1 − π/4 and so on are held to rounding here,
 * the printed factors to half their last place. All seen in print.
 */
const block = (members: readonly Member[], sightEdgeHeight = 20): Section =>
  withDefaults({ sightEdgeHeight, rebate: { width: 0, depth: 0 }, members })

const areaOf = (section: Section): number => measuresOf(section).section.areaMm2

describe('members as plane figures', () => {
  const r = 7

  it('a fillet and a quarter-circle ovolo: rectangles and a quarter circle (p. 78)', () => {
    // 10 × 20, then 7 wide: 20 high below, the quarter circle above
    const { areaMm2, centroid } = measuresOf(
      block([
        { kind: 'fillet', width: 10, rise: 0 },
        { kind: 'ovolo', width: r, rise: r },
      ]),
    ).section
    const quarter = (Math.PI / 4) * r * r
    expectWithin(areaMm2, 200 + 20 * r + quarter, { withinMm2: 1e-9 })
    expectWithin((areaMm2 - 200 - 20 * r) / r ** 2, 0.7854, { within: 0.00005 })
    // p. 230: a quarter circle's centre of gravity lies 4r/3π from either straight side; its corner is at (17, 20)
    const g = (4 * r) / (3 * Math.PI)
    const firstX = 200 * 5 + 20 * r * (10 + r / 2) + quarter * (10 + r - g)
    const firstY = 200 * 10 + 20 * r * 10 + quarter * (20 + g)
    expectWithin(centroid.x, firstX / areaMm2, { withinMm: 1e-9 })
    expectWithin(centroid.y, firstY / areaMm2, { withinMm: 1e-9 })
  })

  it('a quarter-circle cavetto: a spandrel (pp. 80, 230)', () => {
    const { areaMm2, centroid } = measuresOf(block([{ kind: 'cavetto', width: r, rise: r }])).section
    const spandrel = (1 - Math.PI / 4) * r * r
    expectWithin(areaMm2, 20 * r + spandrel, { withinMm2: 1e-9 })
    expectWithin((areaMm2 - 20 * r) / r ** 2, 0.2146, { within: 0.00005 })
    // its corner is at (7, 20); 0.2234 r from either straight side
    const firstX = 20 * r * (r / 2) + spandrel * (r - 0.223368 * r)
    expectWithin(centroid.x, firstX / areaMm2, { withinMm: 1e-5 })
    const inY = (areaMm2 * centroid.y - 20 * r * 10) / spandrel - 20
    expectWithin(inY / r, 0.2234, { within: 0.00005 })
  })

  it('the handbook’s spandrel of radius 0.7 in has 0.105 in² (p. 80)', () => {
    const radius = 0.7 * 25.4
    const section = block([{ kind: 'cavetto', width: radius, rise: radius }])
    expectWithin((areaOf(section) - 20 * radius) / 25.4 ** 2, 0.105, { within: 0.0005 })
  })

  it('a half-round bead: πr²/2, its centre of gravity 0.4244 r up (p. 230)', () => {
    const { areaMm2, centroid } = measuresOf(block([{ kind: 'bead', width: 2 * r, rise: 0 }])).section
    const half = (Math.PI / 2) * r * r
    expectWithin(areaMm2, 40 * r + half, { withinMm2: 1e-9 })
    const up = (areaMm2 * centroid.y - 40 * r * 10) / half - 20
    expectWithin(up / r, 4 / (3 * Math.PI), { within: 1e-9 })
    expectWithin(up / r, 0.4244, { within: 0.00005 })
  })

  it('a flute as the segment of chord 16 and height 6: r 8⅓ (p. 79)', () => {
    const flute: Member = { kind: 'flutes', width: 16, rise: 0, count: 1, fillet: 0, depth: 6 }
    const [arc] = memberSegments(flute, { x: 0, y: 20 })
    expectWithin(arcGeometryOf(arc as ArcSegment).radius, 25 / 3, { withinMm: 1e-12 })
  })

  it('a flute as the segment of radius 12 cm and depth 2 cm: 13.27, 14.06 cm, 18.01 cm² (p. 50)', () => {
    const chord = 2 * Math.sqrt(2 * 12 * 2 - 2 * 2)
    const flute: Member = { kind: 'flutes', width: chord, rise: 0, count: 1, fillet: 0, depth: 2 }
    expectWithin(chord, 13.27, { within: 0.005 })
    expectWithin(girthOf(block([flute]), 0, 1).lengthMm, 14.06, { withinMm: 0.005 })
    expectWithin(20 * chord - areaOf(block([flute])), 18.01, { withinMm2: 0.005 })
  })

  it('a thumb: the quarter ellipse πab/4, 4a/3π and 4b/3π from its axes (list of centroids)', () => {
    const { areaMm2, centroid } = measuresOf(block([{ kind: 'thumb', width: 9, rise: 4 }])).section
    const quarter = (Math.PI * 9 * 4) / 4
    expectWithin(areaMm2, 180 + quarter, { withinMm2: 1e-9 })
    expectWithin((areaMm2 * centroid.x - 180 * 4.5) / quarter, 9 - (4 * 9) / (3 * Math.PI), {
      withinMm: 1e-9,
    })
    expectWithin((areaMm2 * centroid.y - 180 * 10) / quarter, 20 + (4 * 4) / (3 * Math.PI), {
      withinMm: 1e-9,
    })
  })

  it('a stretch of girth: the quarter circle’s arc 1.5708 r, its centroid 2r/π from the sides (p. 78, 230)', () => {
    const { lengthMm, centroid } = girthOf(block([{ kind: 'ovolo', width: r, rise: r }]), 0, 1)
    expectWithin(lengthMm / r, 1.5708, { within: 0.00005 })
    expectWithin(centroid.x, r - (2 * r) / Math.PI, { withinMm: 1e-9 })
    expectWithin(centroid.y, 20 + (2 * r) / Math.PI, { withinMm: 1e-9 })
  })

  it('arcs of the default cyma are sixths of a circle: segment 0.0905861 r² (computed), arc 1.0471976 r', () => {
    const [first] = memberSegments({ kind: 'cyma-recta', width: 16, rise: 12 }, { x: 0, y: 20 })
    const arc = first as ArcSegment
    // half the chord of 20 is the radius
    expectWithin(arcGeometryOf(arc).radius, 10, { withinMm: 1e-12 })
    expectWithin(arcLengthOf(arc), 10.471976, { withinMm: 5e-7 })
    expectWithin(10 ** 2 * (Math.PI / 6 - Math.sqrt(3) / 4), 9.05861, { withinMm2: 5e-6 })
  })
})
