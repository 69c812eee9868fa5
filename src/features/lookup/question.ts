/** The question as it stands in the address, so that it can be shared and the back button works. */
import { lookupQuerySchema, type LookupQuery } from '@shared/schemas/records.ts'

export const KEYS = ['line', 'jointId', 'metalA', 'metalB', 'thickness', 'process', 'position', 'weld'] as const
export type Key = (typeof KEYS)[number]
export type Asked = Partial<Record<Key, string>>

/** What of an address can be asked; a value that fits no field is left out, so that the rest is still answered. */
export function asked(values: Readonly<Partial<Record<Key, string>>>): Omit<LookupQuery, 'unitSystem'> {
  const given = KEYS.flatMap((key): [Key, unknown][] => {
    const value = values[key]
    if (!value) return []
    const parsed = lookupQuerySchema.shape[key].safeParse(value)
    return parsed.success && parsed.data ? [[key, parsed.data]] : []
  })
  return Object.fromEntries(given)
}

export const isAsked = (question: object): boolean => Object.values(question).some((value) => value !== undefined && value !== '')
