import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { isSingleValuedInX, turnedBy } from '@shared/geometry'
import { checksOf, COMMON_PRACTICE_MILL, woodFaceOf } from '@shared/section'
import type { Check, CheckCode, CheckOptions, Member, Section } from '@shared/section'
import { anySection } from '../../helpers/arbitraries-section'
import { expectWithin } from '../../helpers/expect-within'
import { between, fillet, sectionWith } from '../../helpers/sections'

function checkOf(code: CheckCode, section: Section, options: CheckOptions = {}): Check {
  const check = checksOf(section, options).find((candidate) => candidate.code === code)
  if (!check) throw new Error(`no check ${code}`)
  return check
}

describe('undercut', () => {
  it('passes upright walls and quarter circles', () => {
    const members: Member[] = [fillet(10), fillet(0, 5), { kind: 'torus', width: 8, rise: 0 }, fillet(10)]
    expect(checkOf('undercut', sectionWith({ members }))).toMatchObject({
      severity: 'ok',
      value: 0,
      limit: 0,
    })
  })

  it('gives the greatest overhang, where it is, and the tilts that would clear it', () => {
    // chord 10 × 10, 120°: the tangents run from −15° to 105°, so that 15° to 75° toward the back edge clear it
    const check = checkOf('undercut', between({ kind: 'cavetto', width: 10, rise: 10, arc: 120 }))
    const radius = Math.hypot(10, 10) / (2 * Math.sin(Math.PI / 3))
    expect(check.severity).toBe('stop')
    expectWithin(check.value, radius * (1 - Math.cos(Math.PI / 12)), { withinMm: 1e-9 })
    expectWithin(check.at[0], 20, { withinMm: 1e-9 })
    expectWithin(check.at[1], 40, { withinMm: 1e-9 })
    expect(check.cure).toBe('Run the section tilted: 15° to 75° toward the back edge would clear it.')
  })

  it('says when no tilt clears it', () => {
    const members: Member[] = [
      fillet(20),
      { kind: 'cavetto', width: 10, rise: 10, arc: 120 },
      { kind: 'ovolo', width: 10, rise: -10, arc: 170 },
      fillet(8),
    ]
    expect(checkOf('undercut', sectionWith({ members })).cure).toContain('No tilt')
  })

  it('agrees with the face’s own reading, and every tilt it offers does clear it', () => {
    fc.assert(
      fc.property(
        anySection(),
        fc.double({ min: 95, max: 175, noNaN: true }),
        fc.boolean(),
        (section, arc, isRising) => {
          const kind = isRising ? 'cavetto' : 'ovolo'
          const under = sectionWith({
            ...section,
            members: [...section.members, { kind, width: 6, rise: 7, arc }, fillet(20)],
          })
          const { path } = woodFaceOf(under)
          const check = checkOf('undercut', under)
          expect(check.severity === 'ok').toBe(isSingleValuedInX(path))
          const offered = /tilted: ([\d.]+)°(?: to ([\d.]+)°)? toward the (back|sight)/.exec(check.cure ?? '')
          if (!offered) return
          const low = Number(offered[1])
          const high = Number(offered[2] ?? low)
          const turn = (((low + high) / 2) * Math.PI * (offered[3] === 'back' ? -1 : 1)) / 180
          expect(isSingleValuedInX(turnedBy(path, turn))).toBe(true)
        },
      ),
    )
  })
})

describe('steep-wall', () => {
  it('measures the highest wall within the clearance of upright', () => {
    const members: Member[] = [fillet(10), fillet(0, 4), fillet(10), fillet(0, -2), fillet(5)]
    const check = checkOf('steep-wall', sectionWith({ members }))
    expect(check).toMatchObject({ severity: 'warn', value: 4, limit: 3, at: [10, 32] })
    const mill = { sideClearance: { angle: 3, over: 5 } }
    expect(checkOf('steep-wall', sectionWith({ members }), { mill }).severity).toBe('ok')
  })

  it('adds walls that run on from a fillet into an arc, as far as the arc stands so upright', () => {
    // scotia of radius 10 leaves its lip upright: within 3° over 10·sin 3°
    const members: Member[] = [fillet(10), fillet(0, -2), { kind: 'scotia', width: 20, rise: 0 }, fillet(10)]
    const { value } = checkOf('steep-wall', sectionWith({ sightEdgeHeight: 40, members }))
    expectWithin(value, 2 + 10 * Math.sin(Math.PI / 60), { withinMm: 1e-9 })
  })

  it('passes a wall that leans by the clearance', () => {
    const splay: Member = { kind: 'splay', width: 8 * Math.tan((3.01 * Math.PI) / 180), rise: 8 }
    expect(checkOf('steep-wall', between(splay)).severity).toBe('ok')
  })
})

describe('what the grinding wheel must enter', () => {
  it('holds the sharpest round against the wheel’s nose, hollows never', () => {
    const bead: Member = { kind: 'bead', width: 1.4, rise: 0 }
    expect(checkOf('wheel-nose', between(bead))).toMatchObject({ severity: 'warn', limit: 0.8 })
    expectWithin(checkOf('wheel-nose', between(bead)).value, 0.7, { withinMm: 1e-12 })
    const hollow: Member = { kind: 'scotia', width: 1.4, rise: 0 }
    expect(checkOf('wheel-nose', between(hollow)).severity).toBe('ok')
    // a thumb 8 × 2: its sharpest radius is 2²/8
    const thumb: Member = { kind: 'thumb', width: 8, rise: 2 }
    expectWithin(checkOf('wheel-nose', between(thumb)).value, 0.5, { withinMm: 1e-9 })
  })

  it('notes outer arrises, which come out as round as the nose', () => {
    const members: Member[] = [fillet(10), fillet(0, 4), fillet(10), fillet(0, -4), fillet(5)]
    const notes = checksOf(sectionWith({ members })).filter(({ severity }) => severity === 'note')
    expect(notes).toMatchObject([{ code: 'wheel-nose', value: 0, limit: 0.8, at: [10, 34] }])
    expect(notes[0]?.says).toMatch(/^2 outer arrises/)
  })

  it('holds the narrowest raised part against the wheel’s width', () => {
    const raised = (width: number): Section =>
      sectionWith({ members: [fillet(10), fillet(0, 4), fillet(width), fillet(0, -3), fillet(10)] })
    expect(checkOf('wheel-width', raised(2))).toMatchObject({ severity: 'warn', value: 2, limit: 2.5 })
    expect(checkOf('wheel-width', raised(2.5)).severity).toBe('ok')
    expect(
      checkOf('wheel-width', between({ kind: 'reeds', width: 6, rise: 0, count: 3, fillet: 0 })).value,
    ).toBe(2)
  })

  it('holds sunk parts against the tooth that cuts them', () => {
    const quirk: Member = { kind: 'quirk', width: 2, rise: 0, depth: 6, shape: 'square' }
    expect(checkOf('tooth', between(quirk))).toMatchObject({ severity: 'warn', value: 3, limit: 2.5 })
    // gesso widens the channel in the wood to 2 + 2·0.5; its depth stays
    expectWithin(checkOf('tooth', { ...between(quirk), gesso: 0.5 }).value, 2, { within: 1e-9 })
    expect(checkOf('tooth', between({ ...quirk, depth: 5 })).severity).toBe('ok')
  })
})

describe('head, rebate and edges', () => {
  it('stops what is wider or deeper than the head takes', () => {
    const mill = { maxWidth: 39, maxDepth: 4 }
    const section = between(fillet(0, 5))
    expect(checkOf('head-width', sectionWith(), { mill })).toMatchObject({
      severity: 'stop',
      value: 40,
      limit: 39,
    })
    expect(checkOf('head-depth', section, { mill })).toMatchObject({ severity: 'stop', value: 5, limit: 4 })
    const head = { cuttingDiameter: 8 }
    expect(checkOf('head-depth', section, { head })).toMatchObject({ severity: 'stop', limit: 4 })
    expect(checkOf('head-depth', section).severity).toBe('ok')
  })

  it('warns of little wood at the rebate, in the workshop’s own word', () => {
    const thin = sectionWith({ sightEdgeHeight: 15 })
    const check = checkOf('least-wood', thin, { vocabulary: 'molding' })
    expect(check).toMatchObject({ severity: 'warn', value: 3, limit: 5, at: [0, 15] })
    expect(check.says).toContain('rabbet')
    expect(checkOf('least-wood', thin, { mill: { leastWood: 3 } }).severity).toBe('ok')
  })

  it('warns of edges that crumble', () => {
    const fin: Member[] = [
      fillet(20),
      { kind: 'cavetto', width: 6, rise: 6 },
      { kind: 'cavetto', width: 6, rise: -6 },
      fillet(5),
    ]
    expect(checkOf('feather', sectionWith({ members: fin }))).toMatchObject({
      severity: 'warn',
      value: 0,
      at: [26, 36],
    })
    // a back splay leaves 90° less its own 22.6°
    const splayed = checkOf('feather', sectionWith({ backSplay: { x: 5, height: 12 } }))
    expect(splayed.severity).toBe('ok')
  })

  it('holds the picture’s stack against the rebate', () => {
    const stack = { lining: 0.5, glazing: 2, airGap: 3, thickness: 4, backing: 2, fixings: 0.5 }
    const at = (change: object): Check[] =>
      checksOf(sectionWith(), { stack: { ...stack, ...change } }).filter(({ code }) => code === 'stack')
    expect(at({})).toMatchObject([{ severity: 'ok', value: 12, limit: 12 }])
    expect(at({ backing: 4 })).toMatchObject([{ severity: 'warn', value: 14, limit: 12 }])
    expect(at({ backing: 4 })[0]?.cure).toContain('2 mm')
    expect(at({ thickness: 7 })).toMatchObject([{ severity: 'stop' }])
    expect(at({ airGap: 0 })).toMatchObject([{ severity: 'stop' }, { severity: 'ok' }])
    expect(checksOf(sectionWith()).some(({ code }) => code === 'stack')).toBe(false)
    expect(checksOf(sectionWith(), { stack: {} }).some(({ code }) => code === 'stack')).toBe(false)
  })

  it('marks built-in limits as common practice and the mill’s own not', () => {
    const own = checkOf('head-width', sectionWith(), { mill: { maxWidth: 100 } })
    expect(own.says).not.toContain('common practice')
    expect(checkOf('head-width', sectionWith()).says).toContain('(common practice, ask the mill)')
    expect(COMMON_PRACTICE_MILL.maxWidth).toBe(230)
  })

  it('gives finite numbers and words for any section', () => {
    fc.assert(
      fc.property(anySection(fc.constantFrom(0, 0.5)), (section) => {
        for (const { value, limit, at, says, severity, cure } of checksOf(section)) {
          expect([value, limit, ...at].every(Number.isFinite)).toBe(true)
          expect(says.endsWith('.')).toBe(true)
          if (severity === 'stop' || severity === 'warn') expect(cure).toBeDefined()
        }
      }),
    )
  })
})
