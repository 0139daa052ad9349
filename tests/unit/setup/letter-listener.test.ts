import { createTransport } from 'nodemailer'
import { describe, expect, it } from 'vitest'
import { listenForLetters } from '../../helpers/smtp'
import type { LetterListener } from '../../helpers/smtp'

async function send(listener: LetterListener, subject: string): Promise<void> {
  const transport = createTransport(listener.url)
  const from = 'post@workshop.example'
  await transport.sendMail({ from, to: 'mill@mill.example', subject, text: 'plain', html: '<p>rich</p>' })
  transport.close()
}

describe('the listener that tests read letters from', () => {
  it('gives each letter with its envelope and both bodies', async () => {
    const listener = await listenForLetters()
    const awaited = listener.letterWhere(({ mail }) => mail.subject === 'Order 7')
    await send(listener, 'Order 6')
    await send(listener, 'Order 7')
    const letter = await awaited
    expect(letter).toMatchObject({ from: 'post@workshop.example', to: ['mill@mill.example'] })
    expect(letter.mail.text?.trim()).toBe('plain')
    expect(letter.mail.html).toContain('<p>rich</p>')
    expect(listener.letters).toHaveLength(2)
    await listener.stop()
  })

  it('refuses when told to, and takes letters again', async () => {
    const listener = await listenForLetters()
    listener.refuseWith(451)
    await expect(send(listener, 'Order 8')).rejects.toThrow('451')
    listener.refuseWith(undefined)
    await send(listener, 'Order 8')
    expect(listener.letters).toHaveLength(1)
    await listener.stop()
  })

  it('fails in time when the letter does not come, and can come back on its port', async () => {
    const listener = await listenForLetters()
    await expect(listener.letterWhere(() => true, 50)).rejects.toThrow('0 arrived')
    await listener.stop()
    await expect(send(listener, 'Order 9')).rejects.toThrow('ECONNREFUSED')
    const again = await listenForLetters({ port: Number(new URL(listener.url).port) })
    await send(again, 'Order 9')
    expect(again.letters).toHaveLength(1)
    await again.stop()
  })
})
