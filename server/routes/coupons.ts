import type { Router } from 'express'
import { presentCoupon } from '../presenters/coupon.ts'
import { listCoupons } from '../services/coupon-list.ts'
import { certifyCoupon, createCoupon, findCoupon, qualificationsOf, rejectCoupon, saveCoupon } from '../services/coupons.ts'
import { mailCoupon } from '../services/document-mail.ts'
import { printCoupon } from '../services/documents.ts'
import { FileAnswer } from './file-answer.ts'
import { route, type Services } from './mount.ts'

/** Coupons and the qualification records made of them. */
export function couponRoutes(router: Router, services: Services): void {
  route(router, services, 'listCoupons', ({ query, tenant }) => listCoupons(tenant, query))
  route(router, services, 'createCoupon', async ({ body, actor, tenant }) => presentCoupon(tenant, actor, await createCoupon(tenant, actor, body)))
  route(router, services, 'readCoupon', async ({ params, actor, tenant }) => presentCoupon(tenant, actor, await findCoupon(tenant, params.id)))
  route(router, services, 'saveCoupon', async ({ params, body, ifMatch, actor, tenant }) => presentCoupon(tenant, actor, await saveCoupon(tenant, actor, params.id, ifMatch, body.content)))
  route(router, services, 'qualifyCoupon', async ({ params, tenant }) => {
    const coupon = await findCoupon(tenant, params.id)
    return { couponId: coupon.id, qualifications: qualificationsOf(coupon) }
  })
  route(router, services, 'certifyCoupon', async ({ params, body, ifMatch, actor, tenant, req }) =>
    presentCoupon(tenant, actor, await certifyCoupon(services, tenant, actor, params.id, ifMatch, { ...body, address: req.ip ?? '' })))
  route(router, services, 'rejectCoupon', async ({ params, body, ifMatch, actor, tenant, req }) =>
    presentCoupon(tenant, actor, await rejectCoupon(services, tenant, actor, params.id, ifMatch, { ...body, address: req.ip ?? '' })))
  route(router, services, 'printCoupon', async ({ params, query, tenant }) => {
    const { bytes, name, sha256 } = await printCoupon(services, tenant, await findCoupon(tenant, params.id), query)
    return new FileAnswer({ bytes, mediaType: 'application/pdf', name, how: 'inline', sha256 })
  })
  route(router, services, 'mailCoupon', async ({ params, body, actor, tenant }) => mailCoupon(services, tenant, actor, await findCoupon(tenant, params.id), body))
}
