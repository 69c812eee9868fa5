import { randomUUID } from 'node:crypto'
import { isOpen } from '@shared/records/coupon-states.ts'
import type { Tenant } from '../config/database.ts'
import { removeFilesJob } from '../jobs/remove-files.ts'
import { HttpProblem, notFound } from '../middleware/problem.ts'
import type { Coupon } from '../models/coupon.ts'
import { Photo } from '../models/photo.ts'
import type { Actor } from '../policies/index.ts'
import type { Services, Storage } from '../routes/mount.ts'
import { findCoupon } from './coupons.ts'
import type { CheckedFile } from './photo-files.ts'

const MOST = 200

const closedRecord = ({ number, state }: Coupon) => new HttpProblem(409, 'The record is closed', `${number} is ${state}; its photos are part of the record and do not change.`)

/** @throws HttpProblem 404 also for another organization's */
export async function findPhoto({ organizationId, transaction }: Tenant, id: string): Promise<Photo> {
  const photo = await Photo.findOne({ where: { organizationId, id }, transaction })
  if (!photo) throw notFound('photo')
  return photo
}

/** Photos of a coupon in the order in which they came. @throws HttpProblem 404 */
export async function photosOf(tenant: Tenant, couponId: string): Promise<Photo[]> {
  const { organizationId, transaction } = tenant
  await findCoupon(tenant, couponId)
  return Photo.findAll({ where: { organizationId, couponId }, order: [['uploadedAt', 'ASC'], ['id', 'ASC']], transaction })
}

/**
 * Keeps checked files with an open coupon: the originals untouched, a thumbnail beside each picture.
 * @throws HttpProblem 404; 409 when the coupon is closed or full; then no file stays behind
 */
export async function addPhotos(storage: Storage, tenant: Tenant, actor: Actor, couponId: string, files: readonly CheckedFile[]): Promise<Photo[]> {
  const { organizationId, transaction } = tenant
  // Locked, so that it is not certified between this look and the commit.
  const coupon = await findCoupon(tenant, couponId, { lock: true })
  if (!isOpen(coupon.state)) throw closedRecord(coupon)
  const kept = await Photo.count({ where: { organizationId, couponId }, transaction })
  if (kept + files.length > MOST) throw new HttpProblem(409, 'Too many files', `${coupon.number} holds ${kept} files; at most ${MOST} are kept with a coupon. Remove some first.`)
  const written: string[] = []
  const put = async (key: string, bytes: Buffer): Promise<string> => {
    written.push(key)
    await storage.put(key, bytes)
    return key
  }
  try {
    const photos: Photo[] = []
    for (const { name, bytes, mediaType, ending, sha256, picture } of files) {
      const id = randomUUID()
      const storageKey = await put(`${organizationId}/photos/${id}.${ending}`, bytes)
      const thumbnailKey = picture ? await put(`${organizationId}/thumbnails/${id}.jpg`, picture.thumbnail) : null
      photos.push(
        await Photo.create(
          { id, organizationId, couponId, storageKey, thumbnailKey, fileName: name, mediaType, bytes: bytes.length, sha256, width: picture?.width ?? null, height: picture?.height ?? null, takenAt: picture?.takenAt ?? null, uploadedBy: actor.id },
          { transaction },
        ),
      )
    }
    return photos
  } catch (error) {
    for (const key of written) await storage.remove(key)
    throw error
  }
}

async function openPhoto(tenant: Tenant, id: string): Promise<Photo> {
  const photo = await findPhoto(tenant, id)
  const coupon = await findCoupon(tenant, photo.couponId, { lock: true })
  if (!isOpen(coupon.state)) throw closedRecord(coupon)
  return photo
}

/** Changes caption or tag while the coupon is open. */
export async function changePhoto(tenant: Tenant, id: string, change: { caption?: string; tag?: string }): Promise<Photo> {
  const photo = await openPhoto(tenant, id)
  return photo.update({ ...(change.caption !== undefined && { caption: change.caption }), ...(change.tag !== undefined && { tag: change.tag }) }, { transaction: tenant.transaction })
}

/** Removes a photo from an open coupon; its files go once that is committed. */
export async function removePhoto({ queue }: Pick<Services, 'queue'>, tenant: Tenant, id: string): Promise<void> {
  const photo = await openPhoto(tenant, id)
  await photo.destroy({ transaction: tenant.transaction })
  await queue.send(removeFilesJob, { keys: [photo.storageKey, ...(photo.thumbnailKey ? [photo.thumbnailKey] : [])] }, tenant)
}
