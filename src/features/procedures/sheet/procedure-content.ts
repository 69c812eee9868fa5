import type { ProcedureContent } from '@shared/schemas/welding.ts'
import { useSheet } from '@/components/variables/context.ts'

/** The content of the sheet that this feature shows: always a whole procedure. */
export const useProcedureContent = (): ProcedureContent => useSheet().content as ProcedureContent
