import { useState } from 'react'
import type { RevisionState } from '@shared/schemas/records.ts'
import { DataTable, type Column } from '@/components/DataTable.tsx'
import { FilterBar } from '@/components/FilterBar.tsx'
import { Select } from '@/components/fields/text.tsx'
import { RangeGauge } from '@/components/range-gauge/RangeGauge.tsx'
import { Stamp, stampWord } from '@/components/Stamp.tsx'
import { closed, mm } from './fixtures.ts'
import { Group } from './Group.tsx'

interface Row {
  id: string
  title: string
  process: string
  from: number
  to: number
  state: RevisionState
}
const ROWS: Row[] = [
  { id: 'WPS-009 C', title: 'Groove weld, carbon steel plate', process: 'SMAW', from: 5, to: 38, state: 'approved' },
  { id: 'WPS-012 A', title: 'Root by GTAW, fill by SMAW, stainless pipe', process: 'GTAW + SMAW', from: 1.5, to: 12, state: 'in-review' },
  { id: 'WPS-014 B', title: 'Pulsed groove weld, 6061-T6 plate', process: 'GMAW', from: 5, to: 25, state: 'draft' },
]
const COLUMNS: Column<Row>[] = [
  { id: 'number', header: 'Number', sort: 'number', className: 'whitespace-nowrap', cell: (row) => row.id },
  { id: 'title', header: 'Title', sort: 'title', cell: (row) => row.title },
  { id: 'process', header: 'Process', cell: (row) => row.process },
  { id: 'thickness', header: 'Thickness, mm', align: 'right', cell: (row) => `${row.from}–${row.to}` },
  { id: 'gauge', header: 'Covered', className: 'w-44', cell: (row) => <RangeGauge thin label={`${row.id}, thickness`} range={mm([closed(5), closed(20)])} asked={{ min: row.from, max: row.to }} tested={[10]} /> },
  { id: 'state', header: 'State', cell: (row) => <Stamp state={row.state} small /> },
]

export function TableSection() {
  const [sort, setSort] = useState('number')
  const [search, setSearch] = useState('')
  const key = sort.replace('-', '') === 'title' ? 'title' : 'id'
  const rows = ROWS.filter(({ title }) => title.toLowerCase().includes(search.toLowerCase())).sort((a, b) => a[key].localeCompare(b[key]) * (sort.startsWith('-') ? -1 : 1))
  return (
    <Group title="Table, filters">
      <FilterBar label="Find a procedure" search={search} onSearch={setSearch} count={`${rows.length} of ${ROWS.length}`} onClear={search ? () => setSearch('') : undefined}>
        <Select label="State" labelHidden empty="Every state" options={[{ value: 'draft', label: stampWord('draft') }]} />
      </FilterBar>
      <DataTable caption="Procedures" columns={COLUMNS} rows={rows} rowKey={(row) => row.id} rowHref={() => '/gallery'} sort={sort} onSort={setSort} storageKey="gallery" total={12} onMore={() => undefined} />
    </Group>
  )
}
