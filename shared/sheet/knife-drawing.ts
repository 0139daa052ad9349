import { Failure } from '@shared/failure'
import { boundsOf } from '@shared/geometry'
import type { Path, Point } from '@shared/geometry'
import type { KnifeRow } from '@shared/knife'
import { printLength } from '@shared/units'
import type { LengthUnit } from '@shared/units'
import { hungAt } from './block'
import type { Block } from './block'
import { LETTER_MM, LINE_WIDTH_MM, linesItem, pathItem, textItem } from './drawing'
import type { Drawing, DrawingItem } from './drawing'
import { cutToWidth, textWidthMm } from './lettering'
import { checkBar } from './notes'
import { ordinatesBeside } from './ordinates'
import { paperFrame } from './paper-frame'
import { drawingSpaceOf, PAPERS, TITLE_BLOCK_WIDTH_MM } from './paper-sizes'
import type { Paper } from './paper-sizes'
import { pathOnPaper, shiftedItems } from './placement'
import { TITLE_BLOCK_HEIGHT_MM, titleBlock } from './title-block'
import type { TitleBlockInput } from './title-block'

export interface KnifeDrawingInput extends TitleBlockInput {
  readonly unit: LengthUnit
  /** The cutting edge as seen on the knife's face: X = −x, Y from the tip line back, lines and arcs. */
  readonly path: Path
  readonly table: readonly KnifeRow[]
  /** What makes the drawing unfit as a template; stands in large letters. */
  readonly note: string
  /** The head that it is corrected for, in words: cutting circle, hook angle. */
  readonly head: string
}

const INSET_MM = 5
const GAP_MM = 7
/** The note and two lines beneath it. */
const HEADER_MM = 20
const ROW_MM = 3.8
const TABLE_HEADING_MM = 2 * ROW_MM
const COLUMN_MM = 56
/** The first page shows at least this much of the table, rows. */
const LEAST_ROWS = 10
const MICRON_PLACES = { mm: 2, in: 3 } as const

/**
 * The edge of the knife corrected for its hook, at 1:1, with its table of places: a drawing asked for by itself, never
 * sent as the section. The table flows on to further sheets of the same size.
 */
export function knifeDrawingOf(input: KnifeDrawingInput): Drawing[] {
  const view = knifeView(input)
  const bar = checkBar(input.unit).block
  const paper = PAPERS.find((candidate) => takes(candidate, view, bar))
  if (paper === undefined) {
    throw new Failure('input-invalid', {
      says: 'The knife is wider or higher than the largest sheet takes at 1:1.',
    })
  }
  const space = drawingSpaceOf(paper)
  const left = space.left + INSET_MM
  const viewTop = space.top - INSET_MM - HEADER_MM
  const barTop = viewTop - view.heightMm - GAP_MM
  const chunks = tableChunks(input.table, paper, barTop - bar.heightMm - GAP_MM)
  return chunks.map(({ rows, top }, index) => {
    const title = titleBlock(input, {
      documentType: 'Knife outline, corrected',
      scale: index === 0 ? '1:1' : '–',
      unitName: input.unit === 'mm' ? 'mm' : 'inches',
      sheetNumber: index + 1,
      sheetCount: chunks.length,
    })
    const items: DrawingItem[] = [
      ...paperFrame(paper),
      ...shout(input, left, space.top - INSET_MM, space.right - INSET_MM - left),
      ...tableItems(rows, input.unit, { x: left, y: top }, rowsPerColumn(top, paper)),
      ...hungAt(title, { x: space.right - TITLE_BLOCK_WIDTH_MM, y: space.bottom + TITLE_BLOCK_HEIGHT_MM }),
    ]
    const page = {
      title: `${input.note}: ${input.commissionNumber}`,
      widthMm: paper.widthMm,
      heightMm: paper.heightMm,
    }
    if (index > 0) return { ...page, items }
    const origin = { x: left - view.left, y: viewTop - view.top }
    const drawn = [...shiftedItems(view.items, origin), ...hungAt(bar, { x: left, y: barTop })]
    return { ...page, items: [...items, ...drawn], model: { origin, scale: 1, notes: notesOf(input) } }
  })
}

interface KnifeView extends Block {
  readonly left: number
  readonly top: number
}

/** The edge with its width and its height; the tip line is at the top, as the knife stands in the head cutting downward. */
function knifeView({ path, unit }: KnifeDrawingInput): KnifeView {
  const { min, max } = boundsOf(path)
  const text = (mm: number) => printLength(mm, { unit, places: MICRON_PLACES[unit], withUnit: false })
  const ordinate = (point: Point, mm: number) => ({ feature: point, text: text(mm) })
  const below = ordinatesBeside(
    'below',
    [ordinate(min, -min.x), ordinate({ x: max.x, y: min.y }, -max.x)],
    min.y,
  )
  const right = ordinatesBeside(
    'right',
    [ordinate({ x: max.x, y: min.y }, min.y), ordinate(max, max.y)],
    max.x,
  )
  const left = Math.min(min.x, below.from)
  const top = Math.max(max.y, right.to)
  return {
    left,
    top,
    widthMm: Math.max(max.x + right.reachMm, below.to) - left,
    heightMm: top - Math.min(min.y - below.reachMm, right.from),
    items: [
      pathItem('knife', pathOnPaper(path, { x: 0, y: 0 }, 1), LINE_WIDTH_MM.wide),
      ...below.items,
      ...right.items,
    ],
  }
}

function takes(paper: Paper, view: KnifeView, bar: Block): boolean {
  const { left, right, top } = drawingSpaceOf(paper)
  const used = INSET_MM + HEADER_MM + view.heightMm + GAP_MM + bar.heightMm + GAP_MM
  return view.widthMm <= right - left - 2 * INSET_MM && rowsPerColumn(top - used, paper) >= LEAST_ROWS
}

/** Table rows from a height of the sheet down to the title block. */
function rowsPerColumn(top: number, paper: Paper): number {
  const { bottom } = drawingSpaceOf(paper)
  return Math.floor((top - bottom - TITLE_BLOCK_HEIGHT_MM - GAP_MM - TABLE_HEADING_MM) / ROW_MM)
}

const columnsOn = (paper: Paper): number => {
  const { left, right } = drawingSpaceOf(paper)
  return Math.max(1, Math.floor((right - left - 2 * INSET_MM) / COLUMN_MM))
}

interface Chunk {
  readonly rows: readonly KnifeRow[]
  readonly top: number
}

function tableChunks(rows: readonly KnifeRow[], paper: Paper, firstTop: number): Chunk[] {
  const restTop = drawingSpaceOf(paper).top - INSET_MM - HEADER_MM
  const chunks: Chunk[] = []
  let rest = rows
  do {
    const top = chunks.length === 0 ? firstTop : restTop
    const count = columnsOn(paper) * rowsPerColumn(top, paper)
    chunks.push({ rows: rest.slice(0, count), top })
    rest = rest.slice(count)
  } while (rest.length > 0)
  return chunks
}

function tableItems(
  rows: readonly KnifeRow[],
  unit: LengthUnit,
  corner: Point,
  perColumn: number,
): DrawingItem[] {
  const columns = Array.from({ length: Math.ceil(rows.length / perColumn) }, (_, index) =>
    rows.slice(index * perColumn, (index + 1) * perColumn),
  )
  return columns.flatMap((column, index) =>
    tableColumn(column, unit, { x: corner.x + index * COLUMN_MM, y: corner.y }),
  )
}

const CELL_ENDS_MM = [14, 31, 50] as const
const HEADINGS = ['x', 'depth', 'on the knife'] as const

function tableColumn(rows: readonly KnifeRow[], unit: LengthUnit, { x, y }: Point): DrawingItem[] {
  const text = (mm: number) => printLength(mm, { unit, places: MICRON_PLACES[unit], withUnit: false })
  const line = (cells: readonly string[], top: number, weight: 'regular' | 'semibold') =>
    cells.map((cell, index) =>
      textItem('table', { x: x + (CELL_ENDS_MM[index] ?? 0), y: top - ROW_MM + 1 }, cell, LETTER_MM.small, {
        anchor: 'end',
        weight,
      }),
    )
  const rule = y - ROW_MM - 0.4
  return [
    ...line(HEADINGS, y, 'semibold'),
    linesItem(
      'table',
      [
        [
          { x, y: rule },
          { x: x + CELL_ENDS_MM[2], y: rule },
        ],
      ],
      LINE_WIDTH_MM.narrow,
    ),
    ...rows.flatMap((row, index) =>
      line(
        [text(row.x), text(row.depth), text(row.face)],
        y - TABLE_HEADING_MM + ROW_MM - 1 - index * ROW_MM,
        'regular',
      ),
    ),
  ]
}

function shout({ note, head }: KnifeDrawingInput, x: number, top: number, widthMm: number): DrawingItem[] {
  const seen = 'Seen on the face of the knife: the mirror of the section, x from the sight edge at the right.'
  const fits = textWidthMm(note, LETTER_MM.title, 'semibold') <= widthMm
  const heightMm = fits ? LETTER_MM.title : LETTER_MM.heading
  const shown = cutToWidth(note, widthMm, heightMm, 'semibold')
  const foot = top - LETTER_MM.title
  return [
    textItem('notes', { x, y: foot }, shown, heightMm, { weight: 'semibold' }),
    textItem('notes', { x, y: foot - 5 }, cutToWidth(head, widthMm, LETTER_MM.small), LETTER_MM.small),
    textItem('notes', { x, y: foot - 9 }, seen, LETTER_MM.small),
  ]
}

const notesOf = ({ note, head, commissionNumber, title }: KnifeDrawingInput): string[] => [
  note,
  head,
  `${commissionNumber}  ${title.slice(0, 120)}`,
  'Millimetres, 1:1. X is minus the x of the section, Y runs from the tip line back.',
]
