import { Plus, X } from 'lucide-react'
import { useState } from 'react'
import { Controller, type UseFormReturn } from 'react-hook-form'
import { classifyGas } from '@shared/library/gases.ts'
import { GASES, type GasMixture } from '@shared/schemas/welding.ts'
import { quantity, SHOWN_UNIT } from '@shared/units/convert.ts'
import { Button } from '@/components/Button.tsx'
import { FieldError } from '@/components/fields/Field.tsx'
import { QuantityField } from '@/components/fields/quantity.tsx'
import { Select, TextArea, TextField } from '@/components/fields/text.tsx'
import { useUnits } from '@/hooks/units.ts'
import { asFigure, type OwnField } from '../own-form.ts'

export type OwnForm = UseFormReturn<Record<string, unknown>, unknown, Record<string, unknown>>
const textOrNull = (value: unknown): unknown => (value === '' ? null : value)

/** The first sentence in an error, which for a list stands in one of its items or at its root. */
function sentence(error: unknown): string | undefined {
  if (typeof error !== 'object' || error === null) return undefined
  if ('message' in error && typeof error.message === 'string' && error.message !== '') return error.message
  for (const part of Object.values(error)) {
    const found = sentence(part)
    if (found) return found
  }
  return undefined
}

/** One field of an own row, by its kind. */
export function OwnRowField({ form, field }: { form: OwnForm; field: OwnField }) {
  const { name, label, optional, description, placeholder } = field
  const error = sentence(form.formState.errors[name])
  const shared = { label, optional, description, placeholder, error, className: field.wide ? 'sm:col-span-2 lg:col-span-3' : '' }
  switch (field.kind) {
    case 'text':
      return <TextField {...shared} maxLength={field.max} {...form.register(name, optional && name !== 'grade' ? { setValueAs: textOrNull } : {})} />
    case 'paragraph':
      return <TextArea {...shared} maxLength={field.max} {...form.register(name, { setValueAs: textOrNull })} />
    case 'figure':
      return <TextField {...shared} inputMode="decimal" {...form.register(name, { setValueAs: asFigure })} />
    case 'choice':
      return <Select {...shared} options={field.options} empty="Not stated" {...form.register(name, { setValueAs: textOrNull })} />
    case 'stress':
      return <Controller control={form.control} name={name} render={({ field: { value, onChange } }) => <StressField {...shared} value={value as number | null} onChange={onChange} />} />
    case 'words':
      return <Controller control={form.control} name={name} render={({ field: { value, onChange, onBlur } }) => <ListInput {...shared} value={value as string[]} onChange={onChange} onBlur={onBlur} read={(text) => text} />} />
    case 'sizes':
      return <Controller control={form.control} name={name} render={({ field: { value, onChange, onBlur } }) => <ListInput {...shared} value={value as number[]} onChange={onChange} onBlur={onBlur} read={(text) => asFigure(text) ?? NaN} />} />
    case 'parts':
      return <Controller control={form.control} name={name} render={({ field: { value, onChange } }) => <Parts label={label} error={error} value={value as Part[]} onChange={onChange} />} />
  }
}

interface StressProps { label: string; optional?: boolean | undefined; description?: string | undefined; error?: string | undefined; className?: string; value: number | null; onChange: (mpa: number | null) => void }
/** A strength, typed in the person's own unit or with one of its own; kept in MPa. */
function StressField({ value, onChange, ...shared }: StressProps) {
  const { system } = useUnits()
  const [typed, setTyped] = useState(() => (value === null ? null : quantity(value, 'stress')))
  return (
    <QuantityField
      {...shared}
      label={`${shared.label}, ${SHOWN_UNIT[system].stress}`}
      dimension="stress"
      system={system}
      value={typed}
      onChange={(next) => {
        setTyped(next)
        onChange(next === null ? null : Number(next.si.toPrecision(6)))
      }}
    />
  )
}

interface ListProps<T> { label: string; optional?: boolean | undefined; description?: string | undefined; placeholder?: string | undefined; error?: string | undefined; className?: string; value: readonly T[]; onChange: (value: T[]) => void; onBlur: () => void; read: (text: string) => T }
/** Several words or figures in one box, commas between. */
function ListInput<T extends string | number>({ value, onChange, read, ...shared }: ListProps<T>) {
  const [text, setText] = useState(() => value.join(', '))
  return (
    <TextField
      {...shared}
      value={text}
      onChange={(event) => {
        setText(event.target.value)
        onChange(event.target.value.split(/[;,](?=\s|$)|;|,(?=\D)/).map((part) => part.trim()).filter((part) => part !== '').map(read))
      }}
    />
  )
}

type Part = GasMixture['components'][number]
const GAS_OPTIONS = GASES.map((value) => ({ value, label: value }))

/** Parts of a mixture with their sum and the class that follows. */
function Parts({ label, error, value, onChange }: { label: string; error: string | undefined; value: Part[]; onChange: (value: Part[]) => void }) {
  const sum = value.reduce((total, { percent }) => total + (Number.isFinite(percent) ? percent : 0), 0)
  const { symbol } = classifyGas(value.filter(({ percent }) => Number.isFinite(percent)))
  const change = (index: number, part: Partial<Part>) => onChange(value.map((one, at) => (at === index ? { ...one, ...part } : one)))
  const free = GASES.find((gas) => !value.some((part) => part.gas === gas))
  return (
    <fieldset className="sm:col-span-2 lg:col-span-3">
      <legend className="mb-1 font-medium">{label}</legend>
      <div className="flex flex-wrap items-center gap-x-5 gap-y-2">
        {value.map((part, index) => (
          <div key={`${index} ${part.gas}`} className="flex items-center gap-1.5">
            <Select className="w-24" label={`Part ${index + 1}`} labelHidden options={GAS_OPTIONS} value={part.gas} onChange={(event) => change(index, { gas: event.target.value as Part['gas'] })} />
            <input className="box w-20!" inputMode="decimal" aria-label={`Share of ${part.gas} in per cent`} defaultValue={Number.isFinite(part.percent) ? part.percent : ''} onChange={(event) => change(index, { percent: asFigure(event.target.value) ?? NaN })} />
            <span className="text-soft">%</span>
            <button type="button" aria-label={`Remove ${part.gas}`} className="flex size-8 items-center justify-center rounded text-soft hover:text-ink" onClick={() => onChange(value.filter((_, at) => at !== index))}>
              <X size={14} aria-hidden="true" />
            </button>
          </div>
        ))}
        {free && (
          <Button kind="quiet" icon={<Plus size={14} aria-hidden="true" />} onClick={() => onChange([...value, { gas: free, percent: Number(Math.max(0, 100 - sum).toFixed(2)) }])}>
            Part
          </Button>
        )}
        <p className={Math.abs(sum - 100) > 0.01 ? 'font-medium text-straw-deep' : 'text-soft'}>{Math.abs(sum - 100) > 0.01 ? `${Number(sum.toFixed(2))} % of 100 %` : symbol === null ? '' : `ISO 14175 ${symbol}`}</p>
      </div>
      <FieldError error={error} />
    </fieldset>
  )
}
