import type { Assessment, Verdict, VariableClass } from '@shared/schemas/assessment.ts'

export const VERDICT_WORD: Record<Verdict, string> = { within: 'Within', outside: 'Outside', 'cannot-tell': 'Cannot tell' }
export const CLASS_WORD: Record<VariableClass, string> = { essential: 'essential', supplementary: 'supplementary essential', nonessential: 'nonessential', 'not-a-variable': 'not a variable' }
const TEXT: Record<Verdict, string> = { within: 'text-jade', outside: 'text-oxide', 'cannot-tell': 'text-straw-deep' }
const FILL: Record<Verdict, string> = { within: 'fill-jade', outside: 'fill-oxide', 'cannot-tell': 'fill-straw' }

/** The worse of two verdicts: outside, then cannot tell, then within. */
const RANK: Record<Verdict, number> = { outside: 2, 'cannot-tell': 1, within: 0 }
export const worstVerdict = (verdicts: readonly Verdict[]): Verdict | null => verdicts.reduce<Verdict | null>((worst, one) => (worst === null || RANK[one] > RANK[worst] ? one : worst), null)

/** Square within, diamond outside, disc cannot tell. Decorative unless `label` is given. */
export function VerdictMark({ verdict, label, className = 'size-2.5' }: { verdict: Verdict; label?: string; className?: string }) {
  return (
    <svg viewBox="0 0 10 10" className={`inline-block shrink-0 ${FILL[verdict]} ${className}`} role={label ? 'img' : undefined} aria-label={label} aria-hidden={label ? undefined : true}>
      {verdict === 'within' && <rect x="1" y="1" width="8" height="8" />}
      {verdict === 'outside' && <path d="M5 0 10 5 5 10 0 5Z" />}
      {verdict === 'cannot-tell' && <circle cx="5" cy="5" r="4.4" />}
    </svg>
  )
}

/** How many findings stand outside, cannot be told, stand within; worst first. */
export function VerdictTally({ counts }: { counts: Assessment['counts'] }) {
  const parts: [Verdict, number, string][] = [
    ['outside', counts.outside, 'outside'],
    ['cannot-tell', counts.cannotTell, 'cannot tell'],
    ['within', counts.within, 'within'],
  ]
  return (
    <p className="flex flex-wrap gap-x-4 gap-y-1 font-narrow text-[1rem] leading-5 font-semibold" role="status" aria-label={parts.map(([, count, word]) => `${count} ${word}`).join(', ')}>
      {parts.map(([verdict, count, word]) => (
        <span key={verdict} className={`inline-flex items-center gap-1.5 ${count === 0 ? 'text-soft' : TEXT[verdict]}`}>
          <VerdictMark verdict={verdict} className={`size-2.5 ${count === 0 ? 'opacity-35' : ''}`} />
          {count} {word}
        </span>
      ))}
    </p>
  )
}

/** A verdict as shape and coloured word, for tables and summaries. */
export function VerdictWord({ verdict }: { verdict: Verdict }) {
  return (
    <span className={`inline-flex items-center gap-1.5 font-semibold ${TEXT[verdict]}`}>
      <VerdictMark verdict={verdict} />
      {VERDICT_WORD[verdict]}
    </span>
  )
}
