import { EventEmitter } from 'node:events'
import { v7 as uuidv7 } from 'uuid'
import { enterFile, storeBytes } from '../files/file-store'
import { Letter } from '../models/letter'
import { now } from '../services/clock'
import { installation } from '../services/installation'
import { readSettings } from '../services/settings'
import type { Tx } from '../services/transaction'
import { composed } from './message'
import type { Attachment } from './message'
import type { LetterBody } from './letters/letter-body'

export interface NewLetter {
  readonly kind: string
  readonly about: { readonly type: 'order' | 'issue'; readonly id: string; readonly commissionId: string }
  readonly to: string
  readonly body: LetterBody
  readonly attachments?: readonly Attachment[]
}

export type { Attachment } from './message'

const queued = new EventEmitter()

/** Calls back whenever a letter of this process has been committed; the worker looks by itself for those of others. */
export function onQueued(listener: () => void): () => void {
  queued.on('letter', listener)
  return () => queued.off('letter', listener)
}

/**
 * Writes a letter into the outbox, in the transaction that causes it. Its message id and every byte are fixed now;
 * it goes out after the commit, or not at all.
 */
export async function queueLetter(
  tx: Tx,
  { kind, about, to, body, attachments = [] }: NewLetter,
): Promise<string> {
  const at = now()
  const messageId = `<${uuidv7()}@${installation().mailFrom.split('@').at(-1)}>`
  const { document: settings } = await readSettings(tx)
  const raw = await composed({
    messageId,
    from: { name: settings.workshop, address: installation().mailFrom },
    to,
    ...body,
    attachments,
    date: at,
  })
  const file = await enterFile(tx, await storeBytes(raw, 'message/rfc822'), at)
  const letter = await Letter.create(
    {
      messageId,
      kind,
      aboutType: about.type,
      aboutId: about.id,
      commissionId: about.commissionId,
      toAddress: to,
      ...body,
      rawFileId: file.id,
      state: 'queued',
      dueAt: at,
      queuedAt: at,
    },
    { transaction: tx },
  )
  tx.afterCommit(() => {
    queued.emit('letter')
  })
  return letter.id
}
