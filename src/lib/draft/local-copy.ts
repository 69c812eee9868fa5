/** What this device holds of a draft that the server does not have yet, so that a crash loses nothing. */
import { z } from 'zod'
import { procedureContentSchema, type ProcedureContent } from '@shared/schemas/welding.ts'

/** The content may be unfinished (a title cleared a moment ago), so only its variables are held to the full schema. */
const copySchema = z.object({ version: z.number().int(), base: procedureContentSchema, content: procedureContentSchema.extend({ title: z.string() }), at: z.iso.datetime() })
export interface LocalCopy {
  /** Version that the typing started from. */
  version: number
  base: ProcedureContent
  content: ProcedureContent
  at: string
}

const key = (personId: string, revisionId: string) => `sidebend.draft.${personId}.${revisionId}`

export function readLocalCopy(personId: string, revisionId: string, storage: Storage = localStorage): LocalCopy | null {
  try {
    const parsed = copySchema.safeParse(JSON.parse(storage.getItem(key(personId, revisionId)) ?? 'null'))
    return parsed.success ? parsed.data : null
  } catch {
    return null
  }
}

/** @returns false when the device keeps nothing (private window, full) */
export function writeLocalCopy(personId: string, revisionId: string, copy: LocalCopy, storage: Storage = localStorage): boolean {
  try {
    storage.setItem(key(personId, revisionId), JSON.stringify(copy))
    return true
  } catch {
    return false
  }
}

export function dropLocalCopy(personId: string, revisionId: string, storage: Storage = localStorage): void {
  try {
    storage.removeItem(key(personId, revisionId))
  } catch {
    // Nothing was kept, so nothing is left behind.
  }
}
