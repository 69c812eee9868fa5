import { TriangleAlert } from 'lucide-react'
import type { Calculator, CalculatorResult } from '@shared/calculations/catalogue.ts'
import type { InputTexts } from '@shared/calculations/calculator-texts.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import { problemsElsewhere, readFigure, stillOpen } from './figures.ts'

export interface ResultViewProps {
  calculator: Calculator
  result: CalculatorResult
  texts: InputTexts
  system: UnitSystem
  /** Only the principal figure and the next few. */
  most?: number
}

/** The result, its principal figure large; where there is none, what it waits for. */
export function ResultView({ calculator, result, texts, system, most }: ResultViewProps) {
  const [first, ...rest] = result.shown
  if (!first) return <Waiting calculator={calculator} result={result} texts={texts} />
  const { figure, unit } = readFigure(first, system)
  const told = rest.filter(({ value }) => value !== null)
  const more = most === undefined ? told : told.slice(0, most)
  return (
    <div className="space-y-3">
      <div aria-live="polite" aria-atomic="true">
        <p className="cell-label">{first.label}</p>
        <p className="font-narrow font-semibold text-figure">
          <span className={figure.length > 14 ? 'text-2xl' : 'text-4xl'}>{first.value === null ? 'none given' : figure}</span> {unit && <span className="text-xl font-medium text-soft">{unit}</span>}
        </p>
      </div>
      {result.advisory && <p className="inline-block border border-straw px-2 py-0.5 text-sm font-medium text-straw-deep">Advisory: an estimate; it never passes or fails a qualification by itself.</p>}
      <Outside said={result.validity.said} />
      {more.length > 0 && (
        <dl className="divide-y divide-hair border-y border-hair">
          {more.map((shown) => {
            const read = readFigure(shown, system)
            return (
              <div key={shown.key} className="flex flex-wrap items-baseline justify-between gap-x-4 py-1">
                <dt>{shown.label}</dt>
                <dd className="text-right font-semibold">
                  {read.figure} {read.unit && <span className="font-normal text-soft">{read.unit}</span>}
                </dd>
              </div>
            )
          })}
        </dl>
      )}
      {result.notes.length > 0 && (
        <ul className="space-y-1 text-sm text-soft">
          {result.notes.map((note) => (
            <li key={note}>{note}</li>
          ))}
        </ul>
      )}
    </div>
  )
}

/** The limits that are passed, in words and loud. */
function Outside({ said }: { said: readonly string[] }) {
  if (said.length === 0) return null
  return (
    <div role="note" aria-label="Outside its validity" className="border-l-[6px] border-straw bg-straw-bg px-3.5 py-2.5">
      <p className="flex items-center gap-2 font-narrow text-lg font-semibold text-straw-deep">
        <TriangleAlert size={18} aria-hidden="true" className="shrink-0" />
        Outside its validity
      </p>
      {said.map((sentence) => (
        <p key={sentence} className="mt-0.5">
          {sentence}
        </p>
      ))}
    </div>
  )
}

function Waiting({ calculator, result, texts }: Pick<ResultViewProps, 'calculator' | 'result' | 'texts'>) {
  const open = stillOpen(calculator, texts)
  const elsewhere = problemsElsewhere(calculator, result)
  const wrong = result.problems.filter(({ input }) => input in calculator.inputs && !open.includes(input))
  const names = (keys: readonly string[]) => keys.map((key) => calculator.inputs[key]?.label ?? key).join(', ')
  return (
    <div aria-live="polite" className="space-y-1.5">
      <p className="cell-label">No result yet</p>
      {open.length > 0 && <p>Still wanted: {names(open)}.</p>}
      {wrong.length > 0 && <p>To be put right: {names([...new Set(wrong.map(({ input }) => input))])}. The field says what is wrong; what you typed stays.</p>}
      {elsewhere.map((message) => (
        <p key={message} className="font-medium">
          {message}
        </p>
      ))}
    </div>
  )
}
