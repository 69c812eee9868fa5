import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import { Link } from 'react-router-dom'
import { Button } from '@/components/Button.tsx'
import { ErrorState, Skeleton } from '@/components/states.tsx'
import { VerdictMark } from '@/components/Verdict.tsx'
import { useUnits } from '@/hooks/units.ts'
import { query } from '@/lib/query.ts'
import type { JointRow } from '../joint-grid.ts'

interface FindProceduresProps {
  joint: JointRow
  saved: boolean
  /** Absent for people who may not assign. */
  onAssign?: ((procedure: { revisionId: string; name: string } | null) => Promise<void>) | undefined
}

/** The approved procedures that cover one joint, under its row, to be assigned; and those that miss by little. */
export function FindProcedures({ joint, saved, onAssign }: FindProceduresProps) {
  const { system } = useUnits()
  const [pending, setPending] = useState<string | null>(null)
  const asked = saved && joint.id !== null
  const found = useQuery({ ...query('lookUp', { query: { jointId: joint.id ?? undefined, unitSystem: system } }), enabled: asked })
  const assign = async (procedure: { revisionId: string; name: string } | null) => {
    if (!onAssign || pending) return
    setPending(procedure?.revisionId ?? 'none')
    // What went wrong is told above the joints.
    await onAssign(procedure).catch(() => undefined)
    setPending(null)
  }
  return (
    <section aria-label={`Procedures for joint ${joint.number}`} className="mx-4 mt-3 mb-1 border-l-2 border-ink pl-4">
      {!asked && <p className="py-1 text-straw-deep">Save the joints first; then what covers this one is found from what is saved.</p>}
      {asked && found.isPending && <Skeleton label="Looking" rows={2} />}
      {asked && found.isError && <ErrorState compact error={found.error} onRetry={() => void found.refetch()} />}
      {asked && found.data && (
        <>
          {found.data.fits.length === 0 && <p className="py-1 font-medium">No approved procedure covers this joint.</p>}
          <ul>
            {found.data.fits.map(({ revisionId, number, revision, title, reasons }) => (
              <li key={revisionId} className="flex flex-wrap items-start justify-between gap-x-4 gap-y-1 border-b border-hair py-2 last:border-b-0">
                <div className="min-w-0 grow basis-72">
                  <p>
                    <VerdictMark verdict="within" label="Fits" className="mr-2 size-2.5" />
                    <Link to={`/revisions/${revisionId}`} className="font-semibold underline decoration-1 underline-offset-[3px]">
                      {number} rev {revision}
                    </Link>{' '}
                    {title}
                  </p>
                  <p className="text-sm text-soft">{reasons.join(' · ')}</p>
                </div>
                {joint.revisionId === revisionId ? (
                  <p className="flex items-center gap-2 font-medium text-jade">
                    Assigned
                    {onAssign && (
                      <Button kind="quiet" pending={pending === 'none'} onClick={() => void assign(null)}>
                        Take back
                      </Button>
                    )}
                  </p>
                ) : (
                  onAssign && (
                    <Button pending={pending === revisionId} aria-label={`Assign ${number} rev ${revision} to joint ${joint.number}`} onClick={() => void assign({ revisionId, name: `${number} rev ${revision}` })}>
                      Assign
                    </Button>
                  )
                )}
              </li>
            ))}
          </ul>
          {found.data.near.length > 0 && (
            <details className="py-1 text-sm" open={found.data.fits.length === 0}>
              <summary className="w-fit cursor-pointer text-soft underline decoration-dotted underline-offset-2">{found.data.near.length === 1 ? 'One misses' : `${found.data.near.length} miss`} by little</summary>
              <ul className="mt-1 space-y-1">
                {found.data.near.map(({ revisionId, number, revision, wants }) => (
                  <li key={revisionId}>
                    <VerdictMark verdict="outside" label="Does not fit" className="mr-2 size-2.5" />
                    <Link to={`/revisions/${revisionId}`} className="font-medium underline decoration-1 underline-offset-[3px]">
                      {number} rev {revision}
                    </Link>{' '}
                    <span className="text-oxide">{wants.join(' ')}</span>
                  </li>
                ))}
              </ul>
            </details>
          )}
        </>
      )}
    </section>
  )
}
