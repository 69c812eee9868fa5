import { useQuery } from '@tanstack/react-query'
import { useParams } from 'react-router-dom'
import { Breadcrumb, RecordError, Skeleton } from '@/components/states.tsx'
import { query } from '@/lib/query.ts'
import { JobSheet } from '../components/JobSheet.tsx'

/** One job and its joints. */
export function JobPage() {
  const { id = '' } = useParams()
  const job = useQuery(query('readJob', { params: { id } }))
  if (job.isPending) return <Skeleton label="Reading the job" />
  return (
    <>
      <Breadcrumb trail={[{ label: 'Jobs', to: '/jobs' }, { label: job.data?.number ?? 'Job' }]} />
      {job.isError && !job.data ? <RecordError title="The job can’t be shown" error={job.error} onRetry={() => void job.refetch()} /> : job.data && <JobSheet key={job.data.id} job={job.data} />}
    </>
  )
}
