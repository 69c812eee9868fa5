/** What this device holds of a record that the server does not have yet, so that a crash loses nothing. */
import { z } from 'zod'

export interface LocalCopy<C> {
  /** Version that the typing started from. */
  version: number
  base: C
  content: C
  at: string
}

const key = (personId: string, recordId: string) => `sidebend.draft.${personId}.${recordId}`

/** @param schema of a content that may be unfinished: a title cleared a moment ago is kept too */
export function readLocalCopy<C>(schema: z.ZodType<C>, personId: string, recordId: string, storage: Storage = localStorage): LocalCopy<C> | null {
  try {
    const parsed = z.object({ version: z.number().int(), base: schema, content: schema, at: z.iso.datetime() }).safeParse(JSON.parse(storage.getItem(key(personId, recordId)) ?? 'null'))
    return parsed.success ? parsed.data : null
  } catch {
    return null
  }
}

/** @returns false when the device keeps nothing (private window, full) */
export function writeLocalCopy<C>(personId: string, recordId: string, copy: LocalCopy<C>, storage: Storage = localStorage): boolean {
  try {
    storage.setItem(key(personId, recordId), JSON.stringify(copy))
    return true
  } catch {
    return false
  }
}

export function dropLocalCopy(personId: string, recordId: string, storage: Storage = localStorage): void {
  try {
    storage.removeItem(key(personId, recordId))
  } catch {
    // Nothing was kept, so nothing is left behind.
  }
}
