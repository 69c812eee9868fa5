import type { Page } from '@shared/schemas/common.ts'
import { DUE_SOON_DAYS, calibrationState } from '@shared/machines/calibration.ts'
import { panelCard } from '@shared/machines/panel-card.ts'
import type { MachineRow, PanelCard, WriteMachine } from '@shared/schemas/machines.ts'
import type { Process } from '@shared/schemas/welding.ts'
import type { Tenant } from '../config/database.ts'
import { conflict, notFound } from '../middleware/problem.ts'
import { Machine } from '../models/machine.ts'
import type { Actor } from '../policies/index.ts'
import { presentMachine } from '../presenters/machine.ts'
import type { QueryRead } from '../routes/mount.ts'
import { databaseDay } from './calibration-reminders.ts'
import { listPage } from './keyset.ts'
import { nextNumber } from './number-series.ts'
import { findRevision } from './revisions.ts'

/** @throws HttpProblem 404 also for another organization's */
export async function findMachine({ organizationId, transaction }: Tenant, id: string, { lock = false } = {}): Promise<Machine> {
  const machine = await Machine.findOne({ where: { organizationId, id }, transaction, lock })
  if (!machine) throw notFound('machine')
  return machine
}

const columns = (content: WriteMachine) => ({ content, name: content.name, location: content.location, retired: content.retired, calibrationDueOn: content.calibration.dueOn })

export async function createMachine(tenant: Tenant, content: WriteMachine): Promise<Machine> {
  const { organizationId, transaction } = tenant
  return Machine.create({ organizationId, number: await nextNumber(tenant, 'machines'), ...columns(content) }, { transaction })
}

/** @throws HttpProblem 404; 409 whose `current` is the stored machine with `sent` beside it, when somebody saved first */
export async function saveMachine(tenant: Tenant, actor: Actor, id: string, version: number, content: WriteMachine): Promise<Machine> {
  const machine = await findMachine(tenant, id, { lock: true })
  if (machine.version !== version) {
    const current = { ...presentMachine(actor, machine), sent: content }
    throw conflict(`${machine.number} was saved by somebody else since you opened it (version ${machine.version}, yours is ${version}). Nothing of yours is lost: compare the two and save again.`, current)
  }
  return machine.update({ ...columns(content), version: version + 1, updatedAt: new Date() }, { transaction: tenant.transaction })
}

interface Row { id: string; number: string; name: string; location: string; modes: { key: string; name: string; kind: MachineRow['modes'][number]['kind']; processes: Process[] }[]; calibrationDueOn: string | null; retired: boolean; updatedAt: Date }

const CALIBRATION: Readonly<Record<MachineRow['calibration'], string>> = {
  unknown: 'm.calibration_due_on is null',
  lapsed: 'm.calibration_due_on < current_date',
  'due-soon': `m.calibration_due_on between current_date and current_date + ${DUE_SOON_DAYS}`,
  current: `m.calibration_due_on > current_date + ${DUE_SOON_DAYS}`,
}

/** The organization's machines. `retired` left out shows those in use. */
export async function listMachines(tenant: Tenant, query: QueryRead<'listMachines'>): Promise<Page<MachineRow>> {
  const where = ['m.organization_id = $organizationId']
  const bind: Record<string, unknown> = { organizationId: tenant.organizationId }
  if (query.calibration) where.push(CALIBRATION[query.calibration])
  if (query.retired !== 'with') where.push(query.retired === 'only' ? 'm.retired' : 'not m.retired')
  if (query.process) {
    where.push("m.content->'modes' @> jsonb_build_array(jsonb_build_object('processes', jsonb_build_array($process::text)))")
    bind.process = query.process
  }
  const page = await listPage<Row>(
    tenant,
    {
      id: 'm.id',
      select: `m.id, m.number, m.name, m.location, m.calibration_due_on::text as "calibrationDueOn", m.retired, m.updated_at as "updatedAt",
        coalesce((select jsonb_agg(jsonb_build_object('key', mode->>'key', 'name', mode->>'name', 'kind', mode->>'kind', 'processes', mode->'processes') order by place) from jsonb_array_elements(m.content->'modes') with ordinality as each(mode, place)), '[]') as modes`,
      from: 'machines m',
      where,
      bind,
      sorts: {
        number: { expression: "substring(m.number from '[0-9]+$')::integer", type: 'integer' },
        name: { expression: 'lower(m.name)', type: 'text' },
        calibrationDueOn: { expression: "coalesce(m.calibration_due_on::text, '9999')", type: 'text' },
        updatedAt: { expression: 'm.updated_at', type: 'timestamptz' },
      },
      searched: "m.number || ' ' || m.name || ' ' || m.location || ' ' || (m.content->>'serial') || ' ' || (m.content->>'feeder')",
    },
    query,
    'number',
  )
  const today = await databaseDay(tenant)
  return {
    ...page,
    items: page.items.map(({ id, number, name, location, modes, calibrationDueOn, retired, updatedAt }) => ({
      id, number, name, location, calibrationDueOn, retired,
      modes: modes.map((mode) => ({ key: mode.key, name: mode.name, kind: mode.kind })),
      processes: [...new Set(modes.flatMap(({ processes }) => processes))],
      calibration: calibrationState(calibrationDueOn, today),
      updatedAt: updatedAt.toISOString(),
    })),
  }
}

/** The card of a revision's process on a machine. @throws HttpProblem 404 for the revision or the machine */
export async function readPanelCard(tenant: Tenant, revisionId: string, query: QueryRead<'readPanelCard'>): Promise<PanelCard> {
  const revision = await findRevision(tenant, revisionId)
  const { number, content } = await findMachine(tenant, query.machine)
  return panelCard({ variables: revision.content.variables, state: revision.state, processId: query.process ?? null, machine: { number, content }, mode: query.mode, program: query.program, pass: query.pass, today: await databaseDay(tenant) })
}
