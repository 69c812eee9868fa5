import { useState } from 'react'
import type { Quantity } from '@shared/schemas/common.ts'
import { formatQuantity } from '@shared/units/format.ts'
import { parseQuantity } from '@shared/units/parse.ts'
import type { Dimension, UnitSystem } from '@shared/units/types.ts'
import { TextField } from '@/components/fields/text.tsx'

interface Shared {
  label: string
  most: number
  id?: string
  className?: string
}

/** Texts of a list: parts apart by semicolon, by comma and space, or by spaces between bare figures. */
export function partsOf(text: string): string[] {
  const parts = text.split(/;|,(?=\s)/).map((part) => part.trim()).filter(Boolean)
  return parts.flatMap((part) => (/^[\d.]+(\s+[\d.]+)+$/.test(part) ? part.split(/\s+/) : [part]))
}

/** Several measured values in one box: `31, 28, 34`. What can't be read stays, with the reason. */
export function QuantitiesField({ label, most, id, className, value, onChange, dimension, system }: Shared & { value: readonly Quantity[]; onChange: (next: Quantity[]) => void; dimension: Dimension; system: UnitSystem }) {
  const shown = value.map((one) => formatQuantity(one, dimension, system).figure).join(', ')
  const read = (text: string) => {
    const readings = partsOf(text).map((part) => parseQuantity(part, dimension, system))
    const bad = readings.find((reading) => !reading.ok)
    if (bad && !bad.ok) return bad.message
    if (readings.length > most) return `${label}: at most ${most} values; ${readings.length} are written.`
    onChange(readings.flatMap((reading) => (reading.ok ? [reading.quantity] : [])))
    return null
  }
  return <Listed label={label} id={id} className={className} shown={shown} read={read} />
}

/** Several bare figures in one box: `182, 190, 201`. */
export function NumbersField({ label, most, id, className, value, onChange }: Shared & { value: readonly number[]; onChange: (next: number[]) => void }) {
  const read = (text: string) => {
    const parts = partsOf(text)
    const bad = parts.find((part) => !(Number(part) > 0))
    if (bad !== undefined) return `${label}: "${bad}" is not a figure above 0. Write e.g. 182, 190, 201.`
    if (parts.length > most) return `${label}: at most ${most} figures; ${parts.length} are written.`
    onChange(parts.map(Number))
    return null
  }
  return <Listed label={label} id={id} className={className} shown={value.join(', ')} read={read} />
}

function Listed({ label, id, className, shown, read }: { label: string; id: string | undefined; className: string | undefined; shown: string; read: (text: string) => string | null }) {
  const [text, setText] = useState(shown)
  const [seen, setSeen] = useState(shown)
  const [wrong, setWrong] = useState<string | null>(null)
  if (seen !== shown) {
    setSeen(shown)
    setText(shown)
    setWrong(null)
  }
  const leave = () => setWrong(text === shown ? null : read(text))
  return <TextField id={id} className={className} label={label} autoComplete="off" value={text} error={wrong} onChange={(event) => setText(event.target.value)} onBlur={leave} onKeyDown={(event) => event.key === 'Enter' && leave()} />
}
