import { simpleParser } from 'mailparser'
import type { ParsedMail } from 'mailparser'
import { SMTPServer } from 'smtp-server'

/** A letter as it arrived: the envelope it came in, the bytes, and what they say. */
export interface ArrivedLetter {
  readonly from: string
  readonly to: readonly string[]
  readonly raw: Buffer
  readonly mail: ParsedMail
}

export interface LetterListener {
  /** smtp://127.0.0.1:PORT */
  readonly url: string
  /** Everything that arrived so far, the oldest first. */
  readonly letters: readonly ArrivedLetter[]
  /** While set, every letter is refused with this SMTP code (451 for a while, 550 for good). */
  refuseWith(code: number | undefined): void
  /** The first letter, past or future, that the test is after; fails when none comes in time. */
  letterWhere(isWanted: (letter: ArrivedLetter) => boolean, withinMs?: number): Promise<ArrivedLetter>
  /** Stops listening; `port` of the next listener may be the same, to come back after an outage. */
  stop(): Promise<void>
}

/** A real SMTP listener on loopback that keeps what arrives in memory. Port 0 takes any free one. */
export async function listenForLetters(options: { port?: number } = {}): Promise<LetterListener> {
  const letters: ArrivedLetter[] = []
  const watchers = new Set<() => void>()
  let refusal: number | undefined
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS', 'AUTH'],
    disableReverseLookup: true,
    logger: false,
    closeTimeout: 1_000,
    onData: (stream, session, done) => {
      const chunks: Buffer[] = []
      stream.on('data', (chunk: Buffer) => chunks.push(chunk))
      stream.on('end', () => {
        if (refusal !== undefined) {
          done(Object.assign(new Error('refused for the test'), { responseCode: refusal }))
          return
        }
        const raw = Buffer.concat(chunks)
        simpleParser(raw).then((mail) => {
          const { mailFrom, rcptTo } = session.envelope
          const from = mailFrom === false ? '' : mailFrom.address
          letters.push({ from, to: rcptTo.map(({ address }) => address), raw, mail })
          done()
          watchers.forEach((look) => look())
        }, done)
      })
    },
  })
  const port = await listenOn(server, options.port ?? 0)
  return {
    url: `smtp://127.0.0.1:${port}`,
    letters,
    refuseWith: (code) => (refusal = code),
    letterWhere: (isWanted, withinMs = 10_000) => {
      return new Promise((resolve, reject) => {
        const look = () => {
          const found = letters.find(isWanted)
          if (found === undefined) return
          clearTimeout(timer)
          watchers.delete(look)
          resolve(found)
        }
        const timer = setTimeout(() => {
          watchers.delete(look)
          const subjects = letters.map(({ mail }) => mail.subject).join(' | ')
          reject(new Error(`no such letter within ${withinMs} ms; ${letters.length} arrived: ${subjects}`))
        }, withinMs)
        watchers.add(look)
        look()
      })
    },
    stop: () => new Promise((resolve) => server.close(() => resolve())),
  }
}

function listenOn(server: SMTPServer, port: number): Promise<number> {
  return new Promise((resolve, reject) => {
    server.once('error', reject)
    const listener = server.listen(port, '127.0.0.1', () => {
      server.removeListener('error', reject)
      server.on('error', () => {}) // a sender that breaks off, as tests of outages make it do
      const address = listener.address()
      resolve(address !== null && typeof address === 'object' ? address.port : port)
    })
  })
}
