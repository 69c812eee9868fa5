import type { Router } from 'express'
import { presentAssessment, presentProcedure, presentRevision, presentSummary } from '../presenters/revision.ts'
import { mailRevision } from '../services/document-mail.ts'
import { printRevision } from '../services/documents.ts'
import { peopleRefs } from '../services/people-refs.ts'
import { listProcedures } from '../services/procedure-list.ts'
import { compareRevision } from '../services/revision-comparison.ts'
import { approveRevision, returnRevision, submitRevision, withdrawRevision } from '../services/revision-decisions.ts'
import { assessRevision } from '../services/revision-links.ts'
import { createProcedure, discardRevision, findRevision, readProcedure, reviseProcedure, saveRevision } from '../services/revisions.ts'
import { FileAnswer } from './file-answer.ts'
import { route, type Services } from './mount.ts'

/** Procedures, their revisions, and what becomes of those. */
export function procedureRoutes(router: Router, services: Services): void {
  route(router, services, 'listProcedures', ({ query, tenant }) => listProcedures(tenant, query))
  route(router, services, 'createProcedure', async ({ body, actor, tenant }) => presentRevision(tenant, actor, await createProcedure(tenant, actor, body.content)))
  route(router, services, 'readProcedure', async ({ params, tenant }) => {
    const { procedure, revisions } = await readProcedure(tenant, params.id)
    return presentProcedure(tenant, procedure, revisions)
  })
  route(router, services, 'reviseProcedure', async ({ params, actor, tenant }) => presentRevision(tenant, actor, await reviseProcedure(tenant, actor, params.id)))

  route(router, services, 'readRevision', async ({ params, actor, tenant }) => presentRevision(tenant, actor, await findRevision(tenant, params.id)))
  route(router, services, 'saveRevision', async ({ params, body, ifMatch, actor, tenant }) => presentRevision(tenant, actor, await saveRevision(tenant, actor, params.id, ifMatch, body.content)))
  route(router, services, 'discardRevision', ({ params, ifMatch, actor, tenant }) => discardRevision(tenant, actor, params.id, ifMatch))
  route(router, services, 'assessRevision', async ({ params, tenant }) => {
    const revision = await findRevision(tenant, params.id)
    return presentAssessment(revision, await assessRevision(tenant, revision))
  })
  route(router, services, 'compareRevision', async ({ params, query, tenant }) => {
    const { from, to, changes } = await compareRevision(tenant, await findRevision(tenant, params.id), query.against)
    const person = await peopleRefs(tenant, [to.authorId, ...(from ? [from.authorId] : [])])
    return { from: from && presentSummary(from, person), to: presentSummary(to, person), changes }
  })

  route(router, services, 'submitRevision', async ({ params, ifMatch, actor, tenant }) => presentRevision(tenant, actor, await submitRevision(tenant, actor, params.id, ifMatch)))
  route(router, services, 'returnRevision', async ({ params, body, ifMatch, actor, tenant }) => presentRevision(tenant, actor, await returnRevision(tenant, actor, params.id, ifMatch, body.comment)))
  route(router, services, 'approveRevision', async ({ params, body, ifMatch, actor, tenant, req }) =>
    presentRevision(tenant, actor, await approveRevision(services, tenant, actor, params.id, ifMatch, { ...body, address: req.ip ?? '' })))
  route(router, services, 'withdrawRevision', async ({ params, body, ifMatch, actor, tenant, req }) =>
    presentRevision(tenant, actor, await withdrawRevision(services, tenant, actor, params.id, ifMatch, { ...body, address: req.ip ?? '' })))

  route(router, services, 'printRevision', async ({ params, query, tenant }) => {
    const { bytes, name, sha256 } = await printRevision(services, tenant, await findRevision(tenant, params.id), query)
    return new FileAnswer({ bytes, mediaType: 'application/pdf', name, how: 'inline', sha256 })
  })
  route(router, services, 'mailRevision', async ({ params, body, actor, tenant }) => mailRevision(services, tenant, actor, await findRevision(tenant, params.id), body))
}
