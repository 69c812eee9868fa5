import { createContext, useContext } from 'react'
import { useController, type Control, type FieldValues } from 'react-hook-form'
import type { Finding, Fix } from '@shared/schemas/assessment.ts'
import type { WeldingVariables } from '@shared/schemas/welding.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import type { RecordKind } from './row-spec.ts'

/** What every record of a weld has: a procedure's content, a coupon's. */
export interface WeldContent {
  variables: WeldingVariables
}

export interface SheetValue {
  content: WeldContent
  /** The person's own system: figures are shown, and bare ones read, in it. */
  system: UnitSystem
  /** null: the sheet is only read. */
  control: Control<FieldValues> | null
  /** What is written; a procedure unless said. On a coupon a measured value is one value. */
  record?: RecordKind
  findings: ReadonlyMap<string, readonly Finding[]>
  /** Leaves out what stands within. */
  attention: boolean
  onFix?: (fix: Fix, finding: Finding) => void
  /** Writes what was worked out beside a field, to be taken back as a fix is. */
  onUse?: (fix: Fix) => void
  couponNumber: (id: string) => string | undefined
}

export const SheetContext = createContext<SheetValue | null>(null)

export function useSheet(): SheetValue {
  const sheet = useContext(SheetContext)
  if (!sheet) throw new Error('a sheet row stands outside a sheet')
  return sheet
}

/** The first message in an error tree: a value made of parts shows what is wrong in any of them. */
export function firstMessage(error: unknown): string | null {
  if (typeof error !== 'object' || error === null) return null
  if ('message' in error && typeof error.message === 'string') return error.message
  for (const part of Object.values(error)) {
    const found = firstMessage(part)
    if (found) return found
  }
  return null
}

/** Id of the first input of a row, so that a fix can put the cursor there. */
export const inputId = (path: string): string => `row-${path.replaceAll('.', '-')}`

/** Parts that may be absent as a whole: their fields are read from, and written into, the part, so that it comes and goes as one. */
const PARTS: Readonly<Record<string, Readonly<Record<string, null>>>> = { 'variables.postHeating': { used: null, temperature: null, time: null } }

function partOf(name: string): { part: string; key: string } | null {
  const at = name.lastIndexOf('.')
  const part = name.slice(0, at)
  return PARTS[part] ? { part, key: name.slice(at + 1) } : null
}

/** A field of the form by its path from the content's root; null where nothing is stated, also of a field that may be absent. */
export function useSheetField<T>(name: string): { value: T; set: (value: T) => void; error: string | null; onBlur: () => void } {
  const { control } = useSheet()
  if (!control) throw new Error('a field needs a form')
  const within = partOf(name)
  const { field, fieldState } = useController({ control, name: within?.part ?? name })
  const error = firstMessage(fieldState.error)
  if (!within) return { value: (field.value ?? null) as T, set: field.onChange, error, onBlur: field.onBlur }
  const whole = (field.value ?? null) as Record<string, unknown> | null
  const set = (value: T) => {
    const next = { ...PARTS[within.part], ...whole, [within.key]: value }
    field.onChange(Object.values(next).every((one) => one === null) ? null : next)
  }
  return { value: (whole?.[within.key] ?? null) as T, set, error, onBlur: field.onBlur }
}
