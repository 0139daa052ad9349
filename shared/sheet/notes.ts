import type { LengthUnit } from '@shared/units'
import type { Block } from './block'
import { LETTER_MM, LINE_WIDTH_MM, linesItem, pathItem, rectanglePath, textItem } from './drawing'
import type { DrawingItem } from './drawing'
import { LINE_PITCH, textWidthMm, wrappedLines } from './lettering'

export interface NoteRow {
  readonly label: string
  readonly text: string
}

const LINE_MM = LETTER_MM.small * LINE_PITCH
const LABEL_WIDTH_MM = 30
const HEADING_DROP_MM = 7

/** A heading with rows of label and text beneath, the text wrapped. Rows without text are left out. */
export function notesBlock(heading: string, rows: readonly NoteRow[], widthMm: number): Block {
  const items: DrawingItem[] = [headingItem(heading)]
  let y = -HEADING_DROP_MM
  for (const { label, text } of rows) {
    if (text.trim() === '') continue
    const lines = wrappedLines(text, widthMm - LABEL_WIDTH_MM, LETTER_MM.small)
    items.push(textItem('notes', { x: 0, y: y - LETTER_MM.small }, label, LETTER_MM.small, { tone: 'ink' }))
    lines.forEach((line, index) => {
      const at = { x: LABEL_WIDTH_MM, y: y - LETTER_MM.small - index * LINE_MM }
      items.push(textItem('notes', at, line, LETTER_MM.small))
    })
    y -= lines.length * LINE_MM
  }
  return { widthMm, heightMm: -y, items }
}

/** A heading with sentences beneath, each on lines of its own. */
export function sentencesBlock(heading: string, sentences: readonly string[], widthMm: number): Block {
  const items: DrawingItem[] = [headingItem(heading)]
  let y = -HEADING_DROP_MM
  for (const sentence of sentences) {
    for (const line of wrappedLines(sentence, widthMm, LETTER_MM.small)) {
      items.push(textItem('notes', { x: 0, y: y - LETTER_MM.small }, line, LETTER_MM.small))
      y -= LINE_MM
    }
    y -= LETTER_MM.small * 0.4
  }
  return { widthMm, heightMm: -y, items }
}

const headingItem = (heading: string): DrawingItem =>
  textItem('notes', { x: 0, y: -LETTER_MM.dimension }, heading, LETTER_MM.dimension, { weight: 'semibold' })

/** A bar of known length, so that whoever prints the sheet finds out whether the print was scaled. */
export interface CheckBar {
  readonly lengthMm: number
  readonly block: Block
}

const BAR_HEIGHT_MM = 3
const INCH_MM = 25.4

/** 100 mm in ten fields; in inches 4 in in four, since a sheet never mixes its units. */
export function checkBar(unit: LengthUnit): CheckBar {
  const fields = unit === 'mm' ? 10 : 4
  const fieldMm = unit === 'mm' ? 10 : INCH_MM
  const lengthMm = fields * fieldMm
  const name = unit === 'mm' ? '100 mm' : '4 in'
  const filled = Array.from({ length: fields / 2 }, (_, index) =>
    pathItem('notes', rectanglePath(2 * index * fieldMm, -BAR_HEIGHT_MM, fieldMm, BAR_HEIGHT_MM), 0, {
      closed: true,
      fill: 'ink',
    }),
  )
  // The outline's own width lies inside, so that the bar's outer edges are the measure.
  const inset = LINE_WIDTH_MM.narrow / 2
  const frame = rectanglePath(inset, -BAR_HEIGHT_MM + inset, lengthMm - 2 * inset, BAR_HEIGHT_MM - 2 * inset)
  const text = `Measure this bar: it must be ${name} long. If it is not, the print was scaled.`
  const items: DrawingItem[] = [
    ...filled,
    pathItem('notes', frame, LINE_WIDTH_MM.narrow, { closed: true }),
    textItem('notes', { x: 0, y: -BAR_HEIGHT_MM - LETTER_MM.small - 1.4 }, text, LETTER_MM.small),
  ]
  const heightMm = BAR_HEIGHT_MM + LETTER_MM.small + 1.4 + 1
  return {
    lengthMm,
    block: { widthMm: Math.max(lengthMm, textWidthMm(text, LETTER_MM.small)), heightMm, items },
  }
}

/** A line across a block's top, to part it from what stands above. */
export function ruleBlock(widthMm: number): Block {
  const line = linesItem(
    'notes',
    [
      [
        { x: 0, y: 0 },
        { x: widthMm, y: 0 },
      ],
    ],
    LINE_WIDTH_MM.fine,
  )
  return { widthMm, heightMm: LINE_WIDTH_MM.fine, items: [line] }
}
