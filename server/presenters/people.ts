import type { z } from 'zod'
import type { organizationSchema, Person as PersonShown } from '../../shared/schemas/people.ts'
import type { Organization } from '../models/organization.ts'
import type { Person } from '../models/person.ts'

/** What a person's entry shows: of the model, or of a list's row. */
export type PersonFacts = Pick<Person, 'id' | 'name' | 'email' | 'roles' | 'state' | 'version' | 'createdAt' | 'lastSignInAt'>

export const presentPerson = (person: PersonFacts): PersonShown => ({
  id: person.id,
  name: person.name,
  email: person.email,
  roles: person.roles,
  active: person.state === 'active',
  state: person.state,
  createdAt: person.createdAt.toISOString(),
  lastSignInAt: person.lastSignInAt?.toISOString() ?? null,
  version: person.version,
})

export const presentOrganization = ({ id, name, address, defaultUnitSystem, version }: Organization): z.output<typeof organizationSchema> => ({ id, name, address, defaultUnitSystem, version })
