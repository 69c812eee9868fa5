/** The run sheet as cells: what each shows, how a text is read into it, and how rows follow one another. Pure. */
import type { Interval, Quantity } from '@shared/schemas/common.ts'
import { runRowSchema, type ProcessBlock, type RunRow } from '@shared/schemas/welding.ts'
import type { Dimension, UnitSystem } from '@shared/units/types.ts'
import { intervalText, nextPassNumber, quantityText, readIntervalCell, readQuantityCell } from '@/components/variables/pass-grid.ts'

type Measured = 'fillerDiameter' | 'current' | 'voltage' | 'wireFeed' | 'travelSpeed' | 'length' | 'arcTime' | 'interpass' | 'instantaneousEnergy'
export interface RunColumn {
  id: Measured
  label: string
  dimension: Dimension
  kind: 'quantity' | 'interval'
}

const column = (id: Measured, label: string, dimension: Dimension, kind: RunColumn['kind'] = 'interval'): RunColumn => ({ id, label, dimension, kind })
const COLUMNS: readonly RunColumn[] = [
  column('fillerDiameter', 'Size', 'length', 'quantity'),
  column('current', 'Amps', 'current'),
  column('voltage', 'Volts', 'voltage'),
  column('wireFeed', 'Wire feed', 'wireFeed'),
  column('travelSpeed', 'Travel', 'travelSpeed'),
  column('length', 'Length', 'length', 'quantity'),
  column('arcTime', 'Arc time', 'duration', 'quantity'),
  column('interpass', 'Interpass', 'temperature', 'quantity'),
]
const ENERGY = column('instantaneousEnergy', 'Energy', 'energy', 'quantity')
export const MAX_ROWS = 400

/** The columns that arise for these processes: wire feed only for wire, energy only where the waveform is controlled; what is filled stays. */
export function runColumns(blocks: readonly ProcessBlock[], rows: readonly RunRow[]): RunColumn[] {
  const used = (id: Measured) => rows.some((row) => row[id] !== null)
  const wire = blocks.some(({ process }) => process === null || ['GMAW', 'FCAW', 'SAW', 'OTHER'].includes(process))
  const controlled = blocks.some(({ electrical }) => electrical.waveformControlled === true)
  return [...COLUMNS.filter(({ id }) => id !== 'wireFeed' || wire || used(id)), ...(controlled || used('instantaneousEnergy') ? [ENERGY] : [])]
}

export const cellText = (row: RunRow, { id, kind, dimension }: RunColumn, system: UnitSystem): string =>
  kind === 'interval' ? intervalText(row[id] as Interval | null, dimension, system) : quantityText(row[id] as Quantity | null, dimension, system)

export type RowReading = { ok: true; row: RunRow } | { ok: false; message: string }

/** A row with one measured cell typed anew, or what is wrong with the text. */
export function writeCell(row: RunRow, { id, kind, dimension, label }: RunColumn, text: string, system: UnitSystem): RowReading {
  const where = `Pass ${row.pass}, ${label.toLowerCase()}: `
  const reading = kind === 'interval' ? readIntervalCell(text, dimension, where, system) : readQuantityCell(text, dimension, where, system)
  return reading.ok ? { ok: true, row: { ...row, [id]: reading.value } } : reading
}

/** The pass's number typed anew. */
export const writePass = (row: RunRow, text: string): RowReading =>
  text.trim() !== '' && text.trim().length <= 12 ? { ok: true, row: { ...row, pass: text.trim() } } : { ok: false, message: 'Number the pass with 1 to 12 characters, e.g. 3 or 2-4.' }

/** A further row: numbered on, of the same process, layer and size as the one before. */
export function addRow(rows: readonly RunRow[], blocks: readonly ProcessBlock[], id: string): RunRow[] {
  const last = rows.at(-1)
  const layer = last ? (last.layer === 'root' ? 'fill' : last.layer) : 'root'
  return [...rows, runRowSchema.parse({ id, processId: last?.processId ?? blocks[0]?.id ?? '', pass: nextPassNumber(rows.map(({ pass }) => pass)), layer, fillerDiameter: last?.fillerDiameter ?? blocks[0]?.filler.diameters[0] ?? null })]
}

/** The last row once more, numbered on; what differs from pass to pass (arc time, interpass, energy, note) is left to be read. */
export function copyLastRow(rows: readonly RunRow[], id: string): RunRow[] {
  const last = rows.at(-1)
  if (!last) return [...rows]
  return [...rows, { ...structuredClone(last), id, pass: nextPassNumber(rows.map(({ pass }) => pass)), arcTime: null, interpass: null, instantaneousEnergy: null, note: null }]
}
