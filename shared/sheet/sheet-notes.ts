import { wordOf } from '@shared/units'
import { standingCautions } from './cautions'
import { shiftedItems } from './placement'
import { notesBlock, sentencesBlock } from './notes'
import type { NoteRow } from './notes'
import type { Block } from './block'
import { stacked } from './block'
import type { LengthPrinter } from './printing'
import type { MillText, SheetInput } from './sheet-input'

/** A note longer than this goes to a sheet of its own, characters. */
export const LONGEST_NOTE = 400
const COLUMN_GAP_MM = 8
const BLOCK_GAP_MM = 4
/** Notes narrower than this are set in one column, mm. */
const TWO_COLUMNS_FROM_MM = 150

/** What the mill must know of the section besides its face. */
export function sectionRows(
  { section, measures, vocabulary }: SheetInput,
  printer: LengthPrinter,
): NoteRow[] {
  const { length } = printer
  const { wood } = measures
  const { rebate, backSplay, tolerance } = section
  const hasSplay = backSplay.x > 0 && backSplay.height > 0
  return [
    { label: 'wood overall', text: `${length(wood.widthMm)} wide, ${length(wood.depthMm)} deep` },
    {
      label: wordOf(vocabulary, 'rebate'),
      text: `${length(rebate.width)} wide, ${length(rebate.depth)} deep from the back`,
    },
    {
      label: 'lip',
      text: `${length(wood.lipMm)} of wood over the ${wordOf(vocabulary, 'rebate')} at the sight edge`,
    },
    {
      label: `back ${wordOf(vocabulary, 'splay')}`,
      text: hasSplay ? `${length(backSplay.x)} in at the wall, from ${length(backSplay.height)} up` : '',
    },
    { label: 'gesso', text: gessoText(section.gesso, printer) },
    {
      label: 'least wood',
      text: `${length(wood.leastWood.thicknessMm)} between ${wordOf(vocabulary, 'rebate')} and face`,
    },
    { label: 'blank, run flat', text: blankText(wood.blank, printer) },
    { label: 'tolerance', text: `± ${printer.small(tolerance)} on the wood section` },
    { label: 'figures', text: printer.grain },
  ]
}

function gessoText(gesso: SheetInput['section']['gesso'], { small }: LengthPrinter): string {
  if (typeof gesso === 'number')
    return gesso === 0 ? 'none' : `${small(gesso)} over the whole face, allowed for in the wood`
  if (gesso.length === 0) return 'none'
  const stretches = gesso.map(({ from, to, thickness }) => `${small(thickness)} from break ${from} to ${to}`)
  return `${stretches.join(', ')}; allowed for in the wood`
}

function blankText(
  { flat, widthMm, thicknessMm, tiltDeg }: SheetInput['measures']['wood']['blank'],
  { length }: LengthPrinter,
): string {
  const size = `${length(flat.widthMm)} × ${length(flat.thicknessMm)} at the least, before any machining allowance`
  if (tiltDeg === 0) return size
  return `${size}; ${length(widthMm)} × ${length(thicknessMm)} if run tilted by ${tiltDeg.toFixed(1)}°`
}

/** What is asked of the mill, as far as it is said. */
export function millRows(mill: MillText, vocabulary: SheetInput['vocabulary']): NoteRow[] {
  const { notes = '' } = mill
  return [
    { label: 'order', text: mill.orderNumber ?? '' },
    { label: 'mill', text: mill.mill ?? '' },
    { label: wordOf(vocabulary, 'timber'), text: mill.timber ?? '' },
    { label: 'moisture on delivery', text: mill.moisture ?? '' },
    { label: 'grade', text: mill.grade ?? '' },
    { label: 'joints in the length', text: mill.jointing ?? '' },
    { label: 'sanding', text: mill.sanding ?? '' },
    { label: 'to run', text: mill.quantity ?? '' },
    { label: wordOf(vocabulary, 'first-off'), text: mill.firstOff ?? '' },
    { label: 'seen from', text: mill.seenFrom ?? '' },
    { label: 'lies', text: mill.lies ?? '' },
    { label: 'edge to the guide', text: mill.guideEdge ?? '' },
    { label: 'this knife cuts', text: mill.surfacesCut ?? '' },
    { label: 'wanted by', text: mill.wantedBy ?? '' },
    { label: 'notes', text: notes.length > LONGEST_NOTE ? 'on a sheet of their own' : notes },
  ]
}

/** What is asked of the mill, or nothing where no order is. */
export function orderBlock({ mill, vocabulary }: SheetInput, widthMm: number): Block | undefined {
  return mill === undefined ? undefined : notesBlock('To run', millRows(mill, vocabulary), widthMm)
}

export interface SheetNotesOptions {
  readonly scaleText: string
  readonly widthMm: number
  /** Whether the order stands among the notes, or elsewhere on the sheet. */
  readonly withOrder: boolean
}

/** Figures, order and cautions in the width given: in two columns where it is wide. */
export function sheetNotes(input: SheetInput, printer: LengthPrinter, options: SheetNotesOptions): Block {
  const { scaleText, widthMm, withOrder } = options
  const isWide = widthMm >= TWO_COLUMNS_FROM_MM
  const columnMm = isWide ? (widthMm - COLUMN_GAP_MM) / 2 : widthMm
  const figures = notesBlock('Section', sectionRows(input, printer), columnMm)
  const order = withOrder ? orderBlock(input, columnMm) : undefined
  const sentences = [...standingCautions(input, scaleText), ...(input.cautions ?? [])]
  const cautions = sentencesBlock('Take care', sentences, columnMm)
  const left = order === undefined ? [figures] : [figures, order]
  if (!isWide) return stacked([...left, cautions], BLOCK_GAP_MM)
  return besideOneAnother(stacked(left, BLOCK_GAP_MM), cautions)
}

function besideOneAnother(left: Block, right: Block): Block {
  const shift = left.widthMm + COLUMN_GAP_MM
  return {
    widthMm: shift + right.widthMm,
    heightMm: Math.max(left.heightMm, right.heightMm),
    items: [...left.items, ...shiftedItems(right.items, { x: shift, y: 0 })],
  }
}
