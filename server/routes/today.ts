import type { Router } from 'express'
import { readToday } from '../services/today.ts'
import { route, type Services } from './mount.ts'

/** What waits for the person who asks. */
export function todayRoutes(router: Router, services: Services): void {
  route(router, services, 'readToday', ({ actor, tenant }) => readToday(tenant, actor))
}
