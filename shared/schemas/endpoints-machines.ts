/** The API of the machine register and its panel cards. */
import { z } from 'zod'
import { listQuery, pageOf } from './common.ts'
import { byId, endpoint, sorts } from './endpoint.ts'
import { certificateFileSchema } from './heats.ts'
import { CALIBRATION_STATES, machineRowSchema, machineSchema, panelCardSchema, panelQuerySchema, writeMachineSchema } from './machines.ts'
import { processSchema } from './welding.ts'

const files = z.object({ items: z.array(certificateFileSchema) })

export const machineEndpoints = {
  listMachines: endpoint({ method: 'get', path: '/machines', action: 'machines.read', tag: 'Machines', summary: 'Power sources and feeders', query: z.object({ ...listQuery, calibration: z.enum(CALIBRATION_STATES).optional(), process: processSchema.optional(), retired: z.enum(['with', 'without', 'only']).optional(), sort: sorts(['number', '-number', 'name', '-name', 'calibrationDueOn', '-calibrationDueOn', 'updatedAt', '-updatedAt']) }), response: pageOf(machineRowSchema) }),
  createMachine: endpoint({ method: 'post', path: '/machines', action: 'machines.manage', tag: 'Machines', summary: 'Register a machine', body: writeMachineSchema, response: machineSchema, status: 201 }),
  readMachine: endpoint({ method: 'get', path: '/machines/:id', action: 'machines.read', tag: 'Machines', summary: 'One machine, whole', params: byId, response: machineSchema }),
  saveMachine: endpoint({ method: 'put', path: '/machines/:id', action: 'machines.manage', tag: 'Machines', summary: 'Save a machine; 409 with both versions when somebody else saved first', params: byId, body: writeMachineSchema, response: machineSchema, ifMatch: true }),
  listMachineFiles: endpoint({ method: 'get', path: '/machines/:id/files', action: 'machines.read', tag: 'Machines', summary: 'Calibration certificates and pictures of a machine', params: byId, response: files }),
  addMachineFiles: endpoint({ method: 'post', path: '/machines/:id/files', action: 'machines.manage', tag: 'Machines', summary: 'Upload certificates (PDF) or pictures', params: byId, upload: true, response: files, status: 201 }),
  readMachineFile: endpoint({ method: 'get', path: '/machine-files/:id', action: 'machines.read', tag: 'Machines', summary: 'A file of a machine as uploaded', params: byId, binary: 'application/octet-stream', status: 200 }),
  removeMachineFile: endpoint({ method: 'delete', path: '/machine-files/:id', action: 'machines.manage', tag: 'Machines', summary: 'Remove a file of a machine', params: byId }),
  readPanelCard: endpoint({ method: 'get', path: '/revisions/:id/panel-card', action: 'machines.read', tag: 'Machines', summary: 'The revision’s ranges as the settings of one machine, rounded inward to its steps; refuses with the reason where the machine can’t', params: byId, query: panelQuerySchema, response: panelCardSchema }),
} as const
