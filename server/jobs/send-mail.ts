import { z } from 'zod'
import type { Tenant } from '../config/database.ts'
import { OutboxAttachment } from '../models/outbox-attachment.ts'
import { OutboxMail } from '../models/outbox-mail.ts'
import type { Services } from '../routes/mount.ts'
import { job } from './job.ts'

const RETRIES = 5

async function deliver({ env, mailer }: Services, tenant: Tenant, mail: OutboxMail): Promise<void> {
  const { organizationId, transaction } = tenant
  const attachments = await OutboxAttachment.findAll({ where: { organizationId, mailId: mail.id }, order: ['position'], transaction })
  await mailer.send({
    from: env.MAIL_FROM,
    to: mail.recipients,
    subject: mail.subject,
    text: mail.text.replace('{link}', () => mail.link ?? ''),
    attachments: attachments.map(({ name, mediaType, bytes }) => ({ name, mediaType, bytes })),
    messageId: `<${mail.id}@sidebend>`,
  })
}

/**
 * Sends one mail of the outbox. The row is locked while the mail server answers, so a second worker waits and then finds it sent.
 * A try that fails is noted on the row; after the last one the row says failed.
 */
export const sendMailJob = job({
  name: 'send-mail',
  data: z.object({ organizationId: z.uuid(), mailId: z.uuid() }),
  retryLimit: RETRIES,
  retryDelay: 10,
  run: async (services, { organizationId, mailId }) => {
    const failure = await services.database.withTenant(organizationId, async (tenant): Promise<unknown> => {
      const { transaction } = tenant
      const mail = await OutboxMail.findOne({ where: { organizationId, id: mailId }, lock: true, transaction })
      if (mail?.state !== 'queued') return undefined
      const attempts = mail.attempts + 1
      try {
        await deliver(services, tenant, mail)
      } catch (error) {
        const reason = (error instanceof Error ? error.message : String(error)).slice(0, 500)
        await mail.update({ attempts, error: reason, state: attempts > RETRIES ? 'failed' : 'queued' }, { transaction })
        return error
      }
      const caught = services.mailer.caught
      // A link that has gone out is the reader's alone; a caught one has nowhere else to be read.
      await mail.update({ attempts, error: null, state: caught ? 'caught' : 'sent', sentAt: new Date(), link: caught ? mail.link : null }, { transaction })
      return undefined
    })
    if (failure) throw failure instanceof Error ? failure : new Error('the mail could not be sent', { cause: failure })
  },
})
