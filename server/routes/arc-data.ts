import type { Router } from 'express'
import { endpoints } from '@shared/schemas/endpoints.ts'
import { receiveRecording, recordingOf } from '../middleware/arc-upload.ts'
import { badRequest, unprocessable } from '../middleware/problem.ts'
import { presentArcRecording } from '../presenters/arc-recording.ts'
import { plotWindow } from '../services/arc-files.ts'
import { addArcRecording, attachArcRecording, findArcRecording, listArcRecordings, removeArcRecording } from '../services/arc-recordings.ts'
import { FileAnswer } from './file-answer.ts'
import { route, type Services } from './mount.ts'

/** Recordings of volts and amperes. */
export function arcDataRoutes(router: Router, services: Services): void {
  const { storage } = services
  route(router, services, 'listArcRecordings', ({ query, tenant }) => listArcRecordings(tenant, query))

  // Received and read before a transaction is opened: that takes as long as the line is slow.
  router.post(endpoints.addArcRecording.path, receiveRecording(services))
  route(router, services, 'addArcRecording', async ({ actor, tenant, req }) => {
    const kept = recordingOf(req)
    if (!kept) throw unprocessable('No recording', 'No file came with the upload. Choose one.', [{ field: 'files', message: 'Choose a recording.' }])
    return presentArcRecording(tenant, actor, await addArcRecording(storage, tenant, actor, kept))
  })

  route(router, services, 'readArcRecording', async ({ params, actor, tenant }) => presentArcRecording(tenant, actor, await findArcRecording(tenant, params.id)))

  route(router, services, 'plotArcRecording', async ({ params, query, tenant, res }) => {
    if (!(query.to > query.from)) throw badRequest('The part of the recording must end after it begins.', [{ field: 'to', message: 'Give seconds after `from`.', value: query.to }])
    const { storageKey, layout } = await findArcRecording(tenant, params.id)
    return plotWindow(await storage.open(storageKey), layout, query, () => !res.destroyed)
  })

  route(router, services, 'attachArcRecording', async ({ params, body, ifMatch, actor, tenant }) => presentArcRecording(tenant, actor, await attachArcRecording(tenant, actor, params.id, ifMatch, body)))

  route(router, services, 'readArcFile', async ({ params, tenant }) => {
    const { storageKey, fileName, sha256, bytes } = await findArcRecording(tenant, params.id)
    return new FileAnswer({ bytes: await storage.open(storageKey), length: Number(bytes), mediaType: 'text/csv', name: fileName, how: 'attachment', sha256 })
  })

  route(router, services, 'removeArcRecording', ({ params, tenant }) => removeArcRecording(services, tenant, params.id))
}
