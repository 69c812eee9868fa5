/** Small parts of the machine form: cells of its grids, lists typed as text, the keys that move and remove a row. */
import { ArrowDown, ArrowUp, X } from 'lucide-react'
import { useId, useState, type ReactNode } from 'react'
import { Controller, type FieldPath, type FieldPathByValue, type UseFormReturn } from 'react-hook-form'
import type { WriteMachine } from '@shared/schemas/machines.ts'
import { FieldError } from '@/components/fields/Field.tsx'
import { TextField } from '@/components/fields/text.tsx'
import { asFigure, readFigures, readWords, unreadFigures, wrong } from '../words.ts'

export type MachineForm = UseFormReturn<WriteMachine, unknown, WriteMachine>
type Path = FieldPath<WriteMachine>

interface CellProps {
  form: MachineForm
  name: Path
  label: string
  /** A figure: read as one, right-aligned. */
  figure?: boolean
  type?: 'text' | 'date'
  placeholder?: string
  className?: string
  maxLength?: number
}

const textOrNull = (value: unknown): unknown => (value === '' ? null : value)

/** One box of a grid; its label stands over it until the grid is wide enough for a head of its own. */
export function Cell({ form, name, label, figure = false, type = 'text', placeholder, className = '', maxLength }: CellProps) {
  const id = useId()
  const error = wrong(form.getFieldState(name, form.formState).error)
  const nullable = type === 'date' || /\.(where|note|accuracyNote|certificate)$/.test(name)
  return (
    <div className={`min-w-0 ${className}`}>
      <label htmlFor={id} className="cell-label mb-0.5 block xl:sr-only">
        {label}
      </label>
      <input
        id={id}
        type={type}
        inputMode={figure ? 'decimal' : undefined}
        placeholder={placeholder}
        maxLength={maxLength}
        aria-invalid={error ? true : undefined}
        aria-describedby={error ? `${id}-error` : undefined}
        className={`box ${figure ? 'xl:text-right' : ''}`}
        {...form.register(name, figure ? { setValueAs: asFigure } : nullable ? { setValueAs: textOrNull } : {})}
      />
      <FieldError id={`${id}-error`} error={error} />
    </div>
  )
}

/** A choice in a grid. */
export function ChoiceCell({ form, name, label, options, className = '', onPick }: { form: MachineForm; name: Path; label: string; options: readonly { value: string; label: string }[]; className?: string; onPick?: (value: string) => void }) {
  const id = useId()
  return (
    <div className={`min-w-0 ${className}`}>
      <label htmlFor={id} className="cell-label mb-0.5 block xl:sr-only">
        {label}
      </label>
      <select id={id} className="box pr-7" {...form.register(name, { onChange: (event: { target: { value: string } }) => onPick?.(event.target.value) })}>
        {options.map((option) => (
          <option key={option.value} value={option.value}>
            {option.label}
          </option>
        ))}
      </select>
    </div>
  )
}

/** Several words or figures typed in one line, with commas between. */
export function ListField({ form, name, label, placeholder, figures = false }: { form: MachineForm; name: FieldPathByValue<WriteMachine, string[]> | FieldPathByValue<WriteMachine, number[]>; label: string; placeholder?: string; figures?: boolean }) {
  return <Controller control={form.control} name={name} render={({ field, fieldState }) => <ListInput label={label} placeholder={placeholder} figures={figures} value={field.value} onChange={field.onChange} error={fieldState.error?.message} />} />
}

function ListInput({ label, placeholder, figures, value, onChange, error }: { label: string; placeholder: string | undefined; figures: boolean; value: readonly (string | number)[]; onChange: (value: (string | number)[]) => void; error: string | undefined }) {
  const [text, setText] = useState(() => value.join(', '))
  const unread = figures ? unreadFigures(text) : []
  return (
    <TextField
      label={label}
      placeholder={placeholder}
      value={text}
      error={unread.length > 0 ? `${unread.join(', ')} is no figure. Give each in mm, e.g. 0.9, 1.2.` : error}
      onChange={(event) => {
        setText(event.target.value)
        // What is no figure stands in the list as none, so that nothing is saved without it.
        onChange(figures ? [...readFigures(event.target.value), ...unreadFigures(event.target.value).map(() => NaN)] : readWords(event.target.value))
      }}
    />
  )
}

const ICON = 'flex size-9 shrink-0 items-center justify-center rounded text-soft hover:text-ink disabled:opacity-40'

/** Up, down and away, for a row of a list. */
export function RowKeys({ name, index, count, onMove, onRemove }: { name: string; index: number; count: number; onMove?: (from: number, to: number) => void; onRemove: () => void }) {
  return (
    <div className="flex">
      {onMove && (
        <>
          <button type="button" className={ICON} aria-label={`Move ${name} up`} disabled={index === 0} onClick={() => onMove(index, index - 1)}>
            <ArrowUp size={16} aria-hidden="true" />
          </button>
          <button type="button" className={ICON} aria-label={`Move ${name} down`} disabled={index === count - 1} onClick={() => onMove(index, index + 1)}>
            <ArrowDown size={16} aria-hidden="true" />
          </button>
        </>
      )}
      <button type="button" className={ICON} aria-label={`Remove ${name}`} onClick={onRemove}>
        <X size={16} aria-hidden="true" />
      </button>
    </div>
  )
}

/** The head of a grid where it is wide enough for one. */
export function GridHead({ columns, template }: { columns: readonly ReactNode[]; template: string }) {
  return (
    <div aria-hidden="true" className={`hidden gap-x-2 pb-1 xl:grid ${template}`}>
      {columns.map((column, index) => (
        <span key={index} className="cell-label">
          {column}
        </span>
      ))}
    </div>
  )
}
