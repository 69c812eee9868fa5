import { revisionImpact } from '@shared/assessment/impact.ts'
import type { RevisionImpacts } from '@shared/schemas/standards.ts'
import type { Tenant } from '../config/database.ts'
import type { ProcedureRevision } from '../models/procedure-revision.ts'
import { compareRevision } from './revision-comparison.ts'
import { asAssessed, linkedCoupons } from './revision-links.ts'

/**
 * What a revision means under each standard that it names: every change with its class, and whether the coupons linked now cover it.
 * Without an earlier revision there is nothing to compare: `from` is null, no impacts.
 * @throws HttpProblem 404 when `against` is none of this procedure's
 */
export async function impactOfRevision(tenant: Tenant, revision: ProcedureRevision, against?: string): Promise<RevisionImpacts> {
  const { from, to, changes } = await compareRevision(tenant, revision, against)
  if (!from) return { revisionId: to.id, from: null, impacts: [] }
  const coupons = (await linkedCoupons(tenant, to.id)).map(asAssessed)
  const impacts = to.content.variables.standards.map(({ standard, edition, level, route }) => revisionImpact({ before: from.content, after: to.content, standard, edition, level, route, coupons, changes }))
  return { revisionId: to.id, from: { id: from.id, revision: from.revision }, impacts }
}
