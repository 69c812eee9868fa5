import type { Assessment } from '@shared/schemas/assessment.ts'
import { Switch } from '@/components/fields/text.tsx'
import { VerdictTally } from '@/components/Verdict.tsx'
import { standardName } from '@/components/variables/options.ts'

export interface MarginHeadProps {
  assessments: readonly Assessment[]
  shown: number
  onShow: (index: number) => void
  attention: boolean
  onAttention: (on: boolean) => void
  reading: boolean
}

/** Head of the margin: by which standard, how many findings of each kind, and whether those within are shown too. */
export function MarginHead({ assessments, shown, onShow, attention, onAttention, reading }: MarginHeadProps) {
  const one = assessments[shown]
  return (
    <div className="space-y-2">
      {assessments.length > 1 && (
        <div role="group" aria-label="Judged by" className="flex flex-wrap gap-x-4 border-b border-rule">
          {assessments.map(({ standard, edition }, index) => (
            <button key={`${standard} ${edition}`} type="button" aria-pressed={index === shown} onClick={() => onShow(index)} className={`-mb-px border-b-2 py-1.5 ${index === shown ? 'border-ink font-semibold' : 'border-transparent text-soft hover:text-ink'}`}>
              {standardName(standard)} {edition}
            </button>
          ))}
        </div>
      )}
      {one && <VerdictTally counts={one.counts} />}
      <div className="no-print">
        <Switch label="Only what needs attention" checked={attention} onChange={(event) => onAttention(event.target.checked)} />
      </div>
      {reading && (
        <p role="status" className="text-sm text-soft">
          Reading the coupons; the verdicts follow.
        </p>
      )}
    </div>
  )
}
