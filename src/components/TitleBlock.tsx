import type { ReactNode } from 'react'
import { useTitle } from '@/hooks/title.ts'

export interface TitleCell {
  label: string
  children: ReactNode
  /** Takes more room, e.g. an e-mail address. */
  wide?: boolean
}

export interface TitleBlockProps {
  /** What the record is: "Welding procedure specification". */
  kind: string
  number: string
  revision?: string
  /** The record's own title, under the number. */
  title?: string
  cells: readonly TitleCell[]
  stamp?: ReactNode
  /** One line under the stamp: what stands in the way, or who signed when. */
  stampNote?: ReactNode
}

/** Every record opens with this: a drawing's title block, number large, then ruled cells, then the stamp. Names the browser's tab too. */
export function TitleBlock({ kind, number, revision, title, cells, stamp, stampNote }: TitleBlockProps) {
  useTitle(revision === undefined ? number : `${number} rev ${revision}`)
  const cell = 'min-w-0 border-r border-b border-ink px-3.5 pt-2.5 pb-3'
  return (
    <div className="overflow-hidden border border-ink bg-sheet">
      <div className="-mr-px -mb-px flex flex-wrap">
        <div className={`${cell} grow-[2] basis-72`}>
          <p className="cell-label">{kind}</p>
          <h1 className="flex flex-wrap items-baseline gap-x-2.5 font-narrow font-semibold">
            <span className="text-3xl">{number}</span>
            {revision !== undefined && <span className="text-xl font-medium text-soft">rev {revision}</span>}
          </h1>
          {title && <p className="mt-0.5 font-medium">{title}</p>}
        </div>
        {cells.map(({ label, children, wide }) => (
          <div key={label} className={`${cell} ${wide ? 'grow-[1.5] basis-56' : 'grow basis-36'}`}>
            <p className="cell-label">{label}</p>
            <div className="mt-1 text-[0.9375rem] break-words">{children}</div>
          </div>
        ))}
        {stamp && (
          <div className={`${cell} flex grow basis-44 flex-col items-center justify-center gap-1.5 text-center`}>
            {stamp}
            {stampNote && <p className="text-xs text-soft">{stampNote}</p>}
          </div>
        )}
      </div>
    </div>
  )
}

/** A reference in a title block's cell, e.g. a supporting record's number. */
export function Tag({ children }: { children: ReactNode }) {
  return <span className="mr-1 inline-block rounded-sm border border-rule bg-paper px-1.5 leading-6">{children}</span>
}
