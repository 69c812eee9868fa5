import { Link } from 'react-router-dom'
import type { ProcedureRecord } from '@shared/schemas/records.ts'
import { Stamp } from '@/components/Stamp.tsx'

/** The procedure's other revisions, newest first. */
export function RevisionTrail({ revisions, current }: { revisions: ProcedureRecord['revisions']; current: string }) {
  if (revisions.length < 2) return null
  const sorted = [...revisions].sort((a, b) => b.createdAt.localeCompare(a.createdAt))
  return (
    <nav aria-label="Revisions" className="no-print">
      <ul className="flex flex-wrap gap-x-3 gap-y-1 text-sm">
        {sorted.map(({ id, revision, state }) => (
          <li key={id} className="flex items-center gap-1.5">
            {id === current ? (
              <span aria-current="page" className="font-semibold">
                rev {revision}
              </span>
            ) : (
              <Link to={`/revisions/${id}`} className="text-link">
                rev {revision}
              </Link>
            )}
            <Stamp small state={state} />
          </li>
        ))}
      </ul>
    </nav>
  )
}
