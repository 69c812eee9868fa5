import type { Machine as MachineRecord } from '@shared/schemas/machines.ts'
import { writeMachineSchema } from '@shared/schemas/machines.ts'
import type { Machine } from '../models/machine.ts'
import { allows, type Actor } from '../policies/index.ts'

export const presentMachine = (actor: Actor, { id, number, version, updatedAt, content }: Machine): MachineRecord => ({
  id, number, version, updatedAt: updatedAt.toISOString(),
  // Parsed again, so that a field that came with a later version of the program has its default.
  content: writeMachineSchema.parse(content),
  may: allows(actor, 'machines.manage') ? ['save'] : [],
})
