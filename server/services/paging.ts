import { Op, type Attributes, type FindOptions, type Model, type ModelStatic, type WhereOptions } from 'sequelize'
import { z } from 'zod'
import type { Tenant } from '../config/database.ts'
import { badRequest } from '../middleware/problem.ts'
import type { Page } from '../../shared/schemas/common.ts'

const cursorSchema = z.tuple([z.string(), z.union([z.string(), z.number()]), z.string()])

const writeCursor = (sort: string, value: unknown, id: string): string =>
  Buffer.from(JSON.stringify([sort, value instanceof Date ? value.toISOString() : value, id])).toString('base64url')

function readCursor(cursor: string, sort: string): [string | number, string] {
  let parsed: unknown
  try {
    parsed = JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8'))
  } catch {
    parsed = undefined
  }
  const read = cursorSchema.safeParse(parsed)
  if (!read.success || read.data[0] !== sort) throw badRequest('The cursor is not one that this list gave, or the order was changed since. Begin again without it.', [{ field: 'cursor', message: 'Leave it out to begin at the first page.', value: cursor.slice(0, 40) }])
  return [read.data[1], read.data[2]]
}

export interface PageRequest<M extends Model> {
  /** As in the endpoint's `sort`: an attribute of the model that is never null, with `-` before it for descending. */
  sort: string
  cursor?: string
  limit: number
  where?: WhereOptions<Attributes<M>>
  include?: FindOptions['include']
}

/**
 * One page of an organization's rows in a stable order: by the sort attribute, then by id, from where the last page ended.
 * Rows added or removed meanwhile neither repeat nor hide others. Timestamps must be stored to the millisecond, as a cursor keeps them.
 * @throws HttpProblem 400 when the cursor is not one of this list and order
 */
export async function pageOfRows<M extends Model>(model: ModelStatic<M>, { organizationId, transaction }: Tenant, { sort, cursor, limit, where = {}, include }: PageRequest<M>): Promise<Page<M>> {
  const descending = sort.startsWith('-')
  const attribute = descending ? sort.slice(1) : sort
  const conditions: unknown[] = [{ organizationId }, where]
  const total = await model.count({ where: { [Op.and]: [...conditions] } as WhereOptions<Attributes<M>>, transaction })
  if (cursor) {
    const [value, id] = readCursor(cursor, sort)
    const beyond = descending ? Op.lt : Op.gt
    conditions.push({ [Op.or]: [{ [attribute]: { [beyond]: value } }, { [attribute]: value, id: { [beyond]: id } }] })
  }
  const direction = descending ? 'DESC' : 'ASC'
  const rows = await model.findAll({ where: { [Op.and]: conditions } as WhereOptions<Attributes<M>>, include, order: [[attribute, direction], ['id', direction]], limit: limit + 1, transaction })
  const items = rows.slice(0, limit)
  const last = items.at(-1)
  return { items, total, next: rows.length > limit && last ? writeCursor(sort, last.get(attribute), String(last.get('id'))) : null }
}

/** A pattern for `ILIKE` that finds the text as typed: its `%`, `_` and `\` are themselves. */
export const containing = (text: string): string => `%${text.replace(/[\\%_]/g, '\\$&')}%`
