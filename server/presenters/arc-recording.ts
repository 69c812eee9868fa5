import { arcHeatInput, type RecordedWeld } from '@shared/arc-data/heat-input.ts'
import { isOpen } from '@shared/records/coupon-states.ts'
import type { ArcRecording as ArcRecordingRecord } from '@shared/schemas/arc-data.ts'
import type { BeadContent } from '@shared/schemas/trials.ts'
import type { Tenant } from '../config/database.ts'
import type { ArcRecording } from '../models/arc-recording.ts'
import { Coupon } from '../models/coupon.ts'
import { allows, type Actor } from '../policies/index.ts'
import { peopleRefs } from '../services/people-refs.ts'
import { rows } from '../services/query.ts'

interface BeadRow { number: number; trial: string; content: BeadContent }

/** A recording whole, with its heat input where a length or a travel speed is known, and what the person who asks may do with it. */
export async function presentArcRecording(tenant: Tenant, actor: Actor, recording: ArcRecording): Promise<ArcRecordingRecord> {
  const { organizationId, transaction } = tenant
  const { couponId, runRowId, beadId, weldLength, figures } = recording
  const coupon = couponId === null ? null : await Coupon.findOne({ where: { organizationId, id: couponId }, attributes: ['id', 'number', 'state', 'content'], transaction })
  const [bead] = beadId === null ? [] : await rows<BeadRow>(tenant, 'select b.number, t.number as trial, b.content from beads b join trials t on t.organization_id = b.organization_id and t.id = b.trial_id where b.organization_id = $organizationId and b.id = $id', { organizationId, id: beadId })
  const row = coupon?.content.runSheet.find(({ id }) => id === runRowId)
  const weld: RecordedWeld = row
    ? { weldLength, length: row.length?.si ?? null, travelSpeed: row.travelSpeed, of: `pass ${row.pass}` }
    : { weldLength, length: bead?.content.measured.length?.si ?? null, travelSpeed: bead?.content.measured.travelSpeed ?? null, of: bead ? `bead ${bead.number}` : '' }
  const heat = arcHeatInput(figures, weld)
  const person = await peopleRefs(tenant, [recording.uploadedBy])
  const open = coupon === null || isOpen(coupon.state)
  const may = open && allows(actor, 'arc.record') ? ['attach', 'remove', ...(row && allows(actor, 'coupons.record') ? ['write-energy'] : [])] : []
  return {
    id: recording.id, fileName: recording.fileName, bytes: Number(recording.bytes), rows: figures.rows, uploadedAt: recording.uploadedAt.toISOString(), by: person(recording.uploadedBy),
    attachment: { couponId, runRowId, beadId, weldLength },
    attachedTo: coupon ? `${coupon.number}${row ? ` pass ${row.pass}` : ''}` : bead ? `${bead.trial} bead ${bead.number}` : null,
    figures, sha256: recording.sha256, layout: recording.layout, plot: recording.plot, heatInput: heat?.heatInput ?? null, heatInputHow: heat?.how ?? null, version: recording.version, may,
  }
}
