/** What this device holds of beads that the server does not have yet: the one under somebody's hands, and those that wait for the network. */
import { z } from 'zod'
import { beadContentSchema, type BeadContent } from '@shared/schemas/trials.ts'

/** A bead in the form. `id` is made here, so that a second sending is not a second bead. */
const draftSchema = z.object({
  id: z.uuid(),
  content: beadContentSchema,
  /** The bead that it was copied from. */
  from: z.uuid().nullable(),
  /** Version that is edited; null for a new bead. */
  version: z.number().int().nullable(),
  at: z.iso.datetime(),
})
export type BeadDraft = z.infer<typeof draftSchema>

const waitingSchema = z.object({ id: z.uuid(), content: beadContentSchema, at: z.iso.datetime(), /** Why the server will not take it as it stands. */ refusal: z.string().nullable().default(null) })
export type WaitingBead = z.infer<typeof waitingSchema>

/** A new bead is kept by the bead that it copies, so that starting another copy never writes over one half written. */
const newKeys = (personId: string, trialId: string) => `sidebend.bead.${personId}.${trialId}.new.`
const editKey = (personId: string, trialId: string, beadId: string) => `sidebend.bead.${personId}.${trialId}.${beadId}`
const waitingKey = (personId: string, trialId: string) => `sidebend.beads.${personId}.${trialId}`

function read<T>(schema: z.ZodType<T>, name: string): T | null {
  try {
    return schema.safeParse(JSON.parse(localStorage.getItem(name) ?? 'null')).data ?? null
  } catch {
    return null
  }
}

/** @returns false when the device keeps nothing (private window, full) */
function write(name: string, value: unknown): boolean {
  try {
    if (value === null) localStorage.removeItem(name)
    else localStorage.setItem(name, JSON.stringify(value))
    return true
  } catch {
    return false
  }
}

/** New beads of a trial that were left half written, the latest first. */
export function readNewDrafts(personId: string, trialId: string): BeadDraft[] {
  try {
    const names = Object.keys(localStorage).filter((name) => name.startsWith(newKeys(personId, trialId)))
    return names.flatMap((name) => read(draftSchema, name) ?? []).sort((one, other) => other.at.localeCompare(one.at))
  } catch {
    return []
  }
}
export const keepNewDraft = (personId: string, trialId: string, draft: BeadDraft): boolean => write(`${newKeys(personId, trialId)}${draft.from ?? 'first'}`, draft)
export const dropNewDraft = (personId: string, trialId: string, from: string | null): boolean => write(`${newKeys(personId, trialId)}${from ?? 'first'}`, null)

/** Changes to a stored bead that are not on the server yet. */
export const readEdit = (personId: string, trialId: string, beadId: string): BeadDraft | null => read(draftSchema, editKey(personId, trialId, beadId))
export const keepEdit = (personId: string, trialId: string, beadId: string, draft: BeadDraft | null): boolean => write(editKey(personId, trialId, beadId), draft)

export const readWaiting = (personId: string, trialId: string): WaitingBead[] => read(z.array(waitingSchema), waitingKey(personId, trialId)) ?? []
export const keepWaiting = (personId: string, trialId: string, beads: readonly WaitingBead[]): boolean => write(waitingKey(personId, trialId), beads.length > 0 ? beads : null)

/** Pictures that wait with their bead; they are held by this window only. */
const pictures = new Map<string, File[]>()
export const holdPictures = (beadId: string, files: readonly File[]): void => void pictures.set(beadId, [...files])
export const heldPictures = (beadId: string): readonly File[] => pictures.get(beadId) ?? []
export const dropPictures = (beadId: string): void => void pictures.delete(beadId)

/** A UUID; `crypto.randomUUID` is there on secure pages only, and a shop's server may be reached without TLS. */
function newId(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(16))
  bytes[6] = ((bytes[6] ?? 0) & 0x0f) | 0x40
  bytes[8] = ((bytes[8] ?? 0) & 0x3f) | 0x80
  const hex = [...bytes].map((byte) => byte.toString(16).padStart(2, '0')).join('')
  return `${hex.slice(0, 8)}-${hex.slice(8, 12)}-${hex.slice(12, 16)}-${hex.slice(16, 20)}-${hex.slice(20)}`
}

export const freshBead = (content: BeadContent, from: string | null): BeadDraft => ({ id: newId(), content, from, version: null, at: new Date().toISOString() })
