import type { z } from 'zod'
import type { Page } from '@shared/schemas/common.ts'
import type { endpoints } from '@shared/schemas/endpoints.ts'
import type { JobRow, writeJobSchema } from '@shared/schemas/records.ts'
import type { Tenant } from '../config/database.ts'
import { conflict, notFound, unprocessable } from '../middleware/problem.ts'
import { JobJoint } from '../models/job-joint.ts'
import { Job } from '../models/job.ts'
import { presentJob } from '../presenters/job.ts'
import { listPage } from './keyset.ts'
import { nextNumber } from './number-series.ts'
import { rows } from './query.ts'

export type WriteJob = z.output<typeof writeJobSchema>

/** @throws HttpProblem 404 also for another organization's */
export async function findJob({ organizationId, transaction }: Tenant, id: string, { lock = false } = {}): Promise<Job> {
  const job = await Job.findOne({ where: { organizationId, id }, transaction, lock })
  if (!job) throw notFound('job')
  return job
}

/** Joint numbers are unique in a job; a joint is welded by an approved revision. @throws HttpProblem 422 by field */
async function checkJoints(tenant: Tenant, joints: WriteJob['joints'], kept: ReadonlyMap<string, JobJoint>): Promise<void> {
  const seen = new Map<string, number>()
  const errors: { field: string; message: string; value?: unknown }[] = []
  joints.forEach(({ number }, index) => {
    const first = seen.get(number)
    if (first === undefined) seen.set(number, index)
    else errors.push({ field: `joints.${index}.number`, message: `Joint ${number} is in the list twice. Give each joint its own number.`, value: number })
  })
  joints.forEach(({ id, number }, index) => {
    if (id !== undefined && !kept.has(id)) errors.push({ field: `joints.${index}.id`, message: `Joint ${number} names a joint that this job does not have. Leave the id out for a new joint.`, value: id })
  })
  const wanted = joints.flatMap(({ revisionId }) => (revisionId ? [revisionId] : []))
  const states = wanted.length === 0 ? [] : await rows<{ id: string; name: string; state: string }>(tenant, "select id, number || ' revision ' || revision as name, state from procedure_revisions where organization_id = $organizationId and id = any($wanted::uuid[])", { organizationId: tenant.organizationId, wanted })
  const known = new Map(states.map((one) => [one.id, one]))
  joints.forEach(({ id, number, revisionId }, index) => {
    if (!revisionId) return
    const revision = known.get(revisionId)
    const stays = id !== undefined && kept.get(id)?.revisionId === revisionId
    if (!revision) errors.push({ field: `joints.${index}.revisionId`, message: `The procedure chosen for joint ${number} is not there.`, value: revisionId })
    else if (revision.state !== 'approved' && !stays) errors.push({ field: `joints.${index}.revisionId`, message: `${revision.name} is ${revision.state.replace('-', ' ')}; choose an approved revision for joint ${number}.`, value: revisionId })
  })
  if (errors.length > 0) throw unprocessable('The joints do not fit', errors.slice(0, 5).map(({ message }) => message).join(' '), errors)
}

async function writeJoints(tenant: Tenant, job: Job, joints: WriteJob['joints']): Promise<void> {
  const { organizationId, transaction } = tenant
  const stored = await JobJoint.findAll({ where: { organizationId, jobId: job.id }, transaction })
  const kept = new Map(stored.map((joint) => [joint.id, joint]))
  await checkJoints(tenant, joints, kept)
  const named = new Set(joints.flatMap(({ id }) => (id ? [id] : [])))
  for (const joint of stored) if (!named.has(joint.id)) await joint.destroy({ transaction })
  for (const [index, { id, ...columns }] of joints.entries()) {
    const joint = id === undefined ? undefined : kept.get(id)
    if (joint) await joint.update({ ...columns, ordinal: index + 1 }, { transaction })
    else await JobJoint.create({ ...columns, organizationId, jobId: job.id, ordinal: index + 1 }, { transaction })
  }
}

export async function createJob(tenant: Tenant, { joints, ...columns }: WriteJob): Promise<Job> {
  const job = await Job.create({ ...columns, organizationId: tenant.organizationId, number: await nextNumber(tenant, 'jobs') }, { transaction: tenant.transaction })
  await writeJoints(tenant, job, joints)
  return job
}

/** Saves a job and makes its joints those given. @throws HttpProblem 404; 409 with both versions; 422 by joint */
export async function saveJob(tenant: Tenant, id: string, version: number, { joints, ...columns }: WriteJob): Promise<Job> {
  const job = await findJob(tenant, id, { lock: true })
  if (job.version !== version) {
    const current = { ...(await presentJob(tenant, job)), sent: { ...columns, joints } }
    throw conflict(`${job.number} was saved by somebody else since you opened it (version ${job.version}, yours is ${version}). Nothing of yours is lost: compare the two and save again.`, current)
  }
  await writeJoints(tenant, job, joints)
  return job.update({ ...columns, version: version + 1, updatedAt: new Date() }, { transaction: tenant.transaction })
}

/** The organization's jobs, with how many of their joints have a procedure. */
export async function listJobs(tenant: Tenant, query: z.output<(typeof endpoints)['listJobs']['query']>): Promise<Page<JobRow>> {
  const page = await listPage<Omit<JobRow, 'updatedAt'> & { updatedAt: Date }>(
    tenant,
    {
      id: 'j.id',
      select: `j.id, j.number, j.title, j.customer, j.code, j.updated_at as "updatedAt",
        (select count(*)::int from job_joints t where t.organization_id = j.organization_id and t.job_id = j.id) as joints,
        (select count(*)::int from job_joints t where t.organization_id = j.organization_id and t.job_id = j.id and t.revision_id is not null) as assigned`,
      from: 'jobs j',
      where: ['j.organization_id = $organizationId'],
      bind: { organizationId: tenant.organizationId },
      sorts: {
        number: { expression: "substring(j.number from '[0-9]+$')::integer", type: 'integer' },
        updatedAt: { expression: 'j.updated_at', type: 'timestamptz' },
      },
      searched: "j.number || ' ' || j.title || ' ' || j.customer || ' ' || j.code",
    },
    query,
    'number',
  )
  return { ...page, items: page.items.map(({ updatedAt, ...job }) => ({ ...job, updatedAt: updatedAt.toISOString() })) }
}

