import { compareContent, type FieldChange } from '@shared/comparison/compare.ts'
import type { Tenant } from '../config/database.ts'
import { notFound } from '../middleware/problem.ts'
import { ProcedureRevision } from '../models/procedure-revision.ts'
import { rows } from './query.ts'

/** The revision that a comparison starts from: the named one of the same procedure, else the approved one, else the one before. */
async function comparedWith({ organizationId, transaction }: Tenant, revision: ProcedureRevision, against: string | undefined): Promise<ProcedureRevision | null> {
  const { procedureId } = revision
  if (against !== undefined) {
    const named = await ProcedureRevision.findOne({ where: { organizationId, procedureId, id: against }, transaction })
    if (!named) throw notFound('revision of this procedure')
    return named
  }
  const others = await ProcedureRevision.findAll({ where: { organizationId, procedureId }, order: [['ordinal', 'DESC']], transaction })
  return others.find(({ state, id }) => state === 'approved' && id !== revision.id) ?? others.find(({ ordinal }) => ordinal < revision.ordinal) ?? null
}

/** Coupons are known to people by their numbers. */
async function withCouponNumbers(tenant: Tenant, changes: readonly FieldChange[], ids: readonly string[]): Promise<FieldChange[]> {
  const found = await rows<{ id: string; number: string }>(tenant, 'select id, number from coupons where organization_id = $organizationId and id = any($ids::uuid[])', { organizationId: tenant.organizationId, ids })
  const named = (text: string | null) => found.reduce((said, { id, number }) => said?.replaceAll(id, number) ?? null, text)
  return changes.map((change) => (change.field === 'supportingCoupons' ? { ...change, before: named(change.before), after: named(change.after) } : change))
}

export interface RevisionComparison { from: ProcedureRevision | null; to: ProcedureRevision; changes: FieldChange[] }

/**
 * What changed in a revision since another one. Without an earlier one there is nothing to compare: `from` is null, no changes.
 * @param against id of a revision of the same procedure; left out, the approved one or else the one before
 * @throws HttpProblem 404 when `against` is none of this procedure's
 */
export async function compareRevision(tenant: Tenant, to: ProcedureRevision, against?: string): Promise<RevisionComparison> {
  const from = await comparedWith(tenant, to, against)
  if (!from) return { from, to, changes: [] }
  const changes = compareContent(from.content, to.content)
  return { from, to, changes: await withCouponNumbers(tenant, changes, [...from.content.supportingCoupons, ...to.content.supportingCoupons]) }
}
