import type { Router } from 'express'
import type { Session } from '../../shared/schemas/people.ts'
import type { Tenant } from '../config/database.ts'
import { Organization } from '../models/organization.ts'
import type { Person } from '../models/person.ts'
import { actionsOf, POLICY, type Actor } from '../policies/index.ts'
import { presentOrganization } from '../presenters/people.ts'
import { resetRequestJob } from '../jobs/reset-request.ts'
import { beginSession, endSession, type Authenticate } from '../middleware/session.ts'
import { acceptInvitation, changePassword, endSessions, ownRow, resetPassword } from '../services/accounts.ts'
import { countTry } from '../services/throttle.ts'
import { withToken } from '../services/tokens.ts'
import { publicRoute, route, type Services } from './mount.ts'

const flags = ({ env, mailer }: Services) => ({ mailIsCaught: mailer.caught, demo: env.DEMO })
const openToAll = Object.keys(POLICY).filter((action) => POLICY[action] === 'public')

async function sessionOf(services: Services, tenant: Tenant, person: Person): Promise<Session> {
  const organization = await Organization.findByPk(tenant.organizationId, { transaction: tenant.transaction, rejectOnEmpty: true })
  const { id, name, email, roles, unitSystem, theme } = person
  return { person: { id, name, email, roles, unitSystem, theme }, organization: presentOrganization(organization), may: actionsOf({ roles }), ...flags(services) }
}

const readSession = async (services: Services, actor: Actor | null): Promise<Session> =>
  actor
    ? services.database.withTenant(actor.organizationId, async (tenant) => sessionOf(services, tenant, await ownRow(tenant, actor)))
    : { person: null, organization: null, may: openToAll, ...flags(services) }

/** Who is signed in; signing in and out; private links; one's own account. */
export function sessionRoutes(router: Router, services: Services, authenticate: Authenticate): void {
  publicRoute(router, services, 'readSession', ({ actor }) => readSession(services, actor))

  publicRoute(router, services, 'signIn', async ({ body, req, res }) => {
    const person = await authenticate(req, res, body)
    await beginSession(req, person)
    return readSession(services, person)
  })

  publicRoute(router, services, 'signOut', ({ req, res }) => endSession(req, res))

  route(router, services, 'signOutEverywhere', async ({ actor, tenant, req, res }) => {
    await endSessions(tenant, await ownRow(tenant, actor, true))
    // Only once the rows are gone for good: the session library deletes on a connection of its own and would wait for this transaction.
    tenant.transaction.afterCommit(() => endSession(req, res))
  })

  publicRoute(router, services, 'requestReset', async ({ body, req }) => {
    await countTry(services.database.owner, { kind: 'reset', email: body.email, address: req.ip ?? '' })
    await services.queue.send(resetRequestJob, { email: body.email })
  })

  publicRoute(router, services, 'resetPassword', ({ params, body }) => resetPassword(services, params.token, body.password))

  publicRoute(router, services, 'readInvitation', ({ params }) =>
    withToken(services, 'invite', params.token, async ({ organizationId, transaction }, { name, email }) => {
      const organization = await Organization.findByPk(organizationId, { transaction, rejectOnEmpty: true })
      return { name, email, organization: organization.name }
    }),
  )

  publicRoute(router, services, 'acceptInvitation', ({ params, body }) => acceptInvitation(services, params.token, body.password))

  route(router, services, 'changePassword', async ({ actor, tenant, body, req }) => {
    const person = await changePassword(services, tenant, actor, body.currentPassword, body.newPassword)
    tenant.transaction.afterCommit(() => beginSession(req, person))
  })

  route(router, services, 'changeAccount', async ({ actor, tenant, body }) => {
    const person = await ownRow(tenant, actor, true)
    const renamed = body.name !== undefined && body.name !== person.name
    await person.update({ ...body, version: renamed ? person.version + 1 : person.version }, { transaction: tenant.transaction })
    return sessionOf(services, tenant, person)
  })
}
