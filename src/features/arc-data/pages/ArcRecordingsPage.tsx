import { useInfiniteQuery } from '@tanstack/react-query'
import type { ArcRecordingRow } from '@shared/schemas/arc-data.ts'
import { ButtonLink } from '@/components/Button.tsx'
import { DataTable, type Column } from '@/components/DataTable.tsx'
import { FilterBar } from '@/components/FilterBar.tsx'
import { EmptyState, ErrorState, NothingFound, PageHead, Skeleton } from '@/components/states.tsx'
import { useFilters } from '@/hooks/filters.ts'
import { useMay } from '@/hooks/session.ts'
import { day, figure } from '@/lib/figures.ts'
import { listQuery } from '@/lib/query.ts'

const SORTS = ['uploadedAt', '-uploadedAt', 'fileName', '-fileName'] as const
const sorted = (sort: string) => SORTS.find((one) => one === sort) ?? '-uploadedAt'
const soft = (text: string) => <span className="text-soft">{text}</span>

const COLUMNS: Column<ArcRecordingRow>[] = [
  { id: 'fileName', header: 'Recording', sort: 'fileName', className: 'md:min-w-48 break-all', cell: (row) => <span className="font-semibold">{row.fileName}</span> },
  { id: 'attachedTo', header: 'Attached to', cell: (row) => row.attachedTo ?? soft('nothing yet') },
  { id: 'power', header: 'Power', align: 'right', className: 'whitespace-nowrap', cell: (row) => <>{figure(row.figures.averageInstantaneousPower, 0)} {soft('W')}</> },
  { id: 'error', header: 'Meters off by', align: 'right', className: 'whitespace-nowrap', cell: (row) => <>{row.figures.meterError > 0 ? '+' : ''}{figure(row.figures.meterError, 1)} {soft('%')}</> },
  { id: 'arcTime', header: 'Arc', align: 'right', className: 'whitespace-nowrap', cell: (row) => <>{figure(row.figures.arcTime, 1)} {soft('s')}</> },
  { id: 'pulse', header: 'Pulsed', className: 'whitespace-nowrap', wideOnly: true, cell: (row) => (row.figures.pulse ? <>{figure(row.figures.pulse.frequency, 0)} {soft('Hz')}</> : soft('no')) },
  { id: 'rows', header: 'Samples', align: 'right', hidden: true, cell: (row) => figure(row.rows, 0) },
  { id: 'uploadedAt', header: 'Uploaded', sort: 'uploadedAt', className: 'whitespace-nowrap', cell: (row) => day(row.uploadedAt) },
  { id: 'by', header: 'By', hidden: true, cell: (row) => row.by.name },
]

/** Every recording of volts and amperes. */
export function ArcRecordingsPage() {
  const records = useMay('arc.record')
  const filters = useFilters(['q', 'sort'])
  const { q, sort } = filters.values
  const list = useInfiniteQuery(listQuery('listArcRecordings', { query: { q: q || undefined, sort: sorted(sort) } }))
  const begin = records && (
    <ButtonLink kind="primary" to="/arc-data/new">
      Upload a recording
    </ButtonLink>
  )
  return (
    <>
      <PageHead title="Arc data" actions={begin}>
        Sampled volts and amperes of a weld, and the power, energy and heat input worked out from them.
      </PageHead>
      <FilterBar label="Filter by file or coupon" search={q} onSearch={(text) => filters.set({ q: text })} onClear={q ? () => filters.set({ q: '' }) : undefined} />
      {list.isPending && <Skeleton label="Reading the recordings" />}
      {list.isError && <ErrorState error={list.error} onRetry={() => void list.refetch()} />}
      {list.data &&
        (list.data.rows.length > 0 ? (
          <div className="md:overflow-x-auto">
            <DataTable caption="Recordings" columns={COLUMNS} rows={list.data.rows} rowKey={(row) => row.id} rowHref={(row) => `/arc-data/${row.id}`} sort={sorted(sort)} onSort={(next) => filters.set({ sort: next })} storageKey="arc-data" total={list.data.total} onMore={list.hasNextPage ? () => void list.fetchNextPage() : undefined} loadingMore={list.isFetchingNextPage} />
          </div>
        ) : q ? (
          <NothingFound what="recordings" onClear={() => filters.set({ q: '' })} />
        ) : (
          <EmptyState title="No recording yet" step={begin} example={<p>A pulsed arc between 400 A at 32 V and 50 A at 20 V, 120 times a second for 2 ms: its meters read 22.9 V and 134 A, which makes 3066 W. The arc has 3832 W; the meters miss a fifth of it.</p>}>
            <p>Loggers and many power sources save volts and amperes as text, thousands of rows a second. Upload such a file, and it is worked out what power and energy the arc had, how far the meters would have been off, and, with the length of the weld, its heat input by QW-409.1(c).</p>
            {!records && <p className="mt-2">Engineers, inspectors, supervisors and welders upload recordings.</p>}
          </EmptyState>
        ))}
    </>
  )
}
