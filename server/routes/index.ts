import type { Router } from 'express'
import type { Authenticate } from '../middleware/session.ts'
import type { Services } from './mount.ts'
import { outboxRoutes } from './outbox.ts'
import { peopleRoutes } from './people.ts'
import { sessionRoutes } from './session.ts'

/** Every resource of the API. A new one is a file beside this one and a line here. */
const resources: readonly ((router: Router, services: Services) => void)[] = [peopleRoutes, outboxRoutes]

export function resourceRoutes(router: Router, services: Services, authenticate: Authenticate): void {
  sessionRoutes(router, services, authenticate)
  for (const mount of resources) mount(router, services)
}
