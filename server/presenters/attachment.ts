import type { z } from 'zod'
import type { certificateFileSchema } from '@shared/schemas/heats.ts'
import type { Tenant } from '../config/database.ts'
import type { Attachment } from '../models/attachment.ts'
import { peopleRefs } from '../services/people-refs.ts'

/** Papers of a machine, heat or lot, with who brought them and when. */
export async function presentCertificateFiles(tenant: Tenant, attachments: readonly Attachment[]): Promise<z.output<typeof certificateFileSchema>[]> {
  const person = await peopleRefs(tenant, attachments.map(({ uploadedBy }) => uploadedBy))
  return attachments.map(({ id, fileName, mediaType, bytes, sha256, uploadedAt, uploadedBy }) => ({ id, fileName, mediaType, bytes, sha256, uploadedAt: uploadedAt.toISOString(), uploadedBy: person(uploadedBy) }))
}
