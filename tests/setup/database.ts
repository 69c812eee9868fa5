import type { TestProject } from 'vitest/node'
import { migrate } from '../../server/migrations/run.ts'
import './provided.ts'
import { createTestDatabase } from './test-database.ts'

/** API tests: a fresh database with the tables in place, and nothing in them. */
export default async function setUp(project: TestProject): Promise<() => Promise<void>> {
  const database = await createTestDatabase('sidebend_api')
  try {
    await migrate(database.url)
  } catch (error) {
    await database.drop()
    throw error
  }
  project.provide('databaseUrl', database.url)
  return database.drop
}
