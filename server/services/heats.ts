import { Op } from 'sequelize'
import type { Page } from '@shared/schemas/common.ts'
import { writeHeatSchema, type HeatRow, type NamedBy, type WriteHeat } from '@shared/schemas/heats.ts'
import type { Tenant } from '../config/database.ts'
import { conflict, HttpProblem, notFound, unprocessable } from '../middleware/problem.ts'
import { Heat } from '../models/heat.ts'
import type { Actor } from '../policies/index.ts'
import { presentHeat } from '../presenters/heat.ts'
import type { QueryRead, Services } from '../routes/mount.ts'
import { attachmentsTo, removeAttachment } from './attachments.ts'
import { listPage } from './keyset.ts'
import { hasLibraryKey } from './library.ts'
import { recordsNaming } from './named-by.ts'

/** @throws HttpProblem 404 also for another organization's */
export async function findHeat({ organizationId, transaction }: Tenant, id: string, { lock = false } = {}): Promise<Heat> {
  const heat = await Heat.findOne({ where: { organizationId, id }, transaction, lock })
  if (!heat) throw notFound('heat or lot')
  return heat
}

const called = { heat: 'heat', lot: 'lot' } as const

/** Records that name the heat or lot by its number. */
const recordsOfHeat = (tenant: Tenant, { kind, number }: Pick<Heat, 'kind' | 'number'>): Promise<NamedBy[]> => recordsNaming(tenant, kind, number)

/** One number of one grade is one heat; the library row that it is said to be of is there. @throws HttpProblem 422 by field */
async function check(tenant: Tenant, content: WriteHeat, id: string | null): Promise<void> {
  const { organizationId, transaction } = tenant
  const { kind, number, grade, libraryId } = content
  const twin = await Heat.findOne({ where: { organizationId, kind, number, grade, ...(id !== null && { id: { [Op.ne]: id } }) }, attributes: ['id'], transaction })
  if (twin) throw unprocessable('It is recorded already', `${grade} ${called[kind]} ${number} is recorded already.`, [{ field: 'number', message: `${grade} ${called[kind]} ${number} is recorded already. Open that one, or check the number.`, value: number }])
  if (libraryId !== null && !(await hasLibraryKey(tenant, kind === 'heat' ? 'base-metals' : 'filler-metals', libraryId))) {
    throw unprocessable('Not in the library', `The library has no ${kind === 'heat' ? 'base metal' : 'filler metal'} “${libraryId}”.`, [{ field: 'grade', message: 'The library no longer has this row: pick the grade again, or leave it as written.', value: libraryId }])
  }
}

const columns = (content: WriteHeat) => ({ content, kind: content.kind, number: content.number, grade: content.grade, libraryKey: content.libraryId })

/** @throws HttpProblem 422 for a heat that is recorded already, or a library row that is not there */
export async function createHeat(tenant: Tenant, content: WriteHeat): Promise<Heat> {
  await check(tenant, content, null)
  return Heat.create({ organizationId: tenant.organizationId, ...columns(content) }, { transaction: tenant.transaction })
}

/** @throws HttpProblem 404; 422 as createHeat; 409 whose `current` is the stored heat with `sent` beside it, when somebody saved first */
export async function saveHeat(tenant: Tenant, actor: Actor, id: string, version: number, content: WriteHeat): Promise<Heat> {
  const heat = await findHeat(tenant, id, { lock: true })
  if (heat.version !== version) {
    const current = { ...(await presentHeat(tenant, actor, heat)), sent: content }
    throw conflict(`${heat.number} was saved by somebody else since you opened it (version ${heat.version}, yours is ${version}). Nothing of yours is lost: compare the two and save again.`, current)
  }
  await check(tenant, content, id)
  return heat.update({ ...columns(content), version: version + 1, updatedAt: new Date() }, { transaction: tenant.transaction })
}

/** Removes a heat or lot with its files. @throws HttpProblem 404; 409 when somebody saved first or a record names it */
export async function removeHeat(services: Pick<Services, 'queue'>, tenant: Tenant, id: string, version: number): Promise<void> {
  const heat = await findHeat(tenant, id, { lock: true })
  if (heat.version !== version) throw conflict(`${heat.number} was saved by somebody else since you opened it. Read it again before you remove it.`)
  const naming = await recordsOfHeat(tenant, heat)
  if (naming.length > 0) throw new HttpProblem(409, 'Records name it', `${naming.slice(0, 3).map(({ number }) => number).join(', ')}${naming.length > 3 ? ` and ${naming.length - 3} more` : ''} name ${called[heat.kind]} ${heat.number}, so its certificates are kept.`)
  for (const attachment of await attachmentsTo(tenant, { heatId: id })) await removeAttachment(services, tenant, attachment)
  await heat.destroy({ transaction: tenant.transaction })
}

interface Row extends Pick<HeatRow, 'id' | 'kind' | 'number' | 'grade' | 'libraryId' | 'files'> { content: unknown; updatedAt: Date }

/** The organization's heats and lots. */
export async function listHeats(tenant: Tenant, query: QueryRead<'listHeats'>): Promise<Page<HeatRow>> {
  const where = ['h.organization_id = $organizationId']
  const bind: Record<string, unknown> = { organizationId: tenant.organizationId }
  if (query.kind) {
    where.push('h.kind = $kind')
    bind.kind = query.kind
  }
  if (query.libraryId) {
    where.push('h.library_key = $libraryId')
    bind.libraryId = query.libraryId
  }
  const page = await listPage<Row>(
    tenant,
    {
      id: 'h.id',
      select: `h.id, h.kind, h.number, h.grade, h.library_key as "libraryId", h.content, h.updated_at as "updatedAt",
        (select count(*)::int from attachments a where a.organization_id = h.organization_id and a.heat_id = h.id) as files`,
      from: 'heats h',
      where,
      bind,
      sorts: {
        number: { expression: 'lower(h.number)', type: 'text' },
        grade: { expression: 'lower(h.grade)', type: 'text' },
        updatedAt: { expression: 'h.updated_at', type: 'timestamptz' },
      },
      searched: "h.number || ' ' || h.grade || ' ' || coalesce(h.content->>'certificate', '') || ' ' || coalesce(h.library_key, '')",
    },
    query,
    '-updatedAt',
  )
  return {
    ...page,
    items: page.items.map(({ id, kind, number, grade, libraryId, files, content, updatedAt }) => {
      const { certificate, certificateType, receivedOn, chemistryOf, chemistry } = writeHeatSchema.parse(content)
      return { id, kind, number, grade, libraryId, files, certificate, certificateType, receivedOn, chemistryOf, chemistry, updatedAt: updatedAt.toISOString() }
    }),
  }
}
