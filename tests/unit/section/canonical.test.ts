import { createHash } from 'node:crypto'
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { Failure } from '@shared/failure'
import {
  canonicalText,
  issueTextOf,
  sectionSha256,
  sha256Hex,
  shapeSha256,
  shapeTextOf,
  withDefaults,
} from '@shared/section'
import type { Member, Section } from '@shared/section'
import { anySection } from '../../helpers/arbitraries-section'
import { between, fillet, sectionWith } from '../../helpers/sections'

describe('canonicalText', () => {
  it('orders properties at every depth and leaves out what is undefined', () => {
    expect(canonicalText({ b: 1, a: { d: [], c: undefined }, '': null })).toBe('{"":null,"a":{"d":[]},"b":1}')
  })

  it('reads back as the same data, and does not depend on the order it was made in', () => {
    fc.assert(
      fc.property(fc.jsonValue({ noUnicodeString: false }), (value) => {
        const text = canonicalText(value)
        expect(JSON.parse(text)).toEqual(JSON.parse(JSON.stringify(value)))
        expect(canonicalText(JSON.parse(text))).toBe(text)
      }),
    )
  })

  it.each<[string, unknown]>([
    ['not a number', { a: [NaN] }],
    ['infinity', { a: [-Infinity] }],
    ['a lone surrogate', { a: ['\ud83d'] }],
    ['undefined in a list', { a: [undefined] }],
    ['a date', { a: [new Date(0)] }],
    ['a big integer', { a: [1n] }],
    ['a function', { a: [() => 1] }],
  ])('refuses %s and names the place', (_, value) => {
    const attempt = (): string => canonicalText(value)
    expect(attempt).toThrow(Failure)
    expect(attempt).toThrow('/a/0 cannot be written as canonical JSON')
  })

  it('refuses a lone surrogate in a name', () => {
    expect(() => canonicalText({ '\udc00': 1 })).toThrow(Failure)
  })
})

describe('sha256Hex', () => {
  it('agrees with the platform’s own SHA-256 on any text', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme' }), (text) => {
        expect(sha256Hex(text)).toBe(createHash('sha256').update(text, 'utf8').digest('hex'))
      }),
    )
  })

  it('agrees with the published value for "abc" (FIPS 180-2, appendix B.1; from memory)', () => {
    expect(sha256Hex('abc')).toBe('ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad')
  })
})

describe('the text and hash of an issue', () => {
  it('is the canonical JSON of {listel, section} with defaults filled in', () => {
    const section = withDefaults({
      members: [{ kind: 'reeds', width: 6, rise: 0, count: 2 }],
      rebate: { depth: 12, width: 6 },
      sightEdgeHeight: 30,
    })
    expect(issueTextOf(section)).toBe(
      '{"listel":1,"section":{"backSplay":{"height":0,"x":0},"gesso":0,' +
        '"members":[{"count":2,"fillet":0,"kind":"reeds","rise":0,"width":6}],' +
        '"rebate":{"depth":12,"width":6},"sightEdgeHeight":30,"tolerance":0.2}}',
    )
    expect(sectionSha256(section)).toBe(createHash('sha256').update(issueTextOf(section)).digest('hex'))
  })

  it('carries the basis with the file’s own photograph ids, and no key of a draft', () => {
    const basis = { width: { kind: 'measured', plusMinus: 0.4, photograph: 'p1' } } as const
    const member = { ...fillet(40), basis, key: '0193' }
    const text = issueTextOf(sectionWith({ members: [member] }))
    expect(text).toContain('"basis":{"width":{"kind":"measured","photograph":"p1","plusMinus":0.4}}')
    expect(text).not.toContain('0193')
  })

  it('is the same whether nothing is said or said to be nothing', () => {
    const silent = between({ kind: 'thumb', width: 5, rise: 3 })
    const spoken: Section = {
      ...silent,
      gesso: [],
      basis: {},
      members: silent.members.map((member): Member => ({
        ...member,
        basis: {},
        ...(member.kind === 'thumb' && { hollow: false }),
      })),
    }
    expect(issueTextOf(spoken)).toBe(issueTextOf(silent))
  })

  it('survives writing and reading', () => {
    fc.assert(
      fc.property(anySection(fc.constantFrom(0, 0.5)), (section) => {
        const { section: read } = JSON.parse(issueTextOf(section)) as { section: Section }
        expect(sectionSha256(read)).toBe(sectionSha256(section))
        expect(shapeSha256(read)).toBe(shapeSha256(section))
      }),
    )
  })
})

describe('the hash of a shape', () => {
  it('knows wood outline and rebate alone', () => {
    const section = between({ kind: 'ovolo', width: 5, rise: 4 })
    const same: Section = {
      ...section,
      tolerance: 0.5,
      basis: { sightEdgeHeight: { kind: 'judged', note: 'by eye' } },
    }
    expect(shapeSha256(same)).toBe(shapeSha256(section))
    expect(sectionSha256(same)).not.toBe(sectionSha256(section))
    expect(shapeSha256({ ...section, gesso: 0.1 })).not.toBe(shapeSha256(section))
    expect(shapeSha256({ ...section, rebate: { width: 6, depth: 12.001 } })).not.toBe(shapeSha256(section))
  })

  it('does not care how a straight or round stretch is divided into members', () => {
    const whole = sectionWith({ members: [fillet(40), { kind: 'torus', width: 10, rise: 0 }] })
    const parts = sectionWith({
      members: [
        fillet(15),
        fillet(25),
        { kind: 'ovolo', width: 5, rise: 5 },
        { kind: 'ovolo', width: 5, rise: -5 },
      ],
    })
    expect(shapeTextOf(parts)).toBe(shapeTextOf(whole))
  })

  it('is the same for a gessoed section and bare wood of the same shape', () => {
    const gessoed = { ...between(fillet(0, 5)), gesso: 0.5 }
    const bare = sectionWith({ sightEdgeHeight: 29.5, members: [fillet(10.5), fillet(0, 5), fillet(9.5)] })
    expect(shapeTextOf(gessoed)).toBe(shapeTextOf(bare))
  })

  it('does not hang on the last digits of a sum', () => {
    const tenths = Array.from({ length: 10 }, () => fillet(0.1))
    const summed = sectionWith({ members: [fillet(39), ...tenths] })
    expect(shapeTextOf(summed)).toBe(shapeTextOf(sectionWith()))
  })
})
