import { woodFaceOf } from '@shared/section'
import type { Section } from '@shared/section'
import type { Vocabulary } from '@shared/units'
import type { Block } from './block'
import { LETTER_MM, LINE_WIDTH_MM, linesItem, textItem } from './drawing'
import type { Anchor, DrawingItem } from './drawing'
import { cutToWidth } from './lettering'
import { basisText, curveText, kindText } from './member-text'
import type { LengthPrinter } from './printing'
import { gessoOver } from './section-view'

interface Column {
  readonly heading: string
  readonly widthMm: number
  readonly anchor: Anchor
}

/** 170 mm in all: the title block's width less a blank of 5 mm at either side. */
const COLUMNS: readonly Column[] = [
  { heading: 'no.', widthMm: 9, anchor: 'end' },
  { heading: 'member', widthMm: 25, anchor: 'start' },
  { heading: 'width', widthMm: 16, anchor: 'end' },
  { heading: 'basis', widthMm: 19, anchor: 'start' },
  { heading: 'rise', widthMm: 16, anchor: 'end' },
  { heading: 'basis', widthMm: 19, anchor: 'start' },
  { heading: 'x', widthMm: 16, anchor: 'end' },
  { heading: 'y', widthMm: 16, anchor: 'end' },
  { heading: 'radius', widthMm: 34, anchor: 'start' },
]

export const TABLE_WIDTH_MM = 170
const ROW_MM = 4
const CELL_PADDING_MM = 1.5
const HEADING_MM = 12
/** What the headings over the columns say of the figures beneath: which face they belong to. */
const FINISHED_COLUMNS = 6

export type MemberRow = readonly string[]

/** One row for the sight edge and one for each member: finished width and rise with their basis, the wood's break and curve. */
export function memberRowsOf(section: Section, vocabulary: Vocabulary, printer: LengthPrinter): MemberRow[] {
  const { path, memberOf, breaks } = woodFaceOf(section)
  const place = (index: number) => {
    const at = breaks[index]
    return at === undefined ? ['–', '–'] : [printer.length(at.x), printer.length(at.y)]
  }
  const sightBasis = basisText(section.basis?.sightEdgeHeight, printer)
  const sight = [
    '0',
    'sight edge',
    '–',
    '',
    printer.length(section.sightEdgeHeight),
    sightBasis,
    ...place(0),
    '–',
  ]
  const rows = section.members.map((member, index) => [
    `${index + 1}`,
    kindText(member.kind, vocabulary),
    printer.length(member.width),
    member.width === 0 ? '' : basisText(member.basis?.width, printer),
    signed(member.rise, printer),
    member.rise === 0 ? '' : basisText(member.basis?.rise, printer),
    ...place(index + 1),
    curveText(
      member,
      path.filter((_, at) => memberOf[at] === index),
      gessoOver(section, index),
      printer,
    ),
  ])
  return [sight, ...rows]
}

const signed = (mm: number, printer: LengthPrinter): string =>
  mm > 0 ? `+${printer.length(mm)}` : printer.length(mm)

/** How many rows a table of this height takes. */
export const rowsThatFit = (heightMm: number): number =>
  Math.max(0, Math.floor((heightMm - HEADING_MM) / ROW_MM))

export const tableHeightMm = (rowCount: number): number => HEADING_MM + rowCount * ROW_MM

/** A stretch of the member table, with its headings. */
export function memberTable(rows: readonly MemberRow[], title: string, hasGesso: boolean): Block {
  const heightMm = tableHeightMm(rows.length)
  const items: DrawingItem[] = [
    textItem('table', { x: 0, y: -LETTER_MM.dimension }, title, LETTER_MM.dimension, { weight: 'semibold' }),
    ...groupHeadings(hasGesso),
    ...rowItems(
      COLUMNS.map(({ heading }) => heading),
      -HEADING_MM + ROW_MM,
      'semibold',
    ),
    ...rows.flatMap((row, index) => rowItems(row, -HEADING_MM - index * ROW_MM, 'regular')),
    linesItem('table', tableRules(rows.length), LINE_WIDTH_MM.fine, { tone: 'grey' }),
    linesItem('table', [across(-HEADING_MM), across(-heightMm)], LINE_WIDTH_MM.narrow),
  ]
  return { widthMm: TABLE_WIDTH_MM, heightMm, items }
}

function groupHeadings(hasGesso: boolean): DrawingItem[] {
  const wood = COLUMNS.slice(0, FINISHED_COLUMNS).reduce((sum, { widthMm }) => sum + widthMm, 0)
  const finished = COLUMNS.slice(0, 2).reduce((sum, { widthMm }) => sum + widthMm, 0)
  const y = -HEADING_MM + ROW_MM + 1.1
  const face = hasGesso ? 'finished face; ± is about 95 %' : 'face; ± is about 95 %'
  const cut = hasGesso ? 'wood face, at the member’s end' : 'at the member’s end'
  return [
    textItem('table', { x: finished + CELL_PADDING_MM, y }, face, LETTER_MM.small),
    textItem('table', { x: wood + CELL_PADDING_MM, y }, cut, LETTER_MM.small),
  ]
}

function rowItems(cells: MemberRow, top: number, weight: 'regular' | 'semibold'): DrawingItem[] {
  let left = 0
  return COLUMNS.flatMap(({ widthMm, anchor }, index) => {
    const x = anchor === 'end' ? left + widthMm - CELL_PADDING_MM : left + CELL_PADDING_MM
    left += widthMm
    const text = cutToWidth(cells[index] ?? '', widthMm - 1.2 * CELL_PADDING_MM, LETTER_MM.small, weight)
    const y = top - (ROW_MM + LETTER_MM.small) / 2
    return text === '' ? [] : [textItem('table', { x, y }, text, LETTER_MM.small, { anchor, weight })]
  })
}

const across = (y: number) =>
  [
    { x: 0, y },
    { x: TABLE_WIDTH_MM, y },
  ] as const

/** A hairline under every row but the last, which has a line of its own. */
function tableRules(rowCount: number) {
  return Array.from({ length: Math.max(0, rowCount - 1) }, (_, index) =>
    across(-HEADING_MM - (index + 1) * ROW_MM),
  )
}
