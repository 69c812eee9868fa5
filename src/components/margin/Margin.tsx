import { useContext, useEffect, useRef, useState, type ReactNode } from 'react'
import type { Finding } from '@shared/schemas/assessment.ts'
import { MarginNote, type MarginNoteProps } from './MarginNote.tsx'
import { MarginContext } from './layout.ts'

const ORDER = { outside: 0, 'cannot-tell': 1, within: 2 } as const

export interface MarginProps extends Omit<MarginNoteProps, 'finding'> {
  findings: readonly Finding[]
  children?: ReactNode
}

/**
 * The notes of one row, worst first. Inside a MarginLayout wide enough they stand in the right-hand margin beside the row
 * (pushed down where they would overlap); elsewhere, and on a phone, they fold under the row. Reading order is always the row's.
 * Two or more findings that stand within fold into one line.
 */
export function Margin({ findings, children, ...note }: MarginProps) {
  const place = useRef<HTMLDivElement>(null)
  const margin = useContext(MarginContext)
  const [open, setOpen] = useState(false)
  const empty = findings.length === 0 && !children
  useEffect(() => (empty || !place.current ? undefined : margin?.add(place.current)), [margin, empty])
  if (empty) return null

  const sorted = [...findings].sort((a, b) => ORDER[a.verdict] - ORDER[b.verdict])
  const within = sorted.filter((finding) => finding.verdict === 'within')
  const fold = within.length > 1 && !open
  const shown = fold ? sorted.filter((finding) => finding.verdict !== 'within') : sorted
  return (
    <div ref={place} data-margin className="margin-place space-y-1.5">
      {shown.map((finding) => (
        <MarginNote key={`${finding.standard} ${finding.ruleId} ${finding.processId ?? ''} ${finding.field}`} finding={finding} {...note} />
      ))}
      {within.length > 1 && (
        <button type="button" aria-expanded={open} onClick={() => setOpen(!open)} className="w-full border-l-[3px] border-l-jade bg-sheet px-3 py-1.5 text-left text-sm">
          <strong className="font-semibold">Within</strong> · {fold ? `${within.length} variables; show them` : 'fold them away'}
        </button>
      )}
      {children}
    </div>
  )
}
