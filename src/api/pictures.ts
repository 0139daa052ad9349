import { MeasurementsAnswer, PictureAnswer } from '@shared/contracts'
import type { MeasurementRequest, OutputOf, PictureChangeRequest, PictureRequest } from '@shared/contracts'
import { ask, send } from './request'

export const addPicture = (commissionId: string, body: OutputOf<typeof PictureRequest>) =>
  send(PictureAnswer, 'POST', ['commissions', commissionId, 'pictures'], { body })
export const changePicture = (id: string, body: OutputOf<typeof PictureChangeRequest>) =>
  send(PictureAnswer, 'PATCH', ['pictures', id], { body })
export const readMeasurements = (pictureId: string, signal?: AbortSignal) =>
  ask(MeasurementsAnswer, ['pictures', pictureId, 'measurements'], { signal })
/** Gives the picture with its new measurement. */
export const addMeasurement = (pictureId: string, body: OutputOf<typeof MeasurementRequest>) =>
  send(PictureAnswer, 'POST', ['pictures', pictureId, 'measurements'], { body })
