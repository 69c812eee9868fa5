import type { Assessment, Finding } from '@shared/schemas/assessment.ts'
import type { ProcedureContent } from '@shared/schemas/welding.ts'
import type { Tenant } from '../config/database.ts'
import { forbidden, unprocessable } from '../middleware/problem.ts'
import { ProcedureRevision } from '../models/procedure-revision.ts'
import type { Actor } from '../policies/index.ts'
import type { Services } from '../routes/mount.ts'
import { assessRevision } from './revision-links.ts'
import { nameOf, revisionForAct } from './revisions.ts'
import { actingRole, addSignature, confirmPassword } from './signing.ts'

interface Signing { address: string; password: string }
type FieldError = { field: string; message: string }

/** What a draft needs before somebody is asked to review it; what the standard says of it is for the reviewer to see. */
function lackingForReview({ variables }: ProcedureContent): FieldError[] {
  const { a } = variables.baseMetals
  const lacking: FieldError[] = []
  if (!a.grade && !a.specification && !a.pNumber) lacking.push({ field: 'content.variables.baseMetals.a', message: 'Name the base metal, e.g. A516 Gr. 70.' })
  const { thickness } = variables
  if (!thickness || (!thickness.all && !thickness.min && !thickness.max)) lacking.push({ field: 'content.variables.thickness', message: 'Give the base metal thickness, e.g. 5-20 mm.' })
  variables.processes.forEach(({ process, filler, positions }, index) => {
    const field = `content.variables.processes.${index}`
    if (!process) lacking.push({ field: `${field}.process`, message: 'Choose the welding process, e.g. GMAW.' })
    if (filler.added !== false && !filler.classification && !filler.fNumber) lacking.push({ field: `${field}.filler`, message: 'Name the filler metal, e.g. E7018, or say that none is added.' })
    if (positions.length === 0) lacking.push({ field: `${field}.positions`, message: 'Choose the positions, e.g. 1G and 2G.' })
  })
  return lacking
}

const listed = (errors: readonly FieldError[]): string => errors.map(({ message }) => message).join(' ')

/** Sends a draft for review; the act is signed as its author's. @throws HttpProblem 409, 422 with what is lacking */
export async function submitRevision(tenant: Tenant, actor: Actor, id: string, version: number): Promise<ProcedureRevision> {
  const revision = await revisionForAct(tenant, actor, id, version, 'draft', 'submitted')
  const lacking = lackingForReview(revision.content)
  if (lacking.length > 0) throw unprocessable('Not ready for review', `${nameOf(revision)} still lacks ${lacking.length === 1 ? 'one thing' : `${lacking.length} things`}. ${listed(lacking)}`, lacking)
  const now = new Date()
  await revision.update({ state: 'in-review', version: version + 1, submittedAt: now, updatedAt: now }, { transaction: tenant.transaction })
  await addSignature(tenant, { actor, role: actingRole(actor, 'procedures.submit'), meaning: 'authored', record: nameOf(revision), of: { revisionId: id }, contentSha256: revision.contentSha256 })
  return revision
}

/** Gives a revision under review back to its author, with what should change. */
export async function returnRevision(tenant: Tenant, actor: Actor, id: string, version: number, comment: string): Promise<ProcedureRevision> {
  const revision = await revisionForAct(tenant, actor, id, version, 'in-review', 'returned')
  await revision.update({ state: 'draft', version: version + 1, updatedAt: new Date() }, { transaction: tenant.transaction })
  await addSignature(tenant, { actor, role: actingRole(actor, 'procedures.approve'), meaning: 'returned', record: nameOf(revision), of: { revisionId: id }, contentSha256: revision.contentSha256, reason: comment })
  return revision
}

const counts = ({ class: kind, verdict }: Finding): boolean => verdict !== 'within' && (kind === 'essential' || kind === 'supplementary')

/** Findings that stand in the way of an approval without a reason. */
const blockingFindings = (assessments: readonly Assessment[]): Finding[] =>
  assessments.filter(({ verdict }) => verdict !== 'within').flatMap(({ findings }) => findings.filter(counts))

const SHOWN = 50
const asErrors = (findings: readonly Finding[]): FieldError[] => findings.slice(0, SHOWN).map(({ field, sentence }) => ({ field: field === 'supportingCoupons' ? 'content.supportingCoupons' : `content.variables.${field}`, message: sentence }))

/**
 * Approves a revision by signature: from here on its content stands still, and the revision approved before is superseded.
 * @throws HttpProblem 403 to whoever wrote any of it; 409; 422 for a wrong password, or with the findings that want a reason
 */
export async function approveRevision(services: Services, tenant: Tenant, actor: Actor, id: string, version: number, { password, address, deviationReason }: Signing & { deviationReason: string | null }): Promise<ProcedureRevision> {
  const { organizationId, transaction } = tenant
  const revision = await revisionForAct(tenant, actor, id, version, 'in-review', 'approved')
  if (revision.authorId === actor.id || revision.contributors.includes(actor.id)) {
    throw forbidden(`You wrote on ${nameOf(revision)}, so somebody else has to approve it. Ask another supervisor.`)
  }
  await confirmPassword(services, tenant, actor, address, password)
  const blocking = blockingFindings(await assessRevision(tenant, revision))
  if (blocking.length > 0 && !deviationReason) {
    throw unprocessable('A reason is needed', `${blocking.length === 1 ? 'One finding is' : `${blocking.length} findings are`} outside, or cannot be told. Give the reason for approving all the same, or return the draft. ${listed(asErrors(blocking).slice(0, 5))}`, asErrors(blocking))
  }
  const now = new Date()
  await ProcedureRevision.update({ state: 'superseded', updatedAt: now }, { where: { organizationId, procedureId: revision.procedureId, state: 'approved' }, transaction })
  await revision.update({ state: 'approved', version: version + 1, deviationReason: blocking.length > 0 ? deviationReason : null, decidedAt: now, updatedAt: now }, { transaction })
  await addSignature(tenant, { actor, role: actingRole(actor, 'procedures.approve'), meaning: 'approved', record: nameOf(revision), of: { revisionId: id }, contentSha256: revision.contentSha256, reason: revision.deviationReason, deviations: blocking.length })
  return revision
}

/** Takes an approved revision out of use by signature, with the reason. */
export async function withdrawRevision(services: Services, tenant: Tenant, actor: Actor, id: string, version: number, { password, address, reason }: Signing & { reason: string }): Promise<ProcedureRevision> {
  const revision = await revisionForAct(tenant, actor, id, version, 'approved', 'withdrawn')
  await confirmPassword(services, tenant, actor, address, password)
  await revision.update({ state: 'withdrawn', version: version + 1, updatedAt: new Date() }, { transaction: tenant.transaction })
  await addSignature(tenant, { actor, role: actingRole(actor, 'procedures.approve'), meaning: 'withdrawn', record: nameOf(revision), of: { revisionId: id }, contentSha256: revision.contentSha256, reason })
  return revision
}
