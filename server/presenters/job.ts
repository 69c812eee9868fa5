import type { Job as JobRecord } from '@shared/schemas/records.ts'
import type { Tenant } from '../config/database.ts'
import { JobJoint } from '../models/job-joint.ts'
import type { Job } from '../models/job.ts'
import { ProcedureRevision } from '../models/procedure-revision.ts'

/** A job whole, its joints in their order. */
export async function presentJob(tenant: Tenant, job: Job): Promise<JobRecord> {
  const { organizationId, transaction } = tenant
  const joints = await JobJoint.findAll({ where: { organizationId, jobId: job.id }, order: [['ordinal', 'ASC']], transaction })
  const ids = joints.flatMap(({ revisionId }) => (revisionId ? [revisionId] : []))
  const revisions = await ProcedureRevision.findAll({ where: { organizationId, id: ids }, attributes: ['id', 'number'], transaction })
  const numbers = new Map(revisions.map(({ id, number }) => [id, number]))
  return {
    id: job.id,
    number: job.number,
    title: job.title,
    customer: job.customer,
    code: job.code,
    toughnessRequired: job.toughnessRequired,
    notes: job.notes,
    version: job.version,
    updatedAt: job.updatedAt.toISOString(),
    joints: joints.map(({ id, number, mark, metalA, metalB, process, weld, product, thickness, diameter, position, length, count, revisionId }) => ({
      id, number, mark, metalA, metalB, process, weld, product, thickness, diameter, position, length, count, revisionId,
      procedureNumber: revisionId === null ? null : (numbers.get(revisionId) ?? null),
    })),
  }
}
