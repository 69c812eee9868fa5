import { useId, type ReactNode } from 'react'

export interface FieldProps {
  label: string
  /** Keeps the label for readers only, where a row already shows it. */
  labelHidden?: boolean
  description?: ReactNode
  /** What is wrong: names the field, the value and what would be right. */
  error?: string | null
  /** Says "optional" beside the label. */
  optional?: boolean
  className?: string
}

export interface FieldIds {
  id: string
  'aria-describedby': string | undefined
  'aria-invalid': true | undefined
}

/** Label, control, description and error, tied together for readers. The control takes the ids. */
export function Field({ label, labelHidden = false, description, error, optional = false, className = '', id: given, children }: FieldProps & { id?: string | undefined; children: (ids: FieldIds) => ReactNode }) {
  const own = useId()
  const id = given ?? own
  const described = [description ? `${id}-about` : '', error ? `${id}-error` : ''].filter(Boolean).join(' ')
  return (
    <div className={`min-w-0 ${className}`}>
      <label htmlFor={id} className={labelHidden ? 'sr-only' : 'mb-1 block font-medium'}>
        {label}
        {optional && <span className="font-normal text-soft"> (optional)</span>}
      </label>
      {children({ id, 'aria-describedby': described || undefined, 'aria-invalid': error ? true : undefined })}
      {description && (
        <p id={`${id}-about`} className="mt-1 text-sm text-soft">
          {description}
        </p>
      )}
      <FieldError id={`${id}-error`} error={error} />
    </div>
  )
}

/** The error under a field. */
export function FieldError({ id, error }: { id?: string; error?: string | null | undefined }) {
  if (!error) return null
  return (
    <p id={id} className="mt-1 text-sm font-medium text-oxide">
      {error}
    </p>
  )
}

/** What stops a whole form, above its buttons. */
export function FormError({ message }: { message?: string | undefined }) {
  if (!message) return null
  return (
    <p role="alert" className="border-l-[3px] border-l-oxide bg-oxide-bg px-3 py-2">
      {message}
    </p>
  )
}
