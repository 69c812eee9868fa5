import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import path from 'node:path'
import type { TestProject } from 'vitest/node'
import { ensureBuild } from '../../scripts/lib/build.mjs'
import { startServer } from '../../scripts/lib/children.mjs'
import { ensureSecrets } from '../../scripts/lib/environment.mjs'
import { freePort } from '../../scripts/lib/ports.mjs'
import { demoSignIns, loadDemo } from '../../server/demo/load.ts'
import { migrate } from '../../server/migrations/run.ts'
import './provided.ts'
import { createTestDatabase } from './test-database.ts'

/** Browser tests: the built product on a fresh database with the demo firm, its mail caught, its files in a folder of their own. */
export default async function setUp(project: TestProject): Promise<() => Promise<void>> {
  const undo: (() => Promise<unknown>)[] = []
  const tearDown = async () => {
    for (const step of undo.splice(0).reverse()) await step()
  }
  try {
    const folder = await mkdtemp(path.join(tmpdir(), 'sidebend-e2e-'))
    undo.push(() => rm(folder, { recursive: true, force: true }))
    const database = await createTestDatabase('sidebend_e2e')
    undo.push(database.drop)
    await migrate(database.url)
    const port = await freePort()
    const baseUrl = `http://127.0.0.1:${port}`
    // The loader reads the same variables as the server: files and signing certificate must end up in one place. Vitest has a BASE_URL of its own.
    const environment = { ...process.env, ...ensureSecrets(folder).secrets, DATA_DIR: folder, DATABASE_URL: database.url, HOST: '127.0.0.1', PORT: String(port), BASE_URL: baseUrl, SMTP_URL: undefined, DEMO: '1', LOG_LEVEL: 'warn', NODE_ENV: 'production' }
    await withEnvironment(environment, () => loadDemo(database.url))
    await ensureBuild()
    const server = await startServer(environment, { log: 'e2e-server' })
    undo.push(server.stop)
    project.provide('databaseUrl', database.url)
    project.provide('baseUrl', baseUrl)
    project.provide('demoSignIns', [...demoSignIns])
    return tearDown
  } catch (error) {
    await tearDown()
    throw error
  }
}

/** Does `work` with these variables set, and puts back what stood there. */
async function withEnvironment(variables: NodeJS.ProcessEnv, work: () => Promise<unknown>): Promise<void> {
  const before = { ...process.env }
  for (const [name, value] of Object.entries(variables)) {
    if (value === undefined) delete process.env[name]
    else process.env[name] = value
  }
  try {
    await work()
  } finally {
    for (const name of Object.keys(variables)) {
      if (before[name] === undefined) delete process.env[name]
      else process.env[name] = before[name]
    }
  }
}
