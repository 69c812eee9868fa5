import { useQuery } from '@tanstack/react-query'
import { ArrowLeft } from 'lucide-react'
import { Link, useParams, useSearchParams } from 'react-router-dom'
import { idSchema } from '@shared/schemas/common.ts'
import { ErrorState, Skeleton } from '@/components/states.tsx'
import { useTitle } from '@/hooks/title.ts'
import { useUnits } from '@/hooks/units.ts'
import { query } from '@/lib/query.ts'
import { ShopCard } from '../components/ShopCard.tsx'

const CLOCK = new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit' })

/** The shop view: one procedure, by night, for one hand. */
export function ShopPage() {
  const { revisionId = '' } = useParams()
  const jointId = idSchema.safeParse(useSearchParams()[0].get('joint')).data
  const { system } = useUnits()
  const revision = useQuery(query('readRevision', { params: { id: revisionId } }))
  const found = useQuery({ ...query('lookUp', { query: { jointId, unitSystem: system } }), enabled: jointId !== undefined })
  const dead = revision.data !== undefined && revision.data.state !== 'approved'
  const procedure = useQuery({ ...query('readProcedure', { params: { id: revision.data?.procedureId ?? '' } }), enabled: dead })
  const inForce = procedure.data?.revisions.find(({ state }) => state === 'approved') ?? null
  const joint = found.data?.read.find(({ label }) => label === 'Joint')?.value
  useTitle(revision.data ? `${revision.data.number} ${revision.data.revision}, shop view` : 'Shop view')
  return (
    <main className="night shop min-h-dvh">
      <div className="mx-auto max-w-md">
        <nav aria-label="Back" className="no-print flex justify-between px-3 pt-1">
          <Link to={jointId ? `/look-up?jointId=${jointId}` : '/look-up'} className="inline-flex min-h-12 items-center gap-2 px-2 text-soft hover:text-ink">
            <ArrowLeft size={20} aria-hidden="true" />
            Look up
          </Link>
          <Link to={`/revisions/${revisionId}`} className="inline-flex min-h-12 items-center px-2 text-soft hover:text-ink">
            Whole procedure
          </Link>
        </nav>
        {revision.isPending && <Skeleton label="Reading the procedure" rows={8} />}
        {revision.isError && !revision.data && (
          <div className="p-4">
            <h1 className="sr-only">Shop view</h1>
            <ErrorState error={revision.error} onRetry={() => void revision.refetch()} />
          </div>
        )}
        {revision.data && <ShopCard key={revision.data.id} revision={revision.data} system={system} joint={joint} fitsJoint={found.data ? found.data.fits.some(({ revisionId: id }) => id === revisionId) : null} inForce={inForce} readAt={CLOCK.format(revision.dataUpdatedAt)} />}
      </div>
    </main>
  )
}
