import type { CommissionFile } from '@shared/contracts'
import { Failure } from '@shared/failure'
import { knifeCautionsOf } from '@shared/knife'
import { measuresOf, sectionSha256 } from '@shared/section'
import { dxfOf, pdfOf, sheetOf, sheetsOf, svgOf } from '@shared/sheet'
import type { PdfOptions, SheetInput } from '@shared/sheet'
import { soundSectionOf } from './commission-answer'
import { headRunningOf } from './head'

export type SheetFormat = 'sheet' | 'dxf' | 'svg'

/** A file knows no hour: its sheet bears this one, so that the same file gives the same bytes. */
const UNDATED = '2000-01-01T00:00:00Z'

/** The profile sheet of a file's section as a draft, in the forms asked for. Throws input-invalid where the file has no section. */
export async function sheetFilesOf(
  file: CommissionFile,
  formats: readonly SheetFormat[],
  fonts: PdfOptions['fonts'],
): Promise<Partial<Record<SheetFormat, Uint8Array | string>>> {
  const input = inputOf(file)
  const made: Partial<Record<SheetFormat, Uint8Array | string>> = {}
  for (const format of formats) made[format] = await rendered(input, format, fonts)
  return made
}

function inputOf(file: CommissionFile): SheetInput {
  const section = soundSectionOf(file)
  if (section === undefined) {
    const says = 'is missing; a sheet needs a section.'
    throw new Failure('input-invalid', { says, faults: [{ path: '/section', code: 'missing', says }] })
  }
  return {
    section,
    measures: measuresOf(section),
    unit: 'mm',
    vocabulary: 'moulding',
    workshop: 'Listel',
    commissionNumber: 'from a file',
    title: file.title ?? 'Untitled',
    ...(file.accession !== undefined && { accession: file.accession }),
    state: { kind: 'draft' },
    ...(file.head !== undefined && { cautions: knifeCautionsOf(headRunningOf(file.head)) }),
  }
}

async function rendered(
  input: SheetInput,
  format: SheetFormat,
  fonts: PdfOptions['fonts'],
): Promise<Uint8Array | string> {
  switch (format) {
    case 'sheet':
      return pdfOf(sheetsOf(input), {
        fonts,
        createdAt: UNDATED,
        fileId: sectionSha256(input.section).slice(0, 32),
        title: `${input.title}, draft`,
        author: input.workshop,
      })
    case 'dxf':
      return dxfOf(sheetOf(input))
    case 'svg':
      return svgOf(sheetOf(input))
  }
}
