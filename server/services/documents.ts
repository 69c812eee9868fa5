import { createHash, randomUUID } from 'node:crypto'
import type { Tenant } from '../config/database.ts'
import { renderCoupon } from '../documents/coupon.ts'
import { renderProcedure } from '../documents/procedure.ts'
import { signPdf } from '../documents/signature.ts'
import type { Coupon } from '../models/coupon.ts'
import { Organization } from '../models/organization.ts'
import { Photo } from '../models/photo.ts'
import { ProcedureRevision } from '../models/procedure-revision.ts'
import { ReleasedDocument } from '../models/released-document.ts'
import { presentSignature } from '../presenters/revision.ts'
import type { Services } from '../routes/mount.ts'
import { signingCertificate } from './certificates.ts'
import { qualificationsOf } from './coupons.ts'
import { peopleRefs } from './people-refs.ts'
import { rows } from './query.ts'
import { assessRevision, linkedCoupons } from './revision-links.ts'
import { nameOf } from './revisions.ts'
import { signaturesOf } from './signing.ts'

export interface Print { paper: 'A4' | 'Letter'; units?: 'SI' | 'US' | 'both' | undefined }
/** `sha256` is that of the bytes; a document that is not released has none on record. */
export interface PrintedDocument { name: string; bytes: Buffer; sha256: string; released: boolean }

const sha256 = (bytes: Buffer): string => createHash('sha256').update(bytes).digest('hex')

const letterhead = async ({ organizationId, transaction }: Tenant): Promise<Organization> => Organization.findByPk(organizationId, { transaction, rejectOnEmpty: true })
const addressOf = ({ env }: Services, path: string): string | null => (env.BASE_URL ? new URL(path, env.BASE_URL).href : null)

async function drawRevision(services: Services, tenant: Tenant, revision: ProcedureRevision, { paper, units }: Print, now: Date): Promise<Buffer> {
  const { name, address } = await letterhead(tenant)
  const signatures = await signaturesOf(tenant, { revisionId: revision.id })
  const person = await peopleRefs(tenant, [revision.authorId])
  return renderProcedure({
    organization: { name, address },
    number: revision.number,
    revision: revision.revision,
    state: revision.state,
    content: revision.content,
    coupons: await linkedCoupons(tenant, revision.id),
    assessments: await assessRevision(tenant, revision),
    signatures: signatures.map(presentSignature),
    deviationReason: revision.deviationReason ?? null,
    author: person(revision.authorId).name,
    dates: { drafted: revision.createdAt.toISOString(), approved: revision.decidedAt?.toISOString() ?? null, printed: now.toISOString() },
    paper,
    units: units ?? revision.content.variables.unitSystem,
    contentSha256: revision.contentSha256,
    verifyUrl: addressOf(services, `/revisions/${revision.id}`),
  })
}

async function drawCoupon(services: Services, tenant: Tenant, coupon: Coupon, { paper, units }: Print, now: Date): Promise<Buffer> {
  const { organizationId, transaction } = tenant
  const { name, address } = await letterhead(tenant)
  const signatures = await signaturesOf(tenant, { couponId: coupon.id })
  const person = await peopleRefs(tenant, [coupon.inspectorId])
  const revision = coupon.revisionId === null ? null : await ProcedureRevision.findOne({ where: { organizationId, id: coupon.revisionId }, attributes: ['number', 'revision'], transaction })
  const photos = await Photo.findAll({ where: { organizationId, couponId: coupon.id }, order: [['uploadedAt', 'ASC'], ['id', 'ASC']], transaction })
  const pictures = []
  for (const { thumbnailKey, caption, tag, sha256: hash } of photos) if (thumbnailKey) pictures.push({ caption, tag, sha256: hash, jpeg: await services.storage.get(thumbnailKey) })
  return renderCoupon({
    organization: { name, address },
    number: coupon.number,
    state: coupon.state,
    content: coupon.content,
    procedure: revision && { number: revision.number, revision: revision.revision },
    qualifications: qualificationsOf(coupon),
    photos: pictures,
    signatures: signatures.map(presentSignature),
    inspector: person(coupon.inspectorId).name,
    dates: { opened: coupon.createdAt.toISOString(), certified: coupon.decidedAt?.toISOString() ?? null, printed: now.toISOString() },
    paper,
    units: units ?? coupon.content.variables.unitSystem,
    contentSha256: coupon.contentSha256,
    verifyUrl: addressOf(services, `/coupons/${coupon.id}`),
  })
}

interface Release {
  of: { revisionId: string } | { couponId: string }
  state: string
  name: string
  reason: string
  print: Required<Pick<Print, 'paper'>> & { units: 'SI' | 'US' | 'both' }
  draw: (now: Date) => Promise<Buffer>
}

/** The released document: found, or drawn, signed and stored once. From then on it is the same bytes, whatever changes around it. */
async function release(services: Services, tenant: Tenant, { of, state, name, reason, print, draw }: Release): Promise<PrintedDocument> {
  const { organizationId, transaction } = tenant
  const { storage, env } = services
  const where = { organizationId, ...of, recordState: state, paper: print.paper, units: print.units }
  const stored = () => ReleasedDocument.findOne({ where, transaction })
  const fetched = async (document: ReleasedDocument): Promise<PrintedDocument> => {
    const bytes = await storage.get(document.storageKey)
    if (sha256(bytes) !== document.sha256) throw new Error(`${document.storageKey} is not the document that was released`)
    return { name: document.fileName, bytes, sha256: document.sha256, released: true }
  }
  const known = await stored()
  if (known) return fetched(known)
  await rows(tenant, "select pg_advisory_xact_lock(hashtextextended('document ' || $id, 0))", { id: Object.values(of)[0] })
  const meanwhile = await stored()
  if (meanwhile) return fetched(meanwhile)
  const now = new Date()
  const organization = await letterhead(tenant)
  const bytes = await signPdf(await draw(now), { p12: await signingCertificate(services, tenant), passphrase: env.SIGNING_PASSPHRASE, reason, name: organization.name, location: organization.address })
  const storageKey = `${organizationId}/documents/${randomUUID()}.pdf`
  await storage.put(storageKey, bytes)
  try {
    await ReleasedDocument.create({ organizationId, revisionId: null, couponId: null, ...of, recordState: state, paper: print.paper, units: print.units, storageKey, fileName: name, sha256: sha256(bytes), bytes: bytes.length, signedAt: now }, { transaction })
  } catch (error) {
    await storage.remove(storageKey)
    throw error
  }
  return { name, bytes, sha256: sha256(bytes), released: true }
}

const unreleased = (name: string, bytes: Buffer): PrintedDocument => ({ name, bytes, sha256: sha256(bytes), released: false })

/** A revision as PDF: drawn afresh while it is a draft or under review, the released and signed document from approval on. */
export async function printRevision(services: Services, tenant: Tenant, revision: ProcedureRevision, print: Print): Promise<PrintedDocument> {
  const { state } = revision
  const units = print.units ?? revision.content.variables.unitSystem
  const name = `${revision.number} ${revision.revision}${state === 'approved' ? '' : ` ${state}`}.pdf`
  if (state === 'draft' || state === 'in-review') return unreleased(name, await drawRevision(services, tenant, revision, print, new Date()))
  return release(services, tenant, { of: { revisionId: revision.id }, state, name, reason: `${nameOf(revision)}, ${state}`, print: { paper: print.paper, units }, draw: (now) => drawRevision(services, tenant, revision, { ...print, units }, now) })
}

/** A coupon as PDF: drawn afresh while it is open, the released and signed record once it is certified or rejected. */
export async function printCoupon(services: Services, tenant: Tenant, coupon: Coupon, print: Print): Promise<PrintedDocument> {
  const { state } = coupon
  const units = print.units ?? coupon.content.variables.unitSystem
  const name = `${coupon.number}${state === 'certified' ? '' : ` ${state}`}.pdf`
  if (state !== 'certified' && state !== 'rejected') return unreleased(name, await drawCoupon(services, tenant, coupon, print, new Date()))
  return release(services, tenant, { of: { couponId: coupon.id }, state, name, reason: `${coupon.number}, ${state}`, print: { paper: print.paper, units }, draw: (now) => drawCoupon(services, tenant, coupon, { ...print, units }, now) })
}
