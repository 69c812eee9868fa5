import { ownRow } from '@shared/library/own-rows.ts'
import type { NamedBy } from '@shared/schemas/heats.ts'
import type { OwnKind, WriteLibraryItem } from '@shared/schemas/library.ts'
import type { LibraryItem } from '@shared/schemas/records.ts'
import type { Tenant } from '../config/database.ts'
import { badRequest, conflict, forbidden, HttpProblem, unprocessable } from '../middleware/problem.ts'
import { hasLibraryKey, readLibraryItem } from './library.ts'
import { recordsNaming, type NAMES } from './named-by.ts'
import { row, rows } from './query.ts'

/** Own rows stand before the reference. */
const BEFORE_ALL = -1
const NAMED_FIELD = { 'base-metals': 'spec', 'filler-metals': 'classification', gases: 'name' } as const

/** Records that a row went into, and the heats and lots of it. A position or process is named by what it is called. */
export async function usesOf(tenant: Tenant, { kind, key, title }: Pick<LibraryItem, 'kind' | 'key' | 'title'>): Promise<NamedBy[]> {
  const name: Record<LibraryItem['kind'], keyof typeof NAMES> = { 'base-metals': 'baseMetal', 'filler-metals': 'filler', gases: 'gas', positions: 'position', processes: 'process' }
  const records = await recordsNaming(tenant, name[kind], kind === 'positions' || kind === 'processes' ? title : key)
  const heats = await rows<NamedBy>(tenant, "select 'heat' as kind, id, number, grade as title, kind as state from heats where organization_id = $organizationId and library_key = $key order by number limit 60", { organizationId: tenant.organizationId, key })
  return [...records, ...heats]
}

/** @throws HttpProblem 422 when the organization has such a row already */
export async function createLibraryItem(tenant: Tenant, written: WriteLibraryItem): Promise<LibraryItem> {
  const made = ownRow(written)
  if (await hasLibraryKey(tenant, made.kind, made.key)) throw unprocessable('It is there already', `Your library has ${made.title} already.`, [{ field: `content.${NAMED_FIELD[written.kind]}`, message: `${made.title} is in your library already. Change that row, or give this one another name.`, value: made.title }])
  const { id } = await row<{ id: string }>(
    tenant,
    `insert into library_items (organization_id, kind, key, title, subtitle, search, ordinal, origin, basis, source, content)
     values ($organizationId, $kind, $key, $title, $subtitle, $search, ${BEFORE_ALL}, 'own', $basis, $source, $content::jsonb) returning id`,
    { organizationId: tenant.organizationId, ...made, content: JSON.stringify(made.content) },
  )
  return readLibraryItem(tenant, made.kind, id)
}

async function ownItem(tenant: Tenant, kind: OwnKind, id: string, version: number): Promise<LibraryItem> {
  await rows(tenant, 'select id from library_items where organization_id = $organizationId and id = $id for update', { organizationId: tenant.organizationId, id })
  const item = await readLibraryItem(tenant, kind, id)
  if (item.origin !== 'own') throw forbidden(`${item.title} is a reference row and stays as its source has it. Add a row of your own in its place.`)
  if (item.version !== version) throw conflict(`${item.title} was saved by somebody else since you opened it (version ${item.version}, yours is ${version}). Nothing of yours is lost: compare the two and save again.`, item)
  return item
}

/** Changes an own row; its key stays, so records that copied it still name it. @throws HttpProblem 404; 403 for a reference row; 409 with the stored row when somebody saved first */
export async function saveLibraryItem(tenant: Tenant, kind: OwnKind, id: string, version: number, written: WriteLibraryItem): Promise<LibraryItem> {
  if (written.kind !== kind) throw badRequest(`This row is one of ${kind.replace('-', ' ')}; what was sent is of ${written.kind.replace('-', ' ')}.`, [{ field: 'kind', message: 'A row can’t change its kind.', value: written.kind }])
  const { key } = await ownItem(tenant, kind, id, version)
  const made = ownRow(written, key)
  await rows(
    tenant,
    `update library_items set title = $title, subtitle = $subtitle, search = $search, basis = $basis, source = $source, content = $content::jsonb, version = version + 1
     where organization_id = $organizationId and id = $id returning id`,
    { organizationId: tenant.organizationId, id, title: made.title, subtitle: made.subtitle, search: made.search, basis: made.basis, source: made.source, content: JSON.stringify(made.content) },
  )
  return readLibraryItem(tenant, kind, id)
}

/** @throws HttpProblem as saveLibraryItem; 409 while a record, a heat or a lot names the row */
export async function removeLibraryItem(tenant: Tenant, kind: OwnKind, id: string, version: number): Promise<void> {
  const item = await ownItem(tenant, kind, id, version)
  const uses = await usesOf(tenant, item)
  if (uses.length > 0) throw new HttpProblem(409, 'It is in use', `${uses.slice(0, 3).map(({ number }) => number).join(', ')}${uses.length > 3 ? ` and ${uses.length - 3} more` : ''} name ${item.title}, so it stays.`)
  await rows(tenant, 'delete from library_items where organization_id = $organizationId and id = $id returning id', { organizationId: tenant.organizationId, id })
}
