import type { z } from 'zod'
import type { Page } from '@shared/schemas/common.ts'
import type { endpoints } from '@shared/schemas/endpoints.ts'
import type { LibraryItem } from '@shared/schemas/records.ts'
import { findBaseMetals } from '@shared/library/base-metals.ts'
import { findFillers } from '@shared/library/filler-metals.ts'
import { findGases } from '@shared/library/gases.ts'
import { libraryRows } from '@shared/library/library-rows.ts'
import { readProcess } from '@shared/library/processes.ts'
import { matchScore } from '@shared/library/search.ts'
import type { Tenant } from '../config/database.ts'
import { badRequest, notFound } from '../middleware/problem.ts'
import { rows } from './query.ts'

type Kind = LibraryItem['kind']
type Query = z.output<(typeof endpoints)['listLibrary']['query']>

const upToDate = new Set<string>()

/** Writes the reference rows of this version of the program into the organization's library; rows that are as they should be are left alone. */
export async function loadLibrary(tenant: Tenant): Promise<void> {
  const { organizationId, transaction } = tenant
  const given = libraryRows().map(({ content, ...row }, ordinal) => ({ ...row, ordinal, content }))
  await rows(
    tenant,
    `insert into library_items (organization_id, kind, key, title, subtitle, search, ordinal, origin, basis, source, content)
     select $organizationId, kind, key, title, subtitle, search, ordinal, 'reference', basis, source, content
     from jsonb_to_recordset($given::jsonb) as given (kind text, key text, title text, subtitle text, search text, ordinal integer, basis text, source text, content jsonb)
     order by kind, key
     on conflict (organization_id, kind, key) do update
       set title = excluded.title, subtitle = excluded.subtitle, search = excluded.search, ordinal = excluded.ordinal, basis = excluded.basis,
           source = excluded.source, content = excluded.content, version = library_items.version + 1
       where library_items.origin = 'reference' and (library_items.content, library_items.title, library_items.subtitle, library_items.search, library_items.ordinal)
         is distinct from (excluded.content, excluded.title, excluded.subtitle, excluded.search, excluded.ordinal)
     returning id`,
    { organizationId, given: JSON.stringify(given) },
  )
  transaction.afterCommit(() => {
    upToDate.add(organizationId)
  })
}

interface Candidate { id: string; key: string; title: string; search: string; ordinal: number; origin: string; processes: string[] | null; pNumber: string | null; fNumber: string | null }

const candidatesOf = (tenant: Tenant, kind: Kind): Promise<Candidate[]> =>
  rows<Candidate>(
    tenant,
    `select id, key, title, search, ordinal, origin, content->'processes' as processes, content->>'p_no' as "pNumber", content->>'f_no' as "fNumber"
     from library_items where organization_id = $organizationId and kind = $kind order by ordinal, id`,
    { organizationId: tenant.organizationId, kind },
  )

async function candidates(tenant: Tenant, kind: Kind): Promise<Candidate[]> {
  const known = upToDate.has(tenant.organizationId) ? await candidatesOf(tenant, kind) : []
  if (known.length > 0) return known
  await loadLibrary(tenant)
  return candidatesOf(tenant, kind)
}

const ALL = 10_000

/** Places of the reference rows in the answer to a query, by key. */
function referenceOrder(kind: Kind, q: string): Map<string, number> | null {
  if (kind === 'base-metals') return new Map(findBaseMetals(q, ALL).map(({ id }, place) => [id, place]))
  if (kind === 'filler-metals') return new Map(findFillers(q, ALL).map(({ id }, place) => [id, place]))
  if (kind === 'gases') return new Map(findGases(q, ALL).map(({ id }, place) => [id, place]))
  return null
}

/** A row's place: smaller is better, null is no match. An organization's own row that matches well stands before the reference. */
function placeBy(kind: Kind, q: string | undefined): (row: Candidate) => number | null {
  if (!q) return ({ ordinal }) => ordinal
  const reference = referenceOrder(kind, q)
  return (row) => {
    if (reference && row.origin === 'reference') return reference.get(row.key) ?? null
    const score = matchScore(q, row)
    if (score === 0) return null
    return reference ? (score >= 40 ? -score : ALL - score) : -score
  }
}

const encode = (place: number, ordinal: number, id: string): string => Buffer.from(JSON.stringify([place, ordinal, id])).toString('base64url')

function decode(cursor: string): [number, number, string] {
  try {
    const read: unknown = JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8'))
    if (Array.isArray(read) && read.length === 3 && typeof read[0] === 'number' && typeof read[1] === 'number' && typeof read[2] === 'string') return [read[0], read[1], read[2]]
  } catch {
    // Told below, whatever was wrong with it.
  }
  throw badRequest('The cursor is not one that this list gave. Start again at its first page.', [{ field: 'cursor', message: 'Use the value of `next` as it was given.', value: cursor.slice(0, 80) }])
}

const columns = 'id, kind, key, title, subtitle, origin, basis, source, content, version'

/** Library rows that answer to all words of the query, best first; without a query, in the library's own order. */
export async function listLibrary(tenant: Tenant, kind: Kind, { q, cursor, limit, process, pNumber, fNumber }: Query): Promise<Page<LibraryItem>> {
  const place = placeBy(kind, q)
  const placed = (await candidates(tenant, kind))
    .filter((row) => (!process || row.processes?.some((written) => written === process || readProcess(written)?.process === process)) && (!pNumber || row.pNumber?.toUpperCase() === pNumber.toUpperCase()) && (!fNumber || row.fNumber === fNumber))
    .flatMap((row) => {
      const at = place(row)
      return at === null ? [] : [{ id: row.id, at, ordinal: row.ordinal }]
    })
    .sort((one, other) => one.at - other.at || one.ordinal - other.ordinal || (one.id < other.id ? -1 : 1))
  const [afterPlace, afterOrdinal, afterId] = cursor === undefined ? [-Infinity, 0, ''] : decode(cursor)
  const rest = placed.filter(({ id, at, ordinal }) => at > afterPlace || (at === afterPlace && (ordinal > afterOrdinal || (ordinal === afterOrdinal && id > afterId))))
  const page = rest.slice(0, limit)
  const ids = page.map(({ id }) => id)
  const found = await rows<LibraryItem>(tenant, `select ${columns} from library_items where organization_id = $organizationId and id = any($ids::uuid[])`, { organizationId: tenant.organizationId, ids })
  const byId = new Map(found.map((item) => [item.id, item]))
  const last = page.at(-1)
  return {
    items: ids.flatMap((id) => byId.get(id) ?? []),
    total: placed.length,
    next: last && rest.length > page.length ? encode(last.at, last.ordinal, last.id) : null,
  }
}

/** @throws HttpProblem 404 */
export async function readLibraryItem(tenant: Tenant, kind: Kind, id: string): Promise<LibraryItem> {
  const [item] = await rows<LibraryItem>(tenant, `select ${columns} from library_items where organization_id = $organizationId and kind = $kind and id = $id`, { organizationId: tenant.organizationId, kind, id })
  if (!item) throw notFound('library row')
  return item
}

/** Whether the organization's library has a row with that key. */
export async function hasLibraryKey(tenant: Tenant, kind: Kind, key: string): Promise<boolean> {
  return (await candidates(tenant, kind)).some((row) => row.key === key)
}
