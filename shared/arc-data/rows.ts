/**
 * Rows of a table out of pieces of its bytes. Written by hand over Uint8Array, against the habit of taking a library: a row's figures are
 * read in place, without a string or an object a field, so that ten million rows take no more memory than one and a million about a tenth of a second.
 */
import type { ArcLayout } from '../schemas/arc-data.ts'
import { ArcDataError, shownText } from './problem.ts'

/** Bytes of a line; more is no row of figures. */
const LONGEST_LINE = 65_536
const POWERS = Float64Array.from({ length: 23 }, (_, exponent) => Number(`1e${exponent}`))
const [SPACE, QUOTE, PLUS, MINUS] = [32, 34, 43, 45]

export interface RowSink {
  /** Figures as they stand in the file, in its units; `time` is NaN where there is no time column. */
  row: (line: number, time: number, current: number, voltage: number) => void
  /** A row that can't be used, shown text and reason. */
  bad: (line: number, text: string, why: string) => void
}

type Shape = Pick<ArcLayout, 'delimiter' | 'decimal' | 'headerRows' | 'columns'>

export class RowReader {
  /** Lines met so far, counted from 1. */
  line = 0
  private readonly sink: RowSink
  private readonly eol: number
  private readonly delimiter: number
  private readonly decimal: number
  private readonly headerRows: number
  private readonly time: number
  private readonly current: number
  private readonly voltage: number
  private readonly last: number
  private readonly carry = new Uint8Array(LONGEST_LINE)
  private carried = 0
  /** Where the last field ended, and whether it was there at all. */
  private at = 0
  private empty = false

  /** @param eol byte that ends a line: 10, or 13 for files that know no line feed */
  constructor({ delimiter, decimal, headerRows, columns }: Shape, eol: number, sink: RowSink) {
    this.sink = sink
    this.eol = eol
    this.delimiter = delimiter.charCodeAt(0)
    this.decimal = decimal.charCodeAt(0)
    this.headerRows = headerRows
    this.time = columns.time ?? -1
    this.current = columns.current
    this.voltage = columns.voltage
    this.last = Math.max(this.time, this.current, this.voltage)
  }

  /** Takes the next piece; how the file is cut makes no difference. @throws ArcDataError at a line without end */
  push(bytes: Uint8Array): void {
    let start = 0
    for (;;) {
      const end = bytes.indexOf(this.eol, start)
      if (end < 0) break
      if (this.carried > 0) {
        this.keep(bytes, start, end)
        const length = this.carried
        this.carried = 0
        this.read(this.carry, 0, length)
      } else {
        if (end - start > LONGEST_LINE) this.tooLong()
        this.read(bytes, start, end)
      }
      start = end + 1
    }
    this.keep(bytes, start, bytes.length)
  }

  /** Reads what stands after the last line's end. */
  end(): void {
    const length = this.carried
    this.carried = 0
    if (length > 0) this.read(this.carry, 0, length)
  }

  private keep(bytes: Uint8Array, start: number, end: number): void {
    if (end <= start) return
    if (this.carried + end - start > LONGEST_LINE) this.tooLong()
    this.carry.set(bytes.subarray(start, end), this.carried)
    this.carried += end - start
  }

  private tooLong(): never {
    throw new ArcDataError(`Row ${this.line + 1} is longer than ${LONGEST_LINE} characters, so this is no table of samples with a row each. Export the recording with one sample a row.`, { row: this.line + 1 })
  }

  private read(bytes: Uint8Array, start: number, end: number): void {
    this.line += 1
    if (this.line <= this.headerRows) return
    while (end > start && (bytes[end - 1] ?? 0) <= SPACE) end--
    let at = start
    while (at < end && (bytes[at] === SPACE || bytes[at] === 13)) at++
    if (at >= end) return
    const { delimiter, last } = this
    const spaced = delimiter === SPACE
    let time = NaN
    let current = NaN
    let voltage = NaN
    for (let field = 0; field <= last; field++) {
      if (at > end) return this.refuse(bytes, start, end, field)
      if (field === this.time || field === this.current || field === this.voltage) {
        const value = this.number(bytes, at, end)
        if (value !== value) return this.refuse(bytes, start, end, field)
        if (field === this.time) time = value
        if (field === this.current) current = value
        if (field === this.voltage) voltage = value
        at = this.at
      } else {
        while (at < end && bytes[at] !== delimiter) at++
      }
      at++
      if (spaced) while (at < end && bytes[at] === SPACE) at++
    }
    this.sink.row(this.line, time, current, voltage)
  }

  /** The number in the field that begins at `at`; NaN when there is none. Exactly the double that `Number` gives for the same text. */
  private number(bytes: Uint8Array, at: number, end: number): number {
    const { delimiter, decimal } = this
    const spaced = delimiter === SPACE
    let byte = bytes[at] ?? 0
    while (at < end && ((byte === SPACE && !spaced) || byte === QUOTE)) byte = bytes[++at] ?? 0
    this.empty = at >= end || byte === delimiter
    const begin = at
    const negative = byte === MINUS
    if (negative || byte === PLUS) byte = bytes[++at] ?? 0
    let mantissa = 0
    let digits = 0
    let exponent = 0
    while (at < end && byte >= 48 && byte <= 57) {
      mantissa = mantissa * 10 + byte - 48
      digits++
      byte = bytes[++at] ?? 0
    }
    if (at < end && byte === decimal) {
      byte = bytes[++at] ?? 0
      while (at < end && byte >= 48 && byte <= 57) {
        mantissa = mantissa * 10 + byte - 48
        digits++
        exponent--
        byte = bytes[++at] ?? 0
      }
    }
    if (digits === 0) return NaN
    if (at < end && (byte | 32) === 101) {
      byte = bytes[++at] ?? 0
      const down = byte === MINUS
      if (down || byte === PLUS) byte = bytes[++at] ?? 0
      let power = 0
      let powers = 0
      while (at < end && byte >= 48 && byte <= 57 && powers < 5) {
        power = power * 10 + byte - 48
        powers++
        byte = bytes[++at] ?? 0
      }
      if (powers === 0) return NaN
      exponent += down ? -power : power
    }
    const after = at
    while (at < end && ((byte === SPACE && !spaced) || byte === QUOTE)) byte = bytes[++at] ?? 0
    if (at < end && byte !== delimiter) return NaN
    this.at = at
    // Up to 15 digits and a power of ten up to 22 are exact, so one multiplication or division rounds rightly.
    let value: number
    if (digits <= 15 && exponent >= -22 && exponent <= 22) value = exponent < 0 ? mantissa / (POWERS[-exponent] ?? 1) : mantissa * (POWERS[exponent] ?? 1)
    else value = Math.abs(Number(latin(bytes, negative ? begin + 1 : begin, after).replace(',', '.')))
    // Beyond what a double holds is no reading.
    if (value === Infinity) return NaN
    return negative ? -value : value
  }

  private refuse(bytes: Uint8Array, start: number, end: number, field: number): void {
    const name = field === this.time ? 'time' : field === this.current ? 'current' : 'voltage'
    const missing = this.empty || this.fields(bytes, start, end) <= field
    const why = missing ? `the column of the ${name} (column ${field + 1}) is missing or empty` : `the ${name} (column ${field + 1}) is not a number`
    this.sink.bad(this.line, shownText(latin(bytes, start, Math.min(end, start + 200))), why)
  }

  private fields(bytes: Uint8Array, start: number, end: number): number {
    let count = 1
    for (let at = start; at < end; at++) if (bytes[at] === this.delimiter && (this.delimiter !== SPACE || bytes[at + 1] !== SPACE)) count++
    return count
  }
}

function latin(bytes: Uint8Array, start: number, end: number): string {
  let text = ''
  for (let at = start; at < end; at++) text += String.fromCharCode(bytes[at] ?? 0)
  return text
}
