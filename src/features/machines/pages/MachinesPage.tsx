import { useInfiniteQuery } from '@tanstack/react-query'
import { useMemo } from 'react'
import { CALIBRATION_STATES, type MachineRow } from '@shared/schemas/machines.ts'
import { ButtonLink } from '@/components/Button.tsx'
import { DataTable, type Column } from '@/components/DataTable.tsx'
import { Select, Switch } from '@/components/fields/text.tsx'
import { FilterBar } from '@/components/FilterBar.tsx'
import { EmptyState, ErrorState, NothingFound, PageHead, Skeleton } from '@/components/states.tsx'
import { useFilters } from '@/hooks/filters.ts'
import { useMay } from '@/hooks/session.ts'
import { day } from '@/lib/figures.ts'
import { listQuery } from '@/lib/query.ts'
import { Calibrated } from '../components/Calibrated.tsx'
import { CALIBRATION_OPTIONS } from '../words.ts'

const SORTS = ['number', '-number', 'name', '-name', 'calibrationDueOn', '-calibrationDueOn', 'updatedAt', '-updatedAt'] as const
const sorted = (sort: string) => SORTS.find((one) => one === sort) ?? 'number'
const notStated = <span className="text-soft">not stated</span>

export function MachinesPage() {
  const manages = useMay('machines.manage')
  const filters = useFilters(['q', 'calibration', 'retired', 'sort'])
  const { q, sort, retired } = filters.values
  const calibration = CALIBRATION_STATES.find((one) => one === filters.values.calibration)
  const list = useInfiniteQuery(listQuery('listMachines', { query: { q: q || undefined, calibration, retired: retired === 'with' ? 'with' : undefined, sort: sorted(sort) } }))
  const columns = useMemo<Column<MachineRow>[]>(
    () => [
      { id: 'number', header: 'Number', sort: 'number', className: 'whitespace-nowrap', cell: (row) => <span className="font-semibold">{row.number}</span> },
      { id: 'name', header: 'Machine', sort: 'name', className: 'md:min-w-40', cell: (row) => <>{row.name}{row.retired && <span className="text-soft">, retired</span>}</> },
      { id: 'location', header: 'Where', cell: (row) => row.location || notStated },
      { id: 'processes', header: 'For', cell: (row) => row.processes.join(', ') || notStated },
      { id: 'modes', header: 'Modes', wideOnly: true, className: 'md:min-w-40', cell: (row) => row.modes.map(({ name }) => name).join(', ') || <span className="text-soft">none yet</span> },
      { id: 'calibration', header: 'Calibration', cell: (row) => <Calibrated state={row.calibration} /> },
      { id: 'due', header: 'Due', sort: 'calibrationDueOn', className: 'whitespace-nowrap', cell: (row) => (row.calibrationDueOn ? day(row.calibrationDueOn) : notStated) },
    ],
    [],
  )
  const begin = manages && (
    <ButtonLink kind="primary" to="/machines/new">
      Register a machine
    </ButtonLink>
  )
  const filtered = Boolean(q || calibration || retired)
  const clear = () => filters.set({ q: '', calibration: '', retired: '' })
  return (
    <>
      <PageHead title="Machines" actions={begin}>
        Power sources and feeders by what stands on their panels, so that an approved range becomes a figure to dial.
      </PageHead>
      <FilterBar label="Filter by number, name or place" search={q} onSearch={(text) => filters.set({ q: text })} onClear={filtered ? clear : undefined}>
        <Select label="Calibration" labelHidden empty="Any calibration" options={CALIBRATION_OPTIONS} value={calibration ?? ''} onChange={(event) => filters.set({ calibration: event.target.value })} className="w-44" />
        <div className="flex min-h-9 items-center"><Switch label="Retired too" checked={retired === 'with'} onChange={(event) => filters.set({ retired: event.target.checked ? 'with' : '' })} /></div>
      </FilterBar>
      {list.isPending && <Skeleton label="Reading the machines" />}
      {list.isError && <ErrorState error={list.error} onRetry={() => void list.refetch()} />}
      {list.data &&
        (list.data.rows.length > 0 ? (
          <DataTable caption="Machines" columns={columns} rows={list.data.rows} rowKey={(row) => row.id} rowHref={(row) => `/machines/${row.id}`} sort={sorted(sort)} onSort={(next) => filters.set({ sort: next })} storageKey="machines" total={list.data.total} onMore={list.hasNextPage ? () => void list.fetchNextPage() : undefined} loadingMore={list.isFetchingNextPage} />
        ) : filtered ? (
          <NothingFound what="machines" onClear={clear} />
        ) : (
          <EmptyState title="No machine yet" step={begin} example={<p>M-001 Bay 2 feeder · wire feed 1 to 18 m/min in steps of 0.5, volts 15 to 38 in steps of 0.5. A procedure that allows 320 to 350 in/min becomes “dial 8.5 m/min”, with the room left drawn beside it.</p>}>
            <p>Describe each machine by its own panel: its modes, the controls with unit, scale and step, what it shows and what it hides. Panel cards are then worked out from any approved procedure.</p>
            {!manages && <p className="mt-2">Engineers and administrators register machines.</p>}
          </EmptyState>
        ))}
    </>
  )
}
