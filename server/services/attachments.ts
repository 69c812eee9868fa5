import { randomUUID } from 'node:crypto'
import type { Tenant } from '../config/database.ts'
import { removeFilesJob } from '../jobs/remove-files.ts'
import { HttpProblem, notFound } from '../middleware/problem.ts'
import { Attachment } from '../models/attachment.ts'
import type { Actor } from '../policies/index.ts'
import { FileAnswer } from '../routes/file-answer.ts'
import type { Services, Storage } from '../routes/mount.ts'
import type { CheckedFile } from './photo-files.ts'

/** What an attachment belongs to: exactly one record. */
export type AttachmentOwner = { machineId: string } | { heatId: string } | { beadId: string }
export type AttachmentOwnerKey = 'machineId' | 'heatId' | 'beadId'

/** Files that are kept with one record at most. */
const MOST = 40

/** Attachments of one record in the order in which they came. */
export const attachmentsTo = ({ organizationId, transaction }: Tenant, owner: AttachmentOwner): Promise<Attachment[]> =>
  Attachment.findAll({ where: { organizationId, ...owner }, order: [['uploadedAt', 'ASC'], ['id', 'ASC']], transaction })

/** Attachments of several records of one kind, by the record's id, in one query. */
export async function attachmentsToEach({ organizationId, transaction }: Tenant, key: AttachmentOwnerKey, ids: readonly string[]): Promise<Map<string, Attachment[]>> {
  const found = await Attachment.findAll({ where: { organizationId, [key]: [...ids] }, order: [['uploadedAt', 'ASC'], ['id', 'ASC']], transaction })
  const byOwner = new Map<string, Attachment[]>()
  for (const one of found) {
    const owner = one[key]
    if (owner !== null) byOwner.set(owner, [...(byOwner.get(owner) ?? []), one])
  }
  return byOwner
}

/** @param key asks that it belong to that kind of record, so that one kind's policy never opens another's file. @throws HttpProblem 404 */
export async function findAttachment({ organizationId, transaction }: Tenant, id: string, key: AttachmentOwnerKey): Promise<Attachment & { ownerId: string }> {
  const attachment = await Attachment.findOne({ where: { organizationId, id }, transaction })
  const ownerId = attachment?.[key]
  if (!attachment || !ownerId) throw notFound('file')
  return Object.assign(attachment, { ownerId })
}

/**
 * Keeps checked files with a record: the originals untouched, a thumbnail beside each picture.
 * The caller has made sure that the record is there and may take files (lock it for update).
 * @throws HttpProblem 409 when the record would hold more than 40; then no file stays behind
 */
export async function attach(storage: Storage, tenant: Tenant, actor: Actor, owner: AttachmentOwner, files: readonly CheckedFile[]): Promise<Attachment[]> {
  const { organizationId, transaction } = tenant
  const kept = await Attachment.count({ where: { organizationId, ...owner }, transaction })
  if (kept + files.length > MOST) throw new HttpProblem(409, 'Too many files', `${kept} files are kept here already; at most ${MOST} are. Remove some first.`)
  const written: string[] = []
  const put = async (key: string, bytes: Buffer): Promise<string> => {
    written.push(key)
    await storage.put(key, bytes)
    return key
  }
  try {
    const attachments: Attachment[] = []
    for (const { name, bytes, mediaType, ending, sha256, picture } of files) {
      const id = randomUUID()
      const storageKey = await put(`${organizationId}/attachments/${id}.${ending}`, bytes)
      const thumbnailKey = picture ? await put(`${organizationId}/thumbnails/${id}.jpg`, picture.thumbnail) : null
      attachments.push(
        await Attachment.create(
          { id, organizationId, machineId: null, heatId: null, beadId: null, ...owner, storageKey, thumbnailKey, fileName: name, mediaType, bytes: bytes.length, sha256, width: picture?.width ?? null, height: picture?.height ?? null, uploadedBy: actor.id },
          { transaction },
        ),
      )
    }
    return attachments
  } catch (error) {
    for (const key of written) await storage.remove(key)
    throw error
  }
}

/** Removes an attachment; its files go once that is committed. */
export async function removeAttachment({ queue }: Pick<Services, 'queue'>, tenant: Tenant, attachment: Attachment): Promise<void> {
  await attachment.destroy({ transaction: tenant.transaction })
  await queue.send(removeFilesJob, { keys: [attachment.storageKey, ...(attachment.thumbnailKey ? [attachment.thumbnailKey] : [])] }, tenant)
}

/** The file as uploaded, as a route's answer; a paper is offered for saving, a picture shown. */
export async function attachmentAnswer(storage: Storage, { storageKey, mediaType, fileName, sha256 }: Attachment): Promise<FileAnswer> {
  return new FileAnswer({ bytes: await storage.get(storageKey), mediaType, name: fileName, how: mediaType === 'application/pdf' ? 'attachment' : 'inline', sha256 })
}

/** The small picture, without location data. @throws HttpProblem 404 for a paper */
export async function attachmentThumbnailAnswer(storage: Storage, { thumbnailKey, fileName, sha256 }: Attachment): Promise<FileAnswer> {
  if (thumbnailKey === null) throw notFound('small picture')
  return new FileAnswer({ bytes: await storage.get(thumbnailKey), mediaType: 'image/jpeg', name: `${fileName.replace(/\.[A-Za-z0-9]{1,8}$/, '')} small.jpg`, how: 'inline', sha256: `${sha256}-thumbnail` })
}
