import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import { useFilters } from '@/hooks/filters.ts'
import { useTitle } from '@/hooks/title.ts'
import { useRemembered } from '@/hooks/remembered.ts'
import { useUnits } from '@/hooks/units.ts'
import { query } from '@/lib/query.ts'
import { ErrorState, Skeleton } from '@/components/states.tsx'
import { ByJob } from '../components/ByJob.tsx'
import { ByLine } from '../components/ByLine.tsx'
import { ByParts } from '../components/ByParts.tsx'
import { Results } from '../components/Results.tsx'
import { asked, isAsked, KEYS, type Asked } from '../question.ts'

const WAYS = [
  ['line', 'In one line'],
  ['parts', 'Piece by piece'],
  ['job', 'From a job'],
] as const
type Way = (typeof WAYS)[number][0]

const isRemembered = (value: unknown): value is Asked => typeof value === 'object' && value !== null && Object.values(value).every((part) => typeof part === 'string')

/** Which approved procedure fits a joint: asked in a line, piece by piece, or as a joint of a job. */
export function LookUpPage() {
  useTitle('Look up a procedure')
  const { system } = useUnits()
  const filters = useFilters(KEYS)
  const [last, remember] = useRemembered<Asked>('lookup', {}, isRemembered)
  const inAddress = asked(filters.values)
  const given = isAsked(inAddress)
  const [way, setWay] = useState<Way>(inAddress.jointId ? 'job' : given && !inAddress.line ? 'parts' : 'line')
  const ask = (next: Asked) => {
    remember(next)
    filters.set({ ...Object.fromEntries(KEYS.map((key) => [key, ''])), ...next })
  }
  const found = useQuery({ ...query('lookUp', { query: { ...inAddress, unitSystem: system } }), enabled: given, placeholderData: (before) => before })
  const shown = given ? inAddress : last
  return (
    <div className="shop mx-auto max-w-3xl">
      <h1 className="font-narrow text-3xl font-semibold">Which procedure fits the joint?</h1>
      <div role="group" aria-label="How to ask" className="mt-3 grid grid-cols-3 border border-ink">
        {WAYS.map(([id, label]) => (
          <button key={id} type="button" aria-pressed={way === id} onClick={() => setWay(id)} className={`min-h-12 border-l border-ink px-2 font-medium first:border-l-0 ${way === id ? 'bg-ink text-paper' : 'bg-sheet hover:bg-paper'}`}>
            {label}
          </button>
        ))}
      </div>
      <div className="border border-t-0 border-ink bg-sheet px-4 py-4">
        {way === 'line' && <ByLine key={shown.line ?? ''} line={shown.line ?? ''} onAsk={(line) => ask({ line })} />}
        {way === 'parts' && <ByParts key={JSON.stringify(shown)} given={shown} onAsk={ask} />}
        {way === 'job' && <ByJob jointId={shown.jointId ?? ''} onAsk={(jointId) => ask({ jointId })} />}
      </div>
      <div className="mt-5" aria-live="polite" aria-busy={found.isFetching}>
        {!given && <Nothing last={last} onAgain={() => ask(last)} onTry={(line) => { setWay('line'); ask({ line }) }} />}
        {given && found.isPending && <Skeleton label="Looking" rows={3} />}
        {given && found.isError && !found.data && <ErrorState error={found.error} onRetry={() => void found.refetch()} />}
        {given && found.data && <Results result={found.data} jointId={inAddress.jointId} />}
      </div>
    </div>
  )
}

const EXAMPLES = ['12 mm A516-70 to A516-70 SMAW 3G', '6061-T6 1/4 in GMAW 1G', '304L pipe 2 in sch 40 GTAW 6G', 'PF 135 S355 t10']

function Nothing({ last, onAgain, onTry }: { last: Asked; onAgain: () => void; onTry: (line: string) => void }) {
  return (
    <section aria-label="Worked examples" className="border border-rule bg-sheet px-4 py-4">
      {isAsked(last) && (
        <p className="mb-4">
          <button type="button" onClick={onAgain} className="min-h-12 w-full border border-ink px-4 text-left font-medium hover:bg-paper">
            Ask again: <span className="font-semibold">{last.line ?? (last.jointId ? 'the joint last picked' : [last.thickness, last.metalA, last.metalB && `to ${last.metalB}`, last.process, last.position].filter(Boolean).join(' '))}</span>
          </button>
        </p>
      )}
      <p className="text-soft">Write the joint as you would say it: thickness, metal to metal, process, position. Approved procedures that cover it are listed, best first, each with the reason; those that miss by little say what they want.</p>
      <ul className="mt-3">
        {EXAMPLES.map((line) => (
          <li key={line} className="border-t border-hair first:border-t-0">
            <button type="button" className="min-h-12 w-full text-left font-medium hover:underline" onClick={() => onTry(line)}>
              {line}
            </button>
          </li>
        ))}
      </ul>
    </section>
  )
}
