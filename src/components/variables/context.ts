import { createContext, useContext } from 'react'
import { useController, type Control, type FieldValues } from 'react-hook-form'
import type { Finding, Fix } from '@shared/schemas/assessment.ts'
import type { WeldingVariables } from '@shared/schemas/welding.ts'
import type { UnitSystem } from '@shared/units/types.ts'

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
  findings: ReadonlyMap<string, readonly Finding[]>
  /** Leaves out what stands within. */
  attention: boolean
  onFix?: (fix: Fix, finding: Finding) => void
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

/** A field of the form by its path from the content's root. */
export function useSheetField<T>(name: string): { value: T; set: (value: T) => void; error: string | null; onBlur: () => void } {
  const { control } = useSheet()
  if (!control) throw new Error('a field needs a form')
  const { field, fieldState } = useController({ control, name })
  return { value: field.value as T, set: field.onChange, error: firstMessage(fieldState.error), onBlur: field.onBlur }
}
