import type { Router } from 'express'
import { apiDocument } from '../openapi/document.ts'
import { apiPage } from '../openapi/page.ts'

/** The API's description, as data and for reading. Made at the first request, as most processes are never asked. */
export function docsRoutes(router: Router): void {
  let made: { json: string; html: string } | undefined
  const docs = (): { json: string; html: string } => {
    if (!made) {
      const document = apiDocument()
      made = { json: JSON.stringify(document), html: apiPage(document) }
    }
    return made
  }
  router.get('/openapi.json', (_req, res) => {
    res.type('application/json').send(docs().json)
  })
  router.get('/docs', (_req, res) => {
    res.type('text/html').send(docs().html)
  })
}
