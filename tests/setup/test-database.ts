import { isAlive } from '../../scripts/lib/lock.mjs'
import { dropDatabase, ensureCluster, ensureDatabase, listDatabases, parseDatabaseUrl, releaseCluster } from '../../scripts/postgres.ts'

export interface TestDatabase {
  url: string
  /** Drops the database and lets the cluster go. */
  drop: () => Promise<void>
}

/**
 * An empty database for one run of tests: on the private test cluster under a name of this process's own, so that two
 * runs never meet; with DATABASE_URL on that server, beside the database that it names.
 * @param name e.g. `sidebend_api`
 */
export async function createTestDatabase(name: string): Promise<TestDatabase> {
  const given = process.env.DATABASE_URL
  if (given) {
    const url = parseDatabaseUrl(given)
    url.pathname += `_test_${name}`
    await ensureDatabase(url.href, { fresh: true })
    return { url: url.href, drop: () => dropDatabase(url.href) }
  }
  const cluster = await ensureCluster('pg-test')
  // Databases of runs that were killed.
  for (const left of await listDatabases(cluster.url('postgres'), `${name}_`)) {
    const pid = Number(left.slice(name.length + 1))
    if (Number.isInteger(pid) && (pid === process.pid || !isAlive(pid))) await dropDatabase(cluster.url(left))
  }
  const url = cluster.url(`${name}_${process.pid}`)
  await ensureDatabase(url, { fresh: true })
  return {
    url,
    drop: async () => {
      await dropDatabase(url)
      await releaseCluster('pg-test')
    },
  }
}
