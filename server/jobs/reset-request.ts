import { z } from 'zod'
import { baseUrl } from '../config/env.ts'
import { findByEmail } from '../services/directory.ts'
import { queueMail } from '../services/mails.ts'
import { issueToken } from '../services/tokens.ts'
import { job } from './job.ts'

/**
 * Mails a reset link to an address that has an account. It runs after the answer, for known and unknown addresses alike,
 * so that neither the answer nor the time that it takes tells which they are.
 */
export const resetRequestJob = job({
  name: 'reset-request',
  data: z.object({ email: z.string() }),
  run: async (services, { email }) => {
    const person = await findByEmail(services.database.owner, email)
    if (!person?.active) return
    await services.database.withTenant(person.organizationId, async (tenant) => {
      const token = await issueToken(tenant, person.id, 'reset')
      await queueMail(services, tenant, {
        to: [person.email],
        subject: 'Set a new password for Sidebend',
        text: `${person.name},\n\nsomebody, probably you, asked to set a new password. This link works once, for an hour:\n\n{link}\n\nIf it was not you, do nothing: your password stays as it is.\n`,
        link: `${baseUrl(services.env)}/reset-password/${token}`,
      })
    })
  },
})
