import type { Router } from 'express'
import { endpoints } from '@shared/schemas/endpoints.ts'
import { notFound } from '../middleware/problem.ts'
import { filesOf, receiveFiles } from '../middleware/uploads.ts'
import { presentPhotos } from '../presenters/photo.ts'
import { checkFiles, type CheckedFile } from '../services/photo-files.ts'
import { addPhotos, changePhoto, findPhoto, photosOf, removePhoto } from '../services/photos.ts'
import { FileAnswer } from './file-answer.ts'
import { route, type Services } from './mount.ts'

const named = (name: string, ending: string): string => `${name.replace(/\.[A-Za-z0-9]{1,8}$/, '')}${ending}`

/** Photos and papers of a coupon. */
export function photoRoutes(router: Router, services: Services): void {
  const { storage } = services
  const checked = new WeakMap<object, CheckedFile[]>()

  route(router, services, 'listPhotos', async ({ params, tenant }) => ({ items: await presentPhotos(tenant, await photosOf(tenant, params.id)) }))

  // Receiving and checking take their time, so they happen before a transaction is opened.
  router.post(endpoints.addPhotos.path, receiveFiles(endpoints.addPhotos.action), async (req, _res, next) => {
    checked.set(req, await checkFiles(filesOf(req)))
    next()
  })
  route(router, services, 'addPhotos', async ({ params, actor, tenant, req }) => ({ items: await presentPhotos(tenant, await addPhotos(storage, tenant, actor, params.id, checked.get(req) ?? [])) }))

  route(router, services, 'changePhoto', async ({ params, body, tenant }) => {
    const [photo] = await presentPhotos(tenant, [await changePhoto(tenant, params.id, body)])
    if (!photo) throw notFound('photo')
    return photo
  })

  route(router, services, 'removePhoto', ({ params, tenant }) => removePhoto(services, tenant, params.id))

  route(router, services, 'readPhoto', async ({ params, tenant }) => {
    const { storageKey, mediaType, fileName, sha256 } = await findPhoto(tenant, params.id)
    return new FileAnswer({ bytes: await storage.get(storageKey), mediaType, name: fileName, how: mediaType === 'application/pdf' ? 'attachment' : 'inline', sha256 })
  })

  route(router, services, 'readThumbnail', async ({ params, tenant }) => {
    const { thumbnailKey, fileName, sha256 } = await findPhoto(tenant, params.id)
    if (thumbnailKey === null) throw notFound('thumbnail')
    return new FileAnswer({ bytes: await storage.get(thumbnailKey), mediaType: 'image/jpeg', name: named(fileName, ' small.jpg'), how: 'inline', sha256: `${sha256}-thumbnail` })
  })
}
