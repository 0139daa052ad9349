import type { Point } from '@shared/geometry'
import type { Block } from './block'
import type { CutListInput, ListedCut, ListedLength } from './cut-list-input'
import { LETTER_MM, LINE_WIDTH_MM, pathItem, polygonPath, rectanglePath, textItem } from './drawing'
import type { DrawingItem } from './drawing'
import { cutToWidth, textWidthMm } from './lettering'
import type { LengthPrinter } from './printing'

const STRIP_HEIGHT_MM = 12
const NAME_ROOM_MM = 4.5
const CAPTION_MM = 5.5
const TEXT_PADDING_MM = 1

interface StripScale {
  readonly perMm: number
  readonly widthMm: number
}

/**
 * A length seen from above, back edge at the top, with its cuts as they fall: true along the length (all lengths of a
 * list to one scale, the longest as wide as the strip), not to scale across.
 */
export function cutStrip(
  length: ListedLength,
  input: CutListInput,
  printer: LengthPrinter,
  widthMm: number,
): Block {
  const longest = Math.max(...input.lengths.map(({ lengthMm }) => lengthMm))
  const scale = { perMm: widthMm / longest, widthMm: (length.lengthMm / longest) * widthMm }
  const top = -NAME_ROOM_MM
  const bottom = top - STRIP_HEIGHT_MM
  const stick = rectanglePath(0, bottom, scale.widthMm, STRIP_HEIGHT_MM)
  const items: DrawingItem[] = [
    pathItem('table', stick, LINE_WIDTH_MM.narrow, { closed: true, fill: 'pale' }),
    ...length.cuts.flatMap((cut, index) => cutItems(cut, index + 1, input, printer, scale)),
    ...offcutItems(length, input, printer, scale),
    textItem('notes', { x: 0, y: bottom - CAPTION_MM + 1.4 }, captionOf(length, printer), LETTER_MM.small),
  ]
  return { widthMm, heightMm: NAME_ROOM_MM + STRIP_HEIGHT_MM + CAPTION_MM, items }
}

function captionOf({ startTrimMm }: ListedLength, printer: LengthPrinter): string {
  const seen = 'Seen from above: back edge (top) to the fence, flat back on the table, face up.'
  return startTrimMm > 0 ? `${seen} Trim ${printer.length(startTrimMm)} from the first end.` : seen
}

/** The trapezoid of a rail: its long points on the back edge, the mitres running in across the moulding's width. */
function cutItems(
  cut: ListedCut,
  number: number,
  { trueWidthMm }: CutListInput,
  printer: LengthPrinter,
  { perMm }: StripScale,
): DrawingItem[] {
  const left = cut.atMm * perMm
  const right = (cut.atMm + cut.longPointMm) * perMm
  const inset = trueWidthMm * Math.tan((cut.mitreDeg * Math.PI) / 180) * perMm
  const top = -NAME_ROOM_MM
  const bottom = top - STRIP_HEIGHT_MM
  const corners: Point[] = [
    { x: left, y: top },
    { x: right, y: top },
    { x: Math.max(right - inset, (left + right) / 2), y: bottom },
    { x: Math.min(left + inset, (left + right) / 2), y: bottom },
  ]
  const middle = (left + right) / 2
  const inside = right - left - inset - 2 * TEXT_PADDING_MM
  const size = printer.length(cut.longPointMm)
  const text = [`${number}:  ${size}`, size, `${number}`].find((candidate) => textFits(candidate, inside))
  const name = cutToWidth(cut.side, right - left - 2 * TEXT_PADDING_MM, LETTER_MM.small)
  return [
    pathItem('table', polygonPath(corners), LINE_WIDTH_MM.narrow, { closed: true, fill: 'white' }),
    ...centredText(
      text ?? '',
      middle,
      bottom + (STRIP_HEIGHT_MM - LETTER_MM.dimension) / 2,
      LETTER_MM.dimension,
    ),
    ...centredText(name === '…' ? '' : name, middle, top + 1.4, LETTER_MM.small),
  ]
}

const textFits = (text: string, roomMm: number): boolean => textWidthMm(text, LETTER_MM.dimension) <= roomMm

function centredText(text: string, x: number, y: number, heightMm: number): DrawingItem[] {
  return text === '' ? [] : [textItem('table', { x, y }, text, heightMm, { anchor: 'middle' })]
}

/** The words for what is left, where the strip has room for them between the last mitre and the end. */
function offcutItems(
  { cuts, lengthMm, offcutMm }: ListedLength,
  { trueWidthMm }: CutListInput,
  printer: LengthPrinter,
  { perMm }: StripScale,
): DrawingItem[] {
  const last = cuts.at(-1)
  if (last === undefined || offcutMm <= 0) return []
  const from = Math.max(last.atMm + last.longPointMm, lengthMm - offcutMm) * perMm
  const to = lengthMm * perMm
  const room = to - from - 2 * TEXT_PADDING_MM
  const size = printer.length(offcutMm)
  const text = [`offcut ${size}`, size].find((candidate) => textWidthMm(candidate, LETTER_MM.small) <= room)
  if (text === undefined || trueWidthMm <= 0) return []
  const y = -NAME_ROOM_MM - (STRIP_HEIGHT_MM + LETTER_MM.small) / 2
  return centredText(text, (from + to) / 2, y, LETTER_MM.small)
}
