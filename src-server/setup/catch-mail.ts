import { randomBytes } from 'node:crypto'
import { createWriteStream } from 'node:fs'
import { mkdir, rename, rm, writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import { pipeline } from 'node:stream/promises'
import { SMTPServer } from 'smtp-server'
import type { SMTPServerDataStream, SMTPServerSession } from 'smtp-server'

/** What is written beside each caught message: its envelope, which the message itself need not tell. */
export interface CaughtMail {
  /** Name of the message's file in the same folder. */
  readonly file: string
  readonly from: string
  readonly to: readonly string[]
  /** ISO 8601, UTC. */
  readonly caughtAt: string
  readonly bytes: number
}

export interface MailCatcher {
  readonly port: number
  close(): Promise<void>
}

/** Larger ones are refused with SMTP's own 552, as a mail provider would. */
const LARGEST_BYTES = 64 * 1024 * 1024

/**
 * Listens for letters on loopback and keeps each as NAME.eml with NAME.json beside it. The .json comes last and
 * whole, so whoever lists the folder by it never meets half a message. Port 0 takes any free one.
 */
export async function catchMail(options: { folder: string; port: number }): Promise<MailCatcher> {
  await mkdir(options.folder, { recursive: true, mode: 0o700 })
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS', 'AUTH'],
    disableReverseLookup: true,
    size: LARGEST_BYTES,
    logger: false,
    onData: (stream, session, done) => {
      keep(stream, session, options.folder).then(
        () => done(),
        (error: unknown) => done(error instanceof Error ? error : new Error(String(error))),
      )
    },
  })
  const port = await listenOnLoopback(server, options.port)
  // A client that breaks off is its own affair: the letter stays with the sender, who tries again.
  server.on('error', () => {})
  return { port, close: () => new Promise((resolve) => server.close(() => resolve())) }
}

function listenOnLoopback(server: SMTPServer, port: number): Promise<number> {
  return new Promise((resolve, reject) => {
    server.once('error', reject)
    const listener = server.listen(port, '127.0.0.1', () => {
      server.removeListener('error', reject)
      const address = listener.address()
      resolve(address !== null && typeof address === 'object' ? address.port : port)
    })
  })
}

async function keep(stream: SMTPServerDataStream, session: SMTPServerSession, folder: string): Promise<void> {
  const caughtAt = new Date().toISOString()
  const name = `${caughtAt.replaceAll(':', '-')}-${randomBytes(6).toString('hex')}`
  const file = `${name}.eml`
  const unfinished = join(folder, `${name}.part`)
  try {
    await pipeline(stream, createWriteStream(unfinished, { mode: 0o600 }))
    if (stream.sizeExceeded) throw Object.assign(new Error('The letter is too large.'), { responseCode: 552 })
    await rename(unfinished, join(folder, file))
  } finally {
    await rm(unfinished, { force: true })
  }
  const { mailFrom, rcptTo } = session.envelope
  const caught: CaughtMail = {
    file,
    from: mailFrom === false ? '' : mailFrom.address,
    to: rcptTo.map(({ address }) => address),
    caughtAt,
    bytes: stream.byteLength,
  }
  const fresh = join(folder, `${name}.json.part`)
  await writeFile(fresh, `${JSON.stringify(caught, null, 2)}\n`, { mode: 0o600 })
  await rename(fresh, join(folder, `${name}.json`))
}
