import { Failure } from '@shared/failure'
import type { Point } from '@shared/geometry'
import { woodFaceOf } from '@shared/section'
import { hungAt } from './block'
import type { Block } from './block'
import { continuationPages } from './continuation'
import { LETTER_MM, textItem } from './drawing'
import type { Drawing, DrawingItem, ModelPlacement } from './drawing'
import { radiiOf } from './member-text'
import { memberRowsOf, memberTable, rowsThatFit, tableHeightMm } from './member-table'
import type { MemberRow } from './member-table'
import { modelNotes } from './model-notes'
import { checkBar } from './notes'
import { paperFrame } from './paper-frame'
import { drawingSpaceOf, PAPERS, SCALES, TITLE_BLOCK_WIDTH_MM } from './paper-sizes'
import type { Paper, Scale, Space } from './paper-sizes'
import { shiftedItems } from './placement'
import { lengthPrinterOf } from './printing'
import type { LengthPrinter } from './printing'
import { sectionViewOf } from './section-view'
import type { SectionView } from './section-view'
import type { SheetInput } from './sheet-input'
import { sheetNotes } from './sheet-notes'
import { statusText, TITLE_BLOCK_HEIGHT_MM, titleBlock } from './title-block'
import type { TitleBlockFacts } from './title-block'

/** Blank inside the frame and between the parts of a sheet, mm. */
const INSET_MM = 5
const GAP_MM = 7
const VIEW_HEADING_MM = 10
const SHOUT_MM = LETTER_MM.shout + 6
/** A table that flows on to the next sheet shows at least this much on the first, rows. */
const LEAST_ROWS = 8

/**
 * The profile sheet of a section: the smallest ISO 5457 sheet on which the section stands at 1:1 with all that belongs
 * to it (else at the first reduction of ISO 5455 that does), then sheets for what is left of the member table and for
 * long notes. The first page alone holds the drawing to scale.
 */
export function sheetsOf(input: SheetInput): Drawing[] {
  const printer = printerFor(input)
  const parts = partsOf(input, printer)
  for (const scale of SCALES) {
    const view = sectionViewOf(input.section, printer, scale.ratio)
    for (const paper of PAPERS) {
      const layout = arrangementsFor(paper)
        .map((arrange) => arrange({ ...parts, view, scale, paper }))
        .find((found) => found !== undefined)
      if (layout !== undefined) return pagesFrom(input, parts, layout)
    }
  }
  throw new Failure('input-invalid', {
    says: 'The notes and cautions of this sheet take more room than the largest sheet has: shorten them.',
  })
}

/** The first page: the drawing itself. */
export function sheetOf(input: SheetInput): Drawing {
  const [first] = sheetsOf(input)
  if (first === undefined) throw new Failure('input-invalid', { says: 'the sheet has no page' })
  return first
}

/** Everything that will be printed of the section decides together how many places its numbers have. */
function printerFor({ unit, section, measures }: SheetInput): LengthPrinter {
  const { wood } = measures
  const { path, breaks } = woodFaceOf(section)
  const gesso =
    typeof section.gesso === 'number' ? [section.gesso] : section.gesso.map(({ thickness }) => thickness)
  const { rebate, backSplay } = section
  return lengthPrinterOf(unit, [
    ...section.members.flatMap(({ width, rise }) => [width, rise]),
    ...breaks.flatMap(({ x, y }) => [x, y]),
    ...radiiOf(path),
    ...gesso,
    ...[
      section.sightEdgeHeight,
      section.tolerance,
      rebate.width,
      rebate.depth,
      backSplay.x,
      backSplay.height,
    ],
    ...[wood.widthMm, wood.depthMm, wood.lipMm],
  ])
}

interface Parts {
  readonly input: SheetInput
  readonly printer: LengthPrinter
  readonly rows: readonly MemberRow[]
  readonly bar: Block
}

const facts = (
  printer: LengthPrinter,
  scale: string,
  sheetNumber: number,
  sheetCount: number,
): TitleBlockFacts => ({
  documentType: 'Profile sheet',
  scale,
  unitName: printer.unitName,
  sheetNumber,
  sheetCount,
})

function partsOf(input: SheetInput, printer: LengthPrinter): Parts {
  return {
    input,
    printer,
    rows: memberRowsOf(input.section, input.vocabulary, printer),
    bar: checkBar(input.unit).block,
  }
}

interface Attempt extends Parts {
  readonly view: SectionView
  readonly scale: Scale
  readonly paper: Paper
}

/** Where everything goes on the first page; corners are upper left. */
interface Layout {
  readonly paper: Paper
  readonly scale: Scale
  readonly view: SectionView
  /** Of the view's own extents, heading excluded. */
  readonly viewCorner: Point
  readonly headingTop: number
  readonly blocks: readonly { readonly block: Block; readonly corner: Point }[]
  readonly tableCorner: Point
  readonly rowsShown: number
}

type Arrangement = (attempt: Attempt) => Layout | undefined

const arrangementsFor = (paper: Paper): Arrangement[] =>
  paper.name === 'A4' ? [arrangedInOneColumn] : [arrangedBeside, arrangedAbove]

/** The strip in large letters that says a sheet is no order to cut. */
const shoutHeight = ({ input }: Attempt): number => (statusText(input) === 'approved' ? 0 : SHOUT_MM)

const viewWidth = (view: SectionView): number => view.right - view.left
const viewHeight = (view: SectionView): number => view.top - view.bottom

/** A4: view, table, notes, bar and title block under one another; all of the table or not at all. */
function arrangedInOneColumn(attempt: Attempt): Layout | undefined {
  const { paper, view, scale, rows, bar } = attempt
  const space = drawingSpaceOf(paper)
  const left = space.left + INSET_MM
  const widthMm = space.right - INSET_MM - left
  const notes = sheetNotes(attempt.input, attempt.printer, scale.text, widthMm)
  const viewTop = space.top - INSET_MM - shoutHeight(attempt) - VIEW_HEADING_MM
  const tableTop = viewTop - viewHeight(view) - GAP_MM
  const notesTop = tableTop - tableHeightMm(rows.length) - GAP_MM
  const barTop = notesTop - notes.heightMm - GAP_MM
  const fits = viewWidth(view) <= widthMm && barTop - bar.heightMm >= space.bottom + TITLE_BLOCK_HEIGHT_MM + 2
  if (!fits) return undefined
  return {
    ...{ paper, scale, view },
    headingTop: viewTop + VIEW_HEADING_MM,
    viewCorner: { x: centred(left, widthMm, viewWidth(view)), y: viewTop },
    blocks: [
      { block: notes, corner: { x: left, y: notesTop } },
      { block: bar, corner: { x: left, y: barTop } },
    ],
    tableCorner: { x: space.left, y: tableTop },
    rowsShown: rows.length,
  }
}

const centred = (left: number, widthMm: number, own: number): number => left + (widthMm - own) / 2

/** What the right-hand column of a lying sheet takes: the table from the top down, the title block in the corner. */
function rowsInRightColumn({ rows }: Attempt, space: Space, top: number): number | undefined {
  const fitting = Math.min(rows.length, rowsThatFit(top - space.bottom - TITLE_BLOCK_HEIGHT_MM - GAP_MM))
  return fitting === rows.length || fitting >= LEAST_ROWS ? fitting : undefined
}

/** The view and the notes at the left, the table at the right above the title block. */
function arrangedBeside(attempt: Attempt): Layout | undefined {
  const { paper, view, scale, bar } = attempt
  const space = drawingSpaceOf(paper)
  const left = space.left + INSET_MM
  const widthMm = space.right - TITLE_BLOCK_WIDTH_MM - GAP_MM - left
  const notes = sheetNotes(attempt.input, attempt.printer, scale.text, widthMm)
  const viewTop = space.top - INSET_MM - shoutHeight(attempt) - VIEW_HEADING_MM
  const barTop = space.bottom + INSET_MM + bar.heightMm
  const notesTop = barTop + GAP_MM + notes.heightMm
  const rowsShown = rowsInRightColumn(attempt, space, space.top - INSET_MM)
  const slack = viewTop - viewHeight(view) - GAP_MM - notesTop
  const fits = viewWidth(view) <= widthMm && slack >= 0
  if (!fits || bar.widthMm > widthMm || rowsShown === undefined) return undefined
  return {
    ...{ paper, scale, view, rowsShown },
    headingTop: viewTop + VIEW_HEADING_MM,
    viewCorner: { x: centred(left, widthMm, viewWidth(view)), y: viewTop - slack / 2 },
    blocks: [
      { block: notes, corner: { x: left, y: notesTop } },
      { block: bar, corner: { x: left, y: barTop } },
    ],
    tableCorner: { x: space.right - TITLE_BLOCK_WIDTH_MM, y: space.top - INSET_MM },
  }
}

/** A wide view across the sheet; beneath it the notes at the left, the table and the title block at the right. */
function arrangedAbove(attempt: Attempt): Layout | undefined {
  const { paper, view, scale, bar } = attempt
  const space = drawingSpaceOf(paper)
  const left = space.left + INSET_MM
  const fullMm = space.right - INSET_MM - left
  const widthMm = space.right - TITLE_BLOCK_WIDTH_MM - GAP_MM - left
  const notes = sheetNotes(attempt.input, attempt.printer, scale.text, widthMm)
  const viewTop = space.top - INSET_MM - shoutHeight(attempt) - VIEW_HEADING_MM
  const under = viewTop - viewHeight(view) - GAP_MM
  const barTop = space.bottom + INSET_MM + bar.heightMm
  const rowsShown = rowsInRightColumn(attempt, space, under)
  const fits = viewWidth(view) <= fullMm && under - notes.heightMm - GAP_MM >= barTop
  if (!fits || bar.widthMm > widthMm || rowsShown === undefined) return undefined
  return {
    ...{ paper, scale, view, rowsShown },
    headingTop: viewTop + VIEW_HEADING_MM,
    viewCorner: { x: centred(left, fullMm, viewWidth(view)), y: viewTop },
    blocks: [
      { block: notes, corner: { x: left, y: under } },
      { block: bar, corner: { x: left, y: barTop } },
    ],
    tableCorner: { x: space.right - TITLE_BLOCK_WIDTH_MM, y: under },
  }
}

function pagesFrom(input: SheetInput, parts: Parts, layout: Layout): Drawing[] {
  const { printer, rows } = parts
  const { paper, scale, rowsShown } = layout
  const further = continuationPages(input, rows.slice(rowsShown))
  const count = 1 + further.length
  const title = (sheetNumber: number, scaleText: string) =>
    titleBlock(input, facts(printer, scaleText, sheetNumber, count))
  const origin = {
    x: layout.viewCorner.x - layout.view.left,
    y: layout.viewCorner.y - layout.view.top,
  }
  const model: ModelPlacement = { origin, scale: scale.ratio, notes: modelNotes(input) }
  const tableTitle = rowsShown < rows.length ? `Members, continued on sheet 2` : 'Members'
  const table = memberTable(rows.slice(0, rowsShown), tableTitle, input.section.gesso !== 0)
  const items = [
    ...paperFrame(paper),
    ...shoutItems(input, paper),
    ...headingItems(layout, printer),
    ...shiftedItems(layout.view.items, origin),
    ...layout.blocks.flatMap(({ block, corner }) => hungAt(block, corner)),
    ...hungAt(table, layout.tableCorner),
    ...titleItems(title(1, scale.text), paper),
  ]
  const first = { title: sheetTitle(input), widthMm: paper.widthMm, heightMm: paper.heightMm, items, model }
  return [first, ...further.map((page, index) => pageWithTitle(input, page, title(index + 2, '–')))]
}

const sheetTitle = (input: SheetInput): string => `Profile sheet ${input.commissionNumber}: ${input.title}`

function pageWithTitle(
  input: SheetInput,
  { paper, items }: { paper: Paper; items: readonly DrawingItem[] },
  title: Block,
): Drawing {
  return {
    title: sheetTitle(input),
    widthMm: paper.widthMm,
    heightMm: paper.heightMm,
    items: [...paperFrame(paper), ...items, ...titleItems(title, paper)],
  }
}

function titleItems(block: Block, paper: Paper): DrawingItem[] {
  const { right, bottom } = drawingSpaceOf(paper)
  return hungAt(block, { x: right - TITLE_BLOCK_WIDTH_MM, y: bottom + block.heightMm })
}

function shoutItems(input: SheetInput, paper: Paper): DrawingItem[] {
  const status = statusText(input)
  if (status === 'approved') return []
  const { left, top } = drawingSpaceOf(paper)
  const text = input.state.kind === 'draft' ? status : 'not approved'
  const at = { x: left + INSET_MM, y: top - INSET_MM - LETTER_MM.shout }
  return [textItem('notes', at, text, LETTER_MM.shout, { weight: 'semibold', tone: 'grey' })]
}

function headingItems({ headingTop: y, view, scale, paper }: Layout, printer: LengthPrinter): DrawingItem[] {
  const { left } = drawingSpaceOf(paper)
  const x = left + INSET_MM
  const where = 'x from the sight edge outward, y from the flat back'
  const tabled = view.isTabulated ? '; the breaks between are in the table' : ''
  return [
    textItem('notes', { x, y: y - LETTER_MM.heading }, `Wood section ${scale.text}`, LETTER_MM.heading, {
      weight: 'semibold',
    }),
    textItem(
      'notes',
      { x, y: y - LETTER_MM.heading - 4 },
      `${printer.unitName}; ${where}${tabled}`,
      LETTER_MM.small,
    ),
  ]
}
