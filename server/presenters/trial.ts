import { beadContentSchema, type Bead as BeadRecord, type BeadContent, type Trial as TrialRecord } from '@shared/schemas/trials.ts'
import type { Tenant } from '../config/database.ts'
import type { Attachment } from '../models/attachment.ts'
import { Machine } from '../models/machine.ts'
import { Procedure } from '../models/procedure.ts'
import { Bead, type Trial } from '../models/trial.ts'
import { allows, type Actor } from '../policies/index.ts'
import { attachmentsToEach } from '../services/attachments.ts'
import { peopleRefs } from '../services/people-refs.ts'

export const presentBeadPhotos = (attachments: readonly Attachment[]): BeadRecord['photos'] => attachments.map(({ id, fileName, mediaType, width, height }) => ({ id, fileName, mediaType, width, height }))

/** Beads with who welded them and their photos. */
export async function presentBeads(tenant: Tenant, beads: readonly Bead[]): Promise<BeadRecord[]> {
  const person = await peopleRefs(tenant, beads.map(({ weldedBy }) => weldedBy))
  const photos = await attachmentsToEach(tenant, 'beadId', beads.map(({ id }) => id))
  return beads.map(({ id, trialId, number, version, weldedAt, weldedBy, content }) => ({
    id, trialId, number, version, weldedAt: weldedAt.toISOString(), by: person(weldedBy),
    // Parsed again, so that a field that came with a later version of the program has its default.
    content: beadContentSchema.parse(content), photos: presentBeadPhotos(photos.get(id) ?? []),
  }))
}

export async function presentBead(tenant: Tenant, bead: Bead): Promise<BeadRecord> {
  const [presented] = await presentBeads(tenant, [bead])
  if (!presented) throw new RangeError('one bead in, one out')
  return presented
}

/** The words by which a list tells a bead: wire with diameter, metal. */
const wireInWords = ({ wire, wireId, wireDiameter }: Pick<BeadContent, 'wire' | 'wireId' | 'wireDiameter'>): string | null => {
  const name = wire ?? wireId
  return name === null ? null : wireDiameter ? `${name} ${/[a-z]/i.test(wireDiameter.typed) ? wireDiameter.typed : `${wireDiameter.typed} ${wireDiameter.unit}`}` : name
}

/** A trial whole, with its beads in order and what the person who asks may do. */
export async function presentTrial(tenant: Tenant, actor: Actor, trial: Trial): Promise<TrialRecord> {
  const { organizationId, transaction } = tenant
  const found = await Bead.findAll({ where: { organizationId, trialId: trial.id }, order: [['number', 'ASC']], transaction })
  const beads = await presentBeads(tenant, found)
  const person = await peopleRefs(tenant, [trial.createdBy])
  const last = beads.at(-1)?.content
  const machine = last?.machineId ? await Machine.findOne({ where: { organizationId, id: last.machineId }, attributes: ['number', 'name'], transaction }) : null
  const procedure = trial.procedureId === null ? null : await Procedure.findOne({ where: { organizationId, id: trial.procedureId }, attributes: ['number'], transaction })
  const scores = beads.flatMap(({ content }) => (content.score === null ? [] : [content.score]))
  const records = allows(actor, 'trials.record')
  return {
    id: trial.id, number: trial.number, title: trial.title, goal: trial.goal, version: trial.version, updatedAt: trial.updatedAt.toISOString(), by: person(trial.createdBy), beads,
    bestScore: scores.length > 0 ? Math.max(...scores) : null, machine: machine ? `${machine.number} ${machine.name}` : null, wire: last ? wireInWords(last) : null, metal: last ? (last.metal ?? last.metalId) : null,
    procedureId: trial.procedureId, procedureNumber: procedure?.number ?? null,
    may: [...(records ? ['save', 'record', ...(trial.procedureId === null ? ['discard'] : [])] : []), ...(trial.procedureId === null && allows(actor, 'procedures.draft') ? ['promote'] : [])],
  }
}
