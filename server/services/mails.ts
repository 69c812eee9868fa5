import { col, fn } from 'sequelize'
import type { Page } from '../../shared/schemas/common.ts'
import type { Tenant } from '../config/database.ts'
import { sendMailJob } from '../jobs/send-mail.ts'
import type { Attachment } from '../mail/mailer.ts'
import { OutboxAttachment } from '../models/outbox-attachment.ts'
import { OutboxMail } from '../models/outbox-mail.ts'
import type { Actor } from '../policies/index.ts'
import type { AttachmentFacts, MailFacts } from '../presenters/mails.ts'
import type { QueryRead, Services } from '../routes/mount.ts'
import { listPage } from './keyset.ts'

export interface NewMail {
  to: readonly string[]
  subject: string
  text: string
  attachments?: readonly Attachment[]
  /** A private link: put where `{link}` stands in the text when the mail is sent, seen by administrators only, and forgotten afterwards. */
  link?: string
}

/**
 * Puts a mail into the outbox and stores the work of sending it, both in the tenant's transaction:
 * either the act that wants the mail and the mail are kept, or neither.
 * @returns the outbox row, for `presentMailRow`
 */
export async function queueMail({ queue }: Pick<Services, 'queue'>, tenant: Tenant, { to, subject, text, attachments = [], link }: NewMail): Promise<OutboxMail> {
  const { organizationId, transaction } = tenant
  const mail = await OutboxMail.create({ organizationId, recipients: [...to], subject, text, kind: link ? 'account' : 'document', link: link ?? null }, { transaction })
  if (attachments.length > 0) {
    await OutboxAttachment.bulkCreate(attachments.map(({ name, mediaType, bytes }, position) => ({ organizationId, mailId: mail.id, position, name, mediaType, bytes })), { transaction })
  }
  await queue.send(sendMailJob, { organizationId, mailId: mail.id }, tenant)
  return mail
}

/** Which mails a person may read: those with private links are for administrators, who could send such links anyway. */
export const visibleMail = (actor: Pick<Actor, 'roles'>): { kind?: 'document' } => (actor.roles.includes('administrator') ? {} : { kind: 'document' })

/** Mails that this person may read, newest first; `q` looks in subject and recipients. */
export function listMails(tenant: Tenant, actor: Pick<Actor, 'roles'>, query: QueryRead<'listOutbox'>): Promise<Page<MailFacts>> {
  const { kind } = visibleMail(actor)
  return listPage<MailFacts>(
    tenant,
    {
      select: 'id, recipients, subject, state, attempts, error, created_at as "createdAt", sent_at as "sentAt"',
      from: 'outbox_mails',
      where: ['organization_id = $organizationId', ...(kind ? ['kind = $kind'] : [])],
      bind: { organizationId: tenant.organizationId, ...(kind && { kind }) },
      id: 'id',
      sorts: { createdAt: { expression: 'created_at', type: 'timestamptz' } },
      searched: "subject || ' ' || array_to_string(recipients, ' ')",
    },
    query,
    '-createdAt',
  )
}

/** Names and sizes of the attachments of these mails, by mail id, without reading the files. */
export async function attachmentsOf({ organizationId, transaction }: Tenant, mails: readonly Pick<OutboxMail, 'id'>[]): Promise<Map<string, AttachmentFacts[]>> {
  const rows = await OutboxAttachment.findAll({
    where: { organizationId, mailId: mails.map(({ id }) => id) },
    attributes: ['mailId', 'position', 'name', [fn('octet_length', col('bytes')), 'size']],
    order: ['position'],
    transaction,
  })
  const byMail = new Map<string, AttachmentFacts[]>()
  for (const row of rows) byMail.set(row.mailId, [...(byMail.get(row.mailId) ?? []), { name: row.name, bytes: Number(row.get('size' as keyof OutboxAttachment)) }])
  return byMail
}
