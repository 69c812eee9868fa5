import type { Router } from 'express'
import { presentJob } from '../presenters/job.ts'
import { createJob, findJob, listJobs, saveJob } from '../services/jobs.ts'
import { route, type Services } from './mount.ts'

/** Jobs and their joints. */
export function jobRoutes(router: Router, services: Services): void {
  route(router, services, 'listJobs', ({ query, tenant }) => listJobs(tenant, query))
  route(router, services, 'createJob', async ({ body, tenant }) => presentJob(tenant, await createJob(tenant, body)))
  route(router, services, 'readJob', async ({ params, tenant }) => presentJob(tenant, await findJob(tenant, params.id)))
  route(router, services, 'saveJob', async ({ params, body, ifMatch, tenant }) => presentJob(tenant, await saveJob(tenant, params.id, ifMatch, body)))
}
