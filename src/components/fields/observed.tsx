import { useState } from 'react'
import type { Interval } from '@shared/schemas/common.ts'
import { SHOWN_UNIT } from '@shared/units/convert.ts'
import { formatInterval } from '@shared/units/format.ts'
import { parseInterval } from '@shared/units/parse.ts'
import type { Dimension, UnitSystem } from '@shared/units/types.ts'
import { Field } from './Field.tsx'
import { key, textOf, useRested, type Measured } from './quantity.tsx'

const keyOf = (value: Interval | null): string => (value ? `${key(value.min)}|${key(value.max)}|${value.all ? 'all' : ''}` : '')

/** What was observed, in one box: one figure, or the two between which it stayed, `18–22`. */
function shownText(value: Interval | null, dimension: Dimension, system: UnitSystem): string {
  if (!value) return ''
  const { min, max, all } = value
  if (all) return 'all'
  if (min && max && min.si === max.si && min.unit === max.unit) return textOf(min, dimension, system)
  if (!min || !max) return min ? `≥ ${textOf(min, dimension, system)}` : max ? `≤ ${textOf(max, dimension, system)}` : ''
  const ends = [textOf(min, dimension, system), textOf(max, dimension, system)]
  return ends.join(ends.every((end) => /^[\d.,]+$/.test(end)) ? '–' : ' to ')
}

export interface ObservedFieldProps extends Measured {
  value: Interval | null
  onChange: (value: Interval | null) => void
  /** Told at each key what the box would be read as; a text that can't be read yet is passed over. */
  onTyping?: (value: Interval | null) => void
}

/** A value as it was measured: one box, read when it is left. One figure is both ends; a spread is typed as `18-22`. */
export function ObservedField({ value, onChange, dimension, system, onUnread, error, description, label, labelHidden, optional, className, id, onTyping, ...input }: ObservedFieldProps) {
  const shown = shownText(value, dimension, system)
  const [text, setText] = useState(shown)
  const [seen, setSeen] = useState(keyOf(value))
  const [unread, setUnread] = useState<string | null>(null)
  if (seen !== keyOf(value)) {
    setSeen(keyOf(value))
    setText(shown)
    setUnread(null)
  }
  const say = (message: string | null) => {
    setUnread(message)
    onUnread?.(message)
  }
  const read = () => {
    if (text === shown) return say(null)
    if (text.trim() === '') {
      say(null)
      setSeen('')
      return onChange(null)
    }
    const reading = parseInterval(text, dimension, system)
    if (!reading.ok) return say(reading.message)
    if (reading.interval.all) return say(`${label}: what was measured is a figure. Write e.g. 10, or 18-22 where it varied.`)
    say(null)
    if (keyOf(reading.interval) === keyOf(value)) return
    setSeen(keyOf(reading.interval))
    onChange(reading.interval)
  }
  useRested(text, () => {
    if (text.trim() === '') return
    const reading = parseInterval(text, dimension, system)
    if (reading.ok && !reading.interval.all) read()
  })
  const type = (next: string) => {
    setText(next)
    if (!onTyping) return
    const reading = next.trim() === '' ? null : parseInterval(next, dimension, system)
    if (reading === null) onTyping(null)
    else if (reading.ok && !reading.interval.all) onTyping(reading.interval)
  }
  const other = [value?.min, value?.max].some((end) => end && end.unit !== SHOWN_UNIT[system][dimension])
  const converted = value && other ? `= ${formatInterval(value, dimension, system, { asTyped: false }).text}` : null
  return (
    <Field {...{ label, labelHidden, optional, className, id }} error={unread ?? error ?? null} description={converted ?? description}>
      {(ids) => <input {...input} {...ids} inputMode="text" autoComplete="off" className="box" value={text} onChange={(event) => type(event.target.value)} onBlur={read} onKeyDown={(event) => event.key === 'Enter' && read()} />}
    </Field>
  )
}
