import { Plus } from 'lucide-react'
import { useFieldArray, useWatch } from 'react-hook-form'
import { freshKey } from '@shared/machines/patterns.ts'
import { Button } from '@/components/Button.tsx'
import { Cell, GridHead, ListField, RowKeys, type MachineForm } from './form-parts.tsx'
import { PointsPlot } from './PointsPlot.tsx'

/** The programs of a one-knob mode: for which wires each was made, and what the shop measured with it. */
export function ProgramsEditor({ form, mode }: { form: MachineForm; mode: number }) {
  const rows = useFieldArray({ control: form.control, name: `modes.${mode}.programs` })
  return (
    <div>
      {rows.fields.length === 0 && <p className="text-soft">No program yet. A one-knob mode can’t be dialled without one.</p>}
      {rows.fields.map((row, index) => (
        <ProgramEditor key={row.id} form={form} mode={mode} program={index} count={rows.fields.length} onMove={rows.move} onRemove={() => rows.remove(index)} />
      ))}
      <Button kind="quiet" className="mt-1" icon={<Plus size={14} aria-hidden="true" />} onClick={() => rows.append({ key: freshKey('program', rows.fields.map(({ key }) => key)), label: '', wires: [], diameters: [], gases: [], measured: [] })}>
        Program
      </Button>
    </div>
  )
}

function ProgramEditor({ form, mode, program, count, onMove, onRemove }: { form: MachineForm; mode: number; program: number; count: number; onMove: (from: number, to: number) => void; onRemove: () => void }) {
  const at = `modes.${mode}.programs.${program}` as const
  const measured = useFieldArray({ control: form.control, name: `${at}.measured` })
  const name = form.getValues(`${at}.label`) || `program ${program + 1}`
  return (
    <fieldset className="border-t border-rule py-3 first:border-t-0 first:pt-0">
      <legend className="sr-only">{name}</legend>
      <div className="grid gap-3 sm:grid-cols-2 xl:grid-cols-[minmax(0,1.2fr)_minmax(0,1.4fr)_minmax(0,1fr)_minmax(0,1.2fr)_6.75rem]">
        <div className="min-w-0">
          <p className="mb-1 hidden font-medium xl:block" aria-hidden="true">
            Name on the panel
          </p>
          <Cell form={form} name={`${at}.label`} label="Name on the panel" maxLength={80} />
        </div>
        <ListField form={form} name={`${at}.wires`} label="Wires that it stands for" placeholder="ER4043, ER5356" />
        <ListField form={form} name={`${at}.diameters`} label="Diameters, mm" placeholder="0.9, 1.2" figures />
        <ListField form={form} name={`${at}.gases`} label="Gases" placeholder="Ar 100, Ar 82 CO2 18" />
        <div className="xl:pt-6">
          <RowKeys name={name} index={program} count={count} onMove={onMove} onRemove={onRemove} />
        </div>
      </div>
      {measured.fields.map((row, index) => (
        <MeasuredSet key={row.id} form={form} at={`${at}.measured.${index}`} name={`measurement ${index + 1} of ${name}`} onRemove={() => measured.remove(index)} />
      ))}
      <Button kind="quiet" icon={<Plus size={14} aria-hidden="true" />} onClick={() => measured.append({ wire: form.getValues(`${at}.wires`)[0] ?? '', diameter: form.getValues(`${at}.diameters`)[0] ?? 1.2, gas: form.getValues(`${at}.gases`)[0] ?? '', trim: null, points: [] })}>
        Measured points of a wire
      </Button>
    </fieldset>
  )
}

const POINT = 'xl:grid-cols-[5rem_6rem_5rem_5rem_9rem_minmax(0,1fr)_2.5rem]'

function MeasuredSet({ form, at, name, onRemove }: { form: MachineForm; at: `modes.${number}.programs.${number}.measured.${number}`; name: string; onRemove: () => void }) {
  const points = useFieldArray({ control: form.control, name: `${at}.points` })
  const values = useWatch({ control: form.control, name: `${at}.points` })
  const [wire, gas] = useWatch({ control: form.control, name: [`${at}.wire`, `${at}.gas`] })
  return (
    <fieldset className="my-3 border-l-2 border-rule pl-3">
      <legend className="sr-only">{name}</legend>
      <div className="grid grid-cols-2 items-end gap-2 sm:grid-cols-[minmax(0,1fr)_6rem_minmax(0,1fr)_6rem_2.5rem] sm:max-w-3xl">
        <Labelled><Cell form={form} name={`${at}.wire`} label="Wire" maxLength={60} /></Labelled>
        <Labelled><Cell form={form} name={`${at}.diameter`} label="Diameter, mm" figure /></Labelled>
        <Labelled><Cell form={form} name={`${at}.gas`} label="Gas" placeholder="Ar 100" maxLength={60} /></Labelled>
        <Labelled><Cell form={form} name={`${at}.trim`} label="Trim" placeholder="not noted" figure /></Labelled>
        <RowKeys name={name} index={0} count={1} onRemove={onRemove} />
      </div>
      <div className="mt-2 grid gap-4 lg:grid-cols-[minmax(0,1fr)_20rem]">
        <div>
          <GridHead template={POINT} columns={['Knob', 'Feed m/min', 'Volts', 'Amps', 'Measured on', 'Note', '']} />
          {points.fields.map((row, index) => {
            const point = `${at}.points.${index}` as const
            return (
              <fieldset key={row.id} className={`grid grid-cols-3 items-end gap-2 border-t border-hair py-2 sm:grid-cols-4 xl:border-t-0 xl:py-0.5 ${POINT}`}>
                <legend className="sr-only">Point {index + 1}</legend>
                <Cell form={form} name={`${point}.knob`} label="Knob" figure />
                <Cell form={form} name={`${point}.wireFeed`} label="Feed m/min" figure />
                <Cell form={form} name={`${point}.voltage`} label="Volts" figure />
                <Cell form={form} name={`${point}.current`} label="Amps" figure />
                <Cell form={form} name={`${point}.measuredOn`} label="Measured on" type="date" className="max-xl:col-span-2" />
                <Cell form={form} name={`${point}.note`} label="Note" maxLength={200} className="max-sm:col-span-2" />
                <RowKeys name={`point ${index + 1}`} index={index} count={points.fields.length} onRemove={() => points.remove(index)} />
              </fieldset>
            )
          })}
          <Button kind="quiet" icon={<Plus size={14} aria-hidden="true" />} onClick={() => points.append({ knob: (values.at(-1)?.knob ?? 0) + 1, wireFeed: null, voltage: null, current: null, measuredOn: new Date().toISOString().slice(0, 10), note: null })}>
            Point
          </Button>
        </div>
        <PointsPlot points={values} title={`${wire}, ${gas}`} />
      </div>
    </fieldset>
  )
}

/** These few boxes keep their labels at every width. */
function Labelled({ children }: { children: React.ReactNode }) {
  return <div className="[&_label]:xl:not-sr-only [&_label]:xl:mb-0.5 [&_label]:xl:block">{children}</div>
}
