import type { Router } from 'express'
import { listLibrary, readLibraryItem } from '../services/library.ts'
import { route, type Services } from './mount.ts'

/** Base metals, filler metals, gases, positions and processes. */
export function libraryRoutes(router: Router, services: Services): void {
  route(router, services, 'listLibrary', ({ params, query, tenant }) => listLibrary(tenant, params.kind, query))
  route(router, services, 'readLibraryItem', ({ params, tenant }) => readLibraryItem(tenant, params.kind, params.id))
}
