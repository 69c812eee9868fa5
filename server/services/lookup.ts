import { jobJointQuestion, readJointQuery } from '@shared/lookup/joint-query.ts'
import type { JointQuestion } from '@shared/lookup/joint-question.ts'
import { rankForJoint } from '@shared/lookup/rank.ts'
import type { LookupQuery, LookupResult } from '@shared/schemas/records.ts'
import type { ProcedureContent } from '@shared/schemas/welding.ts'
import { formatInterval } from '@shared/units/format.ts'
import type { Tenant } from '../config/database.ts'
import { notFound } from '../middleware/problem.ts'
import { JobJoint } from '../models/job-joint.ts'
import { Job } from '../models/job.ts'
import { askedMetalTokens } from './projections.ts'
import { rows } from './query.ts'

interface Asked { question: JointQuestion; read: LookupResult['read']; notRead: string[] }
interface Candidate { id: string; procedureId: string; number: string; revision: string; title: string; processes: string[]; content: ProcedureContent; failed: number }

/** Candidates are judged by the engine one by one; more than these would only make a long list. */
const CANDIDATES = 200
const NEAR_SHOWN = 20
/** As many failing conditions as a near miss may have. */
const MISSES = 2

async function askedOfJoint({ organizationId, transaction }: Tenant, jointId: string, system: 'SI' | 'US'): Promise<Asked> {
  const joint = await JobJoint.findOne({ where: { organizationId, id: jointId }, transaction })
  if (!joint) throw notFound('joint')
  const job = await Job.findOne({ where: { organizationId, id: joint.jobId }, attributes: ['number', 'toughnessRequired'], transaction })
  const { number, metalA, metalB, thickness, diameter, process, position, weld } = joint
  const told: [string, string | null][] = [
    ['Joint', `${job?.number ?? ''} ${number}`.trim()],
    ['Base metal A', metalA],
    ['Base metal B', metalB],
    ['Thickness', thickness && formatInterval(thickness, 'length', system).text],
    ['Diameter', diameter && formatInterval(diameter, 'length', system).text],
    ['Process', process],
    ['Position', position],
    ['Weld', weld],
    ['Toughness', job?.toughnessRequired ? 'required by the job' : null],
  ]
  return { question: jobJointQuestion(joint, job?.toughnessRequired ?? null), read: told.flatMap(([label, value]) => (value ? [{ label, value }] : [])), notRead: [] }
}

/** What the question demands of the indexed columns, each condition with the values that it binds; all of it necessary, none of it sufficient. */
function conditionsOf(question: JointQuestion): { conditions: string[]; bind: Record<string, unknown> } {
  const conditions: string[] = []
  const bind: Record<string, unknown> = {}
  const sizes = [['thickness', question.thickness], ['diameter', question.diameter]] as const
  for (const [column, interval] of sizes) {
    const [low, high] = [interval?.min?.si ?? interval?.max?.si, interval?.max?.si ?? interval?.min?.si]
    if (low === undefined || high === undefined || low > high) continue
    conditions.push(`coalesce(r.${column} @> numrange($${column}Low::numeric, $${column}High::numeric, '[]'), false)`)
    Object.assign(bind, { [`${column}Low`]: low, [`${column}High`]: high })
  }
  const metals = [['metalA', question.metalA], ['metalB', question.metalB]] as const
  for (const [name, metal] of metals) {
    if (!metal) continue
    conditions.push(`r.metals && $${name}::text[]`)
    bind[name] = askedMetalTokens(metal)
  }
  if (question.processes.length > 0) {
    conditions.push('r.processes @> $processes::text[]')
    bind.processes = question.processes
  }
  if (question.position) {
    conditions.push('r.positions @> array[$position::text]')
    bind.position = question.position
  }
  if (question.weld) {
    conditions.push('r.weld = $weld')
    bind.weld = question.weld
  }
  return { conditions, bind }
}

/** SQL for the approved revisions that a question may concern: those that meet every condition first, then those that miss few. */
function lookupSql(organizationId: string, question: JointQuestion): { sql: string; bind: Record<string, unknown> } {
  const { conditions, bind } = conditionsOf(question)
  const failed = conditions.length === 0 ? '0' : conditions.map((condition) => `(not (${condition}))::int`).join(' + ')
  return {
    sql: `select * from (
        select r.id, r.procedure_id as "procedureId", r.number, r.revision, r.title, r.processes, r.content, ${failed} as failed
        from procedure_revisions r where r.organization_id = $organizationId and r.state = 'approved'
      ) as candidates where failed <= ${MISSES} order by failed, number limit ${CANDIDATES}`,
    bind: { ...bind, organizationId },
  }
}

/**
 * Approved procedures for a joint, best first, with the reasons, and those that miss by little with what they want.
 * The database narrows on indexed columns; what fits is decided by the documents' own statements.
 * @throws HttpProblem 404 for a joint that is not there
 */
export async function lookUp(tenant: Tenant, query: LookupQuery): Promise<LookupResult> {
  const system = query.unitSystem ?? 'SI'
  const reading = query.jointId === undefined ? readJointQuery(query, system) : null
  const asked: Asked = reading ? { question: reading, read: reading.read, notRead: reading.notRead } : await askedOfJoint(tenant, query.jointId ?? '', system)
  const { sql, bind } = lookupSql(tenant.organizationId, asked.question)
  const candidates = await rows<Candidate>(tenant, sql, bind)
  const byId = new Map(candidates.map((candidate) => [candidate.id, candidate]))
  const { fits, near } = rankForJoint(asked.question, candidates, system)
  const told = (id: string) => byId.get(id)
  return {
    read: asked.read,
    notRead: asked.notRead,
    fits: fits.flatMap(({ id, reasons, score }) => {
      const found = told(id)
      return found ? [{ revisionId: id, procedureId: found.procedureId, number: found.number, revision: found.revision, title: found.title, processes: found.processes, reasons, score }] : []
    }),
    near: near.slice(0, NEAR_SHOWN).flatMap(({ id, wants }) => {
      const found = told(id)
      return found ? [{ revisionId: id, procedureId: found.procedureId, number: found.number, revision: found.revision, title: found.title, processes: found.processes, wants }] : []
    }),
  }
}
