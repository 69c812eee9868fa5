import type { AssessedCoupon, Assessment } from '@shared/schemas/assessment.ts'
import { assess } from '@shared/assessment/assess.ts'
import type { CouponState } from '@shared/schemas/records.ts'
import type { CouponContent } from '@shared/schemas/welding.ts'
import type { Tenant } from '../config/database.ts'
import { unprocessable } from '../middleware/problem.ts'
import type { ProcedureRevision } from '../models/procedure-revision.ts'
import { rows } from './query.ts'

export interface LinkedCoupon { id: string; number: string; title: string; state: CouponState; content: CouponContent }

/** The coupons that a revision rests on, in the order in which it names them. */
export const linkedCoupons = (tenant: Tenant, revisionId: string): Promise<LinkedCoupon[]> =>
  rows<LinkedCoupon>(
    tenant,
    `select c.id, c.number, c.title, c.state, c.content from revision_coupons l join coupons c on c.organization_id = l.organization_id and c.id = l.coupon_id
     where l.organization_id = $organizationId and l.revision_id = $revisionId order by l.ordinal`,
    { organizationId: tenant.organizationId, revisionId },
  )

/**
 * Makes the links of a draft those that its content names.
 * @throws HttpProblem 422 naming a coupon that is not there (another organization's is not there either)
 */
export async function replaceLinks(tenant: Tenant, revisionId: string, couponIds: readonly string[]): Promise<void> {
  const { organizationId } = tenant
  const wanted = [...new Set(couponIds)]
  const found = wanted.length === 0 ? [] : await rows<{ id: string }>(tenant, 'select id from coupons where organization_id = $organizationId and id = any($wanted::uuid[])', { organizationId, wanted })
  const known = new Set(found.map(({ id }) => id))
  const missing = couponIds.findIndex((id) => !known.has(id))
  if (missing >= 0) {
    throw unprocessable('A coupon is missing', 'A coupon that the procedure names as its support is not there. Take it off the list and save again.', [{ field: `content.supportingCoupons.${missing}`, message: 'There is no such coupon.', value: couponIds[missing] }])
  }
  await rows(tenant, 'delete from revision_coupons where organization_id = $organizationId and revision_id = $revisionId returning coupon_id', { organizationId, revisionId })
  if (wanted.length > 0) {
    await rows(
      tenant,
      `insert into revision_coupons (organization_id, revision_id, coupon_id, ordinal)
       select $organizationId, $revisionId, id, ordinal from unnest($wanted::uuid[]) with ordinality as given (id, ordinal) returning coupon_id`,
      { organizationId, revisionId, wanted },
    )
  }
}

/** A stored coupon as the engine takes it. */
export const asAssessed = ({ id, number, state, content }: Pick<LinkedCoupon, 'id' | 'number' | 'state' | 'content'>): AssessedCoupon => ({ id, number, certified: state === 'certified', content })

/** Newest first; more would only make the answer slow, not the offer better. */
const OFFERED = 50

/** Certified coupons of the same processes that the revision does not name: offered where one would cure a finding. */
const otherCoupons = (tenant: Tenant, revision: ProcedureRevision): Promise<LinkedCoupon[]> =>
  rows<LinkedCoupon>(
    tenant,
    `select id, number, title, state, content from coupons c where organization_id = $organizationId and state = 'certified' and processes && $processes::text[]
     and not exists (select from revision_coupons l where l.revision_id = $revisionId and l.coupon_id = c.id) order by updated_at desc limit ${OFFERED}`,
    { organizationId: tenant.organizationId, processes: revision.processes, revisionId: revision.id },
  )

/** The newest certified coupons of a process, as the engine takes them. */
export async function certifiedCoupons(tenant: Tenant, process: string, limit: number): Promise<AssessedCoupon[]> {
  const found = await rows<LinkedCoupon>(tenant, "select id, number, title, state, content from coupons where organization_id = $organizationId and state = 'certified' and processes && array[$process]::text[] order by updated_at desc, id limit $limit", { organizationId: tenant.organizationId, process, limit })
  return found.map(asAssessed)
}

/** The revision judged by its coupons under each standard that it names. */
export async function assessRevision(tenant: Tenant, revision: ProcedureRevision): Promise<Assessment[]> {
  const coupons = (await linkedCoupons(tenant, revision.id)).map(asAssessed)
  const others = (await otherCoupons(tenant, revision)).map(asAssessed)
  return revision.content.variables.standards.map(({ standard, edition, level, route }) => assess({ procedure: revision.content, coupons, standard, edition, level, route, otherCoupons: others }))
}
