import { useInfiniteQuery, useQueryClient } from '@tanstack/react-query'
import { useMemo, useState } from 'react'
import { useNavigate } from 'react-router-dom'
import type { TrialRow } from '@shared/schemas/trials.ts'
import { Button } from '@/components/Button.tsx'
import { DataTable, type Column } from '@/components/DataTable.tsx'
import { FilterBar } from '@/components/FilterBar.tsx'
import { EmptyState, ErrorState, NothingFound, PageHead, Skeleton } from '@/components/states.tsx'
import { useFilters } from '@/hooks/filters.ts'
import { useMay } from '@/hooks/session.ts'
import { call } from '@/lib/api.ts'
import { day } from '@/lib/figures.ts'
import { listQuery } from '@/lib/query.ts'
import { TrialDialog } from '../components/TrialDialog.tsx'

const SORTS = ['number', '-number', 'updatedAt', '-updatedAt', 'title', '-title'] as const
const sorted = (sort: string) => SORTS.find((one) => one === sort) ?? '-updatedAt'
const none = <span className="text-soft">not yet</span>

export function TrialsPage() {
  const navigate = useNavigate()
  const client = useQueryClient()
  const records = useMay('trials.record')
  const filters = useFilters(['q', 'sort'])
  const { q, sort } = filters.values
  const [opening, setOpening] = useState(false)
  const list = useInfiniteQuery(listQuery('listTrials', { query: { q: q || undefined, sort: sorted(sort) } }))
  const columns = useMemo<Column<TrialRow>[]>(
    () => [
      { id: 'number', header: 'Number', sort: 'number', className: 'whitespace-nowrap', cell: (row) => <span className="font-semibold">{row.number}</span> },
      { id: 'title', header: 'After what setting', sort: 'title', className: 'md:min-w-48', cell: (row) => row.title },
      { id: 'machine', header: 'Machine', cell: (row) => row.machine ?? none },
      { id: 'wire', header: 'Wire', className: 'md:whitespace-nowrap', cell: (row) => row.wire ?? none },
      { id: 'metal', header: 'Metal', wideOnly: true, cell: (row) => row.metal ?? none },
      { id: 'beads', header: 'Beads', align: 'right', cell: (row) => row.beads },
      { id: 'best', header: 'Best', align: 'right', cell: (row) => (row.bestScore === null ? none : `${row.bestScore} of 5`) },
      { id: 'procedure', header: 'Procedure', cell: (row) => row.procedureNumber ?? <span className="text-soft">none</span> },
      { id: 'by', header: 'By', wideOnly: true, cell: (row) => row.by.name },
      { id: 'updatedAt', header: 'Changed', sort: 'updatedAt', className: 'whitespace-nowrap', cell: (row) => day(row.updatedAt) },
    ],
    [],
  )
  const begin = records && <Button kind="primary" className="max-sm:min-h-12" onClick={() => setOpening(true)}>Begin a trial</Button>
  return (
    <>
      <PageHead title="Dial-in log" actions={begin}>Trial beads on the way to a setting, one change at a time; the best one becomes a procedure.</PageHead>
      <FilterBar label="Filter by number, title, wire or machine" search={q} onSearch={(text) => filters.set({ q: text })} onClear={q ? () => filters.set({ q: '' }) : undefined} />
      {list.isPending && <Skeleton label="Reading the log" />}
      {list.isError && <ErrorState error={list.error} onRetry={() => void list.refetch()} />}
      {list.data &&
        (list.data.rows.length > 0 ? (
          <DataTable caption="Trials" columns={columns} rows={list.data.rows} rowKey={(row) => row.id} rowHref={(row) => `/dial-in/${row.id}`} sort={sorted(sort)} onSort={(next) => filters.set({ sort: next })} storageKey="trials" total={list.data.total} onMore={list.hasNextPage ? () => void list.fetchNextPage() : undefined} loadingMore={list.isFetchingNextPage} />
        ) : q ? (
          <NothingFound what="trials" onClear={() => filters.set({ q: '' })} />
        ) : (
          <EmptyState title="No trial yet" step={begin} example={<p>Bead 3 · feed 330 in/min, frequency 118 Hz · soot, a little · score 3. Copy it, raise the frequency to 124 Hz, weld, tap a score: bead 4 is logged before the plate is cool.</p>}>
            <p>Between two beads, copy the last one and change one thing. The log shows what each change did, which other setting to bring along, and proposes ranges from the beads that came out well.</p>
            {!records && <p className="mt-2">Engineers, inspectors, supervisors and welders log beads.</p>}
          </EmptyState>
        ))}
      {opening && (
        <TrialDialog heading="Begin a trial" submit="Begin" isOpen onClose={() => setOpening(false)} onSave={async (body) => {
          const trial = await call('createTrial', { body })
          void client.invalidateQueries({ queryKey: ['listTrials'] })
          void navigate(`/dial-in/${trial.id}`)
        }} />
      )}
    </>
  )
}
