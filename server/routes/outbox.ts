import type { Router } from 'express'
import type { Tenant } from '../config/database.ts'
import { notFound } from '../middleware/problem.ts'
import { OutboxAttachment } from '../models/outbox-attachment.ts'
import { OutboxMail } from '../models/outbox-mail.ts'
import type { Actor } from '../policies/index.ts'
import { presentMail, presentMailRow } from '../presenters/mails.ts'
import { attachmentsOf, listMails, visibleMail } from '../services/mails.ts'
import { route, type Services } from './mount.ts'

async function findMail({ organizationId, transaction }: Tenant, actor: Actor, id: string): Promise<OutboxMail> {
  const mail = await OutboxMail.findOne({ where: { organizationId, id, ...visibleMail(actor) }, transaction })
  if (!mail) throw notFound('mail')
  return mail
}

/** A name that is safe in a header; the browser takes the UTF-8 form. */
const disposition = (name: string): string => `attachment; filename="${name.replace(/[^\w. -]/g, '_')}"; filename*=UTF-8''${encodeURIComponent(name).replace(/['()*]/g, (c) => `%${c.charCodeAt(0).toString(16).toUpperCase()}`)}`

/** Mail sent, queued or caught. */
export function outboxRoutes(router: Router, services: Services): void {
  route(router, services, 'listOutbox', async ({ query, actor, tenant }) => {
    const page = await listMails(tenant, actor, query)
    const attachments = await attachmentsOf(tenant, page.items)
    return { ...page, items: page.items.map((mail) => presentMailRow(mail, attachments.get(mail.id) ?? [])) }
  })

  route(router, services, 'readMail', async ({ params, actor, tenant }) => {
    const mail = await findMail(tenant, actor, params.id)
    return presentMail(mail, (await attachmentsOf(tenant, [mail])).get(mail.id) ?? [])
  })

  route(router, services, 'readMailAttachment', async ({ params, actor, tenant, res }) => {
    const { organizationId, transaction } = tenant
    const mail = await findMail(tenant, actor, params.id)
    const attachment = await OutboxAttachment.findOne({ where: { organizationId, mailId: mail.id, position: params.index }, transaction })
    if (!attachment) throw notFound('attachment')
    res.set({ 'Content-Type': attachment.mediaType, 'Content-Disposition': disposition(attachment.name) }).send(attachment.bytes)
  })
}
