import type { Actor } from '@shared/access'
import type { MeasurementRequest, OutputOf, PictureChangeRequest, PictureRequest } from '@shared/contracts'
import { Measurement, Picture } from '../models/commission'
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

/** A picture with its latest measurement; null: not measured yet. */
export interface PictureWithMeasurement {
  readonly picture: Picture
  readonly measurement: Measurement | null
}

/** The pictures of a commission in their order, archived ones too. */
export async function picturesOf(commissionId: string, tx?: Tx): Promise<PictureWithMeasurement[]> {
  const options = tx === undefined ? {} : { transaction: tx }
  const pictures = await Picture.findAll({
    where: { commissionId },
    order: [['position', 'ASC']],
    ...options,
  })
  const measurements = latestBy(
    await Measurement.findAll({ where: { pictureId: pictures.map(({ id }) => id) }, ...options }),
    ({ pictureId }) => pictureId,
  )
  return pictures.map((picture) => ({ picture, measurement: measurements.get(picture.id) ?? null }))
}

/** A picture reached through its commission, with the rights that the commission gives. */
export async function requirePicture(id: string, options: ReachOptions): Promise<Picture> {
  const { tx } = options
  const picture = await Picture.findByPk(id, tx === undefined ? {} : { transaction: tx })
  if (picture === null) throw notFound()
  await requireCommission(picture.commissionId, options)
  return picture
}

async function withMeasurement(id: string, tx: Tx): Promise<PictureWithMeasurement> {
  const picture = await Picture.findByPk(id, { transaction: tx, rejectOnEmpty: true })
  const measurement = await Measurement.findOne({
    where: { pictureId: id },
    order: [['no', 'DESC']],
    transaction: tx,
  })
  return { picture, measurement }
}

export const addPicture = (
  actor: Actor,
  commissionId: string,
  { operationId, name, copies }: OutputOf<typeof PictureRequest>,
): Promise<PictureWithMeasurement> =>
  inTransaction(async (tx) => {
    await requireCommission(commissionId, { actor, right: 'picture.manage', tx, lock: true })
    const request = { what: 'picture', commissionId, name, copies }
    const id = await onceOnly(tx, { operationId, actor, request }, () =>
      enterPicture(tx, actor, commissionId, { name, copies }),
    )
    return withMeasurement(id, tx)
  })

/** Makes a picture's row, the next in position. The commission must be held. */
export async function enterPicture(
  tx: Tx,
  actor: Actor,
  commissionId: string,
  { name, copies }: { readonly name: string; readonly copies: number },
): Promise<string> {
  const position = (await Picture.count({ where: { commissionId }, transaction: tx })) + 1
  const picture = await Picture.create(
    { commissionId, position, name, copies, createdAt: now() },
    { transaction: tx },
  )
  await enterTrail(tx, {
    commissionId,
    actor,
    act: 'picture-added',
    says: `Added the picture "${name}"${copies > 1 ? `, ${copies} frames` : ''}`,
    document: { pictureId: picture.id, name, copies },
  })
  return picture.id
}

export const changePicture = (
  actor: Actor,
  id: string,
  { version, name, copies, state }: OutputOf<typeof PictureChangeRequest>,
): Promise<PictureWithMeasurement> =>
  inTransaction(async (tx) => {
    await requirePicture(id, { actor, right: 'picture.manage', tx, lock: true })
    const picture = await Picture.findByPk(id, { transaction: tx, lock: tx.LOCK.UPDATE, rejectOnEmpty: true })
    requireVersion(picture.version, version)
    if (name !== undefined) picture.name = name
    if (copies !== undefined) picture.copies = copies
    if (state !== undefined) picture.state = state
    if (picture.changed() !== false) {
      await picture.save({ transaction: tx })
      await enterTrail(tx, {
        commissionId: picture.commissionId,
        actor,
        act: 'picture-changed',
        says: `Changed the picture "${picture.name}"`,
        document: { pictureId: id, name: picture.name, copies: picture.copies, state: picture.state },
      })
    }
    return withMeasurement(id, tx)
  })

export const measurePicture = (
  actor: Actor,
  id: string,
  { operationId, document }: OutputOf<typeof MeasurementRequest>,
): Promise<PictureWithMeasurement> =>
  inTransaction(async (tx) => {
    const picture = await requirePicture(id, { actor, right: 'picture.manage', tx, lock: true })
    const request = { what: 'measurement', id, document }
    await onceOnly(tx, { operationId, actor, request }, () => enterMeasurement(tx, actor, picture, document))
    return withMeasurement(id, tx)
  })

/** Adds the next measurement; the earlier ones stay as they were. The commission must be held. */
export async function enterMeasurement(
  tx: Tx,
  actor: Actor,
  picture: Picture,
  document: Measurement['document'],
): Promise<string> {
  const pictureId = picture.id
  const no = (await Measurement.count({ where: { pictureId }, transaction: tx })) + 1
  const measurement = await Measurement.create(
    { pictureId, no, document, byId: actor.personId, at: now() },
    { transaction: tx },
  )
  await enterTrail(tx, {
    commissionId: picture.commissionId,
    actor,
    act: 'picture-measured',
    says: `Measured the picture "${picture.name}" (measurement ${no})`,
    document: { pictureId, measurementId: measurement.id, no, document },
  })
  return measurement.id
}

/** Every measurement of a picture, the latest first. */
export async function listMeasurements(actor: Actor, id: string): Promise<Measurement[]> {
  await requirePicture(id, { actor, right: 'commission.read' })
  return Measurement.findAll({ where: { pictureId: id }, order: [['no', 'DESC']] })
}
