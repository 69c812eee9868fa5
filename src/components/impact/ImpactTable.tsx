import { Link } from 'react-router-dom'
import type { ImpactChange, RevisionImpact, Standing } from '@shared/schemas/standards.ts'
import { BASIS_WORD, rulePath } from '../standards/words.ts'
import { VerdictMark } from '../Verdict.tsx'

const CLASS_WORD: Record<ImpactChange['class'], string> = { essential: 'essential', supplementary: 'supplementary essential', nonessential: 'nonessential', editorial: 'editorial' }
const STANDING_WORD: Record<Standing, string> = { requalify: 'Requalify', 'cannot tell': 'Cannot tell', 'still covered': 'Still covered', 'revise only': 'Revise only' }
const STANDING_VERDICT = { requalify: 'outside', 'cannot tell': 'cannot-tell', 'still covered': 'within', 'revise only': null } as const
const STANDING_TEXT: Record<Standing, string> = { requalify: 'text-oxide', 'cannot tell': 'text-straw-deep', 'still covered': 'text-jade', 'revise only': 'text-soft' }
const ORDER: readonly Standing[] = ['requalify', 'cannot tell', 'still covered', 'revise only']
const WASH: Record<Standing, string> = { requalify: 'wash-outside', 'cannot tell': 'wash-cannot-tell', 'still covered': '', 'revise only': '' }

/** A standing as shape and coloured word. */
export function StandingWord({ standing }: { standing: Standing }) {
  const verdict = STANDING_VERDICT[standing]
  return (
    <span className={`inline-flex items-center gap-1.5 font-semibold ${STANDING_TEXT[standing]}`}>
      {verdict && <VerdictMark verdict={verdict} />}
      {STANDING_WORD[standing]}
    </span>
  )
}

/**
 * What a revision means under one standard: the word first, then each change with its class, whether the coupons still cover it,
 * and the coupon that would have to be welded where they don't. What needs something stands first.
 */
export function ImpactTable({ impact, name }: { impact: RevisionImpact; /** The standard, as the page calls it. */ name: string }) {
  const { overall, changes, standard } = impact
  const sorted = [...changes].sort((a, b) => ORDER.indexOf(a.standing) - ORDER.indexOf(b.standing))
  const counts = (['essential', 'supplementary', 'nonessential', 'editorial'] as const).filter((kind) => overall.counts[kind] > 0)
  return (
    <section aria-label={`What the changes mean under ${name}`}>
      <div className="border-b border-hair px-4 py-3">
        <p className="font-narrow text-lg font-semibold">
          {name} {impact.edition}
        </p>
        <p className="max-w-prose text-pretty">
          {overall.standing && <StandingWord standing={overall.standing} />} {overall.sentence}
        </p>
        {counts.length > 0 && <p className="text-sm text-soft">{counts.map((kind) => `${overall.counts[kind]} ${CLASS_WORD[kind]}`).join(', ')}</p>}
      </div>
      <ul>
        {sorted.map((change) => (
          <ChangeRow key={`${change.field} ${change.label}`} change={change} standard={standard} />
        ))}
      </ul>
    </section>
  )
}

function ChangeRow({ change, standard }: { change: ImpactChange; standard: string }) {
  const { label, before, after, class: kind, clause, basis, standing, sentence, wanted, ruleIds } = change
  const to = ruleIds[0] ? rulePath(standard, ruleIds[0]) : null
  return (
    <li className={`sheet-row border-b border-hair px-4 py-2.5 last:border-b-0 ${WASH[standing]}`}>
      <div className="grid gap-x-4 gap-y-0.5 sm:grid-cols-[12rem_minmax(0,1fr)_minmax(0,1fr)]">
        <p className="font-medium break-words">{label}</p>
        <p className="min-w-0 break-words text-soft">
          <span className="sr-only">before: </span>
          {before === null ? 'not stated' : <del className="decoration-oxide">{before}</del>}
        </p>
        <p className="min-w-0 font-medium break-words">
          <span className="sr-only">now: </span>
          {after ?? 'not stated'}
        </p>
      </div>
      <div className="mt-1 sm:pl-[13rem]">
        <p>
          <StandingWord standing={standing} /> <span aria-hidden="true">·</span> {CLASS_WORD[kind]}
          {clause && (
            <span className="ml-2 font-narrow font-medium text-soft">
              {to ? (
                <Link to={to} className="text-link">
                  {clause}
                </Link>
              ) : (
                clause
              )}
              {basis && basis !== 'read' && `, ${BASIS_WORD[basis]}`}
            </span>
          )}
        </p>
        <p className="max-w-prose text-pretty">{sentence}</p>
        {wanted && <p className="mt-0.5 max-w-prose font-medium text-pretty">To weld: {wanted}</p>}
      </div>
    </li>
  )
}
