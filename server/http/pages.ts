import express, { Router } from 'express'
import { join } from 'node:path'

/** Serves the built client. Named files are kept for ever by browsers; the page itself is asked for anew each time. */
export function pages(folder: string): Router {
  const router = Router()
  router.use('/assets', express.static(join(folder, 'assets'), { immutable: true, maxAge: '1y', index: false, redirect: false }))
  router.use(express.static(folder, { index: false, redirect: false, maxAge: 0 }))
  router.get('/{*path}', (request, response, next) => {
    if (request.path.startsWith('/api') || request.path.startsWith('/assets/')) return next()
    response.setHeader('Cache-Control', 'no-cache')
    response.sendFile('index.html', { root: folder }, (error) => error && next(error))
  })
  return router
}
