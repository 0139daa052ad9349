import { connect } from 'node:net'
import { mkdtemp, readFile, readdir, rm, stat } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { createTransport } from 'nodemailer'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { catchMail } from '@server/setup/catch-mail'
import type { CaughtMail, MailCatcher } from '@server/setup/catch-mail'

let folder: string
let catcher: MailCatcher

beforeEach(async () => {
  folder = join(await mkdtemp(join(tmpdir(), 'listel-catch-')), 'caught-mail')
  catcher = await catchMail({ folder, port: 0 })
})

afterEach(async () => {
  await catcher.close()
  await rm(join(folder, '..'), { recursive: true, force: true })
})

async function send(subject: string, attachment?: Buffer): Promise<void> {
  const transport = createTransport({ host: '127.0.0.1', port: catcher.port, secure: false })
  await transport.sendMail({
    from: 'post@workshop.example',
    to: ['mill@mill.example', 'second@mill.example'],
    subject,
    text: 'The section is attached.\n.\nA line that is a lone dot stands above.',
    attachments: attachment === undefined ? [] : [{ filename: 'section.pdf', content: attachment }],
  })
  transport.close()
}

async function caught(): Promise<CaughtMail[]> {
  const names = (await readdir(folder)).filter((name) => name.endsWith('.json')).sort()
  return Promise.all(
    names.map(async (name) => JSON.parse(await readFile(join(folder, name), 'utf8')) as CaughtMail),
  )
}

describe('the mail catcher', () => {
  it('keeps the message as it came and its envelope beside it', async () => {
    await send('Knife order', Buffer.alloc(200_000, 7))
    const [one, ...more] = await caught()
    expect(more).toEqual([])
    expect(one?.from).toBe('post@workshop.example')
    expect(one?.to).toEqual(['mill@mill.example', 'second@mill.example'])
    const message = await readFile(join(folder, one?.file ?? ''))
    expect(message.length).toBe(one?.bytes)
    expect(message.toString()).toContain('Subject: Knife order')
    expect(message.toString()).toContain('\r\n.\r\nA line')
    expect(message.toString()).toContain('filename=section.pdf')
  })

  it('keeps letters that arrive together apart, and leaves no unfinished file', async () => {
    await Promise.all(['A', 'B', 'C', 'D', 'E'].map((subject) => send(subject)))
    expect(new Set((await caught()).map(({ file }) => file)).size).toBe(5)
    expect((await readdir(folder)).filter((name) => name.endsWith('.part'))).toEqual([])
  })

  it('lets nobody else read what it caught', async () => {
    await send('Private')
    const modes = await Promise.all(
      (await readdir(folder)).map(async (name) => (await stat(join(folder, name))).mode & 0o777),
    )
    expect(modes).toEqual([0o600, 0o600])
  })

  it('keeps nothing of a message that breaks off', async () => {
    await new Promise<void>((resolve, reject) => {
      const socket = connect({ port: catcher.port, host: '127.0.0.1' })
      const lines = ['EHLO x', 'MAIL FROM:<a@b.example>', 'RCPT TO:<c@d.example>', 'DATA']
      socket.on('data', () => {
        const line = lines.shift()
        if (line !== undefined) socket.write(`${line}\r\n`)
        else socket.write('Subject: half\r\n\r\nhalf a ', () => socket.destroy())
      })
      socket.on('close', () => resolve())
      socket.on('error', reject)
    })
    await send('whole')
    expect(await caught()).toHaveLength(1)
  })

  it('says so when its port is taken', async () => {
    await expect(catchMail({ folder, port: catcher.port })).rejects.toThrow(/EADDRINUSE/)
  })
})
