import type { Assessment } from '@shared/schemas/assessment.ts'
import type { ProcedureRecord, Revision } from '@shared/schemas/records.ts'
import type { Tenant } from '../config/database.ts'
import type { Procedure } from '../models/procedure.ts'
import type { ProcedureRevision } from '../models/procedure-revision.ts'
import type { Signature } from '../models/signature.ts'
import { revisionActions, type Actor } from '../policies/index.ts'
import { peopleRefs, type PersonRef } from '../services/people-refs.ts'
import { rows } from '../services/query.ts'
import { linkedCoupons } from '../services/revision-links.ts'
import { signaturesOf } from '../services/signing.ts'

export const presentSignature = ({ id, personId, personName, role, meaning, statement, reason, contentSha256, signedAt }: Signature): Revision['signatures'][number] => ({
  id,
  person: { id: personId, name: personName },
  role,
  meaning,
  statement,
  reason,
  contentSha256,
  signedAt: signedAt.toISOString(),
})

export const presentSummary = (revision: ProcedureRevision, person: (id: string) => PersonRef): ProcedureRecord['revisions'][number] => ({
  id: revision.id,
  revision: revision.revision,
  state: revision.state,
  author: person(revision.authorId),
  createdAt: revision.createdAt.toISOString(),
  updatedAt: revision.updatedAt.toISOString(),
  decidedAt: revision.decidedAt?.toISOString() ?? null,
})

/** What the person may do with this revision now, beyond what their roles and its state allow in general. */
async function actionsFor(tenant: Tenant, actor: Actor, revision: ProcedureRevision, signed: boolean): Promise<string[]> {
  const [facts] = await rows<{ later: boolean; tied: boolean }>(
    tenant,
    `select exists (select from procedure_revisions r where r.organization_id = $organizationId and r.procedure_id = $procedureId and r.ordinal > $ordinal and r.state <> 'withdrawn') as later,
            exists (select from coupons c where c.organization_id = $organizationId and c.revision_id = $id) as tied`,
    { organizationId: tenant.organizationId, procedureId: revision.procedureId, ordinal: revision.ordinal, id: revision.id },
  )
  const may = revisionActions(actor, { state: revision.state, authorId: revision.authorId, isLatest: !facts?.later })
  return may.filter((action) => {
    if (action === 'approve') return !revision.contributors.includes(actor.id)
    // History stays: a draft that was under review, or that a coupon was opened against, is not discarded.
    if (action === 'discard') return !signed && !facts?.tied
    return true
  })
}

/** A revision whole, with what the person who asks may do with it. */
export async function presentRevision(tenant: Tenant, actor: Actor, revision: ProcedureRevision): Promise<Revision> {
  const signatures = await signaturesOf(tenant, { revisionId: revision.id })
  const coupons = await linkedCoupons(tenant, revision.id)
  const person = await peopleRefs(tenant, [revision.authorId])
  return {
    ...presentSummary(revision, person),
    procedureId: revision.procedureId,
    number: revision.number,
    version: revision.version,
    content: revision.content,
    coupons: coupons.map(({ id, number, title, state }) => ({ id, number, title, status: state })),
    signatures: signatures.map(presentSignature),
    deviationReason: revision.deviationReason ?? null,
    contentSha256: revision.contentSha256,
    may: await actionsFor(tenant, actor, revision, signatures.length > 0),
  }
}

export async function presentProcedure(tenant: Tenant, procedure: Procedure, revisions: readonly ProcedureRevision[]): Promise<ProcedureRecord> {
  const person = await peopleRefs(tenant, revisions.map(({ authorId }) => authorId))
  return { id: procedure.id, number: procedure.number, revisions: revisions.map((revision) => presentSummary(revision, person)) }
}

export const presentAssessment = (revision: ProcedureRevision, assessments: Assessment[]) => ({ revisionId: revision.id, assessments })
