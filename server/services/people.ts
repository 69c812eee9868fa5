import { Op } from 'sequelize'
import type { z } from 'zod'
import type { Page } from '../../shared/schemas/common.ts'
import type { Role, changePersonSchema, invitePersonSchema } from '../../shared/schemas/people.ts'
import type { Tenant } from '../config/database.ts'
import { conflict, HttpProblem, notFound, unprocessable } from '../middleware/problem.ts'
import { Organization } from '../models/organization.ts'
import { Person } from '../models/person.ts'
import { presentPerson, type PersonFacts } from '../presenters/people.ts'
import type { QueryRead, Services } from '../routes/mount.ts'
import { endSessions, invitationLink } from './accounts.ts'
import { findByEmail } from './directory.ts'
import { listPage, type KeysetList } from './keyset.ts'
import { queueMail } from './mails.ts'
import { issueToken } from './tokens.ts'

/** @throws HttpProblem 404, also for a person of another organization */
export async function findPerson({ organizationId, transaction }: Tenant, id: string, lock = false): Promise<Person> {
  const person = await Person.findOne({ where: { organizationId, id }, transaction, lock })
  if (!person) throw notFound('person')
  return person
}

const peopleList: KeysetList = {
  select: 'id, name, email, roles, state, version, created_at as "createdAt", last_sign_in_at as "lastSignInAt"',
  from: 'people',
  where: [],
  bind: {},
  id: 'id',
  sorts: { name: { expression: 'name', type: 'text' }, createdAt: { expression: 'created_at', type: 'timestamptz' } },
  searched: "name || ' ' || email",
}

/** People of the organization; `q` looks in name and e-mail address. */
export function listPeople(tenant: Tenant, query: QueryRead<'listPeople'>): Promise<Page<PersonFacts>> {
  const where = ['organization_id = $organizationId', ...(query.role ? ['$role = any (roles)'] : [])]
  const bind = { organizationId: tenant.organizationId, ...(query.role && { role: query.role }) }
  return listPage<PersonFacts>(tenant, { ...peopleList, where, bind }, query, 'name')
}

async function mailInvitation(services: Services, tenant: Tenant, person: Person, invitedBy: string): Promise<void> {
  const organization = await Organization.findByPk(tenant.organizationId, { transaction: tenant.transaction, rejectOnEmpty: true })
  const token = await issueToken(tenant, person.id, 'invite')
  await queueMail(services, tenant, {
    to: [person.email],
    subject: `${organization.name} invites you to Sidebend`,
    text: `${person.name},\n\n${invitedBy} invites you to the welding procedures of ${organization.name}. This link works once, for seven days; it asks you to choose a password:\n\n{link}\n`,
    link: invitationLink(services, token),
  })
}

/** @throws HttpProblem 409 when the address has an account, here or elsewhere in the installation */
export async function invitePerson(services: Services, tenant: Tenant, given: z.output<typeof invitePersonSchema>, invitedBy: string): Promise<Person> {
  const taken = await findByEmail(services.database.owner, given.email)
  if (taken) throw new HttpProblem(409, 'Already there', `${given.email} has an account already. Use another address, or change the account that is there.`, { errors: [{ field: 'email', message: 'This address has an account already.', value: given.email }] })
  const person = await Person.create({ ...given, roles: [...new Set(given.roles)], organizationId: tenant.organizationId }, { transaction: tenant.transaction })
  await mailInvitation(services, tenant, person, invitedBy)
  return person
}

/** @throws HttpProblem 404; 422 when the invitation was accepted already */
export async function resendInvitation(services: Services, tenant: Tenant, id: string, invitedBy: string): Promise<void> {
  const person = await findPerson(tenant, id, true)
  if (person.state !== 'invited') throw unprocessable('Nothing to send', `${person.name} has accepted the invitation already.`)
  await mailInvitation(services, tenant, person, invitedBy)
}

/** Somebody must always be able to manage people: locks the administrators so that two of them cannot step down at once. */
async function keepAnAdministrator({ organizationId, transaction }: Tenant, person: Person): Promise<void> {
  const others = await Person.findAll({ where: { organizationId, state: 'active', roles: { [Op.contains]: ['administrator'] } }, attributes: ['id'], order: ['id'], lock: true, transaction })
  if (others.some(({ id }) => id !== person.id)) return
  throw unprocessable('The last administrator', `${person.name} is the only active administrator. Make somebody else an administrator first.`)
}

/**
 * Changes name, roles or access. Taking access away ends the person's sessions at once.
 * @throws HttpProblem 404; 409 with the present row when `version` is not the newest; 422 for the last administrator
 */
export async function changePerson(tenant: Tenant, id: string, version: number, change: z.output<typeof changePersonSchema>): Promise<Person> {
  const { transaction } = tenant
  const seen = await findPerson(tenant, id)
  const wasAdministrator = seen.state === 'active' && seen.roles.includes('administrator')
  const staysAdministrator = change.active !== false && (change.roles ?? seen.roles).includes('administrator')
  if (wasAdministrator && !staysAdministrator) await keepAnAdministrator(tenant, seen)
  const person = await findPerson(tenant, id, true)
  if (person.version !== version) throw conflict(`${person.name} was changed meanwhile. Look at the present entry and change it again.`, presentPerson(person))
  if (change.active === true && person.state === 'inactive' && person.passwordHash === null) {
    await person.update({ state: 'invited' }, { transaction })
  } else if (change.active === true && person.state === 'inactive') {
    await person.update({ state: 'active' }, { transaction })
  } else if (change.active === false && person.state !== 'inactive') {
    await person.update({ state: 'inactive' }, { transaction })
    await endSessions(tenant, person)
  }
  const roles = change.roles && ([...new Set(change.roles)] satisfies Role[])
  return person.update({ ...(change.name !== undefined && { name: change.name }), ...(roles && { roles }), version: version + 1 }, { transaction })
}
