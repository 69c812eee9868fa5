import type { CouponQualification } from '@shared/schemas/assessment.ts'
import type { CouponContent } from '@shared/schemas/welding.ts'
import { qualifyCoupon } from '@shared/assessment/assess.ts'
import { couponFromProcedure } from '@shared/records/coupon-from-procedure.ts'
import { isOpen, mayMove, openStateOf } from '@shared/records/coupon-states.ts'
import type { Tenant } from '../config/database.ts'
import { conflict, HttpProblem, notFound, unprocessable } from '../middleware/problem.ts'
import { Coupon } from '../models/coupon.ts'
import type { Actor } from '../policies/index.ts'
import { presentCoupon } from '../presenters/coupon.ts'
import type { Services } from '../routes/mount.ts'
import { nextNumber } from './number-series.ts'
import { projectionsOf } from './projections.ts'
import { asAssessed } from './revision-links.ts'
import { findRevision, nameOf } from './revisions.ts'
import { actingRole, addSignature, confirmPassword, contentHash } from './signing.ts'

/** @throws HttpProblem 404 also for another organization's */
export async function findCoupon({ organizationId, transaction }: Tenant, id: string, { lock = false } = {}): Promise<Coupon> {
  const coupon = await Coupon.findOne({ where: { organizationId, id }, transaction, lock })
  if (!coupon) throw notFound('coupon')
  return coupon
}

const contentColumns = (content: CouponContent) => ({
  content,
  contentSha256: contentHash(content),
  weldedOn: content.weldedOn,
  ...projectionsOf(content.title, content.variables),
})

/** Every run-sheet row belongs to a process of the coupon, or its heat input would be counted for none. @throws HttpProblem 422 */
function checkRows(content: CouponContent): void {
  const processes = new Set(content.variables.processes.map(({ id }) => id))
  const errors = content.runSheet.flatMap((row, index) => (processes.has(row.processId) ? [] : [{ field: `content.runSheet.${index}.processId`, message: `Pass ${row.pass} names a process that the coupon does not have.`, value: row.processId }]))
  if (errors.length > 0) throw unprocessable('A pass has no process', `${errors[0]?.message ?? ''} Choose one of the coupon’s processes for it.`, errors)
}

/**
 * Opens a coupon, against a revision (its named variables are copied, measured ones left open) or by itself.
 * @throws HttpProblem 404 for the revision, 409 when that is closed, 422 when neither revision nor content is given
 */
export async function createCoupon(tenant: Tenant, actor: Actor, given: { revisionId: string | null; content: CouponContent | null }): Promise<Coupon> {
  const { organizationId, transaction } = tenant
  const revision = given.revisionId === null ? null : await findRevision(tenant, given.revisionId)
  if (revision && (revision.state === 'superseded' || revision.state === 'withdrawn')) {
    throw new HttpProblem(409, 'That revision is closed', `${nameOf(revision)} is ${revision.state}. Open the coupon against the revision in force, or against a draft.`)
  }
  const content = given.content ?? (revision && couponFromProcedure(revision.content, revision.number))
  if (!content) throw unprocessable('Nothing to weld yet', 'Choose the procedure that the coupon is to support, or say what is welded.', [{ field: 'revisionId', message: 'Choose a procedure revision, or send content.' }])
  checkRows(content)
  const number = await nextNumber(tenant, 'coupons')
  return Coupon.create({ organizationId, number, state: openStateOf(content), revisionId: revision?.id ?? null, inspectorId: actor.id, ...contentColumns(content) }, { transaction })
}

async function closed(tenant: Tenant, actor: Actor, coupon: Coupon, act: string): Promise<HttpProblem> {
  return new HttpProblem(409, 'Not in this state', `${coupon.number} is ${coupon.state}, so it cannot be ${act}.`, { current: await presentCoupon(tenant, actor, coupon) })
}

/**
 * Saves an open coupon; its state follows from what is recorded.
 * @throws HttpProblem 409 whose `current` is the stored coupon with `sent` beside it, when somebody saved first
 */
export async function saveCoupon(tenant: Tenant, actor: Actor, id: string, version: number, content: CouponContent): Promise<Coupon> {
  const coupon = await findCoupon(tenant, id, { lock: true })
  if (!isOpen(coupon.state)) throw await closed(tenant, actor, coupon, 'changed')
  if (coupon.version !== version) {
    const current = { ...(await presentCoupon(tenant, actor, coupon)), sent: content }
    throw conflict(`${coupon.number} was saved by somebody else since you opened it (version ${coupon.version}, yours is ${version}). Nothing of yours is lost: compare the two and save again.`, current)
  }
  checkRows(content)
  return coupon.update({ ...contentColumns(content), state: openStateOf(content), version: version + 1, updatedAt: new Date() }, { transaction: tenant.transaction })
}

/** What the coupon still lacks, how its results are judged and what it qualifies, under each of its standards. */
export const qualificationsOf = (coupon: Coupon): CouponQualification[] =>
  coupon.content.variables.standards.map(({ standard, edition, level }) => qualifyCoupon(asAssessed(coupon), standard, edition, level))

type FieldError = { field: string; message: string }

/** Everything that stands in the way of certification: what is missing, and results that do not pass unless that is said already. */
function obstacles(qualifications: readonly CouponQualification[]): FieldError[] {
  const found = new Map<string, FieldError>()
  for (const { missing, results } of qualifications) {
    for (const { field, message } of missing) if (!found.has(message)) found.set(message, { field: field === '' ? 'content' : `content.${field}`, message })
    for (const { testId, verdict, sentence } of results) if (verdict !== 'pass' && !found.has(sentence)) found.set(sentence, { field: `content.tests.${testId}`, message: sentence })
  }
  return [...found.values()]
}

async function couponForAct(tenant: Tenant, actor: Actor, id: string, version: number, act: string): Promise<Coupon> {
  const coupon = await findCoupon(tenant, id, { lock: true })
  if (!isOpen(coupon.state)) throw await closed(tenant, actor, coupon, act)
  if (coupon.version !== version) throw conflict(`${coupon.number} was saved by somebody else since you opened it (version ${coupon.version}, yours is ${version}). Read it again before it is ${act}.`, await presentCoupon(tenant, actor, coupon))
  return coupon
}

interface Signing { address: string; password: string }

/**
 * Certifies a coupon by signature; the record is closed from here on.
 * @throws HttpProblem 409; 422 naming everything that the standard still misses, or for a wrong password
 */
export async function certifyCoupon(services: Services, tenant: Tenant, actor: Actor, id: string, version: number, { password, address }: Signing): Promise<Coupon> {
  const coupon = await couponForAct(tenant, actor, id, version, 'certified')
  const errors = obstacles(qualificationsOf(coupon))
  if (!mayMove(coupon.state, 'certified', 'certification') && errors.length === 0) errors.push({ field: 'content', message: 'No test result is recorded yet.' })
  if (errors.length > 0) {
    const told = errors.slice(0, 5).map(({ message }) => message).join(' ')
    throw unprocessable('Not ready to certify', `${coupon.number} cannot be certified yet: ${errors.length === 1 ? 'one thing stands' : `${errors.length} things stand`} in the way. ${told}`, errors)
  }
  await confirmPassword(services, tenant, actor, address, password)
  return close(tenant, actor, coupon, 'certified', null)
}

/** Rejects an open coupon by signature, with the reason; it qualifies nothing. */
export async function rejectCoupon(services: Services, tenant: Tenant, actor: Actor, id: string, version: number, { password, address, reason }: Signing & { reason: string }): Promise<Coupon> {
  const coupon = await couponForAct(tenant, actor, id, version, 'rejected')
  await confirmPassword(services, tenant, actor, address, password)
  return close(tenant, actor, coupon, 'rejected', reason)
}

async function close(tenant: Tenant, actor: Actor, coupon: Coupon, meaning: 'certified' | 'rejected', reason: string | null): Promise<Coupon> {
  const now = new Date()
  await coupon.update({ state: meaning, version: coupon.version + 1, decidedAt: now, updatedAt: now }, { transaction: tenant.transaction })
  await addSignature(tenant, { actor, role: actingRole(actor, 'coupons.certify'), meaning, record: coupon.number, of: { couponId: coupon.id }, contentSha256: coupon.contentSha256, reason })
  return coupon
}
