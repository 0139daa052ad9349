import { Failure } from '@shared/failure'
import type { Point } from '@shared/geometry'
import type { TextItem, Weight } from './drawing'
import { CHARACTERS, REGULAR_ADVANCES, SEMIBOLD_ADVANCES } from './letter-widths'

/** Height of a capital over the em, from the fonts' own OS/2 tables (660 of 1000), and how far letters reach below the line. */
export const CAPITAL_PER_EM = 0.66
const DESCENDER_PER_EM = 0.2
/** Blank between words, per em. */
const SPACE_PER_EM: Record<Weight, number> = { regular: 0.341, semibold: 0.306 }
/** A character that the table lacks is taken as wide as the widest of the font, so that room is never short. */
const WIDEST_PER_EM = 1.344

/** Distance of base lines over the capital's height: ISO 3098-1 type B, without accents 1.5 h; we leave a little more. */
export const LINE_PITCH = 2

const ADVANCES: Record<Weight, ReadonlyMap<string, number>> = {
  regular: advancesFrom(REGULAR_ADVANCES, SPACE_PER_EM.regular),
  semibold: advancesFrom(SEMIBOLD_ADVANCES, SPACE_PER_EM.semibold),
}

function advancesFrom(table: string, spacePerEm: number): ReadonlyMap<string, number> {
  const widths = table.split(' ').map((thousandths) => Number(thousandths) / 1000)
  const entries = [...CHARACTERS].map(
    (character, index) => [character, widths[index] ?? WIDEST_PER_EM] as const,
  )
  return new Map([...entries, [' ', spacePerEm], ['\u00a0', spacePerEm]])
}

/** The font size, mm, that gives capitals this height. */
export const emOf = (heightMm: number): number => heightMm / CAPITAL_PER_EM

/** Width of a line of text, mm, without kerning. */
export function textWidthMm(text: string, heightMm: number, weight: Weight = 'regular'): number {
  const advances = ADVANCES[weight]
  let ems = 0
  for (const character of text) ems += advances.get(character) ?? WIDEST_PER_EM
  return ems * emOf(heightMm)
}

/** Text without line breaks, tabs and control characters, which no renderer may be handed. */
export function plainLine(text: string): string {
  return text.replace(/[\p{Cc}\p{Cf}\p{Cs}\p{Zl}\p{Zp}\s]+/gu, ' ').trim()
}

/**
 * Text broken at spaces into lines no wider than widthMm; a word that is wider by itself is broken inside.
 * Line breaks in the text are kept.
 */
export function wrappedLines(
  text: string,
  widthMm: number,
  heightMm: number,
  weight: Weight = 'regular',
): string[] {
  return text
    .split(/\r\n|[\n\r]/)
    .flatMap((line) => wrappedParagraph(plainLine(line), widthMm, heightMm, weight))
}

function wrappedParagraph(text: string, widthMm: number, heightMm: number, weight: Weight): string[] {
  if (widthMm < emOf(heightMm) * WIDEST_PER_EM) {
    throw new Failure('input-invalid', {
      says: `no letter ${heightMm} mm high fits a width of ${widthMm} mm`,
    })
  }
  const lines: string[] = []
  let line = ''
  for (const word of text.split(' ').flatMap((whole) => brokenWord(whole, widthMm, heightMm, weight))) {
    const longer = line === '' ? word : `${line} ${word}`
    if (line !== '' && textWidthMm(longer, heightMm, weight) > widthMm) {
      lines.push(line)
      line = word
    } else {
      line = longer
    }
  }
  return [...lines, line]
}

function brokenWord(word: string, widthMm: number, heightMm: number, weight: Weight): string[] {
  const parts: string[] = []
  let part = ''
  for (const character of word) {
    if (part !== '' && textWidthMm(part + character, heightMm, weight) > widthMm) {
      parts.push(part)
      part = ''
    }
    part += character
  }
  return [...parts, part]
}

/** Text cut to a width, the cut shown by an ellipsis. */
export function cutToWidth(
  text: string,
  widthMm: number,
  heightMm: number,
  weight: Weight = 'regular',
): string {
  const plain = plainLine(text)
  if (textWidthMm(plain, heightMm, weight) <= widthMm) return plain
  const characters = [...plain]
  while (characters.length > 0 && textWidthMm(`${characters.join('')}…`, heightMm, weight) > widthMm)
    characters.pop()
  return `${characters.join('').trimEnd()}…`
}

/** The corners of the room that a line of text takes, from its lowest descender to its capitals, turned with it. */
export function textCorners(item: TextItem): readonly Point[] {
  const width = textWidthMm(item.text, item.heightMm, item.weight)
  const left = item.anchor === 'start' ? 0 : item.anchor === 'middle' ? -width / 2 : -width
  const bottom = -DESCENDER_PER_EM * emOf(item.heightMm)
  const cos = Math.cos(item.rotationRad)
  const sin = Math.sin(item.rotationRad)
  return [
    [left, bottom],
    [left + width, bottom],
    [left + width, item.heightMm],
    [left, item.heightMm],
  ].map(([along = 0, up = 0]) => ({
    x: item.at.x + along * cos - up * sin,
    y: item.at.y + along * sin + up * cos,
  }))
}
