import { Plus, X } from 'lucide-react'
import { useEffect, useRef, useState, type ClipboardEvent, type KeyboardEvent } from 'react'
import type { Pass } from '@shared/schemas/welding.ts'
import { SHOWN_UNIT } from '@shared/units/convert.ts'
import { Button } from '@/components/Button.tsx'
import { GridCell } from './GridCell.tsx'
import { inputId, useSheet, useSheetField } from './context.ts'
import { LAYERS } from './options.ts'
import { addPass, caretOf, cellText, MAX_PASSES, moveFrom, PASS_COLUMNS, pasteCells, writeCell, type GridColumn } from './pass-grid.ts'

/** The build-up, a row a pass: arrows move, Enter goes down and adds a pass at the end, cells paste from a spreadsheet. */
export function PassGrid({ path, label }: { path: string; label: string }) {
  const { system } = useSheet()
  const { value: passes, set, error } = useSheetField<Pass[]>(`variables.${path}`)
  const [problems, setProblems] = useState<string[]>([])
  const grid = useRef<HTMLTableSectionElement>(null)
  // A cell is read when it is left, just before a key adds a row: both changes must build on one another.
  const latest = useRef(passes)
  useEffect(() => {
    latest.current = passes
  }, [passes])
  const put = (next: Pass[]) => {
    latest.current = next
    set(next)
  }
  const focus = (row: number, column: number) => requestAnimationFrame(() => grid.current?.querySelector<HTMLElement>(`[data-cell="${row}.${column}"]`)?.focus())

  const write = (row: number, column: GridColumn, text: string): string | null => {
    const pass = latest.current[row]
    if (!pass) return null
    const reading = writeCell(pass, column, text, system)
    if (!reading.ok) return reading.message
    put(latest.current.map((one, at) => (at === row ? reading.pass : one)))
    return null
  }
  const onKey = (event: KeyboardEvent<HTMLElement>, row: number, column: number) => {
    const box = event.target
    const caret = box instanceof HTMLInputElement ? caretOf(box) : { atStart: true, atEnd: true }
    if (box instanceof HTMLSelectElement && event.key.startsWith('Arrow') && !event.altKey && (event.key === 'ArrowUp' || event.key === 'ArrowDown')) return
    const target = moveFrom(event.key, row, column, passes.length, caret)
    if (!target) return
    event.preventDefault()
    if (box instanceof HTMLElement) box.blur()
    if (target.add) put(addPass(latest.current))
    focus(target.row, target.column)
  }
  const onPaste = (event: ClipboardEvent, row: number, column: number) => {
    const text = event.clipboardData.getData('text/plain')
    if (!/[\t\n]/.test(text.replace(/\r?\n$/, ''))) return
    event.preventDefault()
    const pasted = pasteCells(passes, row, column, text, system)
    put(pasted.passes)
    setProblems(pasted.problems)
  }
  const add = () => {
    put(addPass(latest.current))
    focus(passes.length, 0)
  }

  return (
    <div id={inputId(path)} tabIndex={-1} className="space-y-2">
      {passes.length > 0 && (
        <div className="-mx-1 overflow-x-auto px-1 pb-1">
          <table aria-label={label} className="w-full min-w-[50rem] table-fixed border-collapse text-left">
            <thead>
              <tr className="text-soft">
                {PASS_COLUMNS.map(({ id, label: head, dimension }) => (
                  <th key={id} scope="col" className={`pr-2 pb-1 text-sm font-medium whitespace-nowrap ${id === 'number' ? 'w-18' : id === 'layer' ? 'w-28' : ''}`}>
                    {head} {dimension && <span className="font-normal">{SHOWN_UNIT[system][dimension]}</span>}
                  </th>
                ))}
                <td className="w-9" />
              </tr>
            </thead>
            <tbody ref={grid}>
              {passes.map((pass, row) => (
                <tr key={row}>
                  {PASS_COLUMNS.map((column, at) => (
                    <td key={column.id} className="pr-1.5 pb-1.5 align-top">
                      {column.id === 'layer' ? (
                        <select data-cell={`${row}.${at}`} aria-label={`Pass ${pass.number}, layer`} className="box min-w-24" value={pass.layer ?? ''} onChange={(event) => write(row, column, event.target.value)} onKeyDown={(event) => onKey(event, row, at)}>
                          <option value="">Not stated</option>
                          {LAYERS.map((option) => (
                            <option key={option.value} value={option.value}>
                              {option.label}
                            </option>
                          ))}
                        </select>
                      ) : (
                        <GridCell at={`${row}.${at}`} label={`Pass ${pass.number}, ${column.label.toLowerCase()}`} text={cellText(pass, column, system)} write={(text) => write(row, column, text)} onKey={(event) => onKey(event, row, at)} onPaste={(event) => onPaste(event, row, at)} />
                      )}
                    </td>
                  ))}
                  <td className="w-8 pb-1.5 align-top">
                    <button type="button" aria-label={`Remove pass ${pass.number}`} className="flex size-9 items-center justify-center rounded text-soft hover:text-ink" onClick={() => put(passes.filter((_, index) => index !== row))}>
                      <X size={15} aria-hidden="true" />
                    </button>
                  </td>
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      )}
      {[...problems, ...(error ? [error] : [])].map((problem) => (
        <p key={problem} role="alert" className="text-sm font-medium text-oxide">
          {problem}
        </p>
      ))}
      <div className="flex flex-wrap items-center gap-3">
        {passes.length < MAX_PASSES && (
          <Button icon={<Plus size={14} aria-hidden="true" />} onClick={add}>
            {passes.length === 0 ? 'First pass' : 'Pass'}
          </Button>
        )}
        <p className="text-sm text-soft">Enter goes to the next pass and adds one at the end. Cells paste from a spreadsheet.</p>
      </div>
    </div>
  )
}
