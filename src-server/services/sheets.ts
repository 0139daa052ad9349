import type { Actor } from '@shared/access'
import type { MillText, SheetInput, SheetState } from '@shared/sheet'
import { dxfOf, pdfOf, sheetOf, sheetsOf, svgOf } from '@shared/sheet'
import { measuresOf } from '@shared/section'
import { fileAnswer } from '../files/file-answer'
import type { FileAnswer } from '../files/file-answer'
import { readSheetFonts } from '../files/sheet-fonts'
import type { Commission } from '../models/commission'
import { Decision } from '../models/review'
import type { Issue } from '../models/review'
import { requireIssue, sectionOfIssue } from './require-issue'
import { readSettings } from './settings'
import type { Tx } from './transaction'

export type SheetFormat = 'pdf' | 'dxf' | 'svg'
export const SHEET_FORMATS: readonly SheetFormat[] = ['pdf', 'dxf', 'svg']
export const SHEET_TYPES: Readonly<Record<SheetFormat, string>> = {
  pdf: 'application/pdf',
  dxf: 'image/vnd.dxf',
  svg: 'image/svg+xml',
}

/** A sheet of an issue, drawn afresh: the same issue in the same state gives the same bytes. */
export async function readIssueSheet(actor: Actor, id: string, format: SheetFormat): Promise<FileAnswer> {
  const { issue, commission } = await requireIssue(id, { actor, right: 'issue.read' })
  const bytes = await renderedSheet(await sheetInputOf({ issue, commission }), issue, format)
  return fileAnswer({
    from: { bytes },
    type: SHEET_TYPES[format],
    name: sheetNameOf(commission, issue, format),
    inline: format === 'pdf',
    cache: 'never',
  })
}

export const sheetNameOf = ({ number }: Commission, { letter }: Issue, format: SheetFormat): string =>
  `${number}-${letter}.${format}`

export interface SheetOf {
  readonly issue: Issue
  readonly commission: Commission
  readonly mill?: MillText
  readonly cautions?: readonly string[]
  readonly tx?: Tx
}

/** What the sheet says, in the workshop's units and words. */
export async function sheetInputOf({ issue, commission, mill, cautions, tx }: SheetOf): Promise<SheetInput> {
  const { document: settings } = await readSettings(tx)
  const section = sectionOfIssue(issue)
  return {
    section,
    measures: measuresOf(section),
    unit: settings.units,
    vocabulary: settings.vocabulary,
    workshop: settings.workshop,
    commissionNumber: commission.number,
    title: commission.title,
    ...(commission.client === undefined ? {} : { client: commission.client.name }),
    accession: commission.accession,
    state: await stateOf(issue, tx),
    ...(mill === undefined ? {} : { mill }),
    ...(cautions === undefined ? {} : { cautions }),
  }
}

async function stateOf(issue: Issue, tx: Tx | undefined): Promise<SheetState> {
  const approval =
    issue.state === 'approved'
      ? await Decision.findOne({
          where: { issueId: issue.id, kind: 'approve' },
          order: [['at', 'DESC']],
          ...(tx === undefined ? {} : { transaction: tx }),
        })
      : null
  return {
    kind: 'issue',
    letter: issue.letter,
    sha256: issue.sha256,
    shapeSha256: issue.shapeSha256,
    putForwardBy: issue.putForwardByName,
    putForwardOn: dayOf(issue.at),
    ...(approval === null ? {} : { approval: { by: approval.typedName, on: dayOf(approval.at) } }),
  }
}

const dayOf = (at: Date): string => at.toISOString().slice(0, 10)

export async function renderedSheet(
  input: SheetInput,
  issue: Issue,
  format: SheetFormat,
): Promise<Uint8Array> {
  switch (format) {
    case 'pdf':
      return pdfOf(sheetsOf(input), {
        fonts: await readSheetFonts(),
        createdAt: issue.at.toISOString(),
        fileId: issue.sha256.slice(0, 32),
        title: `${input.title}, issue ${issue.letter}`,
        author: input.workshop,
      })
    case 'dxf':
      return new TextEncoder().encode(dxfOf(sheetOf(input)))
    case 'svg':
      return new TextEncoder().encode(svgOf(sheetOf(input)))
  }
}
