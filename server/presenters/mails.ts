import type { z } from 'zod'
import type { OutboxRow, outboxMailSchema } from '../../shared/schemas/records.ts'
import type { OutboxMail } from '../models/outbox-mail.ts'

export interface AttachmentFacts {
  name: string
  bytes: number
}

/** What the outbox shows of a mail: of the model, or of a list's row. */
export type MailFacts = Pick<OutboxMail, 'id' | 'recipients' | 'subject' | 'state' | 'attempts' | 'error' | 'createdAt' | 'sentAt'>

/** A row of the outbox; `attachments` in the order in which they were added. */
export const presentMailRow = (mail: MailFacts, attachments: readonly AttachmentFacts[]): OutboxRow => ({
  id: mail.id,
  to: mail.recipients,
  subject: mail.subject,
  state: mail.state,
  attempts: mail.attempts,
  error: mail.error,
  attachments: attachments.map(({ name, bytes }) => ({ name, bytes })),
  createdAt: mail.createdAt.toISOString(),
  sentAt: mail.sentAt?.toISOString() ?? null,
})

/** A private link is shown only where the mail was caught on this machine and can be read nowhere else. */
export const presentMail = (mail: OutboxMail, attachments: readonly AttachmentFacts[]): z.output<typeof outboxMailSchema> => ({
  ...presentMailRow(mail, attachments),
  text: mail.text.replace('{link}', () => (mail.state === 'caught' && mail.link ? mail.link : '(a private link, shown only in the mail itself)')),
})
