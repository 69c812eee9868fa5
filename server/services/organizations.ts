import { randomUUID } from 'node:crypto'
import type { Role } from '../../shared/schemas/people.ts'
import type { Database, Tenant } from '../config/database.ts'
import { Organization } from '../models/organization.ts'
import { Person } from '../models/person.ts'
import { hashPassword } from './passwords.ts'

export interface NewPerson {
  name: string
  email: string
  roles: readonly Role[]
  /** As typed; or give `passwordHash`. */
  password?: string
  passwordHash?: string
}

/** Adds somebody who can sign in at once: for first set-up and the demo firm. People otherwise come by invitation. */
export async function addPerson({ organizationId, transaction }: Tenant, { name, email, roles, password, passwordHash }: NewPerson): Promise<Person> {
  const kept = passwordHash ?? (password === undefined ? null : await hashPassword(password))
  return Person.create({ organizationId, name, email: email.toLowerCase(), roles: [...roles], passwordHash: kept, state: kept === null ? 'invited' : 'active' }, { transaction })
}

/** Makes an organization and whatever `fill` adds to it, in one transaction. */
export async function createOrganization(database: Database, given: { id?: string; name: string; address?: string; defaultUnitSystem?: 'SI' | 'US' }, fill: (tenant: Tenant, organization: Organization) => Promise<void> = () => Promise.resolve()): Promise<Organization> {
  const id = given.id ?? randomUUID()
  return database.withTenant(id, async (tenant) => {
    const organization = await Organization.create({ ...given, id }, { transaction: tenant.transaction })
    await fill(tenant, organization)
    return organization
  })
}
