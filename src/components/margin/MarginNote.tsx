import { Link } from 'react-router-dom'
import type { Finding, Fix } from '@shared/schemas/assessment.ts'
import { askedInWords, boundsInWords } from '../range-gauge/words.ts'
import { BASIS_SENTENCE as BASIS, rulePath } from '../standards/words.ts'
import { CLASS_WORD, VERDICT_WORD, VerdictMark } from '../Verdict.tsx'

const LOOK = { outside: 'border-l-oxide bg-oxide-bg', 'cannot-tell': 'border-l-straw bg-straw-bg', within: 'border-l-jade bg-sheet' } as const

/** What the procedure asks, as the rule read it. */
function askedOf({ asked, range }: Finding): string | null {
  if (asked === null) return null
  if (Array.isArray(asked)) return asked.length > 0 ? asked.join(', ') : null
  return askedInWords(asked, range?.type === 'numeric' ? range.unit : '')
}

/** What the coupons had, as the rule read it. */
function testedOf({ tested, range }: Finding): string | null {
  const unit = range?.type === 'numeric' ? range.unit : ''
  return tested.length > 0 ? [...new Set(tested.map((one) => (typeof one === 'number' ? askedInWords({ min: one, max: one }, unit) : one)))].join(', ') : null
}

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
  const { verdict, class: kind, clause, sentence, basis, fixes, missing, range, reasoning, couponIds, source, edition } = finding
  const bounds = range ? boundsInWords(range) : null
  const coupons = couponIds.map((id) => couponNumber?.(id)).filter((number) => number !== undefined)
  const asked = askedOf(finding)
  const tested = testedOf(finding)
  const rule = rulePath(finding.standard, finding.ruleId)
  const counts = kind === 'essential' || kind === 'supplementary'
  const reached = (
    <div className="mt-1 space-y-1 text-xs leading-[1.125rem]">
      {asked && <p>Asked: {asked}.</p>}
      {tested && <p>Welded: {tested}.</p>}
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
      {rule && (
        <p>
          <Link to={rule} className="text-link">
            The rule: {clause}
          </Link>{' '}
          <span className="text-soft">edition {edition}</span>
        </p>
      )}
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
        <p className="font-narrow text-[0.875rem] leading-[1.125rem] font-medium whitespace-nowrap text-soft">
          {rule ? (
            <Link to={rule} className="underline decoration-dotted underline-offset-[3px] hover:decoration-solid" aria-label={`${clause}, the rule`}>
              {clause}
            </Link>
          ) : (
            clause
          )}
        </p>
      </header>
      <p className="mt-0.5 text-pretty">{sentence}</p>
      {verdict === 'cannot-tell' && missing.length > 0 && <p className="mt-1">Missing: {missing.join('; ')}.</p>}
      {basis === 'memory' && <p className="mt-1 text-xs text-soft">{BASIS.memory}</p>}
      {onFix && fixes.length > 0 && (
        <p className="no-print mt-1 flex flex-wrap gap-x-3">
          {fixes.map((fix) => (
            <button key={`${fix.kind} ${'field' in fix ? fix.field : ''} ${fix.label}`} type="button" className="min-h-6 text-left font-semibold underline decoration-1 underline-offset-[3px] hover:decoration-2" onClick={() => onFix(fix, finding)}>
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
