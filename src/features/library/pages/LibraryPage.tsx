import { useInfiniteQuery } from '@tanstack/react-query'
import { useMemo } from 'react'
import { Link, useParams } from 'react-router-dom'
import { LIBRARY_KINDS, type LibraryKind } from '@shared/library/library-rows.ts'
import { ownKindSchema } from '@shared/schemas/library.ts'
import { processSchema } from '@shared/schemas/welding.ts'
import type { LibraryItem } from '@shared/schemas/records.ts'
import { ButtonLink } from '@/components/Button.tsx'
import { DataTable, type Column } from '@/components/DataTable.tsx'
import { Select } from '@/components/fields/text.tsx'
import { FilterBar } from '@/components/FilterBar.tsx'
import { EmptyState, ErrorState, NothingFound, PageHead, Skeleton } from '@/components/states.tsx'
import { PROCESS_OPTIONS } from '@/components/variables/options.ts'
import { useFilters } from '@/hooks/filters.ts'
import { useMay } from '@/hooks/session.ts'
import { useUnits } from '@/hooks/units.ts'
import { listQuery } from '@/lib/query.ts'
import { isKind, LibraryNav } from '../components/LibraryNav.tsx'
import { BasisWord, factsOf, KIND_NAMES, Listed } from '../columns.tsx'

export function LibraryPage() {
  const { kind } = useParams()
  return isKind(kind) ? <Kind key={kind} kind={kind} /> : <NoSuchPart />
}

export function NoSuchPart() {
  return (
    <>
      <PageHead title="Library" />
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
    </>
  )
}

/** Columns that a tablet has no room for. */
const WIDE_ONLY: ReadonlySet<string> = new Set(['UNS or EN', 'ISO 15608', 'Composition', 'Product form', 'Product'])

function Kind({ kind }: { kind: LibraryKind }) {
  const { system } = useUnits()
  const manages = useMay('library.manage') && ownKindSchema.safeParse(kind).success
  const filters = useFilters(['q', 'process', 'p', 'f'])
  const { q, process, p, f } = filters.values
  const fillers = kind === 'filler-metals'
  const list = useInfiniteQuery(listQuery('listLibrary', { params: { kind }, query: { q: q || undefined, process: fillers ? processSchema.safeParse(process).data : undefined, pNumber: p || undefined, fNumber: f || undefined } }))
  const { title, one, find, about } = KIND_NAMES[kind]
  const first = list.data?.rows[0]
  const heads = useMemo(() => (first ? factsOf(first, system).shown.map(({ label }) => label) : []), [first, system])
  const columns = useMemo<Column<LibraryItem>[]>(
    () => [
      { id: 'title', header: kind === 'positions' ? 'ASME and AWS' : kind === 'processes' ? 'AWS' : 'Name', className: 'md:min-w-28', cell: (row) => row.title },
      ...heads.map((header, index): Column<LibraryItem> => ({ id: `fact-${index}`, header, wideOnly: WIDE_ONLY.has(header), className: header === 'Tensile, min.' ? 'whitespace-nowrap' : '', align: header === 'Tensile, min.' ? 'right' : 'left', cell: (row) => <Listed facts={factsOf(row, system).shown} at={index} /> })),
      { id: 'basis', header: 'Basis', className: 'whitespace-nowrap', cell: (row) => (row.origin === 'own' ? <Own /> : <BasisWord basis={row.basis} />) },
      { id: 'source', header: 'Source', hidden: true, cell: (row) => <span className="text-sm text-soft">{row.source}</span> },
    ],
    [heads, kind, system],
  )
  const filtered = Boolean(q || process || p || f)
  return (
    <>
      <PageHead title={title} actions={manages && <ButtonLink to={`/library/${kind}/new`}>Add {one} of our own</ButtonLink>}>
        {about}
      </PageHead>
      <LibraryNav />
      <FilterBar label={find} search={q} onSearch={(text) => filters.set({ q: text })} onClear={filtered ? filters.clear : undefined}>
        {fillers && <Select label="Process" labelHidden empty="Every process" value={process} onChange={(event) => filters.set({ process: event.target.value })} options={PROCESS_OPTIONS.filter(({ value }) => value !== 'OTHER')} />}
      </FilterBar>
      {list.isPending && <Skeleton label="Reading the library" />}
      {list.isError && <ErrorState error={list.error} onRetry={() => void list.refetch()} />}
      {list.data &&
        (list.data.rows.length > 0 ? (
          <DataTable caption={title} columns={columns} rows={list.data.rows} rowKey={(row) => row.id} rowHref={(row) => `/library/${kind}/${row.id}`} storageKey={`library.${kind}`} total={list.data.total} onMore={list.hasNextPage ? () => void list.fetchNextPage() : undefined} loadingMore={list.isFetchingNextPage} />
        ) : (
          <NothingFound what={title.toLowerCase()} onClear={filtered ? filters.clear : undefined} />
        ))}
    </>
  )
}

/** A row of the organization's own, told from the reference at a glance. */
export const Own = () => <span className="rounded-sm border border-plum px-1.5 text-sm font-semibold text-plum">our own</span>
