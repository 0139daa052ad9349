import { Failure } from '@shared/failure'
import { woodFaceOf } from '@shared/section'
import { arrangedOn, INSET_MM, shoutHeight } from './arrangement'
import type { Layout, Parts } from './arrangement'
import { hungAt } from './block'
import type { Block } from './block'
import { continuationPages } from './continuation'
import { LETTER_MM, textItem } from './drawing'
import type { Drawing, DrawingItem, ModelPlacement } from './drawing'
import { radiiOf } from './member-text'
import { memberRowsOf, memberTable } from './member-table'
import { modelNotes } from './model-notes'
import { checkBar } from './notes'
import { paperFrame } from './paper-frame'
import { drawingSpaceOf, PAPERS, SCALES, TITLE_BLOCK_WIDTH_MM } from './paper-sizes'
import type { Paper } from './paper-sizes'
import { shiftedItems } from './placement'
import { lengthPrinterOf } from './printing'
import type { LengthPrinter } from './printing'
import { sectionViewOf } from './section-view'
import type { SheetInput } from './sheet-input'
import { statusText, titleBlock } from './title-block'
import type { TitleBlockFacts } from './title-block'

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
      const layout = arrangedOn({ ...parts, view, scale, paper })
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

function pagesFrom(input: SheetInput, parts: Parts, layout: Layout): Drawing[] {
  const { printer, rows } = parts
  const { paper, scale, rowsShown } = layout
  const further = continuationPages(input, rows.slice(rowsShown), shoutHeight(input))
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
    items: [...paperFrame(paper), ...shoutItems(input, paper), ...items, ...titleItems(title, paper)],
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
