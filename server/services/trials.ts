import type { z } from 'zod'
import type { Page } from '@shared/schemas/common.ts'
import type { endpoints } from '@shared/schemas/endpoints.ts'
import type { BeadContent, TrialRow } from '@shared/schemas/trials.ts'
import { checkBead } from '@shared/trials/check-bead.ts'
import { copyBead } from '@shared/trials/copy-bead.ts'
import type { Tenant } from '../config/database.ts'
import { removeFilesJob } from '../jobs/remove-files.ts'
import { conflict, HttpProblem, notFound, unprocessable } from '../middleware/problem.ts'
import { ArcRecording } from '../models/arc-recording.ts'
import { Attachment } from '../models/attachment.ts'
import { Machine } from '../models/machine.ts'
import { Bead, Trial } from '../models/trial.ts'
import type { Actor } from '../policies/index.ts'
import { presentBead, presentTrial } from '../presenters/trial.ts'
import type { QueryRead, Services } from '../routes/mount.ts'
import { listPage } from './keyset.ts'
import { nextNumber } from './number-series.ts'
import { row } from './query.ts'

type Body<N extends 'createTrial' | 'addBead'> = z.output<(typeof endpoints)[N]['body']>

/** @throws HttpProblem 404 also for another organization's */
export async function findTrial({ organizationId, transaction }: Tenant, id: string, { lock = false } = {}): Promise<Trial> {
  const trial = await Trial.findOne({ where: { organizationId, id }, transaction, lock })
  if (!trial) throw notFound('trial')
  return trial
}

/** @throws HttpProblem 404 also for another organization's */
export async function findBead({ organizationId, transaction }: Tenant, id: string, { lock = false } = {}): Promise<Bead> {
  const bead = await Bead.findOne({ where: { organizationId, id }, transaction, lock })
  if (!bead) throw notFound('trial bead')
  return bead
}

export async function createTrial(tenant: Tenant, actor: Actor, { title, goal }: Body<'createTrial'>): Promise<Trial> {
  const { organizationId, transaction } = tenant
  return Trial.create({ organizationId, number: await nextNumber(tenant, 'trials'), title, goal, createdBy: actor.id }, { transaction })
}

async function trialForAct(tenant: Tenant, actor: Actor, id: string, version: number, sent?: Body<'createTrial'>): Promise<Trial> {
  const trial = await findTrial(tenant, id, { lock: true })
  if (trial.version === version) return trial
  const current = await presentTrial(tenant, actor, trial)
  throw conflict(`${trial.number} was saved by somebody else since you opened it (version ${trial.version}, yours is ${version}). Nothing of yours is lost: compare the two and try again.`, sent ? { ...current, sent } : current)
}

/** Saves title and goal. @throws HttpProblem 404; 409 whose `current` is the stored trial with `sent` beside it */
export async function saveTrial(tenant: Tenant, actor: Actor, id: string, version: number, body: Body<'createTrial'>): Promise<Trial> {
  const trial = await trialForAct(tenant, actor, id, version, body)
  return trial.update({ ...body, version: version + 1, updatedAt: new Date() }, { transaction: tenant.transaction })
}

/** Takes recordings off these beads and removes the beads' pictures; the files go once that is committed. */
async function letGo({ queue }: Pick<Services, 'queue'>, tenant: Tenant, beadIds: readonly string[]): Promise<void> {
  const { organizationId, transaction } = tenant
  const of = { where: { organizationId, beadId: [...beadIds] }, transaction }
  for (const recording of await ArcRecording.findAll({ ...of, lock: true })) await recording.update({ beadId: null, version: recording.version + 1 }, { transaction })
  const pictures = await Attachment.findAll(of)
  await Attachment.destroy(of)
  const keys = pictures.flatMap(({ storageKey, thumbnailKey }) => [storageKey, ...(thumbnailKey ? [thumbnailKey] : [])])
  if (keys.length > 0) await queue.send(removeFilesJob, { keys }, tenant)
}

/** Discards a trial with all its beads. @throws HttpProblem 404; 409 when a procedure came of it or somebody saved since */
export async function discardTrial(services: Pick<Services, 'queue'>, tenant: Tenant, actor: Actor, id: string, version: number): Promise<void> {
  const { organizationId, transaction } = tenant
  const trial = await trialForAct(tenant, actor, id, version)
  if (trial.procedureId !== null) throw new HttpProblem(409, 'A procedure came of it', `${trial.number} is where a procedure’s ranges come from, so it stays on record.`, { current: await presentTrial(tenant, actor, trial) })
  const beads = await Bead.findAll({ where: { organizationId, trialId: id }, attributes: ['id'], transaction })
  await letGo(services, tenant, beads.map((bead) => bead.id))
  await trial.destroy({ transaction })
}

/** @throws HttpProblem 422 by field */
async function checked({ organizationId, transaction }: Tenant, content: BeadContent): Promise<BeadContent> {
  const wrong = checkBead(content).map(({ field, message }) => ({ field: `content.${field}`, message }))
  if (content.machineId !== null && !(await Machine.findOne({ where: { organizationId, id: content.machineId }, attributes: ['id'], transaction }))) wrong.push({ field: 'content.machineId', message: 'That machine is not in the register. Choose another.' })
  const [first] = wrong
  if (first) throw unprocessable('That can’t be a bead', first.message, wrong)
  return content
}

const columns = (content: BeadContent) => ({ content, machineId: content.machineId, score: content.score })

/** MOST beads of one trial: beyond that it is another trial. */
const MOST = 500

/**
 * Adds a bead, whole or as a copy with changes. Sent again under the same id it is the bead that was added the first time.
 * @throws HttpProblem 404; 409 when the trial is full or the id is another trial's bead; 422 by field
 */
export async function addBead(tenant: Tenant, actor: Actor, trialId: string, { id, content, copyOf, changes }: Body<'addBead'>): Promise<Bead> {
  const { organizationId, transaction } = tenant
  const trial = await findTrial(tenant, trialId, { lock: true })
  const known = id === undefined ? null : await Bead.findOne({ where: { organizationId, id }, transaction })
  if (known?.trialId === trialId) return known
  if (known) throw new HttpProblem(409, 'That bead is there already', 'A bead with this id belongs to another trial.')
  const copied = copyOf === null ? null : await Bead.findOne({ where: { organizationId, id: copyOf, trialId }, transaction })
  if (copyOf !== null && !copied) throw unprocessable('Nothing to copy', 'The bead to copy is not in this trial any more. Choose another.', [{ field: 'copyOf', message: 'Choose a bead of this trial.', value: copyOf }])
  const next = copied ? copyBead(copied.content, changes) : content
  if (!next) throw unprocessable('Nothing to add', 'Send a bead’s content, or the bead that it copies.', [{ field: 'content', message: 'Send a bead’s content.' }])
  const { last, count } = await row<{ last: number; count: number }>(tenant, 'select coalesce(max(number), 0)::int as last, count(*)::int as count from beads where organization_id = $organizationId and trial_id = $trialId::uuid', { organizationId, trialId })
  if (count >= MOST) throw new HttpProblem(409, 'The trial is full', `${trial.number} has ${count} beads. Begin another trial.`)
  const bead = await Bead.create({ ...(id === undefined ? {} : { id }), organizationId, trialId, number: last + 1, weldedBy: actor.id, ...columns(await checked(tenant, next)) }, { transaction })
  await trial.update({ updatedAt: new Date() }, { transaction })
  return bead
}

async function beadForAct(tenant: Tenant, id: string, version: number, sent?: BeadContent): Promise<Bead> {
  const bead = await findBead(tenant, id, { lock: true })
  if (bead.version === version) return bead
  const current = await presentBead(tenant, bead)
  throw conflict(`Bead ${bead.number} was saved by somebody else since you opened it (version ${bead.version}, yours is ${version}). Nothing of yours is lost: compare the two and try again.`, sent ? { ...current, sent } : current)
}

const touch = ({ organizationId, transaction }: Tenant, trialId: string) => Trial.update({ updatedAt: new Date() }, { where: { organizationId, id: trialId }, transaction })

/** @throws HttpProblem 404; 409 whose `current` is the stored bead with `sent` beside it; 422 by field */
export async function saveBead(tenant: Tenant, id: string, version: number, content: BeadContent): Promise<Bead> {
  const bead = await beadForAct(tenant, id, version, content)
  await touch(tenant, bead.trialId)
  return bead.update({ ...columns(await checked(tenant, content)), version: version + 1, updatedAt: new Date() }, { transaction: tenant.transaction })
}

/** @throws HttpProblem 404; 409 when somebody saved it since */
export async function removeBead(services: Pick<Services, 'queue'>, tenant: Tenant, id: string, version: number): Promise<void> {
  const bead = await beadForAct(tenant, id, version)
  await letGo(services, tenant, [id])
  await bead.destroy({ transaction: tenant.transaction })
  await touch(tenant, bead.trialId)
}

interface Row { id: string; number: string; title: string; beads: number; bestScore: number | null; machine: string | null; wire: string | null; metal: string | null; procedureId: string | null; procedureNumber: string | null; by: string; byName: string; updatedAt: Date }

/** The organization's trials; machine, wire and metal are those of each one's last bead. */
export async function listTrials(tenant: Tenant, query: QueryRead<'listTrials'>): Promise<Page<TrialRow>> {
  const page = await listPage<Row>(
    tenant,
    {
      id: 't.id',
      select: `t.id, t.number, t.title, (select count(*)::int from beads b where b.organization_id = t.organization_id and b.trial_id = t.id) as beads,
        (select max(b.score) from beads b where b.organization_id = t.organization_id and b.trial_id = t.id) as "bestScore",
        m.number || ' ' || m.name as machine,
        coalesce(l.content->>'wire', l.content->>'wireId') || coalesce(' ' || case when l.content->'wireDiameter'->>'typed' ~* '[a-z]' then l.content->'wireDiameter'->>'typed' else (l.content->'wireDiameter'->>'typed') || ' ' || (l.content->'wireDiameter'->>'unit') end, '') as wire,
        coalesce(l.content->>'metal', l.content->>'metalId') as metal,
        t.procedure_id as "procedureId", p.number as "procedureNumber", w.id as "by", w.name as "byName", t.updated_at as "updatedAt"`,
      from: `trials t
        join people w on w.organization_id = t.organization_id and w.id = t.created_by
        left join procedures p on p.organization_id = t.organization_id and p.id = t.procedure_id
        left join lateral (select b.content, b.machine_id from beads b where b.organization_id = t.organization_id and b.trial_id = t.id order by b.number desc limit 1) l on true
        left join machines m on m.organization_id = t.organization_id and m.id = l.machine_id`,
      where: ['t.organization_id = $organizationId'],
      bind: { organizationId: tenant.organizationId },
      sorts: { number: { expression: "substring(t.number from '[0-9]+$')::integer", type: 'integer' }, title: { expression: 'lower(t.title)', type: 'text' }, updatedAt: { expression: 't.updated_at', type: 'timestamptz' } },
      searched: "t.number || ' ' || t.title || ' ' || coalesce(t.goal, '') || ' ' || coalesce(l.content->>'wire', '') || ' ' || coalesce(l.content->>'metal', '') || ' ' || coalesce(m.number || ' ' || m.name, '') || ' ' || w.name",
    },
    query,
    '-updatedAt',
  )
  return { ...page, items: page.items.map(({ by, byName, updatedAt, ...rest }) => ({ ...rest, by: { id: by, name: byName }, updatedAt: updatedAt.toISOString() })) }
}
