import { useQuery } from '@tanstack/react-query'
import { Navigate, useParams } from 'react-router-dom'
import { RecordError, Skeleton } from '@/components/states.tsx'
import { useSession } from '@/hooks/session.ts'
import { procedureQuery, revisionQuery } from '../api.ts'
import { DraftingScreen } from './DraftingScreen.tsx'
import { ReadingScreen } from './ReadingScreen.tsx'

/** One revision: typed in by whoever may save it, read by everybody else. */
export function RevisionPage() {
  const { id = '' } = useParams()
  const { person } = useSession()
  const revision = useQuery(revisionQuery(id))
  if (revision.isPending) return <Skeleton rows={10} label="Reading the procedure" />
  if (!revision.data) return <RecordError title="The procedure can’t be shown" error={revision.error} onRetry={() => void revision.refetch()} />
  return revision.data.may.includes('save') && person ? <DraftingScreen key={id} revision={revision.data} personId={person.id} /> : <ReadingScreen key={id} revision={revision.data} />
}

/** A procedure's address leads to its newest revision. */
export function ProcedurePage() {
  const { id = '' } = useParams()
  const procedure = useQuery(procedureQuery(id))
  if (procedure.isPending) return <Skeleton rows={10} label="Reading the procedure" />
  const newest = [...(procedure.data?.revisions ?? [])].sort((a, b) => b.createdAt.localeCompare(a.createdAt))[0]
  if (!newest) return <RecordError title="The procedure can’t be shown" error={procedure.error} onRetry={() => void procedure.refetch()} />
  return <Navigate replace to={`/revisions/${newest.id}`} />
}
