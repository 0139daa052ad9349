import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  areaMomentsOf,
  lengthOf,
  mirrored,
  nearestOnPath,
  reversed,
  scaledBy,
  signedAreaOf,
} from '@shared/geometry'
import { faceOf, girthOf, measuresOf, outlineOf, woodFaceOf, woodOutlineOf } from '@shared/section'
import type { Member, Section } from '@shared/section'
import { anySection } from '../../helpers/arbitraries-section'
import { expectWithin } from '../../helpers/expect-within'
import { between, fillet, sectionWith } from '../../helpers/sections'

describe('outlineOf', () => {
  it('runs clockwise: face, back edge, back, rebate, sight edge', () => {
    const outline = outlineOf(sectionWith())
    expect(outline.map(({ start }) => [start.x, start.y])).toEqual([
      [0, 30],
      [40, 30],
      [40, 0],
      [6, 0],
      [6, 12],
      [0, 12],
    ])
    expect(outline.at(-1)?.end).toEqual(outline[0]?.start)
    expectWithin(signedAreaOf(outline), -(40 * 30 - 6 * 12), { withinMm2: 1e-9 })
  })

  it('cuts the back splay off and leaves out sides of no length', () => {
    const corners = (section: Section) => outlineOf(section).map(({ start }) => [start.x, start.y])
    expect(corners(sectionWith({ backSplay: { x: 5, height: 10 } }))).toContainEqual([35, 0])
    expect(corners(sectionWith({ rebate: { width: 0, depth: 0 } }))).toEqual([
      [0, 30],
      [40, 30],
      [40, 0],
      [0, 0],
    ])
    expect(corners(sectionWith({ backSplay: { x: 5, height: 30 } }))).toHaveLength(6)
  })
})

describe('measuresOf', () => {
  it('measures a block with a rebate as two rectangles', () => {
    const { section, wood } = measuresOf(sectionWith())
    // 40 × 30 less 6 × 12: area 1128; moments 24000 − 216 and 18000 − 432
    expectWithin(section.areaMm2, 1128, { withinMm2: 1e-9 })
    expectWithin(section.firstMoments.x, 24000 - 216, { withinMm3: 1e-7 })
    expectWithin(section.firstMoments.y, 18000 - 432, { withinMm3: 1e-7 })
    expectWithin(section.centroid.x, 23784 / 1128, { withinMm: 1e-9 })
    expectWithin(section.centroid.y, 17568 / 1128, { withinMm: 1e-9 })
    const xx = (30 * 40 ** 3 - 12 * 6 ** 3) / 3 - 23784 ** 2 / 1128
    const yy = (40 * 30 ** 3 - 6 * 12 ** 3) / 3 - 17568 ** 2 / 1128
    expectWithin(section.secondMoments.xx, xx, { withinMm4: 1e-6 })
    expectWithin(section.secondMoments.yy, yy, { withinMm4: 1e-6 })
    expectWithin(section.secondMoments.xy, (40 * 30) ** 2 / 4 - (6 * 12) ** 2 / 4 - (23784 * 17568) / 1128, {
      withinMm4: 1e-6,
    })
    expect([section.widthMm, section.depthMm, section.girthMm]).toEqual([40, 30, 40])
    expect(section.breaks).toEqual([
      { x: 0, y: 30 },
      { x: 40, y: 30 },
    ])
    expectWithin(wood.lipMm, 18, { withinMm: 1e-12 })
    expect(wood.blank).toEqual({
      widthMm: 40,
      thicknessMm: 30,
      tiltDeg: 0,
      flat: { widthMm: 40, thicknessMm: 30 },
    })
  })

  it('takes width and depth from true extremes, beyond any break', () => {
    // a half round 20 wide crowns at 40; an ovolo of 180° on a chord of 6 × 8 swells beyond its end by 5 − 3
    const crown = measuresOf(between({ kind: 'bead', width: 20, rise: 0 })).section
    expectWithin(crown.depthMm, 40, { withinMm: 1e-9 })
    const swollen = measuresOf(
      sectionWith({ members: [fillet(20), { kind: 'ovolo', width: 6, rise: -8, arc: 180 }] }),
    )
    expectWithin(swollen.section.widthMm, 23 + 5, { withinMm: 1e-9 })
    expectWithin(swollen.section.greatestXMm, 28, { withinMm: 1e-9 })
  })

  it('measures each member: width, rise, radii with their centres, length', () => {
    const members: Member[] = [
      fillet(10),
      { kind: 'torus', width: 9, rise: 1 },
      { kind: 'scotia', width: 8, rise: 0 },
    ]
    const measured = measuresOf(sectionWith({ members })).members
    expect(measured.map(({ widthMm, riseMm }) => [widthMm, riseMm])).toEqual([
      [10, 0],
      [9, 1],
      [8, 0],
    ])
    expect(measured[0]?.radii).toEqual([])
    const [first, second] = measured[1]?.radii ?? []
    expectWithin(first?.radiusMm ?? NaN, 5, { withinMm: 1e-12 })
    expectWithin(second?.radiusMm ?? NaN, 4, { withinMm: 1e-12 })
    expect([first?.shape, second?.shape]).toEqual(['round', 'round'])
    expectWithin(first?.centre.x ?? NaN, 15, { withinMm: 1e-12 })
    expectWithin(measured[1]?.lengthMm ?? NaN, (9 * Math.PI) / 2, { withinMm: 1e-9 })
    expect(measured[2]?.radii.map(({ shape }) => shape)).toEqual(['hollow', 'hollow'])
  })

  it('takes wood, lip and blank inside the gesso', () => {
    const { section, wood } = measuresOf(sectionWith({ gesso: 0.6 }))
    expectWithin(section.areaMm2 - wood.areaMm2, 40 * 0.6, { withinMm2: 1e-9 })
    expectWithin(wood.lipMm, 17.4, { withinMm: 1e-9 })
    expectWithin(wood.blank.thicknessMm, 29.4, { withinMm: 1e-9 })
    expect(section.depthMm).toBe(30)
    expectWithin(wood.sightEdgeHeightMm, 29.4, { withinMm: 1e-9 })
  })

  it('offers a tilt only where it saves', () => {
    // a leaning slab: parallelogram-like, whose least rectangle lies along its long side
    const slab = sectionWith({
      sightEdgeHeight: 12,
      rebate: { width: 0, depth: 0 },
      members: [{ kind: 'splay', width: 40, rise: 30 }],
      backSplay: { x: 36, height: 30 },
    })
    const { blank } = measuresOf(slab).wood
    expect(blank.flat).toEqual({ widthMm: 40, thicknessMm: 42 })
    expect(blank.widthMm * blank.thicknessMm).toBeLessThan(0.6 * 40 * 42)
    expectWithin(blank.tiltDeg, (Math.atan(30 / 40) * 180) / Math.PI, { withinDeg: 5 })
    expect(measuresOf(between({ kind: 'torus', width: 12, rise: 0 })).wood.blank.tiltDeg).toBe(0)
  })
})

describe('least wood', () => {
  const leastOf = (section: Section) => measuresOf(section).wood.leastWood

  it('is the lip under a level face', () => {
    const { thicknessMm, at, featherAngleDeg } = leastOf(sectionWith())
    expect([thicknessMm, at, featherAngleDeg]).toEqual([18, { x: 0, y: 30 }, 0])
  })

  it('is found where a hollow comes nearest to the rebate’s corner, or to its ceiling', () => {
    // scotia of radius 5 about (5 + 5, 30): its circle passes 5 below; corner (6, 12): nearest along the line to the centre
    const members: Member[] = [fillet(5), { kind: 'scotia', width: 10, rise: 0 }, fillet(20)]
    const corner = leastOf(sectionWith({ members }))
    expectWithin(corner.thicknessMm, Math.hypot(4, 18) - 5, { withinMm: 1e-9 })
    expect(corner.featherAngleDeg).toBeUndefined()
    const ceiling = leastOf(sectionWith({ members, rebate: { width: 15, depth: 12 } }))
    expectWithin(ceiling.thicknessMm, 13, { withinMm: 1e-9 })
    expectWithin(ceiling.at.x, 10, { withinMm: 1e-9 })
    expectWithin(ceiling.at.y, 25, { withinMm: 1e-9 })
  })

  it('is found beside the rebate’s wall in a deep channel', () => {
    const members: Member[] = [
      fillet(9),
      { kind: 'quirk', width: 2, rise: 0, depth: 25, shape: 'square' },
      fillet(9),
    ]
    const { thicknessMm, at } = leastOf(sectionWith({ members }))
    expectWithin(thicknessMm, 3, { withinMm: 1e-12 })
    expectWithin(at.x, 9, { withinMm: 1e-12 })
  })

  it('tells a feather edge by its angle', () => {
    const rising: Member = { kind: 'splay', width: 20, rise: 10 }
    const { thicknessMm, featherAngleDeg } = leastOf(sectionWith({ sightEdgeHeight: 13, members: [rising] }))
    expectWithin(thicknessMm, 1, { withinMm: 1e-12 })
    expectWithin(featherAngleDeg ?? NaN, (Math.atan(0.5) * 180) / Math.PI, { withinDeg: 1e-9 })
  })

  it('is no more than any sampled distance, and reached within a little by some', () => {
    fc.assert(
      fc.property(anySection(fc.constantFrom(0, 0.5)), (section) => {
        const { thicknessMm } = leastOf(section)
        const { path } = woodFaceOf(section)
        const { width, depth } = section.rebate
        let sampled = Infinity
        for (let i = 0; i <= 100; i += 1) {
          const onCeiling = { x: (width * i) / 100, y: depth }
          const onWall = { x: width, y: (depth * i) / 100 }
          for (const place of [onCeiling, onWall])
            sampled = Math.min(sampled, nearestOnPath(path, place).distance)
        }
        expect(thicknessMm).toBeLessThanOrEqual(sampled + 1e-9)
        expectWithin(thicknessMm, sampled, { withinMm: 0.1 })
      }),
    )
  })
})

describe('girthOf', () => {
  const members: Member[] = [fillet(10), { kind: 'bead', width: 6, rise: 0 }, fillet(0, 4), fillet(10)]

  it('measures a stretch between breaks, and the centroid of its line', () => {
    const bead = girthOf(sectionWith({ members }), 1, 2)
    expectWithin(bead.lengthMm, 3 * Math.PI, { withinMm: 1e-9 })
    // a half circle's line: 2r/π above its diameter
    expectWithin(bead.centroid.x, 13, { withinMm: 1e-9 })
    expectWithin(bead.centroid.y, 30 + 6 / Math.PI, { withinMm: 1e-9 })
    const last = girthOf(sectionWith({ members }), 2, 4)
    expectWithin(last.lengthMm, 14, { withinMm: 1e-9 })
    expectWithin(last.centroid.x, (4 * 16 + 10 * 21) / 14, { withinMm: 1e-9 })
  })

  it.each([
    [1, 1],
    [2, 1],
    [0, 5],
    [-1, 2],
    [0.5, 2],
  ])('refuses from %s to %s', (from, to) => {
    expect(() => girthOf(sectionWith({ members }), from, to)).toThrow(/0 to 4/)
  })
})

describe('measures of any section', () => {
  it('add up: the members’ lengths are the girth, the stretches too', () => {
    fc.assert(
      fc.property(anySection(), (section) => {
        const { section: whole, members } = measuresOf(section)
        const sum = members.reduce((total, { lengthMm }) => total + lengthMm, 0)
        expectWithin(sum, whole.girthMm, { withinMm: 2e-6 })
        const middle = Math.ceil(section.members.length / 2)
        const stretches = [
          girthOf(section, 0, middle),
          ...(middle < section.members.length ? [girthOf(section, middle, section.members.length)] : []),
        ]
        expectWithin(
          stretches.reduce((total, { lengthMm }) => total + lengthMm, 0),
          whole.girthMm,
          { withinMm: 2e-6 },
        )
      }),
    )
  })

  it('take the rebate off the area, whatever the face', () => {
    fc.assert(
      fc.property(anySection(), (section) => {
        const { width, depth } = section.rebate
        const without = measuresOf({ ...section, rebate: { width: 0, depth: 0 } }).section.areaMm2
        expectWithin(measuresOf(section).section.areaMm2, without - width * depth, { withinMm2: 1e-8 })
      }),
    )
  })

  it('keep their area mirrored and grow by λ and λ²', () => {
    fc.assert(
      fc.property(anySection(), fc.double({ min: 0.2, max: 5, noNaN: true }), (section, factor) => {
        const outline = outlineOf(section)
        const { areaMm2, girthMm } = measuresOf(section).section
        expectWithin(signedAreaOf(mirrored(outline)), areaMm2, { withinRatio: 1e-12 })
        const grown = scaledBy(outline, factor)
        expectWithin(-signedAreaOf(grown), areaMm2 * factor ** 2, { withinRatio: 1e-12 })
        expectWithin(lengthOf(scaledBy(faceOf(section).path, factor)), girthMm * factor, { withinMm: 1e-5 })
      }),
    )
  })

  it('have the sign and centroid of the counter-clockwise outline, and wood within the finished section', () => {
    fc.assert(
      fc.property(anySection(fc.constantFrom(0, 0.4)), (section) => {
        const { section: finished, wood } = measuresOf(section)
        const moments = areaMomentsOf(reversed(woodOutlineOf(section)))
        expectWithin(wood.areaMm2, moments.area, { withinMm2: 1e-9 })
        expectWithin(wood.centroid.x, moments.centroid.x, { withinMm: 1e-9 })
        expect(wood.areaMm2).toBeGreaterThan(0)
        expect(wood.areaMm2).toBeLessThanOrEqual(finished.areaMm2 + 1e-9)
        expect(wood.blank.widthMm * wood.blank.thicknessMm).toBeLessThanOrEqual(
          wood.widthMm * wood.depthMm + 1e-9,
        )
      }),
    )
  })
})
