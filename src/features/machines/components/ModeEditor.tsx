import { ChevronDown, ChevronRight } from 'lucide-react'
import { useState } from 'react'
import { Controller, useWatch } from 'react-hook-form'
import { PROGRAM_KINDS } from '@shared/machines/card-facts.ts'
import { Checkbox, Select, TagPicker, TextField } from '@/components/fields/text.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { HAS_KEYS, HAS_WORDS, MODE_OPTIONS, MODE_WORDS, POLARITY_OPTIONS, PROCESS_OPTIONS, TRANSFER_OPTIONS, wrong } from '../words.ts'
import { ControlGrid, DisplayGrid, ReachFields } from './ControlGrid.tsx'
import { RowKeys, type MachineForm } from './form-parts.tsx'
import { ProgramsEditor } from './ProgramsEditor.tsx'

function Part({ title, about, children }: { title: string; about?: string; children: React.ReactNode }) {
  return (
    <div className="border-t border-hair px-4 py-3">
      <h3 className="font-medium">
        {title} {about && <span className="font-normal text-soft">{about}</span>}
      </h3>
      <div className="mt-2">{children}</div>
    </div>
  )
}

/** One mode of the panel: what it is for, its controls, displays, programs and reach. */
export function ModeEditor({ form, mode, count, onMove, onRemove }: { form: MachineForm; mode: number; count: number; onMove: (from: number, to: number) => void; onRemove: () => void }) {
  const at = `modes.${mode}` as const
  const [name, kind, programs, processes, controls] = useWatch({ control: form.control, name: [`${at}.name`, `${at}.kind`, `${at}.programs`, `${at}.processes`, `${at}.controls`] })
  const error = (path: Parameters<MachineForm['getFieldState']>[0]) => wrong(form.getFieldState(path, form.formState).error)
  const title = name || `Mode ${mode + 1}`
  // Where there is no room to see all modes at once, each is opened by hand; one with something wrong stands open.
  const [open, setOpen] = useState(() => count === 1 || typeof matchMedia !== 'function' || matchMedia('(min-width: 80rem)').matches)
  const shown = open || form.formState.errors.modes?.[mode] !== undefined
  return (
    <Sheet id={`mode-${mode + 1}`} title={title} className="mt-4" aside={
      <div className="flex items-center gap-2">
        <button type="button" aria-expanded={shown} aria-controls={`mode-${mode + 1}-body`} aria-label={`${shown ? 'Fold' : 'Open'} ${title}`} className="flex size-9 items-center justify-center rounded hover:text-ink" onClick={() => setOpen(!shown)}>
          {shown ? <ChevronDown size={18} aria-hidden="true" /> : <ChevronRight size={18} aria-hidden="true" />}
        </button>
        <RowKeys name={title} index={mode} count={count} onMove={onMove} onRemove={onRemove} />
      </div>
    }>
      {!shown && <p className="px-4 py-3 text-soft">{[MODE_WORDS[kind], processes.join(', '), controls.length === 1 ? 'one control' : `${controls.length} controls`].filter(Boolean).join(' · ')}</p>}
      <div id={`mode-${mode + 1}-body`} hidden={!shown}>
      <div className="grid gap-x-6 gap-y-4 px-4 py-4 sm:grid-cols-2">
        <TextField label="Name on the panel" maxLength={60} error={error(`${at}.name`)} {...form.register(`${at}.name`)} />
        <Select label="What it is" options={MODE_OPTIONS} {...form.register(`${at}.kind`)} />
        <Controller control={form.control} name={`${at}.processes`} render={({ field, fieldState }) => <TagPicker label="For" options={PROCESS_OPTIONS} value={field.value} onChange={field.onChange} error={fieldState.error?.message} />} />
        <Controller control={form.control} name={`${at}.transferModes`} render={({ field }) => <TagPicker label="Transfer modes" description="None chosen: not known." options={TRANSFER_OPTIONS} value={field.value} onChange={field.onChange} />} />
        <Controller control={form.control} name={`${at}.polarities`} render={({ field }) => <TagPicker label="Polarity" description="None chosen: not known." options={POLARITY_OPTIONS} value={field.value} onChange={field.onChange} />} />
        <fieldset>
          <legend className="mb-1 font-medium">It has</legend>
          <div className="flex flex-wrap gap-x-5 gap-y-1.5">
            {HAS_KEYS.map((key) => (
              <Checkbox key={key} label={HAS_WORDS[key]} {...form.register(`${at}.has.${key}`)} />
            ))}
          </div>
        </fieldset>
      </div>
      <Part title="Controls" about="in the words, units and steps of the panel">
        <ControlGrid form={form} mode={mode} />
      </Part>
      <Part title="Displays" about="figures that it shows though no control sets them">
        <DisplayGrid form={form} mode={mode} />
      </Part>
      {(PROGRAM_KINDS.includes(kind) || programs.length > 0) && (
        <Part title="Programs">
          <ProgramsEditor form={form} mode={mode} />
        </Part>
      )}
      <Part title="Reach" about="what it can put out, where that is less than the scale says">
        <ReachFields form={form} mode={mode} />
      </Part>
      </div>
    </Sheet>
  )
}
