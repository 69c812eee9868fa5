import type pg from 'pg'
import PgBoss from 'pg-boss'
import type { z } from 'zod'
import { RUNTIME_ROLE, type Database, type Tenant } from '../config/database.ts'
import type { Log } from '../config/log.ts'
import type { Services } from '../routes/mount.ts'
import { jobs } from './index.ts'
import type { Job } from './job.ts'

export interface Queue {
  /** Stores work to be done. With a tenant it is part of that transaction: rolled back with it. */
  send: <D extends z.ZodType>(job: Job<D>, data: z.input<D>, tenant?: Tenant) => Promise<void>
  /** Starts doing stored work in the background. */
  work: (services: Services) => Promise<void>
  /** Does all stored work now, waiting for no delay between tries; returns how many runs that took. For tests and scripts. */
  drain: (services: Services) => Promise<number>
  /** Lets running work end, then stops. */
  stop: () => Promise<void>
}

const POLL_SECONDS = 1
const STOP_MILLISECONDS = 20_000

/** Requests enqueue as the runtime role: it may add a job and read the list of queues, no more. */
const grants = `
  grant usage on schema pgboss to ${RUNTIME_ROLE};
  grant insert, select (id) on pgboss.job to ${RUNTIME_ROLE};
  grant select on pgboss.queue to ${RUNTIME_ROLE};`

async function perform(services: Services, job: Job, raw: unknown): Promise<void> {
  try {
    await job.run(services, await job.data.parseAsync(raw))
  } catch (error) {
    services.log.warn({ err: error, job: job.name }, 'a job failed and will be tried again while tries are left')
    throw error
  }
}

/** Opens the queue in the database's own schema `pgboss`; nothing is worked on until `work` or `drain`. */
export async function openQueue(database: Database, log: Log): Promise<Queue> {
  const boss = new PgBoss({
    db: { executeSql: (text: string, values: unknown[]) => database.owner.query(text, values) },
    schema: 'pgboss',
    archiveCompletedAfterSeconds: 3600,
    deleteAfterDays: 7,
  })
  boss.on('error', (error) => log.error({ err: error }, 'the queue met an error'))
  await boss.start()
  for (const { name, retryLimit, retryDelay } of jobs) await boss.createQueue(name, { name, retryLimit, retryDelay, retryBackoff: true })
  await database.owner.query(grants)
  return {
    send: async (job, data, tenant) => {
      const client = tenant && (tenant.transaction as unknown as { connection: pg.Client }).connection
      await boss.send(job.name, data as object, client ? { db: { executeSql: (text: string, values: unknown[]) => client.query(text, values) } } : {})
    },
    work: async (services) => {
      for (const job of jobs) {
        await boss.work(job.name, { batchSize: 1, pollingIntervalSeconds: POLL_SECONDS }, async ([next]) => {
          if (next) await perform(services, job, next.data)
        })
        if (job.schedule) await boss.schedule(job.name, job.schedule, {}, { tz: 'UTC' })
      }
    },
    drain: async (services) => {
      let runs = 0
      for (let before = -1; before !== runs; ) {
        before = runs
        for (const job of jobs) {
          for (const next of await boss.fetch(job.name, { batchSize: 50, ignoreStartAfter: true })) {
            runs += 1
            await perform(services, job, next.data).then(
              () => boss.complete(job.name, next.id),
              (error: unknown) => boss.fail(job.name, next.id, { message: error instanceof Error ? error.message : String(error) }),
            )
          }
        }
      }
      return runs
    },
    stop: () => boss.stop({ graceful: true, wait: true, timeout: STOP_MILLISECONDS }),
  }
}
