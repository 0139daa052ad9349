import { createReadStream } from 'node:fs'
import { stat } from 'node:fs/promises'
import { pipeline } from 'node:stream/promises'
import type { Response } from 'express'

/** An answer that is a file and not JSON. */
export interface FileAnswer {
  readonly kind: 'file'
  readonly from: { readonly bytes: Uint8Array } | { readonly path: string }
  readonly type: string
  /** The name it is saved under. */
  readonly name: string
  /** Shown in the page, or offered for saving. */
  readonly inline: boolean
  /** `forever`: what this address gives can never change. */
  readonly cache: 'forever' | 'never'
}

export const fileAnswer = (answer: Omit<FileAnswer, 'kind'>): FileAnswer => ({ kind: 'file', ...answer })

export const isFileAnswer = (answer: unknown): answer is FileAnswer =>
  typeof answer === 'object' &&
  answer !== null &&
  'kind' in answer &&
  answer.kind === 'file' &&
  'from' in answer

export async function sendFileAnswer(response: Response, answer: FileAnswer): Promise<void> {
  response.set({
    'Content-Type': answer.type,
    'Content-Disposition': dispositionOf(answer),
    'Cache-Control': answer.cache === 'forever' ? 'private, max-age=31536000, immutable' : 'no-store',
    // Nothing in a file may run as a page of ours.
    'Content-Security-Policy': "default-src 'none'; style-src 'unsafe-inline'; sandbox",
  })
  if ('bytes' in answer.from) {
    response.end(answer.from.bytes)
    return
  }
  const { size } = await stat(answer.from.path)
  response.set('Content-Length', String(size))
  await pipeline(createReadStream(answer.from.path), response)
}

/** The name twice: plain for old readers, and whole in UTF-8 (RFC 6266). */
function dispositionOf({ inline, name }: FileAnswer): string {
  const plain = name.replaceAll(/[^A-Za-z0-9._ -]/g, '_')
  const whole = encodeURIComponent(name).replaceAll(
    /['()*]/g,
    (sign) => '%' + sign.charCodeAt(0).toString(16),
  )
  return `${inline ? 'inline' : 'attachment'}; filename="${plain}"; filename*=UTF-8''${whole}`
}
