/** Starts the application on the run's own database and signs people in; every API test begins here. */
import { randomBytes, randomUUID } from 'node:crypto'
import { mkdtemp, rm } from 'node:fs/promises'
import { createServer, type Server } from 'node:http'
import { tmpdir } from 'node:os'
import path from 'node:path'
import supertest, { type Response } from 'supertest'
import { inject } from 'vitest'
import type { Problem } from '../../shared/schemas/common.ts'
import { problemSchema } from '../../shared/schemas/common.ts'
import type { OutboxRow } from '../../shared/schemas/records.ts'
import { ROLES, type Role } from '../../shared/schemas/people.ts'
import { createApp } from '../../server/app.ts'
import type { Tenant } from '../../server/config/database.ts'
import { readEnv, type Env } from '../../server/config/env.ts'
import { openLog } from '../../server/config/log.ts'
import { closeServices, openServices } from '../../server/config/services.ts'
import type { Actor } from '../../server/policies/index.ts'
import type { Services } from '../../server/routes/mount.ts'
import { addPerson, createOrganization } from '../../server/services/organizations.ts'
import { hashPassword } from '../../server/services/passwords.ts'
import '../setup/provided.ts'

export type Agent = ReturnType<typeof supertest.agent>

/** Everybody's password in tests; hashed once, as hashing is slow by design. */
export const PASSWORD = 'a bead every ten minutes'
let passwordHash: Promise<string> | undefined

export interface TestOrganization {
  id: string
  name: string
  /** One person a role, named by it. */
  people: Record<Role, Actor>
}

export interface TestApp {
  services: Services
  /** The listening server, for `supertest(app.server)`. */
  server: Server
  /** What was logged so far, one JSON object a line. */
  logs: string[]
  /** A new organization with one active person of each role. `fill` runs in the same transaction. */
  makeOrganization: (fill?: (tenant: Tenant) => Promise<void>) => Promise<TestOrganization>
  /** A browser with nobody signed in, at a network address of its own. */
  anonymous: () => Agent
  /** A browser in which the organization's person with this role is signed in. */
  agentFor: (organization: TestOrganization, role: Role) => Promise<Agent>
  /** Does all queued work now; returns the number of runs. */
  drain: () => Promise<number>
  /** Runs in an organization's transaction, as a request would. */
  inTenant: <T>(organization: Pick<TestOrganization, 'id'>, work: (tenant: Tenant) => Promise<T>) => Promise<T>
  close: () => Promise<void>
}

let addresses = 0
/** Throttling counts by network address: each browser in a test has its own (a range kept for documentation). */
const nextAddress = (): string => {
  addresses += 1
  return `2001:db8::${process.pid.toString(16)}:${addresses.toString(16)}`
}

const personOf = (role: Role, organizationId: string): Actor => ({ id: '', organizationId, name: `Test ${role[0]?.toUpperCase()}${role.slice(1)}`, email: `${role}.${randomBytes(5).toString('hex')}@larkfield.example`, roles: [role] })

async function makeOrganization(services: Services, fill: (tenant: Tenant) => Promise<void>): Promise<TestOrganization> {
  passwordHash ??= hashPassword(PASSWORD)
  const hash = await passwordHash
  const id = randomUUID()
  const people = Object.fromEntries(ROLES.map((role) => [role, personOf(role, id)])) as Record<Role, Actor>
  const name = `Works ${id.slice(0, 8)}`
  await createOrganization(services.database, { id, name }, async (tenant) => {
    for (const person of Object.values(people)) person.id = (await addPerson(tenant, { ...person, passwordHash: hash })).id
    await fill(tenant)
  })
  return { id, name, people }
}

/**
 * Starts the application on the run's database. Call `close` in `afterAll`.
 * @param given.env variables that differ from the test's own
 * @param given.services parts to replace
 */
export async function startApp(given: { env?: Partial<Record<keyof Env, string>>; services?: Partial<Services>; clientDirectory?: string; isDraining?: () => boolean } = {}): Promise<TestApp> {
  const folder = await mkdtemp(path.join(tmpdir(), 'sidebend-api-'))
  const env = readEnv({ NODE_ENV: 'test', DATABASE_URL: inject('databaseUrl'), SESSION_SECRET: 's'.repeat(32), SIGNING_PASSPHRASE: 'p'.repeat(24), DATA_DIR: folder, LOG_LEVEL: 'info', ...given.env })
  const logs: string[] = []
  const services = await openServices(env, { log: openLog(env, { write: (line) => void logs.push(line) }), ...given.services })
  const server = createServer(createApp(services, { clientDirectory: given.clientDirectory ?? path.join(folder, 'no-client'), isDraining: given.isDraining }))
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve))
  const anonymous = (): Agent => supertest.agent(server).set('X-Forwarded-For', nextAddress())
  return {
    services,
    server,
    logs,
    anonymous,
    makeOrganization: (fill = () => Promise.resolve()) => makeOrganization(services, fill),
    agentFor: async (organization, role) => {
      const agent = anonymous()
      await agent.post('/api/session').send({ email: organization.people[role].email, password: PASSWORD }).expect(200)
      return agent
    },
    drain: () => services.queue.drain(services),
    inTenant: (organization, work) => services.database.withTenant(organization.id, work),
    close: async () => {
      server.closeAllConnections()
      await new Promise((resolve) => server.close(resolve))
      await closeServices(services)
      await rm(folder, { recursive: true, force: true })
    },
  }
}

/** The problem details that an answer carries; throws when it carries none. */
export function problem(response: Response): Problem {
  if (response.type !== 'application/problem+json') throw new Error(`${response.status} ${response.type} is not a problem: ${response.text?.slice(0, 300)}`)
  return problemSchema.parse(JSON.parse(response.text))
}

/** The text of the newest caught mail to an address, read by an administrator as in the outbox page. */
export async function caughtMail(administrator: Agent, to: string): Promise<{ subject: string; text: string; attachments: OutboxRow['attachments'] }> {
  const list = await administrator.get('/api/outbox').query({ q: to, limit: 1 }).expect(200)
  const newest = (list.body as { items: OutboxRow[] }).items[0]
  if (!newest) throw new Error(`no mail to ${to}`)
  const mail = await administrator.get(`/api/outbox/${newest.id}`).expect(200)
  return mail.body as { subject: string; text: string; attachments: OutboxRow['attachments'] }
}

/** The secret at the end of the link in a mail's text. */
export function tokenIn(text: string): string {
  const token = /\/(?:reset-password|invitation)\/([\w-]+)/.exec(text)?.[1]
  if (!token) throw new Error(`no link in: ${text}`)
  return token
}
