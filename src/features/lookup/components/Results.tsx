import { ChevronRight } from 'lucide-react'
import { Link } from 'react-router-dom'
import type { LookupResult } from '@shared/schemas/records.ts'
import { VerdictMark } from '@/components/Verdict.tsx'
import { Read } from './Read.tsx'

/** How the question was read, the procedures that fit, best first, and those that miss by little with what they want. */
export function Results({ result: { read, notRead, fits, near }, jointId }: { result: LookupResult; jointId?: string | undefined }) {
  const shop = (revisionId: string) => `/shop/${revisionId}${jointId ? `?joint=${jointId}` : ''}`
  return (
    <div className="space-y-5">
      <Read read={read} notRead={notRead} />
      <section aria-label="Procedures that fit">
        <h2 className="flex items-baseline gap-2 font-narrow text-2xl font-semibold">
          {fits.length === 0 ? 'No approved procedure fits' : fits.length === 1 ? 'One procedure fits' : `${fits.length} procedures fit`}
        </h2>
        {fits.length === 0 && <p className="mt-1 text-pretty text-soft">{near.length > 0 ? 'Those below miss by little; each says what it wants. Otherwise an engineer has to write one.' : 'Ask for less, e.g. leave out the position, to see what comes near; or ask an engineer to write one.'}</p>}
        {fits.length > 0 && (
          <ul className="mt-2 border border-ink bg-sheet">
            {fits.map(({ revisionId, number, revision, title, processes, reasons }, index) => (
              <li key={revisionId} className="border-b border-rule last:border-b-0">
                <Link to={shop(revisionId)} className="flex items-center gap-3 px-4 py-3 hover:bg-paper">
                  <VerdictMark verdict="within" label="Fits" className="size-3 self-start mt-3" />
                  <span className="min-w-0 grow">
                    <span className="flex flex-wrap items-baseline gap-x-2.5">
                      <span className="font-narrow text-3xl font-semibold">{number}</span>
                      <span className="font-narrow text-xl font-medium text-soft">rev {revision}</span>
                      <span className="font-medium">{processes.join(' + ')}</span>
                      {index === 0 && fits.length > 1 && <span className="font-narrow font-semibold tracking-wide text-jade uppercase">closest</span>}
                    </span>
                    <span className="block font-medium">{title}</span>
                    <span className="mt-1 block text-base text-pretty text-soft">{reasons.join(' · ')}</span>
                  </span>
                  <ChevronRight size={24} aria-hidden="true" className="shrink-0 text-soft" />
                </Link>
              </li>
            ))}
          </ul>
        )}
      </section>
      {near.length > 0 && (
        <section aria-label="Near misses">
          <h2 className="font-narrow text-xl font-semibold">Near, but not for this joint</h2>
          <ul className="mt-2 border border-rule bg-sheet">
            {near.map(({ revisionId, number, revision, title, wants }) => (
              <li key={revisionId} className="flex gap-3 border-b border-hair px-4 py-3 last:border-b-0">
                <VerdictMark verdict="outside" label="Does not fit" className="mt-1.5 size-3" />
                <div className="min-w-0">
                  <p>
                    <Link to={`/revisions/${revisionId}`} className="font-semibold underline decoration-1 underline-offset-4">
                      {number} rev {revision}
                    </Link>{' '}
                    <span className="text-soft">{title}</span>
                  </p>
                  {wants.map((want) => (
                    <p key={want} className="text-oxide">
                      {want}
                    </p>
                  ))}
                </div>
              </li>
            ))}
          </ul>
        </section>
      )}
    </div>
  )
}
