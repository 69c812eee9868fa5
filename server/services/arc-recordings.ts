import type { z } from 'zod'
import { isOpen } from '@shared/records/coupon-states.ts'
import type { Page } from '@shared/schemas/common.ts'
import type { ArcFigures, ArcRecordingRow, attachArcSchema } from '@shared/schemas/arc-data.ts'
import type { Tenant } from '../config/database.ts'
import { removeFilesJob } from '../jobs/remove-files.ts'
import { conflict, HttpProblem, notFound, unprocessable } from '../middleware/problem.ts'
import { ArcRecording } from '../models/arc-recording.ts'
import { Coupon } from '../models/coupon.ts'
import type { Actor } from '../policies/index.ts'
import { presentArcRecording } from '../presenters/arc-recording.ts'
import type { QueryRead, Services, Storage } from '../routes/mount.ts'
import type { KeptRecording } from './arc-files.ts'
import { listPage } from './keyset.ts'
import { rows } from './query.ts'

/** @throws HttpProblem 404 also for another organization's */
export async function findArcRecording({ organizationId, transaction }: Tenant, id: string, { lock = false } = {}): Promise<ArcRecording> {
  const recording = await ArcRecording.findOne({ where: { organizationId, id }, transaction, lock })
  if (!recording) throw notFound('recording')
  return recording
}

/** Makes the record of a file that is in storage already; the file goes again when that fails. */
export async function addArcRecording(storage: Storage, { organizationId, transaction }: Tenant, actor: Actor, kept: KeptRecording): Promise<ArcRecording> {
  const { name, storageKey, bytes, sha256, layout, figures, plot } = kept
  try {
    return await ArcRecording.create({ organizationId, storageKey, fileName: name, bytes, sha256, layout, figures, plot, couponId: null, runRowId: null, beadId: null, weldLength: null, uploadedBy: actor.id }, { transaction })
  } catch (error) {
    await storage.remove(storageKey)
    throw error
  }
}

const recordClosed = (coupon: Coupon) => new HttpProblem(409, 'The record is closed', `${coupon.number} is ${coupon.state}; its recordings are part of the record and do not change.`)

async function couponOf({ organizationId, transaction }: Tenant, id: string | null): Promise<Coupon | null> {
  return id === null ? null : Coupon.findOne({ where: { organizationId, id }, transaction, lock: true })
}

/**
 * Attaches a recording to a coupon, one of its passes, or a bead; nothing given takes it off.
 * @throws HttpProblem 404; 409 when somebody attached it meanwhile or a coupon is closed; 422 by field
 */
export async function attachArcRecording(tenant: Tenant, actor: Actor, id: string, version: number, to: z.output<typeof attachArcSchema>): Promise<ArcRecording> {
  const recording = await findArcRecording(tenant, id, { lock: true })
  if (recording.version !== version) throw conflict(`${recording.fileName} was attached by somebody else since you opened it (version ${recording.version}, yours is ${version}). Look at it again.`, await presentArcRecording(tenant, actor, recording))
  const before = await couponOf(tenant, recording.couponId)
  if (before && !isOpen(before.state)) throw recordClosed(before)
  if (to.couponId !== null && to.beadId !== null) throw fault('beadId', 'Choose a coupon or a trial bead, not both.')
  if (to.runRowId !== null && to.couponId === null) throw fault('runRowId', 'Choose the coupon that the pass belongs to.')
  const coupon = await couponOf(tenant, to.couponId)
  if (to.couponId !== null && !coupon) throw fault('couponId', 'That coupon is not there. Choose another.')
  if (coupon && !isOpen(coupon.state)) throw recordClosed(coupon)
  if (coupon && to.runRowId !== null && !coupon.content.runSheet.some((row) => row.id === to.runRowId)) throw fault('runRowId', `${coupon.number} has no such pass any more. Choose one of its run sheet.`)
  if (to.beadId !== null) {
    const [bead] = await rows<{ id: string }>(tenant, 'select id from beads where organization_id = $organizationId and id = $id', { organizationId: tenant.organizationId, id: to.beadId })
    if (!bead) throw fault('beadId', 'That trial bead is not there. Choose another.')
  }
  return recording.update({ ...to, version: version + 1 }, { transaction: tenant.transaction })
}

const fault = (field: string, message: string) => unprocessable('That can’t be attached', message, [{ field, message }])

/** Removes a recording; its file goes once that is committed. @throws HttpProblem 404; 409 when a closed coupon rests on it */
export async function removeArcRecording({ queue }: Pick<Services, 'queue'>, tenant: Tenant, id: string): Promise<void> {
  const recording = await findArcRecording(tenant, id, { lock: true })
  const coupon = await couponOf(tenant, recording.couponId)
  if (coupon && !isOpen(coupon.state)) throw recordClosed(coupon)
  await recording.destroy({ transaction: tenant.transaction })
  await queue.send(removeFilesJob, { keys: [recording.storageKey] }, tenant)
}

interface Row {
  id: string
  fileName: string
  bytes: string
  figures: ArcFigures
  couponId: string | null
  runRowId: string | null
  beadId: string | null
  weldLength: number | null
  uploadedAt: Date
  by: string
  byName: string
  attachedTo: string | null
}

/** What a recording hangs on, in words: "PQR-005 pass 2", "DL-003 bead 4". */
const ATTACHED_TO = `case when c.id is not null then c.number || coalesce(' pass ' || (select run.value->>'pass' from jsonb_array_elements(c.content->'runSheet') as run where run.value->>'id' = a.run_row_id limit 1), '')
    when b.id is not null then t.number || ' bead ' || b.number end`
const ATTACHED_FROM = `arc_recordings a
    left join coupons c on c.organization_id = a.organization_id and c.id = a.coupon_id
    left join beads b on b.organization_id = a.organization_id and b.id = a.bead_id
    left join trials t on t.organization_id = b.organization_id and t.id = b.trial_id`

/** The organization's recordings. */
export async function listArcRecordings(tenant: Tenant, query: QueryRead<'listArcRecordings'>): Promise<Page<ArcRecordingRow>> {
  const where = ['a.organization_id = $organizationId']
  const bind: Record<string, unknown> = { organizationId: tenant.organizationId }
  if (query.couponId) {
    where.push('a.coupon_id = $couponId::uuid')
    bind.couponId = query.couponId
  }
  if (query.beadId) {
    where.push('a.bead_id = $beadId::uuid')
    bind.beadId = query.beadId
  }
  const page = await listPage<Row>(
    tenant,
    {
      id: 'a.id',
      select: `a.id, a.file_name as "fileName", a.bytes::text as bytes, a.figures, a.coupon_id as "couponId", a.run_row_id as "runRowId", a.bead_id as "beadId", a.weld_length as "weldLength", a.uploaded_at as "uploadedAt", p.id as "by", p.name as "byName", ${ATTACHED_TO} as "attachedTo"`,
      from: `${ATTACHED_FROM} join people p on p.organization_id = a.organization_id and p.id = a.uploaded_by`,
      where,
      bind,
      sorts: { uploadedAt: { expression: 'a.uploaded_at', type: 'timestamptz' }, fileName: { expression: 'a.file_name', type: 'text' } },
      searched: "a.file_name || ' ' || coalesce(c.number, '') || ' ' || coalesce(c.title, '') || ' ' || coalesce(t.number, '') || ' ' || coalesce(t.title, '')",
    },
    query,
    '-uploadedAt',
  )
  return {
    ...page,
    items: page.items.map(({ id, fileName, bytes, figures, couponId, runRowId, beadId, weldLength, uploadedAt, by, byName, attachedTo }) => ({
      id, fileName, bytes: Number(bytes), rows: figures.rows, uploadedAt: uploadedAt.toISOString(), by: { id: by, name: byName }, attachment: { couponId, runRowId, beadId, weldLength }, attachedTo, figures,
    })),
  }
}
