import type { Router } from 'express'
import { lookUp } from '../services/lookup.ts'
import { route, type Services } from './mount.ts'

/** Which approved procedures a joint can be welded by. */
export function lookupRoutes(router: Router, services: Services): void {
  route(router, services, 'lookUp', ({ query, tenant }) => lookUp(tenant, query))
}
