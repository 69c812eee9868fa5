import type { ReactNode } from 'react'
import type { Verdict } from '@shared/schemas/assessment.ts'

export interface SheetProps {
  /** Target of the section index. */
  id?: string
  title: string
  /** At the right of the head: a short summary, or a control. */
  aside?: ReactNode
  children: ReactNode
  className?: string
}

/** A sheet of ruled rows under a head. */
export function Sheet({ id, title, aside, children, className = '' }: SheetProps) {
  const head = id ? `${id}-head` : undefined
  return (
    <section id={id} aria-labelledby={head} aria-label={head ? undefined : title} className={`scroll-mt-16 border border-rule bg-sheet ${className}`}>
      <header className="flex min-h-11 flex-wrap items-center justify-between gap-x-4 gap-y-1 border-b border-rule px-4 py-2">
        <h2 id={head} className="sheet-head">
          {title}
        </h2>
        {aside !== undefined && <div className="text-soft">{aside}</div>}
      </header>
      {children}
    </section>
  )
}

export interface SheetRowProps {
  label: string
  /** Id of the first input, so that the label points at it. */
  htmlFor?: string
  /** Unit or a short source line, under the label. */
  unit?: ReactNode
  /** The inputs, or the value of a read-only row. */
  children: ReactNode
  /** A range gauge, or a line of words in its place. */
  gauge?: ReactNode
  /** Washes the row; give the worst verdict of its findings. */
  verdict?: Verdict | null
  /** A Margin: stands beside the row, folds under it on a phone. */
  margin?: ReactNode
}

/** One ruled row: label and unit, inputs, gauge; its notes in the margin. Without a gauge the inputs take the gauge's room. */
export function SheetRow({ label, htmlFor, unit, children, gauge, verdict, margin }: SheetRowProps) {
  const wash = verdict === 'outside' ? 'wash-outside' : verdict === 'cannot-tell' ? 'wash-cannot-tell' : ''
  const Label = htmlFor ? 'label' : 'p'
  return (
    <div className={`sheet-row relative border-b border-hair last:border-b-0 ${wash}`}>
      <div className="grid gap-x-4 gap-y-2 px-4 py-3 sm:min-h-14 sm:grid-cols-[9.5rem_minmax(0,1fr)] sm:items-center lg:grid-cols-[10.25rem_13rem_minmax(0,1fr)]">
        <div className="min-w-0">
          <Label htmlFor={htmlFor} className="block font-medium">
            {label}
          </Label>
          {unit && <p className="text-xs text-soft">{unit}</p>}
        </div>
        <div className={`min-w-0 ${gauge === undefined ? 'lg:col-span-2' : ''}`}>{children}</div>
        {gauge !== undefined && <div className="min-w-0 text-soft sm:col-start-2 lg:col-start-auto">{gauge}</div>}
      </div>
      {margin}
    </div>
  )
}
