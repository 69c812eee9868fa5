import { existsSync } from 'node:fs'
import path from 'node:path'
import express, { type Router } from 'express'
import { notFound } from '../middleware/problem.ts'

const YEAR = 31_536_000

/**
 * The built client. Files below `assets` carry a hash in their name and never change; everything else is asked for anew.
 * Any other address is a page of the client, which shows its own "not found".
 */
export function clientRoutes(router: Router, directory: string): void {
  const index = path.join(directory, 'index.html')
  router.use(
    express.static(directory, {
      index: false,
      setHeaders: (res, file) => {
        const hashed = path.relative(directory, file).startsWith(`assets${path.sep}`)
        res.set('Cache-Control', hashed ? `public, max-age=${YEAR}, immutable` : 'no-cache')
      },
    }),
  )
  router.get('/{*path}', (req, res, next) => {
    // A file that is missing must not come back as a page.
    if (!existsSync(index) || path.extname(req.path) !== '') {
      next(notFound('page'))
      return
    }
    res.set('Cache-Control', 'no-cache').sendFile(index)
  })
}
