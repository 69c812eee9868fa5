import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import type { JobJoint } from '@shared/schemas/records.ts'
import { Select } from '@/components/fields/text.tsx'
import { ErrorState } from '@/components/states.tsx'
import { useUnits } from '@/hooks/units.ts'
import { query } from '@/lib/query.ts'
import { useRemembered } from '@/hooks/remembered.ts'

const isText = (value: unknown): value is string => typeof value === 'string'

/** A joint of a job: pick the job, then touch the joint. */
export function ByJob({ jointId, onAsk }: { jointId: string; onAsk: (jointId: string) => void }) {
  const jobs = useQuery(query('listJobs', { query: { limit: 200 } }))
  const [last, setLast] = useRemembered('lookup.job', '', isText)
  const [picked, setPicked] = useState(last)
  const items = jobs.data?.items ?? []
  const jobId = items.some(({ id }) => id === picked) ? picked : ''
  const job = useQuery({ ...query('readJob', { params: { id: jobId } }), enabled: jobId !== '' })
  if (jobs.isError) return <ErrorState compact error={jobs.error} onRetry={() => void jobs.refetch()} />
  return (
    <div className="space-y-3">
      <Select
        label="Job"
        empty={jobs.isPending ? 'Reading the jobs…' : items.length === 0 ? 'No job yet' : 'Choose a job'}
        value={jobId}
        onChange={(event) => {
          setPicked(event.target.value)
          setLast(event.target.value)
        }}
        options={items.map(({ id, number, title }) => ({ value: id, label: `${number} · ${title}` }))}
      />
      {job.isError && <ErrorState compact error={job.error} onRetry={() => void job.refetch()} />}
      {job.data && (
        <ul aria-label="Joints" className="max-h-80 overflow-y-auto border border-rule">
          {job.data.joints.map((joint) => (
            <li key={joint.id} className="border-b border-hair last:border-b-0">
              <button type="button" aria-pressed={joint.id === jointId} onClick={() => onAsk(joint.id)} className={`flex min-h-12 w-full items-baseline gap-x-3 px-3 py-2 text-left ${joint.id === jointId ? 'bg-ink text-paper [&_.text-soft]:text-inherit' : 'hover:bg-paper'}`}>
                <span className="w-14 shrink-0 font-narrow text-xl font-semibold">{joint.number}</span>
                <span className="min-w-0 grow">
                  {joint.mark ?? 'without a mark'}
                  <JointLine joint={joint} />
                </span>
              </button>
            </li>
          ))}
          {job.data.joints.length === 0 && <li className="px-3 py-3 text-soft">This job has no joint yet.</li>}
        </ul>
      )}
    </div>
  )
}

/** "A516-70, 12 mm, SMAW, 3G" */
function JointLine({ joint }: { joint: JobJoint }) {
  const units = useUnits()
  const metals = joint.metalB && joint.metalB !== joint.metalA ? `${joint.metalA ?? '?'} to ${joint.metalB}` : joint.metalA
  return <span className="block text-base text-soft">{[metals, units.interval(joint.thickness, 'length')?.text, joint.process, joint.position].filter(Boolean).join(', ')}</span>
}
