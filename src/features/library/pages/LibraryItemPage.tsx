import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import { useNavigate, useParams } from 'react-router-dom'
import type { LibraryKind } from '@shared/library/library-rows.ts'
import { ownKindSchema } from '@shared/schemas/library.ts'
import type { LibraryItem } from '@shared/schemas/records.ts'
import { Button, ButtonLink } from '@/components/Button.tsx'
import { Dialog } from '@/components/Dialog.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { Breadcrumb, ErrorState, RecordError, Skeleton } from '@/components/states.tsx'
import { TitleBlock } from '@/components/TitleBlock.tsx'
import { say, sayProblem } from '@/components/toast.tsx'
import { useMay } from '@/hooks/session.ts'
import { useUnits } from '@/hooks/units.ts'
import { call } from '@/lib/api.ts'
import { query } from '@/lib/query.ts'
import { FillerSheets, SuitableSheet } from '../components/FillerAdviceSheets.tsx'
import { isKind } from '../components/LibraryNav.tsx'
import { NamedBySheet } from '../components/NamedBySheet.tsx'
import { BASIS_SENTENCE, BasisWord, factsOf, KIND_NAMES, Said } from '../columns.tsx'
import { NoSuchPart, Own } from './LibraryPage.tsx'

export function LibraryItemPage() {
  const { kind, id = '' } = useParams()
  return isKind(kind) ? <Item key={id} kind={kind} id={id} /> : <NoSuchPart />
}

function Item({ kind, id }: { kind: LibraryKind; id: string }) {
  const item = useQuery(query('readLibraryItem', { params: { kind, id } }))
  if (item.isPending) return <Skeleton label="Reading the library" />
  return (
    <>
      <Breadcrumb trail={[{ label: KIND_NAMES[kind].title, to: `/library/${kind}` }, { label: item.data?.title ?? 'Not there' }]} />
      {item.isError ? <RecordError title="The row can’t be shown" error={item.error} onRetry={() => void item.refetch()} /> : <Opened item={item.data} />}
    </>
  )
}

function Opened({ item }: { item: LibraryItem }) {
  const { system } = useUnits()
  const { kind, id } = item
  const { shown, more } = factsOf(item, system)
  const own = item.origin === 'own'
  const mayOwn = useMay('library.manage') && ownKindSchema.safeParse(kind).success
  const uses = useQuery(query('listLibraryUses', { params: { kind, id } }))
  const items = uses.data?.items ?? []
  const records = items.filter((one) => one.kind !== 'heat')
  const heats = items.filter((one) => one.kind === 'heat')
  const melted = kind === 'base-metals' || kind === 'filler-metals'
  const usedIn = uses.data && <NamedBySheet title="Used in" none="No procedure or coupon names it." items={records} />
  const mayRecord = useMay('heats.manage') && melted
  return (
    <article>
      <TitleBlock
        kind={KIND_NAMES[kind].kind}
        number={item.title}
        title={item.subtitle}
        cells={[
          { label: 'Row', children: own ? <Own /> : 'reference' },
          { label: 'Basis', children: <BasisWord basis={item.basis} /> },
          { label: 'Source', wide: true, children: item.source ?? 'not stated' },
        ]}
      />
      <div className="no-print mt-3 flex flex-wrap gap-2">
        {mayOwn && own && <ButtonLink to={`/library/${kind}/${id}/edit`}>Change it</ButtonLink>}
        {mayOwn && own && <Remove item={item} used={items.length > 0} />}
        {mayOwn && !own && <ButtonLink to={`/library/${kind}/new?from=${id}`}>Start our own from it</ButtonLink>}
        {mayRecord && <ButtonLink to={`/library/heats/new?of=${id}&kind=${kind}`}>{kind === 'base-metals' ? 'Record a heat' : 'Record a lot'}</ButtonLink>}
      </div>
      <div className="mt-4 grid items-start gap-4 lg:grid-cols-[minmax(0,1fr)_minmax(0,1fr)]">
        <div className="min-w-0 space-y-4">
          <Sheet title="What is listed">
            <dl className="px-4 py-1">
              {[...shown, ...more].map(({ label, value, basis }) => (
                <div key={label} className="grid grid-cols-[8.5rem_minmax(0,1fr)] gap-x-4 border-b border-hair py-2 last:border-b-0 sm:grid-cols-[9.5rem_minmax(0,1fr)_auto]">
                  <dt className="text-soft">{label}</dt>
                  <dd className="font-medium break-words">
                    <Said value={value} />
                  </dd>
                  <dd className="text-sm max-sm:col-start-2">{value !== null && value !== '' && <BasisWord basis={basis ?? item.basis} />}</dd>
                </div>
              ))}
            </dl>
            <p className="border-t border-hair px-4 py-3 text-sm text-soft">{BASIS_SENTENCE[item.basis ?? ''] ?? 'The basis is not stated.'} What is not listed is not known here; it is never taken as nothing required.</p>
          </Sheet>
          {uses.isError && <ErrorState compact error={uses.error} onRetry={() => void uses.refetch()} />}
          {melted && usedIn}
          {uses.data && melted && <NamedBySheet title={kind === 'base-metals' ? 'Heats' : 'Lots'} none={`No ${kind === 'base-metals' ? 'heat' : 'lot'} of it is recorded.`} items={heats} />}
        </div>
        <div className="min-w-0 space-y-4">
          {!melted && usedIn}
          {kind === 'base-metals' && <SuitableSheet item={item} />}
          {kind === 'filler-metals' && <FillerSheets item={item} />}
        </div>
      </div>
    </article>
  )
}

function Remove({ item, used }: { item: LibraryItem; used: boolean }) {
  const client = useQueryClient()
  const navigate = useNavigate()
  const [asking, setAsking] = useState(false)
  const kind = ownKindSchema.safeParse(item.kind).data ?? 'base-metals'
  const remove = useMutation({
    mutationFn: () => call('removeLibraryItem', { params: { kind, id: item.id }, ifMatch: item.version }),
    onSuccess: () => {
      say(`${item.title} was removed`)
      void client.invalidateQueries({ queryKey: ['listLibrary'] })
      void client.invalidateQueries({ queryKey: ['combo'] })
      void navigate(`/library/${kind}`)
    },
    onError: sayProblem,
  })
  if (used) return <p className="self-center text-soft">It stays while something names it.</p>
  return (
    <>
      <Button onClick={() => setAsking(true)}>Remove it</Button>
      {asking && (
        <Dialog
          title={`Remove ${item.title}?`}
          isOpen
          onClose={() => setAsking(false)}
          footer={
            <>
              <Button onClick={() => setAsking(false)}>Keep it</Button>
              <Button kind="danger" pending={remove.isPending} onClick={() => remove.mutate()}>
                Remove
              </Button>
            </>
          }
        >
          <p>The row leaves your library. No procedure, coupon, heat or lot names it.</p>
        </Dialog>
      )}
    </>
  )
}
