import type { Actor } from '@shared/access'
import { plainSectionOf, sectionFromDraft } from '@shared/section'
import { Draft } from '../models/draft'
import { photographsOf } from './photographs'
import type { PhotographWithReading } from './photographs'
import { picturesOf } from './pictures'
import type { PictureWithMeasurement } from './pictures'
import { requireCommission } from './require-commission'

/** A commission file ready to be saved. */
export interface ExportedFile {
  readonly name: string
  /** JSON, lines broken and indented. */
  readonly text: string
}

/**
 * The commission as a commission file: what it is called, its measured pictures, its section as drawn, the names
 * of its photographs. Taken in again it gives a section with the same hash.
 */
export async function exportCommission(actor: Actor, id: string): Promise<ExportedFile> {
  const commission = await requireCommission(id, { actor, right: 'file.export' })
  const { number, title, artist, accession, due } = commission
  const draft = await Draft.findOne({ where: { commissionId: id }, rejectOnEmpty: true })
  const pictures = (await picturesOf(id)).flatMap(filePictureOf)
  const photographs = (await photographsOf(id)).filter(isOpen).map(filePhotographOf)
  const file = {
    listel: 1,
    units: 'mm',
    title,
    ...(artist === '' ? {} : { artist }),
    ...(accession === '' ? {} : { accession }),
    ...(due === null ? {} : { due }),
    ...(pictures.length === 0 ? {} : { pictures }),
    ...(draft.document.members.length === 0
      ? {}
      : { section: plainSectionOf(sectionFromDraft(draft.document)) }),
    ...(photographs.length === 0 ? {} : { photographs }),
  }
  return { name: `${number}.json`, text: `${JSON.stringify(file, null, 2)}\n` }
}

const isOpen = ({ photograph }: PhotographWithReading): boolean => photograph.state === 'open'

/** A picture with its latest readings; one that was never measured, or was put away, has no place in the file. */
function filePictureOf({ picture, measurement }: PictureWithMeasurement): readonly object[] {
  if (measurement === null || picture.state !== 'open') return []
  const { width, height, diagonals, thickness, allowance, lining, stack } = measurement.document
  const parts = Object.fromEntries(Object.entries(stack).filter(([, part]) => part !== null))
  return [
    {
      name: picture.name,
      count: picture.copies,
      width,
      height,
      diagonals,
      ...(thickness === null ? {} : { thickness }),
      allowance,
      lining,
      ...(Object.keys(parts).length === 0 ? {} : { stack: parts }),
    },
  ]
}

/** Named, so that what a basis says of it keeps its meaning; nothing in the file is read off it yet. */
const filePhotographOf = ({ photograph: { key, width, height } }: PhotographWithReading): object => ({
  id: key,
  width,
  height,
  reference: {},
})
