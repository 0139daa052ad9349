import { PhotographAnswer } from '@shared/contracts'
import type { OutputOf, PhotographChangeRequest, PhotographRequest, ReadingRequest } from '@shared/contracts'
import { addressOf, send } from './request'

/** Sends the file with the words about it; the original is kept untouched. */
export function addPhotograph(commissionId: string, file: File, about: OutputOf<typeof PhotographRequest>) {
  const body = new FormData()
  body.set('about', JSON.stringify(about))
  body.set('file', file)
  return send(PhotographAnswer, 'POST', ['commissions', commissionId, 'photographs'], { body })
}
export const changePhotograph = (id: string, body: OutputOf<typeof PhotographChangeRequest>) =>
  send(PhotographAnswer, 'PATCH', ['photographs', id], { body })
/** Gives the photograph with its new reading. */
export const addReading = (photographId: string, body: OutputOf<typeof ReadingRequest>) =>
  send(PhotographAnswer, 'POST', ['photographs', photographId, 'readings'], { body })
export const photographAddress = (id: string, size: 'screen' | 'thumb') =>
  addressOf(['photographs', id, 'image'], { size })
export const originalAddress = (id: string) => addressOf(['photographs', id, 'original'])
