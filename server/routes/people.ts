import type { Router } from 'express'
import { conflict } from '../middleware/problem.ts'
import { Organization } from '../models/organization.ts'
import { presentOrganization, presentPerson } from '../presenters/people.ts'
import { changePerson, findPerson, invitePerson, listPeople, resendInvitation } from '../services/people.ts'
import { route, type Services } from './mount.ts'

/** People of the organization, and the organization itself. */
export function peopleRoutes(router: Router, services: Services): void {
  route(router, services, 'listPeople', async ({ query, tenant }) => {
    const page = await listPeople(tenant, query)
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
