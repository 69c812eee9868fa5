import type { OutboxRow } from '@shared/schemas/records.ts'
import type { Tenant } from '../config/database.ts'
import { HttpProblem } from '../middleware/problem.ts'
import type { Coupon } from '../models/coupon.ts'
import { Organization } from '../models/organization.ts'
import type { ProcedureRevision } from '../models/procedure-revision.ts'
import type { Actor } from '../policies/index.ts'
import { presentMailRow } from '../presenters/mails.ts'
import type { Services } from '../routes/mount.ts'
import { printCoupon, printRevision, type PrintedDocument } from './documents.ts'
import { queueMail } from './mails.ts'
import { nameOf } from './revisions.ts'

export interface Letter { to: readonly string[]; message: string }

async function send(services: Services, tenant: Tenant, actor: Actor, { to, message }: Letter, record: string, title: string, document: PrintedDocument): Promise<OutboxRow> {
  const organization = await Organization.findByPk(tenant.organizationId, { transaction: tenant.transaction, rejectOnEmpty: true })
  const text = `${message ? `${message}\n\n` : ''}${record}, ${title}, is attached as a digitally signed PDF.\nSHA-256 of the file: ${document.sha256}\n\n${actor.name}\n${organization.name}\n`
  const mail = await queueMail(services, tenant, { to: [...new Set(to)], subject: `${record}: ${title}`, text, attachments: [{ name: document.name, mediaType: 'application/pdf', bytes: document.bytes }] })
  return presentMailRow(mail, [{ name: document.name, bytes: document.bytes.length }])
}

/** E-mails the stored, signed PDF of an approved revision. @throws HttpProblem 409 in any other state */
export async function mailRevision(services: Services, tenant: Tenant, actor: Actor, revision: ProcedureRevision, letter: Letter): Promise<OutboxRow> {
  if (revision.state !== 'approved') throw new HttpProblem(409, 'Not in this state', `${nameOf(revision)} is ${revision.state.replace('-', ' ')}; only an approved revision is sent out.`)
  return send(services, tenant, actor, letter, nameOf(revision), revision.title, await printRevision(services, tenant, revision, { paper: 'A4' }))
}

/** E-mails the stored, signed record of a certified coupon. @throws HttpProblem 409 in any other state */
export async function mailCoupon(services: Services, tenant: Tenant, actor: Actor, coupon: Coupon, letter: Letter): Promise<OutboxRow> {
  if (coupon.state !== 'certified') throw new HttpProblem(409, 'Not in this state', `${coupon.number} is ${coupon.state}; only a certified record is sent out.`)
  return send(services, tenant, actor, letter, coupon.number, coupon.title, await printCoupon(services, tenant, coupon, { paper: 'A4' }))
}
