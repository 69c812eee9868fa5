import pg from 'pg'
import { Sequelize, type Transaction } from 'sequelize'

/** The role under which requests run: it owns nothing and cannot step around row-level security. */
export const RUNTIME_ROLE = 'sidebend_runtime'

/** One organization's view of the database: rows of others do not exist in its transaction. */
export interface Tenant {
  organizationId: string
  transaction: Transaction
}

export interface Database {
  sequelize: Sequelize
  /** Connections as the owner of the tables: sessions, sign-in and other acts before an organization is known. Keep its use rare. */
  owner: pg.Pool
  withTenant: <T>(organizationId: string, work: (tenant: Tenant) => Promise<T>) => Promise<T>
  close: () => Promise<void>
}

/** Opens the pools. Models are bound separately (models/index.ts). */
export function openDatabase(url: string, { poolSize = 10 } = {}): Database {
  const sequelize = new Sequelize(url, { dialect: 'postgres', logging: false, pool: { max: poolSize, idle: 10_000 }, define: { underscored: true, timestamps: false } })
  sequelize.addHook('afterConnect', async (connection: unknown) => {
    await (connection as pg.Client).query(`set role ${RUNTIME_ROLE}`)
  })
  const owner = new pg.Pool({ connectionString: url, max: 6, idleTimeoutMillis: 10_000 })
  // An idle connection lost to a database restart must not end the process.
  owner.on('error', () => undefined)
  return {
    sequelize,
    owner,
    withTenant: (organizationId, work) =>
      sequelize.transaction(async (transaction) => {
        await sequelize.query("select set_config('app.organization_id', :organizationId, true)", { transaction, replacements: { organizationId } })
        return work({ organizationId, transaction })
      }),
    close: async () => {
      await sequelize.close()
      await owner.end()
    },
  }
}
