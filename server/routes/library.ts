import type { Router } from 'express'
import { createLibraryItem, removeLibraryItem, saveLibraryItem, usesOf } from '../services/library-own.ts'
import { listLibrary, readLibraryItem } from '../services/library.ts'
import { route, type Services } from './mount.ts'

/** Base metals, filler metals, gases, positions and processes; the organization's own rows among them. */
export function libraryRoutes(router: Router, services: Services): void {
  route(router, services, 'listLibrary', ({ params, query, tenant }) => listLibrary(tenant, params.kind, query))
  route(router, services, 'readLibraryItem', ({ params, tenant }) => readLibraryItem(tenant, params.kind, params.id))
  route(router, services, 'listLibraryUses', async ({ params, tenant }) => ({ items: await usesOf(tenant, await readLibraryItem(tenant, params.kind, params.id)) }))
  route(router, services, 'createLibraryItem', ({ body, tenant }) => createLibraryItem(tenant, body))
  route(router, services, 'saveLibraryItem', ({ params, body, ifMatch, tenant }) => saveLibraryItem(tenant, params.kind, params.id, ifMatch, body))
  route(router, services, 'removeLibraryItem', ({ params, ifMatch, tenant }) => removeLibraryItem(tenant, params.kind, params.id, ifMatch))
}
