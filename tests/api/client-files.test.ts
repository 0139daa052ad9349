import { mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Express } from 'express'
import { startApplication } from '../helpers/application'
import { stranger } from '../helpers/client'

let clientDir: string
let app: Express
let stop: () => Promise<void>

beforeAll(async () => {
  // A folder whose name begins with a dot is nothing to hide from.
  clientDir = join(await mkdtemp(join(tmpdir(), 'listel-client-')), '.client')
  await mkdir(join(clientDir, 'assets'), { recursive: true })
  await writeFile(join(clientDir, 'index.html'), '<!doctype html><title>Listel</title>')
  await writeFile(join(clientDir, 'assets', 'page-1a2b3c.js'), 'export {}')
  await writeFile(join(clientDir, 'mark.svg'), '<svg xmlns="http://www.w3.org/2000/svg"/>')
  const started = await startApplication({ clientDir })
  app = started.app
  stop = started.stop
})
afterAll(async () => {
  await stop()
  await rm(join(clientDir, '..'), { recursive: true, force: true })
})

const get = (path: string) => stranger(app).agent.get(path)

describe('the client', () => {
  it.each(['/', '/commissions', '/commissions/0192-whatever/section', '/link/a.b-c'])(
    'is one page at every address of its own: %s',
    async (path) => {
      const answer = await get(path)
      expect(answer.status).toBe(200)
      expect(answer.text).toContain('<title>Listel</title>')
      expect(answer.get('Cache-Control')).toBe('no-store')
    },
  )

  it('has assets that are kept for good, and other files that are asked for anew', async () => {
    const asset = await get('/assets/page-1a2b3c.js')
    expect(asset.get('Cache-Control')).toBe('public, max-age=31536000, immutable')
    expect((await get('/mark.svg')).get('Cache-Control')).toBe('no-cache')
  })

  it.each(['/assets/gone.js', '/api/gone', '/assets/../../secret'])('answers 404 for %s', async (path) => {
    const answer = await get(path)
    expect(answer.status).toBe(404)
    expect(answer.body.error.code).toBe('not-found')
  })

  it('may load nothing from elsewhere, run nothing inline and be framed by nobody', async () => {
    const policy = (await get('/')).get('Content-Security-Policy') ?? ''
    expect(policy).toContain("default-src 'self'")
    expect(policy).toContain("script-src 'self' 'wasm-unsafe-eval';")
    expect(policy).toContain("frame-ancestors 'none'")
    expect(policy).toContain("object-src 'none'")
    expect(policy).not.toContain('upgrade-insecure-requests')
    expect((await get('/')).get('X-Powered-By')).toBeUndefined()
  })

  it('says who is alive and who is ready', async () => {
    expect((await stranger(app).get('/health')).body).toEqual({ alive: true })
    expect((await stranger(app).get('/ready')).body).toEqual({ ready: true })
  })
})
