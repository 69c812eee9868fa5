import { Op } from 'sequelize'
import { DUE_SOON_DAYS, calibrationState, daysUntil, dayWords } from '@shared/machines/calibration.ts'
import type { Tenant } from '../config/database.ts'
import { baseUrl } from '../config/env.ts'
import { Machine } from '../models/machine.ts'
import type { Services } from '../routes/mount.ts'
import { queueMail } from './mails.ts'
import { rows } from './query.ts'

/** The day in the database's calendar, UTC. */
export async function databaseDay(tenant: Tenant): Promise<string> {
  const [found] = await rows<{ today: string }>(tenant, 'select current_date::text as today')
  return found?.today ?? ''
}

const told = ({ number, name, location, calibrationDueOn }: Machine, today: string): string => {
  const due = calibrationDueOn ?? ''
  const days = daysUntil(due, today)
  const when = calibrationState(due, today) === 'lapsed' ? `lapsed on ${dayWords(due)}` : `due on ${dayWords(due)}${days === 0 ? ', today' : `, in ${days} ${days === 1 ? 'day' : 'days'}`}`
  return `${number} ${name}${location ? `, ${location}` : ''}: ${when}`
}

/** One organization's reminder, for machines whose due date has not been told of yet. @returns how many machines it tells of */
export async function remindOrganization(services: Pick<Services, 'queue' | 'env'>, tenant: Tenant): Promise<number> {
  const { organizationId, transaction } = tenant
  const today = await databaseDay(tenant)
  const last = new Date(Date.parse(`${today}T00:00:00Z`) + DUE_SOON_DAYS * 86_400_000).toISOString().slice(0, 10)
  // Locked, so that a second run at the same time waits and then finds them told of.
  const due = (await Machine.findAll({ where: { organizationId, retired: false, calibrationDueOn: { [Op.lte]: last } }, order: [['calibrationDueOn', 'ASC'], ['number', 'ASC']], lock: true, transaction })).filter(({ calibrationDueOn, remindedDueOn }) => calibrationDueOn !== remindedDueOn)
  if (due.length === 0) return 0
  const people = await rows<{ email: string }>(tenant, "select email from people where organization_id = $organizationId and state = 'active' and roles && array['administrator', 'engineer']::text[] order by email", { organizationId })
  if (people.length === 0) return 0
  const [first] = due
  await queueMail(services, tenant, {
    to: people.map(({ email }) => email),
    subject: due.length === 1 && first ? `Calibration of ${first.number} ${first.name}` : `Calibration of ${due.length} machines`,
    text: `Calibrations that are due or have lapsed:\n\n${due.map((machine) => `- ${told(machine, today)}\n  ${baseUrl(services.env)}/machines/${machine.id}`).join('\n')}\n\nUntil a new certificate is recorded, panel cards of these machines carry a warning. Each due date is told of once.\n`,
  })
  for (const machine of due) await machine.update({ remindedDueOn: machine.calibrationDueOn }, { transaction })
  return due.length
}

/** All organizations, one transaction each, so that one that fails does not hold back the others. @throws the first failure, after all were tried */
export async function remindOfCalibrations(services: Services): Promise<void> {
  const { rows: organizations } = await services.database.owner.query<{ id: string }>('select id from organizations order by id')
  const failures: unknown[] = []
  for (const { id } of organizations) {
    await services.database.withTenant(id, (tenant) => remindOrganization(services, tenant)).catch((error: unknown) => failures.push(error))
  }
  if (failures.length > 0) throw failures[0] instanceof Error ? failures[0] : new Error('a reminder could not be written', { cause: failures[0] })
}
