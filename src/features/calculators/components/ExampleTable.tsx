import { useState } from 'react'
import type { Calculator } from '@shared/calculations/catalogue.ts'
import { exampleTexts } from '@shared/calculations/calculator-texts.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import { Button } from '@/components/Button.tsx'
import { figureInWords } from '@/components/calculator/figures.ts'
import { Sheet } from '@/components/Sheet.tsx'

/** The worked example: what goes in, what must come out, where it is from. */
export function ExampleTable({ calculator, system, onFill }: { calculator: Calculator; system: UnitSystem; onFill: () => void }) {
  const [all, setAll] = useState(false)
  const texts = exampleTexts(calculator, system)
  const given = Object.entries(calculator.inputs).filter(([key]) => texts[key] !== '')
  const shown = all ? given : given.slice(0, MOST)
  const { shown: results } = calculator.run(texts)
  const expected = results.filter(({ key, value }) => key in calculator.example.expect && value !== null)
  return (
    <Sheet title="Worked example" className="no-print">
      <div className="space-y-2 px-4 py-3">
        <dl className="grid grid-cols-[minmax(0,1fr)_auto] gap-x-4 gap-y-0.5">
          {shown.map(([key, input]) => (
            <Pair key={key} label={input.label} value={input.kind === 'choice' ? (input.options.find(({ value }) => value === texts[key])?.label ?? '') : withUnit(texts[key] ?? '', input.unit)} />
          ))}
        </dl>
        {given.length > shown.length && (
          <Button kind="quiet" onClick={() => setAll(true)}>
            {given.length - shown.length} more figures
          </Button>
        )}
        <dl className="grid grid-cols-[minmax(0,1fr)_auto] gap-x-4 gap-y-0.5 border-t border-rule pt-2 font-medium">
          {expected.map((figure) => (
            <Pair key={figure.key} label={figure.label} value={figureInWords(figure, system)} />
          ))}
        </dl>
        <p className="text-sm text-pretty text-soft">{fromWhere(calculator.example.from)}</p>
        <Button onClick={onFill}>
          Fill in the example
        </Button>
      </div>
    </Sheet>
  )
}

const MOST = 10
/** Where the example is from, without the numbers by which the tests know their cases. */
const fromWhere = (from: string): string => {
  const said = from.replace(/calc-g-[a-z]+-\d+(?:(?:, | and )calc-g-[a-z]+-\d+)*/g, 'a worked case that is kept with the program')
  return `${said.charAt(0).toUpperCase()}${said.slice(1)}${/[.!?]$/.test(said) ? '' : '.'}`
}
/** A text that carries its own unit keeps it. */
const withUnit = (text: string, unit: string): string => (/^[\d.,-]+$/.test(text) && unit ? `${text} ${unit}` : text)

function Pair({ label, value }: { label: string; value: string }) {
  return (
    <>
      <dt className="min-w-0 font-normal">{label}</dt>
      <dd className="text-right">{value}</dd>
    </>
  )
}
