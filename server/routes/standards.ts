import type { Router } from 'express'
import { sideBySide } from '@shared/assessment/side-by-side.ts'
import { standardDetail, standardRow } from '@shared/standards/catalogue.ts'
import { getStandard, standards } from '@shared/standards/index.ts'
import { notFound } from '../middleware/problem.ts'
import { findCoupon } from '../services/coupons.ts'
import { impactOfRevision } from '../services/revision-impact.ts'
import { asAssessed, certifiedCoupons } from '../services/revision-links.ts'
import { findRevision } from '../services/revisions.ts'
import { route, type Services } from './mount.ts'

/** The standards as the program keeps them, and records seen through them. */
export function standardRoutes(router: Router, services: Services): void {
  route(router, services, 'listStandards', () => Promise.resolve({ items: standards.map(standardRow) }))
  route(router, services, 'readStandard', ({ params }) => {
    const standard = getStandard(params.id)
    return standard ? Promise.resolve(standardDetail(standard)) : Promise.reject(notFound('standard whose rules are kept'))
  })
  route(router, services, 'impactOfRevision', async ({ params, query, tenant }) => impactOfRevision(tenant, await findRevision(tenant, params.id), query.against))
  route(router, services, 'qualifyUnderAllStandards', async ({ params, tenant }) => sideBySide(asAssessed(await findCoupon(tenant, params.id))))
  route(router, services, 'listCertifiedCoupons', async ({ query, tenant }) => ({ items: await certifiedCoupons(tenant, query.process, query.limit) }))
}
