import type { Block } from './block'
import { LETTER_MM, LINE_WIDTH_MM, linesItem, pathItem, rectanglePath, textItem } from './drawing'
import type { DrawingItem, Weight } from './drawing'
import { cutToWidth, textWidthMm, wrappedLines } from './lettering'
import { TITLE_BLOCK_WIDTH_MM } from './paper-sizes'
import type { SheetInput } from './sheet-input'

/** The fields of ISO 7200 (the eight mandatory ones and those of use here), and what ties the sheet to its issue. */
interface Field {
  readonly label: string
  readonly text: string
  readonly widthMm: number
  readonly heightMm?: number
  readonly weight?: Weight
}

interface FieldRow {
  readonly heightMm: number
  readonly fields: readonly Field[]
}

/** What the title block takes from the sheet's input. */
export type TitleBlockInput = Pick<
  SheetInput,
  'workshop' | 'commissionNumber' | 'title' | 'client' | 'accession' | 'state'
>

export interface TitleBlockFacts {
  readonly documentType: string
  readonly scale: string
  readonly unitName: string
  readonly sheetNumber: number
  readonly sheetCount: number
}

const PADDING_MM = 1.5
/** From a cell's top down to the foot of its label, and to the top of its value. */
const LABEL_DROP_MM = 1 + LETTER_MM.small
const VALUE_DROP_MM = LABEL_DROP_MM + 1.7
const VALUE_PITCH = 1.7

/** Heights of the rows from the top, mm; on every sheet alike. */
const ROW_HEIGHTS_MM = [9, 15, 12.5, 10, 8.5] as const
export const TITLE_BLOCK_HEIGHT_MM = ROW_HEIGHTS_MM.reduce((sum, heightMm) => sum + heightMm, 0)

/** What state the section is in, in the words that people use of it. */
export function statusText({ state }: Pick<SheetInput, 'state'>): string {
  if (state.kind === 'draft') return 'draft, not approved'
  return state.approval === undefined ? 'put forward, not approved' : 'approved'
}

export function titleBlock(input: TitleBlockInput, facts: TitleBlockFacts): Block {
  const rows = rowsOf(input, facts)
  const heightMm = TITLE_BLOCK_HEIGHT_MM
  const items: DrawingItem[] = [
    pathItem('title-block', rectanglePath(0, -heightMm, TITLE_BLOCK_WIDTH_MM, heightMm), LINE_WIDTH_MM.wide, {
      closed: true,
    }),
  ]
  let top = 0
  rows.forEach((row, index) => {
    if (index > 0) items.push(ruleAcross(top))
    let left = 0
    row.fields.forEach((field, place) => {
      if (place > 0) items.push(ruleDown(left, top, row.heightMm))
      items.push(...fieldItems(field, left, top, row.heightMm))
      left += field.widthMm
    })
    top -= row.heightMm
  })
  return { widthMm: TITLE_BLOCK_WIDTH_MM, heightMm, items }
}

const ruleAcross = (y: number): DrawingItem =>
  linesItem(
    'title-block',
    [
      [
        { x: 0, y },
        { x: TITLE_BLOCK_WIDTH_MM, y },
      ],
    ],
    LINE_WIDTH_MM.narrow,
  )

const ruleDown = (x: number, top: number, heightMm: number): DrawingItem =>
  linesItem(
    'title-block',
    [
      [
        { x, y: top },
        { x, y: top - heightMm },
      ],
    ],
    LINE_WIDTH_MM.narrow,
  )

/** A label in small letters at the top of the cell, the value beneath it: on two lines where it needs and the cell has them. */
function fieldItems(field: Field, left: number, top: number, rowMm: number): DrawingItem[] {
  const wanted = field.heightMm ?? LETTER_MM.dimension
  const weight = field.weight ?? 'regular'
  const room = field.widthMm - 2 * PADDING_MM
  const heightMm = textWidthMm(field.text, wanted, weight) <= room ? wanted : LETTER_MM.small
  const pitch = heightMm * VALUE_PITCH
  const most = Math.max(1, 1 + Math.floor((rowMm - VALUE_DROP_MM - PADDING_MM - heightMm) / pitch))
  const wrapped = wrappedLines(field.text, room, heightMm, weight)
  const kept =
    wrapped.length <= most
      ? wrapped
      : [...wrapped.slice(0, most - 1), cutToWidth(wrapped.slice(most - 1).join(' '), room, heightMm, weight)]
  const label = textItem(
    'title-block',
    { x: left + PADDING_MM, y: top - LABEL_DROP_MM },
    cutToWidth(field.label, room, LETTER_MM.small),
    LETTER_MM.small,
  )
  const values = kept.map((line, index) => {
    const y = top - VALUE_DROP_MM - heightMm - index * pitch
    return textItem('title-block', { x: left + PADDING_MM, y }, line, heightMm, { weight })
  })
  return [label, ...values]
}

function rowsOf(input: TitleBlockInput, facts: TitleBlockFacts): FieldRow[] {
  const { state } = input
  const isIssue = state.kind === 'issue'
  const approval = isIssue ? state.approval : undefined
  const sheet = `${facts.sheetNumber}/${facts.sheetCount}`
  return [
    {
      heightMm: ROW_HEIGHTS_MM[0],
      fields: [
        { label: 'Scale', text: facts.scale, widthMm: 20, weight: 'semibold' },
        { label: 'Units', text: facts.unitName, widthMm: 20 },
        { label: 'Put forward by', text: isIssue ? state.putForwardBy : '–', widthMm: 50 },
        { label: 'Date of issue', text: isIssue ? state.putForwardOn : '–', widthMm: 28 },
        { label: 'Approved by', text: approvalText(approval), widthMm: 62 },
      ],
    },
    {
      heightMm: ROW_HEIGHTS_MM[1],
      fields: [
        { label: 'Title', text: input.title, widthMm: 118, heightMm: LETTER_MM.heading, weight: 'semibold' },
        { label: 'Status', text: statusText(input), widthMm: 62, weight: 'semibold' },
      ],
    },
    {
      heightMm: ROW_HEIGHTS_MM[2],
      fields: [
        { label: 'Legal owner', text: input.workshop, widthMm: 60 },
        { label: 'Picture, accession number', text: input.accession ?? '–', widthMm: 58 },
        { label: 'For', text: input.client ?? '–', widthMm: 62 },
      ],
    },
    {
      heightMm: ROW_HEIGHTS_MM[3],
      fields: [
        { label: 'Document type', text: facts.documentType, widthMm: 60 },
        { label: 'Identification number', text: input.commissionNumber, widthMm: 58, weight: 'semibold' },
        {
          label: 'Issue',
          text: isIssue ? state.letter : 'draft',
          widthMm: 24,
          heightMm: LETTER_MM.heading,
          weight: 'semibold',
        },
        { label: 'Language', text: 'en', widthMm: 18 },
        { label: 'Sheet', text: sheet, widthMm: 20, weight: 'semibold' },
      ],
    },
    {
      heightMm: ROW_HEIGHTS_MM[4],
      fields: [
        {
          label: 'SHA-256 of the section as put forward',
          text: isIssue ? state.sha256 : 'a draft has none',
          widthMm: TITLE_BLOCK_WIDTH_MM,
          heightMm: LETTER_MM.small,
        },
      ],
    },
  ]
}

const approvalText = (approval: { by: string; on: string } | undefined): string =>
  approval === undefined ? 'not approved' : `${approval.by}, ${approval.on}`
