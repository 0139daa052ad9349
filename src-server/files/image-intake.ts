import { open } from 'node:fs/promises'
import sharp from 'sharp'
import { Failure } from '@shared/failure'

/** Most pixels taken. */
export const MOST_PIXELS = 100_000_000
/** Long sides of the copies that are shown, pixels. */
const SCREEN_SIDE = 2400
const THUMB_SIDE = 480

export interface TakenImage {
  readonly type: 'image/jpeg' | 'image/png' | 'image/webp' | 'image/tiff'
  /** Pixels of the upright image. */
  readonly width: number
  readonly height: number
  readonly screen: Uint8Array
  readonly thumb: Uint8Array
}

export const COPY_TYPE = 'image/webp'

/**
 * Looks at a file for what it is, by its contents and never its name: first its header, then, only if that is
 * within bounds, every pixel of it. Gives copies to be shown, upright, in sRGB and without metadata. Throws
 * file-refused or file-too-large with what is wrong and how to mend it.
 */
export async function takeImage(path: string, name: string): Promise<TakenImage> {
  const type = await typeOf(path, name)
  const { width, height } = await sizeOf(path, name)
  if (width * height > MOST_PIXELS) {
    throw new Failure('file-too-large', {
      says: `"${name}" has ${width} × ${height} pixels, more than the ${MOST_PIXELS / 1e6} million that are taken; scale it down and send it again.`,
      width,
      height,
    })
  }
  return decoding(async () => {
    try {
      const screen = await copyOf(path, SCREEN_SIDE)
      // From the copy, so that the original is read only once.
      const thumb = await sharp(screen)
        .resize({ width: THUMB_SIDE, height: THUMB_SIDE, fit: 'inside', withoutEnlargement: true })
        .webp({ quality: 80 })
        .toBuffer()
      return { type, width, height, screen, thumb }
    } catch (error) {
      throw unreadable(name, error)
    }
  })
}

const copyOf = (path: string, side: number): Promise<Buffer> =>
  sharp(path, { failOn: 'error', limitInputPixels: MOST_PIXELS, sequentialRead: true })
    .autoOrient()
    .resize({ width: side, height: side, fit: 'inside', withoutEnlargement: true })
    .toColourspace('srgb')
    .webp({ quality: 88 })
    .toBuffer()

type ImageType = TakenImage['type']

/** What the first bytes of each kind are. */
const SIGNATURES: readonly { readonly type: ImageType; readonly isBegunBy: (head: Buffer) => boolean }[] = [
  { type: 'image/jpeg', isBegunBy: (head) => head.subarray(0, 3).equals(Buffer.from([0xff, 0xd8, 0xff])) },
  {
    type: 'image/png',
    isBegunBy: (head) =>
      head.subarray(0, 8).equals(Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a])),
  },
  {
    type: 'image/webp',
    isBegunBy: (head) =>
      head.toString('latin1', 0, 4) === 'RIFF' && head.toString('latin1', 8, 12) === 'WEBP',
  },
  {
    type: 'image/tiff',
    isBegunBy: (head) => ['II*\0', 'MM\0*'].includes(head.toString('latin1', 0, 4)),
  },
]

async function typeOf(path: string, name: string): Promise<ImageType> {
  const head = Buffer.alloc(16)
  const file = await open(path)
  try {
    const { bytesRead } = await file.read(head, 0, head.length, 0)
    if (bytesRead === 0) {
      throw new Failure('file-refused', {
        says: `"${name}" is empty (0 bytes); it was probably not copied whole. Send it again.`,
      })
    }
  } finally {
    await file.close()
  }
  const found = SIGNATURES.find(({ isBegunBy }) => isBegunBy(head))
  if (found === undefined) {
    throw new Failure('file-refused', {
      says: `"${name}" is not a JPEG, PNG, WebP or TIFF, whatever its name says; save the photograph as one of these and send that.`,
    })
  }
  return found.type
}

/** Upright width and height, read from the header alone. */
async function sizeOf(path: string, name: string) {
  try {
    const { autoOrient } = await sharp(path, { limitInputPixels: false }).metadata()
    return autoOrient
  } catch (error) {
    throw unreadable(name, error)
  }
}

const unreadable = (name: string, cause: unknown): Failure =>
  new Failure(
    'file-refused',
    {
      says: `"${name}" is damaged or was not copied whole: its picture cannot be read to the end. Send it again, or save it anew.`,
    },
    { cause },
  )

/** At most so many images are decoded at once, so that a few large ones cannot fill the memory. */
const MOST_AT_ONCE = 2
let underWay = 0
const waiting: (() => void)[] = []

async function decoding<T>(work: () => Promise<T>): Promise<T> {
  while (underWay >= MOST_AT_ONCE) await new Promise<void>((resolve) => waiting.push(resolve))
  underWay += 1
  try {
    return await work()
  } finally {
    underWay -= 1
    waiting.shift()?.()
  }
}
