import { createHash, randomUUID } from 'node:crypto'
import { readdir } from 'node:fs/promises'
import { createServer } from 'node:http'
import { connect } from 'node:net'
import type { AddressInfo } from 'node:net'
import { join } from 'node:path'
import sharp from 'sharp'
import { beforeAll, describe, expect, it } from 'vitest'
import { FileCopy, StoredFile } from '@server/models/file'
import { Photograph, Reading } from '@server/models/photograph'
import { useApplication } from '../helpers/application'
import { signedIn } from '../helpers/client'
import type { HttpClient } from '../helpers/client'
import { aCommission } from '../helpers/factories/commissions'
import { aPhotograph, anImageFile } from '../helpers/factories/photographs'
import { pathsOf } from '../helpers/faults'

const listel = useApplication()
let designer: HttpClient
beforeAll(async () => {
  designer = await signedIn(listel.app, { role: 'designer' })
})

const about = (change: object = {}) => ({
  operationId: randomUUID(),
  title: 'The old frame',
  source: 'An album',
  citation: 'Album 3, leaf 12',
  ...change,
})
const upload = (id: string, file: Buffer, name = 'frame.jpg', change: object = {}) =>
  designer.upload(`/commissions/${id}/photographs`, { about: about(change), file, name })
const sha256Of = (bytes: Buffer) => createHash('sha256').update(bytes).digest('hex')

/** Nothing may be left where uploads lie while they are looked at. */
const leftovers = () => readdir(join(listel.dataDir, 'uploads'))

describe('adding a photograph', () => {
  it.each(['jpeg', 'png', 'webp', 'tiff'] as const)(
    'takes a %s, whatever its name, and keeps it untouched',
    async (format) => {
      const { id } = await aCommission()
      const file = await anImageFile({ width: 300, height: 200, format })
      const answer = await upload(id, file, 'anything.txt')
      expect(answer.status).toBe(200)
      expect(answer.body).toMatchObject({
        key: 'p1',
        width: 300,
        height: 200,
        type: `image/${format}`,
        bytes: file.length,
        sha256: sha256Of(file),
        reading: null,
      })
      const original = await designer.file(`/photographs/${answer.body.id}/original`)
      expect(original.body.equals(file)).toBe(true)
      expect(original.get('Content-Disposition')).toMatch(/^attachment; filename="T-[0-9a-f]+-p1\./)
      expect(original.get('X-Content-Type-Options')).toBe('nosniff')
      expect(await leftovers()).toEqual([])
    },
  )

  it('shows it upright, at screen size, in sRGB, with nothing of its metadata', async () => {
    const { id } = await aCommission()
    const file = await sharp(await anImageFile({ width: 3000, height: 1200 }))
      .withExif({ IFD0: { Copyright: 'A secret place', Orientation: '6' } })
      .withMetadata({ orientation: 6 })
      .jpeg()
      .toBuffer()
    const answer = await upload(id, file)
    expect(answer.body).toMatchObject({ width: 1200, height: 3000 })
    const screen = await designer.file(`/photographs/${answer.body.id}/image`)
    expect(screen.get('Content-Type')).toBe('image/webp')
    expect(screen.get('Cache-Control')).toBe('private, max-age=31536000, immutable')
    const shown = await sharp(screen.body).metadata()
    expect([shown.width, shown.height]).toEqual([960, 2400])
    expect([shown.exif, shown.icc, shown.xmp, shown.orientation]).toEqual([
      undefined,
      undefined,
      undefined,
      undefined,
    ])
    const thumb = await sharp(
      (await designer.file(`/photographs/${answer.body.id}/image?size=thumb`)).body,
    ).metadata()
    expect([thumb.width, thumb.height]).toEqual([192, 480])
    expect(pathsOf(await designer.get(`/photographs/${answer.body.id}/image?size=huge`))).toEqual(['/size'])
  })

  it('happens once for an operation, and one file of the store serves every photograph of it', async () => {
    const one = await aCommission()
    const two = await aCommission()
    const file = await anImageFile()
    const operationId = randomUUID()
    const first = await upload(one.id, file, 'a.png', { operationId })
    const again = await upload(one.id, file, 'a.png', { operationId })
    expect(again.body).toEqual(first.body)
    expect(await Photograph.count({ where: { commissionId: one.id } })).toBe(1)
    await upload(two.id, file, 'b.png')
    const rows = await StoredFile.findAll({ where: { sha256: sha256Of(file) } })
    expect(rows).toHaveLength(1)
    expect(await FileCopy.count({ where: { fileId: rows[0]?.id ?? '' } })).toBe(2)
    const other = await upload(one.id, await anImageFile(), 'a.png', { operationId })
    expect(other.body.error.code).toBe('operation-reused')
  })
})

describe('a photograph that cannot be taken', () => {
  /** What is refused, with the words that tell what is wrong and how to mend it. */
  const refusals: readonly (readonly [string, () => Promise<Buffer>, RegExp])[] = [
    ['of 0 bytes', async () => Buffer.alloc(0), /is empty \(0 bytes\).*Send it again/],
    [
      'that is a text, renamed',
      async () => Buffer.from('this is no picture'),
      /is not a JPEG, PNG, WebP or TIFF/,
    ],
    [
      'that is a GIF, renamed',
      async () =>
        sharp(await anImageFile())
          .gif()
          .toBuffer(),
      /is not a JPEG/,
    ],
    [
      'that is an SVG, renamed',
      async () => Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"/>'),
      /is not a JPEG/,
    ],
    ['of a header alone', async () => Buffer.from([0xff, 0xd8, 0xff, 0xe0, 0, 16]), /is damaged/],
    ...(['jpeg', 'png', 'webp', 'tiff'] as const).map(
      (format) =>
        [
          `cut short: ${format}`,
          async () => {
            const whole = await anImageFile({ width: 800, height: 600, format })
            return whole.subarray(0, Math.floor(whole.length * 0.6))
          },
          /is damaged or was not copied whole/,
        ] as const,
    ),
  ]
  it.each(refusals)('%s', async (_what, make, says) => {
    const { id } = await aCommission()
    const answer = await upload(id, await make())
    expect(answer.status).toBe(400)
    expect(answer.body.error.code).toBe('file-refused')
    expect(answer.body.error.says).toMatch(/^"frame.jpg" /)
    expect(answer.body.error.says).toMatch(says)
    expect(await Photograph.count({ where: { commissionId: id } })).toBe(0)
    expect(await leftovers()).toEqual([])
  })

  it('of 20 000 × 20 000 pixels is refused from its header, without being decoded', async () => {
    const { id } = await aCommission()
    const answer = await upload(id, headerOfHugePng(20_000, 20_000), 'huge.png')
    expect(answer.status).toBe(413)
    expect(answer.body.error).toMatchObject({ code: 'file-too-large', width: 20_000, height: 20_000 })
    expect(answer.body.error.says).toMatch(/20000 × 20000 pixels, more than the 100 million/)
    expect(await leftovers()).toEqual([])
  })

  it('of more than 100 MB is cut off, and nothing of it stays', async () => {
    const { id } = await aCommission()
    const answer = await upload(id, Buffer.alloc(100 * 1024 * 1024 + 1), 'big.tiff')
    expect(answer.status).toBe(413)
    expect(answer.body.error.code).toBe('file-too-large')
    expect(await leftovers()).toEqual([])
  })

  it.each([
    ['/title', { title: '' }],
    ['/source', { source: 'x'.repeat(501) }],
    ['/rights', { rights: 'ours' }],
    ['/operationId', { operationId: '1' }],
  ])('without a good %s', async (path, change) => {
    const { id } = await aCommission()
    const answer = await upload(id, await anImageFile(), 'a.png', change)
    expect(answer.status).toBe(400)
    expect(pathsOf(answer)).toEqual([path])
    expect(await leftovers()).toEqual([])
  })

  it('without a file, without words about it, or with words that are no JSON', async () => {
    const { id } = await aCommission()
    const url = `/api/commissions/${id}/photographs`
    const file = await anImageFile()
    const without = await designer.agent.post(url).field('about', JSON.stringify(about()))
    expect(pathsOf(without)).toEqual(['/file'])
    const wordless = await designer.agent.post(url).attach('file', file, 'a.png')
    expect(pathsOf(wordless)).toEqual(['/about'])
    const garbled = await designer.agent.post(url).field('about', '{').attach('file', file, 'a.png')
    expect(pathsOf(garbled)).toEqual(['/about'])
    const elsewhere = await designer.agent.post(url).field('about', '{}').attach('picture', file, 'a.png')
    expect(elsewhere.status).toBe(400)
    const notMultipart = await designer.agent.post(url).send({ about: about() })
    expect(notMultipart.status).toBe(400)
    expect(await leftovers()).toEqual([])
  })
})

describe('an upload that breaks off', () => {
  it('leaves nothing behind, and the server goes on', async () => {
    const { id } = await aCommission()
    const server = createServer(listel.app)
    await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve))
    const { port } = server.address() as AddressInfo
    const cookie = designer.agent.jar.getCookies({
      domain: '127.0.0.1',
      path: '/api',
      secure: false,
      script: false,
    })
    const line = connect(port, '127.0.0.1')
    line.write(
      `POST /api/commissions/${id}/photographs HTTP/1.1\r\nHost: 127.0.0.1:${port}\r\nCookie: ${cookie.toValueString()}\r\n` +
        'Content-Type: multipart/form-data; boundary=cut\r\nContent-Length: 1000000\r\n\r\n' +
        '--cut\r\nContent-Disposition: form-data; name="file"; filename="a.png"\r\nContent-Type: image/png\r\n\r\n' +
        'x'.repeat(50_000),
    )
    await expect.poll(leftovers, { timeout: 5000 }).toHaveLength(1)
    line.destroy()
    await expect.poll(leftovers, { timeout: 5000 }).toEqual([])
    expect((await designer.get(`/commissions/${id}`)).body.photographs).toEqual([])
    await new Promise((resolve) => server.close(resolve))
  })
})

describe('what is said and read of a photograph', () => {
  it('is changed from the latest version only', async () => {
    const { id } = await aPhotograph(await aCommission())
    const changed = await designer.patch(`/photographs/${id}`, {
      version: 0,
      title: 'Another',
      state: 'archived',
    })
    expect(changed.body).toMatchObject({ title: 'Another', state: 'archived', version: 1 })
    expect((await designer.patch(`/photographs/${id}`, { version: 0, title: 'x' })).status).toBe(409)
    expect(pathsOf(await designer.patch(`/photographs/${id}`, { version: 1, width: 3 }))).toEqual(['/width'])
  })

  it('is read again and again, and no reading is lost', async () => {
    const { id } = await aPhotograph(await aCommission())
    const scale = { from: [10.5, 20.25], to: [30, 40], distance: 100, plusMinus: 0.5 }
    const read = (document: object) =>
      designer.post(`/photographs/${id}/readings`, { operationId: randomUUID(), document })
    await read({ scale: null, lay: null })
    const second = await read({ scale, lay: { at: [1, 2], turn: 90, mirrored: true } })
    expect(second.body.reading).toMatchObject({ no: 2, document: { scale } })
    expect(await Reading.count({ where: { photographId: id } })).toBe(2)
    expect(pathsOf(await read({ scale: { ...scale, distance: 0 }, lay: null }))).toEqual([
      '/document/scale/distance',
    ])
    expect(pathsOf(await read({ scale: { ...scale, to: [1] }, lay: null }))).toEqual(['/document/scale/to'])
  })

  it('answers 404 for what is not there', async () => {
    for (const path of ['image', 'original']) {
      expect((await designer.get(`/photographs/${randomUUID()}/${path}`)).status).toBe(404)
    }
  })
})

/** A PNG that says how large it is and holds nothing: signature and IHDR chunk with its checksum. */
function headerOfHugePng(width: number, height: number): Buffer {
  const chunk = Buffer.alloc(25)
  chunk.writeUInt32BE(13, 0)
  chunk.write('IHDR', 4, 'latin1')
  chunk.writeUInt32BE(width, 8)
  chunk.writeUInt32BE(height, 12)
  chunk.set([8, 2, 0, 0, 0], 16)
  chunk.writeUInt32BE(crc32Of(chunk.subarray(4, 21)), 21)
  const idat = Buffer.from([0, 0, 0, 0, 0x49, 0x44, 0x41, 0x54, 0x35, 0xaf, 0x06, 0x1e])
  return Buffer.concat([Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]), chunk, idat])
}

/** The checksum of PNG chunks (ISO 3309). */
function crc32Of(bytes: Uint8Array): number {
  let crc = 0xffffffff
  for (const byte of bytes) {
    crc ^= byte
    for (let bit = 0; bit < 8; bit += 1) crc = (crc >>> 1) ^ (crc & 1 ? 0xedb88320 : 0)
  }
  return (crc ^ 0xffffffff) >>> 0
}
