import type { Router } from 'express'
import type { Authenticate } from '../middleware/session.ts'
import type { Services } from './mount.ts'
import { arcDataRoutes } from './arc-data.ts'
import { assessmentRoutes } from './assessments.ts'
import { couponRoutes } from './coupons.ts'
import { heatRoutes } from './heats.ts'
import { jobRoutes } from './jobs.ts'
import { libraryRoutes } from './library.ts'
import { lookupRoutes } from './lookup.ts'
import { machineRoutes } from './machines.ts'
import { outboxRoutes } from './outbox.ts'
import { peopleRoutes } from './people.ts'
import { photoRoutes } from './photos.ts'
import { procedureRoutes } from './procedures.ts'
import { sessionRoutes } from './session.ts'
import { standardRoutes } from './standards.ts'
import { todayRoutes } from './today.ts'
import { trialRoutes } from './trials.ts'

/** Every resource of the API. A new one is a file beside this one and a line here. */
const resources: readonly ((router: Router, services: Services) => void)[] = [todayRoutes, libraryRoutes, heatRoutes, procedureRoutes, couponRoutes, photoRoutes, jobRoutes, arcDataRoutes, machineRoutes, trialRoutes, lookupRoutes, standardRoutes, assessmentRoutes, peopleRoutes, outboxRoutes]

export function resourceRoutes(router: Router, services: Services, authenticate: Authenticate): void {
  sessionRoutes(router, services, authenticate)
  for (const mount of resources) mount(router, services)
}
