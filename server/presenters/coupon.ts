import type { Coupon as CouponRecord } from '@shared/schemas/records.ts'
import type { Tenant } from '../config/database.ts'
import type { Coupon } from '../models/coupon.ts'
import { ProcedureRevision } from '../models/procedure-revision.ts'
import { couponActions, type Actor } from '../policies/index.ts'
import { peopleRefs } from '../services/people-refs.ts'
import { signaturesOf } from '../services/signing.ts'
import { presentSignature } from './revision.ts'

/** A coupon whole, with what the person who asks may do with it. */
export async function presentCoupon(tenant: Tenant, actor: Actor, coupon: Coupon): Promise<CouponRecord> {
  const { organizationId, transaction } = tenant
  const revision = coupon.revisionId === null ? null : await ProcedureRevision.findOne({ where: { organizationId, id: coupon.revisionId }, attributes: ['procedureId', 'number'], transaction })
  const person = await peopleRefs(tenant, [coupon.inspectorId])
  const may = couponActions(actor, { state: coupon.state })
  return {
    id: coupon.id,
    number: coupon.number,
    state: coupon.state,
    revisionId: coupon.revisionId,
    procedureId: revision?.procedureId ?? null,
    procedureNumber: revision?.number ?? null,
    inspector: person(coupon.inspectorId),
    version: coupon.version,
    createdAt: coupon.createdAt.toISOString(),
    updatedAt: coupon.updatedAt.toISOString(),
    content: coupon.content,
    signatures: (await signaturesOf(tenant, { couponId: coupon.id })).map(presentSignature),
    contentSha256: coupon.contentSha256,
    // Only tested coupons are certified; before that the button would always refuse.
    may: may.filter((action) => action !== 'certify' || coupon.state === 'testing'),
  }
}
