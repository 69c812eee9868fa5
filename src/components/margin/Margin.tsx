import { useContext, useEffect, useRef, useState, type ReactNode } from 'react'
import type { Finding } from '@shared/schemas/assessment.ts'
import { MarginNote, type MarginNoteProps } from './MarginNote.tsx'
import { MarginContext } from './layout.ts'

const ORDER = { outside: 0, 'cannot-tell': 1, within: 2 } as const

export interface MarginProps extends Omit<MarginNoteProps, 'finding'> {
  findings: readonly Finding[]
  children?: ReactNode
}

const nameOf = ({ standard, ruleId, processId, field }: Finding) => `${standard} ${ruleId} ${processId ?? ''} ${field}`
/** A rule may say several things of one field; each keeps its place, so that an open note stays open while its sentence changes. */
const keyOf = (finding: Finding, before: readonly Finding[]) => `${nameOf(finding)} ${before.filter((one) => nameOf(one) === nameOf(finding)).length}`

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
  // What a note says may change while its row is out of sight, where no size is observed.
  useEffect(() => margin?.ask(), [margin, findings, open])
  if (empty) return null

  const sorted = [...findings].sort((a, b) => ORDER[a.verdict] - ORDER[b.verdict])
  const within = sorted.filter((finding) => finding.verdict === 'within')
  const fold = within.length > 1 && !open
  const shown = fold ? sorted.filter((finding) => finding.verdict !== 'within') : sorted
  return (
    <div ref={place} data-margin className="margin-place space-y-1.5">
      {shown.map((finding, index) => (
        <MarginNote key={keyOf(finding, shown.slice(0, index))} finding={finding} {...note} />
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
