import type { Router } from 'express'
import { unprocessable } from '../middleware/problem.ts'
import { presentRevision } from '../presenters/revision.ts'
import { presentBead, presentBeadPhotos, presentTrial } from '../presenters/trial.ts'
import { attach, attachmentAnswer, attachmentThumbnailAnswer, findAttachment, removeAttachment } from '../services/attachments.ts'
import { promoteBead } from '../services/trial-promotion.ts'
import { addBead, createTrial, discardTrial, findBead, findTrial, listTrials, removeBead, saveBead, saveTrial } from '../services/trials.ts'
import { route, type Services } from './mount.ts'
import { uploadRoute } from './upload-route.ts'

/** The dial-in log. */
export function trialRoutes(router: Router, services: Services): void {
  route(router, services, 'listTrials', ({ query, tenant }) => listTrials(tenant, query))
  route(router, services, 'createTrial', async ({ body, actor, tenant }) => presentTrial(tenant, actor, await createTrial(tenant, actor, body)))
  route(router, services, 'readTrial', async ({ params, actor, tenant }) => presentTrial(tenant, actor, await findTrial(tenant, params.id)))
  route(router, services, 'saveTrial', async ({ params, body, ifMatch, actor, tenant }) => presentTrial(tenant, actor, await saveTrial(tenant, actor, params.id, ifMatch, body)))
  route(router, services, 'discardTrial', ({ params, ifMatch, actor, tenant }) => discardTrial(services, tenant, actor, params.id, ifMatch))
  route(router, services, 'promoteBead', async ({ params, body, actor, tenant }) => presentRevision(tenant, actor, await promoteBead(tenant, actor, params.id, body)))

  route(router, services, 'addBead', async ({ params, body, actor, tenant }) => presentBead(tenant, await addBead(tenant, actor, params.id, body)))
  route(router, services, 'saveBead', async ({ params, body, ifMatch, tenant }) => presentBead(tenant, await saveBead(tenant, params.id, ifMatch, body.content)))
  route(router, services, 'removeBead', ({ params, ifMatch, tenant }) => removeBead(services, tenant, params.id, ifMatch))

  uploadRoute(router, services, 'addBeadPhotos', async ({ params, actor, tenant }, files) => {
    const paper = files.find(({ picture }) => !picture)
    if (paper) throw unprocessable('Not a picture', `${paper.name} is a paper; a bead takes pictures (JPEG, PNG or HEIC).`, [{ field: 'files', message: 'Choose a picture.' }])
    const { id } = await findBead(tenant, params.id, { lock: true })
    return { items: presentBeadPhotos(await attach(services.storage, tenant, actor, { beadId: id }, files)) }
  })
  route(router, services, 'readBeadPhoto', async ({ params, tenant }) => attachmentAnswer(services.storage, await findAttachment(tenant, params.id, 'beadId')))
  route(router, services, 'readBeadThumbnail', async ({ params, tenant }) => attachmentThumbnailAnswer(services.storage, await findAttachment(tenant, params.id, 'beadId')))
  route(router, services, 'removeBeadPhoto', async ({ params, tenant }) => removeAttachment(services, tenant, await findAttachment(tenant, params.id, 'beadId')))
}
