import { LetterAnswer, LettersAnswer } from '@shared/contracts'
import { addressOf, ask, send } from './request'

export const readLetters = (signal?: AbortSignal) => ask(LettersAnswer, ['letters'], { signal })
export const readLetter = (id: string, signal?: AbortSignal) => ask(LetterAnswer, ['letters', id], { signal })
export const sendLetterAgain = (id: string) => send(LetterAnswer, 'POST', ['letters', id, 'send-again'])
/** The letter as it was queued, and as the workshop's own catcher took it in. */
export const rawLetterAddress = (id: string) => addressOf(['letters', id, 'raw'])
export const caughtLetterAddress = (id: string) => addressOf(['letters', id, 'caught'])
export const attachmentAddress = (id: string, index: number) =>
  addressOf(['letters', id, 'attachments', index])
