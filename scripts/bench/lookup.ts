import pg from 'pg'
import { RUNTIME_ROLE } from '../../server/config/database.ts'
import { createApp } from '../../server/app.ts'
import { readEnv } from '../../server/config/env.ts'
import { closeServices, openServices } from '../../server/config/services.ts'
import { freePort } from '../lib/ports.mjs'
import { alternate, median, type Figure } from './measure.ts'
import { signInAs, type Caller } from './product.ts'
import { readStatement, type Statement } from './statement.ts'

/** What one look-up sends to the database, read off an instance of the application in this process. */
async function statementsOf(environment: NodeJS.ProcessEnv, query: string): Promise<Statement[]> {
  const services = await openServices(readEnv(environment))
  const statements: Statement[] = []
  // Sequelize's types leave out the options that it reads at each query.
  const { options } = services.database.sequelize as unknown as { options: { logging: false | ((line: string) => void); logQueryParameters?: boolean } }
  const port = await freePort()
  const listener = createApp(services).listen(port, '127.0.0.1')
  try {
    const caller = await signInAs(`http://127.0.0.1:${port}`, 'welder')
    await caller.get(`/api/lookup?${query}`)
    options.logging = (line) => {
      const statement = readStatement(line)
      if (statement) statements.push(statement)
    }
    options.logQueryParameters = true
    await caller.get(`/api/lookup?${query}`)
    options.logging = false
  } finally {
    await new Promise((resolve) => listener.close(resolve))
    await closeServices(services)
  }
  if (!statements.some((statement) => /\bselect\b[^]*\bfrom\b/i.test(statement.text))) throw new Error('The look-up sent no query that could be read off, so there is nothing to compare with.')
  return statements
}

/** GET /api/lookup, signed in, against the statements that it sends, straight through pg on one connection under the same role. */
export async function measureLookup(caller: Caller, environment: NodeJS.ProcessEnv, seconds: number): Promise<Figure[]> {
  const query = new URLSearchParams({ line: '12 mm plate GMAW 3G' }).toString()
  const statements = await statementsOf(environment, query)
  const client = new pg.Client(environment.DATABASE_URL)
  await client.connect()
  try {
    await client.query(`set role ${RUNTIME_ROLE}`)
    const times = await alternate(
      {
        api: async () => (await caller.get(`/api/lookup?${query}`)).arrayBuffer(),
        sql: async () => {
          for (const { text, values } of statements) await client.query(text, values)
        },
      },
      seconds,
    )
    const api = median(times.api)
    const sql = median(times.sql)
    const note = `median of ${times.api.length}, one at a time`
    return [
      { name: 'Look-up through the API', value: api, unit: 'ms', note: `${note}, signed in` },
      { name: 'The same SQL straight through pg', value: sql, unit: 'ms', note: `${note}, ${statements.length} statements` },
      { name: 'Look-up: API / SQL', value: api / sql, unit: '×', note: 'session, policy, reading the question, judging fits, JSON' },
    ]
  } finally {
    await client.end()
  }
}
