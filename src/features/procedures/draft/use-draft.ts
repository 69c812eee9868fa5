import { useQueryClient } from '@tanstack/react-query'
import { revisionSchema, type Revision } from '@shared/schemas/records.ts'
import { procedureContentSchema, type ProcedureContent } from '@shared/schemas/welding.ts'
import { z } from 'zod'
import { useDraft, type Draft, type DraftKind } from '@/hooks/draft.ts'
import { call } from '@/lib/api.ts'
import { contentPath } from '@/lib/draft/paths.ts'
import { revisionQuery } from '../api.ts'

export type ProcedureDraft = Draft<ProcedureContent, Revision>

const kind: DraftKind<ProcedureContent, Revision> = {
  schema: procedureContentSchema,
  // A title cleared a moment ago is kept too.
  unfinished: procedureContentSchema.extend({ title: z.string() }),
  recordSchema: revisionSchema,
  isOpen: ({ state }) => state === 'draft',
  read: (id) => call('readRevision', { params: { id } }),
  save: (id, content, version) => call('saveRevision', { params: { id }, body: { content }, ifMatch: version }),
  fieldPath: contentPath,
}

/** A procedure's draft under somebody's hands; see `useDraft`. */
export function useProcedureDraft(revision: Revision, personId: string): ProcedureDraft {
  const client = useQueryClient()
  return useDraft(kind, revision, personId, (stored) => {
    client.setQueryData(revisionQuery(stored.id).queryKey, stored)
    void client.invalidateQueries({ queryKey: ['listProcedures'] })
  })
}
