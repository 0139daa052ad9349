import type { Point } from '@shared/geometry'
import type { Block } from './block'
import { LETTER_MM } from './drawing'
import { rowsThatFit, tableHeightMm } from './member-table'
import type { MemberRow } from './member-table'
import { drawingSpaceOf, TITLE_BLOCK_WIDTH_MM } from './paper-sizes'
import type { Paper, Scale, Space } from './paper-sizes'
import type { LengthPrinter } from './printing'
import type { SectionView } from './section-view'
import type { SheetInput } from './sheet-input'
import { orderBlock, sheetNotes } from './sheet-notes'
import { statusText, TITLE_BLOCK_HEIGHT_MM } from './title-block'

/** Blank inside the frame, mm. */
export const INSET_MM = 5
/** Blank between the parts of a sheet, and the room of the view's heading, mm. */
const GAP_MM = 7
export const VIEW_HEADING_MM = 10
const SHOUT_MM = LETTER_MM.shout + 6
/** The right-hand column's parts are narrower than the title block by a blank at either side. */
const COLUMN_MM = TITLE_BLOCK_WIDTH_MM - 2 * INSET_MM
/** A table that flows on to the next sheet shows at least this much on the first, rows. */
const LEAST_ROWS = 8

/** What a sheet has to hold, whatever its size. */
export interface Parts {
  readonly input: SheetInput
  readonly printer: LengthPrinter
  readonly rows: readonly MemberRow[]
  readonly bar: Block
}

/** The parts tried on one size of paper at one scale. */
export interface Attempt extends Parts {
  readonly view: SectionView
  readonly scale: Scale
  readonly paper: Paper
}

export interface Placed {
  readonly block: Block
  /** Upper left. */
  readonly corner: Point
}

/** Where everything goes on the first page. */
export interface Layout {
  readonly paper: Paper
  readonly scale: Scale
  readonly view: SectionView
  /** Upper left of the view's own extents, heading excluded. */
  readonly viewCorner: Point
  readonly headingTop: number
  readonly blocks: readonly Placed[]
  readonly tableCorner: Point
  readonly rowsShown: number
}

/** The strip in large letters that says a sheet is no order to cut; an approved issue has none. */
export const shoutHeight = (input: SheetInput): number => (statusText(input) === 'approved' ? 0 : SHOUT_MM)

/** The parts on this paper, or undefined where they do not fit: A4 upright in one column, the others lying in two. */
export function arrangedOn(attempt: Attempt): Layout | undefined {
  if (attempt.paper.name === 'A4') return arrangedInOneColumn(attempt)
  return arrangedBeside(attempt) ?? arrangedAbove(attempt)
}

const viewWidth = (view: SectionView): number => view.right - view.left
const viewHeight = (view: SectionView): number => view.top - view.bottom
const centred = (left: number, widthMm: number, own: number): number => left + (widthMm - own) / 2

/** The top of the view, under the strip and the heading. */
const viewTopOf = ({ input }: Attempt, space: Space): number =>
  space.top - INSET_MM - shoutHeight(input) - VIEW_HEADING_MM

/** A4: view, table, notes, bar and title block under one another; all of the table or not at all. */
function arrangedInOneColumn(attempt: Attempt): Layout | undefined {
  const { input, printer, paper, view, scale, rows, bar } = attempt
  const space = drawingSpaceOf(paper)
  const left = space.left + INSET_MM
  const notes = sheetNotes(input, printer, { scaleText: scale.text, widthMm: COLUMN_MM, withOrder: true })
  const viewTop = viewTopOf(attempt, space)
  const tableTop = viewTop - viewHeight(view) - GAP_MM
  const notesTop = tableTop - tableHeightMm(rows.length) - GAP_MM
  const barTop = notesTop - notes.heightMm - GAP_MM
  const hasRoom = barTop - bar.heightMm >= space.bottom + TITLE_BLOCK_HEIGHT_MM + 2
  if (!hasRoom || viewWidth(view) > COLUMN_MM) return undefined
  return {
    ...{ paper, scale, view },
    headingTop: viewTop + VIEW_HEADING_MM,
    viewCorner: { x: centred(left, COLUMN_MM, viewWidth(view)), y: viewTop },
    blocks: [
      { block: notes, corner: { x: left, y: notesTop } },
      { block: bar, corner: { x: left, y: barTop } },
    ],
    tableCorner: { x: left, y: tableTop },
    rowsShown: rows.length,
  }
}

/** The right-hand column of a lying sheet: the table from a height down, the order under it if it has the room, the title block. */
interface RightColumn {
  readonly tableCorner: Point
  readonly rowsShown: number
  readonly order: readonly Placed[]
}

function rightColumn({ input, rows }: Attempt, space: Space, top: number): RightColumn | undefined {
  const foot = space.bottom + TITLE_BLOCK_HEIGHT_MM + GAP_MM
  const rowsShown = Math.min(rows.length, rowsThatFit(top - foot))
  if (rowsShown < rows.length && rowsShown < LEAST_ROWS) return undefined
  const x = space.right - TITLE_BLOCK_WIDTH_MM + INSET_MM
  const orderTop = top - tableHeightMm(rowsShown) - GAP_MM
  const order = orderBlock(input, COLUMN_MM)
  const fits = order !== undefined && orderTop - order.heightMm >= foot
  return {
    tableCorner: { x, y: top },
    rowsShown,
    order: fits ? [{ block: order, corner: { x, y: orderTop } }] : [],
  }
}

/** What stands in the left-hand column: its width, the notes without what the right-hand one has taken, and the bar's top. */
function leftColumn({ input, printer, scale, bar }: Attempt, space: Space, column: RightColumn) {
  const left = space.left + INSET_MM
  const widthMm = space.right - TITLE_BLOCK_WIDTH_MM - GAP_MM - left
  const withOrder = column.order.length === 0
  const notes = sheetNotes(input, printer, { scaleText: scale.text, widthMm, withOrder })
  return { left, widthMm, notes, barTop: space.bottom + INSET_MM + bar.heightMm }
}

/** The view and the notes at the left, the table at the right above the title block. */
function arrangedBeside(attempt: Attempt): Layout | undefined {
  const { paper, view, scale, bar } = attempt
  const space = drawingSpaceOf(paper)
  const column = rightColumn(attempt, space, space.top - INSET_MM)
  if (column === undefined) return undefined
  const { left, widthMm, notes, barTop } = leftColumn(attempt, space, column)
  const viewTop = viewTopOf(attempt, space)
  const notesTop = barTop + GAP_MM + notes.heightMm
  const slack = viewTop - viewHeight(view) - GAP_MM - notesTop
  if (slack < 0 || viewWidth(view) > widthMm || bar.widthMm > widthMm) return undefined
  return {
    ...{ paper, scale, view, rowsShown: column.rowsShown, tableCorner: column.tableCorner },
    headingTop: viewTop + VIEW_HEADING_MM,
    viewCorner: { x: centred(left, widthMm, viewWidth(view)), y: viewTop - slack / 2 },
    blocks: [
      { block: notes, corner: { x: left, y: notesTop } },
      { block: bar, corner: { x: left, y: barTop } },
      ...column.order,
    ],
  }
}

/** A wide view across the sheet; beneath it the notes at the left, the table and the title block at the right. */
function arrangedAbove(attempt: Attempt): Layout | undefined {
  const { paper, view, scale, bar } = attempt
  const space = drawingSpaceOf(paper)
  const viewTop = viewTopOf(attempt, space)
  const under = viewTop - viewHeight(view) - GAP_MM
  const column = rightColumn(attempt, space, under)
  if (column === undefined) return undefined
  const { left, widthMm, notes, barTop } = leftColumn(attempt, space, column)
  const fullMm = space.right - INSET_MM - left
  const hasRoom = under - notes.heightMm - GAP_MM >= barTop
  if (!hasRoom || viewWidth(view) > fullMm || bar.widthMm > widthMm) return undefined
  return {
    ...{ paper, scale, view, rowsShown: column.rowsShown, tableCorner: column.tableCorner },
    headingTop: viewTop + VIEW_HEADING_MM,
    viewCorner: { x: centred(left, fullMm, viewWidth(view)), y: viewTop },
    blocks: [
      { block: notes, corner: { x: left, y: under } },
      { block: bar, corner: { x: left, y: barTop } },
      ...column.order,
    ],
  }
}
