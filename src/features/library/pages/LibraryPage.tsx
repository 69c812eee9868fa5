import { useInfiniteQuery } from '@tanstack/react-query'
import { useMemo, useState } from 'react'
import { Link, NavLink, useParams } from 'react-router-dom'
import { LIBRARY_KINDS, type LibraryKind } from '@shared/library/library-rows.ts'
import { processSchema } from '@shared/schemas/welding.ts'
import type { LibraryItem } from '@shared/schemas/records.ts'
import { DataTable, type Column } from '@/components/DataTable.tsx'
import { Dialog } from '@/components/Dialog.tsx'
import { Select } from '@/components/fields/text.tsx'
import { FilterBar } from '@/components/FilterBar.tsx'
import { EmptyState, ErrorState, NothingFound, PageHead, Skeleton } from '@/components/states.tsx'
import { PROCESS_OPTIONS } from '@/components/variables/options.ts'
import { useFilters } from '@/hooks/filters.ts'
import { useUnits } from '@/hooks/units.ts'
import { listQuery } from '@/lib/query.ts'
import { BASIS_SENTENCE, BASIS_WORD, factsOf, KIND_NAMES, type Fact } from '../columns.tsx'

const isKind = (kind: string | undefined): kind is LibraryKind => LIBRARY_KINDS.some((one) => one === kind)

export function LibraryPage() {
  const { kind } = useParams()
  return isKind(kind) ? <Kind key={kind} kind={kind} /> : (
    <EmptyState title="The library has no such part">
      <p>
        It holds{' '}
        {LIBRARY_KINDS.map((one, index) => (
          <span key={one}>
            {index > 0 && (index === LIBRARY_KINDS.length - 1 ? ' and ' : ', ')}
            <Link to={`/library/${one}`} className="text-link">
              {KIND_NAMES[one].title.toLowerCase()}
            </Link>
          </span>
        ))}
        .
      </p>
    </EmptyState>
  )
}

function Kind({ kind }: { kind: LibraryKind }) {
  const { system } = useUnits()
  const filters = useFilters(['q', 'process', 'p', 'f'])
  const { q, process, p, f } = filters.values
  const [open, setOpen] = useState<LibraryItem | null>(null)
  const fillers = kind === 'filler-metals'
  const list = useInfiniteQuery(listQuery('listLibrary', { params: { kind }, query: { q: q || undefined, process: fillers ? processSchema.safeParse(process).data : undefined, pNumber: p || undefined, fNumber: f || undefined } }))
  const { title, find, about } = KIND_NAMES[kind]
  const first = list.data?.rows[0]
  const heads = useMemo(() => (first ? factsOf(first, system).shown.map(({ label }) => label) : []), [first, system])
  const columns = useMemo<Column<LibraryItem>[]>(
    () => [
      {
        id: 'title',
        header: kind === 'positions' ? 'ASME and AWS' : kind === 'processes' ? 'AWS' : 'Name',
        className: 'md:min-w-28',
        cell: (row) => (
          <button type="button" className="min-h-6 text-left font-semibold hover:underline" data-row-link onClick={() => setOpen(row)}>
            {row.title}
          </button>
        ),
      },
      ...heads.map((header, index): Column<LibraryItem> => ({ id: `fact-${index}`, header, className: header === 'Tensile, min.' ? 'whitespace-nowrap' : '', align: header === 'Tensile, min.' ? 'right' : 'left', cell: (row) => <Said value={factsOf(row, system).shown[index]?.value ?? null} /> })),
      { id: 'basis', header: 'Basis', className: 'whitespace-nowrap', cell: (row) => <Basis item={row} /> },
      { id: 'source', header: 'Source', hidden: true, cell: (row) => <span className="text-sm text-soft">{row.source ?? 'own row'}</span> },
    ],
    [heads, kind, system],
  )
  const filtered = Boolean(q || process || p || f)
  return (
    <>
      <PageHead title={title}>{about}</PageHead>
      <nav aria-label="Parts of the library" className="no-print mb-4 overflow-x-auto border-b border-rule">
        <ul className="flex gap-x-5">
          {LIBRARY_KINDS.map((one) => (
            <li key={one}>
              <NavLink to={`/library/${one}`} className={({ isActive }) => `-mb-px block border-b-2 py-2 whitespace-nowrap ${isActive ? 'border-ink font-semibold' : 'border-transparent text-soft hover:text-ink'}`}>
                {KIND_NAMES[one].title}
              </NavLink>
            </li>
          ))}
        </ul>
      </nav>
      <FilterBar label={find} search={q} onSearch={(text) => filters.set({ q: text })} onClear={filtered ? filters.clear : undefined}>
        {fillers && <Select label="Process" labelHidden empty="Every process" value={process} onChange={(event) => filters.set({ process: event.target.value })} options={PROCESS_OPTIONS.filter(({ value }) => value !== 'OTHER')} />}
      </FilterBar>
      {list.isPending && <Skeleton label="Reading the library" />}
      {list.isError && <ErrorState error={list.error} onRetry={() => void list.refetch()} />}
      {list.data &&
        (list.data.rows.length > 0 ? (
          <div className="md:overflow-x-auto">
            <DataTable caption={title} columns={columns} rows={list.data.rows} rowKey={(row) => row.id} storageKey={`library.${kind}`} total={list.data.total} onMore={list.hasNextPage ? () => void list.fetchNextPage() : undefined} loadingMore={list.isFetchingNextPage} />
          </div>
        ) : (
          <NothingFound what={title.toLowerCase()} onClear={filtered ? filters.clear : undefined} />
        ))}
      {open && <Panel item={open} onClose={() => setOpen(null)} />}
    </>
  )
}

const Said = ({ value }: { value: Fact['value'] }) => (value === null || value === '' ? <span className="text-soft">not listed</span> : <>{value}</>)

const Basis = ({ item }: { item: LibraryItem }) => <span className={item.basis === 'memory' ? 'text-straw-deep' : 'text-soft'}>{item.origin === 'own' ? 'own' : (BASIS_WORD[item.basis ?? ''] ?? item.basis ?? 'not stated')}</span>

/** One row with everything the source says of it. */
function Panel({ item, onClose }: { item: LibraryItem; onClose: () => void }) {
  const { system } = useUnits()
  const { shown, more } = factsOf(item, system)
  return (
    <Dialog title={item.title} isOpen onClose={onClose}>
      <dl>
        {[...shown, ...more].map(({ label, value }) => (
          <div key={label} className="grid grid-cols-[9rem_minmax(0,1fr)] gap-x-4 border-b border-hair py-1.5">
            <dt className="text-soft">{label}</dt>
            <dd className="font-medium break-words">
              <Said value={value} />
            </dd>
          </div>
        ))}
      </dl>
      <div>
        <p className="cell-label">Basis and source</p>
        <p className="mt-1">{BASIS_SENTENCE[item.basis ?? ''] ?? 'The basis is not stated.'}</p>
        {item.source && <p className="mt-0.5 text-sm text-soft">{item.source}</p>}
      </div>
    </Dialog>
  )
}
