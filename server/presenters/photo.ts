import type { Photo as PhotoRecord } from '@shared/schemas/records.ts'
import type { Tenant } from '../config/database.ts'
import type { Photo } from '../models/photo.ts'
import { peopleRefs } from '../services/people-refs.ts'

export async function presentPhotos(tenant: Tenant, photos: readonly Photo[]): Promise<PhotoRecord[]> {
  const person = await peopleRefs(tenant, photos.map(({ uploadedBy }) => uploadedBy))
  return photos.map(({ id, couponId, fileName, mediaType, bytes, sha256, width, height, caption, tag, takenAt, uploadedAt, uploadedBy, thumbnailKey }) => ({
    id, couponId, fileName, mediaType, bytes, sha256, width, height, caption, tag,
    takenAt: takenAt?.toISOString() ?? null,
    uploadedAt: uploadedAt.toISOString(),
    uploadedBy: person(uploadedBy),
    hasThumbnail: thumbnailKey !== null,
  }))
}
