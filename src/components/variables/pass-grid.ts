/** The build-up of passes as a grid of cells that are typed, moved in and pasted into. Pure. */
import type { Interval, Quantity } from '@shared/schemas/common.ts'
import type { Pass } from '@shared/schemas/welding.ts'
import { SHOWN_UNIT } from '@shared/units/convert.ts'
import { formatInterval, formatQuantity } from '@shared/units/format.ts'
import { parseInterval, parseQuantity } from '@shared/units/parse.ts'
import type { Dimension, UnitSystem } from '@shared/units/types.ts'
import { LAYERS } from './options.ts'

export type PassColumn = keyof Pass
export interface GridColumn {
  id: PassColumn
  label: string
  dimension?: Dimension
}
export const PASS_COLUMNS: readonly GridColumn[] = [
  { id: 'number', label: 'Pass' },
  { id: 'layer', label: 'Layer' },
  { id: 'fillerDiameter', label: 'Size', dimension: 'length' },
  { id: 'current', label: 'Amps', dimension: 'current' },
  { id: 'voltage', label: 'Volts', dimension: 'voltage' },
  { id: 'wireFeed', label: 'Wire feed', dimension: 'wireFeed' },
  { id: 'travelSpeed', label: 'Travel', dimension: 'travelSpeed' },
  { id: 'beadArea', label: 'Bead', dimension: 'area' },
]
/** Fields of a pass that are edited in the sequence beside the drawing. */
export const SEQUENCE_FIELDS: readonly PassColumn[] = ['side', 'order']
const isSingle = (id: PassColumn) => id === 'fillerDiameter' || id === 'beadArea'
export const MAX_PASSES = 200

const bare = (text: string, unit: string) => (unit !== '' && text.endsWith(` ${unit}`) ? text.slice(0, -unit.length - 1) : text)

/** What a cell shows of a measured value: the figure without the unit that stands in the column's head. */
export const quantityText = (value: Quantity | null, dimension: Dimension, system: UnitSystem): string => (value ? bare(formatQuantity(value, dimension, system).text, SHOWN_UNIT[system][dimension]) : '')
export const intervalText = (value: Interval | null, dimension: Dimension, system: UnitSystem): string => (value ? bare(formatInterval(value, dimension, system).text, SHOWN_UNIT[system][dimension]) : '')

type Read<T> = { ok: true; value: T | null } | { ok: false; message: string }
/** A cell with one measured value; an empty one is null. `where` opens the message: "Pass 2, size: ". */
export function readQuantityCell(text: string, dimension: Dimension, where: string, system: UnitSystem): Read<Quantity> {
  if (text.trim() === '') return { ok: true, value: null }
  const reading = parseQuantity(text.trim(), dimension, system)
  return reading.ok ? { ok: true, value: reading.quantity } : { ok: false, message: where + reading.message }
}

/** A cell with a figure or a range of them. */
export function readIntervalCell(text: string, dimension: Dimension, where: string, system: UnitSystem): Read<Interval> {
  if (text.trim() === '') return { ok: true, value: null }
  const reading = parseInterval(text.trim(), dimension, system)
  if (!reading.ok) return { ok: false, message: where + reading.message }
  const { min, max, all } = reading.interval
  if (all) return { ok: false, message: `${where}"all" does not apply here. Write a figure, or a range like 18-22.` }
  if (min && max && min.si > max.si) return { ok: false, message: `${where}the lower figure, ${min.typed}, is above the upper, ${max.typed}.` }
  return { ok: true, value: reading.interval }
}

/** What a cell shows: the figure without the unit that stands in the column's head. */
export function cellText(pass: Pass, { id, dimension }: GridColumn, system: UnitSystem): string {
  const value = pass[id] ?? null
  if (value === null) return ''
  if (!dimension) return id === 'layer' ? (LAYERS.find((one) => one.value === value)?.label ?? '') : pass.number
  return isSingle(id) ? quantityText(value as Quantity, dimension, system) : intervalText(value as Interval, dimension, system)
}

export type CellReading = { ok: true; pass: Pass } | { ok: false; message: string }

/** A pass with one cell typed anew; or what is wrong with the text, in a sentence. */
export function writeCell(pass: Pass, { id, dimension, label }: GridColumn, text: string, system: UnitSystem): CellReading {
  const typed = text.trim()
  const where = `Pass ${pass.number}, ${label.toLowerCase()}: `
  if (id === 'number') return typed !== '' && typed.length <= 12 ? { ok: true, pass: { ...pass, number: typed } } : { ok: false, message: 'Number the pass with 1 to 12 characters, e.g. 3 or 2-4.' }
  if (typed === '') return { ok: true, pass: { ...pass, [id]: null } }
  if (id === 'layer') {
    const layer = LAYERS.find((one) => one.label.toLowerCase() === typed.toLowerCase() || one.value === typed)
    return layer ? { ok: true, pass: { ...pass, layer: layer.value as Pass['layer'] } } : { ok: false, message: `${where}"${typed}" is not a layer. Choose ${LAYERS.map((one) => one.label.toLowerCase()).join(', ')}.` }
  }
  if (!dimension) return { ok: false, message: `${where}this cell can't be written.` }
  const reading = isSingle(id) ? readQuantityCell(typed, dimension, where, system) : readIntervalCell(typed, dimension, where, system)
  return reading.ok ? { ok: true, pass: { ...pass, [id]: reading.value } } : reading
}

/** The number after the last pass: 4 after 3, 5 after "2-4"; where it can't be told, the count plus one. */
export function nextPassNumber(numbers: readonly string[]): string {
  const last = /(\d+)\s*$/.exec(numbers.at(-1) ?? '')?.[1]
  return String(last ? Number(last) + 1 : numbers.length + 1)
}

/** A further pass: numbered on, with layer and size of the one before. */
export const addPass = (passes: readonly Pass[]): Pass[] => {
  const last = passes.at(-1)
  return [...passes, { number: nextPassNumber(passes.map(({ number }) => number)), layer: last?.layer === 'root' ? 'fill' : (last?.layer ?? 'root'), fillerDiameter: last?.fillerDiameter ?? null, current: null, voltage: null, wireFeed: null, travelSpeed: null }]
}

/**
 * Cells copied from a spreadsheet (tabs and line ends), written from one cell on; rows are added as needed.
 * @returns the passes with what could be read, and a sentence for each cell that could not
 */
export function pasteCells(passes: readonly Pass[], row: number, column: number, text: string, system: UnitSystem): { passes: Pass[]; problems: string[] } {
  const lines = text.replace(/\r/g, '').replace(/\n$/, '').split('\n')
  let grid = [...passes]
  const problems: string[] = []
  lines.forEach((line, down) => {
    const at = row + down
    if (at >= MAX_PASSES) {
      if (at === MAX_PASSES) problems.push(`A procedure holds at most ${MAX_PASSES} passes; what was beyond is left out.`)
      return
    }
    while (grid.length <= at) grid = addPass(grid)
    line.split('\t').forEach((cell, across) => {
      const target = PASS_COLUMNS[column + across]
      const pass = grid[at]
      if (!target || !pass) return
      const reading = writeCell(pass, target, cell, system)
      if (reading.ok) grid[at] = reading.pass
      else problems.push(reading.message)
    })
  })
  return { passes: grid, problems }
}

/** Where the caret stands in a cell. A cell that is selected whole, as it is when moved into, lets go at either side. */
export function caretOf({ selectionStart, selectionEnd, value }: Pick<HTMLInputElement, 'selectionStart' | 'selectionEnd' | 'value'>): { atStart: boolean; atEnd: boolean } {
  const whole = selectionStart === 0 && selectionEnd === value.length
  return { atStart: whole || selectionEnd === 0, atEnd: whole || selectionStart === value.length }
}

/** The cell that a key leads to; null when the key stays in its text. */
export function moveFrom(key: string, row: number, column: number, rows: number, caret: { atStart: boolean; atEnd: boolean }, columns = PASS_COLUMNS.length): { row: number; column: number; add?: true } | null {
  if (key === 'ArrowUp') return row > 0 ? { row: row - 1, column } : null
  if (key === 'ArrowDown') return row < rows - 1 ? { row: row + 1, column } : null
  if (key === 'Enter') return row < rows - 1 ? { row: row + 1, column } : rows < MAX_PASSES ? { row: rows, column, add: true } : null
  if (key === 'ArrowLeft' && caret.atStart) return column > 0 ? { row, column: column - 1 } : null
  if (key === 'ArrowRight' && caret.atEnd) return column < columns - 1 ? { row, column: column + 1 } : null
  return null
}
