import { mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import path from 'node:path'
import pg from 'pg'
import { QueryTypes } from 'sequelize'
import { afterAll, beforeAll, describe, expect, inject, it } from 'vitest'
import { openDatabase, RUNTIME_ROLE } from '../../server/config/database.ts'
import { problem, startApp, type TestApp } from './harness.ts'

let app: TestApp
let folder: string
let draining = false
beforeAll(async () => {
  folder = await mkdtemp(path.join(tmpdir(), 'sidebend-client-'))
  await mkdir(path.join(folder, 'assets'))
  await writeFile(path.join(folder, 'index.html'), '<!doctype html><title>client</title>')
  await writeFile(path.join(folder, 'assets', 'main-abc123.js'), 'export {}')
  await writeFile(path.join(folder, 'sw.js'), '')
  app = await startApp({ clientDirectory: folder, isDraining: () => draining })
})
afterAll(async () => {
  await app.close()
  await rm(folder, { recursive: true, force: true })
})

describe('health', () => {
  it('answers whether the process lives and whether it can work', async () => {
    expect((await app.anonymous().get('/healthz').expect(200)).body).toEqual({ status: 'ok' })
    expect((await app.anonymous().get('/readyz').expect(200)).body).toEqual({ status: 'ready', database: 'answers' })
  })

  it('is not ready while stopping', async () => {
    draining = true
    expect((await app.anonymous().get('/readyz').expect(503)).body).toMatchObject({ status: 'stopping' })
    draining = false
  })

  it('is alive but not ready without its database', async () => {
    const { database } = app.services
    const gone = openDatabase('postgres://nobody:x@127.0.0.1:1/none')
    app.services.database = gone
    try {
      expect((await app.anonymous().get('/readyz').expect(503)).body).toEqual({ status: 'not ready', database: 'does not answer' })
      await app.anonymous().get('/healthz').expect(200)
    } finally {
      app.services.database = database
      await gone.close()
    }
  })
})

describe('when the database drops every connection', () => {
  it('says so in a problem at worst, comes back by itself, and is as closed as before', async () => {
    const works = await app.makeOrganization()
    const agent = await app.agentFor(works, 'engineer')
    await agent.get('/api/people').expect(200)
    const client = new pg.Client({ connectionString: inject('databaseUrl') })
    await client.connect()
    await client.query('select pg_terminate_backend(pid) from pg_stat_activity where datname = current_database() and pid <> pg_backend_pid()')
    await client.end()
    const seen: number[] = []
    for (let i = 0; i < 20 && seen.at(-1) !== 200; i += 1) {
      const answer = await agent.get('/api/people')
      seen.push(answer.status)
      if (answer.status !== 200) expect(problem(answer).title).toBe('The database does not answer')
    }
    expect(seen.at(-1)).toBe(200)
    const [row] = await app.inTenant(works, ({ transaction }) => app.services.database.sequelize.query<{ role: string }>('select current_user as role', { type: QueryTypes.SELECT, transaction }))
    expect(row?.role).toBe(RUNTIME_ROLE)
  })

  it('answers 503 while it stays away', async () => {
    const away = await startApp()
    try {
      const agent = await away.agentFor(await away.makeOrganization(), 'engineer')
      const { database } = away.services
      const gone = openDatabase('postgres://nobody:x@127.0.0.1:1/none')
      away.services.database = { ...database, withTenant: gone.withTenant }
      const answer = await agent.get('/api/people').expect(503)
      expect(problem(answer).detail).toMatch(/try again/)
      expect(answer.headers['retry-after']).toBe('5')
      away.services.database = database
      await gone.close()
    } finally {
      await away.close()
    }
  })
})

describe('the client', () => {
  it('answers every page address with the same page, never from a cache', async () => {
    for (const address of ['/', '/procedures/42', '/reset/some-token']) {
      const page = await app.anonymous().get(address).expect(200)
      expect(page.text).toContain('<title>client</title>')
      expect(page.headers['cache-control']).toBe('no-cache')
    }
  })

  it('lets files with a hash in their name be kept for good, and others not', async () => {
    expect((await app.anonymous().get('/assets/main-abc123.js').expect(200)).headers['cache-control']).toMatch(/immutable/)
    expect((await app.anonymous().get('/sw.js').expect(200)).headers['cache-control']).toBe('no-cache')
  })

  it('says that a file is missing rather than sending a page for it, and never leaves its folder', async () => {
    problem(await app.anonymous().get('/assets/old-def456.js').expect(404))
    problem(await app.anonymous().get('/..%2f..%2fetc/passwd.txt').expect(404))
    expect((await app.anonymous().get('/%2e%2e/%2e%2e/etc/passwd')).text).not.toContain('root:')
  })

  it('is no answer for an unknown address of the API, or for a change', async () => {
    expect(problem(await app.anonymous().get('/api/nothing').expect(404)).instance).toBe('/api/nothing')
    problem(await app.anonymous().post('/procedures').send({}).expect(404))
  })
})
