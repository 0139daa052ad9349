import { wordOf } from '@shared/units'
import type { Block } from './block'
import { CUT_LIST_WIDTH_MM } from './cut-list-page'
import type { CutListInput, ListedRail } from './cut-list-input'
import { LETTER_MM, LINE_WIDTH_MM, linesItem, pathItem, rectanglePath, textItem } from './drawing'
import type { Anchor, DrawingItem } from './drawing'
import { cutToWidth, LINE_PITCH, wrappedLines } from './lettering'
import type { LengthPrinter } from './printing'

const GAP_MM = 5
const WIDTH = CUT_LIST_WIDTH_MM
/** More short pieces than this are counted, not named. */
const MOST_NAMED = 8

/** What the list is for. */
export function headingBlock({
  title,
  issueLetter,
  commissionNumber,
  lengths,
  vocabulary,
}: CutListInput): Block {
  const shown = cutToWidth(`${title}, drawing ${issueLetter}`, WIDTH, LETTER_MM.title, 'semibold')
  const cuts = lengths.reduce((sum, length) => sum + length.cuts.length, 0)
  const word = wordOf(vocabulary, 'length', { plural: lengths.length !== 1 })
  const list = wordOf(vocabulary, 'cut-list', { capital: true })
  const under = `${list} for ${commissionNumber}: ${cuts} cuts from ${lengths.length} ${word}`
  const items = [
    textItem('notes', { x: 0, y: -LETTER_MM.title }, shown, LETTER_MM.title, { weight: 'semibold' }),
    textItem(
      'notes',
      { x: 0, y: -LETTER_MM.title - 6 },
      cutToWidth(under, WIDTH, LETTER_MM.dimension),
      LETTER_MM.dimension,
    ),
  ]
  return { widthMm: WIDTH, heightMm: LETTER_MM.title + 6 + GAP_MM, items }
}

/** The figures that the saw is set to, large enough to be read at arm's length. */
export function settingsBlock({ rails, saw }: CutListInput, printer: LengthPrinter): Block {
  const mitres = [...new Set(rails.map(({ mitreDeg }) => degreesText(mitreDeg)))]
  const fields = [
    { label: 'saw', value: saw.name, widthMm: 72 },
    { label: 'turned to, from square', value: mitres.join(', '), widthMm: 42 },
    { label: `kerf, ${printer.unitName}`, value: printer.length(saw.kerfMm), widthMm: 24 },
    { label: `between neighbours, ${printer.unitName}`, value: printer.length(saw.marginMm), widthMm: 42 },
  ]
  const heightMm = 15
  const items: DrawingItem[] = [
    pathItem('table', rectanglePath(0, -heightMm, WIDTH, heightMm), LINE_WIDTH_MM.wide, { closed: true }),
  ]
  let left = 0
  for (const { label, value, widthMm } of fields) {
    const x = left + 2.5
    const room = widthMm - 4
    if (left > 0)
      items.push(
        linesItem(
          'table',
          [
            [
              { x: left, y: 0 },
              { x: left, y: -heightMm },
            ],
          ],
          LINE_WIDTH_MM.narrow,
        ),
      )
    const shown = cutToWidth(value, room, LETTER_MM.heading, 'semibold')
    items.push(
      textItem('table', { x, y: -4.3 }, cutToWidth(label, room, LETTER_MM.small), LETTER_MM.small),
      textItem('table', { x, y: -11.8 }, shown, LETTER_MM.heading, { weight: 'semibold' }),
    )
    left += widthMm
  }
  return { widthMm: WIDTH, heightMm: heightMm + GAP_MM, items }
}

/** Whole degrees without decimals, others to a hundredth. */
const degreesText = (deg: number): string => `${Number.isInteger(deg) ? deg : deg.toFixed(2)}°`

/** The standing cautions of the saw, the plan's own, and the pieces too short to be held safely, by name. */
export function cautionBlock(input: CutListInput, printer: LengthPrinter): Block {
  const sentences = [
    'Prove the stop with a test cut before the first rail. Both rails of a pair come off the same stop.',
    'Keep the guard down, and let the blade stop before anything is lifted or cleared. Lock the saw off before the stop or the blade is touched.',
    ...shortPieces(input, printer),
    ...(input.cautions ?? []),
    'The saw maker’s instructions and the workshop’s own rules come before this sheet.',
  ]
  const lines = sentences.flatMap((sentence) => wrappedLines(sentence, WIDTH - 8, LETTER_MM.small))
  const pitch = LETTER_MM.small * LINE_PITCH
  const heightMm = lines.length * pitch + 4
  const items: DrawingItem[] = [
    pathItem('table', rectanglePath(0, -heightMm, WIDTH, heightMm), LINE_WIDTH_MM.narrow, { closed: true }),
    ...lines.map((line, index) =>
      textItem('notes', { x: 4, y: -2.5 - LETTER_MM.small - index * pitch }, line, LETTER_MM.small),
    ),
  ]
  return { widthMm: WIDTH, heightMm: heightMm + GAP_MM, items }
}

function shortPieces({ rails, saw }: CutListInput, printer: LengthPrinter): string[] {
  const short = rails.filter(({ longPointMm }) => longPointMm < saw.shortestSafeMm)
  if (short.length === 0) return []
  const named = short.slice(0, MOST_NAMED)
  const names = named.map(
    ({ frame, side, longPointMm }) => `${frame} ${side} (${printer.length(longPointMm)})`,
  )
  if (short.length > named.length) names.push(`and ${short.length - named.length} more`)
  const least = `${printer.length(saw.shortestSafeMm)} ${printer.unitName}`
  return [
    `Too short to hold by hand on this saw (under ${least}): ${names.join(', ')}. Clamp them, or cut them from a longer piece held in a jig.`,
  ]
}

interface RailColumn {
  readonly heading: string
  readonly widthMm: number
  readonly anchor: Anchor
  readonly text: (rail: ListedRail, printer: LengthPrinter) => string
}

const RAIL_COLUMNS: readonly RailColumn[] = [
  { heading: 'frame', widthMm: 48, anchor: 'start', text: ({ frame }) => frame },
  { heading: 'rail', widthMm: 28, anchor: 'start', text: ({ side }) => side },
  { heading: 'how many', widthMm: 20, anchor: 'end', text: ({ count }) => `${count}` },
  { heading: 'long point', widthMm: 24, anchor: 'end', text: (rail, { length }) => length(rail.longPointMm) },
  { heading: 'rebate', widthMm: 22, anchor: 'end', text: (rail, { length }) => length(rail.rebateMm) },
  { heading: 'sight', widthMm: 22, anchor: 'end', text: (rail, { length }) => length(rail.sightMm) },
  { heading: 'mitre', widthMm: 16, anchor: 'end', text: ({ mitreDeg }) => degreesText(mitreDeg) },
]

const RAIL_ROW_MM = 5

/** The rails, each once with its count: what the finished pieces are measured against. Headings first, then a block a row. */
export function railRows({ rails, vocabulary }: CutListInput, printer: LengthPrinter): Block[] {
  const words: Record<string, string> = {
    rebate: wordOf(vocabulary, 'rebate'),
    mitre: wordOf(vocabulary, 'mitre'),
  }
  const heading = rowBlock(
    RAIL_COLUMNS.map((column) => words[column.heading] ?? column.heading),
    'semibold',
  )
  const rows = rails.map((rail) =>
    rowBlock(
      RAIL_COLUMNS.map(({ text }) => text(rail, printer)),
      'regular',
    ),
  )
  return [heading, ...rows]
}

function rowBlock(cells: readonly string[], weight: 'regular' | 'semibold'): Block {
  let left = 0
  const items: DrawingItem[] = RAIL_COLUMNS.flatMap(({ widthMm, anchor }, index) => {
    const x = anchor === 'end' ? left + widthMm - 1.5 : left + 0.5
    left += widthMm
    const text = cutToWidth(cells[index] ?? '', widthMm - 2, LETTER_MM.small, weight)
    return text === ''
      ? []
      : [textItem('table', { x, y: -RAIL_ROW_MM + 1.6 }, text, LETTER_MM.small, { anchor, weight })]
  })
  const rule = [
    [
      { x: 0, y: -RAIL_ROW_MM },
      { x: WIDTH, y: -RAIL_ROW_MM },
    ],
  ] as const
  items.push(linesItem('table', rule, LINE_WIDTH_MM.fine, { tone: 'grey' }))
  return { widthMm: WIDTH, heightMm: RAIL_ROW_MM, items }
}
