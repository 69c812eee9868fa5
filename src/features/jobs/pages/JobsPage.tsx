import { useInfiniteQuery, useMutation, useQueryClient } from '@tanstack/react-query'
import { useMemo, useState } from 'react'
import { useNavigate } from 'react-router-dom'
import { writeJobSchema, type JobRow } from '@shared/schemas/records.ts'
import { Button } from '@/components/Button.tsx'
import { DataTable, type Column } from '@/components/DataTable.tsx'
import { Dialog } from '@/components/Dialog.tsx'
import { FormError } from '@/components/fields/Field.tsx'
import { TextField } from '@/components/fields/text.tsx'
import { FilterBar } from '@/components/FilterBar.tsx'
import { EmptyState, ErrorState, NothingFound, PageHead, Skeleton } from '@/components/states.tsx'
import { useFilters } from '@/hooks/filters.ts'
import { useMay } from '@/hooks/session.ts'
import { call } from '@/lib/api.ts'
import { day } from '@/lib/figures.ts'
import { showProblem, useZodForm } from '@/lib/forms.ts'
import { listQuery } from '@/lib/query.ts'

const SORTS = ['number', '-number', 'updatedAt', '-updatedAt'] as const
const sorted = (sort: string) => SORTS.find((one) => one === sort) ?? 'number'

export function JobsPage() {
  const manages = useMay('jobs.manage')
  const filters = useFilters(['q', 'sort'])
  const { q, sort } = filters.values
  const [opening, setOpening] = useState(false)
  const list = useInfiniteQuery(listQuery('listJobs', { query: { q: q || undefined, sort: sorted(sort) } }))
  const columns = useMemo<Column<JobRow>[]>(
    () => [
      { id: 'number', header: 'Number', sort: 'number', className: 'whitespace-nowrap', cell: (row) => <span className="font-semibold">{row.number}</span> },
      { id: 'title', header: 'Title', className: 'md:min-w-40', cell: (row) => row.title },
      { id: 'customer', header: 'Customer', cell: (row) => row.customer || <span className="text-soft">not stated</span> },
      { id: 'code', header: 'Code', cell: (row) => row.code || <span className="text-soft">not stated</span> },
      { id: 'joints', header: 'Joints with a procedure', className: 'min-w-40', cell: (row) => <Assigned row={row} /> },
      { id: 'updatedAt', header: 'Changed', sort: 'updatedAt', className: 'whitespace-nowrap', cell: (row) => day(row.updatedAt) },
    ],
    [],
  )
  const begin = manages && (
    <Button kind="primary" onClick={() => setOpening(true)}>
      Open a job
    </Button>
  )
  return (
    <>
      <PageHead title="Jobs" actions={begin}>
        What is to be welded, joint by joint, and by which procedure.
      </PageHead>
      <FilterBar label="Filter by number, title or customer" search={q} onSearch={(text) => filters.set({ q: text })} onClear={q ? () => filters.set({ q: '' }) : undefined} />
      {list.isPending && <Skeleton label="Reading the jobs" />}
      {list.isError && <ErrorState error={list.error} onRetry={() => void list.refetch()} />}
      {list.data &&
        (list.data.rows.length > 0 ? (
          <div className="md:overflow-x-auto"><DataTable caption="Jobs" columns={columns} rows={list.data.rows} rowKey={(row) => row.id} rowHref={(row) => `/jobs/${row.id}`} sort={sorted(sort)} onSort={(next) => filters.set({ sort: next })} storageKey="jobs" total={list.data.total} onMore={list.hasNextPage ? () => void list.fetchNextPage() : undefined} loadingMore={list.isFetchingNextPage} /></div>
        ) : q ? (
          <NothingFound what="jobs" onClear={() => filters.set({ q: '' })} />
        ) : (
          <EmptyState title="No job yet" step={begin} example={<p>Joint J1 · shell course, vertical · A516-70 to A516-70 · 12 mm · SMAW 3G · 4 of them. Touch “Find procedures”, and what covers it is listed with the reason; assign it, and the shop finds it under the joint.</p>}>
            <p>A job lists its joints as the drawing names them. For each, the approved procedures that cover it are found and one is assigned.</p>
            {!manages && <p className="mt-2">Engineers and supervisors open jobs.</p>}
          </EmptyState>
        ))}
      {opening && <NewJob onClose={() => setOpening(false)} />}
    </>
  )
}

/** How many joints have a procedure, as figures and a bar. */
function Assigned({ row: { joints, assigned } }: { row: JobRow }) {
  if (joints === 0) return <span className="text-soft">no joint yet</span>
  return (
    <div className="max-w-40">
      <p className="tabular-nums">
        {assigned} <span className="text-soft">of {joints}</span>
      </p>
      <div aria-hidden="true" className="mt-1 h-1 bg-hair">
        <span className={`block h-full ${assigned === joints ? 'bg-jade' : 'bg-ink'}`} style={{ width: `${(assigned / joints) * 100}%` }} />
      </div>
    </div>
  )
}

const schema = writeJobSchema.pick({ title: true, customer: true, code: true })

function NewJob({ onClose }: { onClose: () => void }) {
  const navigate = useNavigate()
  const client = useQueryClient()
  const form = useZodForm(schema, { title: '', customer: '', code: '' })
  const { errors, isDirty } = form.formState
  const create = useMutation({
    mutationFn: (body: { title: string; customer: string; code: string }) => call('createJob', { body }),
    onSuccess: (job) => {
      void client.invalidateQueries({ queryKey: ['listJobs'] })
      void navigate(`/jobs/${job.id}`)
    },
    onError: (error) => showProblem(form, error),
  })
  return (
    <Dialog title="Open a job" isOpen onClose={onClose} dismissable={!isDirty}>
      <form className="space-y-4" noValidate onSubmit={(event) => void form.handleSubmit((given) => create.mutate(given))(event)}>
        <TextField label="Title" placeholder="e.g. Settling tank 3" maxLength={160} error={errors.title?.message} {...form.register('title')} />
        <TextField label="Customer" optional maxLength={160} error={errors.customer?.message} {...form.register('customer')} />
        <TextField label="Code and specification" optional placeholder="e.g. ASME BPVC Section IX" maxLength={160} error={errors.code?.message} {...form.register('code')} />
        <FormError message={errors.root?.message} />
        <div className="flex flex-wrap justify-end gap-2">
          <Button onClick={onClose}>Not now</Button>
          <Button kind="primary" type="submit" pending={create.isPending}>
            Open the job
          </Button>
        </div>
      </form>
    </Dialog>
  )
}
