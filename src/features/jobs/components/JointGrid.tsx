import { Plus, Search, X } from 'lucide-react'
import { useEffect, useRef, useState, type CSSProperties, type KeyboardEvent } from 'react'
import { Link } from 'react-router-dom'
import { SHOWN_UNIT } from '@shared/units/convert.ts'
import { Button } from '@/components/Button.tsx'
import { Tag } from '@/components/TitleBlock.tsx'
import { GridCell } from '@/components/variables/GridCell.tsx'
import { caretOf, moveFrom } from '@/components/variables/pass-grid.ts'
import { useUnits } from '@/hooks/units.ts'
import { addJoint, cellText, JOINT_COLUMNS, MAX_JOINTS, writeCell, type JointColumn, type JointRow } from '../joint-grid.ts'
import { FindProcedures } from './FindProcedures.tsx'

export interface JointGridProps {
  rows: readonly JointRow[]
  /** Absent where the joints are only read. */
  onChange?: ((next: JointRow[]) => void) | undefined
  onAssign: (key: string, procedure: { revisionId: string; name: string } | null) => Promise<void>
  /** What is shown is what the server holds. */
  saved: boolean
}

const fresh = () => crypto.randomUUID()
const LAYOUT = 'grid grid-cols-2 gap-x-2 gap-y-2 px-4 sm:grid-cols-4 xl:grid-cols-(--joint) xl:gap-x-1.5'

/** The joints, a row each: arrows and Enter move, Enter at the end adds one; on a phone each stacks with its labels. */
export function JointGrid({ rows, onChange, onAssign, saved }: JointGridProps) {
  const { system } = useUnits()
  const [asking, setAsking] = useState<string | null>(null)
  const list = useRef<HTMLDivElement>(null)
  // A cell is read when it is left, just before a key adds a row: both changes must build on one another.
  const latest = useRef(rows)
  useEffect(() => {
    latest.current = rows
  }, [rows])
  const put = (next: JointRow[]) => {
    latest.current = next
    onChange?.(next)
  }
  const focus = (row: number, column: number) => requestAnimationFrame(() => list.current?.querySelector<HTMLElement>(`[data-cell="joint.${row}.${column}"]`)?.focus())
  const write = (index: number, column: JointColumn, text: string): string | null => {
    const row = latest.current[index]
    const reading = row && writeCell(row, column, text, system)
    if (!reading) return null
    if (!reading.ok) return reading.message
    put(latest.current.map((one, at) => (at === index ? reading.row : one)))
    return null
  }
  const onKey = (event: KeyboardEvent<HTMLElement>, row: number, column: number) => {
    const box = event.target
    if (box instanceof HTMLSelectElement && event.key !== 'Enter') return
    const caret = box instanceof HTMLInputElement ? caretOf(box) : { atStart: true, atEnd: true }
    const target = moveFrom(event.key, row, column, rows.length, caret, JOINT_COLUMNS.length)
    if (!target || (target.add && rows.length >= MAX_JOINTS)) return
    event.preventDefault()
    if (box instanceof HTMLElement) box.blur()
    if (target.add) put(addJoint(latest.current, fresh()))
    focus(target.row, target.column)
  }
  const add = () => {
    put(addJoint(latest.current, fresh()))
    focus(latest.current.length - 1, 1)
  }
  const template = { '--joint': `${JOINT_COLUMNS.map(({ width }) => width).join(' ')} minmax(11.5rem,1fr) ${onChange ? '2rem' : '0'}` } as CSSProperties
  return (
    <div ref={list} style={template}>
      <div aria-hidden="true" className={`${LAYOUT} border-b border-ink py-2 font-medium max-xl:hidden`}>
        {JOINT_COLUMNS.map((column) => (
          <p key={column.id}>
            {column.label} {column.kind === 'interval' && <span className="font-normal text-soft">{SHOWN_UNIT[system][column.dimension]}</span>}
          </p>
        ))}
        <p>Procedure</p>
      </div>
      <ul aria-label="Joints">
        {rows.map((row, index) => (
          <li key={row.key} aria-label={`Joint ${row.number}`} className="sheet-row relative border-b border-hair py-2 last:border-b-0">
            <div className={LAYOUT}>
              {JOINT_COLUMNS.map((column, at) => (
                <div key={column.id} className={`min-w-0 ${column.id === 'mark' ? 'max-xl:col-span-2' : column.id === 'number' ? 'max-xl:col-span-full max-xl:max-w-40' : ''} xl:[&_.box]:px-1.5`}>
                  <p aria-hidden="true" className="text-xs text-soft xl:hidden">
                    {column.label} {column.kind === 'interval' && SHOWN_UNIT[system][column.dimension]}
                  </p>
                  {onChange ? (
                    column.kind === 'choice' ? (
                      <select data-cell={`joint.${index}.${at}`} aria-label={`Joint ${row.number}, ${column.label.toLowerCase()}`} className="box" value={cellText(row, column, system)} onChange={(event) => write(index, column, event.target.value)} onKeyDown={(event) => onKey(event, index, at)}>
                        {column.empty !== undefined && <option value="">{column.empty}</option>}
                        {column.options.map(({ value, label }) => (
                          <option key={value} value={value}>
                            {label}
                          </option>
                        ))}
                      </select>
                    ) : (
                      <GridCell at={`joint.${index}.${at}`} label={`Joint ${row.number}, ${column.label.toLowerCase()}`} text={cellText(row, column, system)} write={(text) => write(index, column, text)} onKey={(event) => onKey(event, index, at)} className={column.id === 'number' ? 'font-semibold' : ''} />
                    )
                  ) : (
                    <p className={`py-1 break-words ${column.id === 'number' ? 'text-lg font-semibold' : ''}`}>{(column.kind === 'choice' ? column.options.find(({ value }) => value === row[column.id])?.label : cellText(row, column, system)) || <span className="text-soft">–</span>}</p>
                  )}
                </div>
              ))}
              <div className="col-span-2 flex min-w-0 flex-wrap items-center gap-x-2 gap-y-1 sm:col-span-3 xl:col-span-1">
                {row.revisionId && (
                  <Link to={`/shop/${row.revisionId}${row.id ? `?joint=${row.id}` : ''}`} title="Open in the shop view">
                    <Tag>{row.procedureNumber ?? 'assigned'}</Tag>
                  </Link>
                )}
                <Button kind="quiet" aria-label={`${row.revisionId ? 'Others' : 'Find procedures'} for joint ${row.number}`} aria-expanded={asking === row.key} icon={<Search size={14} aria-hidden="true" />} onClick={() => setAsking(asking === row.key ? null : row.key)}>
                  {row.revisionId ? 'Others' : 'Find procedures'}
                </Button>
              </div>
              {onChange && (
                <button type="button" aria-label={`Remove joint ${row.number}`} className="flex size-9 items-center justify-center justify-self-end rounded text-soft hover:text-ink max-xl:absolute max-xl:top-3 max-xl:right-2 max-xl:size-12" onClick={() => put(rows.filter((one) => one.key !== row.key))}>
                  <X size={16} aria-hidden="true" />
                </button>
              )}
            </div>
            {asking === row.key && <FindProcedures joint={row} saved={saved} onAssign={onChange ? (procedure) => onAssign(row.key, procedure) : undefined} />}
          </li>
        ))}
      </ul>
      {rows.length === 0 && <p className="px-4 py-4 text-soft">{onChange ? 'List the joints as the drawing names them: number, metals, thickness, position. The procedures that cover each are found from that.' : 'No joint is listed yet.'}</p>}
      {onChange && rows.length < MAX_JOINTS && (
        <div className="no-print flex flex-wrap items-center gap-3 border-t border-hair px-4 py-3">
          <Button kind={rows.length === 0 ? 'primary' : 'secondary'} icon={<Plus size={15} aria-hidden="true" />} onClick={add}>
            {rows.length === 0 ? 'First joint' : 'Joint'}
          </Button>
          <p className="text-sm text-soft max-sm:hidden">Arrows and Enter move between cells; Enter in the last row adds one. Ctrl+S saves.</p>
        </div>
      )}
    </div>
  )
}
