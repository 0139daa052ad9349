import type { Actor } from '@shared/access'
import { Failure } from '@shared/failure'
import { pathOf } from '../files/file-store'
import { fileAnswer } from '../files/file-answer'
import type { FileAnswer } from '../files/file-answer'
import { attachmentsAt, findCaughtMessage } from '../mail/reading'
import type { AttachedFile } from '../mail/reading'
import { StoredFile } from '../models/file'
import { Letter, LetterTry } from '../models/letter'
import { now } from './clock'
import { installation } from './installation'
import { withOutcomes } from './orders'
import type { LetterWithOutcome } from './orders'
import { notFound, requireRight } from './rights'
import { enterTrail } from './trail'
import { inTransaction } from './transaction'

export interface WholeLetter extends LetterWithOutcome {
  readonly attempts: readonly LetterTry[]
  readonly attachments: readonly AttachedFile[]
  readonly caught: boolean
}

/** Every letter, the latest first. */
export async function listLetters(actor: Actor): Promise<LetterWithOutcome[]> {
  requireRight(actor, 'post.read', {})
  return withOutcomes(
    await Letter.findAll({
      order: [
        ['queuedAt', 'DESC'],
        ['id', 'DESC'],
      ],
      limit: 1000,
    }),
  )
}

async function requireLetter(actor: Actor, id: string): Promise<Letter> {
  requireRight(actor, 'post.read', {})
  const letter = await Letter.findByPk(id)
  if (letter === null) throw notFound()
  return letter
}

export async function readLetter(actor: Actor, id: string): Promise<WholeLetter> {
  const letter = await requireLetter(actor, id)
  const [known] = await withOutcomes([letter])
  return {
    letter,
    lastOutcome: known?.lastOutcome ?? null,
    attempts: await LetterTry.findAll({ where: { letterId: id }, order: [['no', 'ASC']] }),
    attachments: await attachmentsAt(await rawPathOf(letter)),
    caught: (await findCaught(letter)) !== undefined,
  }
}

async function rawPathOf(letter: Letter): Promise<string> {
  const file = await StoredFile.findByPk(letter.rawFileId, { rejectOnEmpty: true })
  return pathOf(file.sha256)
}

const emlAnswer = (path: string, name: string): FileAnswer =>
  fileAnswer({ from: { path }, type: 'message/rfc822', name, inline: false, cache: 'never' })

/** The message as it was queued, byte for byte. */
export async function readRawLetter(actor: Actor, id: string): Promise<FileAnswer> {
  const letter = await requireLetter(actor, id)
  return emlAnswer(await rawPathOf(letter), `letter-${letter.id}.eml`)
}

/** The message as the stand-in for a mail provider caught it; not found where there is none. */
export async function readCaughtLetter(actor: Actor, id: string): Promise<FileAnswer> {
  const letter = await requireLetter(actor, id)
  const path = await findCaught(letter)
  if (path === undefined) throw notFound()
  return emlAnswer(path, `caught-${letter.id}.eml`)
}

export async function readAttachment(actor: Actor, id: string, index: number): Promise<FileAnswer> {
  const letter = await requireLetter(actor, id)
  const attachment = (await attachmentsAt(await rawPathOf(letter)))[index]
  if (attachment === undefined) throw notFound()
  return fileAnswer({
    from: { bytes: attachment.bytes },
    type: attachment.type,
    name: attachment.name,
    inline: attachment.type === 'application/pdf',
    cache: 'forever',
  })
}

/** Where the stand-in for a mail provider put the letter, if it caught it. */
async function findCaught({ messageId }: Letter): Promise<string | undefined> {
  const folder = installation().caughtMailDir
  return folder === undefined ? undefined : findCaughtMessage(folder, messageId)
}

/** Sends a letter again that was sent or failed: the same bytes under the same message id. */
export async function sendLetterAgain(actor: Actor, id: string): Promise<WholeLetter> {
  await requireLetter(actor, id)
  await inTransaction(async (tx) => {
    requireRight(actor, 'post.send-again', {})
    const letter = await Letter.findByPk(id, { transaction: tx, lock: tx.LOCK.UPDATE, rejectOnEmpty: true })
    if (letter.state === 'queued' || letter.state === 'sending') {
      throw new Failure('transition-not-allowed', {
        says: 'The letter is in the queue already; it goes out as soon as the mail server takes it.',
      })
    }
    await letter.update(
      { state: 'queued', dueAt: now(), claimedBy: null, claimedUntil: null },
      { transaction: tx },
    )
    await enterTrail(tx, {
      commissionId: letter.commissionId,
      actor,
      act: 'letter-sent-again',
      says: `Sent again: ${letter.subject}`,
      document: { letterId: id },
    })
  })
  return readLetter(actor, id)
}
