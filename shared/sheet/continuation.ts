import { hungAt } from './block'
import { LETTER_MM, textItem } from './drawing'
import type { DrawingItem } from './drawing'
import { LINE_PITCH, wrappedLines } from './lettering'
import { memberTable, rowsThatFit } from './member-table'
import type { MemberRow } from './member-table'
import { drawingSpaceOf, PAPERS, TITLE_BLOCK_WIDTH_MM } from './paper-sizes'
import type { Paper } from './paper-sizes'
import type { SheetInput } from './sheet-input'
import { LONGEST_NOTE } from './sheet-notes'
import { TITLE_BLOCK_HEIGHT_MM } from './title-block'

/** A sheet after the first, its title block still to come. */
export interface FurtherPage {
  readonly paper: Paper
  readonly items: readonly DrawingItem[]
}

const INSET_MM = 5
const GAP_MM = 7
const LINE_MM = LETTER_MM.small * LINE_PITCH
const HEADING_MM = 8

const namedPaper = (name: Paper['name']): Paper => {
  const paper = PAPERS.find((candidate) => candidate.name === name)
  if (paper === undefined) throw new RangeError(`no sheet ${name}`)
  return paper
}

/**
 * What the first sheet had no room for: the rest of the members, and a note too long to stand beside the drawing.
 * stripMm stays free at the top of each, for what stands there in large letters.
 */
export function continuationPages(
  input: SheetInput,
  rows: readonly MemberRow[],
  stripMm: number,
): FurtherPage[] {
  return [...tablePages(input, rows, stripMm), ...notePages(input.mill?.notes ?? '', stripMm)]
}

/** A4 while one takes what is left, else A3: a column at the left from top to bottom, another above the title block. */
function tablePages(input: SheetInput, rows: readonly MemberRow[], stripMm: number): FurtherPage[] {
  if (rows.length === 0) return []
  const columnsOn = (paper: Paper) => {
    const { left, right, top, bottom } = drawingSpaceOf(paper)
    const aboveTitle = rowsThatFit(top - bottom - INSET_MM - stripMm - TITLE_BLOCK_HEIGHT_MM - GAP_MM)
    const last = { x: right - TITLE_BLOCK_WIDTH_MM + INSET_MM, rows: aboveTitle }
    return paper.name === 'A4' ? [last] : [{ x: left + INSET_MM, rows: aboveTitle }, last]
  }
  const small = namedPaper('A4')
  const room = columnsOn(small)[0]?.rows ?? 0
  const paper = rows.length <= room ? small : namedPaper('A3')
  const y = drawingSpaceOf(paper).top - INSET_MM - stripMm
  let rest = rows
  const items = columnsOn(paper).flatMap(({ x, rows: count }) => {
    const shown = rest.slice(0, count)
    rest = rest.slice(count)
    if (shown.length === 0) return []
    return hungAt(memberTable(shown, 'Members, continued', input.section.gesso !== 0), { x, y })
  })
  return [{ paper, items }, ...tablePages(input, rest, stripMm)]
}

function notePages(notes: string, stripMm: number): FurtherPage[] {
  if (notes.length <= LONGEST_NOTE) return []
  const paper = namedPaper('A4')
  const { left, right, top: frameTop, bottom } = drawingSpaceOf(paper)
  const top = frameTop - stripMm
  const x = left + INSET_MM
  const lines = wrappedLines(notes, right - INSET_MM - x, LETTER_MM.small)
  const start = top - INSET_MM - HEADING_MM
  const perPage = Math.floor((start - bottom - TITLE_BLOCK_HEIGHT_MM - GAP_MM) / LINE_MM)
  return Array.from({ length: Math.ceil(lines.length / perPage) }, (_, page) => ({
    paper,
    items: [
      textItem(
        'notes',
        { x, y: top - INSET_MM - LETTER_MM.dimension },
        'Notes to the mill',
        LETTER_MM.dimension,
        {
          weight: 'semibold',
        },
      ),
      ...lines.slice(page * perPage, (page + 1) * perPage).flatMap((line, index) => {
        const y = start - LETTER_MM.small - index * LINE_MM
        return line === '' ? [] : [textItem('notes', { x, y }, line, LETTER_MM.small)]
      }),
    ],
  }))
}
