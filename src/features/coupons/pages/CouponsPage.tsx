import { useInfiniteQuery } from '@tanstack/react-query'
import { Camera } from 'lucide-react'
import { useMemo } from 'react'
import { COUPON_STATES, couponStateSchema, type CouponRow } from '@shared/schemas/records.ts'
import { processSchema } from '@shared/schemas/welding.ts'
import { ButtonLink } from '@/components/Button.tsx'
import { DataTable, type Column } from '@/components/DataTable.tsx'
import { Select } from '@/components/fields/text.tsx'
import { FilterBar } from '@/components/FilterBar.tsx'
import { RangeGauge } from '@/components/range-gauge/RangeGauge.tsx'
import { Stamp, stampWord } from '@/components/Stamp.tsx'
import { EmptyState, ErrorState, NothingFound, PageHead, Skeleton } from '@/components/states.tsx'
import { PROCESS_OPTIONS } from '@/components/variables/options.ts'
import { useFilters } from '@/hooks/filters.ts'
import { useMay } from '@/hooks/session.ts'
import { useUnits } from '@/hooks/units.ts'
import { day } from '@/lib/figures.ts'
import { listQuery } from '@/lib/query.ts'

const SORTS = ['number', '-number', 'updatedAt', '-updatedAt'] as const
const sorted = (sort: string) => SORTS.find((one) => one === sort) ?? '-updatedAt'

export function CouponsPage() {
  const mayRecord = useMay('coupons.record')
  const units = useUnits()
  const filters = useFilters(['q', 'state', 'process', 'sort'])
  const { q, state, process, sort } = filters.values
  const list = useInfiniteQuery(listQuery('listCoupons', { query: { q: q || undefined, state: couponStateSchema.safeParse(state).data, process: processSchema.safeParse(process).data, sort: sorted(sort) } }))
  const columns = useMemo<Column<CouponRow>[]>(
    () => [
      { id: 'number', header: 'Number', sort: 'number', className: 'whitespace-nowrap', cell: (row) => <span className="font-semibold">{row.number}</span> },
      { id: 'title', header: 'Title', className: 'md:min-w-40', cell: (row) => row.title },
      { id: 'state', header: 'State', cell: (row) => <Stamp small state={row.state} /> },
      { id: 'processes', header: 'Process', cell: (row) => row.processes.join(' + ') || <Unsaid /> },
      { id: 'metals', header: 'Metals', className: 'md:min-w-28', cell: (row) => row.metals || <Unsaid /> },
      { id: 'thickness', header: 'Thickness', align: 'right', className: 'whitespace-nowrap', cell: (row) => (row.thickness === null ? <Unsaid /> : units.stored(row.thickness, 'length')) },
      { id: 'positions', header: 'Position', cell: (row) => row.positions.join(', ') || <Unsaid /> },
      { id: 'weldedOn', header: 'Welded', className: 'whitespace-nowrap', cell: (row) => (row.weldedOn ? day(row.weldedOn) : <Unsaid text="not yet" />) },
      { id: 'procedure', header: 'For', className: 'whitespace-nowrap', cell: (row) => row.procedureNumber ?? <Unsaid text="by itself" /> },
      {
        id: 'photos',
        header: 'Photos',
        align: 'right',
        cell: (row) => (
          <span className={`inline-flex items-center gap-1.5 ${row.photoCount === 0 ? 'text-soft' : ''}`}>
            <Camera size={14} aria-hidden="true" />
            {row.photoCount}
          </span>
        ),
      },
      { id: 'inspector', header: 'Inspector', hidden: true, cell: (row) => row.inspector.name },
      { id: 'updatedAt', header: 'Changed', sort: 'updatedAt', hidden: true, className: 'whitespace-nowrap', cell: (row) => day(row.updatedAt) },
    ],
    [units],
  )
  const begin = mayRecord && (
    <ButtonLink kind="primary" to="/coupons/new">
      Open a coupon
    </ButtonLink>
  )
  const clear = () => filters.set({ q: '', state: '', process: '' })
  const filtered = Boolean(q || state || process)
  return (
    <>
      <PageHead title="Coupons" actions={begin}>
        What was welded and tested to show that a procedure holds.
      </PageHead>
      <FilterBar label="Filter by number, title or grade" search={q} onSearch={(text) => filters.set({ q: text })} onClear={filtered ? clear : undefined}>
        <Select label="State" labelHidden empty="Every state" value={state} onChange={(event) => filters.set({ state: event.target.value })} options={COUPON_STATES.map((one) => ({ value: one, label: stampWord(one) }))} />
        <Select label="Process" labelHidden empty="Every process" value={process} onChange={(event) => filters.set({ process: event.target.value })} options={PROCESS_OPTIONS} />
      </FilterBar>
      {list.isPending && <Skeleton label="Reading the coupons" />}
      {list.isError && <ErrorState error={list.error} onRetry={() => void list.refetch()} />}
      {list.data &&
        (list.data.rows.length > 0 ? (
          <div className="md:overflow-x-auto"><DataTable
            caption="Coupons"
            columns={columns}
            rows={list.data.rows}
            rowKey={(row) => row.id}
            rowHref={(row) => `/coupons/${row.id}`}
            sort={sorted(sort)}
            onSort={(next) => filters.set({ sort: next })}
            storageKey="coupons"
            total={list.data.total}
            onMore={list.hasNextPage ? () => void list.fetchNextPage() : undefined}
            loadingMore={list.isFetchingNextPage}
          /></div>
        ) : filtered ? (
          <NothingFound what="coupons" onClear={clear} />
        ) : (
          <EmptyState title="No coupon yet" step={begin} example={<Example />}>
            <p>A coupon is a test piece welded as a procedure says. The passes are logged as they are welded, the specimens as they are tested; each figure is judged at once, and what the coupon qualifies is computed from it.</p>
            {!mayRecord && <p className="mt-2">Inspectors open them, against a draft or by themselves.</p>}
          </EmptyState>
        ))}
    </>
  )
}

const Unsaid = ({ text = 'not stated' }: { text?: string }) => <span className="text-soft">{text}</span>

const Example = () => (
  <>
    <p>A 10 mm plate, welded in one position, two tension specimens and four bends accepted. By ASME IX QW-451.1 it qualifies 5 to 20 mm:</p>
    <div className="mt-3 max-w-80">
      <RangeGauge label="Thickness, worked example" range={{ type: 'numeric', dimension: 'length', unit: 'mm', segments: [{ lower: { kind: 'closed', value: 5 }, upper: { kind: 'closed', value: 20 } }] }} asked={null} tested={[10]} />
    </div>
  </>
)
