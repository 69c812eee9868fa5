import type { Sequelize } from 'sequelize'
import { bindOrganization } from './organization.ts'
import { bindOutboxAttachment } from './outbox-attachment.ts'
import { bindOutboxMail } from './outbox-mail.ts'
import { bindPersonToken } from './person-token.ts'
import { bindPerson } from './person.ts'
import { bindUserSession } from './user-session.ts'
import { recordBinders } from './records.ts'

const binders = [bindOrganization, bindPerson, bindPersonToken, bindUserSession, bindOutboxMail, bindOutboxAttachment, ...recordBinders]

/** Binds every model to the connection; run once when the services are made. */
export function bindModels(sequelize: Sequelize): void {
  for (const bind of binders) bind(sequelize)
}
