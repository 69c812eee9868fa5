import type { z } from 'zod'
import { baseMetalById, toBaseMetal } from '@shared/library/base-metals.ts'
import { fillerById, toFiller } from '@shared/library/filler-metals.ts'
import type { endpoints } from '@shared/schemas/endpoints.ts'
import { promoteBead as draftFrom } from '@shared/trials/promote-bead.ts'
import type { Tenant } from '../config/database.ts'
import { HttpProblem, unprocessable } from '../middleware/problem.ts'
import { Machine } from '../models/machine.ts'
import type { ProcedureRevision } from '../models/procedure-revision.ts'
import { Bead } from '../models/trial.ts'
import type { Actor } from '../policies/index.ts'
import { presentBeads } from '../presenters/trial.ts'
import { rows } from './query.ts'
import { createProcedure } from './revisions.ts'
import { findTrial } from './trials.ts'

type Body = z.output<(typeof endpoints)['promoteBead']['body']>

/** A row of the organization's library by its key, the reference's or its own. */
async function libraryRow(tenant: Tenant, kind: 'base-metals' | 'filler-metals', key: string | null): Promise<object | null> {
  if (key === null) return null
  const [found] = await rows<{ content: Record<string, unknown> }>(tenant, 'select content from library_items where organization_id = $organizationId and kind = $kind and key = $key', { organizationId: tenant.organizationId, kind, key })
  // An organization whose library nobody opened yet has the reference's rows all the same.
  return found?.content ?? (kind === 'base-metals' ? baseMetalById(key) : fillerById(key))
}

/**
 * Makes a bead the draft of a procedure and links the trial with it.
 * @throws HttpProblem 404; 409 when a procedure came of the trial already; 422 when the bead can't be promoted, with the reason
 */
export async function promoteBead(tenant: Tenant, actor: Actor, trialId: string, { beadId, title, standards, unitSystem }: Body): Promise<ProcedureRevision> {
  const { organizationId, transaction } = tenant
  const trial = await findTrial(tenant, trialId, { lock: true })
  if (trial.procedureId !== null) throw new HttpProblem(409, 'Promoted already', `A procedure came of ${trial.number} already. Change that one, or discard it first.`)
  const beads = await presentBeads(tenant, await Bead.findAll({ where: { organizationId, trialId }, order: [['number', 'ASC']], transaction }))
  const chosen = beads.find(({ id }) => id === beadId)
  if (!chosen) throw unprocessable('No such bead', 'That bead is not in this trial any more. Choose another.', [{ field: 'beadId', message: 'Choose a bead of this trial.', value: beadId }])
  const { machineId, metalId, wireId } = chosen.content
  const machine = machineId === null ? null : await Machine.findOne({ where: { organizationId, id: machineId }, transaction })
  const [metal, filler] = [await libraryRow(tenant, 'base-metals', metalId), await libraryRow(tenant, 'filler-metals', wireId)]
  const { content, problems } = draftFrom({
    beads, chosenId: beadId, title, standards, unitSystem, trial, machine: machine && { number: machine.number, content: machine.content },
    metal: metal && toBaseMetal({ ...metal }), filler: filler && toFiller({ ...filler }),
  })
  if (!content) throw unprocessable('That bead can’t be promoted', problems.join(' '), problems.map((message) => ({ field: 'beadId', message })))
  const revision = await createProcedure(tenant, actor, content)
  await trial.update({ procedureId: revision.procedureId, version: trial.version + 1, updatedAt: new Date() }, { transaction })
  return revision
}
