/** Signing in, proving who one is, and passwords. */
import type { Tenant } from '../config/database.ts'
import { baseUrl } from '../config/env.ts'
import { HttpProblem, notSignedIn, unprocessable } from '../middleware/problem.ts'
import { Person } from '../models/person.ts'
import { UserSession } from '../models/user-session.ts'
import type { Actor } from '../policies/index.ts'
import type { Services } from '../routes/mount.ts'
import { findByEmail, type SignedIn } from './directory.ts'
import { hashPassword, verifyPassword } from './passwords.ts'
import { countTry } from './throttle.ts'
import { withToken } from './tokens.ts'

/** One answer for an unknown address, a wrong password and an account that is closed. */
const wrongCredentials = () => new HttpProblem(401, 'Not signed in', 'That e-mail address and password do not belong together here. Check both, or ask for a link to set a new password.')

/**
 * The person with this e-mail address and password.
 * @throws HttpProblem 401, the same for unknown address and wrong password; 429 after too many tries
 */
export async function checkCredentials({ database }: Services, email: string, password: string, address: string): Promise<SignedIn> {
  const right = await countTry(database.owner, { kind: 'sign-in', email, address })
  const found = await findByEmail(database.owner, email)
  const matches = await verifyPassword(found?.active ? found.passwordHash : null, password)
  if (!found || !matches) throw wrongCredentials()
  await right()
  await database.withTenant(found.organizationId, ({ organizationId, transaction }) => Person.update({ lastSignInAt: new Date() }, { where: { organizationId, id: found.id }, transaction }))
  const { id, organizationId, name, roles, sessionEpoch } = found
  return { id, organizationId, name, email: found.email, roles, sessionEpoch }
}

/** The row of the person who asks. */
export async function ownRow({ organizationId, transaction }: Tenant, actor: Actor, lock = false): Promise<Person> {
  const person = await Person.findOne({ where: { organizationId, id: actor.id, state: 'active' }, transaction, lock })
  if (!person) throw notSignedIn()
  return person
}

/**
 * Proves again that the person at the keyboard is who signed in: before a new password (signatures: services/signing.ts).
 * Wrong tries are counted outside the transaction, so that rolling it back does not forget them.
 * @throws HttpProblem 422 when the password is wrong; 429 after too many tries
 */
async function confirmPassword({ database }: Pick<Services, 'database'>, tenant: Tenant, actor: Actor, password: string, field = 'password'): Promise<void> {
  const person = await ownRow(tenant, actor)
  const right = await countTry(database.owner, { kind: 'confirm', email: person.email, address: '' })
  if (!(await verifyPassword(person.passwordHash, password))) {
    throw unprocessable('The password is not right', 'That is not your password. Type it again; nothing was signed or changed.', [{ field, message: 'This is not your password.' }])
  }
  await right()
}

/** Ends every session of a person, here and on every other device. Sessions saved again by a request in flight stay ended. */
export async function endSessions({ organizationId, transaction }: Tenant, person: Person): Promise<void> {
  await person.increment('sessionEpoch', { transaction })
  await person.reload({ transaction })
  await UserSession.destroy({ where: { organizationId, personId: person.id }, transaction })
}

/** Sets a new password and ends every session. Returns the person with the new epoch, to begin a session anew. */
export async function changePassword(services: Services, tenant: Tenant, actor: Actor, current: string, next: string): Promise<SignedIn> {
  await confirmPassword(services, tenant, actor, current, 'currentPassword')
  const person = await ownRow(tenant, actor, true)
  await person.update({ passwordHash: await hashPassword(next) }, { transaction: tenant.transaction })
  await endSessions(tenant, person)
  return { ...actor, sessionEpoch: person.sessionEpoch }
}

/** @throws HttpProblem 410 when the link no longer works */
export function resetPassword(services: Services, token: string, password: string): Promise<void> {
  return withToken(services, 'reset', token, async (tenant, person, use) => {
    await use()
    await person.update({ passwordHash: await hashPassword(password) }, { transaction: tenant.transaction })
    await endSessions(tenant, person)
  })
}

/** @throws HttpProblem 410 when the link no longer works */
export function acceptInvitation(services: Services, token: string, password: string): Promise<void> {
  return withToken(services, 'invite', token, async ({ transaction }, person, use) => {
    await use()
    await person.update({ passwordHash: await hashPassword(password), state: 'active', version: person.version + 1 }, { transaction })
  })
}

/** The address of the page where an invitation is accepted. */
export const invitationLink = (services: Pick<Services, 'env'>, token: string): string => `${baseUrl(services.env)}/invitation/${token}`
