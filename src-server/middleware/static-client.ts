import { join, sep } from 'node:path'
import express, { Router } from 'express'

/** The built client: assets named by their contents are kept for good, everything else is asked for anew. */
export function staticClient(clientDir: string): Router {
  const assets = join(clientDir, 'assets') + sep
  const router = Router()
  router.use(
    express.static(clientDir, {
      index: false,
      setHeaders: (response, path) => {
        const isAsset = path.startsWith(assets)
        response.set('Cache-Control', isAsset ? 'public, max-age=31536000, immutable' : 'no-cache')
      },
    }),
  )
  // Every other address is a page of the client, which finds its own way; a missing asset is just missing.
  router.get('/{*rest}', (request, response, next) => {
    if (request.path.startsWith('/assets/')) return next()
    response.set('Cache-Control', 'no-store').sendFile('index.html', { root: clientDir })
  })
  return router
}
