import type { Router } from 'express'
import { assess } from '@shared/assessment/assess.ts'
import { route, type Services } from './mount.ts'

/** Judging without storing: for tests, imports and other programs. */
export function assessmentRoutes(router: Router, services: Services): void {
  route(router, services, 'assess', ({ body }) => Promise.resolve(assess(body)))
}
