import { writeHeatSchema, type Heat as HeatRecord } from '@shared/schemas/heats.ts'
import type { Tenant } from '../config/database.ts'
import type { Heat } from '../models/heat.ts'
import { allows, type Actor } from '../policies/index.ts'
import { attachmentsTo } from '../services/attachments.ts'
import { recordsNaming } from '../services/named-by.ts'
import { presentCertificateFiles } from './attachment.ts'

/** A heat or lot whole: chemistry, certificates, the records that name it, and what the person may do with it. */
export async function presentHeat(tenant: Tenant, actor: Actor, { id, kind, number, version, updatedAt, content }: Heat): Promise<HeatRecord> {
  const namedBy = await recordsNaming(tenant, kind, number)
  const manages = allows(actor, 'heats.manage')
  return {
    id, version, updatedAt: updatedAt.toISOString(),
    // Parsed again, so that a field that came with a later version of the program has its default.
    content: writeHeatSchema.parse(content),
    files: await presentCertificateFiles(tenant, await attachmentsTo(tenant, { heatId: id })),
    namedBy,
    may: manages ? (namedBy.length > 0 ? ['save', 'attach'] : ['save', 'attach', 'remove']) : [],
  }
}
