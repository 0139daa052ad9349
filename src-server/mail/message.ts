import nodemailer from 'nodemailer'

export interface Attachment {
  readonly name: string
  readonly type: string
  readonly bytes: Uint8Array
}

export interface Message {
  readonly messageId: string
  readonly from: { readonly name: string; readonly address: string }
  readonly to: string
  readonly subject: string
  readonly text: string
  readonly html: string
  readonly attachments: readonly Attachment[]
  readonly date: Date
}

const composer = nodemailer.createTransport({ streamTransport: true, buffer: true, newline: 'windows' })

/** The message whole (RFC 5322), as it will go out and be kept. */
export async function composed(message: Message): Promise<Buffer> {
  const info = await composer.sendMail({
    messageId: message.messageId,
    date: message.date,
    from: message.from,
    to: message.to,
    subject: message.subject,
    text: message.text,
    html: message.html,
    // Letters of a program say so, so that no mailbox answers them by itself (RFC 3834).
    headers: { 'Auto-Submitted': 'auto-generated' },
    attachments: message.attachments.map(({ name, type, bytes }) => ({
      filename: name,
      contentType: type,
      content: Buffer.from(bytes),
    })),
    disableFileAccess: true,
    disableUrlAccess: true,
  })
  if (!Buffer.isBuffer(info.message)) throw new Error('the message was not composed in memory')
  return info.message
}
