import { useEffect, useEffectEvent, useId, useState } from 'react'
import type { Interval, Quantity } from '@shared/schemas/common.ts'
import { SHOWN_UNIT, fromSi } from '@shared/units/convert.ts'
import { formatQuantity } from '@shared/units/format.ts'
import { parseInterval, parseQuantity } from '@shared/units/parse.ts'
import type { Dimension, UnitSystem } from '@shared/units/types.ts'
import { Field, FieldError, type FieldProps } from './Field.tsx'

/** ms without a key after which a text that can be read already counts, so that what follows from it is seen before the field is left. */
const REST = 500

/** Runs `read` once typing has rested. Nothing is said of a text that can't be read yet: that waits until the field is left. */
export function useRested(text: string, read: () => void): void {
  const rested = useEffectEvent(read)
  useEffect(() => {
    const timer = setTimeout(() => rested(), REST)
    return () => clearTimeout(timer)
  }, [text])
}

export interface Measured extends FieldProps {
  dimension: Dimension
  /** The system in which a bare figure is read. */
  system: UnitSystem
  /** Reports a text that can't be read (null once it can), so that a form can hold back. The last good value stays. */
  onUnread?: (message: string | null) => void
  id?: string
  disabled?: boolean
  readOnly?: boolean
  placeholder?: string
}

/**
 * The text of a box: as typed, less the unit that the row already shows. An end worked out from a tolerance
 * (`10 ± 2`) was never typed by itself, so it shows its own figure.
 */
export function textOf(quantity: Quantity | null, dimension: Dimension, system: UnitSystem): string {
  if (!quantity) return ''
  const { si, unit, typed } = quantity
  const shown = SHOWN_UNIT[system][dimension]
  const text = /±|\+\s*\/?\s*[-−]/.test(typed) ? `${fromSi(si, dimension, unit)} ${unit}` : typed
  if (unit === shown) return text.endsWith(shown) ? text.slice(0, -shown.length).trim() : text
  // A bare figure typed by somebody who reads the other system: without its unit it would be read as this one's.
  return /^[\d\s.,/-]+$/.test(text) ? `${text} ${unit}` : text
}
export const key = (quantity: Quantity | null): string => (quantity ? `${quantity.si} ${quantity.unit} ${quantity.typed}` : '')

/** "= 12.7 mm" when a figure was typed in another unit than the one shown. */
export function converted(quantity: Quantity | null, dimension: Dimension, system: UnitSystem): string | null {
  if (!quantity || quantity.unit === SHOWN_UNIT[system][dimension]) return null
  return `= ${formatQuantity(quantity, dimension, system).text}`
}

export interface QuantityFieldProps extends Measured {
  value: Quantity | null
  onChange: (value: Quantity | null) => void
}

/** One measured value, typed as people write it (`1/2 in`, `3/8"`, `200 F`, `.035`); read when the field is left. */
export function QuantityField({ value, onChange, dimension, system, onUnread, error, description, ...rest }: QuantityFieldProps) {
  const [text, setText] = useState(textOf(value, dimension, system))
  const [seen, setSeen] = useState(key(value))
  const [unread, setUnread] = useState<string | null>(null)
  if (seen !== key(value)) {
    setSeen(key(value))
    setText(textOf(value, dimension, system))
    setUnread(null)
  }
  const say = (message: string | null) => {
    setUnread(message)
    onUnread?.(message)
  }
  const read = () => {
    if (text.trim() === '') {
      say(null)
      if (value !== null) {
        setSeen('')
        onChange(null)
      }
      return
    }
    if (text === textOf(value, dimension, system)) return say(null)
    const reading = parseQuantity(text, dimension, system)
    say(reading.ok ? null : reading.message)
    if (!reading.ok || key(reading.quantity) === key(value)) return
    setSeen(key(reading.quantity))
    onChange(reading.quantity)
  }
  useRested(text, () => {
    if (text.trim() !== '' && parseQuantity(text, dimension, system).ok) read()
  })
  const { label, labelHidden, optional, className, id, ...input } = rest
  return (
    <Field {...{ label, labelHidden, optional, className, id }} error={unread ?? error ?? null} description={converted(value, dimension, system) ?? description}>
      {(ids) => <input {...input} {...ids} inputMode="text" autoComplete="off" className="box" value={text} onChange={(event) => setText(event.target.value)} onBlur={read} onKeyDown={(event) => event.key === 'Enter' && read()} />}
    </Field>
  )
}

export interface IntervalFieldProps extends Measured {
  value: Interval | null
  onChange: (value: Interval | null) => void
  /** Lets a person write "all" for every size. */
  allowAll?: boolean
  /** What "all" means, shown beside it: "plate and pipe". */
  allMeans?: string
  /** Told at each key what the boxes would be read as; a text that can't be read yet is passed over. */
  onTyping?: (value: Interval | null) => void
}

const none: Interval = { min: null, max: null, all: false }
const intervalKey = (value: Interval | null): string => `${key(value?.min ?? null)}|${key(value?.max ?? null)}|${value?.all ? 'all' : ''}`

/** From and to, in two boxes. `18-22` typed in the first fills both; `all` covers every size where allowed. */
export function IntervalField({ value, onChange, dimension, system, onUnread, error, description, allowAll = false, allMeans, onTyping, label, labelHidden, optional, className = '', id: given, ...input }: IntervalFieldProps) {
  const own = useId()
  const id = given ?? own
  const shown = value ?? none
  const [texts, setTexts] = useState<[string, string]>(textsOf(shown, dimension, system))
  const [seen, setSeen] = useState(intervalKey(value))
  const [unread, setUnread] = useState<[string | null, string | null]>([null, null])
  if (seen !== intervalKey(value)) {
    setSeen(intervalKey(value))
    setTexts(textsOf(shown, dimension, system))
    setUnread([null, null])
  }

  const keep = (next: Interval, at: [string, string]) => {
    const empty = !next.min && !next.max && !next.all
    const order = next.min && next.max && next.min.si > next.max.si ? `${label}: the lower figure, ${next.min.typed}, is above the upper, ${next.max.typed}. Swap them or correct one.` : null
    setUnread([null, order])
    onUnread?.(order)
    setTexts(at)
    const result = empty ? null : next
    if (intervalKey(result) === intervalKey(value)) return
    setSeen(intervalKey(result))
    onChange(result)
  }
  const fail = (side: 0 | 1, message: string) => {
    setUnread(side === 0 ? [message, unread[1]] : [unread[0], message])
    onUnread?.(message)
  }
  const read = (side: 0 | 1) => {
    const text = texts[side].trim()
    const end = side === 0 ? 'min' : 'max'
    if (text === '') return keep({ ...shown, [end]: null, all: false }, side === 0 ? ['', shown.all ? '' : texts[1]] : [shown.all ? '' : texts[0], ''])
    if (text === textsOf(shown, dimension, system)[side] && !unread[side]) return
    const single = parseQuantity(text, dimension, system)
    if (single.ok) return keep({ ...shown, [end]: single.quantity, all: false }, side === 0 ? [text, shown.all ? '' : texts[1]] : [shown.all ? '' : texts[0], text])
    const both = parseInterval(text, dimension, system)
    if (!both.ok) return fail(side, both.message)
    if (both.interval.all && !allowAll) return fail(side, `${label}: "all" does not apply here. Write a figure, or a range like 18-22.`)
    keep(both.interval, textsOf(both.interval, dimension, system))
  }

  /** What both boxes would be read as; undefined where one can't be read yet. */
  const reading = (at: [string, string]): Interval | undefined => {
    const was = textsOf(shown, dimension, system)
    const end = (side: 0 | 1): Quantity | null | undefined => {
      const text = at[side].trim()
      // An end that nobody touched stays what it is, in whatever unit it was typed.
      if (at[side] === was[side]) return side === 0 ? shown.min : shown.max
      const read = text === '' ? null : parseQuantity(text, dimension, system)
      return read?.ok ? read.quantity : undefined
    }
    const [min, max] = [end(0), end(1)]
    return min === undefined || max === undefined || (min && max && min.si > max.si) ? undefined : { min, max, all: false }
  }
  useRested(texts.join(' | '), () => {
    const was = textsOf(shown, dimension, system)
    if (shown.all || (texts[0] === was[0] && texts[1] === was[1])) return
    const next = reading(texts)
    if (next) keep(next, texts)
  })
  const type = (at: [string, string]) => {
    setTexts(at)
    const next = onTyping && !shown.all ? reading(at) : undefined
    if (next) onTyping?.(next.min || next.max ? next : null)
  }

  const message = unread[0] ?? unread[1] ?? error ?? null
  const note = [converted(shown.min, dimension, system), converted(shown.max, dimension, system)].filter((part) => part !== null).join(' to ').replace('to = ', 'to ')
  const about = note || description
  const described = [about ? `${id}-about` : '', message ? `${id}-error` : ''].filter(Boolean).join(' ') || undefined
  const box = (side: 0 | 1) => (
    <input
      {...input}
      id={side === 0 ? id : `${id}-to`}
      aria-label={`${label}, ${side === 0 ? 'from' : 'to'}`}
      aria-describedby={described}
      aria-invalid={(side === 0 ? unread[0] : unread[1]) || (error && !unread[0] && !unread[1]) ? true : undefined}
      autoComplete="off"
      className="box"
      value={texts[side]}
      onChange={(event) => type(side === 0 ? [event.target.value, texts[1]] : [texts[0], event.target.value])}
      onBlur={() => read(side)}
      onKeyDown={(event) => event.key === 'Enter' && read(side)}
    />
  )
  return (
    <div role="group" aria-label={label} className={`min-w-0 ${className}`}>
      {!labelHidden && (
        <label htmlFor={id} className="mb-1 block font-medium">
          {label}
          {optional && <span className="font-normal text-soft"> (optional)</span>}
        </label>
      )}
      <div className="grid grid-cols-2 gap-2">
        {shown.all ? (
          <div className="relative col-span-2">
            {box(0)}
            {allMeans && <span className="pointer-events-none absolute inset-y-0 right-3 flex items-center text-soft">{allMeans}</span>}
          </div>
        ) : (
          <>
            {box(0)}
            {box(1)}
          </>
        )}
      </div>
      {about && (
        <p id={`${id}-about`} className="mt-1 text-sm text-soft">
          {about}
        </p>
      )}
      <FieldError id={`${id}-error`} error={message} />
    </div>
  )
}

function textsOf({ min, max, all }: Interval, dimension: Dimension, system: UnitSystem): [string, string] {
  return all ? ['all', ''] : [textOf(min, dimension, system), textOf(max, dimension, system)]
}
