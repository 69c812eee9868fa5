import { QueryTypes } from 'sequelize'
import type { Tenant } from '../config/database.ts'

/** Rows of one SQL statement inside the tenant's transaction; `$name` stands for a bound value, so text never becomes SQL. */
export const rows = <T extends object>({ transaction }: Tenant, sql: string, bind: Record<string, unknown> = {}): Promise<T[]> => {
  const { sequelize } = transaction as unknown as { sequelize: import('sequelize').Sequelize }
  return sequelize.query<T>(sql, { type: QueryTypes.SELECT, bind, transaction })
}

/** Exactly one row. @throws Error when there is none, which would be a fault of ours */
export async function row<T extends object>(tenant: Tenant, sql: string, bind: Record<string, unknown> = {}): Promise<T> {
  const [first] = await rows<T>(tenant, sql, bind)
  if (!first) throw new Error('a query that always gives a row gave none')
  return first
}

/** A word of a search as a LIKE pattern: what the person typed, anywhere. */
export const likeAnywhere = (word: string): string => `%${word.replace(/[\\%_]/g, (sign) => `\\${sign}`)}%`

/** The words that a search holds; all of them must be found. */
export const searchWords = (q: string | undefined): string[] => (q ?? '').toLowerCase().split(/\s+/).filter((word) => word !== '').slice(0, 12)
