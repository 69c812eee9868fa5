import { randomUUID } from 'node:crypto'
import { QueryTypes } from 'sequelize'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { RUNTIME_ROLE } from '../../server/config/database.ts'
import { migrate } from '../../server/migrations/run.ts'
import { Person } from '../../server/models/person.ts'
import { queueMail } from '../../server/services/mails.ts'
import { problem, startApp, type TestApp, type TestOrganization } from './harness.ts'

let app: TestApp
let ours: TestOrganization
let theirs: TestOrganization
beforeAll(async () => {
  app = await startApp()
  ;[ours, theirs] = [await app.makeOrganization(), await app.makeOrganization()]
})
afterAll(() => app.close())

const tables = async (): Promise<string[]> => {
  const { rows } = await app.services.database.owner.query<{ name: string }>("select tablename as name from pg_tables where schemaname = 'public' order by 1")
  return rows.map(({ name }) => name)
}

describe('row-level security', () => {
  it('closes every table of ours: organization_id, security on, a policy for the runtime role', async () => {
    const { rows } = await app.services.database.owner.query<{ name: string; scoped: boolean; secured: boolean; policies: number }>(`
      select c.relname as name, c.relrowsecurity as secured,
        exists (select from pg_attribute a where a.attrelid = c.oid and a.attname = 'organization_id' and not a.attisdropped) as scoped,
        (select count(*)::int from pg_policies p where p.tablename = c.relname and p.schemaname = 'public' and '${RUNTIME_ROLE}' = any (p.roles)) as policies
      from pg_class c join pg_namespace n on n.oid = c.relnamespace where n.nspname = 'public' and c.relkind in ('r', 'p') order by 1`)
    expect(rows.length).toBeGreaterThan(6)
    expect(rows.filter(({ scoped, secured, policies }) => !scoped || !secured || policies !== 1)).toEqual([])
  })

  it('runs requests as a role that owns nothing and cannot step around it', async () => {
    const [row] = await app.inTenant(ours, ({ transaction }) =>
      app.services.database.sequelize.query<{ role: string; super: boolean; bypass: boolean; owned: number }>(
        "select current_user as role, rolsuper as super, rolbypassrls as bypass, (select count(*)::int from pg_class where relowner = pg_roles.oid) as owned from pg_roles where rolname = current_user",
        { type: QueryTypes.SELECT, transaction },
      ),
    )
    expect(row).toEqual({ role: RUNTIME_ROLE, super: false, bypass: false, owned: 0 })
  })

  it('shows a query without any scope the rows of its own organization only, in every table', async () => {
    const counted = new Map<string, number>()
    for (const table of await tables()) {
      const rows = await app.inTenant(ours, ({ transaction }) =>
        app.services.database.sequelize.query<{ organization_id: string; n: number }>(`select organization_id, count(*)::int as n from "${table}" group by 1`, { type: QueryTypes.SELECT, transaction }),
      )
      expect(rows.filter((row) => row.organization_id !== ours.id), table).toEqual([])
      counted.set(table, rows[0]?.n ?? 0)
    }
    expect(counted.get('people')).toBe(6)
    const unscoped = await app.inTenant(ours, ({ transaction }) => Person.findAll({ transaction }))
    expect(new Set(unscoped.map(({ organizationId }) => organizationId))).toEqual(new Set([ours.id]))
  })

  it('shows nothing at all without an organization', async () => {
    for (const table of await tables()) {
      const rows = await app.services.database.sequelize.query(`select organization_id from "${table}" limit 1`, { type: QueryTypes.SELECT })
      expect(rows, table).toEqual([])
    }
    expect(await Person.count()).toBe(0)
  })

  it('forgets the organization with the transaction', async () => {
    await app.inTenant(ours, ({ transaction }) => Person.count({ transaction }))
    const connections = await Promise.all(Array.from({ length: 12 }, () => Person.count()))
    expect(connections.every((n) => n === 0)).toBe(true)
  })

  it('refuses to write a row for another organization, or to move one there', async () => {
    const foreign = { organizationId: theirs.id, name: 'X', email: `${randomUUID()}@larkfield.example`, roles: ['welder' as const] }
    await expect(app.inTenant(ours, ({ transaction }) => Person.create(foreign, { transaction }))).rejects.toThrow(/row-level security/)
    await expect(app.inTenant(ours, ({ transaction }) => Person.update({ organizationId: theirs.id }, { where: { id: ours.people.welder.id }, transaction }))).rejects.toThrow(/row-level security/)
    const [changed] = await app.inTenant(ours, ({ transaction }) => Person.update({ name: 'Taken over' }, { where: { id: theirs.people.welder.id }, transaction }))
    expect(changed).toBe(0)
  })

  it('keeps a row from pointing into another organization', async () => {
    await expect(
      app.services.database.owner.query("insert into person_tokens (id, organization_id, person_id, kind, token_sha256, expires_at) values ($1, $2, $3, 'reset', '\\x00', now())", [randomUUID(), ours.id, theirs.people.welder.id]),
    ).rejects.toThrow(/foreign key/)
  })

  it('keeps password hashes and sessions of the table’s owner from the runtime role’s reach', async () => {
    await expect(app.inTenant(ours, ({ transaction }) => app.services.database.sequelize.query('select sess from session', { transaction }))).rejects.toThrow(/permission denied/)
    await expect(app.inTenant(ours, ({ transaction }) => app.services.database.sequelize.query('delete from people', { transaction }))).rejects.toThrow(/permission denied/)
    await expect(app.inTenant(ours, ({ transaction }) => app.services.database.sequelize.query('select data from pgboss.job', { transaction }))).rejects.toThrow(/permission denied/)
  })
})

describe('across organizations', () => {
  it('a person, a mail and an attachment of another answer 404, like one that never was', async () => {
    const mail = await app.inTenant(theirs, (tenant) => queueMail(app.services, tenant, { to: ['buyer@larkfield.example'], subject: 'S', text: 'T', attachments: [{ name: 'a.pdf', mediaType: 'application/pdf', bytes: Buffer.from('%PDF') }] }))
    const [agent, owner] = [await app.agentFor(ours, 'administrator'), await app.agentFor(theirs, 'administrator')]
    for (const address of [`/api/people/${theirs.people.welder.id}`, `/api/outbox/${mail.id}`, `/api/outbox/${mail.id}/attachments/0`]) {
      await owner.get(address).expect(200)
      const foreign = problem(await agent.get(address).expect(404))
      const missing = problem(await agent.get(address.replace(/[0-9a-f-]{36}/, randomUUID())).expect(404))
      expect(foreign.detail).toBe(missing.detail)
    }
    await agent.patch(`/api/people/${theirs.people.welder.id}`).set('If-Match', '"1"').send({ active: false }).expect(404)
    await agent.post(`/api/people/${theirs.people.welder.id}/invitations`).expect(404)
    expect((await agent.get('/api/outbox').expect(200)).body).toMatchObject({ total: 0, items: [] })
  })
})

describe('migrations', () => {
  it('have nothing left to do when run again, even twice at once', async () => {
    const { DATABASE_URL } = app.services.env
    expect(await Promise.all([migrate(DATABASE_URL), migrate(DATABASE_URL)])).toEqual([[], []])
  })
})
