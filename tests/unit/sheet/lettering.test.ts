import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { CAPITAL_PER_EM, textWidthMm, wrappedLines } from '@shared/sheet'
import { expectWithin } from '../../helpers/expect-within'

/** Advance widths from a TrueType file's own tables (OpenType specification: cmap format 4, hmtx, OS/2). */
function readFont(path: string) {
  const bytes = readFileSync(path)
  const tables = new Map<string, number>()
  for (let index = 0; index < bytes.readUInt16BE(4); index += 1) {
    const entry = 12 + 16 * index
    tables.set(bytes.toString('latin1', entry, entry + 4), bytes.readUInt32BE(entry + 8))
  }
  const table = (name: string) => tables.get(name) ?? Number.NaN
  const unitsPerEm = bytes.readUInt16BE(table('head') + 18)
  const metrics = bytes.readUInt16BE(table('hhea') + 34)
  const cmap = table('cmap')
  const advanceOf = (codePoint: number): number => {
    for (let index = 0; index < bytes.readUInt16BE(cmap + 2); index += 1) {
      const start = cmap + bytes.readUInt32BE(cmap + 4 + 8 * index + 4)
      if (bytes.readUInt16BE(start) !== 4) continue
      const count = bytes.readUInt16BE(start + 6) / 2
      for (let segment = 0; segment < count; segment += 1) {
        const last = bytes.readUInt16BE(start + 14 + 2 * segment)
        const first = bytes.readUInt16BE(start + 16 + 2 * count + 2 * segment)
        if (codePoint < first || codePoint > last) continue
        const delta = bytes.readInt16BE(start + 16 + 4 * count + 2 * segment)
        const at = start + 16 + 6 * count + 2 * segment
        const offset = bytes.readUInt16BE(at)
        const raw = offset === 0 ? codePoint : bytes.readUInt16BE(at + offset + 2 * (codePoint - first))
        const glyph = raw === 0 ? 0 : (raw + delta) & 0xffff
        return bytes.readUInt16BE(table('hmtx') + 4 * Math.min(glyph, metrics - 1)) / unitsPerEm
      }
    }
    return Number.NaN
  }
  return { advanceOf, capital: bytes.readInt16BE(table('OS/2') + 88) / unitsPerEm }
}

const FONTS = 'node_modules/@expo-google-fonts/work-sans'
const regular = readFont(`${FONTS}/400Regular/WorkSans_400Regular.ttf`)
const semibold = readFont(`${FONTS}/600SemiBold/WorkSans_600SemiBold.ttf`)

describe('the widths of letters', () => {
  it('are those of the bundled fonts', () => {
    const texts = [
      'Harbour at low water, drawing B',
      '0123456789.,:;+-–—±×÷°"“”‘’…',
      'ÀÉÎÕÜßæøåñçžščřłőűğı',
      '½ ¼ ¾ ⅛ ⅜ ⅝ ⅞ ″ ′ ≤ ≥ → ↑ ↓ −',
    ]
    for (const text of texts) {
      for (const [weight, font] of [
        ['regular', regular],
        ['semibold', semibold],
      ] as const) {
        const ems = [...text].reduce(
          (sum, character) => sum + font.advanceOf(character.codePointAt(0) ?? 0),
          0,
        )
        expectWithin(textWidthMm(text, CAPITAL_PER_EM * 10, weight), ems * 10, { withinMm: 1e-9 })
      }
    }
  })

  it('stand on the height of a capital, as ISO 3098 counts it', () => {
    expectWithin(regular.capital, CAPITAL_PER_EM, { within: 1e-9 })
    expectWithin(semibold.capital, CAPITAL_PER_EM, { within: 1e-9 })
  })
})

describe('text broken into lines', () => {
  it('keeps every word and no line is too wide', () => {
    const text = 'Run no timber before the first-off is accepted in writing, whatever was said by telephone.'
    const lines = wrappedLines(text, 40, 1.8)
    expect(lines.join(' ')).toBe(text)
    expect(lines.length).toBeGreaterThan(2)
    for (const line of lines) expect(textWidthMm(line, 1.8)).toBeLessThanOrEqual(40)
  })

  it('breaks a word that is wider than the line, and loses no letter of it', () => {
    const word = 'x'.repeat(300)
    const lines = wrappedLines(word, 30, 2.5)
    expect(lines.join('')).toBe(word)
    for (const line of lines) expect(textWidthMm(line, 2.5)).toBeLessThanOrEqual(30)
  })

  it('keeps the breaks of the text itself', () => {
    expect(wrappedLines('one\ntwo\r\nthree', 100, 2.5)).toEqual(['one', 'two', 'three'])
  })

  it('refuses a width that takes no letter', () => {
    expect(() => wrappedLines('a', 1, 10)).toThrow(/no letter/)
  })
})
