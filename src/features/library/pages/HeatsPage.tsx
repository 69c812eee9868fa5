import { useInfiniteQuery } from '@tanstack/react-query'
import { useMemo } from 'react'
import { heatFigures } from '@shared/library/heat-figures.ts'
import type { HeatRow } from '@shared/schemas/heats.ts'
import { ButtonLink } from '@/components/Button.tsx'
import { DataTable, type Column } from '@/components/DataTable.tsx'
import { Select } from '@/components/fields/text.tsx'
import { FilterBar } from '@/components/FilterBar.tsx'
import { EmptyState, ErrorState, NothingFound, PageHead, Skeleton } from '@/components/states.tsx'
import { useFilters } from '@/hooks/filters.ts'
import { useMay } from '@/hooks/session.ts'
import { day } from '@/lib/figures.ts'
import { listQuery } from '@/lib/query.ts'
import { LibraryNav } from '../components/LibraryNav.tsx'

const SORTS = ['number', '-number', 'grade', '-grade', 'updatedAt', '-updatedAt'] as const
const KINDS = [{ value: 'heat', label: 'Heats of base metal' }, { value: 'lot', label: 'Lots of filler' }]
const none = <span className="text-soft">none</span>

/** The figures of a row in a line: CE and Pcm of a steel, FN and PREN of a stainless one, the A-Number of a deposit. */
function inShort(row: HeatRow): string {
  return heatFigures(row).figures.flatMap(({ id, label, reading }) => (reading === null || id === 'cet' || id === 'cen' ? [] : [`${id === 'ceIiw' ? 'CE' : id === 'ferriteNumber' ? 'FN' : id === 'aNumber' ? 'A-No.' : label}\u00a0${reading}`])).join(' · ')
}

export function HeatsPage() {
  const manages = useMay('heats.manage')
  const filters = useFilters(['q', 'kind', 'sort'])
  const { q, kind } = filters.values
  const sort = SORTS.find((one) => one === filters.values.sort) ?? '-updatedAt'
  const only = kind === 'heat' || kind === 'lot' ? kind : undefined
  const list = useInfiniteQuery(listQuery('listHeats', { query: { q: q || undefined, kind: only, sort } }))
  const columns = useMemo<Column<HeatRow>[]>(
    () => [
      { id: 'number', header: 'Number', sort: 'number', className: 'whitespace-nowrap', cell: (row) => row.number },
      { id: 'kind', header: 'Kind', cell: (row) => row.kind },
      { id: 'grade', header: 'Grade or classification', sort: 'grade', cell: (row) => row.grade },
      { id: 'figures', header: 'From its chemistry', className: 'tabular-nums', cell: (row) => inShort(row) || <span className="text-soft">{row.chemistry.length === 0 ? 'no chemistry' : 'none stated for it'}</span> },
      { id: 'certificate', header: 'Certificate', wideOnly: true, cell: (row) => [row.certificate, row.certificateType].filter(Boolean).join(', ') || none },
      { id: 'files', header: 'Papers', align: 'right', cell: (row) => (row.files === 0 ? none : row.files) },
      { id: 'received', header: 'Received', className: 'whitespace-nowrap', cell: (row) => (row.receivedOn ? day(row.receivedOn) : <span className="text-soft">not stated</span>) },
      { id: 'changed', header: 'Changed', sort: 'updatedAt', hidden: true, className: 'whitespace-nowrap', cell: (row) => day(row.updatedAt) },
    ],
    [],
  )
  const begin = manages && (
    <>
      <ButtonLink kind="primary" to="/library/heats/new">
        Record a heat
      </ButtonLink>
      <ButtonLink to="/library/heats/new?kind=lot">Record a lot</ButtonLink>
    </>
  )
  const filtered = Boolean(q || only)
  const clear = () => filters.set({ q: '', kind: '' })
  return (
    <>
      <PageHead title="Heats and lots" actions={begin}>
        Mill certificates of base metal and certificates of filler metal, with what follows from their chemistry.
      </PageHead>
      <LibraryNav />
      <FilterBar label="Number, grade or certificate" search={q} onSearch={(text) => filters.set({ q: text })} onClear={filtered ? clear : undefined}>
        <Select label="Kind" labelHidden empty="Heats and lots" options={KINDS} value={only ?? ''} onChange={(event) => filters.set({ kind: event.target.value })} />
      </FilterBar>
      {list.isPending && <Skeleton label="Reading heats and lots" />}
      {list.isError && <ErrorState error={list.error} onRetry={() => void list.refetch()} />}
      {list.data &&
        (list.data.rows.length > 0 ? (
          <DataTable caption="Heats and lots" columns={columns} rows={list.data.rows} rowKey={(row) => row.id} rowHref={(row) => `/library/heats/${row.id}`} sort={sort} onSort={(next) => filters.set({ sort: next })} storageKey="heats" total={list.data.total} onMore={list.hasNextPage ? () => void list.fetchNextPage() : undefined} loadingMore={list.isFetchingNextPage} />
        ) : filtered ? (
          <NothingFound what="heats or lots" onClear={clear} />
        ) : (
          <EmptyState title="No heat and no lot yet" step={begin} example={<p>Heat K4471, A/SA-516 70: “C 0.18 Si 0.32 Mn 1.12 Cr 0.05 Ni 0.04 Cu 0.06” copied from the certificate gives CE 0.383 and Pcm 0.253, with formula, limits and source beside them.</p>}>
            <p>Record a heat with its mill certificate, or a lot of filler with its own. Their numbers are then offered where a procedure or a coupon names the metal.</p>
            {!manages && <p className="mt-2">Engineers, inspectors and administrators record them.</p>}
          </EmptyState>
        ))}
    </>
  )
}
