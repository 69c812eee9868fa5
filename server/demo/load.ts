import { readEnv } from '../config/env.ts'
import { closeServices, openServices } from '../config/services.ts'
import { Organization } from '../models/organization.ts'
import type { Actor } from '../policies/index.ts'
import { loadLibrary } from '../services/library.ts'
import { addPerson, createOrganization } from '../services/organizations.ts'
import { hashPassword } from '../services/passwords.ts'
import { DEMO_PASSWORD, FIRM, PEOPLE, type PersonKey } from './people.ts'
import { makeRecords } from './records.ts'

export { demoSignIns } from './people.ts'

/**
 * Loads Larkfield Fabrication with its people, procedures, coupons and jobs into a migrated database, all of it or, when that breaks off,
 * nothing. A second call does nothing.
 * @param url of the database; the other settings come from `environment`
 */
export async function loadDemo(url: string, environment: NodeJS.ProcessEnv = process.env): Promise<void> {
  const services = await openServices(readEnv({ ...environment, DATABASE_URL: url }))
  const { database } = services
  try {
    const present = await database.withTenant(FIRM.id, ({ organizationId, transaction }) => Organization.findByPk(organizationId, { transaction }))
    if (present) return
    const passwordHash = await hashPassword(DEMO_PASSWORD)
    await createOrganization(database, FIRM, async (tenant) => {
      const actors: Partial<Record<PersonKey, Actor>> = {}
      for (const [key, person] of Object.entries(PEOPLE) as [PersonKey, (typeof PEOPLE)[PersonKey]][]) {
        const { id } = await addPerson(tenant, { ...person, passwordHash })
        actors[key] = { id, organizationId: FIRM.id, ...person }
      }
      await loadLibrary(tenant)
      await makeRecords({ services, actors: actors as Record<PersonKey, Actor>, act: (work) => work(tenant) })
    })
  } finally {
    await closeServices(services)
  }
}
