import type { Actor } from '@shared/access'
import type { OutputOf, PhotographRequest } from '@shared/contracts'
import { enterFile, storeBytes, storeUpload } from '../files/file-store'
import type { Stored } from '../files/file-store'
import { COPY_TYPE, takeImage } from '../files/image-intake'
import { FileCopy } from '../models/file'
import { Photograph } from '../models/photograph'
import { now } from './clock'
import { onceOnly } from './operation'
import { withReading } from './photographs'
import type { PhotographWithReading } from './photographs'
import { requireCommission } from './require-commission'
import { enterTrail } from './trail'
import { inTransaction } from './transaction'
import type { Tx } from './transaction'

/** A file that lies in the upload folder. */
export interface SentFile {
  readonly path: string
  /** As the sender called it. */
  readonly name: string
}

interface StoredImage {
  readonly original: Stored
  readonly copies: Readonly<Record<FileCopy['kind'], Stored>>
  readonly width: number
  readonly height: number
}

/**
 * Takes a photograph in: looks at the file, makes the copies that are shown, keeps the original untouched. The files
 * are written before the rows, so that a row never names a file that is not there.
 */
export async function addPhotograph(
  actor: Actor,
  commissionId: string,
  { operationId, ...about }: OutputOf<typeof PhotographRequest>,
  sent: SentFile,
): Promise<PhotographWithReading> {
  await requireCommission(commissionId, { actor, right: 'photograph.manage', see: 'photograph.read' })
  const image = await storeImage(sent)
  return inTransaction(async (tx) => {
    await requireCommission(commissionId, { actor, right: 'photograph.manage', tx, lock: true })
    const request = { what: 'photograph', commissionId, ...about, sha256: image.original.sha256 }
    const id = await onceOnly(tx, { operationId, actor, request }, () =>
      enterPhotograph(tx, actor, commissionId, about, image),
    )
    return withReading(id, tx)
  })
}

async function storeImage({ path, name }: SentFile): Promise<StoredImage> {
  const { type, width, height, screen, thumb } = await takeImage(path, name)
  const copies = {
    screen: await storeBytes(screen, COPY_TYPE),
    thumb: await storeBytes(thumb, COPY_TYPE),
  }
  return { original: await storeUpload(path, type), copies, width, height }
}

async function enterPhotograph(
  tx: Tx,
  actor: Actor,
  commissionId: string,
  { title, source, citation }: Omit<OutputOf<typeof PhotographRequest>, 'operationId'>,
  { original, copies, width, height }: StoredImage,
): Promise<string> {
  const file = await enterFile(tx, original, now())
  for (const kind of ['screen', 'thumb'] as const) await enterCopy(tx, file.id, kind, copies[kind])
  const key = `p${(await Photograph.count({ where: { commissionId }, transaction: tx })) + 1}`
  const photograph = await Photograph.create(
    {
      commissionId,
      key,
      fileId: file.id,
      title,
      source,
      citation,
      width,
      height,
      byId: actor.personId,
      createdAt: now(),
    },
    { transaction: tx },
  )
  await enterTrail(tx, {
    commissionId,
    actor,
    act: 'photograph-added',
    says: `Added photograph ${key}: ${title}`,
    document: { photographId: photograph.id, key, title, source, citation, sha256: file.sha256 },
  })
  return photograph.id
}

async function enterCopy(tx: Tx, fileId: string, kind: FileCopy['kind'], stored: Stored): Promise<void> {
  const copy = await enterFile(tx, stored, now())
  await FileCopy.findOrCreate({
    where: { fileId, kind },
    defaults: { fileId, kind, copyId: copy.id },
    transaction: tx,
  })
}
