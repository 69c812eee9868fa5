import { Minus, Plus } from 'lucide-react'
import { useId, useState } from 'react'
import { settle } from '@shared/units/convert.ts'
import type { PanelControl } from '@shared/schemas/machines.ts'
import { settingText } from '../words.ts'

export interface StepperProps {
  label: string
  unit: string
  /** Null until it is set: a knob that nobody looked at is not recorded. */
  value: number | null
  onChange: (value: number | null) => void
  /** What was typed can't be taken as a figure; the bead isn't saved over it. The next figure takes it back. */
  onUnread: (message: string) => void
  /** The control on the panel; without it steps are of the figure's own size. */
  control: PanelControl | null
  /** What it was on the bead before; a difference is marked. */
  before: number | null
}

const KEY = 'flex size-12 shrink-0 items-center justify-center rounded border border-edge bg-sheet text-ink disabled:opacity-40'

/** A twentieth of the figure, to a round step, where the register doesn't say. */
const stepOf = (control: PanelControl | null, value: number | null): number => control?.step ?? 10 ** Math.floor(Math.log10(Math.max(Math.abs(value ?? 1), 1e-3) / 10))

/** The next position up or down: on the control's own steps, inside its scale. From nothing it starts in the middle. */
export function stepped(value: number | null, direction: 1 | -1, control: PanelControl | null): number {
  const step = stepOf(control, value)
  const [min, max] = [control?.min ?? -Infinity, control?.max ?? Infinity]
  if (value === null) return control ? settle(control.min + Math.round((control.max - control.min) / 2 / step) * step) : 0
  const base = control && control.step !== null ? control.min : 0
  const at = (value - base) / step
  const next = direction === 1 ? Math.floor(at + 1e-6) + 1 : Math.ceil(at - 1e-6) - 1
  return settle(Math.max(min, Math.min(max, base + next * step)))
}

/** A panel setting between a minus and a plus, each a thumb wide; the figure can be typed as well. */
export function Stepper({ label, unit, value, onChange, onUnread, control, before }: StepperProps) {
  const id = useId()
  const [text, setText] = useState(() => (value === null ? '' : settingText(value, control)))
  // The panel's decimals are known once the machine has been read.
  const [decimals, setDecimals] = useState(control?.step ?? null)
  const [seen, setSeen] = useState(value)
  const [wrong, setWrong] = useState<string | null>(null)
  if (seen !== value || decimals !== (control?.step ?? null)) {
    setDecimals(control?.step ?? null)
    setSeen(value)
    setText(value === null ? '' : settingText(value, control))
    setWrong(null)
  }
  const changed = before !== null && value !== null && value !== before
  const off = control && value !== null && (value < control.min || value > control.max) ? `Off the scale, which runs from ${settingText(control.min, control)} to ${settingText(control.max, control)}${unit ? ` ${unit}` : ''}.` : null
  const read = (typed: string) => {
    setText(typed)
    const plain = typed.trim().replace(',', '.')
    if (plain === '') {
      setWrong(null)
      setSeen(null)
      return onChange(null)
    }
    const figure = Number(plain)
    const why = !Number.isFinite(figure)
      ? `“${typed.trim()}” is no figure. Write it as on the panel, e.g. ${control ? settingText(control.min, control) : '120'}.`
      : control && control.min >= 0 && figure < 0
        ? `${label} can’t be below nothing: its scale runs from ${settingText(control.min, control)} to ${settingText(control.max, control)}${unit ? ` ${unit}` : ''}.`
        : null
    if (why) {
      setWrong(why)
      return onUnread(`${label}: ${why}`)
    }
    setWrong(null)
    setSeen(figure)
    onChange(figure)
  }
  const said = wrong ?? off
  return (
    <div className={`border-l-4 py-1.5 pl-3 ${changed ? 'border-l-figure' : 'border-l-transparent'}`}>
      <div className="flex items-end justify-between gap-3">
        <div className="min-w-0 grow pb-1">
          <label htmlFor={id} className="block font-medium">{label}</label>
          <span id={`${id}-about`} className="block text-sm text-soft">{changed ? `was ${settingText(before, control)}${unit ? ` ${unit}` : ''}` : (control?.where ?? (value === null ? 'not set' : ''))}</span>
        </div>
        <div className="flex items-center gap-1.5">
          <button type="button" className={KEY} aria-label={`${label} down`} disabled={control !== null && value !== null && value <= control.min} onClick={() => onChange(stepped(value, -1, control))}>
            <Minus size={22} aria-hidden="true" />
          </button>
          <input id={id} inputMode="decimal" autoComplete="off" aria-describedby={`${id}-about ${id}-error`} aria-invalid={said ? true : undefined} className="box w-22! text-center font-narrow text-2xl! font-semibold text-figure!" value={text} onChange={(event) => read(event.target.value)} />
          <button type="button" className={KEY} aria-label={`${label} up`} disabled={control !== null && value !== null && value >= control.max} onClick={() => onChange(stepped(value, 1, control))}>
            <Plus size={22} aria-hidden="true" />
          </button>
          <span className="w-11 shrink-0 text-sm text-soft">{unit}</span>
        </div>
      </div>
      <p id={`${id}-error`} role={said ? 'alert' : undefined} className={said ? 'pb-1 text-sm font-medium text-oxide' : 'hidden'}>{said}</p>
    </div>
  )
}
