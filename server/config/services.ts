import path from 'node:path'
import { caughtMailer } from '../mail/caught.ts'
import { smtpMailer } from '../mail/smtp.ts'
import { bindModels } from '../models/index.ts'
import { openQueue } from '../jobs/queue.ts'
import type { Services } from '../routes/mount.ts'
import { diskStorage } from '../storage/disk.ts'
import { openDatabase } from './database.ts'
import type { Env } from './env.ts'
import { openLog } from './log.ts'

/**
 * Opens all that routes and jobs use. The database must be migrated.
 * @param given parts that a test replaces
 */
export async function openServices(env: Env, given: Partial<Services> = {}): Promise<Services> {
  const log = given.log ?? openLog(env)
  const database = given.database ?? openDatabase(env.DATABASE_URL)
  bindModels(database.sequelize)
  return {
    env,
    log,
    database,
    mailer: env.SMTP_URL ? smtpMailer(env.SMTP_URL) : caughtMailer(),
    storage: diskStorage(path.resolve(env.DATA_DIR, 'files')),
    queue: await openQueue(database, log),
    ...given,
  }
}

/** Ends what `openServices` began, the work in progress first. */
export async function closeServices({ queue, mailer, database }: Services): Promise<void> {
  await queue.stop()
  mailer.close()
  await database.close()
}
