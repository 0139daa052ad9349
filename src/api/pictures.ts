import { MeasurementAnswer, PictureAnswer } from '@shared/contracts'
import type { MeasurementRequest, OutputOf, PictureChangeRequest, PictureRequest } from '@shared/contracts'
import { ask, send } from './request'

export const addPicture = (commissionId: string, body: OutputOf<typeof PictureRequest>) =>
  send(PictureAnswer, 'POST', ['commissions', commissionId, 'pictures'], { body })
export const changePicture = (id: string, body: OutputOf<typeof PictureChangeRequest>) =>
  send(PictureAnswer, 'PATCH', ['pictures', id], { body })
export const readMeasurements = (pictureId: string, signal?: AbortSignal) =>
  ask(MeasurementAnswer.array(), ['pictures', pictureId, 'measurements'], { signal })
export const addMeasurement = (pictureId: string, body: OutputOf<typeof MeasurementRequest>) =>
  send(MeasurementAnswer, 'POST', ['pictures', pictureId, 'measurements'], { body })
