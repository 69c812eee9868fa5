import { useQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import { ErrorState, PageHead, Skeleton } from '@/components/states.tsx'
import { query } from '@/lib/query.ts'
import { Bases } from '../components/Bases.tsx'

/** The standards that records are judged by here. */
export function StandardsPage() {
  const standards = useQuery({ ...query('listStandards'), staleTime: Infinity })
  return (
    <>
      <PageHead title="Standards">What the program checks, rule by rule: clause, class for each process, how each figure is known, and what is left to you.</PageHead>
      {standards.isPending && <Skeleton label="Reading the standards" rows={5} />}
      {standards.isError && <ErrorState error={standards.error} onRetry={() => void standards.refetch()} />}
      {standards.data && (
        <ul className="border border-rule bg-sheet">
          {standards.data.items.map(({ id, name, shortName, editions, processes, routes, rules, bases }) => (
            <li key={id} className="sheet-row grid gap-x-6 gap-y-1 border-b border-hair px-4 py-3.5 last:border-b-0 md:grid-cols-[minmax(0,2fr)_minmax(0,1fr)_minmax(0,1.4fr)]">
              <div>
                <Link to={`/standards/${id}`} className="text-link font-narrow text-xl font-semibold">
                  {shortName}
                </Link>
                <p>{name}</p>
              </div>
              <div>
                <p className="cell-label">Editions</p>
                <p>{editions.map(({ label }) => label).join(', ')}</p>
                <p className="text-sm text-soft">
                  {processes.join(', ')}
                  {routes.includes('prequalified') && '; by test or prequalified'}
                </p>
              </div>
              <div>
                <p className="cell-label">{rules} rules</p>
                <Bases bases={bases} />
              </div>
            </li>
          ))}
        </ul>
      )}
    </>
  )
}
