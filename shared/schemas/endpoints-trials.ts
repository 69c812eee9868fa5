/** The API of the dial-in log: trials, their beads and the beads' photos. */
import { z } from 'zod'
import { idSchema, listQuery, pageOf, standardChoiceSchema, unitSystemSchema } from './common.ts'
import { byId, endpoint, sorts } from './endpoint.ts'
import { revisionSchema } from './records.ts'
import { addBeadSchema, beadContentSchema, beadPhotoSchema, beadSchema, trialRowSchema, trialSchema, writeTrialSchema } from './trials.ts'

const promotion = z.object({ beadId: idSchema, title: z.string().trim().min(1, 'Give the procedure a title, e.g. "6061 handrail, pulsed, ER5356".').max(160), standards: z.array(standardChoiceSchema).min(1, 'Choose at least one standard.').max(5), unitSystem: unitSystemSchema.default('SI') }).meta({ id: 'PromoteBead' })

export const trialEndpoints = {
  listTrials: endpoint({ method: 'get', path: '/trials', action: 'trials.read', tag: 'Dial-in log', summary: 'Trials on the way to a setting, the one last changed first', query: z.object({ ...listQuery, sort: sorts(['number', '-number', 'updatedAt', '-updatedAt', 'title', '-title']) }), response: pageOf(trialRowSchema) }),
  createTrial: endpoint({ method: 'post', path: '/trials', action: 'trials.record', tag: 'Dial-in log', summary: 'Begin a trial', body: writeTrialSchema, response: trialSchema, status: 201 }),
  readTrial: endpoint({ method: 'get', path: '/trials/:id', action: 'trials.read', tag: 'Dial-in log', summary: 'A trial with all its beads', params: byId, response: trialSchema }),
  saveTrial: endpoint({ method: 'put', path: '/trials/:id', action: 'trials.record', tag: 'Dial-in log', summary: 'Save title and goal; 409 with both versions when somebody else saved first', params: byId, body: writeTrialSchema, response: trialSchema, ifMatch: true }),
  discardTrial: endpoint({ method: 'delete', path: '/trials/:id', action: 'trials.record', tag: 'Dial-in log', summary: 'Discard a trial from which no procedure came', params: byId, ifMatch: true }),
  addBead: endpoint({ method: 'post', path: '/trials/:id/beads', action: 'trials.record', tag: 'Dial-in log', summary: 'Add a bead: whole, or as a copy of another with changes. A bead sent twice under one id is added once', params: byId, body: addBeadSchema, response: beadSchema, status: 201 }),
  saveBead: endpoint({ method: 'put', path: '/beads/:id', action: 'trials.record', tag: 'Dial-in log', summary: 'Save a bead; 409 with both versions when somebody else saved first', params: byId, body: z.object({ content: beadContentSchema }).meta({ id: 'SaveBead' }), response: beadSchema, ifMatch: true }),
  removeBead: endpoint({ method: 'delete', path: '/beads/:id', action: 'trials.record', tag: 'Dial-in log', summary: 'Remove a bead with its photos; recordings of its arc stay by themselves', params: byId, ifMatch: true }),
  addBeadPhotos: endpoint({ method: 'post', path: '/beads/:id/photos', action: 'trials.record', tag: 'Dial-in log', summary: 'Upload pictures of a bead', params: byId, upload: true, response: z.object({ items: z.array(beadPhotoSchema) }), status: 201 }),
  readBeadPhoto: endpoint({ method: 'get', path: '/bead-photos/:id', action: 'trials.read', tag: 'Dial-in log', summary: 'The picture as uploaded', params: byId, binary: 'application/octet-stream', status: 200 }),
  readBeadThumbnail: endpoint({ method: 'get', path: '/bead-photos/:id/thumbnail', action: 'trials.read', tag: 'Dial-in log', summary: 'A small picture without location data', params: byId, binary: 'image/jpeg', status: 200 }),
  removeBeadPhoto: endpoint({ method: 'delete', path: '/bead-photos/:id', action: 'trials.record', tag: 'Dial-in log', summary: 'Remove a picture of a bead', params: byId }),
  promoteBead: endpoint({ method: 'post', path: '/trials/:id/promotion', action: 'procedures.draft', tag: 'Dial-in log', summary: 'Make a bead the draft of a procedure: its values nominal, ranges from the scored beads around it', params: byId, body: promotion, response: revisionSchema, status: 201 }),
} as const
