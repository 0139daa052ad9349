import type { Actor } from '@shared/access'
import { pathOf } from '../files/file-store'
import { Commission } from '../models/commission'
import { FileCopy, StoredFile } from '../models/file'
import { requirePhotograph } from './photographs'

/** A file of the store, ready to be answered. */
export interface FileToShow {
  readonly path: string
  readonly type: string
  /** The name to save it under. */
  readonly name: string
}

/** The copy that is shown: upright, without metadata. */
export async function imageOf(actor: Actor, id: string, kind: FileCopy['kind']): Promise<FileToShow> {
  const photograph = await requirePhotograph(id, { actor, right: 'photograph.read' })
  const copy = await FileCopy.findOne({ where: { fileId: photograph.fileId, kind }, rejectOnEmpty: true })
  const file = await StoredFile.findByPk(copy.copyId, { rejectOnEmpty: true })
  return { path: pathOf(file.sha256), type: file.type, name: `${photograph.key}-${kind}.webp` }
}

/** The original, byte for byte as it came. */
export async function originalOf(actor: Actor, id: string): Promise<FileToShow> {
  const photograph = await requirePhotograph(id, { actor, right: 'photograph.read' })
  const commission = await Commission.findByPk(photograph.commissionId, { rejectOnEmpty: true })
  const file = await StoredFile.findByPk(photograph.fileId, { rejectOnEmpty: true })
  const name = `${commission.number}-${photograph.key}.${file.type.replace('image/', '').replace('jpeg', 'jpg')}`
  return { path: pathOf(file.sha256), type: file.type, name }
}
