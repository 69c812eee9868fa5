import { Sequelize } from 'sequelize'
import { SequelizeStorage, Umzug } from 'umzug'
import { migrations } from './index.ts'

/** Any fixed number: two starts at once must not migrate at once. */
const LOCK = 7_461_201

/**
 * Brings a database up to date as the owner of its tables, each migration in a transaction of its own.
 * @returns the names of the migrations applied now, in order
 * @throws Error of the first migration that fails; those before it stay applied
 */
export async function migrate(url: string): Promise<string[]> {
  const sequelize = new Sequelize(url, { dialect: 'postgres', logging: false, pool: { max: 3 } })
  try {
    return await sequelize.transaction(async (lock) => {
      await sequelize.query(`select pg_advisory_xact_lock(${LOCK})`, { transaction: lock })
      await sequelize.query('create schema if not exists migrations')
      const umzug = new Umzug({
        migrations: Object.entries(migrations).map(([name, migration]) => ({
          name,
          up: () =>
            sequelize.transaction((transaction) =>
              migration.up({ query: sequelize.query.bind(sequelize), queryInterface: sequelize.getQueryInterface(), transaction }),
            ),
        })),
        storage: new SequelizeStorage({ sequelize, schema: 'migrations', tableName: 'applied' }),
        logger: undefined,
      })
      return (await umzug.up()).map(({ name }) => name)
    })
  } finally {
    await sequelize.close()
  }
}

if (process.argv[1] === import.meta.filename) {
  const url = process.env.DATABASE_URL
  if (!url) {
    console.error('Set DATABASE_URL to the database to migrate.')
    process.exit(1)
  }
  const applied = await migrate(url)
  console.log(applied.length > 0 ? `applied ${applied.join(', ')}` : 'nothing to apply')
}
