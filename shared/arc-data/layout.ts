/** How a recording is laid out, found from its first lines. */
import type { ArcChoice, ArcLayout } from '../schemas/arc-data.ts'
import { encodingOf, type Encoding } from './encoding.ts'
import { columnsByValue, type Series } from './columns.ts'
import { ArcDataError, shownText } from './problem.ts'
import { readHeader, type HeaderReading, type Meaning } from './words.ts'

/** Bytes from a file's beginning by which its layout is told. */
export const HEAD_BYTES = 65_536
const LINES_LOOKED_AT = 200
const DELIMITERS = ['\t', ';', '|', ',', ' '] as const

interface ArcColumn { name: string; values: string[] }
export interface LayoutGuess {
  layout: ArcLayout
  /** 10, or 13 for files that know no line feed. */
  eol: number
  /** False where a person should look at the columns first; `doubts` says why. */
  sure: boolean
  doubts: string[]
  /** Every column with its head and first values, for choosing. */
  columns: ArcColumn[]
  /** The time column is missing, so the sample rate is asked for. */
  needsRate: boolean
}

function textOf(bytes: Uint8Array, encoding: Encoding): string {
  return new TextDecoder(encoding).decode(bytes, { stream: true }).replace(/^\uFEFF/, '')
}

interface Table { delimiter: ArcLayout['delimiter']; decimal: ArcLayout['decimal']; first: number; width: number; rows: string[][] }

const splitLine = (line: string, delimiter: string): string[] => (delimiter === ' ' ? line.trim().split(/ +/) : line.split(delimiter)).map((field) => field.trim().replace(/^"(.*)"$/, '$1').trim())

const isNumber = (text: string, decimal: string): boolean => (decimal === ',' ? /^[+-]?\d+(,\d+)?(e[+-]?\d+)?$/i : /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i).test(text)

/** The longest run of lines that are figures in the same columns, read with one pair of separators. */
function tableWith(lines: readonly string[], delimiter: Table['delimiter'], decimal: Table['decimal']): (Table & { score: number }) | null {
  const kinds = lines.map((line) => {
    if (line.trim() === '') return null
    const fields = splitLine(line, delimiter)
    // Figures somewhere in at least two columns; others may hold words, e.g. a state.
    const figures = fields.filter((field) => isNumber(field, decimal)).length
    return { fields, figures: figures >= 2 || (figures === 1 && fields.length === 1) ? figures : 0 }
  })
  const first = kinds.findIndex((kind, index) => {
    if (!kind || kind.figures === 0) return false
    const next = kinds.slice(index, index + 6).filter((one) => one !== null)
    return next.length >= 2 ? next.filter((one) => one.figures >= Math.max(1, kind.figures - 1) && one.fields.length >= kind.fields.length - 1).length >= Math.min(4, next.length) : index >= kinds.length - 2
  })
  if (first < 0) return null
  const rows = kinds.slice(first).flatMap((kind) => (kind ? [kind] : []))
  const widths = new Map<number, number>()
  for (const { fields } of rows) widths.set(fields.length, (widths.get(fields.length) ?? 0) + 1)
  const [width = 0, alike = 0] = [...widths].sort((a, b) => b[1] - a[1])[0] ?? []
  const figures = rows.filter(({ fields }) => fields.length === width).reduce((sum, row) => sum + row.figures, 0)
  const every = rows.reduce((sum, { fields }) => sum + fields.filter((field) => field !== '').length, 0)
  return { delimiter, decimal, first, width, rows: rows.map(({ fields }) => fields), score: (alike / rows.length) * (figures / Math.max(1, every)) * (width >= 2 ? 1 : 0.1) }
}

function findTable(lines: readonly string[]): Table {
  const found = DELIMITERS.flatMap((delimiter) => (['.', ','] as const).flatMap((decimal) => (delimiter === decimal ? [] : (tableWith(lines, delimiter, decimal) ?? []))))
  // Equal scores: the point is the commoner decimal sign, and comes first.
  const best = found.sort((a, b) => b.score - a.score)[0]
  if (!best || best.score < 0.05) {
    const shown = lines.find((line) => line.trim() !== '')
    throw new ArcDataError(shown === undefined ? 'The file is empty. Choose it again; it may not have been copied whole.' : `No rows of figures were found among the first lines. The first reads “${shownText(shown)}”. A recording needs one sample a row: current and voltage, and the time unless the sample rate is given.`)
  }
  if (best.width < 2) throw new ArcDataError('Only one column of figures was found. A recording needs current and voltage side by side, separated by a comma, semicolon, tab, bar or space.', { row: best.first + 1 })
  return best
}

/** Heads by column: the last lines above the figures that have as many fields, a line of units below the names included. */
function headsOf(lines: readonly string[], { first, width, delimiter }: Table): string[] {
  const above: string[][] = []
  for (let at = first - 1; at >= 0 && at >= first - 3; at--) {
    const line = lines[at] ?? ''
    if (line.trim() === '') continue
    const fields = splitLine(line, delimiter)
    if (fields.length < width - 1 || fields.length > width + 1) break
    above.unshift(fields)
  }
  const units = /^[([{]?\s*(s|ms|µs|us|sec|a|ka|ma|v|kv|mv|w|kw|-|)\s*[)\]}]?$/iu
  const withUnits = above.length > 1 && (above.at(-1) ?? []).every((field) => units.test(field))
  const names = withUnits ? above.at(-2) : above.at(-1)
  return Array.from({ length: width }, (_, column) => [names?.[column] ?? '', ...(withUnits ? [`[${(above.at(-1)?.[column] ?? '').replace(/[()[\]{}]/g, '')}]`] : [])].join(' ').trim())
}

const NAMES: Record<Meaning, string> = { time: 'time', current: 'current', voltage: 'voltage' }

/** The column that the heads give a meaning; measured before asked for. */
function named(heads: readonly HeaderReading[], meaning: Meaning): { column: number | null; several: boolean } {
  const all = heads.flatMap((head, column) => (head.meaning === meaning ? [{ column, asked: head.asked }] : []))
  const measured = all.filter(({ asked }) => !asked)
  const usable = measured.length > 0 ? measured : all
  return { column: usable[0]?.column ?? null, several: usable.length > 1 }
}

/**
 * Finds delimiter, decimal sign, header, columns and units.
 * @param head the file's first bytes, up to HEAD_BYTES
 * @param choice what a person says; it goes before what is found
 * @param whole whether `head` is the whole file
 * @throws ArcDataError when there is no table of figures, or a chosen column is not there
 */
export function guessLayout(head: Uint8Array, choice: ArcChoice = {}, whole = false): LayoutGuess {
  if (head.length === 0) throw new ArcDataError('The file is empty. Choose it again; it may not have been copied whole.')
  const { encoding } = encodingOf(head)
  const text = textOf(head, encoding)
  const eol = text.includes('\n') || !text.includes('\r') ? 10 : 13
  const all = text.split(eol === 10 ? /\r?\n/ : '\r')
  // The last line of a piece is likely cut.
  const lines = (whole || all.length < 2 ? all : all.slice(0, -1)).slice(0, LINES_LOOKED_AT)
  const table = findTable(lines)
  const heads = headsOf(lines, table)
  const readings = heads.map(readHeader)
  const series: Series[] = heads.map((_, column) => table.rows.map((row) => (isNumber(row[column] ?? '', table.decimal) ? Number((row[column] ?? '').replace(',', '.')) : NaN)))
  const doubts: string[] = []
  const chosen = { time: choice.time === undefined ? undefined : choice.time < 0 ? null : choice.time, current: choice.current, voltage: choice.voltage }
  for (const meaning of ['time', 'current', 'voltage'] as const) {
    const column = chosen[meaning]
    if (typeof column === 'number' && column >= table.width) throw new ArcDataError(`Column ${column + 1} was chosen for the ${NAMES[meaning]}, but the rows have ${table.width} columns.`, { row: table.first + 1, asks: 'columns' })
  }
  const byName = { time: named(readings, 'time'), current: named(readings, 'current'), voltage: named(readings, 'voltage') }
  const byValue = columnsByValue(series, { time: chosen.time === undefined ? byName.time.column : chosen.time, current: chosen.current ?? byName.current.column, voltage: chosen.voltage ?? byName.voltage.column }, chosen.time === null)
  for (const meaning of ['time', 'current', 'voltage'] as const) {
    if (chosen[meaning] !== undefined) continue
    if (byName[meaning].several) doubts.push(`Several columns are named as ${NAMES[meaning]}; the first was taken.`)
    else if (byName[meaning].column === null && byValue[meaning] !== null) doubts.push(`No head names the ${NAMES[meaning]}; column ${byValue[meaning] + 1} was taken by its figures.`)
  }
  const { time, current, voltage } = byValue
  const aboveWidth = splitLine(lines[table.first - 1] ?? '', table.delimiter).length
  if ((current === null || voltage === null) && table.delimiter === ',' && aboveWidth > 1 && aboveWidth * 2 === table.width) throw new ArcDataError('The comma seems to stand both between the columns and before the decimals, so they cannot be told apart. Export the recording with a semicolon or tab between the columns.', { row: table.first + 1 })
  if (current === null || voltage === null) {
    const missing = current === null && voltage === null ? 'current and voltage' : current === null ? 'the current' : 'the voltage'
    const found = Object.fromEntries(Object.entries(byValue).filter((entry): entry is [Meaning, number] => entry[1] !== null))
    // Beside a time by name, a second column alone can't be both.
    if (table.width < 3 && byName.time.column !== null && chosen.time === undefined) throw new ArcDataError(`The file has no column for ${missing} beside the time${current === null && voltage === null ? '' : current === null ? ' and the voltage' : ' and the current'}. A recording needs both volts and amperes: export it again with both.`, { row: table.first + 1 })
    const both = current === null && voltage === null
    throw new ArcDataError(`The ${both ? 'columns' : 'column'} of ${missing} could not be told from the ${table.width} columns. Choose ${both ? 'them' : 'it'}.`, { row: table.first + 1, asks: 'columns', found })
  }
  if (current === voltage || time === current || time === voltage) throw new ArcDataError('Time, current and voltage must each have a column of its own. Choose them.', { asks: 'columns' })
  const timeUnit = time === null ? 'none' : (choice.timeUnit ?? readings[time]?.timeUnit ?? 's')
  if (time !== null && choice.timeUnit === undefined && !readings[time]?.timeUnit) doubts.push('The time column states no unit; it is read as seconds.')
  if (choice.currentUnit === undefined && !readings[current]?.currentUnit && median(series[current]) < 3) doubts.push('The current states no unit and its figures are small: check whether it is in kA.')
  const layout: ArcLayout = {
    delimiter: table.delimiter, decimal: table.decimal, headerRows: table.first, columns: { time, current, voltage }, timeUnit,
    currentUnit: choice.currentUnit ?? readings[current]?.currentUnit ?? 'A', voltageUnit: choice.voltageUnit ?? readings[voltage]?.voltageUnit ?? 'V',
    samplesPerSecond: time === null ? (choice.samplesPerSecond ?? null) : null, encoding,
  }
  return {
    layout, eol, doubts, sure: doubts.length === 0, needsRate: time === null && choice.samplesPerSecond === undefined,
    columns: heads.map((name, column) => ({ name: shownText(name), values: table.rows.slice(0, 6).map((row) => shownText(row[column] ?? '')) })),
  }
}

function median(values: readonly number[] | undefined): number {
  const sorted = (values ?? []).filter((value) => !Number.isNaN(value)).map(Math.abs).sort((a, b) => a - b)
  return sorted[sorted.length >> 1] ?? 0
}
