import { useInfiniteQuery } from '@tanstack/react-query'
import { useMemo, useState } from 'react'
import { ROLES, roleSchema, type Person } from '@shared/schemas/people.ts'
import { Button } from '@/components/Button.tsx'
import { DataTable, type Column } from '@/components/DataTable.tsx'
import { Select } from '@/components/fields/text.tsx'
import { FilterBar } from '@/components/FilterBar.tsx'
import { Stamp } from '@/components/Stamp.tsx'
import { ErrorState, NothingFound, PageHead, Skeleton } from '@/components/states.tsx'
import { useFilters } from '@/hooks/filters.ts'
import { useMay, useSession } from '@/hooks/session.ts'
import { day, moment } from '@/lib/figures.ts'
import { listQuery } from '@/lib/query.ts'
import { InviteDialog } from '../components/InviteDialog.tsx'
import { PersonDialog } from '../components/PersonDialog.tsx'

const sorted = (sort: string): 'name' | '-name' | 'createdAt' | '-createdAt' => (sort === '-name' || sort === 'createdAt' || sort === '-createdAt' ? sort : 'name')

export function PeoplePage() {
  const manages = useMay('people.manage')
  const me = useSession().person?.id
  const filters = useFilters(['q', 'role', 'sort'])
  const { q, role, sort } = filters.values
  const people = useInfiniteQuery(listQuery('listPeople', { query: { q: q || undefined, role: roleSchema.safeParse(role).data, sort: sorted(sort) } }))
  const [inviting, setInviting] = useState(false)
  const [changing, setChanging] = useState<Person | null>(null)
  const columns = useMemo<Column<Person>[]>(
    () => [
      {
        id: 'name',
        header: 'Name',
        sort: 'name',
        cell: (person) => (
          <span className="font-semibold">
            {person.name}
            {person.id === me && <span className="font-normal text-soft"> (you)</span>}
          </span>
        ),
      },
      { id: 'email', header: 'E-mail', cell: (person) => <Address email={person.email} /> },
      { id: 'roles', header: 'Roles', cell: (person) => person.roles.join(', ') },
      { id: 'state', header: 'Access', cell: (person) => <Stamp state={person.state} small /> },
      { id: 'lastSignInAt', header: 'Last here', cell: (person) => (person.lastSignInAt ? moment(person.lastSignInAt) : 'never') },
      { id: 'createdAt', header: 'Since', sort: 'createdAt', cell: (person) => day(person.createdAt), hidden: true },
      ...(manages ? [{ id: 'change', header: 'Change', fixed: true, cell: (person: Person) => <Button kind="quiet" className="min-h-0! py-0!" aria-label={`Change ${person.name}`} onClick={() => setChanging(person)}>Change</Button> }] : []),
    ],
    [manages, me],
  )
  return (
    <>
      <PageHead title="People" actions={manages && <Button kind="primary" onClick={() => setInviting(true)}>Invite a person</Button>}>
        Who works with the procedures, and what each may do. Signatures keep the name of whoever signed, also after they leave.
      </PageHead>
      <FilterBar label="Find a person" search={q} onSearch={(text) => filters.set({ q: text })} onClear={q || role ? () => filters.set({ q: '', role: '' }) : undefined}>
        <Select label="Role" labelHidden empty="Every role" value={role} onChange={(event) => filters.set({ role: event.target.value })} options={ROLES.map((one) => ({ value: one, label: one }))} />
      </FilterBar>
      {people.isPending && <Skeleton label="Reading the people" />}
      {people.isError && <ErrorState error={people.error} onRetry={() => void people.refetch()} />}
      {people.data &&
        (people.data.rows.length > 0 ? (
          <DataTable
            caption="People"
            columns={columns}
            rows={people.data.rows}
            rowKey={(person) => person.id}
            sort={sorted(sort)}
            onSort={(next) => filters.set({ sort: next })}
            storageKey="people"
            total={people.data.total}
            onMore={people.hasNextPage ? () => void people.fetchNextPage() : undefined}
            loadingMore={people.isFetchingNextPage}
          />
        ) : (
          <NothingFound what="people" onClear={filters.clear} />
        ))}
      {inviting && <InviteDialog onClose={() => setInviting(false)} />}
      {changing && <PersonDialog person={changing} self={changing.id === me} onClose={() => setChanging(null)} />}
    </>
  )
}

/** An address that breaks at its @ where the column is narrow. */
function Address({ email }: { email: string }) {
  const [name, host] = email.split('@')
  return (
    <>
      {name}@<wbr />
      {host}
    </>
  )
}
