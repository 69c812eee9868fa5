/** The API of heats of base metal and lots of filler metal. */
import { z } from 'zod'
import { listQuery, pageOf } from './common.ts'
import { byId, endpoint, sorts } from './endpoint.ts'
import { certificateFileSchema, heatRowSchema, heatSchema, writeHeatSchema } from './heats.ts'

const files = z.object({ items: z.array(certificateFileSchema) })

export const heatEndpoints = {
  listHeats: endpoint({ method: 'get', path: '/heats', action: 'heats.read', tag: 'Heats and lots', summary: 'Heats of base metal and lots of filler metal; of one library row when asked', query: z.object({ ...listQuery, kind: writeHeatSchema.shape.kind.optional(), libraryId: z.string().max(80).optional(), sort: sorts(['number', '-number', 'grade', '-grade', 'updatedAt', '-updatedAt']) }), response: pageOf(heatRowSchema) }),
  createHeat: endpoint({ method: 'post', path: '/heats', action: 'heats.manage', tag: 'Heats and lots', summary: 'Record a heat or a lot', body: writeHeatSchema, response: heatSchema, status: 201 }),
  readHeat: endpoint({ method: 'get', path: '/heats/:id', action: 'heats.read', tag: 'Heats and lots', summary: 'One heat or lot with its chemistry, its certificates and the records that name it', params: byId, response: heatSchema }),
  saveHeat: endpoint({ method: 'put', path: '/heats/:id', action: 'heats.manage', tag: 'Heats and lots', summary: 'Save a heat or lot; 409 with both versions when somebody else saved first', params: byId, body: writeHeatSchema, response: heatSchema, ifMatch: true }),
  removeHeat: endpoint({ method: 'delete', path: '/heats/:id', action: 'heats.manage', tag: 'Heats and lots', summary: 'Remove a heat or lot that no record names', params: byId, ifMatch: true }),
  addHeatFiles: endpoint({ method: 'post', path: '/heats/:id/files', action: 'heats.manage', tag: 'Heats and lots', summary: 'Upload certificates (PDF) or pictures', params: byId, upload: true, response: files, status: 201 }),
  readHeatFile: endpoint({ method: 'get', path: '/heat-files/:id', action: 'heats.read', tag: 'Heats and lots', summary: 'A file of a heat or lot as uploaded', params: byId, binary: 'application/octet-stream', status: 200 }),
  removeHeatFile: endpoint({ method: 'delete', path: '/heat-files/:id', action: 'heats.manage', tag: 'Heats and lots', summary: 'Remove a file of a heat or lot', params: byId }),
} as const
