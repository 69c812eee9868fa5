import { Plus } from 'lucide-react'
import { useFieldArray } from 'react-hook-form'
import { panelUnit, PANEL_QUANTITY } from '@shared/machines/panel-quantities.ts'
import { freshKey, newControl } from '@shared/machines/patterns.ts'
import type { PanelQuantity } from '@shared/schemas/machines.ts'
import { Button } from '@/components/Button.tsx'
import { Checkbox } from '@/components/fields/text.tsx'
import { QUANTITY_OPTIONS, WHEN_OPTIONS, wrong } from '../words.ts'
import { Cell, ChoiceCell, GridHead, RowKeys, type MachineForm } from './form-parts.tsx'

const COLUMNS = 'xl:grid-cols-[minmax(0,1.4fr)_minmax(0,1.2fr)_minmax(0,1.4fr)_5.5rem_5.5rem_5.5rem_5.5rem_5rem_6.75rem]'

/** The knobs, buttons and menu lines of a mode, a row each, in the order in which a welder meets them. */
export function ControlGrid({ form, mode }: { form: MachineForm; mode: number }) {
  const rows = useFieldArray({ control: form.control, name: `modes.${mode}.controls` })
  const add = () => rows.append(newControl('wireFeed', { key: freshKey('wire-feed', rows.fields.map(({ key }) => key)), label: '', step: 0.1, max: 20 }))
  // A unit that does not measure what the control sets now would only confuse.
  const pick = (index: number, sets: string) => {
    const quantity = sets as PanelQuantity
    const unit = form.getValues(`modes.${mode}.controls.${index}.unit`)
    if (PANEL_QUANTITY[quantity].dimension === null || panelUnit(quantity, unit) === null) form.setValue(`modes.${mode}.controls.${index}.unit`, PANEL_QUANTITY[quantity].unit, { shouldDirty: true })
    if (form.getValues(`modes.${mode}.controls.${index}.label`) === '') form.setValue(`modes.${mode}.controls.${index}.label`, PANEL_QUANTITY[quantity].label, { shouldDirty: true })
  }
  return (
    <div>
      <GridHead template={COLUMNS} columns={['Words on the panel', 'Where', 'Sets', 'Unit', 'From', 'To', 'Step', 'Shown', '']} />
      {rows.fields.length === 0 && <p className="text-soft">No control yet. Without controls there is nothing to dial.</p>}
      {rows.fields.map((row, index) => {
        const at = `modes.${mode}.controls.${index}` as const
        const name = form.getValues(`${at}.label`) || `control ${index + 1}`
        return (
          <fieldset key={row.id} className={`grid grid-cols-2 items-end gap-x-2 gap-y-2 border-t border-hair py-3 sm:grid-cols-4 xl:items-start xl:border-t-0 xl:py-1 ${COLUMNS}`}>
            <legend className="sr-only">{name}</legend>
            <Cell form={form} name={`${at}.label`} label="Words on the panel" maxLength={60} className="max-sm:col-span-2" />
            <Cell form={form} name={`${at}.where`} label="Where" placeholder="left knob" maxLength={80} />
            <ChoiceCell form={form} name={`${at}.sets`} label="Sets" options={QUANTITY_OPTIONS} onPick={(value) => pick(index, value)} />
            <Cell form={form} name={`${at}.unit`} label="Unit" placeholder="none" maxLength={16} />
            <Cell form={form} name={`${at}.min`} label="From" figure />
            <Cell form={form} name={`${at}.max`} label="To" figure />
            <Cell form={form} name={`${at}.step`} label="Step" placeholder="stepless" figure />
            <div className="flex min-h-9 items-center">
              <Checkbox label={<span className="xl:sr-only">Shown</span>} aria-label={`The panel shows ${name}`} {...form.register(`${at}.shown`)} />
            </div>
            <RowKeys name={name} index={index} count={rows.fields.length} onMove={rows.move} onRemove={() => rows.remove(index)} />
          </fieldset>
        )
      })}
      <Button kind="quiet" className="mt-1" icon={<Plus size={14} aria-hidden="true" />} onClick={add}>
        Control
      </Button>
    </div>
  )
}

const DISPLAY = 'grid-cols-2 sm:grid-cols-[minmax(0,1.4fr)_6rem_minmax(0,1.2fr)_6rem_3rem]'

/** Figures that the machine shows though no control sets them. */
export function DisplayGrid({ form, mode }: { form: MachineForm; mode: number }) {
  const rows = useFieldArray({ control: form.control, name: `modes.${mode}.displays` })
  return (
    <div className="max-w-3xl">
      {rows.fields.length > 0 && <GridHead template="xl:grid-cols-[minmax(0,1.4fr)_6rem_minmax(0,1.2fr)_6rem_3rem]" columns={['Shows', 'Unit', 'When', 'To the nearest', '']} />}
      {rows.fields.length === 0 && <p className="text-soft">Nothing. What the procedure limits must then be measured.</p>}
      {rows.fields.map((row, index) => {
        const at = `modes.${mode}.displays.${index}` as const
        return (
          <fieldset key={row.id} className={`grid items-end gap-2 border-t border-hair py-2 first:border-t-0 xl:border-t-0 xl:py-1 ${DISPLAY}`}>
            <legend className="sr-only">Display {index + 1}</legend>
            <ChoiceCell form={form} name={`${at}.quantity`} label="Shows" options={QUANTITY_OPTIONS} />
            <Cell form={form} name={`${at}.unit`} label="Unit" maxLength={16} />
            <ChoiceCell form={form} name={`${at}.when`} label="When" options={WHEN_OPTIONS} />
            <Cell form={form} name={`${at}.resolution`} label="To the nearest" placeholder="to" figure />
            <RowKeys name={`display ${index + 1}`} index={index} count={rows.fields.length} onRemove={() => rows.remove(index)} />
          </fieldset>
        )
      })}
      <Button kind="quiet" className="mt-1" icon={<Plus size={14} aria-hidden="true" />} onClick={() => rows.append({ quantity: 'current', unit: 'A', when: 'while-welding', resolution: 1 })}>
        Display
      </Button>
    </div>
  )
}

const REACH = [['current', 'Current', 'A'], ['voltage', 'Voltage', 'V'], ['wireFeed', 'Wire feed', 'm/min']] as const

/** What the machine can put out in the mode, whatever the ends of its scales say. */
export function ReachFields({ form, mode }: { form: MachineForm; mode: number }) {
  return (
    <div className="flex flex-wrap gap-x-6 gap-y-2">
      {REACH.map(([key, label, unit]) => {
        const at = `modes.${mode}.reach.${key}` as const
        const reach = form.watch(at)
        const error = wrong(form.getFieldState(at, form.formState).error)
        const figure = (end: 'min' | 'max') => (
          <input
            aria-label={`${label}, ${end === 'min' ? 'least' : 'most'}, ${unit}`}
            inputMode="decimal"
            className="box w-20"
            defaultValue={reach?.[end] ?? ''}
            key={`${at} ${reach ? 'given' : 'open'} ${end}`}
            onBlur={(event) => {
              const typed = event.target.value.trim()
              const value = Number(typed.replace(',', '.'))
              const other = end === 'min' ? 'max' : 'min'
              if (typed === '') form.setValue(at, null, { shouldDirty: true })
              else if (Number.isFinite(value)) form.setValue(at, { ...(reach ?? { [other]: end === 'min' ? value : 0 }), [end]: value } as { min: number; max: number }, { shouldDirty: true })
            }}
          />
        )
        return (
          <div key={key}>
            <p className="cell-label mb-0.5">
              {label}, {unit}
            </p>
            <div className="flex items-center gap-2">
              {figure('min')} <span className="text-soft">to</span> {figure('max')}
            </div>
            {error && <p className="mt-1 text-sm font-medium text-oxide">{error}</p>}
          </div>
        )
      })}
    </div>
  )
}
