import type { ButtonHTMLAttributes, ReactNode, Ref } from 'react'
import { Link, type LinkProps } from 'react-router-dom'

export type ButtonKind = 'primary' | 'secondary' | 'quiet' | 'danger'

const KINDS: Record<ButtonKind, string> = {
  primary: 'px-3.5 bg-ink text-paper border-ink hover:bg-steel hover:border-steel',
  secondary: 'px-3.5 bg-sheet text-ink border-ink hover:bg-paper',
  quiet: 'px-0.5 bg-transparent text-ink border-transparent underline underline-offset-[3px] decoration-1 hover:decoration-2',
  danger: 'px-3.5 bg-oxide text-stamped border-oxide hover:brightness-90',
}
const SHAPE = 'inline-flex min-h-9 items-center justify-center gap-2 rounded border py-1.5 text-base font-semibold whitespace-nowrap'

/** Classes of a button, for the rare thing that must look like one and be something else (a download link). */
export const buttonClass = (kind: ButtonKind = 'secondary', className = '') => `${SHAPE} ${KINDS[kind]} ${className}`

export interface ButtonProps extends ButtonHTMLAttributes<HTMLButtonElement> {
  kind?: ButtonKind
  /** Work is under way: says so, and takes no second press, but stays focusable. */
  pending?: boolean
  icon?: ReactNode
  ref?: Ref<HTMLButtonElement>
}

/** Primary in ink, secondary outlined, quiet underlined, danger in oxide (only for what cannot be undone). */
export function Button({ kind = 'secondary', pending = false, icon, className = '', children, onClick, disabled, type = 'button', ...rest }: ButtonProps) {
  const off = disabled || pending
  return (
    <button
      {...rest}
      type={type}
      disabled={disabled}
      aria-disabled={off || undefined}
      aria-busy={pending || undefined}
      onClick={(event) => {
        if (pending) event.preventDefault()
        else onClick?.(event)
      }}
      className={buttonClass(kind, `${off ? 'cursor-not-allowed opacity-55' : ''} ${className}`)}
    >
      {icon}
      {children}
      {pending && <span className="size-2 animate-pulse rounded-full bg-current" aria-hidden="true" />}
    </button>
  )
}

/** A link that looks like a button: for going somewhere, never for doing something. */
export function ButtonLink({ kind = 'secondary', className = '', ...rest }: LinkProps & { kind?: ButtonKind }) {
  return <Link {...rest} className={buttonClass(kind, className)} />
}
