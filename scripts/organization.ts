/** Opens an organization with its first administrator: how real work begins without the demo firm. */
import { randomBytes } from 'node:crypto'
import { parseArgs } from 'node:util'
import { openDatabase } from '../server/config/database.ts'
import { migrate } from '../server/migrations/run.ts'
import { bindModels } from '../server/models/index.ts'
import { addPerson, createOrganization } from '../server/services/organizations.ts'
import { emailSchema, nameSchema } from '../shared/schemas/people.ts'
import { loadDotEnv } from './lib/environment.mjs'
import { complain, Refusal } from './lib/steps.mjs'
import { ensureCluster, ensureDatabase, releaseCluster } from './postgres.ts'

const help = `npm run organization -- --name "Works" --person "Name" --email name@works.example [--units SI|US]

Opens an organization in the product's database with one administrator, who can then invite the others,
and prints that person's first password, once. Start the product with DEMO=0 to work without the demo firm.`

async function main(): Promise<void> {
  const { values } = parseArgs({ options: { name: { type: 'string' }, person: { type: 'string' }, email: { type: 'string' }, units: { type: 'string', default: 'SI' }, help: { type: 'boolean', short: 'h' } } })
  if (values.help) return console.log(help)
  const name = nameSchema.safeParse(values.name)
  const person = nameSchema.safeParse(values.person)
  const email = emailSchema.safeParse(values.email)
  if (!name.success) throw new Refusal(`--name is the organization's name as it should stand on documents.\n\n${help}`)
  if (!person.success) throw new Refusal(`--person is the administrator's name as it should stand on documents.\n\n${help}`)
  if (!email.success) throw new Refusal(`--email is the administrator's e-mail address, like name@example.com.\n\n${help}`)
  if (values.units !== 'SI' && values.units !== 'US') throw new Refusal(`--units is SI or US, not "${values.units}".`)

  loadDotEnv()
  const given = process.env.DATABASE_URL
  const url = given ?? (await ensureCluster('pg')).url('sidebend')
  try {
    await ensureDatabase(url)
    await migrate(url)
    const password = randomBytes(12).toString('base64url')
    const database = openDatabase(url)
    bindModels(database.sequelize)
    try {
      await createOrganization(database, { name: name.data, defaultUnitSystem: values.units }, async (tenant) => {
        await addPerson(tenant, { name: person.data, email: email.data, roles: ['administrator'], password })
      })
    } catch (error) {
      if (error instanceof Error && error.name === 'SequelizeUniqueConstraintError') throw new Refusal(`Somebody with the address ${email.data} can sign in already. Use another address, or that person's account.`)
      throw error
    } finally {
      await database.close()
    }
    console.log(`${name.data} is open. ${person.data} signs in as ${email.data} with the password\n\n  ${password}\n\nand should change it at once, under Account.`)
  } finally {
    if (!given) await releaseCluster('pg')
  }
}

await main().catch((error: unknown) => {
  const wrongOption = (error as NodeJS.ErrnoException).code?.startsWith('ERR_PARSE_ARGS')
  complain(wrongOption ? new Refusal(`${(error as Error).message.split('. ')[0]}.\n\n${help}`) : error)
  process.exitCode = 1
})
