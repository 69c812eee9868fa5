import { useMutation, useQueryClient } from '@tanstack/react-query'
import { useEffect, useEffectEvent, useState } from 'react'
import { jobSchema, type Job } from '@shared/schemas/records.ts'
import { Button } from '@/components/Button.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { TitleBlock } from '@/components/TitleBlock.tsx'
import { say } from '@/components/toast.tsx'
import { useSaveKey } from '@/hooks/keys.ts'
import { useMay } from '@/hooks/session.ts'
import { call } from '@/lib/api.ts'
import { same } from '@/lib/draft/paths.ts'
import { day } from '@/lib/figures.ts'
import { asProblem, type ProblemError } from '@/lib/problem.ts'
import { query } from '@/lib/query.ts'
import { rowsOf, toSave, type JointRow } from '../joint-grid.ts'
import { JointGrid } from './JointGrid.tsx'

/** A job's title block and its joints; typed joints wait for Save, an assignment is saved at once. */
export function JobSheet({ job }: { job: Job }) {
  const client = useQueryClient()
  const manages = useMay('jobs.manage')
  const [rows, setRows] = useState(() => rowsOf(job))
  const [seen, setSeen] = useState(job)
  const changed = !same(toSave(seen, rows), toSave(seen, rowsOf(seen)))
  const [theirs, setTheirs] = useState<Job | null>(null)
  const [problem, setProblem] = useState<ProblemError | null>(null)
  const take = (next: Job) => {
    setSeen(next)
    setRows(rowsOf(next))
    setTheirs(null)
    setProblem(null)
  }
  // A page with nothing of its own follows what somebody else saved.
  if (seen !== job && seen.version < job.version && !changed) take(job)

  const save = useMutation({
    mutationFn: ({ joints, version }: { joints: readonly JointRow[]; version: number }) => call('saveJob', { params: { id: job.id }, body: toSave(seen, joints), ifMatch: version }),
    onSuccess: (stored) => {
      client.setQueryData(query('readJob', { params: { id: job.id } }).queryKey, stored)
      void client.invalidateQueries({ queryKey: ['listJobs'] })
      take(stored)
    },
    onError: (error) => {
      const refusal = asProblem(error)
      const current = jobSchema.safeParse(refusal.current)
      setProblem(refusal)
      setTheirs(refusal.isConflict && current.success ? current.data : null)
    },
  })
  const saveAll = () => {
    if (changed && !save.isPending) save.mutate({ joints: rows, version: seen.version }, { onSuccess: () => say('The joints are saved') })
  }
  useSaveKey(saveAll)
  const hold = useEffectEvent((event: BeforeUnloadEvent) => changed && event.preventDefault())
  useEffect(() => {
    const listen = (event: BeforeUnloadEvent) => void hold(event)
    window.addEventListener('beforeunload', listen)
    return () => window.removeEventListener('beforeunload', listen)
  }, [])

  const assign = async (key: string, procedure: { revisionId: string; name: string } | null) => {
    const next = rows.map((row) => (row.key === key ? { ...row, revisionId: procedure?.revisionId ?? null } : row))
    await save.mutateAsync({ joints: next, version: seen.version })
    say(procedure ? `${procedure.name} is assigned` : 'The assignment was taken back')
  }
  const assigned = rows.filter(({ revisionId }) => revisionId !== null).length
  return (
    <>
      <TitleBlock
        kind="Job"
        number={seen.number}
        title={seen.title}
        cells={[
          { label: 'Customer', children: seen.customer || <span className="text-soft">not stated</span> },
          { label: 'Code', children: seen.code || <span className="text-soft">not stated</span>, wide: true },
          { label: 'Toughness', children: seen.toughnessRequired ? 'required' : 'not required' },
          { label: 'Joints', children: rows.length === 0 ? 'none yet' : `${assigned} of ${rows.length} with a procedure` },
          { label: 'Changed', children: day(seen.updatedAt) },
        ]}
      />
      {seen.notes && <p className="mt-3 max-w-prose whitespace-pre-line text-soft">{seen.notes}</p>}
      {problem && (
        <div role="alert" className="mt-4 border-l-[3px] border-l-oxide bg-oxide-bg px-4 py-3">
          <p className="font-semibold">{problem.problem.title}</p>
          <p className="max-w-prose">{problem.message}</p>
          {theirs && (
            <p className="mt-2 flex flex-wrap gap-2">
              <Button onClick={() => save.mutate({ joints: rows, version: theirs.version })}>Save mine over it</Button>
              <Button onClick={() => take(theirs)}>Take theirs</Button>
            </p>
          )}
        </div>
      )}
      <Sheet
        id="joints"
        title="Joints"
        className="mt-4"
        aside={
          manages && changed ? (
            <span className="flex items-center gap-3">
              <span className="text-straw-deep">not saved yet</span>
              <Button kind="primary" pending={save.isPending} onClick={saveAll}>
                Save the joints
              </Button>
            </span>
          ) : (
            `${rows.reduce((sum, { count }) => sum + count, 0)} welds`
          )
        }
      >
        <JointGrid rows={rows} onChange={manages ? setRows : undefined} onAssign={assign} saved={!changed} />
      </Sheet>
    </>
  )
}
