import type { ReactNode } from 'react'
import type { CalculatorInput } from '@shared/calculations/catalogue.ts'
import { boxText, keptText, readAs } from '@shared/calculations/calculator-texts.ts'
import { SHOWN_UNIT } from '@shared/units/convert.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import { Field } from '@/components/fields/Field.tsx'
import { Select } from '@/components/fields/text.tsx'
import { useDebounced } from '@/hooks/debounced.ts'
import { useState } from 'react'

export interface FigureFieldProps {
  input: CalculatorInput
  /** The text as kept; see `calculator-texts`. */
  value: string
  onChange: (kept: string) => void
  system: UnitSystem
  /** What is wrong with it, by the calculation. */
  problem: string | null
  id: string
  /** Where the figure came from, or that it is missing. */
  note?: ReactNode
  className?: string
}

/** ms without a key before a text that can't be read is called wrong: nobody is corrected in the middle of a number. */
const REST = 700

const unitOf = (input: CalculatorInput, system: UnitSystem): string => (input.kind === 'quantity' ? SHOWN_UNIT[system][input.dimension] : input.kind === 'number' ? input.unit : '')

/** One input of a calculator: what is typed stays as typed, the unit stands beside it, and what is wrong is said below once typing rests. */
export function FigureField({ input, value, onChange, system, problem, id, note, className = '' }: FigureFieldProps) {
  const [typed, setTyped] = useState(() => boxText(input, value, system))
  const [seen, setSeen] = useState(`${system} ${value}`)
  const rested = useDebounced(typed, REST)
  const [left, setLeft] = useState(true)
  const [touched, setTouched] = useState(false)
  if (seen !== `${system} ${value}`) {
    setSeen(`${system} ${value}`)
    // Our own typing comes back as what is kept of it; only another text replaces it.
    if (keptText(input, typed, system) !== value) setTyped(boxText(input, value, system))
  }
  if (input.kind === 'choice')
    return <Select id={id} className={className} label={input.label} options={input.options} value={value} onChange={(event) => onChange(event.target.value)} description={note ?? input.help} error={problem} />
  const unit = unitOf(input, system)
  // A box that nobody was in yet is open, not wrong; what it waits for is said with the result.
  const open = typed.trim() === '' && !touched
  const said = !open && (left || rested === typed) ? problem : null
  return (
    <Field id={id} className={className} label={input.label} optional={input.optional} error={said} description={<About converted={readAs(input, value, system)} note={note} help={input.help} />}>
      {(ids) => (
        <div className="relative">
          <input
            {...ids}
            inputMode="text"
            autoComplete="off"
            className="box"
            style={{ paddingRight: `${unit.length * 0.5 + 1.25}rem` }}
            value={typed}
            onFocus={() => setLeft(false)}
            onBlur={() => {
              setLeft(true)
              setTouched(true)
            }}
            onChange={(event) => {
              setTyped(event.target.value)
              onChange(keptText(input, event.target.value, system))
            }}
          />
          <span className="pointer-events-none absolute inset-y-0 right-2.5 flex items-center text-soft">{unit}</span>
        </div>
      )}
    </Field>
  )
}

function About({ converted, note, help }: { converted: string | null; note: ReactNode; help: string | null }) {
  if (!converted && !note && !help) return null
  return (
    <>
      {[converted, note, help].filter(Boolean).map((part, index) => (
        <span key={index} className="block">
          {part}
        </span>
      ))}
    </>
  )
}
