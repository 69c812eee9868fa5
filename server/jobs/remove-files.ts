import { z } from 'zod'
import { job } from './job.ts'

/** Removes files whose rows are gone: stored with the removal of the rows, done once that is committed. */
export const removeFilesJob = job({
  name: 'remove-files',
  data: z.object({ keys: z.array(z.string()).min(1).max(50) }),
  run: async ({ storage }, { keys }) => {
    for (const key of keys) await storage.remove(key)
  },
})
