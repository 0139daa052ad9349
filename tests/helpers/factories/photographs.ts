import { randomUUID } from 'node:crypto'
import sharp from 'sharp'
import { enterFile, storeBytes } from '@server/files/file-store'
import { inTransaction } from '@server/services/transaction'
import type { Commission } from '@server/models/commission'
import { FileCopy } from '@server/models/file'
import { Photograph } from '@server/models/photograph'
import { unique } from './people'

/** A picture file of noise, so that no two are alike. */
export function anImageFile(
  wish: {
    readonly width?: number
    readonly height?: number
    readonly format?: 'jpeg' | 'png' | 'webp' | 'tiff'
  } = {},
): Promise<Buffer> {
  const { width = 64, height = 48, format = 'png' } = wish
  return sharp({
    create: {
      width,
      height,
      channels: 3,
      background: '#000',
      noise: { type: 'gaussian', mean: 128, sigma: 40 },
    },
  })
    .toFormat(format)
    .toBuffer()
}

/** A photograph of a commission with its file and copies in the store. */
export async function aPhotograph(
  commission: Pick<Commission, 'id'>,
  wish: { readonly title?: string; readonly file?: Buffer } = {},
): Promise<Photograph> {
  const bytes = wish.file ?? (await anImageFile())
  const { width = 0, height = 0 } = await sharp(bytes).metadata()
  const stored = await storeBytes(bytes, 'image/png')
  const copy = await storeBytes(await sharp(bytes).webp().toBuffer(), 'image/webp')
  return inTransaction(async (tx) => {
    const file = await enterFile(tx, stored, new Date())
    const copied = await enterFile(tx, copy, new Date())
    for (const kind of ['screen', 'thumb'] as const) {
      await FileCopy.create({ fileId: file.id, kind, copyId: copied.id }, { transaction: tx })
    }
    const count = await Photograph.count({ where: { commissionId: commission.id }, transaction: tx })
    return Photograph.create(
      {
        commissionId: commission.id,
        key: `p${count + 1}`,
        fileId: file.id,
        title: wish.title ?? `View ${unique()}`,
        source: 'An album',
        citation: 'Album 3, leaf 12',
        width,
        height,
        byId: randomUUID(),
        createdAt: new Date(),
      },
      { transaction: tx },
    )
  })
}
