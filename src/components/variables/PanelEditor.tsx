import { Plus, X } from 'lucide-react'
import type { Electrical } from '@shared/schemas/welding.ts'
import { Button } from '@/components/Button.tsx'
import { TextField } from '@/components/fields/text.tsx'
import { readPath } from '@/lib/draft/paths.ts'
import { inputId, useSheet, useSheetField } from './context.ts'

type Panel = NonNullable<Electrical['panel']>
type Setting = Panel['settings'][number]
const EMPTY: Panel = { machine: null, mode: null, caution: null, settings: [] }
const orNull = (text: string) => (text === '' ? null : text)
const figureOrNull = (text: string) => (text.trim() === '' || Number.isNaN(Number(text)) ? null : Number(text))

/** The settings of one machine's panel, in the words on that panel, so that a welder dials what is approved. */
export function PanelEditor({ path, label }: { path: string; label: string }) {
  const { value, set, error } = useSheetField<Electrical['panel']>(`variables.${path}`)
  if (!value) {
    return (
      <div id={inputId(path)} tabIndex={-1} className="flex flex-wrap items-center gap-3">
        <Button icon={<Plus size={14} aria-hidden="true" />} onClick={() => set(EMPTY)}>
          Write the settings of a machine
        </Button>
        <p className="text-sm text-soft">In the words on its panel, for the welder.</p>
      </div>
    )
  }
  const change = (index: number, part: Partial<Setting>) => set({ ...value, settings: value.settings.map((one, at) => (at === index ? { ...one, ...part } : one)) })
  return (
    <div className="space-y-2.5">
      <div className="grid gap-2 sm:grid-cols-2">
        <TextField id={inputId(path)} label="Machine" maxLength={40} value={value.machine ?? ''} onChange={(event) => set({ ...value, machine: orNull(event.target.value) })} />
        <TextField label="Mode" maxLength={60} value={value.mode ?? ''} onChange={(event) => set({ ...value, mode: orNull(event.target.value) })} />
      </div>
      <TextField label="Caution" maxLength={400} value={value.caution ?? ''} onChange={(event) => set({ ...value, caution: orNull(event.target.value) })} />
      {value.settings.map((setting, index) => (
        <fieldset key={index} className="grid grid-cols-2 items-end gap-2 border-l-2 border-rule pl-3 sm:grid-cols-[minmax(0,1.6fr)_repeat(4,minmax(0,1fr))_2rem]">
          <legend className="sr-only">
            {label}, setting {index + 1}
          </legend>
          <TextField label="Control" maxLength={60} value={setting.control} error={setting.control.trim() === '' ? 'Name the control as on the panel.' : null} onChange={(event) => change(index, { control: event.target.value })} />
          <TextField label="Value" maxLength={40} value={setting.value} error={setting.value.trim() === '' ? 'Give the value to dial.' : null} onChange={(event) => change(index, { value: event.target.value })} />
          <TextField label="Unit" maxLength={16} value={setting.unit} onChange={(event) => change(index, { unit: event.target.value })} />
          <Figure label="From" value={setting.min} onChange={(min) => change(index, { min })} />
          <Figure label="To" value={setting.max} onChange={(max) => change(index, { max })} />
          <button type="button" aria-label={`Remove ${setting.control || `setting ${index + 1}`}`} className="flex size-8 items-center justify-center rounded text-soft hover:text-ink" onClick={() => set({ ...value, settings: value.settings.filter((_, at) => at !== index) })}>
            <X size={16} aria-hidden="true" />
          </button>
        </fieldset>
      ))}
      {error && <p className="text-sm font-medium text-oxide">{error}</p>}
      <div className="flex flex-wrap gap-2">
        {value.settings.length < 16 && (
          <Button kind="quiet" icon={<Plus size={14} aria-hidden="true" />} onClick={() => set({ ...value, settings: [...value.settings, { control: 'Wire feed', hint: null, value: '0', unit: '', scaleMin: null, scaleMax: null, min: null, max: null }] })}>
            Setting
          </Button>
        )}
        <Button kind="quiet" onClick={() => set(null)}>
          Remove the panel
        </Button>
      </div>
    </div>
  )
}

function Figure({ label, value, onChange }: { label: string; value: number | null; onChange: (value: number | null) => void }) {
  return <TextField label={label} inputMode="decimal" defaultValue={value ?? ''} onBlur={(event) => onChange(figureOrNull(event.target.value))} />
}

export function PanelReading({ path }: { path: string }) {
  const { content } = useSheet()
  const panel = readPath(content.variables, path) as Electrical['panel']
  if (!panel) return null
  return (
    <div className="space-y-1">
      <p className="font-medium">{[panel.machine, panel.mode].filter(Boolean).join(' · ')}</p>
      <dl className="grid grid-cols-[auto_1fr] gap-x-4">
        {panel.settings.map((one, index) => (
          <div key={index} className="contents">
            <dt className="text-soft">{one.control}</dt>
            <dd>
              {one.value} <span className="text-soft">{one.unit}</span>
              {(one.min !== null || one.max !== null) && <span className="text-soft"> ({[one.min, one.max].filter((end) => end !== null).join(' to ')})</span>}
            </dd>
          </div>
        ))}
      </dl>
      {panel.caution && <p className="text-straw-deep">{panel.caution}</p>}
    </div>
  )
}
