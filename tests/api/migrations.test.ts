import { randomBytes } from 'node:crypto'
import pg from 'pg'
import { afterAll, beforeAll, describe, expect, inject, it } from 'vitest'
import { RUNTIME_ROLE } from '../../server/config/database.ts'
import { migrations } from '../../server/migrations/index.ts'
import { migrate } from '../../server/migrations/run.ts'
import { PASSWORD, startApp } from './harness.ts'

/** A database whose owner is an ordinary account, as a hosting firm would give one. */
const account = `sidebend_plain_${randomBytes(4).toString('hex')}`
const plain = new URL(inject('databaseUrl'))
plain.username = account
plain.password = 'plain-account'
plain.pathname = `/${account}`
let superuser: pg.Client

beforeAll(async () => {
  superuser = new pg.Client({ connectionString: inject('databaseUrl') })
  await superuser.connect()
  await superuser.query(`create role ${account} login password 'plain-account'`)
  await superuser.query(`create database ${account} owner ${account}`)
})
afterAll(async () => {
  await superuser.query(`drop database ${account} with (force)`)
  await superuser.query(`drop role ${account}`)
  await superuser.end()
})

describe('on a database whose account may not make roles', () => {
  it('says which SQL an administrator of the server must run, and leaves nothing half made', async () => {
    await expect(migrate(plain.href)).rejects.toThrow(new RegExp(`create role ${RUNTIME_ROLE} nologin[^]*grant ${RUNTIME_ROLE}`))
    const client = new pg.Client({ connectionString: plain.href })
    await client.connect()
    const { rows } = await client.query("select tablename from pg_tables where schemaname = 'public'")
    await client.end()
    expect(rows).toEqual([])
  })

  it('runs through once that is done, and the product works on it, still closed by organization', async () => {
    await superuser.query(`grant ${RUNTIME_ROLE} to ${account}`)
    expect(await migrate(plain.href)).toEqual(Object.keys(migrations))
    expect(await migrate(plain.href)).toEqual([])
    const app = await startApp({ env: { DATABASE_URL: plain.href } })
    try {
      const works = await app.makeOrganization()
      await app.makeOrganization()
      const agent = await app.agentFor(works, 'administrator')
      expect((await agent.get('/api/people').expect(200)).body).toMatchObject({ total: 6 })
      await app.anonymous().post('/api/password-resets').send({ email: works.people.welder.email }).expect(202)
      await app.drain()
      expect((await agent.get('/api/outbox').expect(200)).body).toMatchObject({ total: 1 })
      await app.anonymous().post('/api/session').send({ email: works.people.engineer.email, password: PASSWORD }).expect(200)
    } finally {
      await app.close()
    }
  })
})
