import type { z } from 'zod'
import type { Services } from '../routes/mount.ts'

/**
 * Work that is done after the answer, kept in PostgreSQL until it is done.
 * A job may run twice (a crash after the work, before the note of it), so `run` looks first whether there is anything left to do.
 */
export interface Job<D extends z.ZodType = z.ZodType> {
  name: string
  /** What is stored: ids only, never secrets or whole records. */
  data: D
  /** Tries after the first; the wait doubles from `retryDelay` seconds. */
  retryLimit: number
  retryDelay: number
  /** When it is to be done by itself, as cron says it, UTC; its data is then empty. */
  schedule?: string
  /** Throws to be tried again. */
  run: (services: Services, data: z.output<D>) => Promise<void>
}

/** Keeps the type of `data` for `run` and for `queue.send`. */
export const job = <D extends z.ZodType>(given: Omit<Job<D>, 'retryLimit' | 'retryDelay'> & Partial<Pick<Job<D>, 'retryLimit' | 'retryDelay'>>): Job<D> => ({ retryLimit: 5, retryDelay: 5, ...given })
