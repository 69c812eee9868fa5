import { useInfiniteQuery } from '@tanstack/react-query'
import { useMemo } from 'react'
import { processSchema } from '@shared/schemas/welding.ts'
import { REVISION_STATES, revisionStateSchema, type ProcedureRow } from '@shared/schemas/records.ts'
import { ButtonLink } from '@/components/Button.tsx'
import { DataTable, type Column } from '@/components/DataTable.tsx'
import { Select } from '@/components/fields/text.tsx'
import { FilterBar } from '@/components/FilterBar.tsx'
import { RangeGauge } from '@/components/range-gauge/RangeGauge.tsx'
import { Stamp, stampWord } from '@/components/Stamp.tsx'
import { EmptyState, ErrorState, NothingFound, PageHead, Skeleton } from '@/components/states.tsx'
import { useFilters } from '@/hooks/filters.ts'
import { useMay } from '@/hooks/session.ts'
import { useUnits, type Units } from '@/hooks/units.ts'
import { day } from '@/lib/figures.ts'
import { listQuery } from '@/lib/query.ts'
import { PROCESS_OPTIONS, standardName } from '@/components/variables/options.ts'

const SORTS = ['number', '-number', 'updatedAt', '-updatedAt', 'title', '-title'] as const
const sorted = (sort: string) => SORTS.find((one) => one === sort) ?? '-updatedAt'

/** Thickness that a procedure asks for, in figures. */
function thickness({ thicknessMin: min, thicknessMax: max }: ProcedureRow, units: Units): string {
  if (min === null && max === null) return ''
  if (min !== null && max !== null && min === max) return units.stored(min, 'length')
  if (min !== null && max !== null) return `${units.stored(min, 'length').split(' ')[0]}–${units.stored(max, 'length')}`
  return min !== null ? `≥ ${units.stored(min, 'length')}` : `≤ ${units.stored(max ?? 0, 'length')}`
}

export function ProceduresPage() {
  const mayDraft = useMay('procedures.draft')
  const units = useUnits()
  const filters = useFilters(['q', 'state', 'process', 'sort'])
  const { q, state, process, sort } = filters.values
  const list = useInfiniteQuery(listQuery('listProcedures', { query: { q: q || undefined, state: revisionStateSchema.safeParse(state).data, process: processSchema.safeParse(process).data, sort: sorted(sort) } }))
  // One scale for every row of the page, so that the bars can be compared down the column.
  const widest = Math.max(...(list.data?.rows ?? []).map(({ thicknessMax, thicknessMin }) => thicknessMax ?? thicknessMin ?? 0), 1)
  const columns = useMemo<Column<ProcedureRow>[]>(
    () => [
      {
        id: 'number',
        header: 'Number',
        sort: 'number',
        className: 'whitespace-nowrap',
        cell: (row) => (
          <>
            <span className="font-semibold">{row.number}</span> <span className="font-normal text-soft">rev {row.revision}</span>
          </>
        ),
      },
      { id: 'title', header: 'Title', sort: 'title', className: 'min-w-48', cell: (row) => row.title },
      { id: 'processes', header: 'Process', cell: (row) => row.processes.join(' + ') || <Unsaid /> },
      { id: 'metals', header: 'Metals', className: 'min-w-28', cell: (row) => row.metals || <Unsaid /> },
      {
        id: 'thickness',
        header: 'Thickness',
        className: 'min-w-36',
        cell: (row) => (thickness(row, units) ? <Thickness row={row} text={thickness(row, units)} widest={widest} /> : <Unsaid />),
      },
      { id: 'positions', header: 'Positions', wideOnly: true, cell: (row) => row.positions.join(', ') || <Unsaid /> },
      { id: 'standards', header: 'Standard', wideOnly: true, cell: (row) => row.standards.map(standardName).join(', ') },
      { id: 'state', header: 'State', cell: (row) => <Stamp small state={row.state} /> },
      { id: 'author', header: 'Author', hidden: true, cell: (row) => row.author.name },
      { id: 'updatedAt', header: 'Changed', sort: 'updatedAt', wideOnly: true, className: 'whitespace-nowrap', cell: (row) => day(row.updatedAt) },
    ],
    [units, widest],
  )
  const begin = mayDraft && (
    <ButtonLink kind="primary" to="/procedures/new">
      New procedure
    </ButtonLink>
  )
  const filtered = Boolean(q || state || process)
  return (
    <>
      <PageHead title="Procedures" actions={begin}>
        How each joint is to be welded, within what the coupons have shown.
      </PageHead>
      <FilterBar label="Filter by number, title or grade" search={q} onSearch={(text) => filters.set({ q: text })} onClear={filtered ? () => filters.set({ q: '', state: '', process: '' }) : undefined}>
        <Select label="State" labelHidden empty="Every state" value={state} onChange={(event) => filters.set({ state: event.target.value })} options={REVISION_STATES.map((one) => ({ value: one, label: stampWord(one) }))} />
        <Select label="Process" labelHidden empty="Every process" value={process} onChange={(event) => filters.set({ process: event.target.value })} options={PROCESS_OPTIONS} />
      </FilterBar>
      {list.isPending && <Skeleton label="Reading the procedures" />}
      {list.isError && <ErrorState error={list.error} onRetry={() => void list.refetch()} />}
      {list.data &&
        (list.data.rows.length > 0 ? (
          <DataTable
            caption="Procedures"
            columns={columns}
            rows={list.data.rows}
            rowKey={(row) => row.id}
            rowHref={(row) => `/revisions/${row.revisionId}`}
            sort={sorted(sort)}
            onSort={(next) => filters.set({ sort: next })}
            storageKey="procedures"
            total={list.data.total}
            onMore={list.hasNextPage ? () => void list.fetchNextPage() : undefined}
            loadingMore={list.isFetchingNextPage}
          />
        ) : filtered ? (
          <NothingFound what="procedures" onClear={() => filters.set({ q: '', state: '', process: '' })} />
        ) : (
          <EmptyState title="No procedure yet" step={begin} example={<Example />}>
            <p>A procedure says how a joint is welded: metals, thickness, filler, positions, gas, heat and settings. Each figure is held against what a tested coupon qualifies, as you write it.</p>
            {!mayDraft && <p className="mt-2">Engineers write them. Once one is approved, it can be looked up for a joint from here and in the shop.</p>}
          </EmptyState>
        ))}
    </>
  )
}

const Unsaid = () => <span className="text-soft">not stated</span>

/** What is asked, drawn against the widest of the list: no range stands behind it, as this is no verdict. */
function Thickness({ row, text, widest }: { row: ProcedureRow; text: string; widest: number }) {
  const min = row.thicknessMin ?? 0
  const max = row.thicknessMax
  const left = (min / widest) * 100
  return (
    <div>
      <p className="whitespace-nowrap">{text}</p>
      <div aria-hidden="true" className="relative mt-1 h-1 w-28 bg-hair">
        <span className="absolute inset-y-0 bg-ink" style={{ left: `${Math.min(left, 97)}%`, right: max === null ? 0 : `${Math.max(0, 100 - Math.max((max / widest) * 100, left + 3))}%` }} />
      </div>
    </div>
  )
}

const Example = () => (
  <>
    <p>A 10 mm coupon welded in P-No. 1 plate qualifies 5 to 20 mm. A procedure that asks for 6 to 16 mm lies within it:</p>
    <div className="mt-3 max-w-80">
      <RangeGauge label="Thickness, worked example" range={{ type: 'numeric', dimension: 'length', unit: 'mm', segments: [{ lower: { kind: 'closed', value: 5 }, upper: { kind: 'closed', value: 20 } }] }} asked={{ min: 6, max: 16 }} tested={[10]} />
    </div>
  </>
)
