import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { Failure } from '@shared/failure'
import { faultsOfSection, measuresOf, requireSoundSection } from '@shared/section'
import type { Member, PartialSection } from '@shared/section'
import { anyWildSection } from '../../helpers/arbitraries-section'
import { between, fillet, sectionWith } from '../../helpers/sections'

const codesAt = (parts: Partial<PartialSection>): string[] =>
  faultsOfSection(sectionWith(parts)).map(({ path, code }) => `${path} ${code}`)
const codesOf = (member: Member): string[] =>
  faultsOfSection(between(member)).map(({ path, code }) => `${path} ${code}`)

const line = [
  [
    [1, 0],
    [2, 0],
    [3, 0],
  ],
] as const
const joint = (x: number, y: number) =>
  [
    ...line,
    [
      [3 + x, y],
      [5, 2],
      [6, 2],
    ],
  ] as const

describe('faultsOfSection', () => {
  it('finds none in a sound section', () => {
    expect(faultsOfSection(sectionWith())).toEqual([])
  })

  it.each<[string, Member, string]>([
    ['a width below 0', { kind: 'splay', width: -1, rise: 2 }, '/members/1/width width-negative'],
    ['a member of no size', fillet(0), '/members/1/width zero-length'],
    ['less than a nanometre', { kind: 'splay', width: 3, rise: 1e-9 }, '/members/1/rise too-small'],
    ['a leaning fillet', { kind: 'fillet', width: 3, rise: 1 }, '/members/1/rise fillet-leans'],
    ['a level splay', { kind: 'splay', width: 3, rise: 0 }, '/members/1/rise chord-straight'],
    ['an upright cavetto', { kind: 'cavetto', width: 0, rise: 3 }, '/members/1/width chord-straight'],
    ['a level ovolo', { kind: 'ovolo', width: 3, rise: 0 }, '/members/1/rise chord-straight'],
    ['a level thumb', { kind: 'thumb', width: 3, rise: 0 }, '/members/1/rise chord-straight'],
    ['a cyma with rise 0', { kind: 'cyma-recta', width: 3, rise: 0 }, '/members/1/rise chord-straight'],
    ['an arc of 0°', { kind: 'ovolo', width: 3, rise: 3, arc: 0 }, '/members/1/arc arc-out-of-range'],
    [
      'an arc beyond 180°',
      { kind: 'cyma-reversa', width: 3, rise: 3, arc: 181 },
      '/members/1/arc arc-out-of-range',
    ],
    ['a scotia as steep as wide', { kind: 'scotia', width: 3, rise: -3 }, '/members/1/rise rise-too-great'],
    ['a torus as steep as wide', { kind: 'torus', width: 3, rise: 3 }, '/members/1/rise rise-too-great'],
    ['a bead with a rise', { kind: 'bead', width: 3, rise: 1 }, '/members/1/rise rise-not-level'],
    [
      'half a reed',
      { kind: 'reeds', width: 3, rise: 0, count: 1.5, fillet: 0 },
      '/members/1/count count-out-of-range',
    ],
    [
      'a negative fillet',
      { kind: 'reeds', width: 3, rise: 0, count: 2, fillet: -1 },
      '/members/1/fillet fillet-out-of-range',
    ],
    [
      'fillets as wide as all',
      { kind: 'reeds', width: 4, rise: 0, count: 3, fillet: 2 },
      '/members/1/fillet fillets-too-wide',
    ],
    [
      'a flute too deep',
      { kind: 'flutes', width: 8, rise: 0, count: 2, fillet: 0, depth: 2.1 },
      '/members/1/depth flute-too-deep',
    ],
    [
      'a flute of no depth',
      { kind: 'flutes', width: 8, rise: 0, count: 2, fillet: 0, depth: 0 },
      '/members/1/depth depth-missing',
    ],
    [
      'a quirk of no depth',
      { kind: 'quirk', width: 2, rise: 0, depth: 0, shape: 'v' },
      '/members/1/depth depth-missing',
    ],
    ['no curves', { kind: 'free', width: 3, rise: 0, curves: [] }, '/members/1/curves curves-missing'],
    [
      'a free end apart',
      { kind: 'free', width: 3, rise: 2e-6, curves: line },
      '/members/1/curves/0 free-end-apart',
    ],
    [
      'an unknown joint',
      { kind: 'free', width: 3, rise: 0, curves: line, corners: [1] },
      '/members/1/corners corner-unknown',
    ],
    [
      'an unmeant arris',
      { kind: 'free', width: 6, rise: 2, curves: joint(1, 0.01) },
      '/members/1/curves/1 free-joint-turns',
    ],
    [
      'a ± below 0',
      { ...fillet(3), basis: { width: { kind: 'measured', plusMinus: -1 } } },
      '/members/1/basis/width/plusMinus plus-minus-negative',
    ],
  ])('refuses %s', (_, member, expected) => {
    expect(codesOf(member)).toEqual([expected])
  })

  it('takes what just keeps the rules', () => {
    expect(codesOf({ kind: 'flutes', width: 8, rise: 0, count: 2, fillet: 0, depth: 2 })).toEqual([])
    expect(codesOf({ kind: 'free', width: 3.0000005, rise: 0, curves: line })).toEqual([])
    expect(codesOf({ kind: 'free', width: 6, rise: 2, curves: joint(1, 0.0017) })).toEqual([])
    expect(codesOf({ kind: 'free', width: 6, rise: 2, curves: joint(1, 1), corners: [1] })).toEqual([])
    expect(codesOf({ kind: 'scotia', width: 3, rise: 2.99 })).toEqual([])
    expect(codesOf({ kind: 'ovolo', width: 3, rise: 3, arc: 180 })).toEqual([])
  })

  it.each<[string, Partial<PartialSection>, string]>([
    ['no members', { members: [] }, '/members no-members'],
    [
      'a sight edge of no height',
      { sightEdgeHeight: 0, rebate: { width: 0, depth: 0 } },
      '/sightEdgeHeight sight-edge-too-low',
    ],
    [
      'a rebate as deep as the sight edge is high',
      { rebate: { width: 6, depth: 30 } },
      '/rebate/depth rebate-too-deep',
    ],
    ['a rebate as wide as the section', { rebate: { width: 40, depth: 5 } }, '/rebate/width rebate-too-wide'],
    ['a negative rebate', { rebate: { width: -1, depth: 5 } }, '/rebate/width negative'],
    ['a splay into the rebate', { backSplay: { x: 34, height: 5 } }, '/backSplay/x back-splay-too-wide'],
    [
      'a splay from above the back edge',
      { backSplay: { x: 4, height: 30.5 } },
      '/backSplay/height back-splay-too-high',
    ],
    ['a negative tolerance', { tolerance: -0.1 }, '/tolerance negative'],
    ['negative gesso', { gesso: -0.1 }, '/gesso negative'],
    [
      'gesso from a break to itself',
      { gesso: [{ from: 1, to: 1, thickness: 1 }] },
      '/gesso/0 stretch-out-of-range',
    ],
    [
      'gesso beyond the last break',
      { gesso: [{ from: 0, to: 2, thickness: 1 }] },
      '/gesso/0 stretch-out-of-range',
    ],
    ['gesso thicker than the lip', { gesso: 18 }, '/gesso gesso-too-thick'],
    ['a number that is none', { tolerance: NaN }, '/tolerance not-finite'],
    ['infinity', { members: [fillet(Infinity)] }, '/members/0/width not-finite'],
    ['1e308', { sightEdgeHeight: 1e308 }, '/sightEdgeHeight out-of-range'],
  ])('refuses %s', (_, parts, expected) => {
    expect(codesAt(parts)).toEqual([expected])
  })

  it('refuses gesso that lies over gesso, but not side by side', () => {
    const members = [fillet(10), fillet(10), fillet(10)]
    const gesso = (from: number) => [
      { from: 0, to: 2, thickness: 0.5 },
      { from, to: 3, thickness: 1 },
    ]
    expect(codesAt({ members, gesso: gesso(1) })).toEqual(['/gesso/1 stretches-overlap'])
    expect(codesAt({ members, gesso: gesso(2) })).toEqual([])
  })

  it('finds a face at or below the wall', () => {
    expect(codesAt({ members: [fillet(20), fillet(0, -29.9), fillet(5)] })).toEqual([])
    const low = codesAt({ members: [fillet(20), { kind: 'scotia', width: 61, rise: 0 }, fillet(5)] })
    expect(low).toContain('/members/1 face-below-wall')
  })

  it('finds a face that crosses or touches itself, the rebate or the back edge', () => {
    const fin = codesAt({ members: [fillet(20), fillet(0, 5), fillet(0, -5), fillet(5)] })
    expect(fin).toEqual(['/members/0 face-crosses-itself', '/members/1 face-crosses-itself'])
    const quirk = (depth: number): Member => ({ kind: 'quirk', width: 2, rise: 0, depth, shape: 'square' })
    expect(codesAt({ members: [fillet(2), quirk(18), fillet(20)] })).toEqual([
      '/members/1 face-crosses-rebate',
    ])
    expect(codesAt({ members: [fillet(2), quirk(17.9), fillet(20)] })).toEqual([])
    expect(codesAt({ members: [fillet(20), quirk(5)] })).toEqual(['/members/1 face-crosses-back-edge'])
  })

  it('takes cusps between beads and smooth runs of scotia and torus as the joints they are', () => {
    const members: Member[] = [
      fillet(10),
      { kind: 'bead', width: 3, rise: 0 },
      { kind: 'bead', width: 2, rise: 0 },
      { kind: 'scotia', width: 6, rise: -2 },
      { kind: 'torus', width: 6, rise: -2 },
      { kind: 'reeds', width: 9, rise: 0, count: 3, fillet: 0 },
      fillet(3),
    ]
    expect(codesAt({ members })).toEqual([])
  })

  it('says in words what is wrong and what must be', () => {
    const [fault] = faultsOfSection(between({ kind: 'torus', width: 3, rise: 4 }))
    expect(fault?.says).toBe(
      'Member 2 (torus): the rise is 4 mm and the width 3 mm; the rise, up or down, must be less than the width.',
    )
  })

  it('never throws, whatever it is given, and what it passes can be measured in finite numbers', () => {
    fc.assert(
      fc.property(anyWildSection(), (section) => {
        const faults = faultsOfSection(section)
        for (const fault of faults) {
          expect(fault.path.startsWith('/')).toBe(true)
          expect(fault.says.length).toBeGreaterThan(20)
        }
        if (faults.length === 0) expect(everyNumberIsFinite(measuresOf(section))).toBe(true)
      }),
      { numRuns: 600 },
    )
  })
})

function everyNumberIsFinite(value: unknown): boolean {
  if (typeof value === 'number') return Number.isFinite(value)
  return typeof value !== 'object' || value === null || Object.values(value).every(everyNumberIsFinite)
}

describe('requireSoundSection', () => {
  it('gives a sound section back and throws every fault of another', () => {
    const sound = sectionWith()
    expect(requireSoundSection(sound)).toBe(sound)
    const refusal = (): unknown => requireSoundSection(sectionWith({ members: [fillet(-1), fillet(0)] }))
    expect(refusal).toThrow(Failure)
    expect(refusal).toThrow(/Member 1 .* Member 2 /)
  })
})
