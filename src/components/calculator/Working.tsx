import type { CalculatorResult } from '@shared/calculations/catalogue.ts'
import { written, type Source } from '@shared/calculations/result.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import { BASIS_SENTENCE } from '@/components/standards/words.ts'

/** How the result came about: each step with its formula, the figures put in, and what it gave. */
export function Working({ result, system }: { result: CalculatorResult; system: UnitSystem }) {
  if (result.steps.length === 0) return <p className="text-soft">The working stands here once there is a result.</p>
  return (
    <>
      <ol className="divide-y divide-hair">
        {result.steps.map(({ label, formula, working, value, unit }, index) => (
          <li key={index} className="grid gap-x-4 gap-y-0.5 py-2 first:pt-0 sm:grid-cols-[10rem_minmax(0,1fr)_auto]">
            <span className="font-medium first-letter:uppercase">{label}</span>
            <span className="min-w-0 break-words">
              <span className="block text-soft">{formula}</span>
              <span className="block tabular-nums">= {working}</span>
            </span>
            <span className="font-semibold whitespace-nowrap sm:text-right">
              {typeof value === 'number' ? written(value) : value} <span className="font-normal text-soft">{unit}</span>
            </span>
          </li>
        ))}
      </ol>
      {system === 'US' && <p className="mt-2 text-sm text-soft">Worked in metric units, as the formula is stated.</p>}
    </>
  )
}

/** Standard, edition and clause, and plainly on what it rests; `brief` leaves the particulars out. */
export function SourceLine({ source, brief = false }: { source: Source; brief?: boolean }) {
  const { standard, edition, clause, basis, note } = source
  return (
    <div>
      <p className="font-medium">{[edition ? `${standard} (${edition})` : standard, clause].filter(Boolean).join(', ')}</p>
      <p className={basis === 'memory' ? 'font-medium text-straw-deep' : 'text-soft'}>{BASIS_SENTENCE[basis]}</p>
      {note && !brief && <p className="text-sm text-soft">{note}</p>}
    </div>
  )
}
