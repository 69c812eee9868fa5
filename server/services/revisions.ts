import type { ProcedureContent } from '@shared/schemas/welding.ts'
import type { RevisionState } from '@shared/schemas/records.ts'
import { revisionLetter } from '@shared/records/revision-letters.ts'
import { revisionName } from '@shared/records/statements.ts'
import type { Tenant } from '../config/database.ts'
import { conflict, HttpProblem, notFound } from '../middleware/problem.ts'
import { Coupon } from '../models/coupon.ts'
import { Procedure } from '../models/procedure.ts'
import { ProcedureRevision } from '../models/procedure-revision.ts'
import { Trial } from '../models/trial.ts'
import type { Actor } from '../policies/index.ts'
import { presentRevision } from '../presenters/revision.ts'
import { nextNumber } from './number-series.ts'
import { projectionsOf } from './projections.ts'
import { replaceLinks } from './revision-links.ts'
import { contentHash, signaturesOf } from './signing.ts'

export const nameOf = ({ number, revision }: Pick<ProcedureRevision, 'number' | 'revision'>): string => revisionName(number, revision)

const contentColumns = (content: ProcedureContent) => ({ content, contentSha256: contentHash(content), ...projectionsOf(content.title, content.variables) })

/** @throws HttpProblem 404 also for another organization's */
export async function findRevision({ organizationId, transaction }: Tenant, id: string, { lock = false } = {}): Promise<ProcedureRevision> {
  const revision = await ProcedureRevision.findOne({ where: { organizationId, id }, transaction, lock })
  if (!revision) throw notFound('revision')
  return revision
}

/** A state in which the act is not possible; carries the record as it is now. */
async function wrongState(tenant: Tenant, actor: Actor, revision: ProcedureRevision, act: string): Promise<HttpProblem> {
  const state = revision.state.replace('-', ' ')
  return new HttpProblem(409, 'Not in this state', `${nameOf(revision)} is ${state}, so it cannot be ${act}. Open it again to see where it stands.`, { current: await presentRevision(tenant, actor, revision) })
}

/**
 * Locks a revision for an act on the version that the person read.
 * @throws HttpProblem 404; 409 with the stored record when it is in another state or somebody saved since
 */
export async function revisionForAct(tenant: Tenant, actor: Actor, id: string, version: number, state: RevisionState, act: string): Promise<ProcedureRevision> {
  const revision = await findRevision(tenant, id, { lock: true })
  if (revision.state !== state) throw await wrongState(tenant, actor, revision, act)
  if (revision.version !== version) {
    throw conflict(`${nameOf(revision)} was saved by somebody else since you opened it (version ${revision.version}, yours is ${version}). Read it again before it is ${act}.`, await presentRevision(tenant, actor, revision))
  }
  return revision
}

/** Starts a procedure with its first revision, A. */
export async function createProcedure(tenant: Tenant, actor: Actor, content: ProcedureContent): Promise<ProcedureRevision> {
  const { organizationId, transaction } = tenant
  const number = await nextNumber(tenant, 'procedures')
  const procedure = await Procedure.create({ organizationId, number, createdBy: actor.id }, { transaction })
  return addRevision(tenant, actor, procedure, 1, content)
}

async function addRevision(tenant: Tenant, actor: Actor, procedure: Procedure, ordinal: number, content: ProcedureContent): Promise<ProcedureRevision> {
  const { organizationId, transaction } = tenant
  const revision = await ProcedureRevision.create(
    { organizationId, procedureId: procedure.id, number: procedure.number, revision: revisionLetter(ordinal), ordinal, state: 'draft', authorId: actor.id, contributors: [actor.id], ...contentColumns(content) },
    { transaction },
  )
  await replaceLinks(tenant, revision.id, content.supportingCoupons)
  return revision
}

/**
 * Saves a draft.
 * @throws HttpProblem 409 whose `current` is the stored revision with `sent` beside it, when somebody saved first
 */
export async function saveRevision(tenant: Tenant, actor: Actor, id: string, version: number, content: ProcedureContent): Promise<ProcedureRevision> {
  const revision = await findRevision(tenant, id, { lock: true })
  if (revision.state !== 'draft') throw await wrongState(tenant, actor, revision, 'saved')
  if (revision.version !== version) {
    const current = { ...(await presentRevision(tenant, actor, revision)), sent: content }
    throw conflict(`${nameOf(revision)} was saved by somebody else since you opened it (version ${revision.version}, yours is ${version}). Nothing of yours is lost: compare the two and save again.`, current)
  }
  await replaceLinks(tenant, id, content.supportingCoupons)
  const contributors = revision.contributors.includes(actor.id) ? revision.contributors : [...revision.contributors, actor.id]
  return revision.update({ ...contentColumns(content), contributors, version: version + 1, updatedAt: new Date() }, { transaction: tenant.transaction })
}

/** The next revision, a copy of the approved one. @throws HttpProblem 409 when none is approved or one is open already */
export async function reviseProcedure(tenant: Tenant, actor: Actor, procedureId: string): Promise<ProcedureRevision> {
  const { organizationId, transaction } = tenant
  const procedure = await Procedure.findOne({ where: { organizationId, id: procedureId }, transaction, lock: true })
  if (!procedure) throw notFound('procedure')
  const revisions = await ProcedureRevision.findAll({ where: { organizationId, procedureId }, order: [['ordinal', 'ASC']], transaction })
  const open = revisions.find(({ state }) => state === 'draft' || state === 'in-review')
  if (open) throw new HttpProblem(409, 'A revision is open already', `${nameOf(open)} is ${open.state.replace('-', ' ')}. Finish it, or discard it, before the next one is opened.`, { current: await presentRevision(tenant, actor, open) })
  const approved = revisions.find(({ state }) => state === 'approved')
  if (!approved) throw new HttpProblem(409, 'Nothing to revise', `${procedure.number} has no approved revision to start from.`)
  const last = revisions.at(-1)?.ordinal ?? 0
  return addRevision(tenant, actor, procedure, last + 1, approved.content)
}

/** Removes a draft that has no history; with its only revision the procedure goes too, and its number is not given again. */
export async function discardRevision(tenant: Tenant, actor: Actor, id: string, version: number): Promise<void> {
  const { organizationId, transaction } = tenant
  const revision = await revisionForAct(tenant, actor, id, version, 'draft', 'discarded')
  if ((await signaturesOf(tenant, { revisionId: id })).length > 0) throw new HttpProblem(409, 'It has a history', `${nameOf(revision)} has been under review, so it stays on record. Change it and submit it again.`)
  const coupon = await Coupon.findOne({ where: { organizationId, revisionId: id }, attributes: ['number'], transaction })
  if (coupon) throw new HttpProblem(409, 'A coupon belongs to it', `${coupon.number} was opened against ${nameOf(revision)}, so the draft stays on record.`)
  const used = await ProcedureRevision.count({ where: { organizationId, procedureId: revision.procedureId }, transaction })
  await revision.destroy({ transaction })
  if (used !== 1) return
  // A trial that it came of may be promoted anew.
  await Trial.update({ procedureId: null }, { where: { organizationId, procedureId: revision.procedureId }, transaction })
  await Procedure.destroy({ where: { organizationId, id: revision.procedureId }, transaction })
}

/** A procedure and all its revisions, oldest first. @throws HttpProblem 404 */
export async function readProcedure({ organizationId, transaction }: Tenant, id: string): Promise<{ procedure: Procedure; revisions: ProcedureRevision[] }> {
  const procedure = await Procedure.findOne({ where: { organizationId, id }, transaction })
  if (!procedure) throw notFound('procedure')
  return { procedure, revisions: await ProcedureRevision.findAll({ where: { organizationId, procedureId: id }, order: [['ordinal', 'ASC']], transaction }) }
}
