import type { Router } from 'express'
import { presentCertificateFiles } from '../presenters/attachment.ts'
import { presentMachine } from '../presenters/machine.ts'
import { attach, attachmentAnswer, attachmentsTo, findAttachment, removeAttachment } from '../services/attachments.ts'
import { createMachine, findMachine, listMachines, readPanelCard, saveMachine } from '../services/machines.ts'
import { route, type Services } from './mount.ts'
import { uploadRoute } from './upload-route.ts'

/** Machines, the papers of their calibration, and panel cards. */
export function machineRoutes(router: Router, services: Services): void {
  route(router, services, 'listMachines', ({ query, tenant }) => listMachines(tenant, query))
  route(router, services, 'createMachine', async ({ body, actor, tenant }) => presentMachine(actor, await createMachine(tenant, body)))
  route(router, services, 'readMachine', async ({ params, actor, tenant }) => presentMachine(actor, await findMachine(tenant, params.id)))
  route(router, services, 'saveMachine', async ({ params, body, ifMatch, actor, tenant }) => presentMachine(actor, await saveMachine(tenant, actor, params.id, ifMatch, body)))

  route(router, services, 'listMachineFiles', async ({ params, tenant }) => {
    const { id } = await findMachine(tenant, params.id)
    return { items: await presentCertificateFiles(tenant, await attachmentsTo(tenant, { machineId: id })) }
  })
  uploadRoute(router, services, 'addMachineFiles', async ({ params, actor, tenant }, files) => {
    const { id } = await findMachine(tenant, params.id, { lock: true })
    return { items: await presentCertificateFiles(tenant, await attach(services.storage, tenant, actor, { machineId: id }, files)) }
  })
  route(router, services, 'readMachineFile', async ({ params, tenant }) => attachmentAnswer(services.storage, await findAttachment(tenant, params.id, 'machineId')))
  route(router, services, 'removeMachineFile', async ({ params, tenant }) => removeAttachment(services, tenant, await findAttachment(tenant, params.id, 'machineId')))

  route(router, services, 'readPanelCard', ({ params, query, tenant }) => readPanelCard(tenant, params.id, query))
}
