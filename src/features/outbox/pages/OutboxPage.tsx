import { useInfiniteQuery } from '@tanstack/react-query'
import type { OutboxRow } from '@shared/schemas/records.ts'
import { DataTable, type Column } from '@/components/DataTable.tsx'
import { FilterBar } from '@/components/FilterBar.tsx'
import { Stamp } from '@/components/Stamp.tsx'
import { EmptyState, ErrorState, NothingFound, PageHead, Skeleton } from '@/components/states.tsx'
import { useFilters } from '@/hooks/filters.ts'
import { useSession } from '@/hooks/session.ts'
import { moment } from '@/lib/figures.ts'
import { listQuery } from '@/lib/query.ts'

const COLUMNS: Column<OutboxRow>[] = [
  { id: 'subject', header: 'Subject', cell: (mail) => mail.subject },
  { id: 'to', header: 'To', cell: (mail) => <span className="break-words">{mail.to.join(', ')}</span> },
  { id: 'state', header: 'State', cell: (mail) => <Stamp state={mail.state} small /> },
  { id: 'attachments', header: 'Attached', cell: (mail) => (mail.attachments.length > 0 ? mail.attachments.map(({ name }) => name).join(', ') : '–') },
  { id: 'createdAt', header: 'Written', cell: (mail) => moment(mail.createdAt), align: 'right', className: 'whitespace-nowrap' },
  { id: 'attempts', header: 'Tries', cell: (mail) => mail.attempts, align: 'right', hidden: true },
]

export function OutboxPage() {
  const { mailIsCaught } = useSession()
  const filters = useFilters(['q'])
  const mails = useInfiniteQuery(listQuery('listOutbox', { query: { q: filters.values.q || undefined } }))
  return (
    <>
      <PageHead title="Outbox">
        {mailIsCaught ? 'This installation has no mail server: every mail is caught here and can be read, links and attachments included.' : 'Every mail that the program sent or will send, newest first.'}
      </PageHead>
      <FilterBar label="Find an e-mail" search={filters.values.q} onSearch={(q) => filters.set({ q })} onClear={filters.any ? filters.clear : undefined} />
      {mails.isPending && <Skeleton label="Reading the outbox" />}
      {mails.isError && <ErrorState error={mails.error} onRetry={() => void mails.refetch()} />}
      {mails.data &&
        (mails.data.rows.length > 0 ? (
          <DataTable
            caption="Outbox"
            columns={COLUMNS}
            rows={mails.data.rows}
            rowKey={(mail) => mail.id}
            rowHref={(mail) => `/outbox/${mail.id}`}
            storageKey="outbox"
            total={mails.data.total}
            onMore={mails.hasNextPage ? () => void mails.fetchNextPage() : undefined}
            loadingMore={mails.isFetchingNextPage}
          />
        ) : filters.any ? (
          <NothingFound what="mails" onClear={filters.clear} />
        ) : (
          <EmptyState title="Nothing has been sent">
            <p>Invitations, password links and signed procedures leave from here. Each mail stays readable with what was attached to it, so that you can show what was sent to whom and when.</p>
          </EmptyState>
        ))}
    </>
  )
}
