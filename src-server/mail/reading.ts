import { readFile, readdir } from 'node:fs/promises'
import { join } from 'node:path'
import { simpleParser } from 'mailparser'

/** An attachment as it stands in a message. */
export interface AttachedFile {
  readonly name: string
  readonly type: string
  readonly bytes: Uint8Array
}

/** The attachments of a message that lies at this path, in order. */
export async function attachmentsAt(path: string): Promise<AttachedFile[]> {
  const { attachments } = await simpleParser(await readFile(path))
  return attachments.map(({ filename, contentType, content }, index) => ({
    name: filename ?? `attachment-${index + 1}`,
    type: contentType,
    bytes: content,
  }))
}

/** The file in a folder of caught mail whose head bears this message id; undefined where there is none. */
export async function findCaughtMessage(folder: string, messageId: string): Promise<string | undefined> {
  const names = await readdir(folder).catch((error: NodeJS.ErrnoException) => {
    if (error.code === 'ENOENT') return []
    throw error
  })
  for (const name of names.filter((one) => one.endsWith('.eml')).toReversed()) {
    const path = join(folder, name)
    const head = (await readFile(path, 'latin1')).split(/\r?\n\r?\n/, 1)[0] ?? ''
    if (head.includes(messageId)) return path
  }
  return undefined
}
