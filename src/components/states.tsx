/** What a page shows when there is nothing, when something failed, and while it waits. */
import type { ReactNode } from 'react'
import { Link } from 'react-router-dom'
import { useTitle } from '@/hooks/title.ts'
import { asProblem } from '@/lib/problem.ts'
import { Button } from './Button.tsx'

export interface EmptyStateProps {
  title: string
  /** What the thing is for. */
  children: ReactNode
  /** The first step: a button or a link. */
  step?: ReactNode
  /** A worked example, drawn or told. */
  example?: ReactNode
}

/** Nothing here yet: says what it is for, offers the first step and shows a worked example. */
export function EmptyState({ title, children, step, example }: EmptyStateProps) {
  return (
    <div className="grid gap-6 border border-rule bg-sheet px-5 py-8 sm:px-8 md:grid-cols-2">
      <div>
        <h2 className="font-narrow text-2xl font-semibold">{title}</h2>
        <div className="mt-2 max-w-prose text-pretty text-soft">{children}</div>
        {step && <div className="mt-5 flex flex-wrap gap-2">{step}</div>}
      </div>
      {example && (
        <div className="border-l-2 border-rule pl-5">
          <p className="cell-label">Worked example</p>
          <div className="mt-2">{example}</div>
        </div>
      )}
    </div>
  )
}

/** A list whose filters leave nothing. */
export function NothingFound({ what, onClear }: { what: string; onClear?: () => void }) {
  return (
    <div className="border border-rule bg-sheet px-5 py-8 text-center" role="status">
      <p className="font-medium">No {what} match these filters.</p>
      {onClear && (
        <Button className="mt-3" onClick={onClear}>
          Clear the filters
        </Button>
      )}
    </div>
  )
}

/** Something failed: what, what to do, and the request id for whoever looks after the server. */
export function ErrorState({ error, onRetry, compact = false }: { error: unknown; onRetry?: () => void; compact?: boolean }) {
  const problem = asProblem(error)
  return (
    <div role="alert" className={`border border-oxide bg-oxide-bg px-4 ${compact ? 'py-2.5' : 'py-5'}`}>
      <p className={compact ? 'font-semibold' : 'font-narrow text-xl font-semibold'}>{problem.problem.title}</p>
      <p className="mt-1 max-w-prose text-pretty">{problem.message}</p>
      {problem.fields.length > 0 && (
        <ul className="mt-1 list-disc pl-5">
          {problem.fields.map(({ field, message }) => (
            <li key={`${field} ${message}`}>{message}</li>
          ))}
        </ul>
      )}
      {onRetry && (
        <Button className="mt-3" onClick={onRetry}>
          Try again
        </Button>
      )}
      {problem.requestId && <p className="mt-2 text-xs">Request {problem.requestId}</p>}
    </div>
  )
}

/** A page whose record can't be shown: a head in the place of its title block, then what failed. */
export function RecordError({ title, ...failed }: { title: string; error: unknown; onRetry: () => void }) {
  return (
    <>
      <PageHead title={title} />
      <ErrorState {...failed} />
    </>
  )
}

/** Ruled rows in outline, while the real ones come. */
export function Skeleton({ rows = 6, label = 'Reading' }: { rows?: number; label?: string }) {
  return (
    <div role="status" aria-label={label} className="border border-rule bg-sheet">
      <span className="sr-only">{label}…</span>
      {Array.from({ length: rows }, (_, index) => (
        <div key={index} className="flex items-center gap-4 border-b border-hair px-4 py-4 last:border-b-0" aria-hidden="true">
          <span className="h-3 w-20 animate-pulse bg-hair" />
          <span className={`h-3 animate-pulse bg-hair ${['w-1/2', 'w-2/5', 'w-3/5'][index % 3]}`} />
        </div>
      ))}
    </div>
  )
}

export interface Crumb {
  label: string
  to?: string
}

/** The way back up; the last is where one stands. */
export function Breadcrumb({ trail }: { trail: readonly Crumb[] }) {
  return (
    <nav aria-label="Breadcrumb" className="no-print mb-2 text-sm">
      <ol className="flex flex-wrap gap-x-1.5">
        {trail.map(({ label, to }, index) => (
          <li key={label} className="flex gap-1.5">
            {to ? (
              <Link to={to} className="text-link">
                {label}
              </Link>
            ) : (
              <span aria-current="page" className="text-soft">
                {label}
              </span>
            )}
            {index < trail.length - 1 && (
              <span aria-hidden="true" className="text-soft">
                /
              </span>
            )}
          </li>
        ))}
      </ol>
    </nav>
  )
}

/** A page's head where no title block opens it: lists and settings. */
export function PageHead({ title, children, actions }: { title: string; children?: ReactNode; actions?: ReactNode }) {
  useTitle(title)
  return (
    <header className="mb-4 flex flex-wrap items-end justify-between gap-x-6 gap-y-3">
      <div>
        <h1 className="font-narrow text-3xl font-semibold">{title}</h1>
        {children && <div className="mt-0.5 max-w-prose text-soft">{children}</div>}
      </div>
      {actions && <div className="no-print flex flex-wrap gap-2">{actions}</div>}
    </header>
  )
}

/** Long work: how far it is, and a way to stop it. Without `value` (0 to 1) the end is not known. */
export function Progress({ label, value, onCancel }: { label: string; value?: number; onCancel?: () => void }) {
  const percent = value === undefined ? undefined : Math.round(value * 100)
  return (
    <div className="flex items-center gap-3">
      <div className="min-w-0 grow">
        <p className="mb-1 flex justify-between gap-3 text-sm">
          <span>{label}</span>
          {percent !== undefined && <span className="text-soft">{percent} %</span>}
        </p>
        <progress aria-label={label} className="block h-2 w-full appearance-none bg-hair [&::-moz-progress-bar]:bg-jade [&::-webkit-progress-bar]:bg-hair [&::-webkit-progress-value]:bg-jade" max={1} value={value} />
      </div>
      {onCancel && <Button onClick={onCancel}>Cancel</Button>}
    </div>
  )
}
