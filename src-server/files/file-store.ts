import { createHash, randomUUID } from 'node:crypto'
import { createReadStream } from 'node:fs'
import { mkdir, open, readdir, rename, rm, stat } from 'node:fs/promises'
import { dirname, join } from 'node:path'
import { pipeline } from 'node:stream/promises'
import type { Transaction } from 'sequelize'
import { StoredFile } from '../models/file'

/** A file that lies in the store, by its contents. */
export interface Stored {
  readonly sha256: string
  readonly bytes: number
  readonly type: string
}

let folder: string | undefined

/** Names the folder that holds the store, absolute; made when the first file comes. */
export function openFileStore(dataDir: string): void {
  folder = dataDir
}

function dataFolder(): string {
  if (folder === undefined) throw new Error('the file store is not open')
  return folder
}

/** Where uploads under way lie until they are taken into the store or thrown away. */
export async function uploadFolder(): Promise<string> {
  const path = join(dataFolder(), 'uploads')
  await mkdir(path, { recursive: true })
  return path
}

/** Throws away uploads that a process left behind when it ended in the middle: those begun before the given time. */
export async function dropUploadsBefore(time: Date): Promise<void> {
  const folder = await uploadFolder()
  for (const name of await readdir(folder)) {
    const path = join(folder, name)
    const found = await stat(path).catch((error: NodeJS.ErrnoException) => {
      if (error.code === 'ENOENT') return undefined // another process took it in meanwhile
      throw error
    })
    if (found !== undefined && found.mtime < time) await rm(path, { force: true })
  }
}

/** Path of a file of the store: files/ab/cdef… */
export function pathOf(sha256: string): string {
  if (!/^[0-9a-f]{64}$/.test(sha256)) throw new TypeError('a stored file is named by 64 hexadecimal digits')
  return join(dataFolder(), 'files', sha256.slice(0, 2), sha256.slice(2))
}

/** Puts bytes into the store, whole or not at all. Bytes that lie there already are left alone. */
export async function storeBytes(bytes: Uint8Array, type: string): Promise<Stored> {
  const sha256 = createHash('sha256').update(bytes).digest('hex')
  const scratch = join(await uploadFolder(), randomUUID())
  try {
    const file = await open(scratch, 'wx', 0o600)
    try {
      await file.writeFile(bytes)
      await file.sync()
    } finally {
      await file.close()
    }
    await moveIn(scratch, sha256)
  } finally {
    await rm(scratch, { force: true })
  }
  return { sha256, bytes: bytes.byteLength, type }
}

/** Takes a file that lies in the upload folder into the store; it is gone from where it lay. */
export async function storeUpload(path: string, type: string): Promise<Stored> {
  const hash = createHash('sha256')
  await pipeline(createReadStream(path), hash)
  const sha256 = hash.digest('hex')
  const { size } = await stat(path)
  await moveIn(path, sha256)
  return { sha256, bytes: size, type }
}

async function moveIn(scratch: string, sha256: string): Promise<void> {
  const target = pathOf(sha256)
  await mkdir(dirname(target), { recursive: true })
  await rename(scratch, target)
}

/** The row of a stored file, made when its contents are new. */
export async function enterFile(tx: Transaction, stored: Stored, at: Date): Promise<StoredFile> {
  const [row] = await StoredFile.findOrCreate({
    where: { sha256: stored.sha256 },
    defaults: { ...stored, at },
    transaction: tx,
  })
  return row
}
