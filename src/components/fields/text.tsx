import type { InputHTMLAttributes, ReactNode, Ref, SelectHTMLAttributes, TextareaHTMLAttributes } from 'react'
import { useId } from 'react'
import { Field, FieldError, type FieldProps } from './Field.tsx'

type Own<T> = FieldProps & Omit<T, 'className' | 'children'>

/** One line of text. Works with react-hook-form's `register`, or with `value` and `onChange`. */
export function TextField({ label, labelHidden, description, error, optional, className, id, ref, ...input }: Own<InputHTMLAttributes<HTMLInputElement>> & { ref?: Ref<HTMLInputElement> }) {
  return (
    <Field {...{ label, labelHidden, description, error, optional, className, id }}>{(ids) => <input ref={ref} type="text" {...input} {...ids} className="box" />}</Field>
  )
}

/** Several lines of text. */
export function TextArea({ label, labelHidden, description, error, optional, className, id, ref, ...input }: Own<TextareaHTMLAttributes<HTMLTextAreaElement>> & { ref?: Ref<HTMLTextAreaElement> }) {
  return (
    <Field {...{ label, labelHidden, description, error, optional, className, id }}>{(ids) => <textarea ref={ref} rows={3} {...input} {...ids} className="box resize-y" />}</Field>
  )
}

export interface Option {
  value: string
  label: string
}

/** One of a few named values; `empty` adds a first choice that means "not stated". */
export function Select({
  label,
  labelHidden,
  description,
  error,
  optional,
  className,
  id,
  ref,
  options,
  empty,
  ...input
}: Own<SelectHTMLAttributes<HTMLSelectElement>> & { ref?: Ref<HTMLSelectElement>; options: readonly Option[]; empty?: string }) {
  return (
    <Field {...{ label, labelHidden, description, error, optional, className, id }}>
      {(ids) => (
        <select ref={ref} {...input} {...ids} className="box pr-7">
          {empty !== undefined && <option value="">{empty}</option>}
          {options.map((option) => (
            <option key={option.value} value={option.value}>
              {option.label}
            </option>
          ))}
        </select>
      )}
    </Field>
  )
}

interface TickProps extends Omit<InputHTMLAttributes<HTMLInputElement>, 'type' | 'className'> {
  label: ReactNode
  description?: ReactNode
  error?: string | null
  ref?: Ref<HTMLInputElement>
}

/** A tick box with its sentence. */
export function Checkbox({ label, description, error, ref, ...input }: TickProps) {
  const id = useId()
  return (
    <div>
      <label className="flex min-h-6 w-fit items-start gap-2.5">
        <input ref={ref} type="checkbox" {...input} aria-invalid={error ? true : undefined} aria-describedby={error ? `${id}-error` : undefined} className="mt-0.5 size-4 shrink-0 accent-ink" />
        <span>
          {label}
          {description && <span className="block text-sm text-soft">{description}</span>}
        </span>
      </label>
      <FieldError id={`${id}-error`} error={error} />
    </div>
  )
}

/** On or off, at once. */
export function Switch({ label, description, ref, ...input }: Omit<TickProps, 'error'>) {
  return (
    <label className="flex min-h-6 w-fit items-center gap-2.5">
      <input
        ref={ref}
        type="checkbox"
        role="switch"
        {...input}
        className="relative h-5 w-9 shrink-0 appearance-none rounded-sm border border-edge bg-paper transition-colors before:absolute before:top-0.5 before:left-0.5 before:h-3.5 before:w-4 before:rounded-sm before:bg-edge before:transition-transform checked:border-ink checked:bg-ink checked:before:translate-x-3.5 checked:before:bg-paper"
      />
      <span>
        {label}
        {description && <span className="block text-sm text-soft">{description}</span>}
      </span>
    </label>
  )
}

/** Several of a few short names, e.g. welding positions: a row of keys that stay pressed. */
export function TagPicker<V extends string>({
  label,
  labelHidden,
  description,
  error,
  options,
  value,
  onChange,
  disabled,
}: FieldProps & { options: readonly { value: V; label?: string; hint?: string }[]; value: readonly V[]; onChange: (value: V[]) => void; disabled?: boolean }) {
  const id = useId()
  return (
    <div role="group" aria-labelledby={`${id}-label`} aria-describedby={[description ? `${id}-about` : '', error ? `${id}-error` : ''].filter(Boolean).join(' ') || undefined}>
      <p id={`${id}-label`} className={labelHidden ? 'sr-only' : 'mb-1 font-medium'}>
        {label}
      </p>
      <div className="flex flex-wrap gap-1.5">
        {options.map((option) => {
          const on = value.includes(option.value)
          return (
            <button
              key={option.value}
              type="button"
              aria-pressed={on}
              title={option.hint}
              disabled={disabled}
              onClick={() => onChange(options.map((one) => one.value).filter((one) => (one === option.value ? !on : value.includes(one))))}
              className={`min-h-8 min-w-10 rounded border px-2.5 font-medium disabled:opacity-55 ${on ? 'border-ink bg-ink text-paper' : 'border-edge bg-sheet hover:border-ink'}`}
            >
              {option.label ?? option.value}
            </button>
          )
        })}
      </div>
      {description && (
        <p id={`${id}-about`} className="mt-1 text-sm text-soft">
          {description}
        </p>
      )}
      <FieldError id={`${id}-error`} error={error} />
    </div>
  )
}
