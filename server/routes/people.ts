import type { Router } from 'express'
import { Op } from 'sequelize'
import { conflict } from '../middleware/problem.ts'
import { Organization } from '../models/organization.ts'
import { Person } from '../models/person.ts'
import { presentOrganization, presentPerson } from '../presenters/people.ts'
import { containing, pageOfRows } from '../services/paging.ts'
import { changePerson, findPerson, invitePerson, resendInvitation } from '../services/people.ts'
import { route, type Services } from './mount.ts'

/** People of the organization, and the organization itself. */
export function peopleRoutes(router: Router, services: Services): void {
  route(router, services, 'listPeople', async ({ query: { q, role, sort = 'name', cursor, limit }, tenant }) => {
    const found = q ? { [Op.or]: [{ name: { [Op.iLike]: containing(q) } }, { email: { [Op.iLike]: containing(q) } }] } : {}
    const page = await pageOfRows(Person, tenant, { sort, cursor, limit, where: { ...found, ...(role && { roles: { [Op.contains]: [role] } }) } })
    return { ...page, items: page.items.map(presentPerson) }
  })

  route(router, services, 'invitePerson', async ({ body, actor, tenant }) => presentPerson(await invitePerson(services, tenant, body, actor.name)))

  route(router, services, 'readPerson', async ({ params, tenant }) => presentPerson(await findPerson(tenant, params.id)))

  route(router, services, 'changePerson', async ({ params, body, ifMatch, tenant }) => presentPerson(await changePerson(tenant, params.id, ifMatch, body)))

  route(router, services, 'resendInvitation', ({ params, actor, tenant }) => resendInvitation(services, tenant, params.id, actor.name))

  route(router, services, 'readOrganization', async ({ tenant: { organizationId, transaction } }) => presentOrganization(await Organization.findByPk(organizationId, { transaction, rejectOnEmpty: true })))

  route(router, services, 'changeOrganization', async ({ body, ifMatch, tenant: { organizationId, transaction } }) => {
    const organization = await Organization.findByPk(organizationId, { transaction, lock: true, rejectOnEmpty: true })
    if (organization.version !== ifMatch) throw conflict('The organization was changed meanwhile. Look at the present entry and change it again.', presentOrganization(organization))
    return presentOrganization(await organization.update({ ...body, version: ifMatch + 1 }, { transaction }))
  })
}
