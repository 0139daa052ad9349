import { describe, expect, it } from 'vitest'
import fc from 'fast-check'
import {
  basisCountsOf,
  changesBetween,
  describeSection,
  differenceOf,
  missingBasisOf,
  withDefaults,
} from '@shared/section'
import type { Basis, Member } from '@shared/section'
import { anySection } from '../../helpers/arbitraries-section'
import { expectWithin } from '../../helpers/expect-within'
import { between, fillet, sectionWith } from '../../helpers/sections'

const measured: Basis = { kind: 'measured', plusMinus: 0.4 }
const judged: Basis = { kind: 'judged', note: 'from the shading' }

describe('the basis of a section', () => {
  it('is missing for every width and rise that is not 0 and for the sight edge', () => {
    const members: Member[] = [
      { ...fillet(10), basis: { width: measured } },
      fillet(0, 5),
      { kind: 'splay', width: 4, rise: -2, basis: { rise: judged } },
    ]
    const section = sectionWith({ members })
    expect(missingBasisOf(section).map(({ path }) => path)).toEqual([
      '/basis/sightEdgeHeight',
      '/members/1/basis/rise',
      '/members/2/basis/width',
    ])
    expect(missingBasisOf(section)[1]?.says).toContain('the rise of member 2 (fillet)')
    expect(basisCountsOf(section)).toEqual({ measured: 1, precedent: 0, judged: 1, none: 3 })
    const citation: Basis = { kind: 'precedent', citation: 'Pattern book, no. 14' }
    const whole = sectionWith({
      members: [{ ...fillet(9), basis: { width: judged } }],
      basis: { sightEdgeHeight: citation },
    })
    expect(missingBasisOf(whole)).toEqual([])
    expect(basisCountsOf(whole)).toEqual({ measured: 0, precedent: 1, judged: 1, none: 0 })
  })
})

describe('withDefaults', () => {
  it('fills in what is left out and keeps what is said', () => {
    const bare = { sightEdgeHeight: 20, rebate: { width: 5, depth: 8 }, members: [] }
    expect(withDefaults(bare)).toEqual({ ...bare, backSplay: { x: 0, height: 0 }, gesso: 0, tolerance: 0.2 })
    expect(withDefaults({ ...bare, gesso: 0.3, tolerance: 0 })).toMatchObject({ gesso: 0.3, tolerance: 0 })
  })
})

describe('describeSection', () => {
  it('tells a section from the sight edge outward, in the workshop’s words', () => {
    const section = sectionWith({
      members: [
        fillet(4),
        { kind: 'cyma-recta', width: 20, rise: 15 },
        { kind: 'quirk', width: 2, rise: 0, depth: 3, shape: 'v' },
        fillet(0, -5),
      ],
      gesso: 0.6,
      backSplay: { x: 3, height: 9 },
    })
    expect(describeSection(section, { vocabulary: 'molding' })).toBe(
      [
        'A molding of 4 members, 26 mm wide from sight edge to back edge.',
        'The sight edge is 30 mm high, the back edge 40 mm.',
        '1. fillet, 4 mm wide.',
        '2. cyma recta, 20 mm wide, rising 15 mm.',
        '3. quirk, V-shaped, 3 mm deep, 2 mm wide.',
        '4. fillet, upright, falling 5 mm.',
        'The rabbet is 6 mm wide and 12 mm deep.',
        'The back edge leans in by 3 mm from 9 mm above the wall.',
        'The face carries 0.6 mm of gesso.',
      ].join('\n'),
    )
  })
})

describe('differenceOf', () => {
  it('is nothing between a section and itself', () => {
    fc.assert(
      fc.property(anySection(), (section) => {
        const { areaBetweenMm2, greatestDistanceMm, changes } = differenceOf(section, section)
        expectWithin(areaBetweenMm2, 0, { withinMm2: 1e-9 })
        expectWithin(greatestDistanceMm, 0, { withinMm: 1e-9 })
        expect(changes).toEqual([])
      }),
      { numRuns: 30 },
    )
  })

  it('measures the area between and the greatest distance, and lists what changed', () => {
    const before = sectionWith({ members: [fillet(20), fillet(20)] })
    const after = sectionWith({ members: [fillet(20), fillet(0, 2), fillet(20)], tolerance: 0.3 })
    const { areaBetweenMm2, greatestDistanceMm, changes } = differenceOf(before, after)
    expectWithin(areaBetweenMm2, 40, { withinMm2: 1e-3 })
    expectWithin(greatestDistanceMm, 2, { withinMm: 1e-4 })
    expect(changes).toEqual([
      { path: '/tolerance', before: 0.2, after: 0.3 },
      { path: '/members/1', before: null, after: fillet(0, 2) },
    ])
  })

  it('measures curves to the accuracy of its chords', () => {
    // a quarter circle of radius 5 turned from hollow to round: 5²·(π/2 − 1) between
    const hollow = between({ kind: 'cavetto', width: 5, rise: 5 })
    const round = between({ kind: 'ovolo', width: 5, rise: 5 })
    const { areaBetweenMm2, greatestDistanceMm } = differenceOf(hollow, round)
    expectWithin(areaBetweenMm2, 25 * (Math.PI / 2 - 1), { withinMm2: 0.02 })
    // their middles lie 2·5 − 5·√2 apart along the diagonal
    expectWithin(greatestDistanceMm, 10 - 5 * Math.SQRT2, { withinMm: 1e-3 })
  })

  it('names a changed dimension, a new basis, a member taken out and one of another kind', () => {
    const before = sectionWith({
      members: [
        fillet(5),
        { kind: 'bead', width: 3, rise: 0 },
        { kind: 'scotia', width: 8, rise: 1 },
        fillet(4),
        fillet(9),
      ],
    })
    const after = sectionWith({
      members: [
        fillet(5),
        { kind: 'scotia', width: 8.5, rise: 1 },
        { ...fillet(4), basis: { width: judged } },
        { kind: 'splay', width: 9, rise: 2 },
      ],
    })
    expect(changesBetween(before, after)).toEqual([
      { path: '/members/1', before: { kind: 'bead', width: 3, rise: 0 }, after: null },
      { path: '/members/1/width', before: 8, after: 8.5 },
      { path: '/members/2/basis', before: null, after: { width: judged } },
      { path: '/members/3/kind', before: 'fillet', after: 'splay' },
      { path: '/members/3/rise', before: 0, after: 2 },
    ])
  })
})
