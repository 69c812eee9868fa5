import { Copy, Plus, X } from 'lucide-react'
import { useEffect, useRef, type CSSProperties, type KeyboardEvent } from 'react'
import { rowHeatInput, summarizeRunSheet, type Span } from '@shared/calculations/run-sheet.ts'
import type { RunRow } from '@shared/schemas/welding.ts'
import { SHOWN_UNIT } from '@shared/units/convert.ts'
import { formatNumber } from '@shared/units/format.ts'
import type { Dimension, UnitSystem } from '@shared/units/types.ts'
import { Button } from '@/components/Button.tsx'
import { heatOf } from '@shared/calculations/joint-picture.ts'
import { Sheet } from '@/components/Sheet.tsx'
import { inputId, useSheet, useSheetField } from '@/components/variables/context.ts'
import { GridCell } from '@/components/variables/GridCell.tsx'
import { LAYERS, wordOf } from '@/components/variables/options.ts'
import { caretOf, moveFrom } from '@/components/variables/pass-grid.ts'
import { addRow, cellText, copyLastRow, MAX_ROWS, runColumns, writeCell, writePass, type RowReading, type RunColumn } from '../run-grid.ts'
import { useCouponContent } from './coupon-sheet.ts'

const HEATS = ['bg-heat-1', 'bg-heat-2', 'bg-heat-3', 'bg-heat-4'] as const
const fresh = () => crypto.randomUUID().slice(0, 8)

/** A span in the shown unit: one figure where both ends agree. */
export function spanText({ min, max }: Span, dimension: Dimension, system: UnitSystem): string {
  const unit = SHOWN_UNIT[system][dimension]
  const [low, high] = [formatNumber(min, dimension, unit, true), formatNumber(max, dimension, unit, true)]
  return low === high ? low : `${low}–${high}`
}

/** The run sheet: a row a pass, what was read typed in, heat input and travel computed beside it. */
export function RunSheet() {
  const { control, system } = useSheet()
  const content = useCouponContent()
  const { processes } = content.variables
  const summaries = summarizeRunSheet(content.runSheet, processes).filter(({ passes }) => passes > 0)
  const aside = content.runSheet.length === 0 ? 'no pass yet' : `${content.runSheet.length} ${content.runSheet.length === 1 ? 'pass' : 'passes'}`
  return (
    <Sheet id="run-sheet" title="Run sheet" aside={aside}>
      {control ? <Typed /> : <Rows rows={content.runSheet} />}
      {summaries.length > 0 && (
        <dl className="grid gap-x-8 gap-y-2 border-t border-rule bg-paper px-4 py-3 sm:grid-cols-2">
          {summaries.map(({ processId, heatInput, complete, maxInterpass, missing }) => (
            <div key={processId}>
              <dt className="cell-label">{processes.find(({ id }) => id === processId)?.process ?? 'Process not stated'}</dt>
              <dd>
                {heatInput ? (
                  <>
                    Heat input <strong className="font-semibold">{spanText(heatInput, 'heatInput', system)}</strong> <span className="text-soft">{SHOWN_UNIT[system].heatInput}</span>
                    {!complete && <span className="text-straw-deep">, not of every pass</span>}
                  </>
                ) : (
                  <span className="text-straw-deep">Heat input can’t be told yet</span>
                )}
                {maxInterpass !== null && (
                  <>
                    {' · '}hottest interpass <strong className="font-semibold">{formatNumber(maxInterpass, 'temperature', SHOWN_UNIT[system].temperature)}</strong> <span className="text-soft">{SHOWN_UNIT[system].temperature}</span>
                  </>
                )}
              </dd>
              {heatInput && processes.find(({ id }) => id === processId)?.electrical.waveformControlled === null && <dd className="text-sm text-straw-deep">Whether the waveform is controlled is not stated; volts times amps holds only if it is not.</dd>}
              {missing.length > 0 && <dd className="text-sm text-soft">Missing: {missing.slice(0, 4).join('; ')}{missing.length > 4 ? `, and ${missing.length - 4} more` : ''}.</dd>}
            </div>
          ))}
        </dl>
      )}
    </Sheet>
  )
}

function Typed() {
  const { value: rows, set, error } = useSheetField<RunRow[]>('runSheet')
  const { processes } = useCouponContent().variables
  // A cell is read when it is left, just before a key adds a row: both changes must build on one another.
  const latest = useRef(rows)
  useEffect(() => {
    latest.current = rows
  }, [rows])
  const list = useRef<HTMLDivElement>(null)
  const put = (next: RunRow[]) => {
    latest.current = next
    set(next)
  }
  const focus = (row: number, column: number) => requestAnimationFrame(() => list.current?.querySelector<HTMLElement>(`[data-cell="run.${row}.${column}"]`)?.focus())
  const write = (index: number, read: (row: RunRow) => RowReading): string | null => {
    const row = latest.current[index]
    const reading = row && read(row)
    if (!reading) return null
    if (!reading.ok) return reading.message
    put(latest.current.map((one, at) => (at === index ? reading.row : one)))
    return null
  }
  const add = () => {
    put(addRow(latest.current, processes, fresh()))
    focus(latest.current.length - 1, 2)
  }
  const copy = () => {
    put(copyLastRow(latest.current, fresh()))
    focus(latest.current.length - 1, 2)
  }
  return (
    <div id={inputId('runSheet')} tabIndex={-1} ref={list}>
      <Rows rows={rows} edit={{ write, focus, add: () => put(addRow(latest.current, processes, fresh())), change: (index, part) => put(latest.current.map((one, at) => (at === index ? { ...one, ...part } : one))), remove: (index) => put(latest.current.filter((_row, at) => at !== index)) }} />
      {error && (
        <p role="alert" className="px-4 pt-2 text-sm font-medium text-oxide">
          {error}
        </p>
      )}
      <div className="no-print flex flex-wrap items-center gap-2 px-4 py-3 max-sm:[&_button]:min-h-12 max-sm:[&_button]:grow max-sm:[&_button]:text-lg">
        {rows.length < MAX_ROWS && (
          <>
            <Button kind={rows.length === 0 ? 'primary' : 'secondary'} icon={<Plus size={16} aria-hidden="true" />} onClick={add}>
              {rows.length === 0 ? 'Log the first pass' : 'Next pass'}
            </Button>
            {rows.length > 0 && (
              <Button icon={<Copy size={15} aria-hidden="true" />} onClick={copy}>
                Copy the last row
              </Button>
            )}
          </>
        )}
        <p className="text-sm text-soft max-sm:hidden">{rows.length === 0 ? 'Amps, volts and travel as read; length and arc time give the travel where it was not read.' : 'Enter goes down and adds a pass at the end.'}</p>
      </div>
    </div>
  )
}

interface Edit {
  write: (index: number, read: (row: RunRow) => RowReading) => string | null
  focus: (row: number, column: number) => void
  add: () => void
  change: (index: number, part: Partial<RunRow>) => void
  remove: (index: number) => void
}

const LAYOUT = 'grid grid-cols-3 gap-x-2 gap-y-1.5 px-4 sm:grid-cols-5 xl:grid-cols-(--run) xl:gap-x-1.5'

function Rows({ rows, edit }: { rows: readonly RunRow[]; edit?: Edit }) {
  const { system } = useSheet()
  const { processes } = useCouponContent().variables
  const columns = runColumns(processes, rows)
  const template = { '--run': `3.25rem minmax(4.75rem,1.2fr) repeat(${columns.length},minmax(0,1fr)) 5.5rem ${edit ? '2rem' : '0'}` } as CSSProperties
  if (rows.length === 0) return edit ? null : <p className="px-4 py-3 text-soft">No pass was logged.</p>
  return (
    <div style={template}>
      <div aria-hidden="true" className={`${LAYOUT} border-b border-hair py-2 text-sm text-soft max-xl:hidden`}>
        <p>Pass</p>
        <p>Layer</p>
        {columns.map(({ id, label, dimension }) => (
          <p key={id} className="leading-4">
            {label} <span className="block text-xs">{SHOWN_UNIT[system][dimension]}</span>
          </p>
        ))}
        <p className="text-right leading-4">
          Heat input <span className="block text-xs">{SHOWN_UNIT[system].heatInput}</span>
        </p>
      </div>
      <ol aria-label="Passes">
        {rows.map((row, index) => (
          <PassRow key={row.id} row={row} index={index} count={rows.length} columns={columns} edit={edit} />
        ))}
      </ol>
    </div>
  )
}

function PassRow({ row, index, count, columns, edit }: { row: RunRow; index: number; count: number; columns: readonly RunColumn[]; edit: Edit | undefined }) {
  const { system } = useSheet()
  const { processes } = useCouponContent().variables
  const block = processes.find(({ id }) => id === row.processId)
  // Whether the waveform is controlled, where it is not stated, is said once under the sheet.
  const { heatInput, travelSpeed, missing, doubts, how } = rowHeatInput(row, block?.electrical.waveformControlled ?? false)
  const name = `Pass ${row.pass}`
  const onKey = (event: KeyboardEvent<HTMLElement>, column: number) => {
    const box = event.target
    if (!edit || (box instanceof HTMLSelectElement && event.key !== 'Enter')) return
    const caret = box instanceof HTMLInputElement ? caretOf(box) : { atStart: true, atEnd: true }
    const target = moveFrom(event.key, index, column, count, caret, columns.length + 2)
    if (!target) return
    event.preventDefault()
    if (box instanceof HTMLElement) box.blur()
    if (target.add) edit.add()
    edit.focus(target.row, target.column)
  }
  const computedTravel = travelSpeed && !row.travelSpeed ? `Travel ${spanText(travelSpeed, 'travelSpeed', system)} ${SHOWN_UNIT[system].travelSpeed} from length and arc time.` : null
  const about = [computedTravel, ...doubts, ...(heatInput ? [] : missing.length > 0 ? [`Heat input needs ${missing.join(' and ')}.`] : [])].filter((one) => one !== null)
  const cell = 'min-w-0 max-sm:[&_.box]:min-h-12 max-sm:[&_.box]:text-lg xl:[&_.box]:px-1.5'
  return (
    <li className="sheet-row border-b border-hair py-2.5 last:border-b-0" aria-label={name}>
      <div className={LAYOUT}>
        <div className={`${cell} flex items-end gap-1.5 max-xl:items-end`}>
          <span aria-hidden="true" className={`h-9 w-1.5 shrink-0 max-sm:h-12 ${HEATS[heatOf(index, count)]}`} />
          <div className="min-w-0 grow">
            <CellLabel label="Pass" />
            {edit ? <GridCell at={`run.${index}.0`} label={`${name}, number`} text={row.pass} write={(text) => edit.write(index, (one) => writePass(one, text))} onKey={(event) => onKey(event, 0)} className="font-semibold" /> : <p className="py-1 text-lg font-semibold">{row.pass}</p>}
          </div>
        </div>
        <div className={cell}>
          <CellLabel label="Layer" />
          {edit ? (
            <select data-cell={`run.${index}.1`} aria-label={`${name}, layer`} className="box" value={row.layer ?? ''} onChange={(event) => edit.change(index, { layer: LAYERS.some(({ value }) => value === event.target.value) ? (event.target.value as RunRow['layer']) : null })} onKeyDown={(event) => onKey(event, 1)}>
              <option value="">–</option>
              {LAYERS.map(({ value, label }) => (
                <option key={value} value={value}>
                  {label}
                </option>
              ))}
            </select>
          ) : (
            <p className="py-1.5">{row.layer ? wordOf(LAYERS, row.layer) : '–'}</p>
          )}
        </div>
        {columns.map((column, at) => (
          <div key={column.id} className={cell}>
            <CellLabel label={column.label} unit={SHOWN_UNIT[system][column.dimension]} />
            {edit ? (
              <GridCell at={`run.${index}.${at + 2}`} label={`${name}, ${column.label.toLowerCase()}`} text={cellText(row, column, system)} write={(text) => edit.write(index, (one) => writeCell(one, column, text, system))} onKey={(event) => onKey(event, at + 2)} />
            ) : (
              <p className="py-1.5 tabular-nums">{cellText(row, column, system) || '–'}</p>
            )}
          </div>
        ))}
        <div className="min-w-0 self-end sm:col-span-4 xl:col-span-1 xl:text-right" title={how ?? undefined}>
          <CellLabel label="Heat input" unit={SHOWN_UNIT[system].heatInput} />
          <p data-heat-input className={`py-1 font-narrow text-xl leading-7 font-semibold whitespace-nowrap tabular-nums ${heatInput ? '' : 'text-soft'}`}>{heatInput ? spanText(heatInput, 'heatInput', system) : '–'}</p>
        </div>
        {edit && (
          <div className="col-start-3 self-end justify-self-end sm:col-start-5 xl:col-start-auto">
            <button type="button" aria-label={`Remove pass ${row.pass}`} className="flex size-9 items-center justify-center rounded text-soft hover:text-ink max-sm:size-12" onClick={() => edit.remove(index)}>
              <X size={16} aria-hidden="true" />
            </button>
          </div>
        )}
      </div>
      {(about.length > 0 || (edit && processes.length > 1) || (!edit && row.note)) && (
        <div className="mt-1.5 flex flex-wrap items-center gap-x-4 gap-y-1 px-4 text-sm text-soft xl:pl-[4.75rem]">
          {edit && processes.length > 1 && (
            <select aria-label={`${name}, process`} className="box w-auto! min-w-28" value={row.processId} onChange={(event) => edit.change(index, { processId: event.target.value })}>
              {!block && <option value={row.processId}>Choose the process</option>}
              {processes.map(({ id, process }, place) => (
                <option key={id} value={id}>
                  {process ?? `Process ${place + 1}`}
                </option>
              ))}
            </select>
          )}
          {!edit && processes.length > 1 && block?.process && <p>{block.process}</p>}
          {!edit && row.note && <p>{row.note}</p>}
          {about.map((one) => (
            <p key={one} className={doubts.includes(one) ? 'text-straw-deep' : ''}>
              {one}
            </p>
          ))}
        </div>
      )}
    </li>
  )
}

function CellLabel({ label, unit }: { label: string; unit?: string }) {
  return (
    <p aria-hidden="true" className="text-xs whitespace-nowrap text-soft xl:hidden">
      {label} {unit}
    </p>
  )
}
