import { useId, useState, type KeyboardEvent } from 'react'
import type { Interval } from '@shared/schemas/common.ts'
import { SHOWN_UNIT } from '@shared/units/convert.ts'
import { formatInterval } from '@shared/units/format.ts'
import { parseInterval } from '@shared/units/parse.ts'
import type { UnitSystem } from '@shared/units/types.ts'

export interface FigureEditorProps {
  label: string
  dimension: 'length' | 'angle'
  system: UnitSystem
  value: Interval | null
  /** Told at each key that leaves something readable. */
  onTyping: (value: Interval | null) => void
  onDone: (value: Interval | null) => void
  onCancel: () => void
}

/** A figure of the drawing, written at the drawing: `3`, `2-4`, `60 ± 5`, `1/8 in`. Enter keeps it, Esc leaves it as it was. */
export function FigureEditor({ label, dimension, system, value, onTyping, onDone, onCancel }: FigureEditorProps) {
  const id = useId()
  const [text, setText] = useState(value ? formatInterval(value, dimension, system).text : '')
  const [problem, setProblem] = useState<string | null>(null)
  const read = (typed: string): { ok: true; value: Interval | null } | { ok: false; message: string } => {
    if (typed.trim() === '') return { ok: true, value: null }
    const reading = parseInterval(typed, dimension, system)
    if (!reading.ok) return reading
    if (reading.interval.all) return { ok: false, message: `${label}: "all" does not apply here. Write a figure, or a range like 2-4.` }
    const { min, max } = reading.interval
    if (min && max && min.si > max.si) return { ok: false, message: `${label}: the lower figure, ${min.typed}, is above the upper, ${max.typed}.` }
    return { ok: true, value: reading.interval }
  }
  const done = () => {
    const reading = read(text)
    if (reading.ok) onDone(reading.value)
    else setProblem(reading.message)
  }
  const onKey = (event: KeyboardEvent) => {
    if (event.key === 'Enter') {
      event.preventDefault()
      done()
    } else if (event.key === 'Escape') {
      event.stopPropagation()
      onCancel()
    }
  }
  return (
    <div className="w-44 border border-ink bg-sheet p-2">
      <label htmlFor={id} className="block text-sm font-medium">
        {label} <span className="font-normal text-soft">{dimension === 'angle' ? 'degrees' : SHOWN_UNIT[system][dimension]}</span>
      </label>
      <input
        id={id}
        autoFocus
        autoComplete="off"
        className="box mt-1"
        value={text}
        aria-invalid={problem !== null || undefined}
        aria-describedby={problem ? `${id}-error` : undefined}
        onFocus={(event) => event.target.select()}
        onChange={(event) => {
          setText(event.target.value)
          setProblem(null)
          const reading = read(event.target.value)
          if (reading.ok) onTyping(reading.value)
        }}
        onKeyDown={onKey}
        onBlur={done}
      />
      {problem && (
        <p id={`${id}-error`} role="alert" className="mt-1 text-sm font-medium text-oxide">
          {problem}
        </p>
      )}
    </div>
  )
}
