import type { Page } from '@shared/schemas/common.ts'
import type { Tenant } from '../config/database.ts'
import { badRequest } from '../middleware/problem.ts'
import { likeAnywhere, row, rows, searchWords } from './query.ts'

interface SortKey {
  /** SQL expression over the list's tables, never null. */
  expression: string
  type: 'integer' | 'text' | 'timestamptz'
}

export interface KeysetList {
  /** Columns, aliased; must include the id as `id`. */
  select: string
  from: string
  /** Conditions, all of which must hold; bound values as `$name`. */
  where: readonly string[]
  bind: Record<string, unknown>
  id: string
  /** By name; the request's sort is a name or `-name`. */
  sorts: Readonly<Record<string, SortKey>>
  /** SQL text that words of a search are looked for in. */
  searched?: string
}

export interface PageRequest { q?: string | undefined; sort?: string | undefined; cursor?: string | undefined; limit: number }

const encode = (sort: string, value: string, id: string): string => Buffer.from(JSON.stringify([sort, value, id])).toString('base64url')

const holds: Readonly<Record<SortKey['type'], RegExp>> = { integer: /^-?\d{1,9}$/, text: /^[^\0]*$/s, timestamptz: /^\d{4}-\d\d-\d\d[ T]\d\d:\d\d:\d\d(\.\d{1,6})?\+00$/ }

function decode(cursor: string, sort: string, type: SortKey['type']): { value: string; id: string } {
  try {
    const parts: unknown = JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8'))
    if (Array.isArray(parts) && parts.length === 3 && parts[0] === sort && typeof parts[1] === 'string' && typeof parts[2] === 'string') {
      const [, value, id] = parts as [string, string, string]
      if (holds[type].test(value) && /^[0-9a-f-]{36}$/.test(id)) return { value, id }
    }
  } catch {
    // Told below, whatever was wrong with it.
  }
  throw badRequest('The cursor does not belong to this list in this order. Start again at its first page.', [{ field: 'cursor', message: 'Use the value of `next` as it was given.', value: cursor.slice(0, 80) }])
}

/**
 * One page of a list, by keyset: rows added or removed meanwhile neither repeat nor hide others.
 * @param request `sort` is a name of `list.sorts`, with `-` in front for the last first
 * @throws HttpProblem 400 for a cursor of another list or order
 */
export async function listPage<Row extends { id: string }>(tenant: Tenant, list: KeysetList, request: PageRequest, defaultSort: string): Promise<Page<Row>> {
  const sort = request.sort ?? defaultSort
  const descending = sort.startsWith('-')
  const key = list.sorts[descending ? sort.slice(1) : sort]
  if (!key) throw badRequest(`This list has no order "${sort}".`)
  const bind: Record<string, unknown> = { ...list.bind }
  const where = [...list.where]
  searchWords(request.q).forEach((word, index) => {
    bind[`word${index}`] = likeAnywhere(word)
    where.push(`(${list.searched ?? "''"}) ilike $word${index}`)
  })
  const total = await row<{ count: number }>(tenant, `select count(*)::int as count from ${list.from} where ${['true', ...where].join(' and ')}`, bind)
  const paged = { ...bind, limit: request.limit + 1 }
  if (request.cursor !== undefined) {
    const after = decode(request.cursor, sort, key.type)
    Object.assign(paged, { afterValue: after.value, afterId: after.id })
    where.push(`(${key.expression}, ${list.id}) ${descending ? '<' : '>'} ($afterValue::${key.type}, $afterId::uuid)`)
  }
  const direction = descending ? 'desc' : 'asc'
  const found = await rows<Row & { sort_value: string }>(
    tenant,
    `select ${list.select}, (${key.expression})::text as sort_value from ${list.from} where ${['true', ...where].join(' and ')} order by ${key.expression} ${direction}, ${list.id} ${direction} limit $limit`,
    paged,
  )
  const items = found.slice(0, request.limit)
  const last = items.at(-1)
  return { items, total: total.count, next: found.length > request.limit && last ? encode(sort, last.sort_value, last.id) : null }
}
