import { rm } from 'node:fs/promises'
import express from 'express'
import type { Request, RequestHandler, Response } from 'express'
import multer, { MulterError, diskStorage } from 'multer'
import { invalid } from '@shared/contracts'
import { Failure } from '@shared/failure'
import { uploadFolder } from '../files/file-store'

const JSON_BYTES = 1024 * 1024
/** Largest photograph taken. */
export const MOST_IMAGE_BYTES = 100 * 1024 * 1024

/** A file that came with a request; it lies in the upload folder until the request is answered. */
export interface Upload {
  readonly path: string
  readonly bytes: number
  /** As the sender called it: not to be trusted. */
  readonly name: string
}

/** Reads a JSON body, at most so many bytes. */
export function readJson(request: Request, response: Response, mostBytes = JSON_BYTES): Promise<unknown> {
  return passed(express.json({ limit: mostBytes }), request, response).then(() => request.body as unknown)
}

export interface UploadLimits {
  readonly mostBytes: number
}

/** Reads a multipart body: one file in the field `file` and JSON about it in the field `about`. */
export async function readUpload(
  request: Request,
  response: Response,
  { mostBytes }: UploadLimits,
): Promise<{ readonly body: unknown; readonly upload: Upload }> {
  const storage = diskStorage({ destination: await uploadFolder() })
  const limits = { fileSize: mostBytes, files: 1, fields: 1, fieldSize: JSON_BYTES, parts: 2 }
  await passed(multer({ storage, limits }).single('file'), request, response).catch((error: unknown) => {
    throw error instanceof MulterError || request.complete ? error : brokenOff(error)
  })
  if (request.file === undefined) {
    throw invalid([{ path: '/file', code: 'missing', says: 'is missing; send a file in the field "file".' }])
  }
  const { path, size, originalname } = request.file
  const upload = { path, bytes: size, name: originalname }
  try {
    return { upload, body: aboutOf(request.body) }
  } catch (error) {
    await dropUpload(upload)
    throw error
  }
}

/** Nobody is there any more to be told; what had come was thrown away. */
const brokenOff = (cause: unknown): Failure =>
  new Failure('input-invalid', { says: 'The upload broke off; send it again.' }, { cause })

/** Throws the file away, unless it was taken into the store. */
export const dropUpload = ({ path }: Upload): Promise<void> => rm(path, { force: true })

function aboutOf(fields: unknown): unknown {
  const about = typeof fields === 'object' && fields !== null && 'about' in fields ? fields.about : undefined
  if (typeof about !== 'string') {
    throw invalid([{ path: '/about', code: 'missing', says: 'is missing; send JSON in the field "about".' }])
  }
  try {
    return JSON.parse(about)
  } catch (error) {
    if (!(error instanceof SyntaxError)) throw error
    throw invalid([{ path: '/about', code: 'not-json', says: `is not JSON: ${error.message}` }])
  }
}

const passed = (handler: RequestHandler, request: Request, response: Response): Promise<void> =>
  new Promise((resolve, reject) => {
    handler(request, response, (error?: unknown) => {
      if (error === undefined) resolve()
      else reject(error)
    })
  })
