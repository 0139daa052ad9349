import { LetterAnswer, LetterBrief } from '@shared/contracts'
import { addressOf, ask, send } from './request'

export const readLetters = (signal?: AbortSignal) => ask(LetterBrief.array(), ['letters'], { signal })
export const readLetter = (id: string, signal?: AbortSignal) => ask(LetterAnswer, ['letters', id], { signal })
export const sendLetterAgain = (id: string, operationId: string) =>
  send(LetterAnswer, 'POST', ['letters', id, 'send-again'], { body: { operationId } })
/** The letter as it was queued, and as the workshop's own catcher took it in. */
export const rawLetterAddress = (id: string) => addressOf(['letters', id, 'raw'])
export const caughtLetterAddress = (id: string) => addressOf(['letters', id, 'caught'])
export const attachmentAddress = (id: string, index: number) =>
  addressOf(['letters', id, 'attachments', index])
