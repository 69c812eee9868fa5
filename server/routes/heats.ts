import type { Router } from 'express'
import { presentCertificateFiles } from '../presenters/attachment.ts'
import { presentHeat } from '../presenters/heat.ts'
import { attach, attachmentAnswer, attachmentsTo, findAttachment, removeAttachment } from '../services/attachments.ts'
import { createHeat, findHeat, listHeats, removeHeat, saveHeat } from '../services/heats.ts'
import { route, type Services } from './mount.ts'
import { uploadRoute } from './upload-route.ts'

/** Heats of base metal and lots of filler metal, with their certificates. */
export function heatRoutes(router: Router, services: Services): void {
  route(router, services, 'listHeats', ({ query, tenant }) => listHeats(tenant, query))
  route(router, services, 'createHeat', async ({ body, actor, tenant }) => presentHeat(tenant, actor, await createHeat(tenant, body)))
  route(router, services, 'readHeat', async ({ params, actor, tenant }) => presentHeat(tenant, actor, await findHeat(tenant, params.id)))
  route(router, services, 'saveHeat', async ({ params, body, ifMatch, actor, tenant }) => presentHeat(tenant, actor, await saveHeat(tenant, actor, params.id, ifMatch, body)))
  route(router, services, 'removeHeat', ({ params, ifMatch, tenant }) => removeHeat(services, tenant, params.id, ifMatch))

  uploadRoute(router, services, 'addHeatFiles', async ({ params, actor, tenant }, files) => {
    const { id } = await findHeat(tenant, params.id, { lock: true })
    await attach(services.storage, tenant, actor, { heatId: id }, files)
    return { items: await presentCertificateFiles(tenant, await attachmentsTo(tenant, { heatId: id })) }
  })
  route(router, services, 'readHeatFile', async ({ params, tenant }) => attachmentAnswer(services.storage, await findAttachment(tenant, params.id, 'heatId')))
  route(router, services, 'removeHeatFile', async ({ params, tenant }) => removeAttachment(services, tenant, await findAttachment(tenant, params.id, 'heatId')))
}
