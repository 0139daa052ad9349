import type { Actor } from '@shared/access'
import type { OutputOf, PhotographChangeRequest, ReadingRequest } from '@shared/contracts'
import { StoredFile } from '../models/file'
import { Photograph, Reading } from '../models/photograph'
import { now } from './clock'
import { latestBy } from './latest'
import { onceOnly } from './operation'
import { requireCommission } from './require-commission'
import type { ReachOptions } from './require-commission'
import { notFound } from './rights'
import { enterTrail } from './trail'
import { inTransaction } from './transaction'
import type { Tx } from './transaction'
import { requireVersion } from './versions'

/** A photograph with the file it is and the latest of what was read off it. */
export interface PhotographWithReading {
  readonly photograph: Photograph
  readonly file: StoredFile
  readonly reading: Reading | null
}

/** The photographs of a commission in the order they came, archived ones too. */
export async function photographsOf(commissionId: string, tx?: Tx): Promise<PhotographWithReading[]> {
  const options = tx === undefined ? {} : { transaction: tx }
  const photographs = await Photograph.findAll({
    where: { commissionId },
    include: [{ model: StoredFile, as: 'file', required: true }],
    order: [
      ['createdAt', 'ASC'],
      ['id', 'ASC'],
    ],
    ...options,
  })
  const readings = latestBy(
    await Reading.findAll({ where: { photographId: photographs.map(({ id }) => id) }, ...options }),
    ({ photographId }) => photographId,
  )
  return photographs.map((photograph) => ({
    photograph,
    file: fileOf(photograph),
    reading: readings.get(photograph.id) ?? null,
  }))
}

function fileOf(photograph: Photograph): StoredFile {
  if (photograph.file === undefined) throw new Error('a photograph was read without its file')
  return photograph.file
}

/** A photograph reached through its commission. */
export async function requirePhotograph(id: string, options: ReachOptions): Promise<Photograph> {
  const photograph = await Photograph.findByPk(id, {
    include: [{ model: StoredFile, as: 'file', required: true }],
    ...(options.tx === undefined ? {} : { transaction: options.tx }),
  })
  if (photograph === null) throw notFound()
  await requireCommission(photograph.commissionId, { see: 'photograph.read', ...options })
  return photograph
}

export async function withReading(id: string, tx: Tx): Promise<PhotographWithReading> {
  const photograph = await Photograph.findByPk(id, {
    include: [{ model: StoredFile, as: 'file', required: true }],
    transaction: tx,
    rejectOnEmpty: true,
  })
  const reading = await Reading.findOne({
    where: { photographId: id },
    order: [['no', 'DESC']],
    transaction: tx,
  })
  return { photograph, file: fileOf(photograph), reading }
}

export const changePhotograph = (
  actor: Actor,
  id: string,
  { version, title, source, citation, state }: OutputOf<typeof PhotographChangeRequest>,
): Promise<PhotographWithReading> =>
  inTransaction(async (tx) => {
    await requirePhotograph(id, { actor, right: 'photograph.manage', tx, lock: true })
    const photograph = await Photograph.findByPk(id, {
      transaction: tx,
      lock: tx.LOCK.UPDATE,
      rejectOnEmpty: true,
    })
    requireVersion(photograph.version, version)
    if (title !== undefined) photograph.title = title
    if (source !== undefined) photograph.source = source
    if (citation !== undefined) photograph.citation = citation
    if (state !== undefined) photograph.state = state
    if (photograph.changed() !== false) {
      await photograph.save({ transaction: tx })
      await enterTrail(tx, {
        commissionId: photograph.commissionId,
        actor,
        act: 'photograph-changed',
        says: `Changed what is said of photograph ${photograph.key}`,
        document: {
          photographId: id,
          title: photograph.title,
          source: photograph.source,
          citation: photograph.citation,
          state: photograph.state,
        },
      })
    }
    return withReading(id, tx)
  })

/** Adds the next reading; the earlier ones stay as they were. */
export const readOffPhotograph = (
  actor: Actor,
  id: string,
  { operationId, document }: OutputOf<typeof ReadingRequest>,
): Promise<PhotographWithReading> =>
  inTransaction(async (tx) => {
    const photograph = await requirePhotograph(id, { actor, right: 'photograph.manage', tx, lock: true })
    const request = { what: 'reading', id, document }
    await onceOnly(tx, { operationId, actor, request }, async () => {
      const no = (await Reading.count({ where: { photographId: id }, transaction: tx })) + 1
      const reading = await Reading.create(
        { photographId: id, no, document, byId: actor.personId, at: now() },
        { transaction: tx },
      )
      await enterTrail(tx, {
        commissionId: photograph.commissionId,
        actor,
        act: 'photograph-read',
        says: `Read photograph ${photograph.key} (reading ${no})`,
        document: { photographId: id, readingId: reading.id, no },
      })
      return reading.id
    })
    return withReading(id, tx)
  })
