import type { Basis, Finding, Fix } from '@shared/schemas/assessment.ts'
import { boundsInWords } from '../range-gauge/words.ts'
import { CLASS_WORD, VERDICT_WORD, VerdictMark } from '../Verdict.tsx'

const BASIS: Record<Basis, string> = {
  read: 'Read in the standard.',
  secondary: 'From a secondary source: check it in your edition.',
  memory: 'From memory: confirm in your edition.',
  'common-practice': 'Common practice, not a rule of the standard.',
}
const LOOK = { outside: 'border-l-oxide bg-oxide-bg', 'cannot-tell': 'border-l-straw bg-straw-bg', within: 'border-l-jade bg-sheet' } as const

export interface MarginNoteProps {
  finding: Finding
  /** Offered fixes become buttons when given; the page knows what each kind does. */
  onFix?: (fix: Fix, finding: Finding) => void
  /** A coupon's number from its id, for the opened reasoning. */
  couponNumber?: (id: string) => string | undefined
}

/**
 * One verdict, as an engineer would red-line a drawing: the word first, the class, a sentence with the figures, the clause,
 * the fixes, and behind a fold how it was reached. What stands within takes one line, and opens to the rest.
 */
export function MarginNote({ finding, onFix, couponNumber }: MarginNoteProps) {
  const { verdict, class: kind, clause, sentence, basis, fixes, missing, range, reasoning, couponIds, source } = finding
  const bounds = range ? boundsInWords(range) : null
  const coupons = couponIds.map((id) => couponNumber?.(id)).filter((number) => number !== undefined)
  const counts = kind === 'essential' || kind === 'supplementary'
  const reached = (
    <div className="mt-1 space-y-1 text-xs leading-[1.125rem]">
      {bounds && <p>Covered: {bounds}.</p>}
      {coupons.length > 0 && <p>Decided by {coupons.join(', ')}.</p>}
      {reasoning.length > 0 && (
        <ol className="list-decimal space-y-0.5 pl-4">
          {reasoning.map((step) => (
            <li key={step}>{step}</li>
          ))}
        </ol>
      )}
      <p className="text-soft">
        {source ? `${source}. ` : ''}
        {BASIS[basis]}
      </p>
    </div>
  )
  if (verdict === 'within') {
    return (
      <article className={`margin-note border-l-[3px] px-3 py-1.5 text-sm ${LOOK.within}`} aria-label={`${VERDICT_WORD.within}: ${finding.title}`}>
        <details>
          <summary className="flex cursor-pointer list-none items-start justify-between gap-3 [&::-webkit-details-marker]:hidden">
            <span className="text-pretty">
              <VerdictMark verdict="within" className="mr-1.5 size-2.5 align-[-0.5px]" />
              <strong className="font-semibold">{VERDICT_WORD.within}</strong> <span aria-hidden="true">·</span> {sentence}
              {basis === 'memory' && counts && <span className="block text-xs text-soft">{BASIS.memory}</span>}
            </span>
            <span className="font-narrow text-[0.875rem] leading-[1.125rem] font-medium whitespace-nowrap text-soft underline decoration-dotted underline-offset-[3px]">{clause}</span>
          </summary>
          <p className="mt-1 text-xs text-soft first-letter:uppercase">{CLASS_WORD[kind]}</p>
          {reached}
        </details>
      </article>
    )
  }
  return (
    <article className={`margin-note border-l-[3px] px-3 py-2 text-sm ${LOOK[verdict]}`} aria-label={`${VERDICT_WORD[verdict]}: ${finding.title}`}>
      <header className="flex items-start justify-between gap-3">
        <p className="font-semibold">
          <VerdictMark verdict={verdict} className="mr-1.5 size-2.5 align-[-0.5px]" />
          {VERDICT_WORD[verdict]} <span aria-hidden="true">·</span> {CLASS_WORD[kind]}
        </p>
        <p className="font-narrow text-[0.875rem] leading-[1.125rem] font-medium whitespace-nowrap text-soft">{clause}</p>
      </header>
      <p className="mt-0.5 text-pretty">{sentence}</p>
      {verdict === 'cannot-tell' && missing.length > 0 && <p className="mt-1">Missing: {missing.join('; ')}.</p>}
      {basis === 'memory' && <p className="mt-1 text-xs text-soft">{BASIS.memory}</p>}
      {onFix && fixes.length > 0 && (
        <p className="no-print mt-1 flex flex-wrap gap-x-3">
          {fixes.map((fix) => (
            <button key={`${fix.kind} ${fix.label}`} type="button" className="min-h-6 font-semibold underline decoration-1 underline-offset-[3px] hover:decoration-2" onClick={() => onFix(fix, finding)}>
              {fix.label}
            </button>
          ))}
        </p>
      )}
      <details className="mt-0.5">
        <summary className="w-fit cursor-pointer py-1 text-xs text-soft underline decoration-dotted underline-offset-2">How this was reached</summary>
        {reached}
      </details>
    </article>
  )
}
