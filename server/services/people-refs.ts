import type { Tenant } from '../config/database.ts'
import { Person } from '../models/person.ts'

export interface PersonRef { id: string; name: string }

/** Names of people by id, in one query. */
export async function peopleRefs({ organizationId, transaction }: Tenant, ids: readonly string[]): Promise<(id: string) => PersonRef> {
  const people = await Person.findAll({ where: { organizationId, id: [...new Set(ids)] }, attributes: ['id', 'name'], transaction })
  const names = new Map(people.map(({ id, name }) => [id, name]))
  return (id) => ({ id, name: names.get(id) ?? '' })
}
