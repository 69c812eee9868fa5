/** The API of recordings of volts and amperes. */
import { z } from 'zod'
import { arcChoiceSchema, arcPlotSchema, arcRecordingRowSchema, arcRecordingSchema, attachArcSchema } from './arc-data.ts'
import { idSchema, listQuery, pageOf } from './common.ts'
import { byId, endpoint, sorts } from './endpoint.ts'

const seconds = z.coerce.number().min(0).max(1e9)

export const arcDataEndpoints = {
  listArcRecordings: endpoint({ method: 'get', path: '/arc-recordings', action: 'arc.read', tag: 'Arc data', summary: 'Recordings of volts and amperes, newest first; of one coupon or one trial bead when asked', query: z.object({ ...listQuery, couponId: idSchema.optional(), beadId: idSchema.optional(), sort: sorts(['uploadedAt', '-uploadedAt', 'fileName', '-fileName']) }), response: pageOf(arcRecordingRowSchema) }),
  addArcRecording: endpoint({ method: 'post', path: '/arc-recordings', action: 'arc.record', tag: 'Arc data', summary: 'Upload one recording as text with a row a sample; it is read while it arrives. The query says what the file does not: columns, units, sample rate', query: arcChoiceSchema, upload: true, response: arcRecordingSchema, status: 201 }),
  readArcRecording: endpoint({ method: 'get', path: '/arc-recordings/:id', action: 'arc.read', tag: 'Arc data', summary: 'One recording: figures, plot, what it is attached to', params: byId, response: arcRecordingSchema }),
  plotArcRecording: endpoint({ method: 'get', path: '/arc-recordings/:id/plot', action: 'arc.read', tag: 'Arc data', summary: 'The plot of a part of it, read again in more detail; seconds from its beginning', params: byId, query: z.object({ from: seconds, to: seconds }), response: arcPlotSchema }),
  attachArcRecording: endpoint({ method: 'put', path: '/arc-recordings/:id/attachment', action: 'arc.record', tag: 'Arc data', summary: 'Attach it to a coupon, a pass of its run sheet, or a trial bead; nothing given takes it off', params: byId, body: attachArcSchema, response: arcRecordingSchema, ifMatch: true }),
  readArcFile: endpoint({ method: 'get', path: '/arc-recordings/:id/original', action: 'arc.read', tag: 'Arc data', summary: 'The file as uploaded', params: byId, binary: 'text/csv', status: 200 }),
  removeArcRecording: endpoint({ method: 'delete', path: '/arc-recordings/:id', action: 'arc.record', tag: 'Arc data', summary: 'Remove a recording that no closed coupon rests on', params: byId }),
} as const
