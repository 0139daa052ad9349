import { Failure } from '@shared/failure'
import { wordOf } from '@shared/units'
import { hungAt } from './block'
import type { Block } from './block'
import { LETTER_MM, LINE_WIDTH_MM, linesItem, pathItem, rectanglePath, textItem } from './drawing'
import type { Drawing, DrawingItem } from './drawing'
import { cutStrip } from './cut-strip'
import type { CutListInput, ListedLength } from './cut-list-input'
import { cutToWidth, wrappedLines } from './lettering'
import { cautionBlock, headingBlock, railRows, settingsBlock } from './cut-list-head'
import { CUT_LIST_MARGIN_MM as MARGIN_MM, CUT_LIST_PAGE as PAGE, CUT_LIST_WIDTH_MM } from './cut-list-page'
import { benchPrinterOf } from './printing'
import type { LengthPrinter } from './printing'

const ROW_MM = 9.5
const BOX_MM = 5.5

/** A block, and whether the one after it must stand on the same page. */
interface Flowing {
  readonly block: Block
  readonly keepsNext: boolean
}

/**
 * The cut list as the bench takes it to the saw: settings and cautions, the rails, then every length with its cuts drawn
 * and a box to tick, a line for the true length and one for the offcut. A4 pages, as many as it takes.
 */
export function cutListPagesOf(input: CutListInput): Drawing[] {
  if (input.lengths.length === 0) {
    throw new Failure('not-ready', {
      says: 'The plan opens no length, so there is no list to cut: make a plan first.',
    })
  }
  const printer = benchPrinterOf(input.unit)
  const head = [
    headingBlock(input),
    ...barredBlocks(input),
    settingsBlock(input, printer),
    cautionBlock(input, printer),
  ]
  const flow: Flowing[] = [
    ...head.map((block) => ({ block, keepsNext: true })),
    ...railRows(input, printer).map((block, index) => ({ block, keepsNext: index === 0 })),
    ...input.lengths.flatMap((length, index) => lengthBlocks(length, index, input, printer)),
  ]
  const pages = flowed(flow)
  return pages.map((items, index) => ({
    title: `Cut list ${input.commissionNumber}: ${input.title}`,
    ...PAGE,
    items: [...items, ...footItems(input, index + 1, pages.length)],
  }))
}

function barredBlocks({ barred }: CutListInput): Block[] {
  if (barred === undefined) return []
  const lines = wrappedLines(barred, CUT_LIST_WIDTH_MM, LETTER_MM.title, 'semibold')
  const pitch = LETTER_MM.title * 1.6
  const items = lines.map((line, index) =>
    textItem('notes', { x: 0, y: -LETTER_MM.title - index * pitch }, line, LETTER_MM.title, {
      weight: 'semibold',
    }),
  )
  return [{ widthMm: CUT_LIST_WIDTH_MM, heightMm: lines.length * pitch, items }]
}

/** A length's heading, its drawing, a row for every cut and one for the offcut. */
function lengthBlocks(
  length: ListedLength,
  index: number,
  input: CutListInput,
  printer: LengthPrinter,
): Flowing[] {
  const rows = length.cuts.map(({ side, frame, longPointMm }, cut) =>
    tickRow({
      number: `${cut + 1}`,
      name: side,
      detail: frame,
      size: printer.length(longPointMm),
      asks: 'true length',
    }),
  )
  const offcut = tickRow({
    number: '',
    name: length.offcutMark === undefined ? 'Offcut, to waste' : 'Offcut to the rack',
    detail: length.offcutMark === undefined ? '' : `along the back edge, mark ${length.offcutMark}`,
    size: printer.length(length.offcutMm),
    asks: 'true length',
  })
  return [
    { block: lengthHeading(length, index, input, printer), keepsNext: true },
    { block: cutStrip(length, input, printer, CUT_LIST_WIDTH_MM), keepsNext: true },
    ...[...rows, offcut].map((block) => ({ block, keepsNext: false })),
  ]
}

function lengthHeading(
  { name, lengthMm }: ListedLength,
  index: number,
  { lengths, vocabulary }: CutListInput,
  printer: LengthPrinter,
): Block {
  const word = wordOf(vocabulary, 'length', { capital: true })
  const text = `${word} ${index + 1} of ${lengths.length}: ${name}, ${printer.length(lengthMm)} ${printer.unitName}`
  const at = { x: 0, y: -6 - LETTER_MM.heading }
  const shown = cutToWidth(text, CUT_LIST_WIDTH_MM, LETTER_MM.heading, 'semibold')
  return {
    widthMm: CUT_LIST_WIDTH_MM,
    heightMm: LETTER_MM.heading + 9,
    items: [textItem('notes', at, shown, LETTER_MM.heading, { weight: 'semibold' })],
  }
}

interface TickRow {
  readonly number: string
  readonly name: string
  readonly detail: string
  readonly size: string
  readonly asks: string
}

/** A box, the cut's number, what it is, its size in large figures, and a line to write the true length on. */
function tickRow({ number, name, detail, size, asks }: TickRow): Block {
  const line = -ROW_MM
  const base = line + (ROW_MM - LETTER_MM.dimension) / 2
  const large = line + (ROW_MM - LETTER_MM.heading) / 2
  const box = rectanglePath(0.5, line + (ROW_MM - BOX_MM) / 2, BOX_MM, BOX_MM)
  const writeOn = [
    { x: 148, y: base - 0.6 },
    { x: CUT_LIST_WIDTH_MM, y: base - 0.6 },
  ] as const
  const items: DrawingItem[] = [
    pathItem('table', box, LINE_WIDTH_MM.wide, { closed: true }),
    textItem('table', { x: 9, y: base }, number, LETTER_MM.dimension),
    textItem(
      'table',
      { x: 16, y: base },
      cutToWidth(name, 34, LETTER_MM.dimension, 'semibold'),
      LETTER_MM.dimension,
      {
        weight: 'semibold',
      },
    ),
    textItem('table', { x: 52, y: base }, cutToWidth(detail, 44, LETTER_MM.small), LETTER_MM.small),
    textItem('table', { x: 126, y: large }, size, LETTER_MM.heading, { anchor: 'end', weight: 'semibold' }),
    textItem('table', { x: 130, y: base }, asks, LETTER_MM.small),
    linesItem('table', [writeOn], LINE_WIDTH_MM.fine),
    linesItem(
      'table',
      [
        [
          { x: 0, y: line },
          { x: CUT_LIST_WIDTH_MM, y: line },
        ],
      ],
      LINE_WIDTH_MM.fine,
      { tone: 'grey' },
    ),
  ]
  return { widthMm: CUT_LIST_WIDTH_MM, heightMm: ROW_MM, items: items.filter(isNotBlank) }
}

const isNotBlank = (item: DrawingItem): boolean => item.kind !== 'text' || item.text !== ''

/** The blocks on pages from the top down; a page ends before the first of a kept run that it cannot take whole. */
function flowed(flow: readonly Flowing[]): DrawingItem[][] {
  const roomMm = PAGE.heightMm - MARGIN_MM.top - MARGIN_MM.bottom
  const pages: DrawingItem[][] = [[]]
  let usedMm = 0
  const turn = () => {
    pages.push([])
    usedMm = 0
  }
  for (const run of keptRuns(flow)) {
    if (usedMm > 0 && usedMm + heightOf(run) > roomMm) turn()
    for (const { block } of run) {
      // Only a run taller than a whole page gets here without room: it is parted rather than cut off.
      if (usedMm > 0 && usedMm + block.heightMm > roomMm) turn()
      pages.at(-1)?.push(...hungAt(block, { x: MARGIN_MM.left, y: PAGE.heightMm - MARGIN_MM.top - usedMm }))
      usedMm += block.heightMm
    }
  }
  return pages
}

const heightOf = (run: readonly Flowing[]): number => run.reduce((sum, { block }) => sum + block.heightMm, 0)

function keptRuns(flow: readonly Flowing[]): Flowing[][] {
  const runs: Flowing[][] = []
  let run: Flowing[] = []
  for (const entry of flow) {
    run.push(entry)
    if (entry.keepsNext) continue
    runs.push(run)
    run = []
  }
  return run.length === 0 ? runs : [...runs, run]
}

function footItems(input: CutListInput, number: number, count: number): DrawingItem[] {
  const { workshop, commissionNumber, issueLetter, sha256, listNumber, printedOn, batch } = input
  const left = MARGIN_MM.left
  const right = PAGE.widthMm - MARGIN_MM.right
  const y = MARGIN_MM.bottom - 7
  const batchText = batch === undefined ? '' : `, batch ${batch}`
  const what = `${workshop}. ${commissionNumber}, drawing ${issueLetter}${batchText}, list ${listNumber} of ${printedOn}`
  const page = `sheet ${number}/${count}`
  return [
    linesItem(
      'notes',
      [
        [
          { x: left, y: y + 5 },
          { x: right, y: y + 5 },
        ],
      ],
      LINE_WIDTH_MM.narrow,
    ),
    textItem('notes', { x: left, y }, cutToWidth(what, right - left - 25, LETTER_MM.small), LETTER_MM.small),
    textItem('notes', { x: right, y }, page, LETTER_MM.small, { anchor: 'end' }),
    textItem('notes', { x: left, y: y - 4 }, `SHA-256 ${sha256}`, LETTER_MM.small),
  ]
}
