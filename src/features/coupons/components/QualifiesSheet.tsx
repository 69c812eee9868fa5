import { useState } from 'react'
import { fieldLabel } from '@shared/comparison/fields.ts'
import type { CouponQualification, QualifiedRange } from '@shared/schemas/assessment.ts'
import { SHOWN_UNIT } from '@shared/units/convert.ts'
import { SI_UNIT, type Dimension } from '@shared/units/types.ts'
import { RangeGauge } from '@/components/range-gauge/RangeGauge.tsx'
import { boundsInWords } from '@/components/range-gauge/words.ts'
import { Sheet } from '@/components/Sheet.tsx'
import { CLASS_WORD } from '@/components/Verdict.tsx'
import { useSheet } from '@/components/variables/context.ts'
import { standardName } from '@/components/variables/options.ts'
import { useCouponContent } from './coupon-sheet.ts'

const isDimension = (name: string): name is Dimension => name in SI_UNIT
const BASIS = { read: '', secondary: 'from a secondary source', memory: 'from memory, confirm in your edition', 'common-practice': 'common practice' } as const

/** What the coupon qualifies under each of its standards: a gauge or names a variable, with the clause and how it comes about. */
export function QualifiesSheet({ qualifications, certified }: { qualifications: readonly CouponQualification[]; certified: boolean }) {
  const [tab, setTab] = useState(0)
  const shown = qualifications[Math.min(tab, qualifications.length - 1)]
  const { processes } = useCouponContent().variables
  if (!shown) return null
  const groups = [...new Set(shown.ranges.map(({ processId }) => processId))].map((processId) => [processId ?? '', shown.ranges.filter((range) => range.processId === processId)] as const)
  return (
    <Sheet id="qualifies" title="What this coupon qualifies" aside={`${standardName(shown.standard)} ${shown.edition}`}>
      {qualifications.length > 1 && (
        <div role="group" aria-label="Under which standard" className="flex flex-wrap gap-x-4 border-b border-rule px-4">
          {qualifications.map(({ standard, edition }, index) => (
            <button key={`${standard} ${edition}`} type="button" aria-pressed={index === tab} onClick={() => setTab(index)} className={`-mb-px min-h-11 border-b-2 ${index === tab ? 'border-ink font-semibold' : 'border-transparent text-soft hover:text-ink'}`}>
              {standardName(standard)} {edition}
            </button>
          ))}
        </div>
      )}
      {!certified && shown.ranges.length > 0 && <p className="border-b border-hair px-4 py-2.5 text-sm text-soft">So it would be, once certified.</p>}
      {shown.ranges.length === 0 ? (
        <p className="px-4 py-3 text-soft">Nothing yet. The ranges appear here as the process, the metals and the thickness are stated.</p>
      ) : (
        groups.map(([processId, ranges]) => (
          <div key={processId}>
            {groups.length > 1 && <p className="border-b border-rule bg-paper px-4 py-1.5 font-narrow text-lg font-semibold">{processes.find(({ id }) => id === processId)?.process ?? 'Every process'}</p>}
            {ranges.map((range) => (
              <RangeRow key={`${range.ruleId} ${range.field}`} range={range} />
            ))}
          </div>
        ))
      )}
    </Sheet>
  )
}

function RangeRow({ range }: { range: QualifiedRange }) {
  const { system } = useSheet()
  const { label, field, clause, basis, reason, tested, class: kind } = range
  return (
    <div className="sheet-row grid gap-x-4 gap-y-1 border-b border-hair px-4 py-2.5 last:border-b-0 sm:grid-cols-[10.25rem_minmax(0,1fr)_6.5rem] sm:items-center">
      <div className="flex items-baseline justify-between gap-3 sm:block">
        <p className="font-medium first-letter:uppercase">{label || fieldLabel(field)}</p>
        {range.range.type === 'numeric' && isDimension(range.range.dimension) && <p className="text-xs text-soft">{SHOWN_UNIT[system][range.range.dimension]}</p>}
        {kind === 'supplementary' && <p className="text-xs text-soft">{CLASS_WORD[kind]}</p>}
      </div>
      <div className="min-w-0">
        {range.range.type === 'numeric' ? (
          <RangeGauge label={label} range={range.range} asked={null} tested={typeof tested === 'number' ? [tested] : []} system={system} />
        ) : (
          <p className="font-medium break-words">
            {boundsInWords(range.range)}
            {typeof tested === 'string' && !(range.range.values.length === 1 && range.range.values[0] === tested) && <span className="ml-2 font-normal text-plum">welded {tested}</span>}
          </p>
        )}
        <details className="text-sm text-soft">
          <summary className="w-fit cursor-pointer underline decoration-dotted underline-offset-2">How it comes about</summary>
          <p className="mt-0.5 max-w-prose text-pretty">
            {reason} {BASIS[basis] && `(${BASIS[basis]})`}
          </p>
        </details>
      </div>
      <p className="font-narrow font-medium text-soft sm:text-right">{clause}</p>
    </div>
  )
}
